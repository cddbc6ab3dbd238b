using System;
using System.Linq;
using FamilyGen.Partition;
using FamilyGen.Tests.Partition;

namespace FamilyGen.Tests.Sampling;

/// <summary>Draws as users make them.</summary>
public class DrawTests
{
    private const int Many = 100_000;

    private static Distribution<AtomKernel<TFamily>> Member<TFamily>(params double[] theta)
        where TFamily : IAtomFamily => new(default, theta);

    private static double[] Batch<TFamily>(int seed, params double[] theta)
        where TFamily : IAtomFamily
    {
        var draws = new double[Many];
        Member<TFamily>(theta).Sample(new Random(seed), draws);
        return draws;
    }

    [Fact]
    public void Normal_draws_pass_Kolmogorovs_test() => GoodnessOfFit.Kolmogorov(
        Batch<Normal>(1, 1e8, -0.5), x => MathNet.Numerics.SpecialFunctions.Erfc((1e8 - x) / Math.Sqrt(2)) / 2);

    [Fact]
    public void Gamma_draws_pass_Kolmogorovs_test() => GoodnessOfFit.Kolmogorov(
        Batch<Gamma>(2, 1.5, -3), x => MathNet.Numerics.Distributions.Gamma.CDF(2.5, 3, x));

    [Fact]
    public void Beta_draws_pass_Kolmogorovs_test() => GoodnessOfFit.Kolmogorov(
        Batch<Beta>(3, -0.5, -0.5), x => 2 / Math.PI * Math.Asin(Math.Sqrt(x)));

    [Fact]
    public void Inverse_gaussian_draws_pass_Kolmogorovs_test() => GoodnessOfFit.Kolmogorov(
        Batch<InverseGaussian>(4, -1, -2), x => new MathNet.Numerics.Distributions.InverseGaussian(Math.Sqrt(2), 4).CumulativeDistribution(x));

    [Fact]
    public void Single_draws_pass_Kolmogorovs_test()
    {
        var (member, random) = (Member<Exponential>(-1), new Random(5));
        GoodnessOfFit.Kolmogorov([.. Enumerable.Range(0, Many).Select(_ => member.Sample(random))], x => 1 - Math.Exp(-x));
    }

    [Fact]
    public void Poisson_draws_pass_the_chi_squared_test() => GoodnessOfFit.ChiSquared(
        Batch<Poisson>(6, Math.Log(8.25)), 0, 60, x => MathNet.Numerics.Distributions.Poisson.PMF(8.25, (int)x));

    [Fact]
    public void Wide_counts_pass_the_chi_squared_test() => GoodnessOfFit.ChiSquared(
        Batch<Poisson>(7, Math.Log(5000)), 4000, 6000, x => MathNet.Numerics.Distributions.Poisson.PMF(5000, (int)x));

    [Fact]
    public void Zero_inflated_counts_pass_the_chi_squared_test()
    {
        var member = Member<PoissonExtraZero>(Math.Log(3), 2);
        GoodnessOfFit.ChiSquared(Batch<PoissonExtraZero>(8, Math.Log(3), 2), 0, 30, x => Math.Exp(member.LogDensity(x)));
    }

    [Fact]
    public void Binomial_draws_pass_the_chi_squared_test() => GoodnessOfFit.ChiSquared(
        Batch<Binomial12>(9, -0.4), 0, 12, x => MathNet.Numerics.Distributions.Binomial.PMF(1 / (1 + Math.Exp(0.4)), 12, (int)x));

    [Fact]
    public void A_point_with_probability_of_its_own_is_drawn_exactly()
    {
        // odds of zero against the rest: e^θ₁ to 1/2
        var draws = Batch<DurationWithZeros>(16, 0, -2);
        var zeros = draws.Count(x => x == 0);
        Assert.InRange(zeros, (Many * 2 / 3.0) - 800, (Many * 2 / 3.0) + 800);      // five standard errors
        GoodnessOfFit.Kolmogorov([.. draws.Where(x => x > 0)], x => 1 - Math.Exp(-2 * x));
    }

    [Fact]
    public void Heaped_counts_pass_the_chi_squared_test()
    {
        var member = Member<HeapedCount>(-0.01, 1.2);
        GoodnessOfFit.ChiSquared(Batch<HeapedCount>(17, -0.01, 1.2), 0, 1000, x => Math.Exp(member.LogDensity(x)));
    }

    [Fact]
    public void Opaque_counts_pass_the_chi_squared_test()
    {
        var member = Member<OpaqueCount>(0.7, -0.2);
        GoodnessOfFit.ChiSquared(Batch<OpaqueCount>(18, 0.7, -0.2), 0, 100, x => Math.Exp(member.LogDensity(x)));
    }

    [Fact]
    public void Steps_pass_Kolmogorovs_test()
    {
        var (low, total) = (Math.Exp(1.5), Math.Exp(1.5) + 2);
        GoodnessOfFit.Kolmogorov(Batch<Steps>(19, 1.5), x => (x < 1 ? low * x : low + x - 1) / total);
    }

    [Fact]
    public void The_same_seed_gives_the_same_batch_and_another_seed_another()
    {
        Assert.Equal(Batch<Gamma>(11, 1, -1), Batch<Gamma>(11, 1, -1));
        Assert.NotEqual(Batch<Gamma>(11, 1, -1), Batch<Gamma>(12, 1, -1));
        var member = Member<Gamma>(1, -1);
        Assert.Equal(member.Sample(new Random(13)), member.Sample(new Random(13)));
    }

    [Fact]
    public void Integer_batches_are_the_double_batch()
    {
        var member = Member<Poisson>(2);
        var (doubles, ints, longs) = (new double[100], new int[100], new long[100]);
        member.Sample(new Random(14), doubles);
        member.Sample(new Random(14), ints);
        member.Sample(new Random(14), longs);
        Assert.Equal(doubles, ints.Select(x => (double)x));
        Assert.Equal(doubles, longs.Select(x => (double)x));
    }

    [Fact]
    public void Counts_beyond_their_type_are_refused()
    {
        var member = Member<Geometric>(-1e-12);
        Assert.Throws<OverflowException>(() => member.Sample(new Random(15), new int[100]));
        var longs = new long[100];
        member.Sample(new Random(15), longs);
        Assert.InRange(longs.Average(), 0.6e12, 1.5e12);
    }

    [Fact]
    public void A_missing_generator_is_named() =>
        Assert.Throws<ArgumentNullException>("random", () => Member<Poisson>(2).Sample(null!));
}
