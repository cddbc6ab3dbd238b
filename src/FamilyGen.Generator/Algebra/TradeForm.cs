using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>A kernel sorted into statistics, their natural parameters and the base measure.</summary>
internal sealed record TradeForm(IReadOnlyList<TradeForm.Part> Parts, Polynomial LogBase)
{
    /// <summary>One statistic T (free of parameters), the coefficient θ that multiplies it (free of x), and the atom in
    /// which it appeared first.</summary>
    internal sealed record Part(Polynomial Statistic, Polynomial Natural, Term Atom);

    /// <summary>Sorts an expanded kernel. Every factor must be free of x or of parameters.</summary>
    public static TradeForm Of(Polynomial kernel)
    {
        var relations = new AffineRelations();
        var statistics = new List<Polynomial>();
        var naturals = new List<(Polynomial Coefficient, Term Atom)>();
        var logBase = Polynomial.Zero;
        foreach (var (atom, coefficient) in ByAtom(kernel))
        {
            var function = Polynomial.Of(atom);
            if (relations.Find(coefficient) is { } relation)
            {
                logBase += function * relation.Constant;
                for (var i = 0; i < relation.Weights.Count; i++)
                    statistics[i] += function * relation.Weights[i];
            }
            else
            {
                relations.Add(coefficient);
                statistics.Add(function);
                naturals.Add((coefficient, atom));
            }
        }

        return new TradeForm(statistics.Select((s, i) => new Part(s, naturals[i].Coefficient, naturals[i].Atom)).ToList(), logBase);
    }

    /// <summary>The coefficient of an atom as it was written, taken from a kernel in which coefficients were left in their
    /// brackets; the collected one where the two do not agree.</summary>
    public static Expression Written(Part part, Polynomial bracketed, Expander expander)
    {
        foreach (var (atom, coefficient) in ByAtom(bracketed))
        {
            if (Term.CompareFactors(atom, part.Atom) == 0 && Polynomial.Same(expander.Expand(coefficient.ToExpression()), part.Natural))
                return Grouping.Write(coefficient);
        }

        return Grouping.Write(part.Natural);
    }

    // Atoms in order of first appearance with all that multiplies them. Known values go with x; terms without x go into A.
    private static IEnumerable<(Term Atom, Polynomial Coefficient)> ByAtom(Polynomial kernel)
    {
        var atoms = new List<Term>();
        var coefficients = new List<List<Term>>();
        foreach (var term in kernel.Terms)
        {
            if (!term.Dependence.HasObservation())
                continue;
            var atom = term.Keep(GoesWithObservation);
            var coefficient = term.Keep(f => !GoesWithObservation(f)).WithCoefficient(term.Coefficient);
            var at = atoms.FindIndex(a => Term.CompareFactors(a, atom) == 0);
            if (at < 0)
            {
                at = atoms.Count;
                atoms.Add(atom);
                coefficients.Add(new List<Term>());
            }

            coefficients[at].Add(coefficient);
        }

        return atoms.Select((atom, i) => (atom, Polynomial.Collect(coefficients[i])));
    }

    private static bool GoesWithObservation(Factor factor) =>
        factor.Dependence.HasObservation() || (factor.Dependence == Dependence.Known);
}
