using System;
using FamilyGen.Special;

namespace FamilyGen.Kernels;

/// <summary>A closed range of numbers that is guaranteed to hold every value of a formula over a range of its
/// arguments: interval arithmetic (Moore 1966), rounded outward after every operation.</summary>
/// <remarks>The four operations are rounded by one unit in the last place, functions by as many as their stated error
/// asks. A function that is undefined on part of the range answers for the rest of it; one that is undefined on all of
/// it gives the whole line.</remarks>
public readonly record struct Bounds : IArithmetic<Bounds>
{
    private const int ElementaryError = 2;
    private const int GammaError = 8;

    private const double LogGammaMinimumAt = 1.4616321449683622;
    private const double LogGammaMinimum = -0.12148629053584961;

    /// <summary>The range [lower, upper]; the whole line when an end is NaN.</summary>
    public Bounds(double lower, double upper)
    {
        var known = lower <= upper;
        (Lower, Upper) = known ? (lower, upper) : (double.NegativeInfinity, double.PositiveInfinity);
    }

    /// <summary>The least value.</summary>
    public double Lower { get; }

    /// <summary>The greatest value.</summary>
    public double Upper { get; }

    /// <summary>Whether the number lies in the range.</summary>
    public bool Contains(double value) => value >= Lower && value <= Upper;

    /// <inheritdoc/>
    public static Bounds Unknown { get; } = new(double.NegativeInfinity, double.PositiveInfinity);

    /// <inheritdoc/>
    public static implicit operator Bounds(double value) => new(value, value);

    /// <inheritdoc/>
    public static Bounds operator +(Bounds a, Bounds b) => Outward(a.Lower + b.Lower, a.Upper + b.Upper);

    /// <inheritdoc/>
    public static Bounds operator -(Bounds a, Bounds b) => Outward(a.Lower - b.Upper, a.Upper - b.Lower);

    /// <inheritdoc/>
    public static Bounds operator -(Bounds a) => new(-a.Upper, -a.Lower);

    /// <inheritdoc/>
    public static Bounds operator *(Bounds a, Bounds b)
    {
        var (p, q) = (Product(a.Lower, b.Lower), Product(a.Lower, b.Upper));
        var (r, s) = (Product(a.Upper, b.Lower), Product(a.Upper, b.Upper));
        return Outward(Math.Min(Math.Min(p, q), Math.Min(r, s)), Math.Max(Math.Max(p, q), Math.Max(r, s)));
    }

    /// <inheritdoc/>
    public static Bounds operator /(Bounds a, Bounds b)
    {
        if ((b.Lower < 0 && b.Upper > 0) || (b.Lower == 0 && b.Upper == 0))
            return Unknown;
        var low = b.Upper == 0 ? double.NegativeInfinity : 1 / b.Upper;
        var high = b.Lower == 0 ? double.PositiveInfinity : 1 / b.Lower;
        return a * Outward(low, high);
    }

    /// <inheritdoc/>
    public static Bounds Exp(Bounds a)
    {
        var range = Outward(Math.Exp(a.Lower), Math.Exp(a.Upper), ElementaryError);
        return new(Math.Max(0, range.Lower), range.Upper);
    }

    /// <inheritdoc/>
    public static Bounds Log(Bounds a) => a.Upper <= 0
        ? Unknown
        : Outward(Math.Log(Math.Max(0, a.Lower)), Math.Log(a.Upper), ElementaryError);

    /// <inheritdoc/>
    public static Bounds Pow(Bounds a, double b)
    {
        if (b == 0)
            return 1;
        if (b < 0)
            return (Bounds)1 / Pow(a, -b);
        var isInteger = b == Math.Floor(b);
        var isOdd = isInteger && Math.IEEERemainder(b, 2) != 0;
        if (!isInteger)
        {
            if (a.Upper < 0)
                return Unknown;
            a = new(Math.Max(0, a.Lower), a.Upper);
        }

        if (isOdd || a.Lower >= 0)
            return Outward(Math.Pow(a.Lower, b), Math.Pow(a.Upper, b), ElementaryError);
        if (a.Upper <= 0)
            return Outward(Math.Pow(a.Upper, b), Math.Pow(a.Lower, b), ElementaryError);
        return new(0, Outward(0, Math.Pow(Math.Max(-a.Lower, a.Upper), b), ElementaryError).Upper);
    }

    /// <inheritdoc/>
    public static Bounds Pow(Bounds a, Bounds b) => b.Lower == b.Upper ? Pow(a, b.Lower) : Exp(b * Log(a));

    /// <inheritdoc/>
    public static Bounds Cos(Bounds a) => Oscillation(a, 0);

    /// <inheritdoc/>
    public static Bounds Sin(Bounds a) => Oscillation(a, 0.25);

    /// <inheritdoc/>
    public static Bounds Abs(Bounds a) =>
        a.Lower >= 0 ? a : a.Upper <= 0 ? -a : new(0, Math.Max(-a.Lower, a.Upper));

    /// <inheritdoc/>
    public static Bounds LogGamma(Bounds a)
    {
        if (a.Upper <= 0)
            return Unknown;
        var atLower = a.Lower <= 0 ? double.PositiveInfinity : Special.LogGamma.Value(a.Lower);
        var atUpper = Special.LogGamma.Value(a.Upper);
        var least = a.Lower < LogGammaMinimumAt && a.Upper > LogGammaMinimumAt ? LogGammaMinimum : Math.Min(atLower, atUpper);
        return Outward(least, Math.Max(atLower, atUpper), GammaError);
    }

    /// <inheritdoc/>
    public static Bounds Digamma(Bounds a) => a.Upper <= 0
        ? Unknown
        : Outward(Special.Digamma.Value(Math.Max(0, a.Lower)), Special.Digamma.Value(a.Upper), GammaError);

    /// <inheritdoc/>
    public static Bounds DigammaDifference(Bounds a, double shift)
    {
        // monotone: its derivative ψ′(a + shift) − ψ′(a) has one sign
        if (!(a.Lower > 0 && a.Lower + shift > 0))
            return Digamma(a + shift) - Digamma(a);
        var (p, q) = (LogGammaRatio.Derivative(a.Lower, shift), double.IsInfinity(a.Upper) ? 0 : LogGammaRatio.Derivative(a.Upper, shift));
        return Outward(Math.Min(p, q), Math.Max(p, q), GammaError);
    }

    // 0·∞ is 0: the numbers of a range are finite
    private static double Product(double a, double b) => a == 0 || b == 0 ? 0 : a * b;

    // cos 2π(t − shift) over the turns t: maxima at whole t − shift, minima halfway between. A turn that is met up to
    // rounding counts as met, which only widens the range.
    private static Bounds Oscillation(Bounds a, double shift)
    {
        const double Slack = 1e-7;
        const double Farthest = 1e8;
        if (!(a.Lower > -Farthest && a.Upper < Farthest))
            return new(-1, 1);
        var low = (a.Lower / (2 * Math.PI)) - shift - Slack;
        var high = (a.Upper / (2 * Math.PI)) - shift + Slack;
        var (atLower, atUpper) = shift == 0 ? (Math.Cos(a.Lower), Math.Cos(a.Upper)) : (Math.Sin(a.Lower), Math.Sin(a.Upper));
        var range = Outward(Math.Min(atLower, atUpper), Math.Max(atLower, atUpper), ElementaryError);
        var lower = HoldsInteger(low - 0.5, high - 0.5) ? -1 : Math.Max(-1, range.Lower);
        var upper = HoldsInteger(low, high) ? 1 : Math.Min(1, range.Upper);
        return new(lower, upper);
    }

    private static bool HoldsInteger(double low, double high) => Math.Ceiling(low) <= high;

    private static Bounds Outward(double lower, double upper, int units = 1)
    {
        for (var i = 0; i < units; i++)
            (lower, upper) = (Math.BitDecrement(lower), Math.BitIncrement(upper));
        return new(lower, upper);
    }
}
