using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using FamilyGen.Partition;

namespace FamilyGen.Tests.Partition;

/// <summary>Distribution and survival functions against values with 25 digits: each tail to 1e−9 of itself, down to
/// probabilities that only their logarithm can hold; and quantiles that lead back to them.</summary>
public class TailTests
{
    private static readonly ILookup<string, string[]> s_rows = Rows().ToLookup(row => row[0]);

    [Theory]
    [InlineData("exponential", typeof(Exponential))]
    [InlineData("gamma", typeof(Gamma))]
    [InlineData("normal", typeof(Normal))]
    [InlineData("beta", typeof(Beta))]
    [InlineData("duration_log_lin_inv", typeof(Duration))]
    [InlineData("von_mises", typeof(VonMises))]
    [InlineData("quartic", typeof(Quartic))]
    [InlineData("geometric", typeof(Geometric))]
    [InlineData("poisson", typeof(Poisson))]
    public void Tails_keep_their_digits(string family, Type declaration) => Run(nameof(CheckTails), family, declaration);

    [Theory]
    [InlineData("exponential", typeof(Exponential))]
    [InlineData("gamma", typeof(Gamma))]
    [InlineData("normal", typeof(Normal))]
    [InlineData("beta", typeof(Beta))]
    [InlineData("duration_log_lin_inv", typeof(Duration))]
    [InlineData("von_mises", typeof(VonMises))]
    [InlineData("quartic", typeof(Quartic))]
    public void Quantiles_lead_back_to_probabilities(string family, Type declaration) => Run(nameof(CheckQuantiles), family, declaration);

    [Theory]
    [InlineData("geometric", typeof(Geometric))]
    [InlineData("poisson", typeof(Poisson))]
    public void Quantiles_of_counts_are_the_first_to_reach(string family, Type declaration) => Run(nameof(CheckCountQuantiles), family, declaration);

    private static void Run(string check, string family, Type declaration)
    {
        var failures = new List<string>();
        var method = typeof(TailTests).GetMethod(check, System.Reflection.BindingFlags.Static | System.Reflection.BindingFlags.NonPublic)!;
        foreach (var point in s_rows[family].GroupBy(row => row[1]))
            method.MakeGenericMethod(declaration).Invoke(null, [point.Key, point.ToArray(), failures]);
        Assert.True(failures.Count == 0, string.Join('\n', failures));
    }

    private static void CheckTails<TFamily>(string theta, string[][] rows, List<string> failures)
        where TFamily : IAtomFamily
    {
        var distribution = new Distribution<AtomKernel<TFamily>>(default, Numbers(theta));
        foreach (var row in rows)
        {
            var x = Number(row[2]);
            Compare($"log P(X ≤ {x:R}) at {theta}", distribution.LogCdf(x), Number(row[3]), failures);
            Compare($"log P(X > {x:R}) at {theta}", distribution.LogSurvival(x), Number(row[4]), failures);
            Compare($"P(X ≤ {x:R}) at {theta}", Math.Log(distribution.Cdf(x)), Math.Log(Math.Exp(Number(row[3]))), failures);
            Compare($"P(X > {x:R}) at {theta}", Math.Log(distribution.Survival(x)), Math.Log(Math.Exp(Number(row[4]))), failures);
        }
    }

    private static void CheckQuantiles<TFamily>(string theta, string[][] rows, List<string> failures)
        where TFamily : IAtomFamily
    {
        var distribution = new Distribution<AtomKernel<TFamily>>(default, Numbers(theta));
        double[] probabilities = [1e-300, 1e-100, 1e-30, 1e-12, 1e-6, 1e-3, 0.1, 0.25, 0.5 - 1e-9, 0.5];
        var before = double.NegativeInfinity;
        foreach (var p in probabilities)
        {
            var x = distribution.Quantile(p);
            CompareProbability($"cdf of the quantile of {p:R} at {theta}: {x:R}", distribution.Cdf, p, x, failures);
            if (!(x >= before))
                failures.Add($"The quantile of {p:R} at {theta} is {x:R}, below {before:R}.");
            before = x;
        }

        foreach (var q in probabilities.Reverse())
        {
            var x = distribution.SurvivalQuantile(q);
            CompareProbability($"survival at the upper quantile of {q:R} at {theta}: {x:R}", distribution.Survival, q, x, failures);
            if (!(x >= before - 1e-15 * Math.Abs(before)))
                failures.Add($"The upper quantile of {q:R} at {theta} is {x:R}, below {before:R}.");
            before = x;
        }
    }

    private static void CheckCountQuantiles<TFamily>(string theta, string[][] rows, List<string> failures)
        where TFamily : IAtomFamily
    {
        var distribution = new Distribution<AtomKernel<TFamily>>(default, Numbers(theta));
        foreach (var row in rows)
        {
            var x = Number(row[2]);
            var (cdf, survival) = (distribution.Cdf(x), distribution.Survival(x));
            if (cdf > 1e-300 && distribution.Quantile(cdf) is var lower && lower != x && survival > 1e-12)
                failures.Add($"The quantile of {cdf:R} at {theta} is {lower:R} instead of {x:R}.");
            if (survival > 1e-300 && distribution.SurvivalQuantile(survival) is var upper && upper != x && cdf > 1e-12)
                failures.Add($"The upper quantile of {survival:R} at {theta} is {upper:R} instead of {x:R}.");
            if (cdf is > 1e-300 and < 0.99999 && distribution.Quantile(Math.BitIncrement(cdf * (1 + 1e-12))) is var next && next != x + 1)
                failures.Add($"Just above {cdf:R} at {theta} the quantile is {next:R} instead of {x + 1:R}.");
        }
    }

    private static void Compare(string what, double actual, double expected, List<string> failures)
    {
        if (!(actual == expected || Math.Abs(actual - expected) <= 1e-9))
            failures.Add(string.Create(CultureInfo.InvariantCulture, $"{what}: {actual:R} instead of {expected:R}"));
    }

    // The doubles on either side of x may be too far apart for a probability to be met: it then lies between theirs.
    private static void CompareProbability(string what, Func<double, double> function, double expected, double x, List<string> failures)
    {
        var actual = function(x);
        if (Math.Abs(actual - expected) <= 1e-9 * expected)
            return;
        var (a, b) = (function(Math.BitDecrement(x)), function(Math.BitIncrement(x)));
        if (!(Math.Min(a, b) <= expected && Math.Max(a, b) >= expected))
            failures.Add(string.Create(CultureInfo.InvariantCulture, $"{what}: {actual:R} instead of {expected:R}"));
    }

    private static double[] Numbers(string text) => text.Split(' ').Select(Number).ToArray();

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);

    private static IEnumerable<string[]> Rows()
    {
        using var stream = typeof(TailTests).Assembly.GetManifestResourceStream("partition-tails.tsv")!;
        using var reader = new StreamReader(stream);
        while (reader.ReadLine() is { } line)
            yield return line.Split('\t');
    }
}
