using System;
using FamilyGen.Conformance.Families;
using MathNet.Numerics.Distributions;

namespace FamilyGen.Conformance;

/// <summary>MathNet's distributions as a second, independent witness, where they are accurate: moderate parameters and the
/// body of the law. Densities agree to 1e-11 relative, cdfs to 1e-9 absolute.</summary>
public class WitnessTests
{
    private const double DensityTolerance = 1e-11;
    private const double CdfTolerance = 1e-9;

    private static readonly double[] s_levels = [0.001, 0.02, 0.1, 0.3, 0.5, 0.8, 0.95, 0.999];

    [Theory]
    [InlineData(0.4)]
    [InlineData(3.1)]
    [InlineData(40)]
    public void Poisson(double mean) =>
        AgreeAsCounts(new Face("", new ArrivalCount(mean)), new MathNet.Numerics.Distributions.Poisson(mean));

    [Theory]
    [InlineData(0.05, 12)]
    [InlineData(0.6, 40)]
    public void Binomial(double chance, int parts) =>
        AgreeAsCounts(new Face("", new DefectiveParts(chance, parts: parts)), new Binomial(chance, parts));

    [Theory]
    [InlineData(0.3, 2.5)]
    [InlineData(0.8, 12)]
    public void Negative_binomial(double success, double size) =>
        AgreeAsCounts(new Face("", new SizedNegativeBinomial(Math.Log(1 - success), size: size)), new MathNet.Numerics.Distributions.NegativeBinomial(size, success));

    [Theory]
    [InlineData(0.5, 1)]
    [InlineData(3.5, 0.02)]
    [InlineData(60, 5)]
    public void Gamma(double shape, double rate) =>
        AgreeAsIntervals(new Face("", new GammaDuration(shape, rate)), new MathNet.Numerics.Distributions.Gamma(shape, rate));

    [Theory]
    [InlineData(0, 1)]
    [InlineData(100, 0.5)]
    [InlineData(-3, 20)]
    public void Normal(double mean, double deviation) =>
        AgreeAsIntervals(new Face("", new Reading(mean, deviation)), new MathNet.Numerics.Distributions.Normal(mean, deviation));

    [Theory]
    [InlineData(0.5, 0.5)]
    [InlineData(2, 5)]
    [InlineData(30, 12)]
    public void Beta(double a, double b) =>
        AgreeAsIntervals(new Face("", new Share(a, b)), new MathNet.Numerics.Distributions.Beta(a, b));

    [Theory]
    [InlineData(0, 1)]
    [InlineData(2, 0.3)]
    public void Log_normal(double logMean, double logDeviation) =>
        AgreeAsIntervals(new Face("", new LogReading(logMean, logDeviation)), new MathNet.Numerics.Distributions.LogNormal(logMean, logDeviation));

    [Theory]
    [InlineData(0.1)]
    [InlineData(7)]
    public void Exponential(double rate) =>
        AgreeAsIntervals(new Face("", new Families.Exponential(-rate)), new MathNet.Numerics.Distributions.Exponential(rate));

    [Theory]
    [InlineData(3)]
    [InlineData(40)]
    public void Chi_squared(double freedom) =>
        AgreeAsIntervals(new Face("", new Families.ChiSquared(freedom / 2 - 1)), new MathNet.Numerics.Distributions.ChiSquared(freedom));

    [Theory]
    [InlineData(3, 2)]
    [InlineData(0.7, 9)]
    public void Inverse_Gaussian(double mean, double shape) =>
        AgreeAsIntervals(new Face("", new FirstPassage(mean, shape)), new MathNet.Numerics.Distributions.InverseGaussian(mean, shape));

    private static void AgreeAsCounts(Face face, IDiscreteDistribution witness)
    {
        foreach (var p in s_levels)
        {
            var x = face.Quantile(p);
            Near(witness.Probability((int)x), face.Density(x), DensityTolerance);
            Assert.InRange(face.Cdf(x) - witness.CumulativeDistribution(x), -CdfTolerance, CdfTolerance);
        }
        Assert.InRange((face.Mean - witness.Mean) / witness.StdDev, -DensityTolerance, DensityTolerance);
        Near(witness.Variance, face.Variance, DensityTolerance);
    }

    private static void AgreeAsIntervals(Face face, IContinuousDistribution witness)
    {
        foreach (var p in s_levels)
        {
            var x = face.Quantile(p);
            Near(witness.Density(x), face.Density(x), DensityTolerance);
            Assert.InRange(face.Cdf(x) - witness.CumulativeDistribution(x), -CdfTolerance, CdfTolerance);
        }
        Assert.InRange((face.Mean - witness.Mean) / witness.StdDev, -DensityTolerance, DensityTolerance);
        Near(witness.Variance, face.Variance, DensityTolerance);
    }

    private static void Near(double expected, double actual, double tolerance) =>
        Assert.InRange(actual - expected, -tolerance * Math.Abs(expected), tolerance * Math.Abs(expected));
}
