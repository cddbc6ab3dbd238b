using System;

namespace FamilyGen.ClosedForms;

/// <summary>Σ exp(c·n)/n! over n = 0, 1, …: the Poisson law of mean eᶜ; A = eᶜ.</summary>
public sealed class PoissonForm : IClosedForm
{
    /// <inheritdoc/>
    public static int Count => 1;

    /// <inheritdoc/>
    public static bool TryEvaluate(
        ReadOnlySpan<double> settings, ReadOnlySpan<double> coefficients, out double logNormalizer, Span<double> mean, Span<double> covariance)
    {
        logNormalizer = Math.Exp(coefficients[0]);
        if (mean.Length > 0)
            mean[0] = covariance[0] = logNormalizer;
        return double.IsFinite(logNormalizer);
    }
}
