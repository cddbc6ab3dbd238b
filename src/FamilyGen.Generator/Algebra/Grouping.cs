using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>Writes a coefficient with common factors before the bracket, size·(1 − mean) − 1, as it was before it was
/// multiplied out: shorter, and 1 − mean then loses no digits to the rest.</summary>
internal static class Grouping
{
    public static Expression Write(Polynomial coefficient)
    {
        var common = MostCommon(coefficient);
        if (common is null)
            return coefficient.ToExpression();
        var inside = Polynomial.Collect(coefficient.Terms.Where(t => Contains(t, common)).Select(t => t.Keep(f => !IsSame(f, common)).WithCoefficient(t.Coefficient)));
        var outside = coefficient.Where(t => !Contains(t, common));
        var parts = new List<Expression>();

        // The group stands where its first term stood.
        if (Contains(coefficient.Terms[0], common))
            parts.Add(Group(common, inside));
        if (!outside.IsZero)
            parts.Add(Write(outside));
        if (!Contains(coefficient.Terms[0], common))
            parts.Add(Group(common, inside));
        return parts.Count == 1 ? parts[0] : Formula.Sum(parts.SelectMany(p => p is Sum sum ? sum.Terms.AsEnumerable() : new[] { p }).ToArray());
    }

    private static Expression Group(Factor common, Polynomial inside)
    {
        var sign = inside.Terms.All(t => t.Coefficient.Sign < 0) ? -1 : 1;
        var bracket = Write(inside * sign);
        if (bracket is Sum)
            bracket = MostCommon(inside) is null ? (inside * sign).ToSortedExpression() : bracket;
        return sign < 0 ? Formula.Product(Formula.Of(-1), common.ToExpression(), bracket) : Formula.Product(common.ToExpression(), bracket);
    }

    // The factor that most terms share, the first one of equals.
    private static Factor? MostCommon(Polynomial coefficient) => coefficient.Terms
        .SelectMany(t => t.Factors)
        .Where(f => !f.IsIndicator && f.Dependence != Dependence.None)
        .Select(f => (Factor: f, Count: coefficient.Terms.Count(t => Contains(t, f))))
        .Where(c => c.Count > 1)
        .OrderByDescending(c => c.Count)
        .Select(c => c.Factor)
        .FirstOrDefault();

    private static bool Contains(Term term, Factor factor) => term.Factors.Any(f => IsSame(f, factor));

    private static bool IsSame(Factor a, Factor b) => StructuralOrder.Same(a.Base, b.Base) && Polynomial.Same(a.Exponent, b.Exponent);
}
