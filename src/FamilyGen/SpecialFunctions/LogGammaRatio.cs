using System;

namespace FamilyGen.Special;

/// <summary>log Γ(x + shift) − log Γ(x) for x &gt; 0 and x + shift &gt; 0, without cancellation between the two: what the
/// negative binomial coefficient is made of.</summary>
/// <remarks>From 10 on, Stirling's series of the two, term by term: shift·log x + x(log(1 + z) − z) +
/// (shift − ½)log(1 + z) + the difference of the tails, z = shift/x; below, both arguments are moved up by
/// Γ(x + 1) = xΓ(x). Where a negative shift takes most of x the plain difference loses nothing and is taken; so is log Γ of an
/// exact x + shift at the zeros of log Γ(x), where a coefficient that subtracts it again must become 0.</remarks>
public static class LogGammaRatio
{
    private const double StirlingFrom = 10;

    // B₂ₖ/(2k) for k = 1, 2, …: ψ(x) = log x − 1/(2x) − Σ B₂ₖ/(2k x²ᵏ)
    private static ReadOnlySpan<double> Asymptotic =>
    [
        1.0 / 12, -1.0 / 120, 1.0 / 252, -1.0 / 240, 1.0 / 132, -691.0 / 32760, 1.0 / 12, -3617.0 / 8160,
    ];

    /// <summary>log Γ(x + shift) − log Γ(x).</summary>
    public static double Value(double x, double shift)
    {
        if (!(shift > -0.5 * x))
            return LogGamma.Value(x + shift) - LogGamma.Value(x);
        if (x is 1 or 2 && x + shift - x == shift)
            return LogGamma.Value(x + shift);
        var moved = 0.0;
        while (x < StirlingFrom || x + shift < StirlingFrom)
            moved += Elementary.Log1P(shift / x++);
        return shift * Math.Log(x) + Bend(x, shift) - moved;
    }

    /// <summary>ψ(x + shift) − ψ(x), the derivative with respect to x.</summary>
    public static double Derivative(double x, double shift)
    {
        if (!(shift > -0.5 * x))
            return Digamma.Value(x + shift) - Digamma.Value(x);
        var moved = 0.0;
        for (; x < StirlingFrom || x + shift < StirlingFrom; x++)
            moved += shift / (x * (x + shift));
        return moved + (shift / x) + BendSlope(x, shift);
    }

    /// <summary>What shift·log x leaves of the ratio, for x and x + shift from 10 on: about shift(shift − 1)/(2x).</summary>
    internal static double Bend(double x, double shift)
    {
        var z = shift / x;
        return x * Elementary.Log1PMinus(z) + (shift - 0.5) * Elementary.Log1P(z) + Tail(LogGamma.StirlingCoefficients, x, shift, 1);
    }

    /// <summary>The derivative of <see cref="Bend"/> with respect to x.</summary>
    internal static double BendSlope(double x, double shift)
    {
        var z = shift / x;
        return Elementary.Log1PMinus(z) + shift / (2 * x * (x + shift)) - Tail(Asymptotic, x, shift, 2);
    }

    // Σ cₖ((x + shift)^−m − x^−m) over m = first, first + 2, …
    private static double Tail(ReadOnlySpan<double> coefficients, double x, double shift, int first)
    {
        var end = x + shift;
        var log = -Elementary.Log1P(shift / x);
        var sum = 0.0;
        var power = first == 1 ? 1 / x : 1 / (x * x);
        var m = first;
        foreach (var coefficient in coefficients)
        {
            sum += coefficient * power * Elementary.ExpM1(m * log);
            power /= x * x;
            m += 2;
            if (power * Math.Max(1, Math.Pow(x / end, m)) < 1e-24)
                break;
        }

        return sum;
    }
}
