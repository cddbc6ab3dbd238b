using System;
using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Kernels;

/// <summary>How the integral near an end was decided.</summary>
/// <param name="Converges">Whether it is finite.</param>
/// <param name="IsStrict">Whether nearby parameters are decided in the same way.</param>
internal readonly record struct Decision(bool Converges, bool IsStrict);

/// <summary>The asymptotic scale at one end, strongest rank first.</summary>
/// <remarks>The integral is decided by the first rank whose coefficient differs from its bound: 0 for ranks above the
/// logarithm; for the logarithm −1 at an infinite end (∫ xᶜ dx) and 1 at a finite end (∫ d⁻ᶜ dd, d the distance); at that
/// bound ∫ (log x)ᵈ dx/x is left, so −1 for log log; at this last bound the integral diverges.</remarks>
internal sealed class EndScale
{
    public EndScale(EndGrowth end)
    {
        End = end;

        // Factors of the density may raise these ranks even where the exponent has none of them.
        Rank[] always = [new(Growth.Linear, [], 0, "0"), new(Growth.Log, [], 0, "0"), new(Growth.LogLog, [], 0, "0")];
        Levels = end.Ranks.Concat(always)
            .GroupBy(rank => rank.Growth.Canonical())
            .Where(ranks => ranks.Key.Kind != GrowthKind.Bounded)
            .OrderByDescending(ranks => ranks.Key, Comparer<Growth>.Create(Growth.CompareStrength))
            .Select(ranks => new CoefficientLevel(ranks.Key, [.. ranks], Bound(ranks.Key.Kind)))
            .ToArray();
    }

    public EndGrowth End { get; }

    public CoefficientLevel[] Levels { get; }

    /// <summary>Whether ∫ |f|^power·|g|^otherPower·exp(exponent) is finite near the end, for factors f and g of the
    /// growth given.</summary>
    public Decision Decide(
        ReadOnlySpan<double> theta, Growth factor = default, double power = 0, Growth other = default, double otherPower = 0)
    {
        var strict = true;
        foreach (var level in Levels)
        {
            var extra = factor.AsFactor(power, level.Growth) + other.AsFactor(otherPower, level.Growth);
            var excess = level.Excess(theta, extra);
            if (excess != 0)
                return new(excess < 0, strict);
            strict &= level.IsFixed;
        }

        return new(false, strict);
    }

    private double Bound(GrowthKind kind) => kind switch
    {
        GrowthKind.Log => End.IsInfinite ? -1 : 1,
        GrowthKind.LogLog => -1,
        _ => 0,
    };
}
