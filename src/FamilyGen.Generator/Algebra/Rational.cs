using System;
using System.Globalization;
using System.Numerics;

namespace FamilyGen.Generator.Algebra;

/// <summary>An exact fraction in lowest terms with a positive denominator.</summary>
internal readonly struct Rational : IEquatable<Rational>, IComparable<Rational>
{
    private readonly BigInteger _denominatorLessOne;

    public Rational(BigInteger numerator, BigInteger denominator)
    {
        if (denominator.IsZero)
            throw new DivideByZeroException();
        var divisor = BigInteger.GreatestCommonDivisor(numerator, denominator);
        if (denominator.Sign < 0)
            divisor = -divisor;
        Numerator = numerator / divisor;
        _denominatorLessOne = (denominator / divisor) - 1;
    }

    public BigInteger Numerator { get; }

    public BigInteger Denominator => _denominatorLessOne + 1;

    public bool IsInteger => _denominatorLessOne.IsZero;

    public bool IsZero => Numerator.IsZero;

    public int Sign => Numerator.Sign;

    public static Rational Zero => default;

    public static Rational One => new(1, 1);

    public static implicit operator Rational(int value) => new(value, 1);

    public static implicit operator Rational(long value) => new(value, 1);

    public static Rational operator +(Rational a, Rational b) => new((a.Numerator * b.Denominator) + (b.Numerator * a.Denominator), a.Denominator * b.Denominator);

    public static Rational operator -(Rational a, Rational b) => a + (-b);

    public static Rational operator -(Rational a) => new(-a.Numerator, a.Denominator);

    public static Rational operator *(Rational a, Rational b) => new(a.Numerator * b.Numerator, a.Denominator * b.Denominator);

    public static Rational operator /(Rational a, Rational b) => new(a.Numerator * b.Denominator, a.Denominator * b.Numerator);

    public static bool operator ==(Rational a, Rational b) => a.Equals(b);

    public static bool operator !=(Rational a, Rational b) => !a.Equals(b);

    public static bool operator <(Rational a, Rational b) => a.CompareTo(b) < 0;

    public static bool operator >(Rational a, Rational b) => a.CompareTo(b) > 0;

    public static Rational Abs(Rational a) => a.Sign < 0 ? -a : a;

    /// <summary>aⁿ for an integer n; a ≠ 0 when n is negative.</summary>
    public static Rational Pow(Rational a, int n) => n >= 0
        ? new(BigInteger.Pow(a.Numerator, n), BigInteger.Pow(a.Denominator, n))
        : new(BigInteger.Pow(a.Denominator, -n), BigInteger.Pow(a.Numerator, -n));

    /// <summary>The nearest double, ties to even. (The conversion of a BigInteger truncates.)</summary>
    public double ToDouble()
    {
        if (IsZero)
            return 0;

        // A quotient of 56 or 57 bits, fewer where the result is subnormal; what is left of the division only breaks ties.
        var scale = Math.Max(BitLength(Numerator) - BitLength(Denominator) - 56, -1076);
        var quotient = scale >= 0
            ? BigInteger.DivRem(BigInteger.Abs(Numerator), Denominator << scale, out var rest)
            : BigInteger.DivRem(BigInteger.Abs(Numerator) << -scale, Denominator, out rest);
        var drop = Math.Max(BitLength(quotient) - 53, -1074 - scale);
        var mantissa = quotient >> drop;
        var dropped = quotient - (mantissa << drop);
        var half = BigInteger.One << (drop - 1);
        if (dropped > half || (dropped == half && (!rest.IsZero || !mantissa.IsEven)))
            mantissa += 1;

        // In two steps, since a power of two beyond the largest double would overflow.
        var exponent = scale + drop;
        var first = Math.Min(exponent, 900);
        return Numerator.Sign * (double)(ulong)mantissa * Math.Pow(2, first) * Math.Pow(2, exponent - first);
    }

    /// <summary>The fraction that a decimal literal such as 2.5 or 1e-3 denotes.</summary>
    public static Rational Parse(string text)
    {
        var lower = text.ToLowerInvariant();
        var exponent = 0;
        var e = lower.IndexOf('e');
        if (e >= 0)
        {
            exponent = int.Parse(lower.Substring(e + 1), NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture);
            lower = lower.Substring(0, e);
        }

        var point = lower.IndexOf('.');
        if (point >= 0)
        {
            exponent -= lower.Length - point - 1;
            lower = lower.Remove(point, 1);
        }

        var digits = BigInteger.Parse(lower, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture);
        return exponent >= 0 ? new(digits * BigInteger.Pow(10, exponent), 1) : new(digits, BigInteger.Pow(10, -exponent));
    }

    public int CompareTo(Rational other) => (Numerator * other.Denominator).CompareTo(other.Numerator * Denominator);

    public bool Equals(Rational other) => Numerator == other.Numerator && _denominatorLessOne == other._denominatorLessOne;

    public override bool Equals(object? obj) => obj is Rational other && Equals(other);

    public override int GetHashCode() => unchecked((Numerator.GetHashCode() * 397) ^ _denominatorLessOne.GetHashCode());

    public override string ToString() => IsInteger
        ? Numerator.ToString(CultureInfo.InvariantCulture)
        : Numerator.ToString(CultureInfo.InvariantCulture) + "/" + Denominator.ToString(CultureInfo.InvariantCulture);

    private static int BitLength(BigInteger value)
    {
        var bytes = BigInteger.Abs(value).ToByteArray();
        var bits = (bytes.Length - 1) * 8;
        for (int top = bytes[bytes.Length - 1]; top > 0; top >>= 1)
            bits++;
        return bits;
    }
}
