using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>Observations at which a formula may stop being finite, or change: where an argument of a logarithm, a power or
/// log Γ vanishes, where a condition changes, with a point on either side.</summary>
internal static class SpecialPoints
{
    private const int MostPoints = 60;

    public static IReadOnlyList<Rational> Of(IEnumerable<Expression> formulas, string observation)
    {
        var roots = new List<Rational>();
        foreach (var part in formulas.SelectMany(Dependences.Parts))
        {
            foreach (var argument in Critical(part))
            {
                if (Dependences.Of(argument) == Dependence.Observation && Affine.In(argument, observation) is { } affine
                    && affine.Root() is Number { Value: var root } && !roots.Contains(root))
                {
                    roots.Add(root);
                }
            }

            if (roots.Count >= MostPoints)
                break;
        }

        // The far side of a root says more than the root itself: the logarithm of −1 rather than of 0.
        return roots.SelectMany(r => new[] { r - 1, r + 1, r }).Distinct().ToList();
    }

    private static IEnumerable<Expression> Critical(Expression part) => part switch
    {
        Call { Function: Function.Log or Function.LogGamma or Function.Digamma } call => new[] { call.Arguments[0] },
        Call { Function: Function.Remainder or Function.IntegerQuotient } call => new[] { call.Arguments[1] },
        Call { Function: Function.Abs } call => new[] { call.Arguments[0] },
        Power power => new[] { power.Base },
        Conditional conditional => Conditions.Comparisons(conditional.Condition).Select(c => Formula.Difference(c.Left, c.Right)),
        _ => Enumerable.Empty<Expression>(),
    };
}
