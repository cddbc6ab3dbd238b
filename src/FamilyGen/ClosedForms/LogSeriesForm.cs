using System;
using FamilyGen.Special;

namespace FamilyGen.ClosedForms;

/// <summary>Σ exp(c·n)/n over n = 1, 2, …, c &lt; 0: the logarithmic series law (Fisher 1943) with p = eᶜ; A = log(−log(1 − p)).</summary>
public sealed class LogSeriesForm : IClosedForm
{
    /// <inheritdoc/>
    public static int Count => 1;

    /// <inheritdoc/>
    public static bool TryEvaluate(
        ReadOnlySpan<double> settings, ReadOnlySpan<double> coefficients, out double logNormalizer, Span<double> mean, Span<double> covariance)
    {
        var c = coefficients[0];
        logNormalizer = double.NaN;
        if (!(c < 0 && double.IsFinite(c)))
            return false;
        var p = Math.Exp(c);
        var rest = -Elementary.ExpM1(c);
        var total = -NegativeBinomialForm.LogOneMinusExp(c);

        // −log(1 − p) − p, and its size beside p
        var excess = p < 0.5 ? -Elementary.Log1PMinus(-p) : total - p;
        var ratio = p < 1e-15 ? 0.5 * p : excess / p;
        logNormalizer = c + Elementary.Log1P(ratio);
        if (mean.Length > 0)
        {
            mean[0] = 1 / ((1 + ratio) * rest);
            covariance[0] = mean[0] * mean[0] * ratio;
        }

        return true;
    }
}
