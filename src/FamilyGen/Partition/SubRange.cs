using System;
using System.Globalization;

namespace FamilyGen.Partition;

/// <summary>A part of a support, from one end to the other, each end open or closed. On an interval a closed end matters
/// only where a point carries probability of its own.</summary>
/// <param name="Lower">Lower end, possibly −∞.</param>
/// <param name="Upper">Upper end, possibly +∞.</param>
/// <param name="LowerIncluded">Whether the lower end belongs to the range.</param>
/// <param name="UpperIncluded">Whether the upper end belongs to the range.</param>
public readonly record struct SubRange(double Lower, double Upper, bool LowerIncluded, bool UpperIncluded)
{
    /// <summary>Everything.</summary>
    public static SubRange Whole { get; } = new(double.NegativeInfinity, double.PositiveInfinity, true, true);

    /// <summary>The points above x: (x, ∞).</summary>
    public static SubRange Above(double x) => new(x, double.PositiveInfinity, false, true);

    /// <summary>The points from x on: [x, ∞).</summary>
    public static SubRange From(double x) => new(x, double.PositiveInfinity, true, true);

    /// <summary>The points below x: (−∞, x).</summary>
    public static SubRange Below(double x) => new(double.NegativeInfinity, x, true, false);

    /// <summary>The points up to x: (−∞, x].</summary>
    public static SubRange UpTo(double x) => new(double.NegativeInfinity, x, true, true);

    /// <summary>The points from lower to upper, both included.</summary>
    public static SubRange Between(double lower, double upper) => new(lower, upper, true, true);

    /// <summary>Whether the point lies in the range.</summary>
    public bool Contains(double x) =>
        (x > Lower || (LowerIncluded && x == Lower)) && (x < Upper || (UpperIncluded && x == Upper));

    /// <inheritdoc/>
    public override string ToString() => string.Create(CultureInfo.InvariantCulture,
        $"{(LowerIncluded ? '[' : '(')}{Lower}, {Upper}{(UpperIncluded ? ']' : ')')}");
}
