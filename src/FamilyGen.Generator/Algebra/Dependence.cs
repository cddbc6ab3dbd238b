using System;
using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>What a formula depends on.</summary>
[Flags]
internal enum Dependence
{
    None = 0,
    Observation = 1,
    Parameter = 2,
    Known = 4,
    Natural = 8,
}

internal static class Dependences
{
    /// <summary>Whether a formula ties the observation to a parameter.</summary>
    public static bool Ties(this Dependence dependence) =>
        (dependence & (Dependence.Observation | Dependence.Parameter)) == (Dependence.Observation | Dependence.Parameter);

    public static bool HasObservation(this Dependence dependence) => (dependence & Dependence.Observation) != 0;

    public static bool HasParameter(this Dependence dependence) => (dependence & (Dependence.Parameter | Dependence.Natural)) != 0;

    public static Dependence Of(Expression expression)
    {
        var result = Dependence.None;
        foreach (var symbol in Symbols(expression))
        {
            result |= symbol.Kind switch
            {
                SymbolKind.Observation => Dependence.Observation,
                SymbolKind.Known => Dependence.Known,
                SymbolKind.Parameter => Dependence.Parameter,
                _ => Dependence.Natural,
            };
        }

        return result;
    }

    public static Dependence Of(Condition condition) => condition.Operands().Aggregate(Dependence.None, (all, e) => all | Of(e));

    /// <summary>Every symbol of a formula, as often as it occurs, from left to right.</summary>
    public static IEnumerable<Symbol> Symbols(Expression expression)
    {
        var stack = new Stack<Expression>();
        stack.Push(expression);
        while (stack.Count > 0)
        {
            var next = stack.Pop();
            if (next is Symbol symbol)
                yield return symbol;
            foreach (var child in next.Children().Reverse())
                stack.Push(child);
        }
    }

    /// <summary>The distinct names of a kind, in order of first appearance.</summary>
    public static List<string> Names(Expression expression, SymbolKind kind) =>
        Symbols(expression).Where(s => s.Kind == kind).Select(s => s.Name).Distinct().ToList();

    public static IEnumerable<Expression> Children(this Expression expression) => expression switch
    {
        Sum sum => sum.Terms,
        Product product => product.Factors,
        Power power => new[] { power.Base, power.Exponent },
        Call call => call.Arguments,
        Opaque opaque => opaque.Arguments,
        Conditional conditional => conditional.Condition.Operands().Concat(new[] { conditional.WhenTrue, conditional.WhenFalse }),
        _ => Enumerable.Empty<Expression>(),
    };

    /// <summary>The formulas that a condition compares.</summary>
    public static IEnumerable<Expression> Operands(this Condition condition) => condition switch
    {
        Comparison comparison => new[] { comparison.Left, comparison.Right },
        Not not => not.Operand.Operands(),
        And and => and.Left.Operands().Concat(and.Right.Operands()),
        Or or => or.Left.Operands().Concat(or.Right.Operands()),
        _ => Enumerable.Empty<Expression>(),
    };

    /// <summary>Every part of a formula, itself included, from the outside in.</summary>
    public static IEnumerable<Expression> Parts(Expression expression)
    {
        var stack = new Stack<Expression>();
        stack.Push(expression);
        while (stack.Count > 0)
        {
            var next = stack.Pop();
            yield return next;
            foreach (var child in next.Children().Reverse())
                stack.Push(child);
        }
    }
}
