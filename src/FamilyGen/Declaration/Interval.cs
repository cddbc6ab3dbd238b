using System;
using System.Collections.Immutable;
using System.Globalization;

namespace FamilyGen;

/// <summary>A support on the real line. Ends are open unless closed by <see cref="IncludingLower"/> or
/// <see cref="IncludingUpper"/>; a closed end only matters for an observation recorded exactly there.</summary>
public sealed record Interval
{
    private Interval(double lower, double upper) => (Lower, Upper) = (lower, upper);

    /// <summary>The lower end, −∞ when there is none.</summary>
    public double Lower { get; }

    /// <summary>The upper end, +∞ when there is none.</summary>
    public double Upper { get; }

    /// <summary>Whether an observation may equal the lower end.</summary>
    public bool LowerIncluded { get; private init; }

    /// <summary>Whether an observation may equal the upper end.</summary>
    public bool UpperIncluded { get; private init; }

    /// <summary>Whether the interval is a circle, so that upper and lower end are the same point.</summary>
    public bool IsCircle { get; private init; }

    /// <summary>Points that carry probability of their own, in the order in which they were declared.</summary>
    public ImmutableArray<double> Masses { get; private init; } = [];

    /// <summary>The whole real line.</summary>
    public static Interval RealLine { get; } = new(double.NegativeInfinity, double.PositiveInfinity);

    /// <summary>The points above <paramref name="lower"/>.</summary>
    public static Interval Above(double lower) => new(lower, double.PositiveInfinity);

    /// <summary>The points below <paramref name="upper"/>.</summary>
    public static Interval Below(double upper) => new(double.NegativeInfinity, upper);

    /// <summary>The points between <paramref name="lower"/> and <paramref name="upper"/>.</summary>
    public static Interval Between(double lower, double upper) => new(lower, upper);

    /// <summary>A circle of the given period: the points 0 ≤ x &lt; period.</summary>
    public static Interval Circle(double period) => new(0, period) { LowerIncluded = true, IsCircle = true };

    /// <summary>The same interval with its lower end closed.</summary>
    public Interval IncludingLower() => this with { LowerIncluded = true };

    /// <summary>The same interval with its upper end closed.</summary>
    public Interval IncludingUpper() => this with { UpperIncluded = true };

    /// <summary>The same interval with a point that carries probability of its own; the density there is that probability.</summary>
    public Interval WithMassAt(double point) => this with { Masses = Masses.Add(point) };

    /// <summary>Whether the point lies in the interval or is one of its masses.</summary>
    public bool Contains(double x) =>
        (x > Lower && x < Upper) || (LowerIncluded && x == Lower) || (UpperIncluded && x == Upper) || Masses.Contains(x);

    /// <inheritdoc/>
    public override string ToString() => string.Create(CultureInfo.InvariantCulture,
        $"{(LowerIncluded ? '[' : '(')}{Lower}, {Upper}{(UpperIncluded ? ']' : ')')}");
}
