using System;
using System.Collections.Immutable;
using System.Globalization;

namespace FamilyGen.Kernels;

/// <summary>Whether the points of a wall belong to the natural parameter set, as far as its end of the support goes.</summary>
public enum WallMembership
{
    /// <summary>None do.</summary>
    Excluded,

    /// <summary>All do.</summary>
    Included,

    /// <summary>Those do that satisfy the wall's refinement.</summary>
    Conditional,
}

/// <summary>A hyperplane that limits the natural parameter set at one end of the support: inside,
/// Σ weightⱼθⱼ + constant &lt; bound.</summary>
/// <param name="Where">The end as a person would name it.</param>
/// <param name="Weights">One weight for each natural parameter.</param>
/// <param name="Constant">The contribution of the base measure.</param>
/// <param name="Bound">0, or the limit of the power condition.</param>
/// <param name="Text">The left side as a person would write it: "1 − crowding".</param>
/// <param name="Membership">Whether the set reaches the hyperplane.</param>
/// <param name="Refinement">The condition on the next rank, which decides on the hyperplane where membership is
/// conditional.</param>
public sealed record Wall(
    string Where,
    ImmutableArray<double> Weights,
    double Constant,
    double Bound,
    string Text,
    WallMembership Membership,
    Wall? Refinement)
{
    /// <summary>Σ weightⱼθⱼ + constant − bound: negative inside, 0 on the wall.</summary>
    public double Value(ReadOnlySpan<double> theta) => CoefficientLevel.Excess(Weights, theta, Constant, -Bound);

    /// <summary>The whole condition as a person would write it: "crowding &lt; 0, or crowding = 0 and total &lt; 0".</summary>
    public string Condition
    {
        get
        {
            var bound = Bound.ToString(CultureInfo.InvariantCulture);
            return Membership switch
            {
                WallMembership.Excluded => $"{Text} < {bound}",
                WallMembership.Included => $"{Text} ≤ {bound}",
                _ => $"{Text} < {bound}, or {Text} = {bound} and {Refinement!.Condition}",
            };
        }
    }
}
