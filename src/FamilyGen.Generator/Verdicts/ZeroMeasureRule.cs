using System.Collections.Generic;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>FG0301: a base measure that is zero on the whole support, so that nothing can occur. (That it is zero on a part is
/// legitimate.)</summary>
internal static class ZeroMeasureRule
{
    public static IEnumerable<Finding> Find(FamilyReading reading)
    {
        var declaration = reading.Declaration;
        var (member, body) = declaration.BaseMeasure is { } measure ? (measure.Member, measure.Body) : (declaration.KernelMember, declaration.Kernel);
        if (member is null || body is null || !new SupportSearch(EffectiveSupport.OfDeclared(declaration)).IsNowhere())
            yield break;
        yield return new Finding(DiagnosticIds.Measure, body.Origin, EquatableArray.Of(
            member.Name,
            declaration.IsTrade ? "is −∞ on the whole support, so nothing can be observed" : "is zero on the whole support, so nothing can be observed",
            "compare its condition with the ends of the support"));
    }
}
