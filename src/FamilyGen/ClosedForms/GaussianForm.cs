using System;

namespace FamilyGen.ClosedForms;

/// <summary>∫ exp(b·y + q·y²) dy over the line, q &lt; 0: the normal law, and with y = log x the log-normal one.</summary>
/// <remarks>With μ = −b/(2q) and σ² = −1/(2q), A = ½bμ + ½ log(2πσ²).</remarks>
public sealed class GaussianForm : IClosedForm
{
    /// <inheritdoc/>
    public static int Count => 2;

    /// <inheritdoc/>
    public static bool TryEvaluate(
        ReadOnlySpan<double> settings, ReadOnlySpan<double> coefficients, out double logNormalizer, Span<double> mean, Span<double> covariance)
    {
        var (slope, curvature) = (coefficients[0], -2 * coefficients[1]);
        logNormalizer = double.NaN;
        if (!(curvature > 0 && double.IsFinite(slope) && double.IsFinite(curvature)))
            return false;
        var (centre, variance) = (slope / curvature, 1 / curvature);
        logNormalizer = (0.5 * slope * centre) + (0.5 * Math.Log(2 * Math.PI * variance));
        if (mean.Length == 0)
            return true;
        mean[0] = centre;
        mean[1] = (centre * centre) + variance;
        covariance[0] = variance;
        covariance[1] = covariance[2] = 2 * centre * variance;
        covariance[3] = ((4 * centre * centre) + (2 * variance)) * variance;
        return true;
    }
}
