using System;

namespace FamilyGen.Generator.Algebra;

/// <summary>The neighbours of a double, for rounding outward.</summary>
internal static class Doubles
{
    /// <summary>The next double above; infinities stay.</summary>
    public static double Above(double value)
    {
        if (double.IsNaN(value) || double.IsPositiveInfinity(value))
            return value;
        if (value == 0)
            return double.Epsilon;
        var bits = BitConverter.DoubleToInt64Bits(value);
        return BitConverter.Int64BitsToDouble(value > 0 ? bits + 1 : bits - 1);
    }

    /// <summary>The next double below; infinities stay.</summary>
    public static double Below(double value) => -Above(-value);

    /// <summary>A bound above a value that a function of stated accuracy returned: a few units in the last place.</summary>
    public static double SafelyAbove(double value) => double.IsInfinity(value) ? value : Above(value + (Math.Abs(value) * 1e-15));

    public static double SafelyBelow(double value) => -SafelyAbove(-value);

    /// <summary>The decimal fraction by which a finite double is written.</summary>
    public static Rational ToRational(double value)
    {
        var text = value.ToString("R", System.Globalization.CultureInfo.InvariantCulture);
        return Rational.Parse(text);
    }
}
