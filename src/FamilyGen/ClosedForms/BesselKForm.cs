using System;
using FamilyGen.Special;

namespace FamilyGen.ClosedForms;

/// <summary>∫ exp(p·y + q·e^(ky) + r·e^(−ky)) dy over the line, q, r &lt; 0, k &gt; 0: with y = log x the law with statistics
/// log x, xᵏ and x⁻ᵏ on (0, ∞), the generalised inverse Gaussian for k = 1.</summary>
/// <remarks>About the mode, where the two exponentials are worth −P and −N with P − N = p/k and PN = qr,
/// A = (p/k)·t − P − N + log ∫ exp(−Pφ − Nφ) − log k with e^t = P/|q|: see <see cref="BesselKMoments"/>. On the faces
/// q = 0 (p &lt; 0) and r = 0 (p &gt; 0) the law is a gamma law of 1/x or x; only A is given there.</remarks>
public sealed class BesselKForm : IClosedForm
{
    /// <inheritdoc/>
    public static int Count => 3;

    /// <inheritdoc/>
    public static double RelativeError => 2e-14;

    /// <inheritdoc/>
    public static bool TryEvaluate(
        ReadOnlySpan<double> settings, ReadOnlySpan<double> coefficients, out double logNormalizer, Span<double> mean, Span<double> covariance)
    {
        var k = settings[0];
        var (order, up, down) = (coefficients[0] / k, -coefficients[1], -coefficients[2]);
        logNormalizer = double.NaN;
        if (!(k > 0 && up >= 0 && down >= 0 && double.IsFinite(order + up + down)))
            return false;
        if (up == 0 || down == 0)
        {
            return mean.Length == 0 && (up == 0
                ? GammaForm.TryEvaluate([-k], [coefficients[0], coefficients[2]], out logNormalizer, mean, covariance)
                : GammaForm.TryEvaluate([k], [coefficients[0], coefficients[1]], out logNormalizer, mean, covariance));
        }

        // the larger of P and N without cancellation, the other from the product
        var root = 2 * Math.Sqrt(up) * Math.Sqrt(down);
        var larger = 0.5 * (Math.Abs(order) + Hypotenuse(order, root));
        var smaller = 0.25 * root * (root / larger);
        var (rise, fall) = order >= 0 ? (larger, smaller) : (smaller, larger);
        var (logMode, atMode) = (Math.Log(rise / up), rise / up);
        if (order < 0)
            (logMode, atMode) = (-Math.Log(fall / down), down / fall);
        if (!double.IsFinite(logMode) || !BesselKMoments.TryEvaluate(rise, fall, out var logIntegral, mean, covariance))
            return false;
        logNormalizer = (order * logMode) - rise - fall + logIntegral - Math.Log(k);
        if (mean.Length == 0)
            return true;

        Span<double> scale = [1 / k, atMode, 1 / atMode];
        mean[0] = (logMode + mean[0]) / k;
        mean[1] = atMode * (1 + mean[1]);
        mean[2] = (1 + mean[2]) / atMode;
        for (var i = 0; i < 3; i++)
        {
            for (var j = 0; j < 3; j++)
                covariance[(3 * i) + j] *= scale[i] * scale[j];
        }

        return true;
    }

    private static double Hypotenuse(double a, double b)
    {
        var (large, small) = (Math.Max(Math.Abs(a), Math.Abs(b)), Math.Min(Math.Abs(a), Math.Abs(b)));
        return large * Math.Sqrt(1 + (small / large * (small / large)));
    }
}
