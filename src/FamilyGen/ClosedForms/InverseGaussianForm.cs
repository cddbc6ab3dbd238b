using System;

namespace FamilyGen.ClosedForms;

/// <summary>∫ exp(−½ky + q·e^(ky) + r·e^(−ky)) dy over the line, q ≤ 0, r &lt; 0: with y = log x and k = 1 the inverse
/// Gaussian law, with k = −1 that of its reciprocal.</summary>
/// <remarks>A = ½ log(π/|r|) − 2√(qr) − log |k| (Schrödinger 1915; Tweedie 1957). At q = 0 it is Lévy's law; only A is given there.</remarks>
public sealed class InverseGaussianForm : IClosedForm
{
    /// <inheritdoc/>
    public static int Count => 2;

    /// <inheritdoc/>
    public static bool TryEvaluate(
        ReadOnlySpan<double> settings, ReadOnlySpan<double> coefficients, out double logNormalizer, Span<double> mean, Span<double> covariance)
    {
        var (up, down) = (-coefficients[0], -coefficients[1]);
        logNormalizer = double.NaN;
        if (!(up >= 0 && down > 0 && double.IsFinite(up + down)) || (up == 0 && mean.Length > 0))
            return false;
        var (rootUp, rootDown) = (Math.Sqrt(up), Math.Sqrt(down));
        logNormalizer = (0.5 * Math.Log(Math.PI / down)) - (2 * rootUp * rootDown) - Math.Log(Math.Abs(settings[0]));
        if (mean.Length == 0)
            return true;
        mean[0] = rootDown / rootUp;
        mean[1] = (0.5 / down) + (rootUp / rootDown);
        covariance[0] = 0.5 * mean[0] / up;
        covariance[1] = covariance[2] = -0.5 / rootUp / rootDown;
        covariance[3] = ((0.5 / down) + (0.5 * rootUp / rootDown)) / down;
        return true;
    }
}
