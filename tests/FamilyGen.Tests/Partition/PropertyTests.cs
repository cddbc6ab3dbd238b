using System;
using System.Collections.Generic;
using System.Linq;
using CsCheck;
using FamilyGen.Partition;

namespace FamilyGen.Tests.Partition;

/// <summary>Drawn parameters against sums that use nothing of the engine, and the relations that hold at any parameter.</summary>
public class PropertyTests
{
    // −a(x − p)²(x − q)² + tilt·x: one mode or two, narrow or wide, level or not
    private static readonly Gen<double[]> s_wells =
        Gen.Select(Gen.Double[-2, 5], Gen.Double[-3, 3], Gen.Double[-3, 3], Gen.Double[-2, 2]).Select((a, p, q, tilt) =>
        {
            var scale = Math.Pow(10, a);
            return new[]
            {
                scale * 2 * p * q * (p + q) + tilt,
                -scale * (p * p + q * q + 4 * p * q),
                scale * 2 * (p + q),
                -scale,
            };
        });

    [Fact]
    public void Wells_agree_with_the_trapezoid_rule() => s_wells.Sample(
        theta =>
        {
            var law = new Distribution<AtomKernel<Quartic>>(default, theta);
            var (sum, mean, square) = Trapezoid(x => ((theta[3] * x + theta[2]) * x + theta[1]) * x * x + theta[0] * x, -12, 12);
            return Close(sum, law.LogNormalizer, 1e-11 * (1 + theta.Max(Math.Abs)))
                && Close(mean, law.Mean, 1e-10 * (1 + theta.Max(Math.Abs)))
                && Close(square - mean * mean, law.Variance, 1e-9 * (1 + theta.Max(Math.Abs)));
        },
        iter: 60);

    [Fact]
    public void Counts_agree_with_plain_sums() => Gen.Select(Gen.Double[-3, 3], Gen.Double[-3, 0.5]).Sample(
        (first, second) =>
        {
            double[] theta = [first, Math.Pow(10, second)];
            if (first / theta[1] > 11)
                return true;                       // more terms than a plain sum should have
            var law = new Distribution<AtomKernel<DispersedCount>>(default, theta);
            var terms = new List<double>();
            for (var x = 0; x < 400_000; x++)
            {
                terms.Add(theta[0] * x - theta[1] * Special.LogGamma.Value(x + 1));
                if (x > 20 && terms[^1] < terms.Max() - 60)
                    break;
                if (x > 2000)
                    return true;
            }

            var top = terms.Max();
            var sum = terms.Sum(term => Math.Exp(term - top));
            var mean = terms.Select((term, x) => x * Math.Exp(term - top)).Sum() / sum;
            return Close(top + Math.Log(sum), law.LogNormalizer, 1e-12 * (1 + Math.Abs(top)))
                && Close(mean, law.Mean, 1e-11 * (1 + mean))
                && Close(terms.Take(4).Sum(term => Math.Exp(term - top)) / sum, law.Cdf(3), 1e-11);
        },
        iter: 150);

    [Fact]
    public void The_gradient_is_that_of_the_normalizer() =>
        Gen.Select(Gen.Double[-0.9, 30], Gen.Double[-3, 1], Gen.Double[-3, 1]).Sample(
            (shape, rate, delay) =>
            {
                double[] theta = [shape, -Math.Pow(10, rate), -Math.Pow(10, delay)];
                var law = new Distribution<AtomKernel<Duration>>(default, theta);
                var mean = law.MeanStatistics();
                var covariance = law.StatisticCovariance();
                for (var j = 0; j < 3; j++)
                {
                    var step = 1e-4 * Math.Min(1, Math.Abs(theta[j]) + 1e-9);
                    var (up, down) = (At(theta, j, step), At(theta, j, -step));
                    var slope = (up.LogNormalizer - down.LogNormalizer) / (2 * step);
                    if (!Close(slope, mean[j], 1e-6 * Math.Sqrt(covariance[j, j]) + 1e-6 * Math.Abs(mean[j]) + 1e-11 / step))
                        return false;
                }

                var determinant = (covariance[0, 0] * covariance[1, 1]) - (covariance[0, 1] * covariance[1, 0]);
                return covariance[0, 0] > 0 && covariance[1, 1] > 0 && covariance[2, 2] > 0 && determinant > 0;
            },
            iter: 100);

    [Fact]
    public void A_whole_is_the_sum_of_its_parts() =>
        Gen.Select(s_wells, Gen.Double[-4, 4], Gen.Double[-4, 4]).Sample(
            (theta, a, b) =>
            {
                var law = new Distribution<AtomKernel<Quartic>>(default, theta);
                var (low, high) = (Math.Min(a, b), Math.Max(a, b));
                double[] logs =
                [
                    law.LogProbability(SubRange.UpTo(low)),
                    law.LogProbability(new SubRange(low, high, false, true)),
                    law.LogProbability(SubRange.Above(high)),
                ];
                var tolerance = 1e-11 * (1 + theta.Max(Math.Abs));
                return Close(1, logs.Sum(Math.Exp), tolerance)
                    && Close(law.Cdf(low), Math.Exp(logs[0]), tolerance)
                    && Close(law.Survival(high), Math.Exp(logs[2]), tolerance)
                    && law.Cdf(low) <= law.Cdf(high) + 1e-15;
            },
            iter: 60);

    [Fact]
    public void Quantiles_and_distribution_functions_are_inverse() =>
        Gen.Select(Gen.Double[-0.99, 40], Gen.Double[-3, 3], Gen.Double[-12, -0.01]).Sample(
            (shape, rate, logProbability) =>
            {
                var law = new Distribution<AtomKernel<Gamma>>(default, [shape, -Math.Pow(10, rate)]);
                var p = Math.Pow(10, logProbability);
                var (x, y) = (law.Quantile(p), law.SurvivalQuantile(p));
                return (x == 0 || Close(p, law.Cdf(x), 1e-9 * p)) && Close(p, law.Survival(y), 1e-9 * p);
            },
            iter: 100);

    private static Distribution<AtomKernel<Duration>> At(double[] theta, int index, double step)
    {
        var moved = (double[])theta.Clone();
        moved[index] += step;
        return new(default, moved);
    }

    private static (double Log, double Mean, double Square) Trapezoid(Func<double, double> exponent, double from, double to)
    {
        const int Steps = 400_000;
        var values = new double[Steps + 1];
        for (var i = 0; i <= Steps; i++)
            values[i] = exponent(from + (to - from) * i / Steps);
        var top = values.Max();
        double sum = 0, first = 0, second = 0;
        for (var i = 0; i <= Steps; i++)
        {
            var x = from + (to - from) * i / Steps;
            var weight = Math.Exp(values[i] - top);
            (sum, first, second) = (sum + weight, first + weight * x, second + weight * x * x);
        }

        return (top + Math.Log(sum * (to - from) / Steps), first / sum, second / sum);
    }

    private static bool Close(double expected, double actual, double tolerance) => Math.Abs(expected - actual) <= tolerance;
}
