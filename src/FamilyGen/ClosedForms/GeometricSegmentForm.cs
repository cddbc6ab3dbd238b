using System;
using FamilyGen.Special;

namespace FamilyGen.ClosedForms;

/// <summary>Σ exp(c·n) over n = 0, …, N (setting: N): the geometric law truncated above, uniform at c = 0.</summary>
/// <remarks>Counted from the end where the weight is greater, with M = N + 1 and t = |c|, A = log(1 − e^(−Mt)) −
/// log(1 − e⁻ᵗ), the mean g(t) − M·g(Mt) and the variance v(t) − M²v(Mt) with g(t) = 1/(eᵗ − 1), v = g(1 + g). Below
/// Mt = 1.5 the poles of g and v at 0 are taken off both terms: see <see cref="LogSinhRatio"/>.</remarks>
public sealed class GeometricSegmentForm : IClosedForm
{
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
        if (points * t < LogSinhRatio.Limit)
        {
            logNormalizer = (0.5 * c * last) + Math.Log(points) + LogSinhRatio.Value(points * t) - LogSinhRatio.Value(t);
            fromHeavyEnd = (0.5 * last) - (points * LogSinhRatio.Slope(points * t)) + LogSinhRatio.Slope(t);
            variance = (points * points * LogSinhRatio.Bend(points * t)) - LogSinhRatio.Bend(t);
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
}
