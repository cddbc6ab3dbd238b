using System;
using FamilyGen.Conformance.Families;

namespace FamilyGen.Conformance;

/// <summary>The families that an actuary, a reliability engineer and a demand modeller type on their first day: each fits
/// simulated data of its own back within three standard errors.</summary>
public class ThreeTradesTests
{
    private const int Rows = 4000;

    [Fact]
    public void Average_claim()
    {
        var truth = new AverageClaim(1.4, 0.01, claims: 3);
        var fit = AverageClaim.Fit(Draws(truth.Sample), claims: 3);
        Near([1.4, 0.01], fit);
        Assert.Equal(FitStatus.InteriorMaximum, fit.Status);
        Assert.InRange(fit.At(claims: 1).Mean / fit.At(claims: 3).Mean, 1 - 1e-9, 1 + 1e-9);
    }

    [Fact]
    public void Liability_loss()
    {
        var truth = new LiabilityLoss(1.5, 0.002, 1.8, 22, large: 5000);
        Near([1.5, 0.002, 1.8, 22], LiabilityLoss.Fit(Draws(truth.Sample), large: 5000));
    }

    [Fact]
    public void Bearing_life()
    {
        var truth = new BearingLife(0.002, 0.0004, 0.003);
        var fit = BearingLife.Fit(Draws(truth.Sample));
        Near([0.002, 0.0004, 0.003], fit);
        Assert.Equal(EventsOverExposure(Draws(truth.Sample)), fit.Estimate.Steady, 1e-9);
    }

    [Fact]
    public void Order_quantity()
    {
        var truth = new OrderQuantity(-0.02, -0.4, 1.2, perPallet: 48);
        var draws = new int[Rows];
        truth.Sample(new Random(11), draws);
        var fit = OrderQuantity.Fit(draws, perPallet: 48);
        for (var j = 0; j < 3; j++)
            Assert.InRange(fit.Natural[j] - truth.Natural[j], -3 * fit.StandardErrors[j], 3 * fit.StandardErrors[j]);
    }

    [Fact]
    public void Arrival_hour()
    {
        var truth = new ArrivalHour(0.8, 9, 0.6, 3);
        Near([0.8, 9, 0.6, 3], ArrivalHour.Fit(Draws(truth.Sample)));
    }

    [Fact]
    public void Every_first_second_and_third_pallet_is_seen_in_the_probabilities()
    {
        var law = new OrderQuantity(-0.02, -0.4, 1.2, perPallet: 48);
        Assert.Equal(Math.Exp(1.2 - 0.02 - 0.4 * Math.Log(48.0 / 47)), law.Density(48) / law.Density(47), 1e-12);
    }

    private static double EventsOverExposure(double[] lives)
    {
        var (events, exposure) = (0, 0.0);
        foreach (var life in lives)
        {
            exposure += Math.Max(0, Math.Min(life, 4000) - 200);
            events += life is >= 200 and < 4000 ? 1 : 0;
        }
        return events / exposure;
    }

    private delegate void Sampling(Random random, Span<double> draws);

    private static double[] Draws(Sampling sample)
    {
        var draws = new double[Rows];
        sample(new Random(11), draws);
        return draws;
    }

    private static void Near<TFamily>(double[] truth, FitResult<TFamily> fit)
    {
        for (var i = 0; i < truth.Length; i++)
        {
            var error = fit.ParameterStandardErrors[i];
            Assert.True(error > 0 && error < Math.Abs(truth[i]), $"standard error {error}");
            Assert.InRange(fit.Parameters[i] - truth[i], -3 * error, 3 * error);
        }
    }
}
