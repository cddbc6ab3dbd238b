using System;
using FamilyGen.Special;

namespace FamilyGen.ClosedForms;

/// <summary>∫ exp(c·y) dy over an interval or half-line (settings: its ends): the exponential law, also truncated at one end
/// or both, the uniform law, and with y = log x the power laws.</summary>
/// <remarks>With D the distance from the end where the density is greater and w the width, the density of D/w is that of
/// e^(−tD/w), t = |c|w: E D/w = 1/t − 1/(eᵗ − 1), Var D/w = 1/t² − eᵗ/(eᵗ − 1)², by their series in Bernoulli numbers
/// below t = 1.5.</remarks>
public sealed class ExponentialForm : IClosedForm
{
    private const double SeriesBelow = 1.5;

    // B₂ₖ/(2k)! for k = 1, 2, …: 1/(eᵗ − 1) − 1/t + ½ = Σ t²ᵏ⁻¹B₂ₖ/(2k)!
    private static ReadOnlySpan<double> Bernoulli =>
    [
        1.0 / 12, -1.0 / 720, 1.0 / 30240, -1.0 / 1209600, 1.0 / 47900160,
        -5.284190138687493e-10, 1.3382536530684679e-11, -3.3896802963225827e-13, 8.586062056277845e-15,
        -2.174868698558062e-16, 5.509002828360229e-18, -1.3954464685812524e-19,
    ];

    /// <inheritdoc/>
    public static int Count => 1;

    /// <inheritdoc/>
    public static bool TryEvaluate(
        ReadOnlySpan<double> settings, ReadOnlySpan<double> coefficients, out double logNormalizer, Span<double> mean, Span<double> covariance)
    {
        var (lower, upper, c) = (settings[0], settings[1], coefficients[0]);
        var width = upper - lower;
        logNormalizer = double.NaN;
        if (!(width > 0) || !double.IsFinite(c))
            return false;
        var (end, side) = c > 0 ? (upper, -1) : (lower, 1);
        var steepness = Math.Abs(c);
        if (!double.IsFinite(end) || (c == 0 && !double.IsFinite(width)))
            return false;
        if (double.IsInfinity(width))
        {
            logNormalizer = (c * end) - Math.Log(steepness);
            if (mean.Length > 0)
            {
                mean[0] = end + (side / steepness);
                covariance[0] = 1 / steepness / steepness;
            }

            return true;
        }

        var t = steepness * width;
        logNormalizer = t < SeriesBelow
            ? (c * 0.5 * (lower + upper)) + Math.Log(width) + LogSinhRatio(t)
            : (c * end) + Math.Log(-Elementary.ExpM1(-t) / steepness);
        if (mean.Length == 0)
            return true;
        if (t < SeriesBelow)
        {
            mean[0] = (0.5 * (lower + upper)) - (side * width * Centre(t));
            covariance[0] = width * width * Spread(t);
            return true;
        }

        var rest = t < 700 ? 1 / Elementary.ExpM1(t) : 0;
        mean[0] = end + (side * width * ((1 / t) - rest));
        covariance[0] = width * width * ((1 / (t * t)) - (rest * (1 + rest)));
        return true;
    }

    // log(sinh(t/2)/(t/2)) = Σ t²ᵏB₂ₖ/(2k(2k)!)
    private static double LogSinhRatio(double t)
    {
        var (sum, square) = (0.0, t * t);
        for (var k = Bernoulli.Length; k > 0; k--)
            sum = (sum * square) + (Bernoulli[k - 1] / (2 * k));
        return sum * square;
    }

    // ½ − E D/w
    private static double Centre(double t) => t * Polynomial.Horner(Bernoulli, t * t);

    // Var D/w
    private static double Spread(double t)
    {
        var (sum, square) = (0.0, t * t);
        for (var k = Bernoulli.Length; k > 0; k--)
            sum = (sum * square) + (Bernoulli[k - 1] * ((2 * k) - 1));
        return sum;
    }
}
