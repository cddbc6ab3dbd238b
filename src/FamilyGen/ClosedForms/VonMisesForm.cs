using System;
using FamilyGen.Special;

namespace FamilyGen.ClosedForms;

/// <summary>∫ exp(c·cos ωx + s·sin ωx) dx over a circle that is a whole number of periods 2π/ω (setting: its length): von
/// Mises' law.</summary>
/// <remarks>With κ = √(c² + s²), A = log length + log I₀(κ); along the mean direction the derivatives are R = I₁/I₀ and R′,
/// across it R/κ (Mardia and Jupp 2000).</remarks>
public sealed class VonMisesForm : IClosedForm
{
    /// <inheritdoc/>
    public static int Count => 2;

    /// <inheritdoc/>
    public static double RelativeError => 1e-12;

    /// <inheritdoc/>
    public static bool TryEvaluate(
        ReadOnlySpan<double> settings, ReadOnlySpan<double> coefficients, out double logNormalizer, Span<double> mean, Span<double> covariance)
    {
        var (c, s) = (coefficients[0], coefficients[1]);
        var size = Math.Max(Math.Abs(c), Math.Abs(s));
        logNormalizer = double.NaN;
        if (!(settings[0] > 0) || !double.IsFinite(c) || !double.IsFinite(s))
            return false;
        var kappa = size == 0 ? 0 : size * Math.Sqrt((c / size * (c / size)) + (s / size * (s / size)));
        logNormalizer = kappa + (Math.Log(settings[0]) + BesselIRatio.LogScaledI0(kappa));
        if (mean.Length == 0)
            return true;
        var (cos, sin) = kappa == 0 ? (1, 0) : (c / kappa, s / kappa);
        var ratio = BesselIRatio.Value(kappa);
        var (along, across) = (BesselIRatio.Slope(kappa), kappa < 1e-8 ? 0.5 : ratio / kappa);
        (mean[0], mean[1]) = (cos * ratio, sin * ratio);
        covariance[0] = (cos * cos * along) + (sin * sin * across);
        covariance[1] = covariance[2] = cos * sin * (along - across);
        covariance[3] = (sin * sin * along) + (cos * cos * across);
        return true;
    }
}
