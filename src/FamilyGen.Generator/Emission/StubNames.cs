using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Emission;

/// <summary>Gives the arguments of a refused declaration distinct names, so that its stub compiles although they collide.</summary>
internal static class StubNames
{
    public static FamilyDeclaration Distinct(FamilyDeclaration declaration)
    {
        var taken = new HashSet<string> { declaration.ObservationName };
        return declaration with
        {
            Parameters = declaration.Parameters.Select(p => p with { Name = Next(p.Name, taken) }).ToEquatableArray(),
            Statistics = declaration.Statistics.Select(s => s with { Parameter = Next(s.Parameter, taken) }).ToEquatableArray(),
            Known = declaration.Known.Select(k => k with { Name = Next(k.Name, taken) }).ToEquatableArray(),
        };
    }

    private static string Next(string name, HashSet<string> taken)
    {
        var next = Names.Unique(name, taken);
        taken.Add(next);
        return next;
    }
}
