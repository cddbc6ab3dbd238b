using System;
using System.Collections.Generic;
using System.Collections.Immutable;

namespace FamilyGen.Kernels;

/// <summary>The support of a kernel with all that the partition must respect on it.</summary>
public sealed record Domain
{
    /// <summary>Whether the support is a set of integers (counting measure) rather than an interval (Lebesgue measure).</summary>
    public required bool IsLattice { get; init; }

    /// <summary>Lower end, possibly −∞.</summary>
    public required double Lower { get; init; }

    /// <summary>Upper end, possibly +∞.</summary>
    public required double Upper { get; init; }

    /// <summary>Whether an observation may equal the lower end (always on a lattice).</summary>
    public bool LowerIncluded { get; init; }

    /// <summary>Whether an observation may equal the upper end (always on a lattice).</summary>
    public bool UpperIncluded { get; init; }

    /// <summary>Whether the two ends are one point of a circle.</summary>
    public bool IsCircle { get; init; }

    /// <summary>Whether the exponent is unbounded (a logarithm, a negative power) at the finite lower end.</summary>
    public bool LowerSingular { get; init; }

    /// <summary>Whether the exponent is unbounded at the finite upper end.</summary>
    public bool UpperSingular { get; init; }

    /// <summary>Points inside the support at which the exponent is not smooth, in ascending order. On a lattice a
    /// breakpoint b separates the integers below b from those at and above it.</summary>
    public ImmutableArray<double> Breakpoints { get; init; } = [];

    /// <summary>Points of an interval that carry probability of their own.</summary>
    public ImmutableArray<double> Masses { get; init; } = [];

    /// <summary>On a lattice: the exponent is smooth along each residue class of this modulus.</summary>
    public long Period { get; init; } = 1;

    /// <summary>Whether the exponent contains a function that could not be read: modes cannot then be proved complete,
    /// and a lattice is summed term by term.</summary>
    public bool IsOpaque { get; init; }

    /// <summary>The domain of a range of counts.</summary>
    public static Domain Of(CountRange range) => new()
    {
        IsLattice = true,
        Lower = range.Min ?? double.NegativeInfinity,
        Upper = range.Max ?? double.PositiveInfinity,
        LowerIncluded = range.Min is not null,
        UpperIncluded = range.Max is not null,
    };

    /// <summary>The domain of an interval.</summary>
    public static Domain Of(Interval range) => new()
    {
        IsLattice = false,
        Lower = range.Lower,
        Upper = range.Upper,
        LowerIncluded = range.LowerIncluded,
        UpperIncluded = range.UpperIncluded,
        IsCircle = range.IsCircle,
        Masses = range.Masses,
    };

    /// <summary>Breakpoints in the ascending order that the engine expects, each once.</summary>
    public static ImmutableArray<double> Ascending(params ReadOnlySpan<double> points)
    {
        var sorted = new SortedSet<double>();
        foreach (var point in points)
            sorted.Add(point);
        return [.. sorted];
    }

    /// <summary>The point at an observation, as its own reference point.</summary>
    public Point At(double x) => new()
    {
        X = x,
        LogAboveLower = IsLattice ? double.NaN : EndDistance.LogAbove(x, Lower, Upper),
        LogBelowUpper = IsLattice ? double.NaN : EndDistance.LogBelow(x, Lower, Upper),
        Integer = IsLattice ? (long)x : 0,
    };
}
