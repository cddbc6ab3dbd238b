using System;
using System.Collections.Generic;
using FamilyGen.Kernels;

namespace FamilyGen.Partition;

/// <summary>Finds every mode of the integrand on a piece of the support and divides the piece between them.</summary>
internal readonly ref struct ModeSearch<TKernel>
    where TKernel : struct, IKernel
{
    // A short run of integers is summed as it stands, and needs only its largest term.
    private const double ShortRun = 64;

    private const int MostModes = 1000;
    private const double Reach = 64;

    private readonly TKernel _kernel;
    private readonly ReadOnlySpan<double> _theta;
    private readonly Chart _chart;

    public ModeSearch(TKernel kernel, ReadOnlySpan<double> theta, Chart chart)
    {
        _kernel = kernel;
        _theta = theta;
        _chart = chart;
    }

    /// <summary>Adds the basins of a piece in ascending order; none where the base measure vanishes on all of it.</summary>
    /// <returns>Whether the modes are proved to be all there are.</returns>
    public bool Find(Piece piece, bool isOpaque, List<Basin> basins)
    {
        if (_chart.IsLattice && piece.Count <= ShortRun)
        {
            AddLargestTerm(piece, basins);
            return true;
        }

        var (from, to) = SearchEnds(piece);
        var field = FieldOn(piece, from, to);
        if (isOpaque || double.IsNaN(field.Slope(Inner(from, to, 0.37))) || double.IsNaN(field.Slope(Inner(from, to, 0.71))))
        {
            new HeightScan<TKernel>(field, _chart).Find(piece, from, to, basins);
            return false;
        }

        if (IsVoid(field, from, to))
            return true;
        var signs = SlopeSigns.Isolate(field, _chart.Kind, from, to, _chart.IsLattice ? piece.Step : 0, out var isProven);
        Divide(piece, field, signs, from, to, isProven, basins);
        return isProven;
    }

    private void Divide(Piece piece, in SlopeField<TKernel> field, List<SignedRange> signs, double from, double to, bool isProven, List<Basin> basins)
    {
        if (signs.Count > 2 * MostModes)
            throw new PartitionException($"The exponent has more than {MostModes} modes: it oscillates too often to be integrated.");
        var lower = piece.Lower;
        for (var i = 0; i <= signs.Count; i++)
        {
            // A mode lies between a rise, or the start, and the fall, or the end, that follows it.
            var rises = i > 0 && signs[i - 1].Sign > 0;
            var falls = i < signs.Count && signs[i].Sign < 0;
            if (!((i == 0 || rises) && (i == signs.Count || falls)))
                continue;
            var mode = Root(field, i == 0 ? from : signs[i - 1].To, i == signs.Count ? to : signs[i].From, 1);
            var isLast = i + 1 >= signs.Count;
            var upper = piece.Upper;
            if (!isLast)
                upper = ObservationAt(Root(field, signs[i].To, signs[i + 1].From, -1));
            AddBasin(piece, field, mode, lower, upper, isLast, isProven, basins);
            lower = upper;
        }
    }

    private void AddBasin(Piece piece, in SlopeField<TKernel> field, double mode, double lower, double upper, bool isLast, bool isProven, List<Basin> basins)
    {
        if (!_chart.IsLattice)
        {
            var m = ModePoint(piece, mode);
            basins.Add(new(piece, m, lower, upper, isProven));
            return;
        }

        // The first basin starts at the piece's first point, the others just after the point that ended the one before.
        var first = basins.Count > 0 && basins[^1].Piece == piece ? basins[^1].Upper + piece.Step : lower;
        var last = isLast ? upper : Member(piece, upper);
        if (first > last)
            return;
        var below = Math.Clamp(Member(piece, mode), first, last);
        var above = Math.Clamp(below + piece.Step, first, last);
        var best = above != below && field.Height(above) > field.Height(below) ? above : below;
        basins.Add(new(piece, _chart.Reference(best), first, last, isProven));
    }

    private Point ModePoint(Piece piece, double mode)
    {
        var (lower, upper) = (Math.Max(piece.Lower, piece.InnerLower), Math.Min(piece.Upper, piece.InnerUpper));
        if (mode <= _chart.CoordinateOf(lower))
            return _chart.Reference(lower);
        if (mode >= _chart.CoordinateOf(upper))
            return _chart.Reference(upper);
        var m = _chart.ReferenceNear(mode);
        return m.X < lower ? _chart.Reference(lower) : m.X > upper ? _chart.Reference(upper) : m;
    }

    // The member of the piece's residue class at or below x.
    private static double Member(Piece piece, double x)
    {
        var anchor = double.IsFinite(piece.Lower) ? piece.Lower : double.IsFinite(piece.Upper) ? piece.Upper : piece.Integer;
        return anchor + Math.Floor((x - anchor) / piece.Step) * piece.Step;
    }

    private double ObservationAt(double u) => _chart.Kind == Coordinate.Identity ? u : _chart.ReferenceNear(u).X;

    private (double From, double To) SearchEnds(Piece piece)
    {
        var (least, greatest) = _chart.SearchRange;
        var from = _chart.CoordinateOf(piece.Lower);
        var to = _chart.CoordinateOf(piece.Upper);

        // a range that lies closer to an end than doubles reach is searched as far again
        return (Math.Max(from, Math.Min(least, to - Reach)), Math.Min(to, Math.Max(greatest, from + Reach)));
    }

    private SlopeField<TKernel> FieldOn(Piece piece, double from, double to)
    {
        var inside = _chart.IsLattice
            ? new Point { X = piece.Integer }
            : _chart.ReferenceNear(Inner(from, to, 0.5));
        return new(_kernel, _theta, _chart, piece, inside with { Integer = piece.Integer });
    }

    private static double Inner(double from, double to, double share)
    {
        if (from <= -1e300 || to >= 1e300)
            return from <= -1e300 ? (to >= 1e300 ? share - 0.5 : to - share) : from + share;
        return from + (to - from) * share;
    }

    private static bool IsVoid(in SlopeField<TKernel> field, double from, double to)
    {
        for (var i = 1; i <= 7; i++)
        {
            if (!double.IsNegativeInfinity(field.Height(Inner(from, to, i / 8.0))))
                return false;
        }

        return true;
    }

    private void AddLargestTerm(Piece piece, List<Basin> basins)
    {
        var field = new SlopeField<TKernel>(_kernel, _theta, _chart, piece, new Point { X = piece.Integer, Integer = piece.Integer });
        var (best, height) = (double.NaN, double.NegativeInfinity);
        for (var x = piece.Lower; x <= piece.Upper; x += piece.Step)
        {
            var value = field.Height(x);
            if (value > height)
                (best, height) = (x, value);
        }

        if (!double.IsNaN(best))
            basins.Add(new(piece, _chart.Reference(best), piece.Lower, piece.Upper, true));
    }

    /// <summary>The coordinate in a range at which the slope, times the direction, turns from positive to negative.</summary>
    private double Root(in SlopeField<TKernel> field, double from, double to, double direction)
    {
        var (low, high) = (from, to);
        var atLow = direction * field.Slope(low);
        var atHigh = direction * field.Slope(high);
        if (!(atLow > 0))
            return low;
        if (!(atHigh < 0))
            return high;
        for (var step = 0; step < 200; step++)
        {
            // regula falsi, weighted against a stalling end (Illinois; Dowell and Jarratt 1971), with bisection in between
            var next = step % 4 == 3 || double.IsInfinity(atLow) || double.IsInfinity(atHigh)
                ? low + (high - low) / 2
                : low + (high - low) * (atLow / (atLow - atHigh));
            if (!(next > low && next < high))
                next = low + (high - low) / 2;
            if (!(next > low && next < high) || (_chart.IsLattice && high - low < 0.25))
                return next;
            var value = direction * field.Slope(next);
            if (value == 0 || Math.Abs(value) * (high - low) < 1e-7)
                return next;
            if (value > 0)
            {
                (low, atLow) = (next, value);
                atHigh /= 2;
            }
            else
            {
                (high, atHigh) = (next, value);
                atLow /= 2;
            }
        }

        return low;
    }
}
