using System;

namespace FamilyGen.Special;

/// <summary>The standard normal law on a half-line t ≥ α, about its mode: log ∫ exp(−t²/2 + m²/2) dt with m = max(α, 0), and
/// the moments of u = t − m and u².</summary>
/// <remarks>For α ≤ 0 the known expressions in h = φ(α)/Φ(−α), whose terms do not cancel there. For α &gt; 0 the moments of
/// exp(−αu − u²/2) obey I₁ + αI₀ = 1, Iₙ₊₁ + αIₙ = nIₙ₋₁: forwards from Mills' ratio up to α = 2, beyond it backwards as
/// the continued fraction Iₙ/Iₙ₋₁ = n/(α + Iₙ₊₁/Iₙ), all of whose terms are positive (Laplace 1805; Gautschi 1961).
/// Measured error against 60-digit values for α from −1e3 to 1e9: logarithm 4e-16, means 4e-15 and covariances 3e-13
/// relative.</remarks>
public static class NormalTail
{
    private const double FractionFrom = 2;

    /// <summary>Evaluates the integral.</summary>
    /// <param name="alpha">The end α.</param>
    /// <param name="logIntegral">The logarithm of the integral.</param>
    /// <param name="mean">The means of (u, u²), or empty.</param>
    /// <param name="covariance">Their covariance, row by row, or empty.</param>
    public static void Evaluate(double alpha, out double logIntegral, Span<double> mean, Span<double> covariance)
    {
        if (!(alpha > 0))
            AboutMode(alpha, out logIntegral, mean, covariance);
        else if (alpha < FractionFrom)
            Forwards(alpha, out logIntegral, mean, covariance);
        else
            Backwards(alpha, out logIntegral, mean, covariance);
    }

    private static void AboutMode(double alpha, out double logIntegral, Span<double> mean, Span<double> covariance)
    {
        var kernel = Math.Exp(-0.5 * alpha * alpha);
        var outside = kernel == 0 ? 0 : 0.5 * kernel * Erfcx.Value(-alpha / Math.Sqrt(2));
        logIntegral = (0.5 * Math.Log(2 * Math.PI)) + Elementary.Log1P(-outside);
        if (mean.Length == 0)
            return;
        var h = kernel == 0 ? 0 : kernel / Math.Sqrt(2 * Math.PI) / (1 - outside);
        var slope = kernel == 0 ? 0 : alpha * h;
        var curved = kernel == 0 ? 0 : alpha * slope;
        mean[0] = h;
        mean[1] = 1 + slope;
        covariance[0] = 1 + slope - (h * h);
        covariance[1] = covariance[2] = h + curved - (slope * h);
        covariance[3] = 2 + slope + (alpha * curved) - (slope * slope);
    }

    private static void Forwards(double alpha, out double logIntegral, Span<double> mean, Span<double> covariance)
    {
        var zeroth = Math.Sqrt(0.5 * Math.PI) * Erfcx.Value(alpha / Math.Sqrt(2));
        logIntegral = Math.Log(zeroth);
        if (mean.Length == 0)
            return;
        var first = (1 - (alpha * zeroth)) / zeroth;
        var second = 1 - (alpha * first);
        var third = (2 * first) - (alpha * second);
        Fill(first, second, third, (3 * second) - (alpha * third), mean, covariance);
    }

    private static void Backwards(double alpha, out double logIntegral, Span<double> mean, Span<double> covariance)
    {
        var depth = 8 + (int)(340 / alpha / alpha);
        var ratio = 0.5 * (Math.Sqrt((alpha * alpha) + (4 * (depth + 1))) - alpha);
        for (var n = depth; n > 4; n--)
            ratio = n / (alpha + ratio);
        var fourth = 4 / (alpha + ratio);
        var third = 3 / (alpha + fourth);
        var second = 2 / (alpha + third);
        var first = 1 / (alpha + second);
        logIntegral = -Math.Log(alpha + first);
        if (mean.Length > 0)
            Fill(first, first * second, first * second * third, first * second * third * fourth, mean, covariance);
    }

    private static void Fill(double first, double second, double third, double fourth, Span<double> mean, Span<double> covariance)
    {
        (mean[0], mean[1]) = (first, second);
        covariance[0] = second - (first * first);
        covariance[1] = covariance[2] = third - (first * second);
        covariance[3] = fourth - (second * second);
    }
}
