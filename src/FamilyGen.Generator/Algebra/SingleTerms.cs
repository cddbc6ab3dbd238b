using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>Integer powers of one term.</summary>
internal static class SingleTerms
{
    /// <summary>termⁿ for an integer n, factor by factor.</summary>
    public static Polynomial Raise(Term term, Rational n) =>
        Rationals.Abs(n) > 200 && term.Coefficient != Rational.One
            ? Polynomial.Of(Term.Of(Polynomial.Of(term).ToSortedExpression(), Polynomial.Of(n), -1))
            : Polynomial.Of(Term.Of(
                Rationals.Power(term.Coefficient, Rationals.Abs(n) > 200 ? 1 : (int)n.Numerator),
                term.Factors.Select(f => new Factor(f.Base, f.IsIndicator && n.Sign > 0 ? f.Exponent : f.Exponent * n, f.Origin))));
}
