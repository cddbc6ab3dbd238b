using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>Looks for an observation with a certain property, by bisection of the support.</summary>
internal sealed class SupportSearch(EffectiveSupport support)
{
    private const int MostRanges = 400;
    private const double Farthest = 1e15;
    private const double Finest = 1e-7;

    private static readonly Rational[] s_plain = new[] { "0", "1", "-1", "2", "-2", "0.5", "-0.5", "10", "-10" }.Select(Rational.Parse).ToArray();

    /// <summary>A point that certainly has the property; null where none was found.</summary>
    /// <param name="candidates">Points that are worth a try.</param>
    /// <param name="mayHold">Whether some point of a range may have the property: a range where none can is left out.</param>
    /// <param name="holds">Whether a point certainly has it. It lies inside the declared range.</param>
    /// <param name="crossing">A point inside the range where the property certainly holds because a continuous function
    /// vanishes there.</param>
    public Witness? Find(
        IEnumerable<Rational> candidates, Func<Enclosure, bool> mayHold, Func<Enclosure, bool> holds, Func<double, double, double?>? crossing = null)
    {
        var points = Ends().Concat(candidates).Concat(s_plain).Where(support.InRange).Distinct().ToList();
        foreach (var point in points)
        {
            if (holds(Enclosure.Of(point)))
                return new Witness(point, IsExact: true);
        }

        var ranges = new Queue<(double Lower, double Upper)>(Ranges(points));
        for (var i = 0; i < MostRanges && ranges.Count > 0; i++)
        {
            var (lower, upper) = ranges.Dequeue();
            var range = Enclosure.Between(lower, upper);
            if (support.In(range) == Presence.Out || !mayHold(range))
                continue;
            if (crossing?.Invoke(lower, upper) is { } root)
                return new Witness(Doubles.ToRational(root), IsExact: false);
            if (Middle(lower, upper) is not { } middle)
                continue;
            if (support.InRange(middle) && holds(Enclosure.Of(middle)))
                return new Witness(middle, IsExact: true);
            foreach (var part in Split(lower, upper, middle))
                ranges.Enqueue(part);
        }

        return null;
    }

    /// <summary>Whether it is certain that nothing can be observed at all.</summary>
    public bool IsNowhere()
    {
        if (!support.IsNumeric || support.Masses.Any(m => support.At(m) != Presence.Out))
            return false;
        var points = Ends().Concat(s_plain).Where(support.InRange).Distinct().ToList();
        if (points.Any(p => support.IsLattice && support.At(p) != Presence.Out))
            return false;
        var ranges = new Queue<(double Lower, double Upper)>(Ranges(points));
        for (var i = 0; i < MostRanges; i++)
        {
            if (ranges.Count == 0)
                return true;
            var (lower, upper) = ranges.Dequeue();
            var presence = support.In(lower == upper ? Enclosure.Of(Doubles.ToRational(lower)) : Enclosure.Between(lower, upper));
            if (presence == Presence.Out)
                continue;
            if (presence == Presence.In || Middle(lower, upper) is not { } middle)
                return false;
            foreach (var part in Split(lower, upper, middle))
                ranges.Enqueue(part);
            if (support.IsLattice && lower < upper)
                ranges.Enqueue((middle.ToDouble(), middle.ToDouble()));
        }

        return false;
    }

    private IEnumerable<Rational> Ends()
    {
        if (support.Lower is { } lower && support.LowerIncluded)
            yield return lower;
        if (support.Upper is { } upper && support.UpperIncluded)
            yield return upper;
        foreach (var mass in support.Masses)
            yield return mass;
    }

    // The support between the points that were tried already. Where an end is not known nothing can be said of what lies
    // between.
    private IEnumerable<(double Lower, double Upper)> Ranges(List<Rational> points)
    {
        if (!support.IsNumeric)
            yield break;
        var lower = support.Lower is { } l ? (support.LowerIncluded ? l.ToDouble() : Doubles.Above(l.ToDouble())) : double.NegativeInfinity;
        var upper = support.Upper is { } u ? (support.UpperIncluded ? u.ToDouble() : Doubles.Below(u.ToDouble())) : double.PositiveInfinity;
        if (support.IsLattice)
            (lower, upper) = (Math.Ceiling(lower), Math.Floor(upper));

        // On a lattice a point that was tried is in no range.
        var step = support.IsLattice ? 1 : 0;
        var from = lower;
        foreach (var point in points.Select(p => p.ToDouble()).Where(p => p >= lower && p <= upper).OrderBy(p => p))
        {
            if (point - step > from || (point - step == from && support.IsLattice))
                yield return (from, point - step);
            from = point + step;
        }

        if (upper > from || (upper == from && support.IsLattice))
            yield return (from, upper);
    }

    private IEnumerable<(double Lower, double Upper)> Split(double lower, double upper, Rational middle)
    {
        var at = middle.ToDouble();
        var step = support.IsLattice ? 1 : 0;
        if (at - step >= lower && (support.IsLattice || at > lower))
            yield return (lower, at - step);
        if (at + step <= upper && (support.IsLattice || at < upper))
            yield return (at + step, upper);
    }

    // A round number well inside the range; null where the range is too short, or too far out, to be looked at further.
    private Rational? Middle(double lower, double upper)
    {
        if (lower > Farthest || upper < -Farthest)
            return null;
        var center = double.IsInfinity(lower) && double.IsInfinity(upper) ? 0
            : double.IsInfinity(upper) ? (lower < 1 ? 2 : lower * 8)
            : double.IsInfinity(lower) ? (upper > -1 ? -2 : upper * 8)
            : lower > Finest * upper && upper > 16 * lower ? Math.Sqrt(lower) * Math.Sqrt(upper)
            : upper < Finest * lower && lower < 16 * upper ? -Math.Sqrt(-lower) * Math.Sqrt(-upper)
            : lower + ((upper - lower) / 2);
        if (support.IsLattice)
        {
            var integer = Math.Floor(center);
            return integer >= lower && integer <= upper ? Doubles.ToRational(integer) : null;
        }

        var width = upper - lower;
        if (width < Finest * (1 + Math.Abs(center)))
            return null;
        var slack = double.IsInfinity(width) ? Math.Max(1, Math.Abs(center)) / 2 : Math.Min(center - lower, upper - center) / 2;
        for (var digits = 0; digits < 12; digits++)
        {
            var scale = Math.Pow(10, digits - Math.Floor(Math.Log10(Math.Max(slack, 1e-300))) - 1);
            var rounded = Math.Round(center * scale) / scale;
            if (Math.Abs(rounded - center) <= slack && rounded > lower && rounded < upper)
                return Rational.Parse(rounded.ToString("R", CultureInfo.InvariantCulture));
        }

        return Doubles.ToRational(center);
    }
}

/// <summary>An observation that was looked for; where it is not exact it lies next to the one that has the property. A name
/// stands for an end that is a known value.</summary>
internal readonly record struct Witness(Rational Point, bool IsExact, string? Name = null)
{
    public string Text => Name ?? (IsExact ? Rendering.Number(Point) : "about " + Rendering.Number(Math.Round(Point.ToDouble(), 6)));
}
