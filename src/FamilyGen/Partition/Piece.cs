using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Kernels;

namespace FamilyGen.Partition;

/// <summary>A part of a range on which the exponent is smooth: an interval between breakpoints, or the integers of one
/// residue class between them.</summary>
/// <param name="Lower">The lower end; on a lattice the first point, or −∞.</param>
/// <param name="Upper">The upper end; on a lattice the last point, or +∞.</param>
/// <param name="Integer">On a lattice a point of the piece, by which conditions on residues are decided.</param>
/// <param name="Step">On a lattice the distance between neighbours; 0 on an interval.</param>
internal readonly record struct Piece(double Lower, double Upper, long Integer, double Step)
{
    /// <summary>The least observation by which conditions are decided. A condition may count a breakpoint to either side, and
    /// a point that carries probability of its own stands for itself: they are looked at from one double away.</summary>
    public double InnerLower { get; init; } = double.NegativeInfinity;

    /// <summary>The greatest observation by which conditions are decided.</summary>
    public double InnerUpper { get; init; } = double.PositiveInfinity;

    /// <summary>The number of lattice points, possibly infinite.</summary>
    public double Count => (Upper - Lower) / Step + 1;

    /// <summary>The pieces of a domain inside a range, in ascending order and class by class.</summary>
    public static List<Piece> Of(Domain domain, SubRange range)
    {
        var pieces = new List<Piece>();
        if (domain.IsLattice)
            AddLattice(domain, range, pieces);
        else
            AddIntervals(domain, range, pieces);
        return pieces;
    }

    private static void AddIntervals(Domain domain, SubRange range, List<Piece> pieces)
    {
        var lower = Math.Max(domain.Lower, range.Lower);
        var upper = Math.Min(domain.Upper, range.Upper);
        var inner = double.NegativeInfinity;
        foreach (var point in domain.Breakpoints.Union(domain.Masses).Order())
        {
            if (point < lower || point > upper)
                continue;
            if (point > lower)
                pieces.Add(new(lower, point, 0, 0) { InnerLower = inner, InnerUpper = Math.BitDecrement(point) });
            (lower, inner) = (point, Math.BitIncrement(point));
        }

        if (lower < upper)
            pieces.Add(new(lower, upper, 0, 0) { InnerLower = inner });
    }

    private static void AddLattice(Domain domain, SubRange range, List<Piece> pieces)
    {
        var lower = Math.Max(Math.Ceiling(domain.Lower), First(range));
        var upper = Math.Min(Math.Floor(domain.Upper), Last(range));
        foreach (var point in domain.Breakpoints)
        {
            var start = Math.Ceiling(point);
            if (start <= lower || start > upper)
                continue;
            AddClasses(lower, start - 1, domain.Period, pieces);
            lower = start;
        }

        AddClasses(lower, upper, domain.Period, pieces);
    }

    private static void AddClasses(double lower, double upper, long period, List<Piece> pieces)
    {
        if (!(lower <= upper))
            return;
        var anchor = double.IsFinite(lower) ? lower : double.IsFinite(upper) ? upper : 0;
        for (long i = 0; i < period; i++)
        {
            // counted up from a finite lower end, else down from the upper one
            var member = double.IsFinite(lower) ? anchor + i : anchor - i;
            var first = double.IsFinite(lower) ? member : lower;
            var last = double.IsInfinity(upper) ? upper
                : double.IsFinite(lower) ? member + Math.Floor((upper - member) / period) * period : member;
            if (first <= last)
                pieces.Add(new(first, last, Frame.ToInteger(member), period));
        }
    }

    private static double First(SubRange range)
    {
        var first = Math.Ceiling(range.Lower);
        return first == range.Lower && !range.LowerIncluded ? first + 1 : first;
    }

    private static double Last(SubRange range)
    {
        var last = Math.Floor(range.Upper);
        return last == range.Upper && !range.UpperIncluded ? last - 1 : last;
    }
}
