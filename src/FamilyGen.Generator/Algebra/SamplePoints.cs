using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>Observations on which functions that agree agree everywhere: all counts of a short range, else enough of them in
/// every piece and residue class.</summary>
internal sealed class SamplePoints
{
    private const int MostListed = 400;
    private const int MostPieces = 24;
    private const int LongestPeriod = 30;

    // Spread over scales, and without a pattern that a function might share.
    private static readonly double[] s_steps = { 0.37, 0.81, 1.46, 2.3, 3.7, 5.9, 8.3, 12.7, 17.1, 23.9, 31.3, 47.7 };
    private static readonly int[] s_strides = { 0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 13, 17, 22, 29, 41, 60 };

    private SamplePoints(IReadOnlyList<Rational> points, bool isComplete) => (Points, IsComplete) = (points, isComplete);

    public IReadOnlyList<Rational> Points { get; }

    /// <summary>Whether these are all observations there are.</summary>
    public bool IsComplete { get; }

    /// <summary>Null where no finite choice would prove anything: a function or an end that is not known, too many pieces.</summary>
    public static SamplePoints? Of(FamilyDeclaration declaration, NormalForm form, EffectiveSupport support)
    {
        if (!support.IsNumeric || declaration.Support.Masses.Count != support.Masses.Count)
            return null;
        if (support.IsLattice && support.Lower is { } from && support.Upper is { } to && to - from < MostListed)
        {
            var all = Enumerable.Range(0, (int)EnclosedFunctions.FloorOf(to - from).Numerator + 1).Select(i => from + i);
            return new(all.Where(p => support.At(p) != Presence.Out).ToList(), true);
        }

        if (form.IsOpaque || Breaks(form) is not { } breaks)
            return null;
        var points = support.IsLattice ? Counts(form, support, breaks) : Numbers(support, breaks);
        return points is null ? null : new(points.Concat(support.Masses).Distinct().Where(p => support.At(p) == Presence.In).ToList(), false);
    }

    private static List<double>? Breaks(NormalForm form)
    {
        var breaks = new List<double>();
        foreach (var point in form.Breakpoints)
        {
            var value = Dependences.Of(point) == Dependence.None ? Evaluator.Evaluate(point, _ => double.NaN) : double.NaN;
            if (double.IsNaN(value) || breaks.Count >= MostPieces)
                return null;
            breaks.Add(value);
        }

        breaks.Sort();
        return breaks;
    }

    private static IEnumerable<Rational>? Counts(NormalForm form, EffectiveSupport support, List<double> breaks)
    {
        if (form.Period is not Number { Value: var period } || period > LongestPeriod)
            return null;
        var starts = breaks.Select(b => Doubles.ToRational(Math.Ceiling(b))).ToList();
        if (support.Lower is { } lower)
            starts.Insert(0, lower);
        var points = starts.SelectMany(s => Along(s, period));
        if (support.Lower is null)
            points = points.Concat(Along(starts.Count > 0 ? starts[0] - 1 : Rational.Zero, -period));
        return starts.Count == 0 ? points.Concat(Along(Rational.Zero, period)) : points;
    }

    // Each residue class a number of times.
    private static IEnumerable<Rational> Along(Rational start, Rational period) =>
        s_strides.SelectMany(s => Enumerable.Range(0, (int)Rational.Abs(period).Numerator).Select(r => start + (period * s) + (r * period.Sign)));

    private static IEnumerable<Rational> Numbers(EffectiveSupport support, List<double> breaks)
    {
        var ends = breaks.ToList();
        ends.Insert(0, support.Lower?.ToDouble() ?? double.NegativeInfinity);
        ends.Add(support.Upper?.ToDouble() ?? double.PositiveInfinity);
        for (var i = 0; i + 1 < ends.Count; i++)
        {
            foreach (var point in Inside(ends[i], ends[i + 1]))
                yield return Doubles.ToRational(point);
        }
    }

    private static IEnumerable<double> Inside(double lower, double upper)
    {
        if (double.IsInfinity(lower) && double.IsInfinity(upper))
            return s_steps.Select(s => s - 0.1).Concat(s_steps.Select(s => 0.23 - s));
        if (double.IsInfinity(upper))
            return s_steps.Select(s => Math.Round(lower + s, 6));
        if (double.IsInfinity(lower))
            return s_steps.Select(s => Math.Round(upper - s, 6));
        return s_steps.Select((s, i) => lower + ((upper - lower) * Math.Round((i + 0.5 + (0.3 * Math.Sin(s))) / s_steps.Length, 4)));
    }
}
