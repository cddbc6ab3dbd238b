using System.Collections.Immutable;

namespace FamilyGen.Kernels;

/// <summary>One rank of the exponent at an end: its coefficient there is Σ weightⱼθⱼ + constant.</summary>
/// <param name="Growth">The function of x.</param>
/// <param name="Weights">One weight for each natural parameter.</param>
/// <param name="Constant">The contribution of the base measure.</param>
/// <param name="Text">The coefficient as a person would write it: "1 − crowding".</param>
public sealed record Rank(Growth Growth, ImmutableArray<double> Weights, double Constant, string Text);

/// <summary>The expansion of the exponent at one end of one piece of the support.</summary>
/// <param name="Where">The end as a person would name it: "x → ∞", "x → 0".</param>
/// <param name="IsInfinite">Whether the end lies at ±∞. The finite end of a lattice always converges and has no row.</param>
/// <param name="IsUpper">Whether it is the upper end.</param>
/// <param name="Ranks">The ranks in any order; one that is absent has coefficient 0.</param>
/// <param name="Statistics">The growth of |T₀| … |T_{k−1}|, |log h| at this end.</param>
public sealed record EndGrowth(string Where, bool IsInfinite, bool IsUpper, ImmutableArray<Rank> Ranks, ImmutableArray<Growth> Statistics);
