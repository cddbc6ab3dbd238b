using System;
using FamilyGen.Special;

namespace FamilyGen.ClosedForms;

/// <summary>Σ exp(c·n)·Γ(n + r)/(Γ(r)n!) over n = 0, 1, …, c &lt; 0 (setting: the real size r &gt; 0): the negative binomial
/// law with failure probability eᶜ, the geometric one for r = 1; A = −r log(1 − eᶜ).</summary>
public sealed class NegativeBinomialForm : IClosedForm
{
    /// <inheritdoc/>
    public static int Count => 1;

    /// <inheritdoc/>
    public static bool TryEvaluate(
        ReadOnlySpan<double> settings, ReadOnlySpan<double> coefficients, out double logNormalizer, Span<double> mean, Span<double> covariance)
    {
        var (size, c) = (settings[0], coefficients[0]);
        logNormalizer = double.NaN;
        if (!(size > 0 && c < 0 && double.IsFinite(size) && double.IsFinite(c)))
            return false;
        logNormalizer = -size * LogOneMinusExp(c);
        if (mean.Length > 0)
        {
            var odds = 1 / Elementary.ExpM1(-c);
            mean[0] = size * odds;
            covariance[0] = mean[0] * (1 + odds);
        }

        return true;
    }

    /// <summary>log(1 − eᶜ) for c &lt; 0 (Mächler 2012).</summary>
    internal static double LogOneMinusExp(double c) =>
        c > -0.6931471805599453 ? Math.Log(-Elementary.ExpM1(c)) : Elementary.Log1P(-Math.Exp(c));
}
