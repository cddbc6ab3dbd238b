using System;
using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Conformance;

/// <summary>Draws against the cdf. Each test of fit is passed by a correct sampler with probability 1 − 1e-6 over the
/// choice of its seed, so that with a fixed seed and some fifty tests a false alarm had a chance below 1 in 10,000.</summary>
public class SamplingTests
{
    private const int Count = 20_000;
    private const int Seed = 20240607;

    [Theory]
    [MemberData(nameof(FaceCases.IntervalNames), MemberType = typeof(FaceCases))]
    public void Draws_follow_the_cdf_by_the_Kolmogorov_Smirnov_distance(string name)
    {
        var face = FaceCases.Get(name);
        var draws = face.Draws(Seed, Count);
        Array.Sort(draws);
        var distance = 0.0;
        for (var i = 0; i < Count; i++)
        {
            // among equal draws (a point with a probability of its own) only the last and the first edge count
            var cdf = face.Cdf(draws[i]);
            if (i + 1 == Count || draws[i + 1] != draws[i])
                distance = Math.Max(distance, Math.Abs((i + 1.0) / Count - cdf));
            if (i > 0 && draws[i - 1] != draws[i])
                distance = Math.Max(distance, Math.Abs((double)i / Count - cdf));
        }

        // P(√n·D > 2.694) = 2·exp(−2·2.694²) = 1e-6 (Kolmogorov 1933)
        Assert.InRange(distance * Math.Sqrt(Count), 0, 2.694);
    }

    [Theory]
    [MemberData(nameof(FaceCases.CountNames), MemberType = typeof(FaceCases))]
    public void Draws_follow_the_probabilities_by_chi_squared(string name)
    {
        var face = FaceCases.Get(name);
        var draws = face.Draws(Seed, Count);
        var (statistic, freedom) = ChiSquared(face, draws);
        Assert.True(freedom > 0);
        var limit = MathNet.Numerics.Distributions.ChiSquared.InvCDF(freedom, 1 - 1e-6);
        Assert.InRange(statistic, 0, limit);
    }

    [Theory]
    [MemberData(nameof(FaceCases.Names), MemberType = typeof(FaceCases))]
    public void Single_draws_follow_the_cdf_too(string name)
    {
        var face = FaceCases.Get(name);
        var draws = face.SingleDraws(Seed, 400);
        foreach (var p in (ReadOnlySpan<double>)[0.25, 0.5, 0.9])
        {
            var x = face.Quantile(p);
            var expected = face.Cdf(x);
            var found = draws.Count(d => d <= x) / (double)draws.Length;

            // six standard deviations of a proportion: a false alarm below 1e-8
            Assert.InRange(found - expected, -6 * Math.Sqrt(expected * (1 - expected) / draws.Length), 6 * Math.Sqrt(expected * (1 - expected) / draws.Length));
        }
    }

    [Theory]
    [MemberData(nameof(FaceCases.Names), MemberType = typeof(FaceCases))]
    public void Every_draw_can_be_observed(string name)
    {
        var face = FaceCases.Get(name);
        Assert.All(face.Draws(Seed, Count), x => Assert.True(face.Density(x) > 0, $"density at {x:r}"));
    }

    [Theory]
    [MemberData(nameof(FaceCases.Names), MemberType = typeof(FaceCases))]
    public void A_seed_gives_the_same_draws_again(string name)
    {
        var face = FaceCases.Get(name);
        Assert.Equal(face.Draws(7, 50), face.Draws(7, 50));
        Assert.Equal(face.SingleDraws(7, 5), face.SingleDraws(7, 5));
        Assert.NotEqual(face.Draws(7, 50), face.Draws(8, 50));
    }

    /// <summary>Cells of at least some 50 expected draws, cut at quantiles.</summary>
    private static (double Statistic, int Freedom) ChiSquared(Face face, double[] draws)
    {
        var edges = new SortedSet<double>();
        for (var k = 1; k < 60; k++)
            edges.Add(face.Quantile(k / 60.0));
        var (statistic, below, drawnBelow) = (0.0, 0.0, 0);
        foreach (var edge in edges)
        {
            var (cdf, drawn) = (face.Cdf(edge), draws.Count(d => d <= edge));
            statistic += Square(drawn - drawnBelow - Count * (cdf - below)) / (Count * (cdf - below));
            (below, drawnBelow) = (cdf, drawn);
        }
        var rest = face.Survival(edges.Max);
        if (rest * Count < 5)
            return (statistic, edges.Count - 1);
        return (statistic + Square(Count - drawnBelow - Count * rest) / (Count * rest), edges.Count);
    }

    private static double Square(double x) => x * x;
}
