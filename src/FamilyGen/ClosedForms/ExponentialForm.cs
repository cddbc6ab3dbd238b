using System;
using FamilyGen.Special;

namespace FamilyGen.ClosedForms;

/// <summary>∫ exp(c·y) dy over an interval or half-line (settings: its ends): the exponential law, also truncated at one end
/// or both, the uniform law, and with y = log x the power laws.</summary>
/// <remarks>With D the distance from the end where the density is greater and w the width, the density of D/w is that of
/// e^(−tD/w), t = |c|w: E D/w = 1/t − 1/(eᵗ − 1), Var D/w = 1/t² − eᵗ/(eᵗ − 1)², below t = 1.5
/// by <see cref="LogSinhRatio"/>.</remarks>
public sealed class ExponentialForm : IClosedForm
{
    /// <inheritdoc/>
    public static int Count => 1;

    /// <inheritdoc/>
    public static bool TryEvaluate(
        ReadOnlySpan<double> settings, ReadOnlySpan<double> coefficients, out double logNormalizer, Span<double> mean, Span<double> covariance)
    {
        var (lower, upper, c) = (settings[0], settings[1], coefficients[0]);
        var width = upper - lower;
        logNormalizer = double.NaN;
        if (!(width > 0) || !double.IsFinite(c))
            return false;
        var (end, side) = c > 0 ? (upper, -1) : (lower, 1);
        var steepness = Math.Abs(c);
        if (!double.IsFinite(end) || (c == 0 && !double.IsFinite(width)))
            return false;
        if (double.IsInfinity(width))
        {
            logNormalizer = (c * end) - Math.Log(steepness);
            if (mean.Length > 0)
            {
                mean[0] = end + (side / steepness);
                covariance[0] = 1 / steepness / steepness;
            }

            return true;
        }

        var t = steepness * width;
        logNormalizer = t < LogSinhRatio.Limit
            ? (c * 0.5 * (lower + upper)) + Math.Log(width) + LogSinhRatio.Value(t)
            : (c * end) + Math.Log(-Elementary.ExpM1(-t) / steepness);
        if (mean.Length == 0)
            return true;
        if (t < LogSinhRatio.Limit)
        {
            mean[0] = (0.5 * (lower + upper)) - (side * width * LogSinhRatio.Slope(t));
            covariance[0] = width * width * LogSinhRatio.Bend(t);
            return true;
        }

        var rest = t < 700 ? 1 / Elementary.ExpM1(t) : 0;
        mean[0] = end + (side * width * ((1 / t) - rest));
        covariance[0] = width * width * ((1 / (t * t)) - (rest * (1 + rest)));
        return true;
    }
}
