using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>FG0406: the normalizer is finite on a thin set of parameters only, so that one of them is forced to a value.</summary>
internal static class InteriorRule
{
    public static IEnumerable<Finding> Find(FamilyDeclaration declaration, NormalForm form)
    {
        var sets = new NaturalSets(declaration, form);
        if (sets.Shapes.Any(s => s.HasInterior() || !s.IsDecided || s.Point() is null))
            yield break;
        var shape = sets.Shapes[0];
        var ends = NaturalSets.Fewest(shape, some => !new NaturalSetShape(some, form.Statistics.Count).HasInterior());
        var why = "it asks " + string.Join(", and ", ends.Select(sets.AskedAtLeast));
        var forced = form.Statistics
            .Select((s, j) => (Statistic: s, Place: j, Value: shape.Forced(j)))
            .Where(f => f.Value is not null)
            .ToList();
        if (forced.Count == 0)
        {
            yield return new Finding(DiagnosticIds.NoInterior, declaration.Kernel?.Origin ?? -1, EquatableArray.Of(
                "they satisfy an equation", why, "leave out one of the statistics, or combine them into the sum that the equation leaves"));
            yield break;
        }

        var values = string.Join(" and ", forced.Select(f => $"{Name(f.Statistic)} = {Rendering.Number(f.Value!.Value)}"));
        var first = forced[0];
        var place = declaration.IsTrade
            ? KernelPlace.Of(declaration, first.Statistic.Body)
            : declaration.Statistics[first.Place].Body.Origin;
        var mend = first.Value!.Value.IsZero
            ? $"leave out {What(declaration, first.Statistic)}, or bound the support"
            : $"move {Rendering.Number(first.Value.Value)}·{Rendering.Text(first.Statistic.Body)} into the base measure and leave out {What(declaration, first.Statistic)}";
        yield return new Finding(DiagnosticIds.NoInterior, place, EquatableArray.Of(values, why, mend));
    }

    private static string Name(Statistic statistic) => statistic.Natural is { } natural ? Rendering.Text(natural) : statistic.Parameter;

    private static string What(FamilyDeclaration declaration, Statistic statistic) =>
        declaration.IsTrade ? $"the term in {Rendering.Text(statistic.Body)}" : $"'{statistic.Name}'";
}
