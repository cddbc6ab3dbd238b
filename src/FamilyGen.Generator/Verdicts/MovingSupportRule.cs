using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>FG0101: a support whose member takes or reads a parameter. (A kernel that is −∞ on a side of the observation that
/// a parameter decides is found where the kernel is split into pieces.)</summary>
internal static class MovingSupportRule
{
    public static IEnumerable<Finding> Find(FamilyReading reading) => reading.Dependencies
        .Where(d => d.Kind == DependencyKind.Parameter && d.Role == MemberRole.Support)
        .GroupBy(d => (d.Member, d.Name))
        .Select(g => g.First())
        .Select(d => new Finding(DiagnosticIds.SupportOnParameter, d.Origin, EquatableArray.Of(d.Name, d.PathText)));
}
