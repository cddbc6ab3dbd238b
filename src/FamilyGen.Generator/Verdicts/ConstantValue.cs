using System;
using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Verdicts;

/// <summary>The value of a formula of constants and at most one count; null where it depends on anything else.</summary>
internal static class ConstantValue
{
    public static double? Of(Expression expression, double? count = null)
    {
        double? Value(Expression e) => Of(e, count);
        switch (expression)
        {
            case Number number:
                return number.Value.ToDouble();
            case Constant constant:
                return constant.Value;
            case Symbol { Kind: SymbolKind.Observation }:
                return count;
            case Sum sum:
                return sum.Terms.Aggregate((double?)0, (total, term) => total + Value(term));
            case Product product:
                return product.Factors.Aggregate((double?)1, (total, factor) => total * Value(factor));
            case Power power:
                return Value(power.Base) is { } b && Value(power.Exponent) is { } e ? e == -1 ? 1 / b : Math.Pow(b, e) : null;
            case Call { Arguments.Count: 1 } call:
                return Value(call.Arguments[0]) is { } a ? Apply(call.Function, a) : null;
            case Call { Arguments.Count: 2 } call:
                return Value(call.Arguments[0]) is { } left && Value(call.Arguments[1]) is { } right ? Apply(call.Function, left, right) : null;
            case Conditional choice:
                return Holds(choice.Condition, count) is { } holds ? Value(holds ? choice.WhenTrue : choice.WhenFalse) : null;
            default:
                return null;
        }
    }

    public static bool? Holds(Condition condition, double? count = null)
    {
        switch (condition)
        {
            case Always always:
                return always.Value;
            case Not not:
                return !Holds(not.Operand, count);
            case And both:
                return Holds(both.Left, count) & Holds(both.Right, count);
            case Or either:
                return Holds(either.Left, count) | Holds(either.Right, count);
            case Comparison comparison when Of(comparison.Left, count) is { } left && Of(comparison.Right, count) is { } right:
                return comparison.Relation switch
                {
                    Relation.Less => left < right,
                    Relation.LessOrEqual => left <= right,
                    _ => left.Equals(right),
                };
            default:
                return null;
        }
    }

    private static double? Apply(Function function, double a) => function switch
    {
        Function.Exp => Math.Exp(a),
        Function.Log => Math.Log(a),
        Function.Sin => Math.Sin(a),
        Function.Cos => Math.Cos(a),
        Function.Abs => Math.Abs(a),
        Function.Floor => Math.Floor(a),
        Function.Sign when !double.IsNaN(a) => Math.Sign(a),
        _ => null,
    };

    private static double? Apply(Function function, double a, double b) => function switch
    {
        Function.Min => Math.Min(a, b),
        Function.Max => Math.Max(a, b),
        Function.Remainder => a % b,
        Function.IntegerQuotient => Math.Truncate(a / b),
        Function.Atan2 => Math.Atan2(a, b),
        _ => null,
    };
}
