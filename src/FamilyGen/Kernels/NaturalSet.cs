using System;
using System.Collections.Immutable;

namespace FamilyGen.Kernels;

/// <summary>The ranks of the asymptotic scale in which an exponent is expanded at an end of the support, from the
/// strongest down. At an infinite end they are functions of |x| → ∞, at a finite end functions of 1/distance → ∞.</summary>
public enum GrowthKind
{
    /// <summary>exp(order·|x|), order &gt; 0.</summary>
    Exponential = 6,

    /// <summary>|x|^order, order &gt; 1, or any order &gt; 0 above a logarithm.</summary>
    Power = 5,

    /// <summary>|x|^order · log |x|, order &gt; 0 (between |x|^order and higher powers).</summary>
    PowerTimesLog = 4,

    /// <summary>(log |x|)^order, order &gt; 1.</summary>
    LogPower = 3,

    /// <summary>log |x|.</summary>
    Log = 2,

    /// <summary>log log |x|.</summary>
    LogLog = 1,

    /// <summary>Bounded.</summary>
    Bounded = 0,
}

/// <summary>How fast a function grows at an end.</summary>
/// <param name="Kind">The rank of the scale.</param>
/// <param name="Order">The exponent within the rank.</param>
public readonly record struct Growth(GrowthKind Kind, double Order = 1);

/// <summary>One rank of the exponent at an end: its coefficient there is Σ weightⱼθⱼ + constant.</summary>
/// <param name="Growth">The function of x.</param>
/// <param name="Weights">One weight for each natural parameter.</param>
/// <param name="Constant">The contribution of the base measure.</param>
/// <param name="Text">The coefficient as a person would write it: "1 − crowding".</param>
public sealed record Rank(Growth Growth, ImmutableArray<double> Weights, double Constant, string Text);

/// <summary>The expansion of the exponent at one end of one piece of the support, strongest rank first.</summary>
/// <param name="Where">The end as a person would name it: "x → ∞", "x → 0".</param>
/// <param name="IsInfinite">Whether the end lies at ±∞.</param>
/// <param name="IsUpper">Whether it is the upper end.</param>
/// <param name="Ranks">The ranks, strongest first; one that is absent has coefficient 0.</param>
/// <param name="Statistics">The growth of |T₀| … |T_{k−1}|, |log h| at this end.</param>
public sealed record EndGrowth(string Where, bool IsInfinite, bool IsUpper, ImmutableArray<Rank> Ranks, ImmutableArray<Growth> Statistics);

/// <summary>The set of natural parameters: those for which every end of the support converges.</summary>
public sealed class NaturalSet(ImmutableArray<EndGrowth> ends)
{
    /// <summary>The ends of the support and of its pieces.</summary>
    public ImmutableArray<EndGrowth> Ends { get; } = ends;
}
