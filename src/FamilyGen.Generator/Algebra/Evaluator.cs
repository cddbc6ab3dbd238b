using System;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>The value of a formula in double precision, for checks at compile time. NaN where it is undefined or cannot be
/// known (an opaque function).</summary>
internal static class Evaluator
{
    public static double Evaluate(Expression expression, Func<Symbol, double> value)
    {
        switch (expression)
        {
            case Number number:
                return number.Value.ToDouble();
            case Constant constant:
                return constant.Value;
            case Symbol symbol:
                return value(symbol);
            case Sum sum:
                return sum.Terms.Sum(t => Evaluate(t, value));
            case Product product:
                return product.Factors.Aggregate(1.0, (all, f) => all * Evaluate(f, value));
            case Power power:
                return Math.Pow(Evaluate(power.Base, value), Evaluate(power.Exponent, value));
            case Call call:
                return Evaluate(call, value);
            case Conditional conditional:
                return Holds(conditional.Condition, value) is { } holds
                    ? Evaluate(holds ? conditional.WhenTrue : conditional.WhenFalse, value)
                    : double.NaN;
            default:
                return double.NaN;
        }
    }

    /// <summary>Whether a condition holds; null where a side is undefined.</summary>
    public static bool? Holds(Condition condition, Func<Symbol, double> value)
    {
        switch (condition)
        {
            case Comparison comparison:
                var (left, right) = (Evaluate(comparison.Left, value), Evaluate(comparison.Right, value));
                if (double.IsNaN(left) || double.IsNaN(right))
                    return null;
                return comparison.Relation switch
                {
                    Relation.Less => left < right,
                    Relation.LessOrEqual => left <= right,
                    _ => left == right,
                };
            case Not not:
                return !Holds(not.Operand, value);
            case And and:
                return Holds(and.Left, value) is not { } first ? null : !first ? false : Holds(and.Right, value);
            case Or or:
                return Holds(or.Left, value) is not { } either ? null : either ? true : Holds(or.Right, value);
            default:
                return ((Always)condition).Value;
        }
    }

    private static double Evaluate(Call call, Func<Symbol, double> value)
    {
        var arguments = call.Arguments.Select(a => Evaluate(a, value)).ToList();
        var a = arguments[0];
        return call.Function switch
        {
            Function.Exp => Math.Exp(a),
            Function.Log => a == 0 ? double.NegativeInfinity : Math.Log(a),
            Function.Sin => Math.Sin(a),
            Function.Cos => Math.Cos(a),
            Function.Abs => Math.Abs(a),
            Function.Atan2 => Math.Atan2(a, arguments[1]),
            Function.Min => arguments.Aggregate(Math.Min),
            Function.Max => arguments.Aggregate(Math.Max),
            Function.LogGamma => GammaFunctions.LogGamma(a),
            Function.Digamma => GammaFunctions.Digamma(a),
            Function.Floor => Math.Floor(a),
            Function.Sign => double.IsNaN(a) ? a : Math.Sign(a),
            Function.Remainder => a % arguments[1],
            Function.IntegerQuotient => Math.Truncate(a / arguments[1]),
            _ => double.NaN,
        };
    }
}
