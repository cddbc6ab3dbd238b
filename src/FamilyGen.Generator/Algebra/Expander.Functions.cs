using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>Logarithms, waves, absolute values, extremes and the functions that are taken as they are.</summary>
internal sealed partial class Expander
{
    private Polynomial OfCall(Call call)
    {
        if (Lifted(call) is { } lifted)
            return Expand(lifted);
        switch (call.Function)
        {
            case Function.Log:
                return Factored(call.Arguments[0]) is { } term ? LogOf(term, call.Origin, call.Arguments[0].Origin) : NegativeInfinity;
            case Function.Cos or Function.Sin:
                return Wave(call.Function, Expand(call.Arguments[0]), call.Origin);
            case Function.Abs:
                return AbsOf(Factored(call.Arguments[0]), call.Origin);
            case Function.Min or Function.Max:
                return call.Arguments.Skip(1).Aggregate(Expand(call.Arguments[0]), (all, next) => Extreme(call, all, Expand(next)));
            case Function.LogGamma when Expand(call.Arguments[0]).AsInteger() is { } n && n > 0 && n <= 20:
                return LogOf(Term.Of(Enumerable.Range(1, n - 1).Aggregate(Rational.One, (product, i) => product * i)), call.Origin);
            case Function.Sign:
                var range = Scope.RangeOf(Sorted(call.Arguments[0]));
                return range.IsPositive ? Polynomial.One : range.IsNegative ? Polynomial.Of(-1) : Atom(call);
            default:
                return Atom(call);
        }
    }

    private Polynomial Atom(Call call) =>
        Polynomial.Of(call with { Arguments = call.Arguments.Select(Sorted).ToEquatableArray() }, call.Origin);

    private static Polynomial Atom(Function function, Expression argument, int origin) =>
        Polynomial.Of(new Call(function, EquatableArray.Of(argument)) { Origin = origin }, origin);

    // Where the argument is itself a sum, the logarithm is what ties; inside a product or power it is the sum that does.
    private Polynomial LogOf(Term term, int origin, int argumentOrigin = -1)
    {
        var split = SplitSigns(term);
        var result = Polynomial.Zero;
        foreach (var factor in split.Positive)
        {
            if (factor.Base is Constant { Text: "e" })
                result += factor.Exponent;
            else if (factor.Base is Number number)
                result += LogOf(Term.Of(number.Value), origin) * factor.Exponent;
            else
                result += Atom(Function.Log, factor.Base, Place(factor.Base)) * factor.Exponent;
        }

        if (split.Rest is { } rest)
        {
            result += rest.Factors.Count == 1 && rest.Coefficient == Rational.One
                ? Atom(Function.Log, rest.Factors[0].Base, Place(rest.Factors[0].Base)) * rest.Factors[0].Exponent
                : Atom(Function.Log, Polynomial.Of(rest).ToSortedExpression(), origin);
        }

        if (split.Coefficient.Sign < 0)
            return result + Atom(Function.Log, Formula.Of(split.Coefficient), origin);
        return result + LogOfInteger(split.Coefficient.Numerator, origin) - LogOfInteger(split.Coefficient.Denominator, origin);

        int Place(Expression inner) => inner.Origin < 0 || inner.Origin == argumentOrigin ? origin : inner.Origin;
    }

    private static Polynomial LogOfInteger(System.Numerics.BigInteger value, int origin) =>
        value.IsOne ? Polynomial.Zero : Atom(Function.Log, Formula.Of(new Rational(value, 1)), origin);

    // cos(u + a) = cos u cos a − sin u sin a and sin(u + a) = sin u cos a + cos u sin a, where a holds the parameters.
    private Polynomial Wave(Function function, Polynomial argument, int origin)
    {
        var moved = argument.Where(t => t.Dependence.HasParameter() && !t.Dependence.HasObservation());
        var rest = argument - moved;
        if (moved.IsZero || !rest.Dependence.HasObservation())
            return PlainWave(function, argument, origin);
        var (cosRest, sinRest) = (PlainWave(Function.Cos, rest, origin), PlainWave(Function.Sin, rest, origin));
        var (cosMoved, sinMoved) = (PlainWave(Function.Cos, moved, origin), PlainWave(Function.Sin, moved, origin));
        return function == Function.Cos
            ? (cosRest * cosMoved) - (sinRest * sinMoved)
            : (sinRest * cosMoved) + (cosRest * sinMoved);
    }

    private static Polynomial PlainWave(Function function, Polynomial argument, int origin)
    {
        if (argument.IsZero)
            return function == Function.Cos ? Polynomial.One : Polynomial.Zero;
        if (argument.Sorted()[0].Coefficient.Sign > 0)
            return Atom(function, argument.ToSortedExpression(), origin);
        var turned = Atom(function, (argument * -1).ToSortedExpression(), origin);
        return function == Function.Cos ? turned : turned * -1;
    }

    private Polynomial AbsOf(Term? term, int origin)
    {
        if (term is null)
            return Polynomial.Zero;
        var result = Term.Of(Rationals.Abs(term.Coefficient));
        foreach (var factor in term.Factors)
        {
            var range = Scope.RangeOf(factor.Base);
            var plain = factor.Base is Constant { Text: "e" } || range.IsNonNegative || factor.Exponent.AsInteger() is not { } n || n % 2 == 0;
            var next = plain ? Term.Of(factor.Base, factor.Exponent, factor.Origin)
                : range.IsNonPositive ? Term.Of(Sorted(Formula.Negate(factor.Base)), factor.Exponent, factor.Origin)
                : Term.Of(new Call(Function.Abs, EquatableArray.Of(factor.Base)) { Origin = origin }, factor.Exponent, origin);
            if (Term.Multiply(result, next) is not { } multiplied)
                return Polynomial.Zero;
            result = multiplied;
        }

        return MultiplyOut(result);
    }

    // One of the two where the order is known on the whole support; positive common factors go before; a moving kink becomes
    // the conditional that it is, so that it is found out like one.
    private Polynomial Extreme(Call call, Polynomial first, Polynomial second)
    {
        var range = Scope.RangeOf((first - second).ToSortedExpression());
        var isMin = call.Function == Function.Min;
        if (range.IsNonPositive)
            return isMin ? first : second;
        if (range.IsNonNegative)
            return isMin ? second : first;
        if ((first.Dependence | second.Dependence).Ties())
        {
            var scale = CommonTerm(first.Terms.Concat(second.Terms).ToList()).Keep(f => Scope.IsPositive(f.ToExpression()));
            if (!scale.IsNumber)
                return Extreme(call, first * Inverse(scale), second * Inverse(scale)) * scale;
            return Expand(AsConditional(call, first.ToExpression(), second.ToExpression()));
        }

        return Polynomial.Of(new Call(call.Function, EquatableArray.Of(first.ToExpression(), second.ToExpression())) { Origin = call.Origin }, call.Origin);
    }

    private static Conditional AsConditional(Call extreme, Expression a, Expression b)
    {
        var condition = extreme.Function == Function.Min ? new Comparison(Relation.Less, a, b) : new Comparison(Relation.Less, b, a);
        return new Conditional(condition with { Origin = extreme.Origin }, a, b) { Origin = extreme.Origin };
    }
}
