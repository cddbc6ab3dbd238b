using System;
using System.Globalization;
using System.Linq;
using FamilyGen.Fitting;
using FamilyGen.Tests.Partition;

namespace FamilyGen.Tests.Fitting;

/// <summary>Fits to published data against estimates computed in multiple precision: θ to 1e-8, log-likelihood to 1e-10,
/// standard errors to 1e-6, relative.</summary>
public class PublishedFitTests
{
    // Deaths by horse kicks in Prussian army corps (von Bortkiewicz 1898): corps-years with 0, 1, 2, … deaths.
    private static readonly double[] s_horseKicks = [109, 65, 22, 3, 1];

    // Hours between failures of air-conditioning equipment (Proschan 1963).
    private static readonly double[] s_airConditioning = [3, 5, 7, 18, 43, 85, 91, 98, 100, 130, 230, 487];

    [Fact]
    public void Counts_whose_spread_is_free_of_their_mean() => Check<DispersedCount>(
        Frequencies(s_horseKicks),
        ["-0.4945069641883719235459140", "0.9994385097165750571074304"],
        ["0.1433444227389639356353283", "0.2962273231301709451493414"],
        "-206.1067196755668061701097");

    [Fact]
    public void Counts_with_extra_zeros() => Check<PoissonExtraZero>(
        Frequencies(s_horseKicks),
        ["-0.4811777929013187008459648", "0.02420406673289755149879506"],
        ["0.1718977676801749159101839", "0.2706906928457355779042918"],
        "-206.1027278807840615340412");

    [Fact]
    public void Durations_with_a_delay() => Check<Duration>(
        Observations(s_airConditioning),
        ["-0.6320425192780385975534417", "-0.004513552431193854029873314", "-1.771543779025550541496423"],
        ["0.4602474254300714843441324", "0.003489333526705307497690007", "3.067617060814870164092944"],
        "-67.17245464047598975182168");

    private static (double X, double Weight)[] Frequencies(double[] frequencies) =>
        [.. frequencies.Select((frequency, x) => ((double)x, frequency))];

    private static (double X, double Weight)[] Observations(double[] observations) =>
        [.. observations.Select(x => (x, 1.0))];

    private static void Check<TFamily>((double X, double Weight)[] data, string[] theta, string[] errors, string logLikelihood)
        where TFamily : struct, IAtomFamily
    {
        var sums = new StatisticSums<AtomKernel<TFamily>>(default);
        foreach (var (x, weight) in data)
            sums.Add(x, weight);
        var fit = MaximumLikelihood.Fit(sums, (_, _) => default(TFamily));
        Assert.Equal(FitStatus.InteriorMaximum, fit.Status);
        for (var j = 0; j < theta.Length; j++)
        {
            Near(theta[j], fit.Natural[j], 1e-11);
            Near(errors[j], fit.StandardErrors[j], 1e-11);
        }

        Near(logLikelihood, fit.LogLikelihood, 1e-13);
        Assert.Equal((2 * theta.Length) - (2 * fit.LogLikelihood), fit.Aic, 12);
        Assert.Equal((theta.Length * Math.Log(fit.TotalWeight)) - (2 * fit.LogLikelihood), fit.Bic, 12);
    }

    private static void Near(string expected, double actual, double relative)
    {
        var value = double.Parse(expected, CultureInfo.InvariantCulture);
        Assert.InRange(actual / value, 1 - relative, 1 + relative);
    }
}
