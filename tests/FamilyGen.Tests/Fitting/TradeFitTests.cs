using System;
using System.Linq;
using CsCheck;
using FamilyGen.Fitting;

namespace FamilyGen.Tests.Fitting;

public class TradeFitTests
{
    [Fact]
    public void A_normal_law_far_from_zero_keeps_all_its_digits()
    {
        double[] x = [1e8 - 1, 1e8, 1e8 + 1, 1e8 + 0.5];
        var fit = Fit<SwingingLoad>(x);
        var mean = 1e8 + 0.125;
        var deviation = Math.Sqrt(x.Average(v => (v - mean) * (v - mean)));
        Assert.Equal(FitStatus.InteriorMaximum, fit.Status);
        Assert.InRange(fit.Natural[0] / (mean / deviation / deviation), 1 - 1e-14, 1 + 1e-14);
        Assert.InRange(fit.Natural[1] / (-0.5 / deviation / deviation), 1 - 1e-14, 1 + 1e-14);
        Assert.InRange(fit.Parameters[1] / deviation, 1 - 1e-12, 1 + 1e-12);
        Assert.Equal(deviation / 2, fit.ParameterStandardErrors[0], 8);
        Assert.Equal(deviation / Math.Sqrt(8), fit.ParameterStandardErrors[1], 8);
        Assert.Equal(-4 * (Math.Log(deviation * Math.Sqrt(2 * Math.PI)) + 0.5), fit.LogLikelihood, 12);
        Assert.InRange(fit.Iterations, 0, 10);
    }

    [Fact]
    public void Trade_parameters_come_back_through_the_natural_ones() => Gen.Select(Gen.Double[-1e3, 1e3], Gen.Double[1e-3, 1e3]).Sample((mean, deviation) =>
    {
        var found = TradeParameters.FromNatural<TradeKernel<SwingingLoad>>(default, [mean / deviation / deviation, -0.5 / deviation / deviation]);
        return Math.Abs(found[0] - mean) <= 1e-8 * (Math.Abs(mean) + deviation) && Math.Abs((found[1] / deviation) - 1) < 1e-8;
    }, iter: 50);

    [Fact]
    public void Natural_parameters_out_of_reach_are_refused()
    {
        var failure = Assert.Throws<ArgumentOutOfRangeException>(() => TradeParameters.FromNatural<TradeKernel<SwingingLoad>>(default, [1, 0.5]));
        Assert.Contains("No values of mean, deviation within their ranges give the natural parameters load = 1, squaredLoad = 0.5.", failure.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(0.0, "The parameter 'deviation' is 0; it must be a number in (0, ∞).")]
    [InlineData(double.NaN, "The parameter 'deviation' is NaN; it must be a number in (0, ∞).")]
    public void A_parameter_out_of_range_is_refused_by_name(double deviation, string expected)
    {
        var failure = Assert.Throws<ArgumentOutOfRangeException>(() => TradeParameters.Distribution<TradeKernel<SwingingLoad>>(default, [1, deviation]));
        Assert.Contains(expected, failure.Message, StringComparison.Ordinal);
        Assert.False(TradeParameters.AreInRange<TradeKernel<SwingingLoad>>(default, [1, deviation]));
    }

    [Fact]
    public void A_curved_family_is_fitted_and_called_local()
    {
        double[] x = [18.2, 21.4, 19.9, 22.8, 20.3, 17.6];
        var fit = Fit<ProportionalLoad>(x);
        Assert.Equal(FitStatus.LocalMaximum, fit.Status);

        // With deviation = mean/10 the score is a quadratic: mean² + 100·average·mean − 100·(average square) = 0.
        var (average, square) = (x.Average(), x.Average(v => v * v));
        var mean = 0.5 * (Math.Sqrt((1e4 * average * average) + (400 * square)) - (100 * average));
        Assert.InRange(fit.Parameters[0] / mean, 1 - 1e-10, 1 + 1e-10);

        // Observed information: n·(−1 − 200·average/mean + 300·square/mean²)/mean².
        var information = x.Length * (-1 - (200 * average / mean) + (300 * square / mean / mean)) / mean / mean;
        Assert.Equal(1 / Math.Sqrt(information), fit.ParameterStandardErrors[0], 9);
        Assert.Contains("local maximum", fit.ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void A_piecewise_hazard_is_events_over_exposure_and_known_to_be_the_only_maximum()
    {
        double[] hours = [20, 60, 90, 150, 180, 300, 420, 800, 1500, 2600];
        var fit = Fit<BearingHours>(hours);
        Assert.Equal(FitStatus.InteriorMaximum, fit.Status);
        var early = 5 / hours.Sum(x => Math.Min(x, 200));
        var late = 5 / hours.Sum(x => Math.Max(0, x - 200));
        Assert.InRange(fit.Parameters[0] / early, 1 - 1e-10, 1 + 1e-10);
        Assert.InRange(fit.Parameters[1] / late, 1 - 1e-10, 1 + 1e-10);
        Assert.InRange(fit.ParameterStandardErrors[0] / (early / Math.Sqrt(5)), 1 - 1e-8, 1 + 1e-8);
        Assert.Equal((5 * Math.Log(early)) + (5 * Math.Log(late)) - 10, fit.LogLikelihood, 9);
    }

    [Fact]
    public void The_table_leads_with_the_trade_parameters_in_invariant_writing()
    {
        var culture = System.Globalization.CultureInfo.CurrentCulture;
        try
        {
            System.Globalization.CultureInfo.CurrentCulture = new("sv-SE");
            var lines = Fit<RepairHours>([0.6, 1.1, 1.4, 2, 2.2, 3.1, 4.7, 0.9, 1.7]).ToString().Split('\n');
            Assert.Equal("RepairHours fitted to 9 observations", lines[0]);
            Assert.StartsWith("shape", lines[2], StringComparison.Ordinal);
            Assert.StartsWith("rate", lines[3], StringComparison.Ordinal);
            Assert.StartsWith("delay", lines[4], StringComparison.Ordinal);
            Assert.StartsWith("mean", lines[5], StringComparison.Ordinal);
            Assert.StartsWith("95 % quantile", lines[6], StringComparison.Ordinal);
            Assert.StartsWith("log-likelihood", lines[7], StringComparison.Ordinal);
            Assert.StartsWith("AIC", lines[8], StringComparison.Ordinal);
            Assert.StartsWith("BIC", lines[9], StringComparison.Ordinal);
            Assert.Contains("interior maximum, the only one", lines[10], StringComparison.Ordinal);
            Assert.DoesNotContain(lines, line => line.Contains(',', StringComparison.Ordinal) && !line.Contains("maximum", StringComparison.Ordinal));
        }
        finally
        {
            System.Globalization.CultureInfo.CurrentCulture = culture;
        }
    }

    private static FitResult<TFamily> Fit<TFamily>(double[] data)
        where TFamily : struct, ITradeFamily
    {
        var sums = new StatisticSums<TradeKernel<TFamily>>(default);
        sums.AddRange(data);
        return MaximumLikelihood.FitTrade(sums, (_, _) => default(TFamily));
    }
}
