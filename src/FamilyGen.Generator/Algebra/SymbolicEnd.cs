using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>A formula at an end of the support that is a known value: whatever that is, the end itself can be observed.</summary>
internal static class SymbolicEnd
{
    /// <summary>A formula with the observation put at such an end, its arguments written out: log(n − x) at x = n is the
    /// logarithm of 0.</summary>
    public static NotFinite? NotFinite(FamilyDeclaration declaration, NormalForm form, Expression formula)
    {
        var support = declaration.Support;
        if (support.Predicate is not null)
            return null;
        var expander = new Expander(new Scope(declaration));
        var evaluator = new EnclosingEvaluator(support.IsLattice);
        foreach (var (end, isIncluded) in new[] { (support.Lower, support.LowerIncluded || support.IsLattice), (support.Upper, support.UpperIncluded || support.IsLattice) })
        {
            if (end is null || !isIncluded || Dependences.Of(end) != Dependence.Known || !CanOccur(end))
                continue;
            var there = At(formula, end);
            if (evaluator.Of(there, Enclosure.Zero).IsNeverFinite)
                return Blamed(there, end);
        }

        return null;

        Expression At(Expression e, Expression end) => Simplified(e.Substitute(SymbolKind.Observation, declaration.ObservationName, end));

        // The arguments at which a function may stop being finite as numbers, where the known values drop out.
        Expression Simplified(Expression e) => e.Rewrite(part => part switch
        {
            Call { Function: Function.Log or Function.LogGamma or Function.Digamma } call when expander.Expand(call.Arguments[0]).AsRational() is { } number =>
                call with { Arguments = EquatableArray.Of(Formula.Of(number)) },
            Power power when expander.Expand(power.Base).AsRational() is { } number => power with { Base = Formula.Of(number) },
            _ => null,
        });

        bool CanOccur(Expression end) =>
            expander.Expand(form.LogBase.ToExpression().Substitute(SymbolKind.Observation, declaration.ObservationName, end)) is { IsNegativeInfinity: false } measure
            && evaluator.Of(measure.ToExpression(), Enclosure.Zero).IsFinite;

        NotFinite? Blamed(Expression there, Expression end)
        {
            var support = EffectiveSupport.Declared(declaration);
            return new Finiteness(support, declaration.ObservationName).Blame(there, new Witness(Rational.Zero, true, Rendering.Text(end)));
        }
    }
}
