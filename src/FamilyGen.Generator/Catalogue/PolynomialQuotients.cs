using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Catalogue;

internal static class PolynomialQuotients
{
    /// <summary>1/p: exact for a single term, else a power of the whole sum.</summary>
    public static Polynomial Inverse(this Polynomial p) => p.IsSingleTerm
        ? SingleTerms.Raise(p.Terms[0], -1)
        : Polynomial.Of(Formula.Power(p.ToSortedExpression(), -1));
}
