using System;
using FamilyGen.Kernels;

namespace FamilyGen.ClosedForms;

/// <summary>From an entry's coefficients to natural parameters: the exponent is Σ cᵢaᵢ + c₀ with every c affine in θ, so that
/// E Tⱼ = Σ Mᵢⱼ E aᵢ + M₀ⱼ and Cov T = Mᵀ Cov a M, with bounds on what rounding does to them.</summary>
/// <remarks>Rows are laid out one after another, first that of c₀: the weights of the natural parameters and a constant.</remarks>
internal static class ChainRule
{
    private const double Unit = 2.220446049250313e-16;

    /// <summary>Whether an entry needs no moments for its logarithm to be judged: c₀ is a constant.</summary>
    public static bool IsPlain(ReadOnlySpan<double> rows, int parameters) => rows[..parameters].IndexOfAnyExcept(0.0) < 0;

    /// <summary>The logarithm alone.</summary>
    public static bool TryLog<TForm>(
        ReadOnlySpan<double> theta, ReadOnlySpan<double> settings, ReadOnlySpan<double> rows, out double log)
        where TForm : IClosedForm
    {
        Span<double> c = stackalloc double[TForm.Count];
        for (var i = 0; i < c.Length; i++)
            c[i] = Value(rows, i + 1, theta, out _);
        var found = TForm.TryEvaluate(settings, c, out log, [], []);
        log += Value(rows, 0, theta, out _);
        return found && double.IsFinite(log);
    }

    /// <summary>Logarithm, mean and covariance in terms of the family's statistics.</summary>
    public static bool TryMoments<TForm>(
        ReadOnlySpan<double> theta, ReadOnlySpan<double> settings, ReadOnlySpan<double> rows, ref MomentPart part)
        where TForm : IClosedForm
    {
        var count = TForm.Count;
        Span<double> c = stackalloc double[count];
        Span<double> mean = stackalloc double[count];
        Span<double> covariance = stackalloc double[count * count];
        for (var i = 0; i < count; i++)
            c[i] = Value(rows, i + 1, theta, out _);
        if (!TForm.TryEvaluate(settings, c, out var log, mean, covariance))
            return false;
        var offset = Value(rows, 0, theta, out var size);
        part.Log = offset + log;
        part.LogError = Unit * (size + (4 * Math.Abs(log)));
        for (var i = 0; i < count; i++)
            part.LogError += Unit * Math.Abs(c[i] * mean[i]);
        Map<TForm>(rows, theta.Length, mean, covariance, part);
        return true;
    }

    /// <summary>A point: its logarithm, its statistics and no spread.</summary>
    public static void Point(ReadOnlySpan<double> theta, ReadOnlySpan<double> row, ref MomentPart part)
    {
        part.Log = Value(row, 0, theta, out var size);
        part.LogError = 2 * Unit * size;
        row[..theta.Length].CopyTo(part.Mean);
        part.MeanError.Clear();
        part.Covariance.Clear();
        part.CovarianceError.Clear();
    }

    private static void Map<TForm>(
        ReadOnlySpan<double> rows, int parameters, ReadOnlySpan<double> mean, ReadOnlySpan<double> covariance, in MomentPart part)
        where TForm : IClosedForm
    {
        var (count, stride) = (mean.Length, parameters + 1);
        for (var j = 0; j < parameters; j++)
        {
            var (sum, size) = (rows[j], Math.Abs(rows[j]));
            for (var a = 0; a < count; a++)
            {
                var term = rows[((a + 1) * stride) + j] * mean[a];
                sum += term;
                size += 3 * Math.Abs(term);
            }

            part.Mean[j] = sum;
            part.MeanError[j] = Unit * size;
            for (var i = 0; i <= j; i++)
            {
                double product = 0, weight = 0;
                for (var a = 0; a < count; a++)
                {
                    for (var b = 0; b < count; b++)
                    {
                        var factor = rows[((a + 1) * stride) + i] * rows[((b + 1) * stride) + j];
                        if (factor == 0)
                            continue;
                        product += factor * covariance[(a * count) + b];
                        weight += Math.Abs(factor) * Math.Sqrt(covariance[a * (count + 1)]) * Math.Sqrt(covariance[b * (count + 1)]);
                    }
                }

                part.Covariance[(i * parameters) + j] = part.Covariance[(j * parameters) + i] = product;
                part.CovarianceError[(i * parameters) + j] = part.CovarianceError[(j * parameters) + i] = TForm.RelativeError * weight;
            }
        }
    }

    /// <summary>Σ weightⱼθⱼ + constant, rounded once, and the sum of the sizes of its terms.</summary>
    private static double Value(ReadOnlySpan<double> rows, int row, ReadOnlySpan<double> theta, out double size)
    {
        var stride = theta.Length + 1;
        var constant = rows[(row * stride) + theta.Length];
        TwoSum sum = constant;
        size = Math.Abs(constant);
        for (var j = 0; j < theta.Length; j++)
        {
            var weight = rows[(row * stride) + j];
            if (weight == 0)
                continue;
            sum += (TwoSum)weight * theta[j];
            size += Math.Abs(weight * theta[j]);
        }

        return sum.High + sum.Low;
    }
}
