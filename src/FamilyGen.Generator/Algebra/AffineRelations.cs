using System;
using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>The coefficients of the statistics found so far, in echelon form over their monomials in the parameters, so that
/// it can be told whether a further one is α + Σ βᵢθᵢ of them. With another choice of what a number is it tells the same of
/// functions of x.</summary>
/// <param name="numbers">What a factor may depend on to count as a number.</param>
internal sealed class AffineRelations(Dependence numbers = Dependence.None)
{
    private readonly List<Row> _rows = new();

    /// <summary>α and β of a coefficient that is an affine combination of those added before; null when it is none.</summary>
    public Relation? Find(Polynomial coefficient)
    {
        var row = Reduce(Row.Of(coefficient, numbers));
        return row.Entries.Count == 0 ? new Relation(row.Constant, row.Weights.Select(w => w * -1).ToList()) : null;
    }

    public void Add(Polynomial coefficient)
    {
        var row = Reduce(Row.Of(coefficient, numbers));
        foreach (var other in _rows)
            other.Weights.Add(Polynomial.Zero);
        while (row.Weights.Count < _rows.Count)
            row.Weights.Add(Polynomial.Zero);
        row.Weights.Add(Polynomial.One);
        _rows.Add(row);
    }

    // row − Σ multiples of earlier rows; its weights keep count: row = coefficient + Σ weightᵢ·coefficientᵢ.
    private Row Reduce(Row row)
    {
        foreach (var pivot in _rows)
        {
            while (row.Weights.Count < pivot.Weights.Count)
                row.Weights.Add(Polynomial.Zero);
            if (pivot.Entries.Count == 0)
                continue;
            var (monomial, value) = pivot.Entries[0];
            var at = row.Entries.FindIndex(e => Term.CompareFactors(e.Monomial, monomial) == 0);
            if (at >= 0)
                row.Subtract(pivot, Divide(row.Entries[at].Value, value));
        }

        return row;
    }

    private static Polynomial Divide(Polynomial a, Polynomial b) => b.IsSingleTerm
        ? a * SingleTerms.Raise(b.Terms[0], -1)
        : a * Term.Of(b.ToSortedExpression(), Polynomial.Of(-1), -1);

    private static bool IsZero(Polynomial constant)
    {
        if (constant.IsZero || constant.Terms.Count == 1)
            return constant.IsZero;
        var size = constant.Terms.Max(t => Math.Abs(Value(Polynomial.Of(t))));
        return Math.Abs(Value(constant)) <= 1e-13 * size;
    }

    private static double Value(Polynomial constant) => Evaluator.Evaluate(constant.ToSortedExpression(), _ => double.NaN);

    /// <summary>constant + Σ weightᵢθᵢ.</summary>
    internal sealed record Relation(Polynomial Constant, IReadOnlyList<Polynomial> Weights);

    private sealed class Row
    {
        public List<(Term Monomial, Polynomial Value)> Entries { get; private set; } = new();

        public Polynomial Constant { get; private set; } = Polynomial.Zero;

        public List<Polynomial> Weights { get; } = new();

        public static Row Of(Polynomial coefficient, Dependence numbers)
        {
            var row = new Row();
            foreach (var term in coefficient.Terms)
            {
                var scalar = Polynomial.Of(term.Keep(f => (f.Dependence & ~numbers) == Dependence.None).WithCoefficient(term.Coefficient));
                var monomial = term.Keep(f => (f.Dependence & ~numbers) != Dependence.None);
                if (monomial.IsNumber)
                    row.Constant += scalar;
                else
                    row.Add(monomial, scalar);
            }

            return row;
        }

        public void Subtract(Row other, Polynomial multiple)
        {
            foreach (var (monomial, value) in other.Entries)
                Add(monomial, value * multiple * -1);
            Constant -= other.Constant * multiple;
            for (var i = 0; i < other.Weights.Count; i++)
                Weights[i] -= other.Weights[i] * multiple;
            Entries = Entries.Where(e => !IsZero(e.Value)).ToList();
        }

        private void Add(Term monomial, Polynomial value)
        {
            var at = Entries.FindIndex(e => Term.CompareFactors(e.Monomial, monomial) == 0);
            if (at < 0)
                Entries.Add((monomial, value));
            else
                Entries[at] = (monomial, Entries[at].Value + value);
        }
    }
}
