using System;
using FamilyGen.Special;

namespace FamilyGen.ClosedForms;

/// <summary>Σ exp(c·n) over n = 0, …, N (setting: N): the geometric law truncated above, uniform at c = 0.</summary>
/// <remarks>Counted from the end where the weight is greater, with M = N + 1 and t = |c|, A = log(1 − e^(−Mt)) −
/// log(1 − e⁻ᵗ), the mean g(t) − M·g(Mt) and the variance v(t) − M²v(Mt) with g(t) = 1/(eᵗ − 1), v = g(1 + g). Below
/// Mt = 1 the poles of g and v at 0 are taken off both terms by their series in Bernoulli numbers.</remarks>
public sealed class GeometricSegmentForm : IClosedForm
{
    private const double SeriesBelow = 1;

    // B₂ₖ/(2k)! for k = 1, 2, …
    private static ReadOnlySpan<double> Bernoulli =>
    [
        1.0 / 12, -1.0 / 720, 1.0 / 30240, -1.0 / 1209600, 1.0 / 47900160,
        -5.284190138687493e-10, 1.3382536530684679e-11, -3.3896802963225827e-13, 8.586062056277845e-15, -2.174868698558062e-16,
    ];

    /// <inheritdoc/>
    public static int Count => 1;

    /// <inheritdoc/>
    public static bool TryEvaluate(
        ReadOnlySpan<double> settings, ReadOnlySpan<double> coefficients, out double logNormalizer, Span<double> mean, Span<double> covariance)
    {
        var (last, c) = (settings[0], coefficients[0]);
        logNormalizer = double.NaN;
        if (!(last >= 0 && last < 9e15) || !double.IsFinite(c))
            return false;
        var (points, t) = (last + 1, Math.Abs(c));
        double fromHeavyEnd, variance;
        if (points * t < SeriesBelow)
        {
            var (square, wide) = (t * t, points * t * points * t);
            logNormalizer = (0.5 * c * last) + Math.Log(points) + LogSinhRatio(wide) - LogSinhRatio(square);
            fromHeavyEnd = (0.5 * last) - (((points * points * Sum(wide)) - Sum(square)) * t);
            variance = (points * points * SlopeSum(wide)) - SlopeSum(square);
        }
        else
        {
            var (near, far) = (1 / Elementary.ExpM1(t), points * t < 700 ? 1 / Elementary.ExpM1(points * t) : 0);
            logNormalizer = (c > 0 ? c * last : 0)
                + NegativeBinomialForm.LogOneMinusExp(-points * t) - NegativeBinomialForm.LogOneMinusExp(-t);
            fromHeavyEnd = near - (points * far);
            variance = (near * (1 + near)) - (points * far * points * (1 + far));
        }

        if (mean.Length > 0)
        {
            mean[0] = c > 0 ? last - fromHeavyEnd : fromHeavyEnd;
            covariance[0] = variance;
        }

        return true;
    }

    // log(sinh(t/2)/(t/2)) = Σ t²ᵏB₂ₖ/(2k(2k)!), in t²
    private static double LogSinhRatio(double square)
    {
        var sum = 0.0;
        for (var k = Bernoulli.Length; k > 0; k--)
            sum = (sum * square) + (Bernoulli[k - 1] / (2 * k));
        return sum * square;
    }

    // 1/(eᵗ − 1) = 1/t − ½ + t·Σ t²ᵏ⁻²B₂ₖ/(2k)!, the last sum in t²
    private static double Sum(double square) => Polynomial.Horner(Bernoulli, square);

    // its derivative with the pole −1/t² taken off
    private static double SlopeSum(double square)
    {
        var sum = 0.0;
        for (var k = Bernoulli.Length; k > 0; k--)
            sum = (sum * square) + (Bernoulli[k - 1] * ((2 * k) - 1));
        return sum;
    }
}
