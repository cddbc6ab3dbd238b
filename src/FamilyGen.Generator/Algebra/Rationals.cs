using System.Numerics;

namespace FamilyGen.Generator.Algebra;

/// <summary>Powers, roots and common divisors of exact fractions.</summary>
internal static class Rationals
{
    public static Rational Power(Rational value, int exponent)
    {
        if (exponent < 0)
            return Rational.One / Power(value, -exponent);
        return new Rational(BigInteger.Pow(value.Numerator, exponent), BigInteger.Pow(value.Denominator, exponent));
    }

    /// <summary>Whether an integer power of a fraction would have more digits than anybody wants to carry.</summary>
    public static bool IsTooLarge(Rational value, Rational exponent) =>
        Abs(exponent) > 1000 || (value.Numerator.ToByteArray().Length + value.Denominator.ToByteArray().Length) * Abs(exponent).ToDouble() > 400;

    public static Rational Abs(Rational value) => value.Sign < 0 ? -value : value;

    /// <summary>The greatest g ≥ 0 of which both are integer multiples.</summary>
    public static Rational CommonDivisor(Rational a, Rational b) => new(
        BigInteger.GreatestCommonDivisor(a.Numerator * b.Denominator, b.Numerator * a.Denominator), a.Denominator * b.Denominator);

    /// <summary>The exact root of the given degree, where there is one.</summary>
    public static Rational? Root(Rational value, int degree)
    {
        if (value.Sign < 0)
            return null;
        return Root(value.Numerator, degree) is { } numerator && Root(value.Denominator, degree) is { } denominator
            ? new Rational(numerator, denominator)
            : null;
    }

    private static BigInteger? Root(BigInteger value, int degree)
    {
        if (value > new BigInteger(1e15))
            return null;
        var root = new BigInteger(System.Math.Round(System.Math.Pow((double)value, 1.0 / degree)));
        return BigInteger.Pow(root, degree) == value ? root : null;
    }
}
