using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>Splits what is left of exponents and finds the factors that tie x and a parameter: where there is one, the kernel
/// is no exponential family.</summary>
internal static class Separation
{
    /// <summary>The kernel with powers split so that each factor is free of x or of parameters where possible:
    /// e^(a+x) = eᵃ·eˣ, x^(a+2) = xᵃ·x².</summary>
    public static IEnumerable<Factor> Factors(Term term) => term.Factors.SelectMany(Split);

    /// <summary>What stands in the way: the distinct factors that tie, each at its place in the source.</summary>
    public static List<Finding> Findings(Polynomial kernel, string observation, bool isExhausted)
    {
        var findings = new List<Finding>();
        foreach (var factor in kernel.Terms.SelectMany(Factors).Where(f => f.Dependence.Ties()))
        {
            var origin = Origin(factor);
            if (findings.Any(f => f.Origin == origin && origin >= 0))
                continue;
            var expression = factor.ToExpression();
            var names = Dependences.Names(expression, SymbolKind.Parameter);
            var hint = isExhausted ? "write the kernel with fewer or lower powers of sums" : Hints.For(factor, names);
            findings.Add(new Finding("FG0501", origin, EquatableArray.Of(
                Rendering.Text(expression), ObservationPart(factor, observation), string.Join(", ", names), hint)));
        }

        return findings;
    }

    /// <summary>The kernel as factors that separate, or with those that tie left in.</summary>
    public static Polynomial Separated(Polynomial kernel) => Polynomial.Collect(kernel.Terms.Select(Regroup));

    private static Term? Regroup(Term term)
    {
        // A base that occurs with exponents of both kinds is written twice, so that every factor is of one kind.
        var needed = term.Factors.Any(f => f.Exponent.Terms.Count > 1 && Split(f).Skip(1).Any());
        if (!needed)
            return term;
        var result = Term.Of(term.Coefficient);
        foreach (var factor in Factors(term))
            result = result.With(factor);
        return result;
    }

    private static IEnumerable<Factor> Split(Factor factor)
    {
        if (factor.Exponent.Terms.Count < 2)
            return new[] { factor };
        return factor.Exponent.Terms
            .GroupBy(t => (t.Dependence.HasObservation(), t.Dependence.HasParameter()))
            .Select(g => new Factor(factor.Base, Polynomial.Collect(g), factor.Origin));
    }

    private static int Origin(Factor factor) => factor.Origin >= 0 ? factor.Origin : factor.Base.Origin;

    // What the tied factor says about x: the parts of its argument that are free of parameters.
    private static string ObservationPart(Factor factor, string observation)
    {
        if (factor.Base is Symbol { Kind: SymbolKind.Observation })
            return observation;
        var parts = new List<string>();
        var inner = factor.Exponent.Dependence.HasObservation() ? factor.Exponent.ToExpression() : factor.Base;
        Collect(inner, parts);
        return parts.Count == 0 ? observation : string.Join(", ", parts.Distinct().Take(3));
    }

    private static Expression WithoutNumbers(Expression expression)
    {
        if (expression is not Product product)
            return expression;
        var factors = product.Factors.Where(f => Dependences.Of(f).HasObservation()).ToArray();
        return factors.Length == 1 ? factors[0] : Formula.Product(factors);
    }

    private static void Collect(Expression expression, List<string> parts)
    {
        var dependence = Dependences.Of(expression);
        if (!dependence.HasObservation())
            return;
        if (!dependence.HasParameter())
        {
            parts.Add(Rendering.Text(WithoutNumbers(expression)));
            return;
        }

        if (expression is Product product)
        {
            var free = product.Factors.Where(f => Dependences.Of(f) is var d && d.HasObservation() && !d.HasParameter()).ToArray();
            if (free.Length > 0)
                parts.Add(Rendering.Text(WithoutNumbers(Formula.Product(free))));
            foreach (var tied in product.Factors.Where(f => Dependences.Of(f).Ties()))
                Collect(tied, parts);
            return;
        }

        foreach (var child in expression.Children())
            Collect(child, parts);
    }
}
