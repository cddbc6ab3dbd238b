using System;
using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>Encloses the values of formulas over ranges of the observation. Known values and parameters may be any finite
/// number unless they are given.</summary>
/// <param name="isLattice">Whether the observation is an integer.</param>
/// <param name="others">What is known of other symbols; null where nothing is.</param>
internal sealed class EnclosingEvaluator(bool isLattice, Func<Symbol, Enclosure?>? others = null)
{
    /// <summary>Whether single points of an interval count for nothing, so that x = 3 never holds on a range.</summary>
    public bool IgnoresPoints { get; init; }

    public Enclosure Of(Expression expression, Enclosure x)
    {
        switch (expression)
        {
            case Number number:
                return Enclosure.Of(number.Value);
            case Constant constant:
                return Enclosure.Of(constant.Value);
            case Symbol { Kind: SymbolKind.Observation }:
                return x;
            case Symbol symbol:
                return others?.Invoke(symbol) ?? Enclosure.Line;
            case Sum sum:
                return sum.Terms.Aggregate(Enclosure.Zero, (all, t) => all + Of(t, x));
            case Product product:
                return OfProduct(product, x);
            case Power power:
                return EnclosedFunctions.Power(Of(power.Base, x), Of(power.Exponent, x), IsInteger(power.Exponent));
            case Conditional conditional:
                return OfConditional(conditional, x);
            case Call call:
                return Apply(call.Function, call.Arguments.Select(a => Of(a, x)).ToList());
            default:
                return Enclosure.Unknown;
        }
    }

    /// <summary>Whether a condition holds on the whole range, or nowhere on it; null where neither is sure.</summary>
    public bool? Holds(Condition condition, Enclosure x)
    {
        switch (condition)
        {
            case Comparison comparison:
                return Holds(comparison, x);
            case Not not:
                return !Holds(not.Operand, x);
            case And and:
                var left = Holds(and.Left, x);
                return left == false ? false : Holds(and.Right, x) is var right && right == false ? false : left & right;
            case Or or:
                var either = Holds(or.Left, x);
                return either == true ? true : Holds(or.Right, x) is var other && other == true ? true : either | other;
            default:
                return ((Always)condition).Value;
        }
    }

    /// <summary>The part of the range where a condition may hold (or may fail); null where there is none.</summary>
    public Enclosure? Narrow(Condition condition, bool holds, Enclosure x)
    {
        switch (condition)
        {
            case Not not:
                return Narrow(not.Operand, !holds, x);
            case And both when holds:
                return Narrow(both.Left, true, x) is { } part ? Narrow(both.Right, true, part) : null;
            case Or either when !holds:
                return Narrow(either.Left, false, x) is { } rest ? Narrow(either.Right, false, rest) : null;
            case Comparison { Relation: not Relation.Equal, Left: Symbol { Kind: SymbolKind.Observation } } comparison:
                return Cut(x, Of(comparison.Right, x), holds, comparison.Relation == Relation.Less);
            case Comparison { Relation: not Relation.Equal, Right: Symbol { Kind: SymbolKind.Observation } } comparison:
                // c < x fails where x ≤ c.
                return Cut(x, Of(comparison.Left, x), !holds, comparison.Relation != Relation.Less);
            default:
                return x;
        }
    }

    /// <summary>Whether the formula takes whole numbers only, on a lattice.</summary>
    public bool IsInteger(Expression expression) => expression switch
    {
        Number number => number.Value.IsInteger,
        Symbol { Kind: SymbolKind.Observation } => isLattice,
        Symbol symbol => symbol.IsInteger,
        Sum or Product => expression.Children().All(IsInteger),
        Call { Function: Function.Floor or Function.IntegerQuotient or Function.Sign } => true,
        Call { Function: Function.Abs or Function.Min or Function.Max or Function.Remainder } => expression.Children().All(IsInteger),
        _ => false,
    };

    public static Enclosure Apply(Function function, IReadOnlyList<Enclosure> a) => function switch
    {
        Function.Exp => EnclosedFunctions.Exp(a[0]),
        Function.Log => EnclosedFunctions.Log(a[0]),
        Function.Sin => EnclosedFunctions.Sin(a[0]),
        Function.Cos => EnclosedFunctions.Cos(a[0]),
        Function.Abs => EnclosedFunctions.Abs(a[0]),
        Function.Min => a.Aggregate(EnclosedFunctions.Min),
        Function.Max => a.Aggregate(EnclosedFunctions.Max),
        Function.LogGamma => EnclosedFunctions.LogGamma(a[0]),
        Function.Digamma => EnclosedFunctions.Digamma(a[0]),
        Function.Floor => EnclosedFunctions.Floor(a[0]),
        Function.Sign => EnclosedFunctions.Sign(a[0]),
        Function.Remainder => EnclosedFunctions.Remainder(a[0], a[1]),
        Function.IntegerQuotient => EnclosedFunctions.IntegerQuotient(a[0], a[1]),
        _ => Enclosure.Unknown,
    };

    // A repeated factor is a power: x·x is never negative.
    private Enclosure OfProduct(Product product, Enclosure x)
    {
        var result = Enclosure.One;
        var factors = product.Factors;
        for (var i = 0; i < factors.Count; i++)
        {
            var count = 1;
            while (i + 1 < factors.Count && StructuralOrder.Same(factors[i], factors[i + 1]))
            {
                count++;
                i++;
            }

            var value = Of(factors[i], x);
            result *= count == 1 ? value : EnclosedFunctions.Power(value, count);
        }

        return result;
    }

    private Enclosure OfConditional(Conditional conditional, Enclosure x)
    {
        if (Holds(conditional.Condition, x) is { } holds)
            return Of(holds ? conditional.WhenTrue : conditional.WhenFalse, x);
        var (here, there) = (Narrow(conditional.Condition, true, x), Narrow(conditional.Condition, false, x));
        if (here is null && there is null)
            return Enclosure.Unknown;
        if (here is null || there is null)
            return here is null ? Of(conditional.WhenFalse, there!) : Of(conditional.WhenTrue, here);
        return Of(conditional.WhenTrue, here).Join(Of(conditional.WhenFalse, there), isContinuous: false);
    }

    private bool? Holds(Comparison comparison, Enclosure x)
    {
        var (left, right) = (Of(comparison.Left, x), Of(comparison.Right, x));
        if ((left.IsNeverFinite && left.Beyond == Beyond.Undefined) || (right.IsNeverFinite && right.Beyond == Beyond.Undefined))
            return false;
        if (left.May(Beyond.Undefined) || right.May(Beyond.Undefined))
            return null;
        if (left.Exact is { } first && right.Exact is { } second)
        {
            return comparison.Relation switch
            {
                Relation.Less => first < second,
                Relation.LessOrEqual => first.CompareTo(second) <= 0,
                _ => first == second,
            };
        }

        if (StructuralOrder.Same(comparison.Left, comparison.Right))
            return comparison.Relation != Relation.Less;
        if (left.IsFinite && right.IsNeverFinite && right.Beyond == Beyond.PositiveInfinity)
            return comparison.Relation != Relation.Equal;
        var below = Highest(left) < Lowest(right) || (Highest(left) == Lowest(right) && comparison.Relation == Relation.LessOrEqual && left.IsFinite && right.IsFinite);
        var above = Lowest(left) > Highest(right) || (Lowest(left) == Highest(right) && comparison.Relation == Relation.Less);
        if (comparison.Relation == Relation.Equal)
            return below || above ? false : IsSinglePoint(comparison, x) ? false : null;
        return below ? true : above ? false : null;
    }

    // x = c on a range of an interval: true at one point only.
    private bool IsSinglePoint(Comparison comparison, Enclosure x) =>
        IgnoresPoints && !isLattice && x.Lower < x.Upper
        && (comparison.Left is Symbol { Kind: SymbolKind.Observation } || comparison.Right is Symbol { Kind: SymbolKind.Observation })
        && Dependences.Of(comparison.Left).HasObservation() != Dependences.Of(comparison.Right).HasObservation();

    private static double Lowest(Enclosure a) =>
        a.May(Beyond.NegativeInfinity) ? double.NegativeInfinity : a.IsNeverFinite ? double.PositiveInfinity : a.Lower;

    private static double Highest(Enclosure a) =>
        a.May(Beyond.PositiveInfinity) ? double.PositiveInfinity : a.IsNeverFinite ? double.NegativeInfinity : a.Upper;

    // x below the limit (strictly or not), or not below it. An observation is a double, so that below the limit is at most
    // the double next to it.
    private Enclosure? Cut(Enclosure x, Enclosure limit, bool below, bool strict)
    {
        if (!limit.IsFinite)
            return x;
        var (lower, upper) = (x.Lower, x.Upper);
        var exact = limit.Lower == limit.Upper;
        if (below)
        {
            var most = !strict || !exact ? limit.Upper : isLattice ? Math.Ceiling(limit.Upper) - 1 : Doubles.Below(limit.Upper);
            upper = Math.Min(upper, isLattice ? Math.Floor(most) : most);
        }
        else
        {
            var least = strict || !exact ? limit.Lower : isLattice ? Math.Floor(limit.Lower) + 1 : Doubles.Above(limit.Lower);
            lower = Math.Max(lower, isLattice ? Math.Ceiling(least) : least);
        }

        if (lower > upper)
            return null;
        return lower == x.Lower && upper == x.Upper ? x : Enclosure.Between(lower, upper);
    }
}
