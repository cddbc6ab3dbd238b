using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>FG0003: two known values whose names or types nearly agree.</summary>
internal static class KnownValueRule
{
    // Shorter names differ by a letter on purpose: n and m, day and bay.
    private const int ShortestSuspect = 5;

    public static IEnumerable<Finding> Find(FamilyReading reading)
    {
        var known = reading.Names.Where(n => n.Kind == NamedPieceKind.Known).ToList();
        for (var i = 0; i < known.Count; i++)
        {
            var name = known[i].Name;
            if (known.Take(i).FirstOrDefault(k => k.Name == name) is { } same)
            {
                if (same.Detail != known[i].Detail)
                    yield return Near(known[i], $"{same.Detail} {name}", $"{known[i].Detail} {name}");
            }
            else if (known.Take(i).FirstOrDefault(k => IsNear(k.Name, name)) is { } near)
            {
                yield return Near(known[i], near.Name, name);
            }
        }
    }

    private static Finding Near(NamedPiece piece, string first, string second) =>
        new(DiagnosticIds.NearlyEqualKnown, piece.Origin, EquatableArray.Of(first, second));

    private static bool IsNear(string a, string b)
    {
        if (string.Equals(a, b, StringComparison.OrdinalIgnoreCase))
            return true;
        if (Math.Min(a.Length, b.Length) < ShortestSuspect || Math.Abs(a.Length - b.Length) > 1)
            return false;

        // One letter added, dropped or changed: what remains behind the first difference agrees.
        var i = 0;
        while (i < a.Length && i < b.Length && char.ToLowerInvariant(a[i]) == char.ToLowerInvariant(b[i]))
            i++;
        return SameFrom(a, i + 1, b, i + 1) || SameFrom(a, i + 1, b, i) || SameFrom(a, i, b, i + 1);
    }

    private static bool SameFrom(string a, int i, string b, int j) =>
        i <= a.Length && j <= b.Length && string.Equals(a.Substring(i), b.Substring(j), StringComparison.OrdinalIgnoreCase)
        && !(EndsInDigit(a) && EndsInDigit(b));

    // site1 and site2 are told apart by their number.
    private static bool EndsInDigit(string name) => char.IsDigit(name[name.Length - 1]);
}
