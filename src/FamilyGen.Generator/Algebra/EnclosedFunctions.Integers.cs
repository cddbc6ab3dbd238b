using System;

namespace FamilyGen.Generator.Algebra;

/// <content>Functions with whole values.</content>
internal static partial class EnclosedFunctions
{
    public static Enclosure Sign(Enclosure a)
    {
        if (a.IsNeverFinite && a.Beyond == Beyond.Undefined)
            return a;
        var beyond = a.Beyond & Beyond.Undefined;
        if (a.IsPositive)
            return Enclosure.One;
        return a.IsNegative ? -Enclosure.One : a.IsZero ? a : Enclosure.Between(-1, 1, beyond, false);
    }

    public static Enclosure Floor(Enclosure a)
    {
        if (a.Exact is { } exact)
            return Enclosure.Of(FloorOf(exact));
        if (a.IsNeverFinite)
            return a;
        var (lower, upper) = (Math.Floor(a.Lower), Math.Floor(a.Upper));
        return lower == upper && a.IsFinite && Math.Abs(lower) < 9e15
            ? Enclosure.Of((Rational)(long)lower)
            : Enclosure.Between(lower, upper, a.Beyond, false);
    }

    public static Rational FloorOf(Rational value)
    {
        var quotient = System.Numerics.BigInteger.DivRem(value.Numerator, value.Denominator, out var rest);
        return new Rational(rest.Sign < 0 ? quotient - 1 : quotient, 1);
    }

    /// <summary>a mod b with the sign of a; undefined for b = 0 and for an infinite a.</summary>
    public static Enclosure Remainder(Enclosure a, Enclosure b)
    {
        if (a.Exact is { } dividend && b.Exact is { IsZero: false } divisor)
            return Enclosure.Of(dividend - (divisor * Truncated(dividend / divisor)));
        var beyond = (a.Beyond | b.Beyond) & Beyond.Undefined;
        if (b.HasZero || a.May(Beyond.Infinity))
            beyond |= Beyond.Undefined;
        if (a.IsNeverFinite || b.IsZero)
            return Enclosure.Never(Beyond.Undefined);
        var bound = b.May(Beyond.Infinity) || b.IsNeverFinite ? double.PositiveInfinity : Math.Max(-b.Lower, b.Upper);
        return Enclosure.Between(
            a.Lower >= 0 ? 0 : Math.Max(a.Lower, -bound), a.Upper <= 0 ? 0 : Math.Min(a.Upper, bound), beyond, false);
    }

    /// <summary>a/b rounded toward zero; there is no such number for b = 0.</summary>
    public static Enclosure IntegerQuotient(Enclosure a, Enclosure b)
    {
        if (a.Exact is { } dividend && b.Exact is { IsZero: false } divisor)
            return Enclosure.Of(Truncated(dividend / divisor));
        if (b.IsZero)
            return Enclosure.Never(Beyond.Undefined);
        var quotient = a * Reciprocal(b);
        if (quotient.IsNeverFinite)
            return Enclosure.Never(Beyond.Undefined);
        return Enclosure.Between(
            quotient.Lower > 0 ? Math.Floor(quotient.Lower) : Math.Ceiling(quotient.Lower),
            quotient.Upper > 0 ? Math.Floor(quotient.Upper) : Math.Ceiling(quotient.Upper),
            quotient.IsFinite ? Beyond.None : Beyond.Undefined,
            false);
    }

    private static Rational Truncated(Rational value) => value.Sign < 0 ? -FloorOf(-value) : FloorOf(value);
}
