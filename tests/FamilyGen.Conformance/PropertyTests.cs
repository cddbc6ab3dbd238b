using System;
using System.Collections.Generic;
using System.Linq;
using CsCheck;
using FamilyGen.Conformance.Families;
using FamilyGen.Conformance.Subjects;

namespace FamilyGen.Conformance;

/// <summary>What must hold at any parameters and on any data, at random ones (the same at each run).</summary>
public class PropertyTests
{
    // Hours from a quarter to twenty, most of them short, as a delay leaves them. (On arbitrary hours the best delay may be as
    // small as 1e-200 hours, which no double can resolve.)
    private static readonly Gen<double[]> s_hours = Gen.Double[-1.4, 3].Select(Math.Exp).Array[10, 200];

    public static TheoryData<string> Families() =>
        ["dispersed_count", "dispersed_count_from_1", "duration_log_lin_inv", "bounded_log_log_lin", "quartic", "von_mises"];

    private static Gen<double[]> Parameters(string family) => family switch
    {
        "dispersed_count" or "dispersed_count_from_1" => Gen.Select(Gen.Double[-3, 4], Gen.Double[0.2, 5], (a, b) => new[] { a, b }),
        "duration_log_lin_inv" => Gen.Select(
            Gen.Double[-5, 20], Gen.Double[-3, 3], Gen.Double[-3, 3], (a, b, c) => new[] { a, -Math.Pow(10, b), -Math.Pow(10, c) }),
        "bounded_log_log_lin" => Gen.Select(
            Gen.Double[-0.9, 30], Gen.Double[-0.9, 30], Gen.Double[-40, 40], (a, b, c) => new[] { a, b, c }),
        "quartic" => Gen.Select(
            Gen.Double[-3, 3], Gen.Double[-8, 8], Gen.Double[-2, 2], Gen.Double[0.1, 3], (a, b, c, d) => new[] { a, b, c, -d }),
        _ => Gen.Select(Gen.Double[-300, 300], Gen.Double[-300, 300], (a, b) => new[] { a, b }),
    };

    [Theory]
    [MemberData(nameof(Families))]
    public void The_gradient_is_the_difference_quotient_of_A(string family)
    {
        var subject = Subject.All[family];
        foreach (var theta in Drawn(Parameters(family), 60))
        {
            var law = subject.At(theta);
            for (var j = 0; j < theta.Length; j++)
            {
                // within a hundredth of the scale on which A bends, and of the distance to the face; by Richardson's extrapolation
                var sigma = Math.Sqrt(law.Covariance[j, j]);
                var step = theta[j] == 0 ? 1e-2 / sigma : Math.Min(1e-2 / sigma, 1e-2 * Math.Abs(theta[j]));
                var (wide, narrow) = (Quotient(subject, theta, j, 2 * step), Quotient(subject, theta, j, step));
                var slope = narrow + (narrow - wide) / 3;
                var rounding = 1e-14 * (1 + Math.Abs(law.LogNormalizer) + theta.Zip(law.Mean, (t, m) => Math.Abs(t * m)).Max()) / step;
                Assert.True(Math.Abs(law.Mean[j] - slope) <= rounding + 1e-5 * sigma, $"gradient [{j}] at {Text(theta)}: {law.Mean[j]:r}, by differences {slope:r}");
            }
        }
    }

    [Theory]
    [MemberData(nameof(Families))]
    public void The_Hessian_is_symmetric_and_positive_definite(string family)
    {
        var subject = Subject.All[family];
        foreach (var theta in Drawn(Parameters(family), 60))
        {
            var h = subject.At(theta).Covariance;
            var k = theta.Length;
            var correlation = new double[k, k];
            for (var i = 0; i < k; i++)
            {
                for (var j = 0; j < k; j++)
                {
                    Assert.Equal(h[j, i], h[i, j]);
                    correlation[i, j] = h[i, j] / Math.Sqrt(h[i, i] * h[j, j]);
                }
            }
            var smallest = MathNet.Numerics.LinearAlgebra.Double.DenseMatrix.OfArray(correlation).Evd().EigenValues.Min(e => e.Real);
            Assert.True(smallest > -1e-11, $"smallest eigenvalue of the correlations {smallest} at {Text(theta)}");
        }
    }

    [Fact]
    public void Merged_shards_give_the_fit_of_the_whole_bit_for_bit()
    {
        foreach (var (data, shards) in Drawn(Gen.Select(s_hours, Gen.Int[1, 9], (data, shards) => (data, shards)), 40))
        {
            var parts = Enumerable.Range(0, shards).Select(_ => new RepairHours.Accumulator()).ToArray();
            for (var i = data.Length - 1; i >= 0; i--)
                parts[i % shards].Add(data[i]);
            var merged = new RepairHours.Accumulator();
            foreach (var part in parts)
                merged.Merge(part);
            AssertSameBits(RepairHours.Fit(data), merged.Fit());
        }
    }

    [Fact]
    public void A_weight_counts_an_observation_as_often_as_it_says()
    {
        foreach (var rows in Drawn(Gen.Select(Gen.Int[0, 12], Gen.Int[1, 30]).Array[3, 12], 40).Where(rows => rows.Any(r => r.Item1 > 0)))
        {
            var (weighted, repeated) = (new Poisson.Accumulator(), new Poisson.Accumulator());
            foreach (var (count, times) in rows)
            {
                weighted.Add(count, times);
                for (var i = 0; i < times; i++)
                    repeated.Add(count);
            }
            AssertSameBits(repeated.Fit(), weighted.Fit());
        }
    }

    [Fact]
    public void A_fit_inside_the_set_reproduces_the_means_of_the_statistics()
    {
        var inside = 0;
        foreach (var data in Drawn(s_hours, 40))
        {
            var fit = DelayedDuration.Fit(data);
            if (fit.Status != FitStatus.InteriorMaximum)
                continue;
            inside++;
            var law = fit.Estimate;
            double[] means = [data.Average(Math.Log), data.Average(), data.Average(x => 1 / x)];
            for (var j = 0; j < 3; j++)
            {
                var sigma = Math.Sqrt(law.StatisticCovariance[j, j]);
                Assert.True(Math.Abs(law.MeanStatistics[j] - means[j]) <= 1e-9 * sigma, $"mean [{j}] {law.MeanStatistics[j]:r} against {means[j]:r}");
            }
        }
        Assert.True(inside >= 5, $"only {inside} data sets with a maximum inside the set");
    }

    private static void AssertSameBits<TFamily>(FitResult<TFamily> expected, FitResult<TFamily> actual)
    {
        Assert.Equal(expected.Natural.Select(BitConverter.DoubleToInt64Bits), actual.Natural.Select(BitConverter.DoubleToInt64Bits));
        Assert.Equal(BitConverter.DoubleToInt64Bits(expected.LogLikelihood), BitConverter.DoubleToInt64Bits(actual.LogLikelihood));
    }

    private static double Quotient(Subject subject, double[] theta, int j, double step)
    {
        double[] upper = [.. theta], lower = [.. theta];
        (upper[j], lower[j]) = (theta[j] + step, theta[j] - step);
        return (subject.At(upper).LogNormalizer - subject.At(lower).LogNormalizer) / (upper[j] - lower[j]);
    }

    /// <summary>Values of a generator from a fixed seed, so that a run can be repeated.</summary>
    private static IEnumerable<T> Drawn<T>(Gen<T> generator, int count)
    {
        var bits = new PCG(1, 20240607);
        for (var i = 0; i < count; i++)
            yield return generator.Generate(bits, null, out _);
    }

    private static string Text(double[] theta) => string.Join(", ", theta.Select(t => t.ToString("R", System.Globalization.CultureInfo.InvariantCulture)));
}
