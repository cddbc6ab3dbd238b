using System;
using FamilyGen.Special;

namespace FamilyGen.Kernels;

public static partial class Residual
{
    /// <summary>For wⁿ with an integer exponent; w ≠ 0 when n &lt; 0.</summary>
    /// <remarks>For n ≥ 2 it is step²·Qₙ with Q₂ = 1, Qₙ₊₁ = (w + step)Qₙ + n·wⁿ⁻¹; for n = −m with q = w/(w + step) and
    /// δ = step/w it is wⁿ·Pₘ with P₀ = 0, Pₘ₊₁ = qPₘ + (m + 1)qδ²: where w and w + step have one sign, every term is
    /// positive.</remarks>
    public static double Power(double w, double step, int n)
    {
        if (n is 0 or 1)
            return 0;
        if (Math.Abs((long)n) > 64)
            return HighPower(w, step, n);
        var end = w + step;
        if (n < 0)
            return Math.Pow(w, n) * InversePower(w / end, step / w * (step / end), -n);
        var (sum, power) = (1.0, w);
        for (var k = 2; k < n; k++)
        {
            sum = (end * sum) + (k * power);
            power *= w;
        }

        return step * step * sum;
    }

    /// <summary>For wᵖ, w &gt; 0 and w + step ≥ 0.</summary>
    public static double Power(double w, double step, double p)
    {
        if (p is >= -64 and <= 64 && p == Math.Floor(p))
            return Power(w, step, (int)p);
        var ratio = LogRatio(w, w + step, step);
        return IsFar(ratio, p) ? Difference(w, step, p) : Math.Pow(w, p) * PowerOfRatio(ratio, p);
    }

    /// <summary>For wᵖ, w the distance to an end.</summary>
    public static double PowerAtEnd(double w, double ratio, double p)
    {
        if (!IsFar(ratio, p))
            return Math.Pow(w, p) * PowerOfRatio(ratio, p);
        var scale = Math.Pow(w, p);
        return Math.Exp(p * (Math.Log(w) + ratio)) - scale - (p * scale * Elementary.ExpM1(ratio));
    }

    // eᵖᵗ − 1 − p(eᵗ − 1), with the two terms of one sign where p < 0 (first form) or p > 1 (second form)
    private static double PowerOfRatio(double t, double p)
    {
        if (p < 0.5)
            return Elementary.ExpM1Minus(p * t) - (p * Elementary.ExpM1Minus(t));
        var q = p - 1;
        return Math.Exp(t) * (Elementary.ExpM1Minus(q * t) + (q * Elementary.ExpM1Minus(-t)));
    }

    // whether one of the three terms outweighs the others, so that they may be subtracted as they are
    private static bool IsFar(double t, double p) => Math.Abs((p < 0.5 ? p : p - 1) * t) > 4;

    private static double Difference(double w, double step, double p) =>
        Math.Pow(w + step, p) - Math.Pow(w, p) - (p * Math.Pow(w, p - 1) * step);

    private static double HighPower(double w, double step, int n)
    {
        if (w * (w + step) <= 0)
            return Difference(w, step, n);
        var sign = w < 0 && int.IsOddInteger(n) ? -1 : 1;
        return sign * Power(Math.Abs(w), Math.Sign(w) * step, (double)n);
    }

    // (1 + δ)⁻ᵐ − 1 + mδ for q = 1/(1 + δ), growth = qδ²
    private static double InversePower(double q, double growth, int m)
    {
        var sum = 0.0;
        for (var k = 1; k <= m; k++)
            sum = (q * sum) + (k * growth);
        return sum;
    }
}
