using System;

namespace FamilyGen.Special;

/// <summary>Hurwitz' zeta function ζ(s, q) = Σ (n + q)⁻ˢ, n = 0, 1, …, relative to its first term, with its
/// logarithmic derivatives in s, for s &gt; 1 and q &gt; 0.</summary>
/// <remarks>Terms are summed until they are negligible or n + q has passed s + 24; the rest by the Euler–Maclaurin formula
/// with its derivatives in s (Johansson 2015), whose main term 1/(s − 1) and its derivatives are of one sign.
/// Measured error against 60-digit values for s − 1 from 1e-10 to 1e3 and q from 1e-3 to 1e9: logarithm, mean and
/// variance (8 + s) ulp, what the rounding of a power leaves.</remarks>
public static class HurwitzZeta
{
    private const int CorrectionTerms = 10;
    private const int MostTerms = 100_000;

    /// <summary>Evaluates the function and the law on n that gives n the weight (n + q)⁻ˢ.</summary>
    /// <param name="s">The exponent.</param>
    /// <param name="q">The first base.</param>
    /// <param name="logRatio">log(ζ(s, q)·qˢ), exact even where all but the first term are tiny.</param>
    /// <param name="mean">The mean of log((n + q)/q).</param>
    /// <param name="variance">Its variance.</param>
    /// <returns>False outside the domain.</returns>
    public static bool TryEvaluate(double s, double q, out double logRatio, out double mean, out double variance)
    {
        (logRatio, mean, variance) = (double.NaN, double.NaN, double.NaN);
        if (!(s > 1 && q > 0 && q < 1e15))
            return false;
        double zeroth = 0, first = 0, second = 0;
        for (var n = 1; ; n++)
        {
            var log = n < q ? Elementary.Log1P(n / q) : Math.Log((n + q) / q);
            var weight = n < q ? Math.Exp(-s * log) : Math.Pow((n + q) / q, -s);
            if (n + q >= s + 24)
            {
                AddTail(s, n + q, log, weight, ref zeroth, ref first, ref second);
                break;
            }

            zeroth += weight;
            first += weight * log;
            second += weight * log * log;
            if (weight * (n + q) * (1 + log) * (1 + log) < 1e-19 * (s - 1) * second)
                break;
            if (n == MostTerms)
                return false;
        }

        logRatio = Elementary.Log1P(zeroth);
        mean = first / (1 + zeroth);
        variance = (second / (1 + zeroth)) - (mean * mean);
        return true;
    }

    // the terms from x on: x⁻ˢ(x/(s − 1) + ½ + Σ B₂ₖ/(2k)!·s(s + 1)…(s + 2k − 2)x¹⁻²ᵏ) and its first derivatives in s
    private static void AddTail(double s, double x, double log, double weight, ref double zeroth, ref double first, ref double second)
    {
        var excess = s - 1;
        var (value, slope, bend) = (x / excess + 0.5, -x / (excess * excess), 2 * x / (excess * excess * excess));
        var (term, termSlope, termBend) = (s / x, 1 / x, 0.0);
        var square = x * x;
        for (var k = 1; ; k++)
        {
            var correction = LogSinhRatio.BernoulliOverFactorial[k - 1];
            value += correction * term;
            slope += correction * termSlope;
            bend += correction * termBend;
            if (k == CorrectionTerms)
                break;
            var factor = (s + (2 * k) - 1) * (s + (2 * k)) / square;
            var factorSlope = ((2 * s) + (4 * k) - 1) / square;
            termBend = (termBend * factor) + (2 * termSlope * factorSlope) + (2 * term / square);
            termSlope = (termSlope * factor) + (term * factorSlope);
            term *= factor;
        }

        zeroth += weight * value;
        first += weight * ((log * value) - slope);
        second += weight * ((log * log * value) - (2 * log * slope) + bend);
    }
}
