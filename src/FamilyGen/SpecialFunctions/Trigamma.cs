using System;

namespace FamilyGen.Special;

/// <summary>ψ′(x), the second derivative of log Γ(x), for x &gt; 0.</summary>
/// <remarks>ψ′(x) = ψ′(x + 1) + 1/x² up to x ≥ 10, there the asymptotic series (Schneider 1978, AS 121, with more terms);
/// every term of the recurrence is positive.</remarks>
public static class Trigamma
{
    // the Bernoulli numbers B₂, B₄, …
    private static ReadOnlySpan<double> Bernoulli =>
    [
        1.0 / 6, -1.0 / 30, 1.0 / 42, -1.0 / 30, 5.0 / 66, -691.0 / 2730, 7.0 / 6, -3617.0 / 510, 43867.0 / 798,
    ];

    /// <summary>ψ′(x); +∞ at 0 and NaN at negative x.</summary>
    public static double Value(double x)
    {
        if (!(x > 0))
            return x == 0 ? double.PositiveInfinity : double.NaN;
        var sum = 0.0;
        for (; x < 10; x++)
            sum += 1 / (x * x);
        var inverse = 1 / x;
        var square = inverse * inverse;
        return sum + (inverse + (square * (0.5 + (inverse * Polynomial.Horner(Bernoulli, square)))));
    }
}
