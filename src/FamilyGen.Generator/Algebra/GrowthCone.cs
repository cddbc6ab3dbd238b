using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>One rank of an exponent at an end: its coefficient less the bound that it must stay below, Σ weightⱼθⱼ +
/// excess.</summary>
/// <param name="Kind">The name of the rank in FamilyGen.Kernels.GrowthKind.</param>
/// <param name="Weights">One for each natural parameter.</param>
/// <param name="Excess">The constant part, less the bound.</param>
internal sealed record GrowthLevel(string Kind, IReadOnlyList<Rational> Weights, Rational Excess)
{
    public bool IsFixed => Weights.All(w => w.IsZero);

    public LinearCondition Condition(Sense sense) => new(Weights, Excess, sense);
}

/// <summary>The natural parameters for which the integral near one end is finite: those whose first level that is not zero
/// is negative.</summary>
/// <param name="End">The end.</param>
/// <param name="Levels">Strongest first. If all are zero the integral diverges.</param>
internal sealed record GrowthCone(EndRow End, IReadOnlyList<GrowthLevel> Levels)
{
    /// <summary>Reads an end for given known values; irrational constants are taken at their nearest double.</summary>
    public static GrowthCone Of(EndRow end, Expander expander, Func<Symbol, double> known)
    {
        var none = new Rational[end.Statistics.Count - 1];
        var entries = end.Ranks
            .Select(r => new Entry(GrowthRank.Of(r.Kind, Number(r.Order)), r.Weights.Select(Number).ToArray(), Number(r.Constant)))
            .Append(new Entry(GrowthRank.Log, none, Rational.Zero))
            .Append(new Entry(GrowthRank.LogLog, none, Rational.Zero));
        var ranks = entries
            .Where(e => e.Rank.Class > 0)
            .GroupBy(e => e.Rank)
            .OrderByDescending(g => g.Key)
            .Select(g => new GrowthLevel(
                g.Key.Kind,
                g.Select(e => e.Weights).Aggregate((a, b) => a.Select((w, j) => w + b[j]).ToArray()),
                g.Aggregate(-g.Key.Bound(end.IsInfinite), (sum, e) => sum + e.Constant)));
        return new GrowthCone(end, ranks.ToList());

        Rational Number(Expression expression) => Approximation.Of(expander.Expand(expression), known);
    }

    private sealed record Entry(GrowthRank Rank, Rational[] Weights, Rational Constant);

    /// <summary>The level that decides at all but special parameters; null where no level is ever different from zero.</summary>
    public GrowthLevel? Deciding => Levels.FirstOrDefault(l => !l.IsFixed || !l.Excess.IsZero);

    /// <summary>The cells of the cone, one for each level that may be the first that is not zero: the levels above it are
    /// zero and it is negative.</summary>
    public IEnumerable<IReadOnlyList<LinearCondition>> Cells()
    {
        var zero = new List<LinearCondition>();
        foreach (var level in Levels)
        {
            if (level.IsFixed)
            {
                if (level.Excess.Sign < 0)
                    yield return zero.ToArray();
                if (!level.Excess.IsZero)
                    yield break;
                continue;
            }

            yield return zero.Append(level.Condition(Sense.Negative)).ToArray();
            zero.Add(level.Condition(Sense.Zero));
        }
    }
}

/// <summary>A place in the asymptotic scale.</summary>
internal readonly record struct GrowthRank(int Class, Rational Order, bool TimesLog, string Kind) : IComparable<GrowthRank>
{
    public static GrowthRank Log { get; } = new(2, Rational.One, false, "Log");

    public static GrowthRank LogLog { get; } = new(1, Rational.One, false, "LogLog");

    /// <summary>The rank under the name that it has once its order is a number: |x|⁰·log |x| is log |x|; class 0 is bounded.</summary>
    public static GrowthRank Of(string kind, Rational order) => kind switch
    {
        "Log" => Log,
        "LogLog" => LogLog,
        "PowerTimesLog" when order.IsZero => Log,
        "LogPower" when order == Rational.One => Log,
        _ when order.Sign <= 0 => new(0, Rational.Zero, false, kind),
        "Exponential" => new(5, order, false, kind),
        "Power" => new(4, order, false, kind),
        "PowerTimesLog" => new(4, order, true, kind),
        "LogPower" => new(3, order, false, kind),
        _ => new(0, Rational.Zero, false, kind),
    };

    /// <summary>∫ xᶜ dx at an infinite end, ∫ d⁻ᶜ dd at a finite one; at the bound ∫ (log x)ᶜ dx/x is left.</summary>
    public Rational Bound(bool isInfinite) => Kind switch
    {
        "LogLog" => -1,
        _ when Class == 2 => isInfinite ? -1 : 1,
        _ => Rational.Zero,
    };

    public int CompareTo(GrowthRank other)
    {
        var byClass = Class.CompareTo(other.Class);
        if (byClass != 0)
            return byClass;
        var byOrder = Order.CompareTo(other.Order);
        return byOrder != 0 ? byOrder : TimesLog.CompareTo(other.TimesLog);
    }
}
