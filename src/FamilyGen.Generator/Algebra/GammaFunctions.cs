using System;

namespace FamilyGen.Generator.Algebra;

/// <summary>log Γ and its derivative for checks at compile time, by Stirling's series after the recurrence has carried the
/// argument beyond 12 (Abramowitz and Stegun 1964, 6.1.41 and 6.3.18); relative error about 1e-14 away from the zeros.</summary>
internal static class GammaFunctions
{
    private static readonly double[] s_bernoulli = { 1.0 / 6, -1.0 / 30, 1.0 / 42, -1.0 / 30, 5.0 / 66, -691.0 / 2730, 7.0 / 6 };

    /// <summary>log |Γ(x)|, as the runtime libraries define it; +∞ at the poles.</summary>
    public static double LogGamma(double x)
    {
        if (double.IsNaN(x) || double.IsPositiveInfinity(x))
            return x;
        if (x <= 0)
            return x == Math.Floor(x) ? double.PositiveInfinity : Math.Log(Math.PI / Math.Abs(Math.Sin(Math.PI * x))) - LogGamma(1 - x);
        var product = 1.0;
        for (; x < 12; x++)
            product *= x;
        var sum = 0.0;
        var power = 1 / x;
        for (var n = 1; n <= s_bernoulli.Length; n++, power /= x * x)
            sum += s_bernoulli[n - 1] / (2 * n * ((2 * n) - 1)) * power;
        return ((x - 0.5) * Math.Log(x)) - x + (0.5 * Math.Log(2 * Math.PI)) + sum - Math.Log(product);
    }

    public static double Digamma(double x)
    {
        if (double.IsNaN(x) || double.IsPositiveInfinity(x))
            return x;
        if (x <= 0)
            return x == Math.Floor(x) ? double.NaN : Digamma(1 - x) - (Math.PI / Math.Tan(Math.PI * x));
        var sum = 0.0;
        for (; x < 12; x++)
            sum -= 1 / x;
        sum += Math.Log(x) - (0.5 / x);
        var power = 1 / (x * x);
        for (var n = 1; n <= s_bernoulli.Length; n++, power /= x * x)
            sum -= s_bernoulli[n - 1] / (2 * n) * power;
        return sum;
    }
}
