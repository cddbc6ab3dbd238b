using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Emission;

/// <summary>Joins c·log Γ(x + a) − c·log Γ(x + b) into one function: each part grows as x·log x, and far out only their
/// difference, about (a − b)·log x, has digits left.</summary>
internal static class GammaPairs
{
    public static AtomSum Joined(AtomSum sum)
    {
        var open = sum.Terms.ToList();
        var joined = new List<WeightedAtom>();
        while (open.Count > 0)
        {
            var first = open[0];
            open.RemoveAt(0);
            var partner = open.FirstOrDefault(t => Ratio(first, t) is not null);
            if (partner is not null)
                open.Remove(partner);
            joined.Add(partner is null ? first : Ratio(first, partner)!);
        }

        return new AtomSum(joined.ToEquatableArray());
    }

    private static WeightedAtom? Ratio(WeightedAtom above, WeightedAtom below)
    {
        if (Shifted(above.Atom) is not { } a || Shifted(below.Atom) is not { } b || !Opposite(above.Coefficient, below.Coefficient))
            return null;
        var shift = (a.Intercept, b.Intercept) is (Number p, Number q)
            ? new Number(p.Value - q.Value)
            : Formula.Difference(a.Intercept, b.Intercept);
        return new WeightedAtom(above.Coefficient, Formula.Call(Function.LogGammaRatio, b.Whole, shift));
    }

    /// <summary>x + a, the argument of log Γ(x + a); null for any other function.</summary>
    private static AffineForm? Shifted(Expression atom) =>
        atom is Call { Function: Function.LogGamma } call && AffineForm.Match(call.Arguments[0]) is { } w && w.Slope.IsOne() ? w : null;

    private static bool Opposite(Expression a, Expression b) => (a, b) switch
    {
        (Number p, Number q) => p.Value == -q.Value,
        _ => Formula.Negate(a).Equals(b) || Formula.Negate(b).Equals(a),
    };
}
