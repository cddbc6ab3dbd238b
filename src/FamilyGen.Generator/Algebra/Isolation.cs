using System;
using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>Solves one equation for one symbol by peeling: what multiplies it, what surrounds it.</summary>
internal sealed class Isolation(Expander expander, string unknown)
{
    private const int DeepestPeel = 12;

    /// <summary>The symbol's value where left = right, with right free of it; null where peeling does not reach it.</summary>
    public Polynomial? Solve(Polynomial left, Polynomial right) => Solve(left, right, 0);

    private Polynomial? Solve(Polynomial left, Polynomial right, int depth)
    {
        if (depth > DeepestPeel)
            return null;
        var moving = left.Where(t => t.Factors.Any(Has));
        right -= left - moving;
        var parts = Grouped(moving);
        if (parts.Count == 0)
            return null;
        if (parts.Count > 1)
            return OfLogarithms(parts, right);
        var (part, coefficient) = parts[0];
        right = Divide(right, coefficient);
        if (part.Factors.Count > 1)
            return part.Factors.All(f => f.Exponent.AsInteger() is not null) ? OfFraction(part.Factors.Select(f => (f.Base, f.Exponent.AsInteger()!.Value)), right) : null;
        return Peel(part.Factors[0], right, depth);
    }

    private Polynomial? Peel(Factor factor, Polynomial right, int depth)
    {
        if (Mentions(factor.Exponent.ToExpression()))
        {
            // b^g(p) = r
            if (Mentions(factor.Base))
                return null;
            var log = Log(right);
            if (factor.Base is not Constant { Text: "e" })
                log = Divide(log, Log(Polynomial.Of(factor.Base)));
            return Solve(factor.Exponent, log, depth + 1);
        }

        var root = factor.Exponent.IsOne
            ? right
            : expander.Expand(new Power(right.ToSortedExpression(), Divide(Polynomial.One, factor.Exponent).ToSortedExpression()));
        return factor.Base switch
        {
            Symbol => root,
            Sum sum => Solve(expander.Expand(sum), root, depth + 1),
            Call { Function: Function.Log } call => Solve(expander.Expand(call.Arguments[0]), Exp(root), depth + 1),
            _ => null,
        };
    }

    // c·(n₁ log u₁ + n₂ log u₂ + …) = r with integers n: the product of uᵢ^nᵢ is e^(r/c).
    private Polynomial? OfLogarithms(List<(Term Part, Polynomial Coefficient)> parts, Polynomial right)
    {
        var scale = parts[0].Coefficient;
        var factors = new List<(Expression, int)>();
        foreach (var (part, coefficient) in parts)
        {
            if (part.Factors.Count != 1 || part.Factors[0] is not { Base: Call { Function: Function.Log } log, Exponent.IsOne: true })
                return OfPolynomial(parts, right);
            if (Divide(coefficient, scale).AsInteger() is not { } n)
                return null;
            factors.Add((log.Arguments[0], n));
        }

        return OfFraction(factors, Exp(Divide(right, scale)));
    }

    // Π uᵢ^nᵢ = r, where numerator − r·denominator is linear in the unknown.
    private Polynomial? OfFraction(IEnumerable<(Expression Base, int Exponent)> factors, Polynomial right)
    {
        var (numerator, denominator) = (Polynomial.One, Polynomial.One);
        foreach (var (factor, exponent) in factors)
        {
            for (var i = 0; i < Math.Abs(exponent) && i < 8; i++)
            {
                if (exponent > 0)
                    numerator *= expander.Expand(factor);
                else
                    denominator *= expander.Expand(factor);
            }
        }

        return Linear(numerator - (right * denominator));
    }

    private Polynomial? OfPolynomial(List<(Term Part, Polynomial Coefficient)> parts, Polynomial right) =>
        Linear(parts.Select(p => Polynomial.Of(p.Part) * p.Coefficient).Aggregate(Polynomial.Zero, (a, b) => a + b) - right);

    // a·p + b = 0.
    private Polynomial? Linear(Polynomial equation)
    {
        var moving = equation.Where(t => t.Factors.Any(Has));
        var parts = Grouped(moving);
        if (parts.Count != 1 || parts[0].Part.Factors.Count != 1 || parts[0].Part.Factors[0] is not { Base: Symbol, Exponent.IsOne: true })
            return null;
        return Divide((equation - moving) * -1, parts[0].Coefficient);
    }

    // The terms by what depends on the unknown.
    private List<(Term Part, Polynomial Coefficient)> Grouped(Polynomial moving)
    {
        var parts = new List<(Term Part, Polynomial Coefficient)>();
        foreach (var term in moving.Terms)
        {
            var part = term.Keep(Has);
            var rest = Polynomial.Of(term.Keep(f => !Has(f)).WithCoefficient(term.Coefficient));
            var at = parts.FindIndex(p => Term.CompareFactors(p.Part, part) == 0);
            if (at < 0)
                parts.Add((part, rest));
            else
                parts[at] = (part, parts[at].Coefficient + rest);
        }

        return parts;
    }

    private Polynomial Divide(Polynomial a, Polynomial b) =>
        b.AsRational() is { IsZero: false } number
            ? a * (Rational.One / number)
            : expander.Expand(Formula.Quotient(a.ToExpression(), b.ToExpression()));

    private Polynomial Log(Polynomial value) => expander.Expand(Formula.Log(value.ToExpression()));

    private Polynomial Exp(Polynomial value) => expander.Expand(Formula.Exp(value.ToExpression()));

    private bool Has(Factor factor) => factor.Dependence.HasParameter() && (Mentions(factor.Base) || Mentions(factor.Exponent.ToExpression()));

    private bool Mentions(Expression expression) =>
        Dependences.Symbols(expression).Any(s => s.Kind == SymbolKind.Parameter && s.Name == unknown);
}
