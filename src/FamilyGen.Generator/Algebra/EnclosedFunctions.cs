using System;

namespace FamilyGen.Generator.Algebra;

/// <summary>Known functions of enclosed values. Every bound is moved outward by more than the error of the function that
/// computed it.</summary>
internal static partial class EnclosedFunctions
{
    private const double LogGammaMinimumAt = 1.4616321449683622;
    private const double LogGammaMinimum = -0.12148629053584962;

    // Beyond this the reduction of an angle by 2π is no longer trusted.
    private const double LargestAngle = 1e6;

    public static Enclosure Exp(Enclosure a)
    {
        if (a.IsZero)
            return Enclosure.One;
        var beyond = a.Beyond & (Beyond.Undefined | Beyond.PositiveInfinity);
        var (lower, upper) = a.IsNeverFinite
            ? (double.PositiveInfinity, double.NegativeInfinity)
            : (Math.Max(0, Doubles.SafelyBelow(Math.Exp(a.Lower))), Doubles.SafelyAbove(Math.Exp(a.Upper)));

        // A number has a positive exponential, however small.
        if (double.IsPositiveInfinity(lower) && !a.IsNeverFinite)
            lower = double.MaxValue;
        if (!a.IsNeverFinite && !double.IsNegativeInfinity(a.Lower))
            lower = Math.Max(lower, double.Epsilon);
        if (a.May(Beyond.NegativeInfinity))
            (lower, upper) = (0, Math.Max(0, upper));
        return Enclosure.Between(lower, upper, beyond, a.IsContinuous);
    }

    public static Enclosure Log(Enclosure a)
    {
        if (a.Exact is { } exact && exact == Rational.One)
            return Enclosure.Zero;
        var beyond = a.Beyond & (Beyond.Undefined | Beyond.PositiveInfinity);
        if (a.May(Beyond.NegativeInfinity) || (!a.IsNeverFinite && a.Lower < 0))
            beyond |= Beyond.Undefined;
        if (a.IsNeverFinite)
            return Enclosure.Never(beyond);
        if (a.HasZero)
            beyond |= Beyond.NegativeInfinity;
        if (a.IsZero)
            return Enclosure.Never(Beyond.NegativeInfinity);
        if (a.Upper <= 0)
            return Enclosure.Never(beyond);
        return Enclosure.Between(
            a.Lower <= 0 ? double.NegativeInfinity : Doubles.SafelyBelow(Math.Log(a.Lower) - 1e-16),
            Doubles.SafelyAbove(Math.Log(a.Upper) + 1e-16),
            beyond,
            a.IsContinuous);
    }

    /// <summary>aⁿ for a whole number n.</summary>
    public static Enclosure Power(Enclosure a, int n)
    {
        if (n == 0)
            return a.May(Beyond.Undefined) ? Enclosure.One with { Beyond = Beyond.Undefined } : Enclosure.One;
        if (n < 0)
            return Reciprocal(n == -1 ? a : Power(a, -n));
        if (a.Exact is { } exact && Math.Abs(n) < 200)
            return Enclosure.Of(Rational.Pow(exact, n));
        var beyond = a.Beyond;
        if (n % 2 == 0 && a.May(Beyond.Infinity))
            beyond = (beyond & Beyond.Undefined) | Beyond.PositiveInfinity;
        if (a.IsNeverFinite)
            return Enclosure.Never(beyond);
        var inner = n % 2 == 0 ? Abs(a) : a;
        return Enclosure.Between(Doubles.SafelyBelow(Math.Pow(inner.Lower, n)), Doubles.SafelyAbove(Math.Pow(inner.Upper, n)), beyond, a.IsContinuous);
    }

    /// <summary>1/a; at zero it is infinite of either sign.</summary>
    public static Enclosure Reciprocal(Enclosure a)
    {
        if (a.Exact is { } exact)
            return exact.IsZero ? Enclosure.Never(Beyond.Infinity) : Enclosure.Of(Rational.One / exact);
        var beyond = a.Beyond & Beyond.Undefined;
        var (lower, upper) = (double.PositiveInfinity, double.NegativeInfinity);
        var continuous = a.IsContinuous;
        if (!a.IsNeverFinite)
        {
            if (a.HasZero)
            {
                beyond |= a.Lower < 0 ? Beyond.Infinity : Beyond.PositiveInfinity;
                continuous = false;
            }

            (lower, upper) = a.Lower < 0 && a.Upper > 0
                ? (double.NegativeInfinity, double.PositiveInfinity)
                : (Doubles.Below(a.Upper == 0 ? double.NegativeInfinity : 1 / a.Upper), Doubles.Above(a.Lower == 0 ? double.PositiveInfinity : 1 / a.Lower));
        }

        if (a.May(Beyond.Infinity))
            (lower, upper) = (Math.Min(lower, 0), Math.Max(upper, 0));
        return Enclosure.Between(lower, upper, beyond, continuous);
    }

    /// <summary>a^p; <paramref name="isInteger"/> tells that p takes whole numbers only, so that a may be negative.</summary>
    public static Enclosure Power(Enclosure a, Enclosure p, bool isInteger)
    {
        if (p.Exact is { } exponent)
        {
            if (exponent.IsInteger && Rational.Abs(exponent) < 2000)
                return Power(a, (int)exponent.Numerator);
            return FractionalPower(a, exponent);
        }

        if (a.IsNegative || (!a.IsNeverFinite && a.Lower < 0 && isInteger))
        {
            if (!isInteger)
                return Enclosure.Unknown;
            var size = Exp(p * Log(Abs(a)));
            return size.IsNeverFinite ? size : Enclosure.Between(-size.Upper, size.Upper, size.Beyond, false);
        }

        var result = Exp(p * Log(a));
        if (!a.HasZero)
            return result;

        // 0^p is 0 or 1 or infinite by the sign of p, whatever p·log 0 says.
        return Enclosure.Between(
            Math.Min(0, result.Lower),
            Math.Max(1, double.IsNaN(result.Upper) ? double.PositiveInfinity : result.Upper),
            result.Beyond | a.Beyond | p.Beyond | (p.Lower < 0 ? Beyond.PositiveInfinity : Beyond.None),
            result.IsContinuous && p.Lower > 0);
    }

    public static Enclosure Abs(Enclosure a)
    {
        var beyond = (a.Beyond & Beyond.Undefined) | (a.May(Beyond.Infinity) ? Beyond.PositiveInfinity : Beyond.None);
        if (a.Exact is { } exact)
            return Enclosure.Of(Rational.Abs(exact));
        if (a.IsNeverFinite)
            return Enclosure.Never(beyond);
        var upper = Math.Max(-a.Lower, a.Upper);
        return Enclosure.Between(a.HasZero ? 0 : Math.Min(Math.Abs(a.Lower), Math.Abs(a.Upper)), upper, beyond, a.IsContinuous);
    }

    public static Enclosure Min(Enclosure a, Enclosure b)
    {
        if (a.Exact is { } first && b.Exact is { } second)
            return first < second ? a : b;
        var beyond = ((a.Beyond | b.Beyond) & (Beyond.Undefined | Beyond.NegativeInfinity)) | (a.Beyond & b.Beyond & Beyond.PositiveInfinity);
        if (a.IsNegativeInfinity || b.IsNegativeInfinity)
            return Enclosure.Never(beyond);
        var lower = Math.Min(a.Lower, b.Lower);
        var upper = b.May(Beyond.PositiveInfinity) || b.IsNeverFinite ? a.Upper
            : a.May(Beyond.PositiveInfinity) || a.IsNeverFinite ? b.Upper : Math.Min(a.Upper, b.Upper);
        if (a.May(Beyond.PositiveInfinity) && b.May(Beyond.PositiveInfinity))
            upper = Math.Max(a.Upper, b.Upper);
        if (upper < lower)
            return Enclosure.Never(beyond);
        return Enclosure.Between(lower, upper, beyond, a.IsContinuous && b.IsContinuous);
    }

    public static Enclosure Max(Enclosure a, Enclosure b) => -Min(-a, -b);

    public static Enclosure Cos(Enclosure a) => Wave(a, 0, Math.Cos, Rational.One);

    public static Enclosure Sin(Enclosure a) => Wave(a, 0.25, Math.Sin, Rational.Zero);

    /// <summary>log |Γ|, infinite at 0, −1, −2, …</summary>
    public static Enclosure LogGamma(Enclosure a)
    {
        if (a.Exact is { IsInteger: true, Sign: <= 0 })
            return Enclosure.Never(Beyond.PositiveInfinity);
        if (a.Exact is { } exact && (exact == Rational.One || exact == 2))
            return Enclosure.Zero;
        var beyond = a.Beyond & (Beyond.Undefined | Beyond.PositiveInfinity);
        if (a.May(Beyond.NegativeInfinity))
            beyond |= Beyond.Undefined | Beyond.PositiveInfinity;
        if (a.IsNeverFinite)
            return Enclosure.Never(beyond);
        if (a.Lower <= 0)
        {
            var pole = Math.Floor(Math.Min(a.Upper, 0)) >= a.Lower;
            return Enclosure.Between(double.NegativeInfinity, double.PositiveInfinity, beyond | (pole ? Beyond.PositiveInfinity : Beyond.None), a.IsContinuous && !pole);
        }

        var (atLower, atUpper) = (GammaFunctions.LogGamma(a.Lower), GammaFunctions.LogGamma(a.Upper));
        var least = a.Lower <= LogGammaMinimumAt && a.Upper >= LogGammaMinimumAt ? LogGammaMinimum : Math.Min(atLower, atUpper);
        var greatest = Math.Max(atLower, atUpper);
        return Enclosure.Between(least - Slack(least), greatest + Slack(greatest), beyond, a.IsContinuous);
    }

    public static Enclosure Digamma(Enclosure a)
    {
        if (a.Exact is { IsInteger: true, Sign: <= 0 })
            return Enclosure.Never(Beyond.Anything);
        var beyond = a.Beyond & (Beyond.Undefined | Beyond.PositiveInfinity);
        if (a.May(Beyond.NegativeInfinity))
            beyond |= Beyond.Undefined;
        if (a.IsNeverFinite)
            return Enclosure.Never(beyond);
        if (a.Lower <= 0)
            return Enclosure.Between(double.NegativeInfinity, double.PositiveInfinity, beyond | Beyond.Anything, false);
        var (lower, upper) = (GammaFunctions.Digamma(a.Lower), GammaFunctions.Digamma(a.Upper));
        return Enclosure.Between(lower - Slack(lower), upper + Slack(upper), beyond, a.IsContinuous);
    }

    private static Enclosure FractionalPower(Enclosure a, Rational exponent)
    {
        if (a.Exact is { Sign: > 0 } exact && exponent.Denominator < 60 && Rational.Abs(exponent) < 60
            && Rationals.Root(exact, (int)exponent.Denominator) is { } root)
        {
            return Enclosure.Of(Rational.Pow(root, (int)exponent.Numerator));
        }

        if (exponent.Sign < 0)
            return Reciprocal(FractionalPower(a, -exponent));
        var beyond = a.Beyond & (Beyond.Undefined | Beyond.PositiveInfinity);
        if (a.May(Beyond.NegativeInfinity) || (!a.IsNeverFinite && a.Lower < 0))
            beyond |= Beyond.Undefined;
        if (a.IsNeverFinite || a.Upper < 0)
            return Enclosure.Never(beyond);
        if (a.IsZero)
            return Enclosure.Zero;
        var power = exponent.ToDouble();
        return Enclosure.Between(
            Math.Max(0, Doubles.SafelyBelow(Doubles.SafelyBelow(Math.Pow(Math.Max(0, a.Lower), power)))),
            Doubles.SafelyAbove(Doubles.SafelyAbove(Math.Pow(a.Upper, power))),
            beyond,
            a.IsContinuous);
    }

    // cos 2π(t − shift): greatest at whole t − shift, least halfway between. A turn that is met up to rounding counts as met.
    private static Enclosure Wave(Enclosure a, double shift, Func<double, double> wave, Rational atZero)
    {
        if (a.IsZero)
            return Enclosure.Of(atZero);
        var beyond = a.Beyond == Beyond.None ? Beyond.None : Beyond.Undefined;
        if (a.IsNeverFinite)
            return Enclosure.Never(beyond);
        if (!(a.Lower > -LargestAngle && a.Upper < LargestAngle))
            return Enclosure.Between(-1, 1, beyond, a.IsContinuous);
        const double Slack = 1e-9;
        var low = (a.Lower / (2 * Math.PI)) - shift - Slack;
        var high = (a.Upper / (2 * Math.PI)) - shift + Slack;
        var (first, last) = (wave(a.Lower), wave(a.Upper));
        return Enclosure.Between(
            Math.Ceiling(low - 0.5) <= high - 0.5 ? -1 : Math.Max(-1, Math.Min(first, last) - 1e-15),
            Math.Ceiling(low) <= high ? 1 : Math.Min(1, Math.Max(first, last) + 1e-15),
            beyond,
            a.IsContinuous);
    }

    private static double Slack(double value) => double.IsInfinity(value) ? 0 : 1e-12 * (1 + Math.Abs(value));
}
