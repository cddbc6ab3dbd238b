using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>FG0201: a statistic or base measure that takes or reads a parameter.</summary>
internal static class ParameterRule
{
    public static IEnumerable<Finding> Find(FamilyReading reading) => reading.Dependencies
        .Where(d => d.Kind == DependencyKind.Parameter && d.Role is MemberRole.Statistic or MemberRole.BaseMeasure)
        .Select(d => new Finding(DiagnosticIds.StatisticOnParameter, d.Origin, EquatableArray.Of(d.Member, d.Name, d.PathText)));
}
