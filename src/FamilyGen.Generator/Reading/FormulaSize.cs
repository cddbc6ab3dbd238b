using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Reading;

/// <summary>Bounds what is read. A local that is used twice stands twice in the formula: y = y * y, ten times over, is a
/// thousand factors, and forty times over would never end.</summary>
internal static class FormulaSize
{
    private const int MostNodes = 5000;
    private const int DeepestNesting = 250;

    public static bool IsManageable(Value value) => value switch
    {
        NumberValue number => IsManageable([number.Expression]),
        TruthValue truth => IsManageable([truth.Condition]),
        RangeValue range => IsManageable(new[] { range.Lower, range.Upper }.Concat(range.Masses).OfType<Expression>()),
        _ => true,
    };

    // Without recursion, so that depth costs no stack, and counted before it is stored, so that width costs no memory.
    private static bool IsManageable(IEnumerable<object> roots)
    {
        var nodes = 0;
        var stack = new Stack<(object Node, int Depth)>();
        foreach (var root in roots)
        {
            if (++nodes > MostNodes)
                return false;
            stack.Push((root, 0));
        }

        while (stack.Count > 0)
        {
            var (node, depth) = stack.Pop();
            if (depth > DeepestNesting)
                return false;
            foreach (var child in Parts(node))
            {
                if (++nodes > MostNodes)
                    return false;
                stack.Push((child, depth + 1));
            }
        }

        return true;
    }

    private static IEnumerable<object> Parts(object node) => node switch
    {
        Conditional choice => [choice.Condition, choice.WhenTrue, choice.WhenFalse],
        Expression expression => expression.Children(),
        Comparison comparison => [comparison.Left, comparison.Right],
        Not not => [not.Operand],
        And both => [both.Left, both.Right],
        Or either => [either.Left, either.Right],
        _ => [],
    };
}
