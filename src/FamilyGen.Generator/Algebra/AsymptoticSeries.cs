using System;
using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>A function of t as t → ∞, expanded in falling terms. What was left out is O(t^<paramref name="error"/>) up to
/// logarithms.</summary>
internal sealed class AsymptoticSeries(IReadOnlyList<AsymptoticTerm> terms, double error, bool isVerified)
{
    // Terms are carried this far below t⁰, so that products with powers up to t⁸ are still right down to bounded terms.
    private const double Depth = 8;
    private const int MostTerms = 60;
    private const int MostIterations = 12;

    /// <summary>The terms, strongest first.</summary>
    public IReadOnlyList<AsymptoticTerm> Terms { get; } = terms;

    public double Error { get; } = error;

    /// <summary>False where the argument does not reach: an opaque function, an unbounded oscillation.</summary>
    public bool IsVerified { get; } = isVerified;

    public static AsymptoticSeries Zero { get; } = new(Array.Empty<AsymptoticTerm>(), double.NegativeInfinity, true);

    /// <summary>A function about which nothing is known.</summary>
    public static AsymptoticSeries Unknown { get; } = new(Array.Empty<AsymptoticTerm>(), double.PositiveInfinity, false);

    public static AsymptoticSeries Of(params AsymptoticTerm[] terms) => Collect(terms, double.NegativeInfinity, true);

    public static AsymptoticSeries Of(Polynomial constant) => Of(AsymptoticTerm.Constant(constant));

    public bool IsZero => Terms.Count == 0;

    public AsymptoticTerm? Leading => Terms.Count == 0 ? null : Terms[0];

    /// <summary>Whether the function stays bounded, as far as is known.</summary>
    public bool IsBounded => IsVerified && Error <= 0 && !Terms.Any(t => t.Grows);

    public bool IsFreeOfWaves => !Terms.Any(t => t.IsWavering);

    /// <summary>The sign of the function near the end; null where it is not known.</summary>
    public int? Sign => Leading is not { } leading || leading.IsWavering ? null : SignOf(leading.Coefficient);

    public static int? SignOf(Polynomial coefficient)
    {
        if (coefficient.Dependence != Dependence.None)
            return null;
        var value = AsymptoticTerm.Estimate(coefficient);
        return double.IsNaN(value) ? null : Math.Sign(value);
    }

    public static AsymptoticSeries operator +(AsymptoticSeries a, AsymptoticSeries b) =>
        Collect(a.Terms.Concat(b.Terms), Math.Max(a.Error, b.Error), a.IsVerified && b.IsVerified);

    public static AsymptoticSeries operator -(AsymptoticSeries a, AsymptoticSeries b) => a + (b * Polynomial.Of(-1));

    public static AsymptoticSeries operator *(AsymptoticSeries a, Polynomial constant) => Collect(
        a.Terms.Select(t => t with { Coefficient = t.Coefficient * constant }), constant.IsZero ? double.NegativeInfinity : a.Error, a.IsVerified);

    public static AsymptoticSeries operator *(AsymptoticSeries a, AsymptoticSeries b)
    {
        var error = Math.Max(a.Spread(b.Error), b.Spread(a.Error));
        return Collect(a.Terms.SelectMany(t => b.Terms.Select(u => t * u)), error, a.IsVerified && b.IsVerified);
    }

    /// <summary>The same function with less known about it.</summary>
    public AsymptoticSeries WithError(double error) => new(Terms, Math.Max(Error, error), IsVerified);

    public AsymptoticSeries Unverified() => new(Terms, Error, false);

    /// <summary>The strongest term apart, and the rest divided by it; null where no term can be told to be the strongest.</summary>
    public (AsymptoticTerm Leading, AsymptoticSeries Ratio)? Split()
    {
        if (Leading is not { IsWavering: false } leading)
            return null;
        if (Terms.Count > 1 && Terms[1].StrengthAgainst(leading) == 0)
            return null;
        var inverse = new AsymptoticTerm(
            Reciprocal(leading.Coefficient), leading.Rate * -1, leading.Order * -1, -leading.LogOrder, -leading.LogLogOrder, false);
        var rest = new AsymptoticSeries(Terms.Skip(1).ToList(), Error, IsVerified && !IsAmbiguous(leading));
        return (leading, rest * Of(inverse));
    }

    /// <summary>Σ cᵢ·rⁱ for a series r that tends to zero.</summary>
    public static AsymptoticSeries PowerSeries(AsymptoticSeries r, Func<int, Polynomial> coefficient)
    {
        var sum = Of(coefficient(0));
        var power = Of(Polynomial.One);
        for (var i = 1; i <= MostIterations; i++)
        {
            power *= r;
            sum += power * coefficient(i);
            if (power.IsZero)
                return sum;
        }

        // What is left starts with the next power of r.
        var next = power * r;
        return next.Leading is { } rest && Math.Abs(rest.RateEstimate) < 1e-12 ? sum.WithError(rest.OrderEstimate) : sum;
    }

    private static Polynomial Reciprocal(Polynomial coefficient) => coefficient.IsSingleTerm
        ? SingleTerms.Raise(coefficient.Terms[0], -1)
        : Polynomial.Of(Term.Of(coefficient.ToSortedExpression(), Polynomial.Of(-1), -1));

    // Whether the strongest term is so only for some known values.
    private bool IsAmbiguous(AsymptoticTerm leading) => Terms.Skip(1).Any(t =>
        (leading.Order - t.Order).Dependence != Dependence.None || (leading.Rate - t.Rate).Dependence != Dependence.None);

    // The order of what an error of the given order becomes in a product with this series.
    private double Spread(double error)
    {
        if (double.IsNegativeInfinity(error) || Leading is not { } leading)
            return double.NegativeInfinity;
        return leading.RateEstimate > 0 ? double.PositiveInfinity : leading.RateEstimate < 0 ? double.NegativeInfinity : leading.OrderEstimate + error;
    }

    private static AsymptoticSeries Collect(IEnumerable<AsymptoticTerm> terms, double error, bool isVerified)
    {
        var collected = new List<AsymptoticTerm>();
        foreach (var term in terms)
        {
            var at = collected.FindIndex(t => t.IsSameRank(term));
            if (at < 0)
                collected.Add(term);
            else if (!term.IsWavering)
                collected[at] = collected[at] with { Coefficient = collected[at].Coefficient + term.Coefficient };
        }

        var kept = new List<AsymptoticTerm>();
        foreach (var term in collected.OrderByDescending(t => t, Comparer<AsymptoticTerm>.Create((t, u) => t.StrengthAgainst(u))))
        {
            if (IsNothing(term.Coefficient))
                continue;
            if (!term.IsSymbolic && term.RateEstimate == 0 && term.OrderEstimate < -Depth)
                error = Math.Max(error, term.OrderEstimate);
            else if (term.RateEstimate < -3.5 * SmallestRate(kept) || kept.Count >= MostTerms)
                error = kept.Count >= MostTerms && term.RateEstimate >= 0 ? Math.Max(error, term.OrderEstimate) : error;
            else
                kept.Add(term);
        }

        return new AsymptoticSeries(kept, error, isVerified);
    }

    // Exponentially small terms are followed over a few of their powers only.
    private static double SmallestRate(List<AsymptoticTerm> kept)
    {
        var small = kept.FirstOrDefault(t => t.RateEstimate < 0);
        return small is null ? double.PositiveInfinity : -small.RateEstimate;
    }

    private static bool IsNothing(Polynomial coefficient) =>
        coefficient.IsZero || (coefficient.Terms.Count > 1 && coefficient.Dependence == Dependence.None
            && Math.Abs(AsymptoticTerm.Estimate(coefficient)) < 1e-13 * coefficient.Terms.Max(t => Math.Abs(AsymptoticTerm.Estimate(Polynomial.Of(t)))));
}
