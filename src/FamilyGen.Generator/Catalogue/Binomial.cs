using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Catalogue;

/// <summary>c ± d·uᵏ with c, d &gt; 0; known values are taken for positive.</summary>
/// <param name="Constant">c.</param>
/// <param name="Factor">d.</param>
/// <param name="Power">k.</param>
/// <param name="IsRising">Whether the sign is +.</param>
internal sealed record Binomial(Polynomial Constant, Polynomial Factor, Polynomial Power, bool IsRising)
{
    public static Binomial? Of(Expression expression, Piece piece)
    {
        var sum = piece.Value(expression);
        var constant = sum.Where(t => !t.Dependence.HasObservation());
        var rest = sum - constant;
        if (constant.IsZero || !rest.IsSingleTerm)
            return null;
        var term = rest.Terms[0];
        var inner = term.Factors.Where(f => f.Dependence.HasObservation()).ToList();
        if (inner.Count != 1 || inner[0].Base is not Symbol || inner[0].Exponent.Dependence.HasObservation())
            return null;
        var factor = Polynomial.Of(term.Keep(f => !f.Dependence.HasObservation()).WithCoefficient(term.Coefficient));
        var range = piece.Scope.RangeOf(factor.ToSortedExpression());
        if (piece.Scope.RangeOf(constant.ToSortedExpression()).IsNegative)
            return null;
        return range.IsNegative ? new Binomial(constant, factor * (Rational)(-1), inner[0].Exponent, false)
            : new Binomial(constant, factor, inner[0].Exponent, true);
    }

    /// <summary>(c/d)^(1/k), where both terms are of one size.</summary>
    public Polynomial Scale(Piece piece) => piece.Value(new Power(
        Formula.Quotient(Constant.ToSortedExpression(), Factor.ToSortedExpression()), Formula.Power(Power.ToSortedExpression(), -1)));
}
