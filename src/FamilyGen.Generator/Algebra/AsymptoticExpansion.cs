using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>One end of one piece of the support: x = ±t, or x = point ± 1/t, with t → ∞.</summary>
internal sealed record SupportEnd(Expression? Point, bool IsUpper)
{
    public bool IsInfinite => Point is null;
}

/// <summary>Expands functions of x at an end. Conditions that the end does not decide (residues) have to be assumed.</summary>
internal sealed class AsymptoticExpansion(SupportEnd end, Scope scope, IReadOnlyDictionary<Condition, bool> assumed)
{
    private readonly AsymptoticSeries _observation = Observation(end);

    /// <summary>A condition that was not decided on the way, for the caller to split into cases.</summary>
    public Condition? Undecided { get; private set; }

    /// <summary>Whether the base measure vanishes here.</summary>
    public bool IsExcluded { get; private set; }

    /// <summary>The expansion of a formula; where it cannot be followed but stays between two numbers, no more than that.</summary>
    public AsymptoticSeries Expand(Expression expression)
    {
        var series = ExpandAsIs(expression);
        return series.IsVerified || expression is not (Call or Power or Product) || Dependences.Parts(expression).Any(p => p is Conditional or Opaque)
            || !scope.RangeOf(expression).IsFinite
            ? series
            : Bounded;
    }

    private AsymptoticSeries ExpandAsIs(Expression expression)
    {
        switch (expression)
        {
            case Number number:
                return AsymptoticSeries.Of(Polynomial.Of(number.Value));
            case Symbol { Kind: SymbolKind.Observation }:
                return _observation;
            case Constant constant when constant.IsNegativeInfinity():
                IsExcluded = true;
                return AsymptoticSeries.Zero;
            case Constant or Symbol:
                return AsymptoticSeries.Of(Polynomial.Of(expression));
            case Sum sum:
                return sum.Terms.Select(Expand).Aggregate(AsymptoticSeries.Zero, (a, b) => a + b);
            case Product product:
                return product.Factors.Select(Expand).Aggregate(AsymptoticSeries.Of(Polynomial.One), (a, b) => a * b);
            case Power power when Dependences.Of(power.Exponent).HasObservation():
                return AsymptoticFunctions.Exp(Expand(power.Exponent) * AsymptoticFunctions.Log(Expand(power.Base)));
            case Power power:
                return AsymptoticFunctions.Power(Expand(power.Base), Constants(power.Exponent));
            case Conditional conditional:
                return OfConditional(conditional);
            case Call call when !Dependences.Of(call).HasObservation():
                return AsymptoticSeries.Of(Polynomial.Of(call));
            case Call call:
                return OfCall(call, call.Arguments.Select(Expand).ToList());
            default:
                return Dependences.Of(expression).HasObservation() ? AsymptoticSeries.Unknown : AsymptoticSeries.Of(Polynomial.Of(expression));
        }
    }

    private AsymptoticSeries OfCall(Call call, List<AsymptoticSeries> arguments)
    {
        var s = arguments[0];
        switch (call.Function)
        {
            case Function.Exp:
                return AsymptoticFunctions.Exp(s);
            case Function.Log when s.IsZero && s.IsVerified && double.IsNegativeInfinity(s.Error):
                IsExcluded = true;
                return AsymptoticSeries.Zero;
            case Function.Log:
                return AsymptoticFunctions.Log(s);
            case Function.LogGamma:
                return AsymptoticFunctions.LogGamma(s);
            case Function.Digamma:
                return AsymptoticFunctions.Digamma(s);
            case Function.Cos or Function.Sin:
                return AsymptoticFunctions.Wave(call.Function, s);
            case Function.Abs:
                return (s.Sign ?? SignByPlace(call.Arguments[0])) is { } sign ? s * Polynomial.Of((Rational)sign) : s.IsZero ? s : s.IsBounded ? Bounded : AsymptoticSeries.Unknown;
            case Function.Sign:
                return (s.Sign ?? SignByPlace(call.Arguments[0])) is { } known ? AsymptoticSeries.Of(Polynomial.Of((Rational)known)) : Bounded;
            case Function.Min or Function.Max:
                return arguments.Count == 2 ? Extreme(call, s, arguments[1]) : AsymptoticSeries.Unknown;
            case Function.Floor:
                return s.IsVerified && s.Error <= 0 ? s + Bounded : AsymptoticSeries.Unknown;
            case Function.IntegerQuotient:
                var quotient = s * AsymptoticFunctions.Power(arguments[1], Polynomial.Of(-1));
                return quotient.IsVerified && quotient.Error <= 0 ? quotient + Bounded : AsymptoticSeries.Unknown;
            case Function.Remainder:
                return arguments[1].IsBounded ? Bounded : AsymptoticSeries.Unknown;
            default:
                return AsymptoticSeries.Unknown;
        }
    }

    private static AsymptoticSeries Bounded { get; } = AsymptoticSeries.Of(AsymptoticTerm.Wave);

    private AsymptoticSeries Extreme(Call call, AsymptoticSeries a, AsymptoticSeries b)
    {
        var difference = a - b;
        if ((difference.Sign ?? SignByPlace(Formula.Difference(call.Arguments[0], call.Arguments[1]))) is { } sign)
            return (sign < 0) == (call.Function == Function.Min) ? a : b;
        if (difference.IsZero && difference.IsVerified)
            return a;
        return a.IsBounded && b.IsBounded ? Bounded : AsymptoticSeries.Unknown;
    }

    private AsymptoticSeries OfConditional(Conditional conditional)
    {
        if (Decide(conditional.Condition) is { } holds)
            return Expand(holds ? conditional.WhenTrue : conditional.WhenFalse);
        if (!conditional.WhenTrue.IsNegativeInfinity() && !conditional.WhenFalse.IsNegativeInfinity())
        {
            var (whenTrue, whenFalse) = (Expand(conditional.WhenTrue), Expand(conditional.WhenFalse));
            if (whenTrue.IsBounded && whenFalse.IsBounded)
                return Bounded;
        }

        Undecided ??= conditional.Condition;
        return AsymptoticSeries.Unknown;
    }

    private bool? Decide(Condition condition)
    {
        foreach (var pair in assumed)
        {
            if (StructuralOrder.Same(pair.Key, condition))
                return pair.Value;
            if (StructuralOrder.Same(pair.Key, Conditions.Not(condition)))
                return !pair.Value;
        }

        switch (condition)
        {
            case Always always:
                return always.Value;
            case Not not:
                return !Decide(not.Operand);
            case And and:
                var (left, right) = (Decide(and.Left), Decide(and.Right));
                return left == false || right == false ? false : left == true && right == true ? true : null;
            case Or or:
                var (either, other) = (Decide(or.Left), Decide(or.Right));
                return either == true || other == true ? true : either == false && other == false ? false : null;
            case Comparison comparison:
                return Decide(comparison);
            default:
                return null;
        }
    }

    private bool? Decide(Comparison comparison)
    {
        var difference = Expand(comparison.Left) - Expand(comparison.Right);
        if (!difference.IsVerified)
            return null;
        if (difference.IsZero)
            return double.IsNegativeInfinity(difference.Error) ? comparison.Relation != Relation.Less : null;
        if ((difference.Sign ?? SignByPlace(Formula.Difference(comparison.Left, comparison.Right))) is not { } sign)
            return null;
        return comparison.Relation != Relation.Equal && sign < 0;
    }

    // A known threshold lies inside the support: near the lower end x is below it, near the upper end above it. The sign of
    // a difference that changes there follows from its slope in x.
    private int? SignByPlace(Expression difference)
    {
        if (Affine.In(difference, scope.Observation.Name) is not { } affine || (Dependences.Of(affine.Intercept) & Dependence.Known) == 0)
            return null;
        var slope = scope.RangeOf(affine.Slope);
        return slope.IsPositive ? (end.IsUpper ? 1 : -1) : slope.IsNegative ? (end.IsUpper ? -1 : 1) : null;
    }

    private static Polynomial Constants(Expression expression) => expression switch
    {
        Number number => Polynomial.Of(number.Value),
        Sum sum => sum.Terms.Aggregate(Polynomial.Zero, (all, t) => all + Constants(t)),
        Product product => product.Factors.Aggregate(Polynomial.One, (all, f) => all * Constants(f)),
        Power { Exponent: Number { Value.IsInteger: true } n } power when Constants(power.Base) is { IsSingleTerm: true } b && Rationals.Abs(n.Value) < 50 =>
            SingleTerms.Raise(b.Terms[0], n.Value),
        _ => Polynomial.Of(expression),
    };

    private static AsymptoticSeries Observation(SupportEnd end)
    {
        var direction = Polynomial.Of(end.IsUpper == end.IsInfinite ? 1 : -1);
        return end.Point is null
            ? AsymptoticSeries.Of(AsymptoticTerm.Power(direction, Polynomial.One))
            : AsymptoticSeries.Of(AsymptoticTerm.Constant(Constants(end.Point)), AsymptoticTerm.Power(direction, Polynomial.Of(-1)));
    }
}
