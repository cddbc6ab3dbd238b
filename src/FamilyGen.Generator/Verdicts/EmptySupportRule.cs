using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>FG0103: a support with constant ends in which nothing, or only one value, can be observed.</summary>
internal static class EmptySupportRule
{
    // A predicate is tried on every count of a range up to this length.
    private const int LongestTried = 10_000;

    public static IEnumerable<Finding> Find(FamilyReading reading)
    {
        var support = reading.Declaration.Support;
        var lower = support.Lower is { } l ? ConstantValue.Of(l) : double.NegativeInfinity;
        var upper = support.Upper is { } u ? ConstantValue.Of(u) : double.PositiveInfinity;
        foreach (var (end, value) in new[] { (support.Lower, lower), (support.Upper, upper) })
        {
            if (end is not null && value is { } v && double.IsNaN(v))
                return [At(end, "has an end that is not a number", "give it a number")];
        }

        foreach (var mass in support.Masses)
        {
            if (ConstantValue.Of(mass) is { } point && (double.IsNaN(point) || double.IsInfinity(point)))
                return [At(mass, $"has a point mass at {Text(point)}", "give it a finite point")];
        }

        if (lower is not { } from || upper is not { } to)
            return [];
        return (support.IsCircle ? OfCircle(support, to) : OfRange(support, from, to) ?? OfPredicate(support, from, to)) is { } finding ? [finding] : [];
    }

    private static Finding? OfCircle(SupportDeclaration support, double period) => period > 0 && !double.IsInfinity(period)
        ? null
        : At(support.Upper!, $"is a circle of period {Text(period)}", "give it a positive finite period");

    private static Finding? OfRange(SupportDeclaration support, double from, double to)
    {
        var place = support.Upper ?? support.Lower;
        if (place is null)
            return null;
        if (from > to)
            return At(place, $"is empty because its lower end {Text(from)} lies above its upper end {Text(to)}", "exchange the ends");
        if (double.IsPositiveInfinity(from) || double.IsNegativeInfinity(to))
            return At(place, "is empty because an end lies at infinity on the wrong side", "give it a finite end");
        if (from < to || support.Masses.Count > 0)
            return null;
        return support.IsLattice || (support.LowerIncluded && support.UpperIncluded)
            ? At(place, $"is the single point {Text(from)}, so nothing is random", "widen it")
            : At(place, $"is empty because both its ends are {Text(from)}", "widen it");
    }

    private static Finding? OfPredicate(SupportDeclaration support, double from, double to)
    {
        if (support.Predicate is not { } predicate)
            return null;
        if (predicate is Always { Value: false })
            return new Finding(DiagnosticIds.SupportEmpty, predicate.Origin, EquatableArray.Of("is empty because its condition is never true", "state the counts that can occur"));
        if (!(to - from < LongestTried))
            return null;
        var allowed = new List<double>();
        for (var count = Math.Ceiling(from); count <= to && allowed.Count < 2; count++)
        {
            if (ConstantValue.Holds(predicate, count) is not { } holds)
                return null;
            if (holds)
                allowed.Add(count);
        }

        return allowed.Count switch
        {
            0 => new Finding(DiagnosticIds.SupportEmpty, predicate.Origin, EquatableArray.Of(
                $"is empty because its condition holds for none of the counts from {Text(from)} to {Text(to)}", "state the counts that can occur")),
            1 => new Finding(DiagnosticIds.SupportEmpty, predicate.Origin, EquatableArray.Of(
                $"is the single point {Text(allowed[0])}, so nothing is random", "widen its condition")),
            _ => null,
        };
    }

    private static Finding At(Expression place, string what, string mend) =>
        new(DiagnosticIds.SupportEmpty, place.Origin, EquatableArray.Of(what, mend));

    private static string Text(double value) => value.ToString("R", CultureInfo.InvariantCulture);
}
