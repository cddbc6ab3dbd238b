using System;
using FamilyGen.Special;

namespace FamilyGen.ClosedForms;

/// <summary>Σ exp(c·log(n + q)) over n = 0, 1, …, c &lt; −1 (setting: q &gt; 0): the zeta law for q = 1, from the smallest count
/// q on for a whole q; A = log ζ(−c, q).</summary>
public sealed class ZetaForm : IClosedForm
{
    /// <inheritdoc/>
    public static int Count => 1;

    /// <inheritdoc/>
    public static double RelativeError => 2e-13;

    /// <inheritdoc/>
    public static bool TryEvaluate(
        ReadOnlySpan<double> settings, ReadOnlySpan<double> coefficients, out double logNormalizer, Span<double> mean, Span<double> covariance)
    {
        var (q, c) = (settings[0], coefficients[0]);
        logNormalizer = double.NaN;
        if (!HurwitzZeta.TryEvaluate(-c, q, out var logRatio, out var relativeMean, out var variance))
            return false;
        var logFirst = Math.Log(q);
        logNormalizer = (c * logFirst) + logRatio;
        if (mean.Length > 0)
        {
            mean[0] = logFirst + relativeMean;
            covariance[0] = variance;
        }

        return true;
    }
}
