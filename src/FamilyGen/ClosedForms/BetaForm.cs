using System;
using FamilyGen.Special;

namespace FamilyGen.ClosedForms;

/// <summary>∫ exp(α·log F(y) + β·log(1 − F(y))) dy over the line with F(y) = 1/(1 + e⁻ʸ), α, β &gt; 0: the beta law of
/// x = F(y) on (0, 1), and with it laws in log x and log(1 + x) on (0, ∞), in log(1 + eʸ) on the line.</summary>
/// <remarks>A = log B(α, β); its derivatives are differences of digamma and trigamma, taken without cancellation.</remarks>
public sealed class BetaForm : IClosedForm
{
    /// <inheritdoc/>
    public static int Count => 2;

    /// <inheritdoc/>
    public static bool TryEvaluate(
        ReadOnlySpan<double> settings, ReadOnlySpan<double> coefficients, out double logNormalizer, Span<double> mean, Span<double> covariance)
    {
        var (alpha, beta) = (coefficients[0], coefficients[1]);
        logNormalizer = double.NaN;
        if (!(alpha > 0 && beta > 0 && double.IsFinite(alpha + beta)))
            return false;
        logNormalizer = LogBeta.Value(alpha, beta);
        if (mean.Length == 0)
            return true;
        mean[0] = -DigammaDifference.Value(alpha, beta);
        mean[1] = -DigammaDifference.Value(beta, alpha);
        covariance[0] = TrigammaDifference.Value(alpha, beta);
        covariance[1] = covariance[2] = -Trigamma.Value(alpha + beta);
        covariance[3] = TrigammaDifference.Value(beta, alpha);
        return true;
    }
}
