using System;
using FamilyGen.Special;

namespace FamilyGen.ClosedForms;

/// <summary>Σ exp(c·n)·N!/(n!(N − n)!) over n = 0, …, N (setting: N): the binomial law of N trials with log-odds c;
/// A = N log(1 + eᶜ).</summary>
public sealed class BinomialForm : IClosedForm
{
    /// <inheritdoc/>
    public static int Count => 1;

    /// <inheritdoc/>
    public static bool TryEvaluate(
        ReadOnlySpan<double> settings, ReadOnlySpan<double> coefficients, out double logNormalizer, Span<double> mean, Span<double> covariance)
    {
        var (trials, c) = (settings[0], coefficients[0]);
        logNormalizer = trials * Elementary.LogOnePlusExp(c);
        if (mean.Length > 0)
        {
            mean[0] = trials * Elementary.Logistic(c);
            covariance[0] = mean[0] * Elementary.Logistic(-c);
        }

        return trials >= 0 && double.IsFinite(logNormalizer);
    }
}
