using System;
using System.Globalization;
using System.Numerics;

namespace FamilyGen.Conformance.Subjects;

/// <summary>A decimal of 25 digits held as the nearest double and what that double leaves over, so that differences far
/// below one rounding are seen.</summary>
internal readonly record struct ReferenceNumber(double Nearest, double Rest)
{
    public static ReferenceNumber Parse(string text)
    {
        var nearest = double.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture);
        return double.IsFinite(nearest) ? new(nearest, Remainder(text, nearest)) : new(nearest, 0);
    }

    /// <summary>|value − this|, exact to rounding of the difference itself.</summary>
    public double DistanceTo(double value) =>
        double.IsInfinity(Nearest) ? (value == Nearest ? 0 : double.PositiveInfinity)
        : double.IsNaN(value) ? double.PositiveInfinity
        : Math.Abs(value - Nearest - Rest);

    private static double Remainder(string text, double nearest)
    {
        var (digits, tens) = Decimal(text);
        var bits = BitConverter.DoubleToInt64Bits(Math.Abs(nearest));
        var exponent = (int)(bits >> 52);
        BigInteger mantissa = (bits & ((1L << 52) - 1)) | (exponent == 0 ? 0 : 1L << 52);
        var twos = Math.Max(exponent, 1) - 1075;
        if (nearest < 0)
            mantissa = -mantissa;

        // digits·10^tens − mantissa·2^twos over one common denominator
        var numerator = digits * Power(10, tens) * Power(2, -twos) - mantissa * Power(2, twos) * Power(10, -tens);
        var denominator = Power(10, -tens) * Power(2, -twos);
        return Quotient(numerator, denominator);
    }

    private static BigInteger Power(int radix, int exponent) => exponent > 0 ? BigInteger.Pow(radix, exponent) : BigInteger.One;

    private static double Quotient(BigInteger numerator, BigInteger denominator)
    {
        if (numerator.IsZero)
            return 0;
        var shift = (int)(denominator.GetBitLength() - BigInteger.Abs(numerator).GetBitLength()) + 64;
        var scaled = shift > 0 ? (numerator << shift) / denominator : numerator / (denominator << -shift);
        return Math.ScaleB((double)scaled, -shift);
    }

    private static (BigInteger Digits, int Tens) Decimal(string text)
    {
        var parts = text.ToLowerInvariant().Split('e');
        var tens = parts.Length > 1 ? int.Parse(parts[1], CultureInfo.InvariantCulture) : 0;
        var point = parts[0].IndexOf('.', StringComparison.Ordinal);
        if (point >= 0)
            tens -= parts[0].Length - point - 1;
        return (BigInteger.Parse(parts[0].Replace(".", "", StringComparison.Ordinal), CultureInfo.InvariantCulture), tens);
    }
}
