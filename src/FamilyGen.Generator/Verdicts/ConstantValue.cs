using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Verdicts;

/// <summary>The value of a formula of constants and at most one count; null where it depends on anything else.</summary>
internal static class ConstantValue
{
    public static double? Of(Expression expression, double count = double.NaN) =>
        IsConstant(expression, count) ? Evaluator.Evaluate(expression, _ => count) : null;

    public static bool? Holds(Condition condition, double count) =>
        condition.Operands().All(o => IsConstant(o, count)) ? Evaluator.Holds(condition, _ => count) : null;

    private static bool IsConstant(Expression expression, double count) => expression switch
    {
        Symbol symbol => symbol.Kind == SymbolKind.Observation && !double.IsNaN(count),
        Opaque => false,
        _ => expression.Children().All(c => IsConstant(c, count)),
    };
}
