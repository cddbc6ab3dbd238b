using System.Collections.Generic;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>FG0001: the shape of class, members and formulas, which only the reader can see.</summary>
internal static class ShapeRule
{
    public static IEnumerable<Finding> Find(FamilyReading reading) => reading.Faults;
}
