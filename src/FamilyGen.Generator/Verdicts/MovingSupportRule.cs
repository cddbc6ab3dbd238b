using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>FG0101: a support that moves with a parameter: because its member takes or reads one, or because the kernel is
/// −∞ on a side of the observation that a parameter decides.</summary>
internal static class MovingSupportRule
{
    public static IEnumerable<Finding> Find(FamilyReading reading)
    {
        var taken = reading.Dependencies
            .Where(d => d.Kind == DependencyKind.Parameter && d.Role == MemberRole.Support)
            .GroupBy(d => (d.Member, d.Name))
            .Select(g => g.First())
            .Select(d => new Finding(DiagnosticIds.SupportOnParameter, d.Origin, EquatableArray.Of(d.Name, d.PathText)));
        return reading.Declaration is { Kernel: { } kernel, KernelMember: { } member }
            ? taken.Concat(InKernel(kernel, member.Name))
            : taken;
    }

    private static IEnumerable<Finding> InKernel(Expression kernel, string member)
    {
        foreach (var piece in Walk.All(kernel).OfType<Conditional>())
        {
            if (!(ZeroDensity.Follows(kernel, piece, piece.WhenTrue) || ZeroDensity.Follows(kernel, piece, piece.WhenFalse)))
                continue;
            foreach (var comparison in Walk.Comparisons(piece.Condition))
            {
                var symbols = Walk.All(comparison.Left).Concat(Walk.All(comparison.Right)).OfType<Symbol>().ToList();
                if (symbols.FirstOrDefault(s => s.Kind == SymbolKind.Parameter) is { } parameter
                    && symbols.FirstOrDefault(s => s.Kind == SymbolKind.Observation) is { } observation)
                {
                    yield return new Finding(DiagnosticIds.SupportOnParameter, comparison.Origin, EquatableArray.Of(
                        parameter.Name, $"'{member}' is −∞ where '{observation.Name}' is on one side of '{parameter.Name}'"));
                }
            }
        }
    }
}
