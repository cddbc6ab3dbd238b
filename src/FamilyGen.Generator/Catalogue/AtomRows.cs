using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Catalogue;

/// <summary>The exponent on one piece of the support, atom by atom: f(x) = Σ rowₐ·a(x) + the row of the constant.</summary>
internal sealed class AtomRows
{
    private readonly List<Term> _terms = new();
    private readonly List<AffineRow> _rows = new();

    private AtomRows(int parameters) => (Parameters, Constant) = (parameters, AffineRow.Zero(parameters));

    public int Parameters { get; }

    /// <summary>The part of the exponent that is free of x.</summary>
    public AffineRow Constant { get; private set; }

    /// <summary>Whether the base measure vanishes on the piece.</summary>
    public bool IsEmpty { get; private set; }

    public IEnumerable<(Expression Atom, AffineRow Row)> Atoms =>
        _terms.Select((t, i) => (t.ToExpression().WithoutOrigins(), _rows[i])).Where(a => !a.Item2.IsZero);

    /// <summary>Reads the statistics and, last, log h as they are on the expander's piece.</summary>
    public static AtomRows Read(IReadOnlyList<Expression> functions, Expander expander)
    {
        var result = new AtomRows(functions.Count - 1);
        for (var j = 0; j < functions.Count; j++)
        {
            var function = expander.Expand(functions[j]);
            result.IsEmpty |= j == functions.Count - 1 && function.IsNegativeInfinity && !function.Dependence.HasObservation();
            foreach (var term in function.Terms)
                result.Add(term, j);
        }

        return result;
    }

    /// <summary>The exponent at a point, or null where it is not a number there.</summary>
    public AffineRow? At(Expression point, Expander expander)
    {
        var sum = Constant;
        foreach (var (atom, row) in Atoms)
        {
            var value = expander.Expand(atom.Rewrite(e => e is Symbol { Kind: SymbolKind.Observation } ? point : null));
            if (value.IsNegativeInfinity)
                return null;
            sum += row * value;
        }

        return sum;
    }

    public bool Same(AtomRows other) =>
        IsEmpty == other.IsEmpty && Constant.Same(other.Constant) && Covers(other) && other.Covers(this);

    private void Add(Term term, int function)
    {
        var coefficient = Polynomial.Of(term.Keep(f => !f.Dependence.HasObservation()).WithCoefficient(term.Coefficient));
        var row = AffineRow.Single(Parameters, function, coefficient);
        if (!term.Dependence.HasObservation())
        {
            Constant += row;
            return;
        }

        var atom = term.Keep(f => f.Dependence.HasObservation());
        var at = _terms.FindIndex(t => Term.CompareFactors(t, atom) == 0);
        if (at >= 0)
        {
            _rows[at] += row;
            return;
        }

        _terms.Add(atom);
        _rows.Add(row);
    }

    private bool Covers(AtomRows other)
    {
        for (var i = 0; i < _terms.Count; i++)
        {
            var at = other._terms.FindIndex(t => Term.CompareFactors(t, _terms[i]) == 0);
            if (!(at < 0 ? _rows[i] : _rows[i] - other._rows[at]).IsZero)
                return false;
        }

        return true;
    }
}
