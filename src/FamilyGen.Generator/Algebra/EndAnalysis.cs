using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>The growth of the exponent at the ends of the support and at its inner singularities.</summary>
/// <param name="scope">The support and the symbols.</param>
/// <param name="statistics">The statistics.</param>
/// <param name="logBase">log h.</param>
/// <param name="naturals">What multiplies each statistic, as it is to be named: a natural parameter or its value in trade
/// parameters.</param>
internal sealed class EndAnalysis(Scope scope, IReadOnlyList<AtomSum> statistics, AtomSum logBase, IReadOnlyList<Polynomial> naturals)
{
    private const int MostSplits = 4;

    /// <summary>The rows for one end, one for each case that the end does not decide; none where everything is bounded at a
    /// finite point or the base measure vanishes.</summary>
    public IEnumerable<EndRow> Rows(SupportEnd end, string where) => Rows(end, where, new Dictionary<Condition, bool>());

    /// <summary>Whether some function is unbounded at a finite end, or not smooth up to it.</summary>
    public bool IsSingular(SupportEnd end)
    {
        var expansion = new AsymptoticExpansion(end, scope, new Dictionary<Condition, bool>());
        var isSmooth = IsSmooth(Expand(logBase, expansion));
        return !expansion.IsExcluded && !(isSmooth && statistics.All(s => IsSmooth(Expand(s, expansion))));
    }

    private IEnumerable<EndRow> Rows(SupportEnd end, string where, Dictionary<Condition, bool> assumed)
    {
        var expansion = new AsymptoticExpansion(end, scope, assumed);
        var baseSeries = Expand(logBase, expansion);
        if (expansion.IsExcluded && expansion.Undecided is null)
            return Array.Empty<EndRow>();
        var series = statistics.Select(s => Expand(s, expansion)).Append(baseSeries).ToList();
        if (expansion.Undecided is { } condition && assumed.Count < MostSplits)
        {
            return new[] { true, false }.SelectMany(value =>
            {
                var more = assumed.ToDictionary(p => p.Key, p => p.Value);
                more[condition] = value;
                var text = Rendering.Text(value ? condition : Conditions.Not(condition));
                return Rows(end, where + (assumed.Count == 0 ? " where " : " and ") + text, more);
            }).ToList();
        }

        if (expansion.IsExcluded || (!end.IsInfinite && series.All(s => s.IsBounded && !s.Terms.Any(t => t.IsSymbolic))))
            return Array.Empty<EndRow>();
        return new[] { Row(end, where, series) };
    }

    private static AsymptoticSeries Expand(AtomSum sum, AsymptoticExpansion expansion) => sum.Terms
        .Select(t => expansion.Expand(t.Coefficient) * expansion.Expand(t.Atom))
        .Aggregate(AsymptoticSeries.Zero, (a, b) => a + b);

    private static bool IsSmooth(AsymptoticSeries series) => series.IsBounded
        && series.Terms.All(t => !t.IsWavering && t.LogOrder.IsZero && t.LogLogOrder.IsZero && t.Rate.IsZero && t.Order.AsInteger() is <= 0);

    private EndRow Row(SupportEnd end, string where, List<AsymptoticSeries> series)
    {
        var verified = series.All(s => s.IsVerified && s.Error <= 0);
        var ranks = new List<(AsymptoticTerm Term, Polynomial[] Weights)>();
        for (var j = 0; j < series.Count; j++)
        {
            foreach (var term in series[j].Terms)
            {
                if (Growth.Of(term) is not { } growth)
                    continue;
                verified &= growth.IsInScale;
                var at = ranks.FindIndex(r => r.Term.IsSameRank(term));
                if (at < 0)
                {
                    at = ranks.Count;
                    ranks.Add((term, Enumerable.Repeat(Polynomial.Zero, series.Count).ToArray()));
                }

                ranks[at].Weights[j] = term.Coefficient;
            }
        }

        var rows = ranks
            .OrderByDescending(r => r.Term, Comparer<AsymptoticTerm>.Create((t, u) => t.StrengthAgainst(u)))
            .Select(r => Rank(r.Term, r.Weights))
            .ToEquatableArray();
        return new EndRow(where, end.IsInfinite, end.IsUpper, verified, rows, series.Select(Strongest).ToEquatableArray());
    }

    private RankRow Rank(AsymptoticTerm term, Polynomial[] weights)
    {
        var growth = Growth.Of(term)!.Value;
        return new RankRow(
            growth.Kind,
            Written(growth.Order),
            weights.Take(statistics.Count).Select(Written).ToEquatableArray(),
            Written(weights[statistics.Count]),
            Rendering.Text(Coefficient(weights, naturals).ToSortedExpression()));
    }

    /// <summary>Σ weightⱼθⱼ + constant.</summary>
    public static Polynomial Coefficient(IReadOnlyList<Polynomial> weights, IReadOnlyList<Polynomial> naturals) =>
        naturals.Select((n, j) => n * weights[j]).Aggregate(Polynomial.Zero, (a, b) => a + b) + weights[naturals.Count];

    private static GrowthRow Strongest(AsymptoticSeries series)
    {
        foreach (var term in series.Terms)
        {
            if (Growth.Of(term) is { } growth)
                return new GrowthRow(growth.Kind, Written(growth.Order));
        }

        return new GrowthRow("Bounded", Formula.One);
    }

    private static Expression Written(Polynomial value) => value.ToSortedExpression().WithoutOrigins();

    /// <summary>The name of a term in the scale of FamilyGen.Kernels.GrowthKind.</summary>
    private readonly record struct Growth(string Kind, Polynomial Order, bool IsInScale)
    {
        /// <summary>Null for a term that stays bounded, whatever the known values are.</summary>
        public static Growth? Of(AsymptoticTerm term)
        {
            if (!term.IsSymbolic && !term.Grows)
                return null;
            if (!term.Rate.IsZero)
                return new("Exponential", term.Rate, term.Order.IsZero && term.LogOrder.IsZero && term.LogLogOrder.IsZero && !term.IsWavering);
            var inScale = !term.IsWavering && term.LogLogOrder.IsZero;
            if (!term.Order.IsZero)
                return term.LogOrder == 1 ? new("PowerTimesLog", term.Order, inScale) : new("Power", term.Order, inScale && term.LogOrder.IsZero);
            if (term.LogOrder == 1)
                return new("Log", Polynomial.One, inScale);
            if (term.LogOrder > 0)
                return new("LogPower", Polynomial.Of(term.LogOrder), inScale && term.LogOrder > 1);
            return new("LogLog", Polynomial.One, !term.IsWavering && term.LogLogOrder == 1);
        }
    }
}
