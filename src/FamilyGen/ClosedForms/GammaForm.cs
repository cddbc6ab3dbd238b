using System;
using FamilyGen.Special;

namespace FamilyGen.ClosedForms;

/// <summary>∫ exp(p·y + q·e^(ky)) dy over the line, q &lt; 0, p/k &gt; 0: with y = log x the law with statistics log x and
/// xᵏ on (0, ∞). Gamma (k = 1), inverse gamma (k = −1), half-normal and Maxwell (k = 2), Weibull of known shape k; with
/// y = x itself Gumbel's law.</summary>
/// <remarks>With a = p/k and b = −q, A = log Γ(a) − a log b − log |k|. From a = 10 on log Γ is replaced by Stirling's
/// series with a log(a/b) in one term, so that what is left when f(m) is taken off stays exact for any shape.</remarks>
public sealed class GammaForm : IClosedForm
{
    private const double LargeShape = 10;

    /// <inheritdoc/>
    public static int Count => 2;

    /// <inheritdoc/>
    public static bool TryEvaluate(
        ReadOnlySpan<double> settings, ReadOnlySpan<double> coefficients, out double logNormalizer, Span<double> mean, Span<double> covariance)
    {
        var k = settings[0];
        var (shape, rate) = (coefficients[0] / k, -coefficients[1]);
        logNormalizer = double.NaN;
        if (!(shape > 0 && rate > 0 && double.IsFinite(shape) && double.IsFinite(rate)))
            return false;
        var logRatio = LogRatio(shape, rate);
        logNormalizer = shape < LargeShape
            ? LogGamma.Value(shape) - (shape * Math.Log(rate)) - Math.Log(Math.Abs(k))
            : (shape * (logRatio - 1)) + (0.5 * Math.Log(2 * Math.PI / shape)) + LogGamma.StirlingTail(shape) - Math.Log(Math.Abs(k));
        if (mean.Length == 0)
            return true;
        mean[0] = (shape < LargeShape ? Digamma.Value(shape) - Math.Log(rate) : logRatio - Digamma.LogMinus(shape)) / k;
        mean[1] = shape / rate;
        covariance[0] = Trigamma.Value(shape) / k / k;
        covariance[1] = covariance[2] = 1 / (rate * k);
        covariance[3] = shape / rate / rate;
        return true;
    }

    // log(a/b), relatively exact near a = b
    private static double LogRatio(double a, double b) =>
        a < 2 * b && b < 2 * a ? Elementary.Log1P((a - b) / b) : Math.Log(a / b);
}
