using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>Expands formulas into sums of products of irreducible factors. What depends on the observation and what depends
/// on parameters ends up in different factors wherever the rules of the functions allow it.</summary>
/// <param name="scope">The support and the symbols.</param>
/// <param name="keepsCoefficients">Whether sums of parameters alone are left in their brackets.</param>
internal sealed partial class Expander(Scope scope, bool keepsCoefficients = false)
{
    // Beyond these a product of sums is left as it stands; the work stays bounded whatever is declared.
    private const int MostTerms = 1500;
    private const int HighestExpandedPower = 24;
    private const int HighestFreePower = 4;

    private static readonly Expression s_pi = new Constant(Math.PI, "π");

    private readonly Dictionary<Expression, Polynomial> _sums = new(StructuralOrder.Instance);
    private readonly List<Finding> _findings = new();

    public Scope Scope { get; } = scope;

    /// <summary>What was found to be wrong on the way: a support that moves, a condition that ties.</summary>
    public IReadOnlyList<Finding> Findings => _findings;

    /// <summary>Whether a product was too large to be multiplied out.</summary>
    public bool IsExhausted { get; private set; }

    public Polynomial Expand(Expression expression)
    {
        switch (expression)
        {
            case Number number:
                return Polynomial.Of(number.Value);
            case Constant constant:
                return OfConstant(constant);
            case Symbol symbol:
                return Polynomial.Of(symbol with { Origin = -1 }, symbol.Origin);
            case Sum sum:
                var total = sum.Terms.Aggregate(Polynomial.Zero, (all, t) => all + Expand(t));
                return total.IsNegativeInfinity ? NegativeInfinity : total;
            case Product or Power or Call { Function: Function.Exp }:
                return Factored(expression) is { } term ? MultiplyOut(term) : Polynomial.Zero;
            case Conditional conditional:
                return OfConditional(conditional);
            case Call call:
                return OfCall(call);
            case Opaque opaque:
                return Polynomial.Of(opaque with { Arguments = opaque.Arguments.Select(Sorted).ToEquatableArray(), Origin = opaque.Origin }, opaque.Origin);
            default:
                return Polynomial.Of(expression);
        }
    }

    /// <summary>Expands and writes the result down again, in the order that depends on its content alone.</summary>
    public Expression Sorted(Expression expression) => Expand(expression).ToSortedExpression();

    private static Polynomial NegativeInfinity { get; } = Polynomial.Of(Formula.NegativeInfinity);

    private static Polynomial OfConstant(Constant constant)
    {
        if (constant.Value == Math.E)
            return Polynomial.Of(Formula.E);
        if (double.IsPositiveInfinity(constant.Value))
            return NegativeInfinity * -1;
        if (double.IsNegativeInfinity(constant.Value))
            return NegativeInfinity;
        if (constant.Value == Math.Floor(constant.Value) && Math.Abs(constant.Value) < 1e15)
            return Polynomial.Of((Rational)(long)constant.Value);
        return PiMultiple(constant.Value) ?? Polynomial.Of(constant with { Origin = -1 });
    }

    // 2π, as the compiler folds it, is twice π.
    private static Polynomial? PiMultiple(double value)
    {
        var ratio = value / Math.PI;
        for (var denominator = 1; denominator <= 12; denominator++)
        {
            var numerator = Math.Round(ratio * denominator);
            if (numerator != 0 && Math.Abs(numerator) <= 720 && Math.PI * numerator / denominator == value)
                return Polynomial.Of(s_pi) * new Rational((long)numerator, denominator);
        }

        return null;
    }

    /// <summary>The formula as one term whose sums are not multiplied out; null when it is zero.</summary>
    public Term? Factored(Expression expression)
    {
        switch (expression)
        {
            case Product product:
                var result = Term.Of(Rational.One);
                foreach (var factor in product.Factors)
                {
                    if (Factored(factor) is not { } next || Term.Multiply(result, next) is not { } multiplied)
                        return null;
                    result = multiplied;
                }

                return Finite(result);
            case Power power:
                if (Lifted(power) is { } lifted)
                    return Factorize(Expand(lifted), power.Origin);
                return Raise(Factored(power.Base), Expand(power.Exponent), power.Origin);
            case Call { Function: Function.Exp } exp:
                if (Lifted(exp) is { } liftedExp)
                    return Factorize(Expand(liftedExp), exp.Origin);
                return Exponential(Expand(exp.Arguments[0]), exp.Origin);
            default:
                return Factorize(Expand(expression), expression.Origin);
        }
    }

    // −∞ swallows every finite factor; a negative one makes it +∞.
    private static Term Finite(Term term)
    {
        var infinite = term.Factors.FirstOrDefault(f => f.Base.IsNegativeInfinity());
        return infinite is null ? term : Term.Of(infinite.Base, -1).WithCoefficient(term.Coefficient.Sign);
    }

    private Polynomial MultiplyOut(Term term)
    {
        var sums = term.Factors.Where(IsExpandable).ToList();
        if (sums.Count == 0)
            return Polynomial.Of(term);
        var result = Polynomial.Of(term.Keep(f => !sums.Contains(f)).WithCoefficient(term.Coefficient));
        foreach (var factor in sums)
        {
            var sum = Polynomial.Zero;
            if (!_sums.TryGetValue(factor.Base, out sum!))
                sum = ((Sum)factor.Base).Terms.Aggregate(Polynomial.Zero, (all, t) => all + Expand(t));
            for (var i = factor.Exponent.AsInteger()!.Value; i > 0; i--)
            {
                if ((long)result.Terms.Count * sum.Terms.Count > MostTerms)
                {
                    IsExhausted = true;
                    result *= Term.Of(factor.Base, Polynomial.Of((Rational)i), factor.Origin);
                    break;
                }

                result *= sum;
            }
        }

        return result;
    }

    private bool IsExpandable(Factor factor) =>
        factor.Base is Sum
        && !(keepsCoefficients && factor.Dependence == Dependence.Parameter)
        && factor.Exponent.AsInteger() is { } n
        && n > 0
        && n <= (factor.Dependence.Ties() ? HighestExpandedPower : HighestFreePower);

    /// <summary>A sum as unit · rest, where the unit takes the common factors of all terms; null when it is zero.</summary>
    private Term? Factorize(Polynomial sum, int origin)
    {
        if (sum.Terms.Count < 2)
            return sum.IsZero ? null : sum.Terms[0];
        if (keepsCoefficients && sum.Dependence == Dependence.Parameter)
        {
            var written = sum.ToExpression(origin);
            _sums[written] = sum;
            return Term.Of(written, origin);
        }

        var unit = CommonTerm(sum.Terms);
        var rest = Polynomial.Collect(sum.Terms.Select(t => Term.Multiply(t, Inverse(unit))));
        var leading = rest.Sorted()[0].Coefficient;
        var expression = rest.ToSortedExpression();
        var range = Scope.RangeOf(expression);
        if (range.IsNegative || (!range.IsPositive && !range.IsNonNegative && leading.Sign < 0))
        {
            rest *= -1;
            unit = unit.WithCoefficient(-unit.Coefficient);
            expression = rest.ToSortedExpression();
        }

        if (rest.Terms.Count < 2)
            return Term.Multiply(unit, rest.Terms[0]);
        expression = expression with { Origin = origin };
        _sums[expression] = rest;
        return Term.Multiply(unit, Term.Of(expression, origin));
    }

    private static Term Inverse(Term term) => SingleTerms.Raise(term, -1).Terms[0];

    // The factors that every term has, with the exponent nearest to zero, and the common divisor of the coefficients.
    private static Term CommonTerm(IReadOnlyList<Term> terms)
    {
        var content = terms.Select(t => Rationals.Abs(t.Coefficient)).Aggregate(Rationals.CommonDivisor);
        var common = new List<Factor>();
        foreach (var factor in terms[0].Factors.Where(f => !f.IsIndicator))
        {
            var exponents = terms
                .Select(t => t.Factors.FirstOrDefault(f => StructuralOrder.Same(f.Base, factor.Base))?.Exponent)
                .ToList();
            if (exponents.All(e => e is not null) && CommonExponent(exponents!) is { IsZero: false } exponent)
                common.Add(new Factor(factor.Base, exponent, factor.Origin));
        }

        return Term.Of(content, common)!;
    }

    private static Polynomial CommonExponent(List<Polynomial> exponents)
    {
        // e^(a+x) and e^a have e^a in common: the parts of the exponents that agree.
        var shared = exponents[0].Where(t => !t.IsNumber && exponents.All(e => e.Terms.Any(u => Term.CompareFactors(t, u) == 0 && t.Coefficient == u.Coefficient)));
        var numbers = exponents.Select(e => e.Terms.FirstOrDefault(t => t.IsNumber)?.Coefficient ?? Rational.Zero).ToList();
        var nearest = numbers.All(n => n.Sign > 0) ? numbers.Min() : numbers.All(n => n.Sign < 0) ? numbers.Max() : Rational.Zero;
        return shared + Polynomial.Of(nearest);
    }
}
