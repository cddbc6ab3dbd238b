using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>FG0102: a support that is not the same at every moment.</summary>
internal static class ChangingSupportRule
{
    public static IEnumerable<Finding> Find(FamilyReading reading) => reading.Dependencies
        .Where(d => d.Kind == DependencyKind.Changing && d.Role == MemberRole.Support)
        .Select(d => new Finding(DiagnosticIds.SupportChanges, d.Origin, EquatableArray.Of(d.Name, d.PathText, d.Reason)));
}
