using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

internal enum Sense
{
    /// <summary>Σ weightⱼθⱼ + constant &lt; 0.</summary>
    Negative,

    /// <summary>Σ weightⱼθⱼ + constant ≤ 0.</summary>
    NotPositive,

    /// <summary>Σ weightⱼθⱼ + constant = 0.</summary>
    Zero,
}

/// <summary>One linear condition on θ, in exact fractions.</summary>
internal sealed record LinearCondition(IReadOnlyList<Rational> Weights, Rational Constant, Sense Sense)
{
    public bool IsFixed => Weights.All(w => w.IsZero);

    /// <summary>For a condition that θ does not enter: whether it holds.</summary>
    public bool Holds => Sense switch
    {
        Sense.Negative => Constant.Sign < 0,
        Sense.NotPositive => Constant.Sign <= 0,
        _ => Constant.IsZero,
    };
}

/// <summary>Whether linear conditions can hold together, decided exactly by elimination of one unknown after the other
/// (Fourier 1826, Motzkin 1936).</summary>
internal static class LinearSystem
{
    private const int MostConditions = 600;

    /// <summary>A point at which all conditions hold; null where there is none.</summary>
    /// <param name="conditions">The conditions.</param>
    /// <param name="count">The number of unknowns.</param>
    /// <param name="isDecided">False where the elimination grew beyond its bound.</param>
    public static Rational[]? Solve(IEnumerable<LinearCondition> conditions, int count, out bool isDecided)
    {
        isDecided = true;
        var stages = new List<(int Unknown, List<LinearCondition> Conditions)>();
        var current = Reduced(conditions);
        foreach (var unknown in Order(current, count))
        {
            if (current is null)
                return null;
            stages.Add((unknown, current));
            current = Reduced(Eliminate(current, unknown));
            if (current is { Count: > MostConditions })
            {
                isDecided = false;
                return null;
            }
        }

        if (current is null || current.Any(c => !c.Holds))
            return null;
        var point = new Rational[count];
        for (var i = stages.Count - 1; i >= 0; i--)
            point[stages[i].Unknown] = Choose(stages[i].Conditions, stages[i].Unknown, point);
        return point;
    }

    // Unknowns that stand in equations first: they go without any growth.
    private static IEnumerable<int> Order(List<LinearCondition>? conditions, int count) => Enumerable.Range(0, count)
        .OrderByDescending(j => conditions?.Any(c => c.Sense == Sense.Zero && !c.Weights[j].IsZero) ?? false)
        .ToList();

    private static IEnumerable<LinearCondition> Eliminate(List<LinearCondition> conditions, int unknown)
    {
        var equation = conditions.FirstOrDefault(c => c.Sense == Sense.Zero && !c.Weights[unknown].IsZero);
        if (equation is not null)
        {
            foreach (var condition in conditions.Where(c => c != equation))
                yield return Combine(condition, Rational.One, equation, -condition.Weights[unknown] / equation.Weights[unknown], condition.Sense);
            yield break;
        }

        var (below, above) = (new List<LinearCondition>(), new List<LinearCondition>());
        foreach (var condition in conditions)
        {
            var sign = condition.Weights[unknown].Sign;
            if (sign == 0)
                yield return condition;
            else
                (sign > 0 ? above : below).Add(condition);
        }

        foreach (var upper in above)
        {
            foreach (var lower in below)
            {
                var sense = upper.Sense == Sense.Negative || lower.Sense == Sense.Negative ? Sense.Negative : Sense.NotPositive;
                yield return Combine(upper, -lower.Weights[unknown], lower, upper.Weights[unknown], sense);
            }
        }
    }

    private static LinearCondition Combine(LinearCondition a, Rational p, LinearCondition b, Rational q, Sense sense) =>
        new(a.Weights.Select((w, j) => (w * p) + (b.Weights[j] * q)).ToArray(), (a.Constant * p) + (b.Constant * q), sense);

    // Each direction once, with its strongest condition; null where one can never hold.
    private static List<LinearCondition>? Reduced(IEnumerable<LinearCondition> conditions)
    {
        var kept = new List<LinearCondition>();
        foreach (var condition in conditions)
        {
            if (condition.IsFixed)
            {
                if (!condition.Holds)
                    return null;
                continue;
            }

            var scaled = Scaled(condition);
            var at = kept.FindIndex(k => (k.Sense == Sense.Zero) == (scaled.Sense == Sense.Zero) && k.Weights.SequenceEqual(scaled.Weights));
            if (at < 0)
            {
                kept.Add(scaled);
            }
            else if (scaled.Sense == Sense.Zero)
            {
                if (scaled.Constant != kept[at].Constant)
                    return null;
            }
            else if (scaled.Constant > kept[at].Constant || (scaled.Constant == kept[at].Constant && scaled.Sense == Sense.Negative))
            {
                kept[at] = scaled;
            }
        }

        return kept;
    }

    private static LinearCondition Scaled(LinearCondition condition)
    {
        var leading = condition.Weights.First(w => !w.IsZero);
        var scale = Rational.One / (condition.Sense == Sense.Zero ? leading : Rational.Abs(leading));
        return scale == Rational.One
            ? condition
            : new LinearCondition(condition.Weights.Select(w => w * scale).ToArray(), condition.Constant * scale, condition.Sense);
    }

    // A value between what the conditions leave once the later unknowns are chosen: a whole number where there is one.
    private static Rational Choose(List<LinearCondition> conditions, int unknown, Rational[] point)
    {
        Rational? lower = null;
        Rational? upper = null;
        foreach (var condition in conditions.Where(c => !c.Weights[unknown].IsZero))
        {
            var rest = condition.Constant;
            for (var j = 0; j < point.Length; j++)
            {
                if (j != unknown)
                    rest += condition.Weights[j] * point[j];
            }

            var bound = -rest / condition.Weights[unknown];
            if (condition.Sense == Sense.Zero)
                return bound;
            if (condition.Weights[unknown].Sign > 0)
                upper = upper is { } u && u < bound ? u : bound;
            else
                lower = lower is { } l && l > bound ? l : bound;
        }

        return (lower, upper) switch
        {
            (null, null) => Rational.Zero,
            ({ } l, null) => l.Sign < 0 ? Rational.Zero : EnclosedFunctions.FloorOf(l) + 1,
            (null, { } u) => u.Sign > 0 ? Rational.Zero : EnclosedFunctions.FloorOf(u) - 1,
            ({ } l, { } u) => l == u ? l : l.Sign < 0 && u.Sign > 0 ? Rational.Zero : (l + u) / 2,
        };
    }
}
