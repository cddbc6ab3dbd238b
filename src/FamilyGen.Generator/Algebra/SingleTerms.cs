using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>Integer powers of one term.</summary>
internal static class SingleTerms
{
    /// <summary>termⁿ for an integer n, factor by factor.</summary>
    public static Polynomial Raise(Term term, Rational n) =>
        term.Coefficient != Rational.One && Rationals.IsTooLarge(term.Coefficient, n)
            ? Polynomial.Of(Term.Of(Polynomial.Of(term).ToSortedExpression(), Polynomial.Of(n), -1))
            : Polynomial.Of(Term.Of(
                term.Coefficient == Rational.One ? Rational.One : Rationals.Power(term.Coefficient, (int)n.Numerator),
                term.Factors.Select(f => new Factor(f.Base, f.IsIndicator && n.Sign > 0 ? f.Exponent : f.Exponent * n, f.Origin))));
}
