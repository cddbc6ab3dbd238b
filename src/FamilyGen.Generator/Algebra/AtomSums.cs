using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>Writes an expanded function of x as weighted atoms.</summary>
internal static class AtomSums
{
    /// <summary>Every term as coefficient · atom. A perfect power (x − s)ⁿ is put together again: it does not cancel when it
    /// is evaluated. Without <paramref name="withConstant"/> terms free of x are left out.</summary>
    public static AtomSum Of(Polynomial function, Symbol observation, bool withConstant)
    {
        var terms = new List<WeightedAtom>();
        var constant = function.Where(t => !t.Dependence.HasObservation());
        var rest = function - constant;
        if (PerfectPower.Find(rest, observation) is { } power)
        {
            rest -= power.Replaced;
            constant += power.Constant;
            terms.Add(new WeightedAtom(Clean(power.Coefficient), power.Atom.WithoutOrigins()));
        }

        foreach (var term in rest.Terms)
            terms.Add(Split(term));
        if (withConstant && !constant.IsZero)
            terms.Add(new WeightedAtom(Clean(constant), Formula.One));
        return new AtomSum(terms.ToEquatableArray());
    }

    /// <summary>One term as coefficient · atom.</summary>
    public static WeightedAtom Split(Term term)
    {
        var coefficient = term.Keep(f => !f.Dependence.HasObservation()).WithCoefficient(term.Coefficient);
        var atom = Flattened(term.Keep(f => f.Dependence.HasObservation()).ToExpression());
        return new WeightedAtom(Clean(Polynomial.Of(coefficient)), atom.WithoutOrigins());
    }

    /// <summary>The sum as one formula.</summary>
    public static Expression ToExpression(this AtomSum sum)
    {
        var terms = sum.Terms.Select(t => t.Coefficient.IsOne() ? t.Atom : Formula.Product(t.Coefficient, t.Atom)).ToArray();
        return terms.Length == 1 ? terms[0] : Formula.Sum(terms);
    }

    private static Expression Clean(Polynomial coefficient) => coefficient.ToSortedExpression().WithoutOrigins();

    // −∞ on one set inside another is −∞ on their intersection.
    private static Expression Flattened(Expression atom)
    {
        if (atom is Conditional { WhenFalse: Number { Value.IsZero: true }, WhenTrue: Conditional { WhenFalse: Number { Value.IsZero: true } } inner } outer
            && inner.WhenTrue.IsNegativeInfinity())
        {
            return new Conditional(Conditions.And(outer.Condition, inner.Condition), inner.WhenTrue, Formula.Zero);
        }

        return atom;
    }
}
