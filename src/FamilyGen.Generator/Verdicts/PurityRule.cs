using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>FG0202: a statistic, base measure or kernel that need not give the same value twice.</summary>
internal static class PurityRule
{
    public static IEnumerable<Finding> Find(FamilyReading reading) => reading.Dependencies
        .Where(d => d.Kind == DependencyKind.Changing && d.Role != MemberRole.Support)
        .Select(d => new Finding(DiagnosticIds.Impure, d.Origin, EquatableArray.Of(d.Member, d.Name, d.PathText, d.Reason)));
}
