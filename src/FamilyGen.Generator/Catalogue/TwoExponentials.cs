using System.Collections.Generic;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Catalogue;

/// <summary>A sum of two exponentials of x, Be^(bx)·(1 + e^(rate·x + shift)): log(eˣ + e⁻ˣ), log(1 + e⁻ˣ).</summary>
/// <param name="LogFactor">log B.</param>
/// <param name="OuterRate">b.</param>
/// <param name="Rate">The difference of the two rates.</param>
/// <param name="Shift">The difference of the two logarithms at x = 0.</param>
internal sealed record TwoExponentials(Polynomial LogFactor, Polynomial OuterRate, Polynomial Rate, Polynomial Shift)
{
    public static TwoExponentials? Of(Expression sum, Piece piece)
    {
        var terms = new List<(Polynomial Log, Polynomial Rate)>();
        foreach (var term in piece.Value(sum).Terms)
        {
            if (Exponential(term, piece) is not { } exponential || terms.Count == 2)
                return null;
            terms.Add(exponential);
        }

        if (terms.Count != 2)
            return null;
        var (outer, inner) = terms[0].Rate.IsZero ? (terms[0], terms[1]) : (terms[1], terms[0]);
        var rate = inner.Rate - outer.Rate;
        return rate.IsSingleTerm ? new TwoExponentials(outer.Log, outer.Rate, rate, inner.Log - outer.Log) : null;
    }

    // coefficient·e^(rate·x + intercept) with its logarithm at 0
    private static (Polynomial Log, Polynomial Rate)? Exponential(Term term, Piece piece)
    {
        var (log, rate) = (Polynomial.Zero, Polynomial.Zero);
        var rest = term.Keep(f => !f.Dependence.HasObservation()).WithCoefficient(term.Coefficient);
        foreach (var factor in term.Factors)
        {
            if (!factor.Dependence.HasObservation())
                continue;
            if (factor.Base is not Constant { Text: "e" } || Affine.In(factor.Exponent.ToSortedExpression(), piece.Observation) is not { } affine)
                return null;
            rate = piece.Value(affine.Slope);
            log = piece.Value(affine.Intercept);
        }

        return (log + piece.Value(Formula.Log(Polynomial.Of(rest).ToSortedExpression())), rate);
    }
}
