using System;

namespace FamilyGen.Generator.Algebra;

/// <summary>An interval that surely contains the values of a formula. Open ends are never taken on.</summary>
internal readonly record struct Range(double Lower, bool LowerOpen, double Upper, bool UpperOpen)
{
    public static Range Line { get; } = new(double.NegativeInfinity, true, double.PositiveInfinity, true);

    public static Range Positive { get; } = new(0, true, double.PositiveInfinity, true);

    public static Range NonNegative { get; } = new(0, false, double.PositiveInfinity, true);

    public bool IsPositive => Lower > 0 || (Lower == 0 && LowerOpen);

    public bool IsNegative => Upper < 0 || (Upper == 0 && UpperOpen);

    public bool IsNonNegative => Lower >= 0;

    public bool IsNonPositive => Upper <= 0;

    public bool IsFinite => !double.IsInfinity(Lower) && !double.IsInfinity(Upper);

    public static Range At(double value) => double.IsNaN(value) ? Line : new(value, double.IsInfinity(value), value, double.IsInfinity(value));

    public static Range operator +(Range a, Range b) => Checked(a.Lower + b.Lower, a.LowerOpen || b.LowerOpen, a.Upper + b.Upper, a.UpperOpen || b.UpperOpen);

    public static Range operator -(Range a) => new(-a.Upper, a.UpperOpen, -a.Lower, a.LowerOpen);

    public static Range operator *(Range a, Range b)
    {
        var corners = new[]
        {
            Corner(a.Lower, a.LowerOpen, b.Lower, b.LowerOpen),
            Corner(a.Lower, a.LowerOpen, b.Upper, b.UpperOpen),
            Corner(a.Upper, a.UpperOpen, b.Lower, b.LowerOpen),
            Corner(a.Upper, a.UpperOpen, b.Upper, b.UpperOpen),
        };
        var lower = corners[0];
        var upper = corners[0];
        foreach (var corner in corners)
        {
            if (corner.Value < lower.Value || (corner.Value == lower.Value && !corner.Open))
                lower = corner;
            if (corner.Value > upper.Value || (corner.Value == upper.Value && !corner.Open))
                upper = corner;
        }

        return Checked(lower.Value, lower.Open, upper.Value, upper.Open);
    }

    /// <summary>The range of a function that rises everywhere.</summary>
    public Range Map(Func<double, double> rising) => Checked(rising(Lower), LowerOpen, rising(Upper), UpperOpen);

    /// <summary>The range of |a|.</summary>
    public Range Abs() =>
        Lower >= 0 ? this
        : Upper <= 0 ? -this
        : -Lower > Upper ? new(0, false, -Lower, LowerOpen) : new(0, false, Upper, UpperOpen);

    /// <summary>The smallest interval around both.</summary>
    public Range Join(Range other)
    {
        var lower = Lower < other.Lower || (Lower == other.Lower && !LowerOpen) ? (Lower, LowerOpen) : (other.Lower, other.LowerOpen);
        var upper = Upper > other.Upper || (Upper == other.Upper && !UpperOpen) ? (Upper, UpperOpen) : (other.Upper, other.UpperOpen);
        return new(lower.Item1, lower.Item2, upper.Item1, upper.Item2);
    }

    /// <summary>The range of aⁿ.</summary>
    public Range Power(int n)
    {
        if (n == 0)
            return At(1);
        if (n < 0)
        {
            var positive = Power(-n);
            if (positive.IsPositive || positive.IsNegative)
                return Checked(1 / positive.Upper, positive.UpperOpen, 1 / positive.Lower, positive.LowerOpen || positive.Lower == 0);
            return positive.IsNonNegative ? Positive : Line;
        }

        return n % 2 == 0 ? Abs().Map(v => Math.Pow(v, n)) : Map(v => Math.Pow(v, n));
    }

    private static (double Value, bool Open) Corner(double a, bool aOpen, double b, bool bOpen)
    {
        // A zero that is taken on makes the product exactly zero, however the other end behaves.
        if (a == 0 || b == 0)
            return (0, (a != 0 || aOpen) && (b != 0 || bOpen));
        return (a * b, aOpen || bOpen);
    }

    private static Range Checked(double lower, bool lowerOpen, double upper, bool upperOpen) => new(
        double.IsNaN(lower) ? double.NegativeInfinity : lower,
        lowerOpen || double.IsNaN(lower) || double.IsInfinity(lower),
        double.IsNaN(upper) ? double.PositiveInfinity : upper,
        upperOpen || double.IsNaN(upper) || double.IsInfinity(upper));
}
