using System;
using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>Indicators that are affine combinations of earlier ones on the support ([x = 0] + [x &gt; 0] = 1 on the counts):
/// the last one is replaced, and the constant goes into the normalizer.</summary>
internal static class IndicatorRelations
{
    private const int MostIndicators = 12;

    public static Polynomial Apply(Polynomial kernel, Scope scope)
    {
        var indicators = new List<Factor>();
        foreach (var term in kernel.Terms)
        {
            if (Indicator(term) is { } indicator && !indicators.Any(i => StructuralOrder.Same(i.Base, indicator.Base)))
                indicators.Add(indicator);
        }

        if (indicators.Count < 2 || indicators.Count > MostIndicators)
            return kernel;
        var rows = Rows(indicators.Select(i => ((Conditional)i.Base).Condition).ToList(), scope);
        if (rows is null)
            return kernel;
        for (var last = indicators.Count - 1; last > 0; last--)
        {
            if (Combination(rows, last) is not { } weights)
                continue;
            var replaced = Polynomial.Of(weights[0]);
            for (var i = 0; i < last; i++)
                replaced += Polynomial.Of(Term.Of(indicators[i].Base, indicators[i].Origin)) * weights[i + 1];
            kernel = Polynomial.Collect(kernel.Terms.SelectMany(t => Indicator(t) is { } own && StructuralOrder.Same(own.Base, indicators[last].Base)
                ? (replaced * t.Keep(f => f != own).WithCoefficient(t.Coefficient)).Terms
                : new[] { t }));
        }

        return kernel;
    }

    // The indicator of a term whose only part in x it is.
    private static Factor? Indicator(Term term)
    {
        var parts = term.Factors.Where(f => f.Dependence.HasObservation()).ToList();
        return parts.Count == 1 && parts[0].IsIndicator ? parts[0] : null;
    }

    // The distinct patterns of the indicators over the support, for several choices of the known values.
    private static List<bool[]>? Rows(List<Condition> conditions, Scope scope)
    {
        var rows = new List<bool[]>();
        for (var draw = 0; draw < 3; draw++)
        {
            foreach (var x in Points(conditions, scope, draw))
            {
                var pattern = conditions.Select(c => Evaluator.Holds(c, s => s.Kind == SymbolKind.Observation ? x : Known(s, draw))).ToList();
                if (pattern.Any(p => p is null))
                    return null;
                var row = pattern.Select(p => p!.Value).ToArray();
                if (!rows.Any(r => r.SequenceEqual(row)))
                    rows.Add(row);
            }
        }

        return rows;
    }

    private static IEnumerable<double> Points(List<Condition> conditions, Scope scope, int draw)
    {
        var range = scope.RangeOf(scope.Observation);
        var lower = double.IsInfinity(range.Lower) ? Math.Min(-40, range.Upper - 80) : range.Lower;
        var upper = double.IsInfinity(range.Upper) ? lower + 120 : range.Upper;
        var roots = conditions.SelectMany(Conditions.Comparisons)
            .Select(c => Affine.In(Formula.Difference(c.Left, c.Right), scope.Observation.Name))
            .Where(a => a is not null && !a.Slope.IsZero())
            .Select(a => Evaluator.Evaluate(a!.Root(), s => Known(s, draw)))
            .Where(r => !double.IsNaN(r))
            .ToList();
        var points = scope.Support.IsLattice
            ? Enumerable.Range(0, 130).Select(i => Math.Ceiling(lower) + i).Concat(roots.SelectMany(r => new[] { -2, -1, 0, 1, 2 }.Select(d => Math.Floor(r) + d)))
            : roots.SelectMany(r => new[] { r - 1e-4 * (1 + Math.Abs(r)), r + 1e-4 * (1 + Math.Abs(r)) })
                .Concat(Enumerable.Range(0, 60).Select(i => lower + ((i + 0.37) / 60 * (upper - lower))))
                .Concat(scope.Support.Masses.Select(m => Evaluator.Evaluate(m, s => Known(s, draw))));
        return points.Where(p => p >= range.Lower && p <= range.Upper);
    }

    private static double Known(Symbol symbol, int draw)
    {
        var unit = ((symbol.Name.Sum(c => c) * 0.6180339887498949) + (draw * 0.7548776662466927)) % 1;
        return symbol.IsInteger ? 2 + Math.Floor(6 * unit) : 0.5 + (5 * unit);
    }

    // c₀ + Σ cᵢ·(indicator i) = (indicator last) in every row, by elimination in exact numbers.
    private static Rational[]? Combination(List<bool[]> rows, int last)
    {
        var system = rows.Select(r => Enumerable.Range(0, last + 2).Select(j => j == 0 ? Rational.One : (Rational)(r[j - 1] ? 1 : 0)).ToArray()).ToList();
        var pivots = new List<int>();
        for (var column = 0; column <= last; column++)
        {
            var at = system.FindIndex(pivots.Count, r => !r[column].IsZero);
            if (at < 0)
                continue;
            (system[pivots.Count], system[at]) = (system[at], system[pivots.Count]);
            var pivot = system[pivots.Count];
            var scale = pivot[column];
            for (var j = 0; j <= last + 1; j++)
                pivot[j] /= scale;
            foreach (var other in system.Where(r => r != pivot && !r[column].IsZero))
            {
                var multiple = other[column];
                for (var j = 0; j <= last + 1; j++)
                    other[j] -= multiple * pivot[j];
            }

            pivots.Add(column);
        }

        if (system.Skip(pivots.Count).Any(r => !r[last + 1].IsZero))
            return null;
        var weights = new Rational[last + 1];
        for (var i = 0; i < pivots.Count; i++)
            weights[pivots[i]] = system[i][last + 1];
        return weights;
    }
}
