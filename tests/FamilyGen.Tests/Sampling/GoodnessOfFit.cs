using System;
using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Tests.Sampling;

/// <summary>Tests of draws against the distribution that they should have. The level is the chance that one test fails
/// although the draws are right; seeds are fixed, so that a test that passes once passes always.</summary>
internal static class GoodnessOfFit
{
    public const double Level = 1e-6;

    /// <summary>Kolmogorov's test, with the asymptotic distribution of √n·D: P(√n·D &gt; λ) ≤ 2 exp(−2λ²).</summary>
    public static void Kolmogorov(double[] draws, Func<double, double> cdf)
    {
        Array.Sort(draws);
        var distance = 0.0;
        for (var i = 0; i < draws.Length; i++)
        {
            var p = cdf(draws[i]);
            distance = Math.Max(distance, Math.Max(p - ((double)i / draws.Length), ((i + 1.0) / draws.Length) - p));
        }

        var limit = Math.Sqrt(Math.Log(2 / Level) / 2 / draws.Length);
        Assert.True(distance < limit, $"distance {distance}, at level {Level} the limit is {limit}");
    }

    /// <summary>Pearson's test on single counts, those with an expectation below 10 thrown together.</summary>
    public static void ChiSquared(double[] draws, double from, double to, Func<double, double> probability)
    {
        var observed = draws.CountBy(x => x).ToDictionary();
        double statistic = 0, restExpected = draws.Length, restObserved = draws.Length;
        var cells = 0;
        for (var x = from; x <= to; x++)
        {
            var expected = draws.Length * probability(x);
            if (expected < 10)
                continue;
            var count = observed.GetValueOrDefault(x);
            statistic += (count - expected) * (count - expected) / expected;
            (restExpected, restObserved, cells) = (restExpected - expected, restObserved - count, cells + 1);
        }

        if (restExpected > 10)
        {
            statistic += (restObserved - restExpected) * (restObserved - restExpected) / restExpected;
            cells++;
        }

        var limit = ChiSquaredInverse(cells - 1);
        Assert.True(cells > 1 && statistic < limit, $"χ² = {statistic} on {cells - 1} degrees of freedom, at level {Level} the limit is {limit}");
    }

    private static double ChiSquaredInverse(int freedom) => MathNet.Numerics.Distributions.ChiSquared.InvCDF(freedom, 1 - Level);
}
