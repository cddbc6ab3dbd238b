using System;
using System.Globalization;
using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Tests.Reading;

/// <summary>Writes a formula in one line, fully bracketed, for comparison.</summary>
internal static class FormulaText
{
    public static string Of(Expression expression) => expression switch
    {
        Number n => n.Value.ToString(),
        Constant c => c.Text,
        Symbol { Kind: SymbolKind.Observation } s => s.Name,
        Symbol { Kind: SymbolKind.Known } s => "#" + s.Name,
        Symbol s => "$" + s.Name,
        Sum s => "(" + string.Join(" + ", s.Terms.Select(Of)) + ")",
        Product p => "(" + string.Join(" * ", p.Factors.Select(Of)) + ")",
        Power p => Of(p.Base) + "^" + Of(p.Exponent),
        Call c => c.Function + "(" + string.Join(", ", c.Arguments.Select(Of)) + ")",
        Opaque o => "«" + string.Format(CultureInfo.InvariantCulture, o.Text, o.Arguments.Select(Of).ToArray<object>()) + "»",
        Conditional c => "if(" + Of(c.Condition) + ", " + Of(c.WhenTrue) + ", " + Of(c.WhenFalse) + ")",
        _ => throw new ArgumentException(expression.GetType().Name),
    };

    public static string Of(Condition condition) => condition switch
    {
        Always a => a.Value ? "true" : "false",
        Not n => "!" + Of(n.Operand),
        And a => "(" + Of(a.Left) + " & " + Of(a.Right) + ")",
        Or o => "(" + Of(o.Left) + " | " + Of(o.Right) + ")",
        Comparison c => "(" + Of(c.Left) + (c.Relation switch { Relation.Less => " < ", Relation.LessOrEqual => " <= ", _ => " = " }) + Of(c.Right) + ")",
        _ => throw new ArgumentException(condition.GetType().Name),
    };
}
