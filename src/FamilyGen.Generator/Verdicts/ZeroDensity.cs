using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Verdicts;

/// <summary>Whether a log-kernel is −∞, and so the density zero, once one of its conditionals takes a given branch.</summary>
internal sealed class ZeroDensity
{
    private readonly Conditional _piece;
    private readonly Expression _branch;

    private ZeroDensity(Conditional piece, Expression branch) => (_piece, _branch) = (piece, branch);

    public static bool Follows(Expression kernel, Conditional piece, Expression branch) =>
        new ZeroDensity(piece, branch).InfinitySign(kernel) < 0;

    /// <summary>−1 or 1 where the formula is −∞ or +∞, 0 where that cannot be said.</summary>
    private int InfinitySign(Expression expression)
    {
        switch (expression)
        {
            case Constant { Value: double.NegativeInfinity }:
                return -1;
            case Constant { Value: double.PositiveInfinity }:
                return 1;
            case Sum sum:
                return sum.Terms.Select(InfinitySign).FirstOrDefault(s => s != 0);
            case Product product:
                var signs = product.Factors.Select(InfinitySign).Where(s => s != 0).ToList();
                return signs.Count == 0 ? 0 : signs.Concat(product.Factors.Where(IsNegative).Select(_ => -1)).Aggregate((a, b) => a * b);
            case Call { Function: Function.Log } log:
                return IsZero(log.Arguments[0]) ? -1 : 0;
            case Conditional choice when ReferenceEquals(choice, _piece):
                return InfinitySign(_branch);
            default:
                return 0;
        }
    }

    private bool IsZero(Expression expression) => expression switch
    {
        Number { Value: { IsZero: true } } => true,
        Sum sum => sum.Terms.All(IsZero),
        Product product => product.Factors.Any(IsZero),
        Power { Exponent: Number { Value.Sign: > 0 } } power => IsZero(power.Base),
        Call { Function: Function.Exp } exp => InfinitySign(exp.Arguments[0]) < 0,
        Conditional choice when ReferenceEquals(choice, _piece) => IsZero(_branch),
        _ => false,
    };

    private static bool IsNegative(Expression factor) => factor is Number { Value.Sign: < 0 };
}
