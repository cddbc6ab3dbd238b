using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>log Γ(u + n) against log Γ(u + m) for integers n and m: the difference is Σ log(u + i), so that the two are no
/// independent functions of x.</summary>
internal static class RecurrenceOfGamma
{
    private const int LargestStep = 12;

    /// <summary>The polynomial with each log Γ written by the first one that differs from it by a small integer.</summary>
    public static Polynomial Apply(Polynomial function, Expander expander)
    {
        var first = new List<Polynomial>();
        var result = new List<Term?>();
        foreach (var term in function.Terms)
        {
            var gamma = term.Factors.FirstOrDefault(f =>
                f.Base is Call { Function: Function.LogGamma } && f.Exponent.IsOne && f.Dependence.HasObservation());
            if (gamma is null)
            {
                result.Add(term);
                continue;
            }

            var argument = expander.Expand(((Call)gamma.Base).Arguments[0]);
            var other = first.FirstOrDefault(a => (argument - a).AsInteger() is { } n && System.Math.Abs(n) <= LargestStep);
            if (other is null)
            {
                first.Add(argument);
                result.Add(term);
                continue;
            }

            var step = (argument - other).AsInteger()!.Value;
            var replaced = Polynomial.Of(new Call(Function.LogGamma, EquatableArray.Of(other.ToSortedExpression())) { Origin = gamma.Base.Origin }, gamma.Origin);
            for (var i = 0; i < step; i++)
                replaced += Log(other, i);
            for (var i = step; i < 0; i++)
                replaced -= Log(other, i);
            result.AddRange((replaced * term.Keep(f => f != gamma).WithCoefficient(term.Coefficient)).Terms);
        }

        return Polynomial.Collect(result);

        Polynomial Log(Polynomial argument, int shift) => expander.Expand(Formula.Log((argument + Polynomial.Of((Rational)shift)).ToSortedExpression()));
    }
}
