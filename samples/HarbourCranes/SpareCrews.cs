using System;
using System.Collections.Generic;

namespace HarbourCranes;

/// <summary>How many spare crews cover a shift. A crew gives <see cref="HoursPerCrew"/> hours of repair work in a shift; a
/// shift is covered when the hours it loses are no more than its spare crews can give.</summary>
internal static class SpareCrews
{
    /// <summary>Eight hours less breaks and ways.</summary>
    public const double HoursPerCrew = 5.5;

    /// <summary>The share of shifts that must be covered.</summary>
    public const double Goal = 0.95;

    /// <summary>No, one, two … crews, up to one more than is needed, each with the chance that a shift is NOT covered.</summary>
    public static IReadOnlyList<Chance> Uncovered(LostHours lost)
    {
        var chances = new List<Chance>();
        while (chances.Count < 2 || chances[^2].Value > 1 - Goal)
            chances.Add(lost.ChanceOfMoreThan(chances.Count * HoursPerCrew));
        return chances;
    }
}
