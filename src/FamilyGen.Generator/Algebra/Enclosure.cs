using System;

namespace FamilyGen.Generator.Algebra;

/// <summary>What a formula may be besides a finite number.</summary>
[Flags]
internal enum Beyond
{
    None = 0,
    NegativeInfinity = 1,
    PositiveInfinity = 2,
    Infinity = NegativeInfinity | PositiveInfinity,
    Undefined = 4,
    Anything = Infinity | Undefined,
}

/// <summary>A guarantee on the values that a formula takes over a range of its arguments: every finite one lies between
/// <paramref name="Lower"/> and <paramref name="Upper"/>, and every other one is among <paramref name="Beyond"/>
/// (interval arithmetic, Moore 1966, rounded outward).</summary>
/// <param name="Lower">A bound below the finite values; above the upper bound where no value is finite.</param>
/// <param name="Upper">A bound above the finite values.</param>
/// <param name="Beyond">What the value may be besides.</param>
/// <param name="IsContinuous">Whether the formula is sure to be continuous over the range, wherever it is finite.</param>
internal sealed record Enclosure(double Lower, double Upper, Beyond Beyond, bool IsContinuous)
{
    // An exact value of more bytes than this costs more than it can tell.
    private const int MostExactBytes = 100;

    private static readonly Rational s_largest = Rational.Pow(2, 1000);

    /// <summary>Any number or none.</summary>
    public static Enclosure Unknown { get; } = new(double.NegativeInfinity, double.PositiveInfinity, Beyond.Anything, false);

    /// <summary>Any finite number.</summary>
    public static Enclosure Line { get; } = new(double.NegativeInfinity, double.PositiveInfinity, Beyond.None, true);

    public static Enclosure Zero { get; } = Of(Rational.Zero);

    public static Enclosure One { get; } = Of(Rational.One);

    /// <summary>The value, where it is one number that is known without rounding.</summary>
    public Rational? Exact { get; private init; }

    /// <summary>Whether every value is finite.</summary>
    public bool IsFinite => Beyond == Beyond.None;

    /// <summary>Whether no value is finite.</summary>
    public bool IsNeverFinite => Lower > Upper;

    /// <summary>Whether every value is −∞.</summary>
    public bool IsNegativeInfinity => IsNeverFinite && Beyond == Beyond.NegativeInfinity;

    public bool IsPositive => Lower > 0 && !IsNeverFinite && (Beyond & ~Beyond.PositiveInfinity) == 0;

    public bool IsNegative => Upper < 0 && !IsNeverFinite && (Beyond & ~Beyond.NegativeInfinity) == 0;

    public bool IsZero => Exact is { IsZero: true };

    /// <summary>Whether zero may be among the finite values.</summary>
    public bool HasZero => Lower <= 0 && Upper >= 0;

    /// <summary>No finite value.</summary>
    public static Enclosure Never(Beyond beyond) => new(double.PositiveInfinity, double.NegativeInfinity, beyond, true);

    public static Enclosure Between(double lower, double upper, Beyond beyond = Beyond.None, bool isContinuous = true) => new(
        double.IsNaN(lower) ? double.NegativeInfinity : lower, double.IsNaN(upper) ? double.PositiveInfinity : upper, beyond, isContinuous);

    /// <summary>One number, exactly.</summary>
    public static Enclosure Of(Rational value)
    {
        if (Rational.Abs(value) > s_largest)
            return value.Sign > 0 ? Between(1e300, double.PositiveInfinity) : Between(double.NegativeInfinity, -1e300);
        var nearest = value.ToDouble();
        var isDouble = value.IsInteger && Math.Abs(nearest) < 9e15;
        var enclosure = isDouble ? Between(nearest, nearest) : Between(Doubles.Below(nearest), Doubles.Above(nearest));
        return value.Numerator.ToByteArray().Length + value.Denominator.ToByteArray().Length > MostExactBytes
            ? enclosure
            : enclosure with { Exact = value };
    }

    /// <summary>A constant that has no exact form, known to the precision of a double.</summary>
    public static Enclosure Of(double value) =>
        double.IsNaN(value) ? Never(Beyond.Undefined)
        : double.IsPositiveInfinity(value) ? Never(Beyond.PositiveInfinity)
        : double.IsNegativeInfinity(value) ? Never(Beyond.NegativeInfinity)
        : Between(Doubles.Below(value), Doubles.Above(value));

    /// <summary>The values of either.</summary>
    public Enclosure Join(Enclosure other, bool isContinuous) => new(
        Math.Min(Lower, other.Lower), Math.Max(Upper, other.Upper), Beyond | other.Beyond, isContinuous && IsContinuous && other.IsContinuous);

    public static Enclosure operator +(Enclosure a, Enclosure b)
    {
        if (a.Exact is { } first && b.Exact is { } second)
            return Of(first + second);
        var beyond = (a.Beyond | b.Beyond) & Beyond.Undefined;
        if (a.May(Beyond.NegativeInfinity) || b.May(Beyond.NegativeInfinity))
            beyond |= Beyond.NegativeInfinity;
        if (a.May(Beyond.PositiveInfinity) || b.May(Beyond.PositiveInfinity))
            beyond |= Beyond.PositiveInfinity;
        if ((a.May(Beyond.NegativeInfinity) && b.May(Beyond.PositiveInfinity)) || (a.May(Beyond.PositiveInfinity) && b.May(Beyond.NegativeInfinity)))
            beyond |= Beyond.Undefined;
        beyond = WithoutImpossible(a, b, beyond);
        return a.IsNeverFinite || b.IsNeverFinite
            ? Never(beyond)
            : Between(Doubles.Below(a.Lower + b.Lower), Doubles.Above(a.Upper + b.Upper), beyond, a.IsContinuous && b.IsContinuous);
    }

    public static Enclosure operator -(Enclosure a) => new(-a.Upper, -a.Lower, Mirrored(a.Beyond), a.IsContinuous) { Exact = -a.Exact };

    public static Enclosure operator *(Enclosure a, Enclosure b)
    {
        if (a.Exact is { } first && b.Exact is { } second)
            return Of(first * second);
        if (a.IsZero || b.IsZero)
        {
            var other = a.IsZero ? b : a;
            return other.IsFinite ? Zero : other.IsNeverFinite ? Never(Beyond.Undefined) : Zero with { Beyond = Beyond.Undefined, Exact = null };
        }

        var beyond = ((a.Beyond | b.Beyond) & Beyond.Undefined) | Infinite(a, b) | Infinite(b, a);
        if (a.IsNeverFinite || b.IsNeverFinite)
            return Never(beyond);
        var (p, q) = (Times(a.Lower, b.Lower), Times(a.Lower, b.Upper));
        var (r, s) = (Times(a.Upper, b.Lower), Times(a.Upper, b.Upper));
        return Between(
            Doubles.Below(Math.Min(Math.Min(p, q), Math.Min(r, s))),
            Doubles.Above(Math.Max(Math.Max(p, q), Math.Max(r, s))),
            beyond,
            a.IsContinuous && b.IsContinuous);
    }

    public bool May(Beyond value) => (Beyond & value) != 0;

    private static Beyond Mirrored(Beyond beyond) =>
        (beyond & Beyond.Undefined)
        | ((beyond & Beyond.NegativeInfinity) != 0 ? Beyond.PositiveInfinity : Beyond.None)
        | ((beyond & Beyond.PositiveInfinity) != 0 ? Beyond.NegativeInfinity : Beyond.None);

    // −∞ that meets nothing but +∞ is undefined and no longer infinite.
    private static Beyond WithoutImpossible(Enclosure a, Enclosure b, Beyond beyond)
    {
        if ((Only(a, Beyond.PositiveInfinity) && Only(b, Beyond.NegativeInfinity)) || (Only(a, Beyond.NegativeInfinity) && Only(b, Beyond.PositiveInfinity)))
            return Beyond.Undefined;
        return Only(a, Beyond.Undefined) || Only(b, Beyond.Undefined) ? Beyond.Undefined : beyond;
    }

    private static bool Only(Enclosure a, Beyond value) => a.IsNeverFinite && a.Beyond == value;

    // What an infinite value of the one can become by the values of the other.
    private static Beyond Infinite(Enclosure a, Enclosure b)
    {
        var result = Beyond.None;
        if (!a.May(Beyond.Infinity))
            return result;
        if (!b.IsNeverFinite && b.HasZero)
            result |= Beyond.Undefined;
        if ((!b.IsNeverFinite && b.Upper > 0) || b.May(Beyond.PositiveInfinity))
            result |= a.Beyond & Beyond.Infinity;
        if ((!b.IsNeverFinite && b.Lower < 0) || b.May(Beyond.NegativeInfinity))
            result |= Mirrored(a.Beyond & Beyond.Infinity);
        return result;
    }

    // The finite values of an unbounded range times zero are zero.
    private static double Times(double a, double b) => a == 0 || b == 0 ? 0 : a * b;
}
