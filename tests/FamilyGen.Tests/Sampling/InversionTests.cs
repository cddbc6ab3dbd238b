using System;
using System.Linq;
using FamilyGen.Kernels;
using FamilyGen.Sampling;
using FamilyGen.Tests.Partition;

namespace FamilyGen.Tests.Sampling;

/// <summary>The inverse against distribution functions known in closed form: well within the stated 1e-10 of probability.</summary>
public class InversionTests
{
    private const double Tolerance = 1e-11;

    private static readonly double[] s_probabilities =
    [
        1e-16, 1e-12, 1e-9, 1e-6, 1e-4, .. Enumerable.Range(1, 997).Select(k => k / 998.0), 1 - 1e-4, 1 - 1e-6, 1 - 1e-9, 1 - 1e-12,
    ];

    private static SweepInverse<AtomKernel<TFamily>> Inverse<TFamily>(params double[] theta)
        where TFamily : IAtomFamily => new(new(default, theta), TFamily.Domain);

    private static void CheckInterval<TFamily>(double[] theta, Func<double, double> cdf)
        where TFamily : IAtomFamily
    {
        var inverse = Inverse<TFamily>(theta);
        foreach (var p in s_probabilities)
        {
            var x = inverse.At(p);
            // the draw is one of the doubles about the place
            Assert.True(
                cdf(Math.BitIncrement(x)) > p - Tolerance && cdf(Math.BitDecrement(x)) < p + Tolerance,
                $"{typeof(TFamily).Name}: {p} gives {x}, with probability {cdf(x)} below");
        }
    }

    private static void CheckCounts<TFamily>(double[] theta, Func<double, double> cdf)
        where TFamily : IAtomFamily
    {
        var inverse = Inverse<TFamily>(theta);
        foreach (var p in s_probabilities)
        {
            var x = inverse.At(p);
            Assert.True(x == Math.Floor(x));
            Assert.True(cdf(x) > p - Tolerance && cdf(x - 1) < p + Tolerance, $"{typeof(TFamily).Name}: {p} gives {x}: {cdf(x - 1)} … {cdf(x)}");
        }
    }

    [Theory]
    [InlineData(0, 1)]
    [InlineData(1e8, 1)]
    [InlineData(-3, 1e-5)]
    public void Normal(double mean, double deviation) => CheckInterval<Normal>(
        [mean / (deviation * deviation), -0.5 / (deviation * deviation)],
        x => MathNet.Numerics.SpecialFunctions.Erfc((mean - x) / (deviation * Math.Sqrt(2))) / 2);

    [Theory]
    [InlineData(1)]
    [InlineData(1e-9)]
    [InlineData(1e9)]
    public void Exponential(double rate) => CheckInterval<Exponential>([-rate], x => -Special.Elementary.ExpM1(-rate * x));

    [Theory]
    [InlineData(1)]
    [InlineData(7)]
    [InlineData(40)]
    public void Gamma_with_an_integer_shape(int shape) => CheckInterval<Gamma>([shape - 1, -2], x =>
    {
        var (term, sum) = (1.0, 0.0);
        for (var k = 0; k < shape; k++, term *= 2 * x / k)
            sum += term;
        return 1 - (Math.Exp(-2 * x) * sum);
    });

    [Fact]
    public void Gamma_with_shape_one_half() => CheckInterval<Gamma>([-0.5, -1], x => MathNet.Numerics.SpecialFunctions.Erf(Math.Sqrt(x)));

    [Fact]
    public void Gamma_all_but_at_zero()
    {
        // P(X < x) is (x/2)^0.01/Γ(1.01) to the leading order
        var inverse = Inverse<Gamma>([-0.99, -2]);
        foreach (var p in new[] { 0.001, 0.01, 0.1, 0.5 })
        {
            var expected = (Math.Log(p) + Special.LogGamma.Value(1.01)) / 0.01;
            Assert.Equal(Math.Max(Math.Exp(expected) / 2, double.Epsilon), inverse.At(p), 1e-10 * Math.Exp(expected));
        }
    }

    [Theory]
    [InlineData(0.5)]
    [InlineData(1e-3)]
    [InlineData(1e-7)]
    [InlineData(1e-12)]
    public void Geometric(double rate) => CheckCounts<Geometric>([-rate], x => -Special.Elementary.ExpM1(-rate * (x + 1)));

    [Theory]
    [InlineData(0.03)]
    [InlineData(5.5)]
    [InlineData(1234.5)]
    [InlineData(2.5e6)]
    public void Poisson(double mean)
    {
        // terms by their ratios from the mode outward
        var mode = Math.Floor(mean);
        var first = Math.Max(0, mode - 5000 - Math.Floor(12 * Math.Sqrt(mean)));
        var terms = new double[(int)(mode - first) + 5000 + (int)(12 * Math.Sqrt(mean))];
        terms[(int)(mode - first)] = 1;
        for (var k = mode; k > first; k--)
            terms[(int)(k - 1 - first)] = terms[(int)(k - first)] * k / mean;
        for (var k = mode + 1; k - first < terms.Length; k++)
            terms[(int)(k - first)] = terms[(int)(k - 1 - first)] * mean / k;
        var total = terms.Sum();
        var below = 0.0;
        var cumulative = terms.Select(term => (below += term) / total).ToArray();
        CheckCounts<Poisson>([Math.Log(mean)], x => x < first ? 0 : cumulative[(int)Math.Min(x - first, cumulative.Length - 1)]);
    }

    [Fact]
    public void Joints_between_cells_and_panels_are_met()
    {
        // on the unit interval a flat density puts every joint at a multiple of a power of two
        var inverse = Inverse<Steps>(0);
        for (var k = 1; k < 3 * 512; k++)
            foreach (var off in new[] { -1e-12, -1e-15, 0, 1e-15, 1e-12 })
                Assert.Equal((k / 512.0) + off, inverse.At(((k / 512.0) + off) / 3), 1e-11);
    }

    [Fact]
    public void Draws_never_leave_the_support()
    {
        var inverse = Inverse<Beta>([-0.9999, -0.9999]);
        foreach (var p in s_probabilities)
            Assert.InRange(inverse.At(p), double.Epsilon, Math.BitDecrement(1));
    }

    [Fact]
    public void Places_rise_with_the_probability()
    {
        var inverse = Inverse<Quartic>([0.3, 4, 0.1, -1]);
        var draws = s_probabilities.Select(inverse.At).ToArray();
        Assert.Equal(draws.Order(), draws);
        Assert.True(draws[0] < -1 && draws[^1] > 1);
    }
}
