using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>Powers and exponentials.</summary>
internal sealed partial class Expander
{
    // (c·u·v)^p factor by factor, where the signs allow it.
    private Term? Raise(Term? term, Polynomial exponent, int origin)
    {
        if (term is null)
        {
            // 0⁰ = 1, and a negative power of 0 is infinite.
            return exponent.IsZero ? Term.Of(Rational.One)
                : Scope.RangeOf(exponent.ToSortedExpression()).IsNegative ? NegativeInfinity.Terms[0].WithCoefficient(-1)
                : null;
        }

        if (exponent.AsRational() is { IsInteger: true } n)
            return SingleTerms.Raise(term, n).Terms.FirstOrDefault();

        var factors = new List<Factor>();
        var split = SplitSigns(term);
        foreach (var factor in split.Positive)
            factors.Add(new Factor(factor.Base, factor.Exponent * exponent, origin));
        if (split.Rest is { } rest)
            factors.Add(Alone(rest, exponent, origin));
        var result = Term.Of(Rational.One, factors);
        if (split.Coefficient != Rational.One && result is not null)
            result = Term.Multiply(result, RaiseNumber(split.Coefficient, exponent, origin));
        return result;
    }

    private static Factor Alone(Term rest, Polynomial exponent, int origin) =>
        rest.Factors.Count == 1 && rest.Coefficient == Rational.One
            ? new Factor(rest.Factors[0].Base, rest.Factors[0].Exponent * exponent, origin)
            : new Factor(Polynomial.Of(rest).ToSortedExpression(), exponent, origin);

    private Term RaiseNumber(Rational value, Polynomial exponent, int origin)
    {
        if (exponent.AsRational() is { } fraction)
        {
            var root = fraction.Denominator < 60 ? Rationals.Root(value, (int)fraction.Denominator) : null;
            if (root is { } exact && Rationals.Abs(fraction) < 200)
                return Term.Of(Rationals.Power(exact, (int)fraction.Numerator));
            var parts = new[]
            {
                new Factor(Formula.Of(new Rational(value.Numerator, 1)), exponent, origin),
                new Factor(Formula.Of(new Rational(value.Denominator, 1)), exponent * -1, origin),
            };
            return Term.Of(Rational.One, parts.Where(f => !f.Base.IsOne()))!;
        }

        // c^x is e^(x·log c), so that exponentials have one form.
        return exponent.Dependence.HasObservation()
            ? Exponential(exponent * LogOf(Term.Of(value), origin), origin)!
            : Term.Of(Formula.Of(value), exponent, origin);
    }

    private Term? Exponential(Polynomial exponent, int origin)
    {
        if (exponent.IsNegativeInfinity)
            return null;
        var result = Term.Of(Rational.One);
        var remaining = new List<Term>();
        foreach (var term in exponent.Terms)
        {
            // e^(c·log u) is u^c.
            var logs = term.Factors.Where(f => f.Base is Call { Function: Function.Log } && f.Exponent.IsOne).ToList();
            var log = logs.FirstOrDefault(f => f.Dependence.HasObservation()) ?? logs.FirstOrDefault();
            var rest = log is null ? null : term.Keep(f => f != log).WithCoefficient(term.Coefficient);
            if (log is null || rest!.Dependence.HasObservation())
            {
                remaining.Add(term);
                continue;
            }

            var inner = ((Call)log.Base).Arguments[0];
            result = Term.Multiply(result, Term.Of(inner, Polynomial.Of(rest), origin));
            if (result is null)
                return null;
        }

        var sum = Polynomial.Collect(remaining);
        if (sum.IsZero)
            return result;

        // One base e for the whole exponent; the separation splits it where the kernel is taken apart.
        return Term.Multiply(result, Term.Of(Formula.E, sum, origin));
    }

    private readonly record struct Signed(Rational Coefficient, List<Factor> Positive, Term? Rest);

    // Writes a term that is positive where its logarithm is taken as coefficient · positive factors · rest: the rest is the
    // product of the factors whose sign on the support is not known. Parameters and known values are taken for positive.
    private Signed SplitSigns(Term term)
    {
        var sign = term.Coefficient.Sign;
        var positive = new List<Factor>();
        var rest = new List<Factor>();
        var assumed = new List<int>();
        foreach (var factor in term.Factors)
        {
            var exponent = factor.Exponent.AsInteger();
            var range = Scope.RangeOf(factor.Base);
            var whole = exponent is not null;
            if (factor.Base is Constant { Text: "e" } || range.IsNonNegative || (!whole && !factor.Exponent.IsZero))
            {
                positive.Add(factor);
            }
            else if (range.IsNonPositive)
            {
                if (exponent!.Value % 2 != 0)
                    sign = -sign;
                positive.Add(new Factor(Sorted(Formula.Negate(factor.Base)) with { Origin = factor.Base.Origin }, factor.Exponent, factor.Origin));
            }
            else if (exponent!.Value % 2 == 0)
            {
                positive.Add(new Factor(new Call(Function.Abs, EquatableArray.Of(factor.Base)) { Origin = factor.Origin }, factor.Exponent, factor.Origin));
            }
            else if (!factor.Dependence.HasObservation() && (factor.Dependence & Dependence.Natural) == 0)
            {
                assumed.Add(positive.Count);
                positive.Add(factor);
            }
            else
            {
                rest.Add(factor);
            }
        }

        if (sign < 0 && rest.Count == 0 && assumed.Count > 0)
        {
            // Only with a negative parameter is the term positive at all; p/(p − 1) is rather p/(1 − p) than −p/(p − 1).
            var at = assumed.FindIndex(i => positive[i].Base is Sum) is >= 0 and var sum ? assumed[sum] : assumed[0];
            var factor = positive[at];
            positive[at] = new Factor(Sorted(Formula.Negate(factor.Base)), factor.Exponent, factor.Origin);
            sign = 1;
        }

        var coefficient = Rationals.Abs(term.Coefficient);
        if (rest.Count == 0)
            return new Signed(sign < 0 ? -coefficient : coefficient, positive, null);
        var product = Term.Of(Rational.One, rest)!;
        if (sign < 0)
            product = Negated(product);
        return new Signed(coefficient, positive, product);
    }

    private Term Negated(Term product)
    {
        if (product.Factors.Count != 1 || !product.Factors[0].Exponent.IsOne)
            return product.WithCoefficient(-product.Coefficient);
        var inner = product.Factors[0];
        return Term.Of(Sorted(Formula.Negate(inner.Base)) with { Origin = inner.Base.Origin }, inner.Origin);
    }
}
