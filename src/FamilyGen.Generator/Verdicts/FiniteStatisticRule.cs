using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>FG0203: a statistic or base measure that is not finite at an observation which can occur. Only what is certain is
/// found: an end that is open, or a value that some known value would allow, does not count.</summary>
internal static class FiniteStatisticRule
{
    public static IEnumerable<Finding> Find(FamilyDeclaration declaration, NormalForm form)
    {
        // The measure alone decides what can occur, so it is judged on the whole declared support.
        var declared = new Finiteness(EffectiveSupport.Declared(declaration), declaration.ObservationName);
        var effective = new Finiteness(EffectiveSupport.Of(declaration, form), declaration.ObservationName);
        var findings = declaration.IsTrade ? OfKernel(declaration, form, declared, effective) : OfMembers(declaration, form, declared, effective);
        return findings.Distinct();
    }

    private static IEnumerable<Finding> OfMembers(FamilyDeclaration declaration, NormalForm form, Finiteness declared, Finiteness effective)
    {
        if (declaration.BaseMeasure is { } measure && declared.Find(measure.Body, measure.IsLogarithm) is { } fault)
        {
            yield return Report(declaration, measure.Member, fault, measure.Body);
            yield break;
        }

        foreach (var statistic in declaration.Statistics)
        {
            if ((effective.Find(statistic.Body) ?? SymbolicEnd.NotFinite(declaration, form, statistic.Body)) is { } found)
                yield return Report(declaration, statistic.Member, found, statistic.Body);
        }
    }

    // The kernel itself holds parameters, of which nothing is known; its statistics and its measure are free of them.
    private static IEnumerable<Finding> OfKernel(FamilyDeclaration declaration, NormalForm form, Finiteness declared, Finiteness effective)
    {
        var kernel = declaration.Kernel!;
        if (form.LogBase.Terms.Count > 0 && declared.Find(form.LogBase.ToExpression(), mayBeNegativeInfinity: true) is { } measure)
        {
            yield return Report(declaration, declaration.KernelMember!, Place(measure, form.LogBase), kernel);
            yield break;
        }

        foreach (var statistic in form.Statistics)
        {
            var body = statistic.Body.ToExpression();
            if ((effective.Find(body) ?? SymbolicEnd.NotFinite(declaration, form, body)) is { } fault)
                yield return Report(declaration, declaration.KernelMember!, Place(fault, statistic.Body), kernel);
        }

        NotFinite Place(NotFinite fault, AtomSum function) =>
            (fault.At.IsExact && fault.At.Name is null ? declared.Blame(kernel, fault.At) : null)
            ?? fault with { Origin = KernelPlace.Of(declaration, function) };
    }

    private static Finding Report(FamilyDeclaration declaration, DeclaredMember member, NotFinite found, Expression body)
    {
        var x = declaration.ObservationName;
        var at = found.At.IsExact ? $"{x} = {found.At.Text}" : $"{x} {found.At.Text}";
        return new Finding(
            DiagnosticIds.NotFinite,
            found.Origin >= 0 ? found.Origin : body.Origin,
            EquatableArray.Of(member.Name, at, found.Reason, Mend(declaration, found)));
    }

    private static string Mend(FamilyDeclaration declaration, NotFinite found)
    {
        var support = EffectiveSupport.Declared(declaration);
        var value = $"{declaration.ObservationName} == {(found.At.Name ?? found.At.Text).Replace('−', '-')} ? … : …";
        if (support.Masses.Contains(found.At.Point) && found.At.Name is null)
            return $"the point of mass needs a value of its own, so write '{value}'";
        if (!support.IsLattice && (found.At.Point == support.Lower || found.At.Point == support.Upper))
            return $"leave this end of the support open, or write a value for it with '{value}'";
        return found.At.IsExact
            ? $"narrow the support so that this cannot be observed, or write a value for it with '{value}'"
            : "narrow the support so that this cannot be observed";
    }
}
