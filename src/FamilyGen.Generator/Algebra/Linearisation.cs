using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>Expanded functions of x in atoms between which no affine relation is left: products of waves become sums of
/// waves, of an indicator and its complement one is kept.</summary>
internal sealed class Linearisation(Expander expander)
{
    private const int MostRounds = 12;

    public Polynomial Of(Polynomial function)
    {
        for (var round = 0; round < MostRounds; round++)
        {
            var terms = new List<Term?>();
            var changed = false;
            foreach (var term in function.Terms)
            {
                if ((Waves(term) ?? Complement(term)) is { } rewritten)
                {
                    terms.AddRange(rewritten.Terms);
                    changed = true;
                }
                else
                {
                    terms.Add(term);
                }
            }

            if (!changed)
                break;
            function = Polynomial.Collect(terms);
        }

        return function;
    }

    // cos u cos v = ½(cos(u − v) + cos(u + v)) and its like, for two waves in one term.
    private Polynomial? Waves(Term term)
    {
        var waves = term.Factors.Where(f => f.Base is Call { Function: Function.Cos or Function.Sin } && f.Exponent.AsInteger() is > 0).ToList();
        if (waves.Count == 0 || (waves.Count == 1 && waves[0].Exponent.IsOne))
            return null;
        var first = waves[0];
        var second = first.Exponent.IsOne ? waves[1] : first;
        var rest = Term.Of(term.Coefficient, term.Factors.Where(f => f != first && f != second));
        foreach (var used in new[] { first, second }.Distinct())
        {
            var left = used.Exponent.AsInteger()!.Value - (first == second ? 2 : 1);
            if (left > 0 && rest is not null)
                rest = Term.Multiply(rest, Term.Of(used.Base, Polynomial.Of((Rational)left), -1));
        }

        if (rest is null)
            return Polynomial.Zero;
        var (a, b) = ((Call)first.Base, (Call)second.Base);
        var (u, v) = (expander.Expand(a.Arguments[0]), expander.Expand(b.Arguments[0]));
        var product = (a.Function, b.Function) switch
        {
            (Function.Cos, Function.Cos) => Wave(Function.Cos, u - v) + Wave(Function.Cos, u + v),
            (Function.Sin, Function.Sin) => Wave(Function.Cos, u - v) - Wave(Function.Cos, u + v),
            (Function.Sin, _) => Wave(Function.Sin, u + v) + Wave(Function.Sin, u - v),
            _ => Wave(Function.Sin, u + v) - Wave(Function.Sin, u - v),
        };
        return product * new Rational(1, 2) * rest;
    }

    private Polynomial Wave(Function function, Polynomial argument) =>
        expander.Expand(Formula.Call(function, argument.ToSortedExpression()));

    // f·[not c] = f − f·[c].
    private static Polynomial? Complement(Term term)
    {
        var indicator = term.Factors.FirstOrDefault(f => f.IsIndicator);
        if (indicator is null || Kept(((Conditional)indicator.Base).Condition) is not { } kept)
            return null;
        var rest = Polynomial.Of(term.Keep(f => f != indicator).WithCoefficient(term.Coefficient));
        return rest - (rest * Polynomial.Of(Formula.Indicator(kept)));
    }

    // The other of a condition and its opposite, where that is the one to be kept.
    private static Condition? Kept(Condition condition) => condition switch
    {
        Not not => not.Operand,
        Comparison { Relation: Relation.LessOrEqual } => Conditions.Not(condition),
        _ => null,
    };
}
