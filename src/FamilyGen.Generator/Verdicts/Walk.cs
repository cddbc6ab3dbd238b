using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Verdicts;

/// <summary>Goes through all parts of a formula.</summary>
internal static class Walk
{
    /// <summary>The formula and everything in it, conditions' sides included.</summary>
    public static IEnumerable<Expression> All(Expression expression) =>
        new[] { expression }.Concat(Parts(expression).SelectMany(All));

    public static IEnumerable<Comparison> Comparisons(Condition condition) => condition switch
    {
        Comparison comparison => [comparison],
        Not not => Comparisons(not.Operand),
        And both => Comparisons(both.Left).Concat(Comparisons(both.Right)),
        Or either => Comparisons(either.Left).Concat(Comparisons(either.Right)),
        _ => [],
    };

    private static IEnumerable<Expression> Parts(Expression expression) => expression switch
    {
        Sum sum => sum.Terms,
        Product product => product.Factors,
        Power power => [power.Base, power.Exponent],
        Call call => call.Arguments,
        Opaque opaque => opaque.Arguments,
        Conditional choice => Comparisons(choice.Condition).SelectMany(c => new[] { c.Left, c.Right }).Concat([choice.WhenTrue, choice.WhenFalse]),
        _ => [],
    };
}
