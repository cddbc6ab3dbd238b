using System;
using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>A sum of distinct terms, kept in the order in which they first appeared.</summary>
internal sealed class Polynomial
{
    private Polynomial(IReadOnlyList<Term> terms)
    {
        Terms = terms;
        Dependence = terms.Aggregate(Dependence.None, (all, t) => all | t.Dependence);
    }

    public static Polynomial Zero { get; } = new(Array.Empty<Term>());

    public static Polynomial One { get; } = Of(Rational.One);

    public IReadOnlyList<Term> Terms { get; }

    public Dependence Dependence { get; }

    public bool IsZero => Terms.Count == 0;

    public bool IsOne => AsRational() == Rational.One;

    public bool IsSingleTerm => Terms.Count == 1;

    /// <summary>Whether the sum contains −∞, which swallows all that is finite beside it.</summary>
    public bool IsNegativeInfinity => Terms.Any(t => t.Coefficient.Sign > 0 && t.Factors.Any(f => f.Base.IsNegativeInfinity()));

    public static Polynomial Of(Rational value) => value.IsZero ? Zero : new(new[] { Term.Of(value) });

    public static Polynomial Of(Term? term) => term is null || term.Coefficient.IsZero ? Zero : new(new[] { term });

    public static Polynomial Of(Expression atom, int origin = -1) => atom is Number number ? Of(number.Value) : Of(Term.Of(atom, origin));

    public static Polynomial operator +(Polynomial a, Polynomial b) => a.IsZero ? b : b.IsZero ? a : Collect(a.Terms.Concat(b.Terms));

    public static Polynomial operator -(Polynomial a, Polynomial b) => a + (b * (Rational)(-1));

    public static Polynomial operator *(Polynomial a, Rational factor) =>
        factor.IsZero ? Zero : factor == Rational.One ? a : new(a.Terms.Select(t => t.WithCoefficient(t.Coefficient * factor)).ToList());

    public static Polynomial operator *(Polynomial a, Term factor) => Collect(a.Terms.Select(t => Term.Multiply(t, factor)));

    public static Polynomial operator *(Polynomial a, Polynomial b)
    {
        if (a.AsRational() is { } left)
            return b * left;
        if (b.AsRational() is { } right)
            return a * right;
        return Collect(a.Terms.SelectMany(t => b.Terms.Select(u => Term.Multiply(t, u))));
    }

    public static Polynomial Collect(IEnumerable<Term?> terms)
    {
        var result = new List<Term>();
        var index = new Dictionary<Term, int>(FactorEquality.Instance);
        foreach (var term in terms)
        {
            if (term is null)
                continue;
            if (index.TryGetValue(term, out var at))
            {
                result[at] = result[at].WithCoefficient(result[at].Coefficient + term.Coefficient);
            }
            else
            {
                index.Add(term, result.Count);
                result.Add(term);
            }
        }

        result.RemoveAll(t => t.Coefficient.IsZero);
        return result.Count == 0 ? Zero : new(result);
    }

    /// <summary>The number that the polynomial is, if it is one.</summary>
    public Rational? AsRational() => Terms.Count == 0 ? Rational.Zero : Terms.Count == 1 && Terms[0].IsNumber ? Terms[0].Coefficient : null;

    /// <summary>The integer that the polynomial is, if it is a small one.</summary>
    public int? AsInteger() => AsRational() is { IsInteger: true } value && Rationals.Abs(value) < 1000 ? (int)value.Numerator : null;

    public Polynomial Where(Func<Term, bool> which)
    {
        var kept = Terms.Where(which).ToList();
        return kept.Count == 0 ? Zero : kept.Count == Terms.Count ? this : new(kept);
    }

    /// <summary>The formula with its terms in order of first appearance.</summary>
    public Expression ToExpression(int origin = -1) => Write(Terms, origin);

    /// <summary>The formula in an order that depends only on its content, so that equal sums inside functions are equal
    /// formulas: constants last, a positive term first.</summary>
    public Expression ToSortedExpression(int origin = -1)
    {
        if (Terms.Count < 2)
            return Write(Terms, origin);
        var sorted = Sorted();
        if (sorted[0].Coefficient.Sign < 0)
            sorted = sorted.Where(t => t.Coefficient.Sign > 0).Concat(sorted.Where(t => t.Coefficient.Sign < 0)).ToList();
        return Write(sorted, origin);
    }

    public List<Term> Sorted()
    {
        var sorted = Terms.Where(t => !t.IsNumber).ToList();
        sorted.Sort(Term.CompareInSum);
        sorted.AddRange(Terms.Where(t => t.IsNumber));
        return sorted;
    }

    public static int Compare(Polynomial a, Polynomial b)
    {
        if (ReferenceEquals(a, b))
            return 0;
        if (a.AsRational() is { } left && b.AsRational() is { } right)
            return left.CompareTo(right);
        if (a.Terms.Count != b.Terms.Count)
            return a.Terms.Count.CompareTo(b.Terms.Count);
        var first = a.Sorted();
        var second = b.Sorted();
        for (var i = 0; i < first.Count; i++)
        {
            var order = Term.CompareFactors(first[i], second[i]);
            if (order == 0)
                order = first[i].Coefficient.CompareTo(second[i].Coefficient);
            if (order != 0)
                return order;
        }

        return 0;
    }

    public static bool Same(Polynomial a, Polynomial b) => Compare(a, b) == 0;

    public override string ToString() => Rendering.Text(ToExpression());

    private static Expression Write(IReadOnlyList<Term> terms, int origin)
    {
        if (terms.Count == 0)
            return Formula.Zero;
        var expression = terms.Count == 1 ? terms[0].ToExpression() : Formula.Sum(terms.Select(t => t.ToExpression()).ToArray());
        return origin < 0 ? expression : expression with { Origin = origin };
    }

    private sealed class FactorEquality : IEqualityComparer<Term>
    {
        public static FactorEquality Instance { get; } = new();

        public bool Equals(Term? a, Term? b) => ReferenceEquals(a, b) || Term.CompareFactors(a!, b!) == 0;

        public int GetHashCode(Term term)
        {
            var hash = term.Factors.Count;
            foreach (var factor in term.Factors)
                hash = unchecked((hash * 31) + StructuralOrder.Instance.GetHashCode(factor.Base));
            return hash;
        }
    }
}
