using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>c·(x − s)ⁿ found again in its expanded form.</summary>
/// <param name="Coefficient">c.</param>
/// <param name="Atom">(x − s)ⁿ.</param>
/// <param name="Replaced">The terms of the expanded form that contain x.</param>
/// <param name="Constant">What has to be added to the atom's multiple to give the replaced terms.</param>
internal sealed record PerfectPower(Polynomial Coefficient, Expression Atom, Polynomial Replaced, Polynomial Constant)
{
    private const int HighestDegree = 4;

    public static PerfectPower? Find(Polynomial function, Symbol observation)
    {
        var powers = function.Where(t => Degree(t, observation) is > 0);
        if (powers.Terms.Count < 2)
            return null;
        var degree = powers.Terms.Max(t => Degree(t, observation)!.Value);
        if (degree > HighestDegree || degree < 2)
            return null;
        var x = Term.Of(observation, -1);
        var leading = CoefficientOf(powers, degree, observation);
        var next = CoefficientOf(powers, degree - 1, observation);
        if (!leading.IsSingleTerm || next.IsZero)
            return null;
        var shift = next * SingleTerms.Raise(leading.Terms[0], -1) * new Rational(1, degree);
        var root = Polynomial.Of(x) + shift;
        var expanded = leading;
        for (var i = 0; i < degree; i++)
            expanded *= root;
        var constant = expanded.Where(t => !t.Dependence.HasObservation());
        return (expanded - constant - powers).IsZero
            ? new PerfectPower(leading, Formula.Power(root.ToSortedExpression(), degree), powers, constant * -1)
            : null;
    }

    private static Polynomial CoefficientOf(Polynomial powers, int degree, Symbol observation) => Polynomial.Collect(powers.Terms
        .Where(t => Degree(t, observation) == degree)
        .Select(t => t.Keep(f => !f.Dependence.HasObservation()).WithCoefficient(t.Coefficient)));

    // The degree of c·xⁿ with c free of x, n ≥ 0; null for any other term.
    private static int? Degree(Term term, Symbol observation)
    {
        var factors = term.Factors.Where(f => f.Dependence.HasObservation()).ToList();
        if (factors.Count != 1 || factors[0].Base is not Symbol symbol || symbol.Name != observation.Name)
            return null;
        return factors[0].Exponent.AsInteger() is { } n && n > 0 ? n : null;
    }
}
