using System.Collections.Generic;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>FG0405: some parameters with a finite normalizer lie on the boundary of their set.</summary>
internal static class OpenSetRule
{
    public static IEnumerable<Finding> Find(FamilyDeclaration declaration, NormalForm form)
    {
        var sets = new NaturalSets(declaration, form);
        if (sets.IsVerified && sets.Face() is { } face)
            yield return new Finding(DiagnosticIds.NotOpen, -1, EquatableArray.Of(sets.Asked(face)));
    }
}
