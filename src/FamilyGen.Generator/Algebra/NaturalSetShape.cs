using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>The set of natural parameters with a finite normalizer, as the intersection of what the ends ask for: whether it
/// is empty, has an interior, is open. All is decided in exact fractions.</summary>
internal sealed class NaturalSetShape(IReadOnlyList<GrowthCone> cones, int count)
{
    private const int MostSystems = 3000;

    private int _systems;

    public IReadOnlyList<GrowthCone> Cones { get; } = cones;

    /// <summary>False once a question was too large to be answered; nothing may then be concluded.</summary>
    public bool IsDecided { get; private set; } = true;

    /// <summary>Whether some neighbourhood of a parameter belongs to the set.</summary>
    public bool HasInterior(IEnumerable<LinearCondition>? more = null)
    {
        var conditions = new List<LinearCondition>(more ?? Enumerable.Empty<LinearCondition>());
        foreach (var cone in Cones)
        {
            if (cone.Deciding is not { } level)
                return false;
            conditions.Add(level.Condition(Sense.Negative));
        }

        return Solve(conditions) is not null;
    }

    /// <summary>A parameter of the set at which further conditions hold; null where there is none.</summary>
    public Rational[]? Point(params LinearCondition[] more) => Search(Cones, 0, more.ToList());

    /// <summary>Whether the cones of some of the ends have no parameter in common.</summary>
    public bool Exclude(IReadOnlyList<GrowthCone> some, IEnumerable<LinearCondition> more) => Search(some, 0, more.ToList()) is null && IsDecided;

    /// <summary>The ends on whose boundary some of the parameters belong to the set; none where it is open.</summary>
    public IEnumerable<GrowthCone> Faces()
    {
        foreach (var cone in Cones)
        {
            var others = Cones.Where(c => c != cone).ToList();
            if (cone.Cells().Where(c => c.Any(l => l.Sense == Sense.Zero)).Any(c => Search(others, 0, c.ToList()) is not null))
                yield return cone;
        }
    }

    /// <summary>The value to which a parameter is forced; null where it can differ.</summary>
    public Rational? Forced(int parameter)
    {
        if (Point() is not { } point)
            return null;
        var value = point[parameter];
        var weights = Enumerable.Range(0, count).Select(j => j == parameter ? Rational.One : Rational.Zero).ToArray();
        var less = Point(new LinearCondition(weights, -value, Sense.Negative));
        var more = Point(new LinearCondition(weights.Select(w => -w).ToArray(), value, Sense.Negative));
        return less is null && more is null && IsDecided ? value : null;
    }

    private Rational[]? Search(IReadOnlyList<GrowthCone> some, int at, List<LinearCondition> conditions)
    {
        if (Solve(conditions) is not { } point)
            return null;
        if (at == some.Count)
            return point;
        foreach (var cell in some[at].Cells())
        {
            if (Search(some, at + 1, conditions.Concat(cell).ToList()) is { } found)
                return found;
        }

        return null;
    }

    private Rational[]? Solve(List<LinearCondition> conditions)
    {
        if (++_systems > MostSystems)
        {
            IsDecided = false;
            return null;
        }

        var point = LinearSystem.Solve(conditions, count, out var decided);
        IsDecided &= decided;
        return point;
    }
}
