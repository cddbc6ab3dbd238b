using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>FG0401: no parameter at all makes the normalizer finite.</summary>
internal static class InfiniteNormalizerRule
{
    public static IEnumerable<Finding> Find(FamilyDeclaration declaration, NormalForm form)
    {
        var sets = new NaturalSets(declaration, form);
        if (sets.Shapes.Any(s => s.Cones.Count == 0 || !s.Exclude(s.Cones, sets.Image)))
            yield break;
        var shape = sets.Shapes[0];
        var alone = shape.Exclude(shape.Cones, []);
        IReadOnlyList<LinearCondition> image = alone ? [] : sets.Image;
        var ends = NaturalSets.Fewest(shape, some => shape.Exclude(some, image));
        var reason = ends.Count == 1 && !ends[0].Cells().Any()
            ? NaturalSets.Divergence(ends[0])
            : "it asks " + string.Join(", and ", ends.Select(sets.Asked)) + (alone ? "" : ", which the parameters never reach");
        yield return new Finding(DiagnosticIds.InfiniteNormalizer, declaration.Kernel?.Origin ?? -1, EquatableArray.Of(reason, Mend(declaration, ends)));
    }

    private static string Mend(FamilyDeclaration declaration, IReadOnlyList<GrowthCone> ends)
    {
        var what = declaration.IsTrade ? "a term" : "a statistic or a base measure";
        var places = string.Join(" and ", ends.Select(e => e.End.Where).Distinct());
        return ends.Any(e => e.End.IsInfinite)
            ? $"add {what} that makes the density fall off as {places}, or bound the support"
            : $"add {what} that keeps the density down as {places}, or end the support before";
    }
}
