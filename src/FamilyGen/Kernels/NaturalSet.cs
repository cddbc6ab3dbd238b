using System;
using System.Collections.Immutable;
using System.Globalization;
using System.Linq;

namespace FamilyGen.Kernels;

/// <summary>The set of natural parameters: those for which the integral of the exponential converges at every end of the
/// support and of its pieces.</summary>
public sealed class NaturalSet
{
    private readonly EndScale[] _scales;
    private readonly ImmutableArray<Wall> _walls;

    /// <summary>The set for the growth of the exponent at each end of the support and of its pieces.</summary>
    public NaturalSet(ImmutableArray<EndGrowth> ends)
    {
        Ends = ends;
        _scales = [.. ends.Select(end => new EndScale(end))];
        _walls = [.. _scales.Select(scale => WallFrom(scale, 0, new()).Wall).OfType<Wall>()];
    }

    /// <summary>The ends of the support and of its pieces.</summary>
    public ImmutableArray<EndGrowth> Ends { get; }

    /// <summary>Whether the normalizer is finite at θ.</summary>
    public bool Contains(ReadOnlySpan<double> theta) => IsFinite(theta, default, default);

    /// <summary>Whether the normalizer is finite in a whole neighbourhood of θ.</summary>
    public bool IsInterior(ReadOnlySpan<double> theta)
    {
        foreach (var scale in _scales)
            if (scale.Decide(theta) is not { Converges: true, IsStrict: true })
                return false;
        return AllFinite(theta);
    }

    /// <summary>Whether ∫ |factor|·exp(exponent) is finite, for a factor that grows as stated at lower and upper ends.</summary>
    public bool IsFinite(ReadOnlySpan<double> theta, Growth lowerFactor, Growth upperFactor)
    {
        foreach (var scale in _scales)
            if (!scale.Decide(theta, scale.End.IsUpper ? upperFactor : lowerFactor, 1).Converges)
                return false;
        return AllFinite(theta);
    }

    /// <summary>Whether the moment E|Tⱼ|^power is finite; the index after the last statistic stands for log h.</summary>
    public bool IsMomentFinite(ReadOnlySpan<double> theta, int statistic, int power)
    {
        foreach (var scale in _scales)
            if (!scale.Decide(theta, scale.End.Statistics[statistic], power).Converges)
                return false;
        return AllFinite(theta);
    }

    /// <summary>Whether the moment E|Tᵢ·Tⱼ| is finite; the index after the last statistic stands for log h.</summary>
    public bool IsProductFinite(ReadOnlySpan<double> theta, int first, int second)
    {
        foreach (var scale in _scales)
            if (!scale.Decide(theta, scale.End.Statistics[first], 1, scale.End.Statistics[second], 1).Converges)
                return false;
        return AllFinite(theta);
    }

    /// <summary>Whether the moment E|x|^power of the observation itself is finite.</summary>
    public bool IsObservationMomentFinite(ReadOnlySpan<double> theta, double power)
    {
        foreach (var scale in _scales)
            if (!scale.Decide(theta, scale.End.IsInfinite ? Growth.Linear : default, power).Converges)
                return false;
        return AllFinite(theta);
    }

    /// <summary>The condition that θ fails, as a sentence with the values that fail it; null when θ belongs to the set.</summary>
    public string? Violation(ReadOnlySpan<double> theta)
    {
        for (var j = 0; j < theta.Length; j++)
            if (!double.IsFinite(theta[j]))
                return string.Create(CultureInfo.InvariantCulture, $"natural parameter {j + 1} is {theta[j]}");
        foreach (var scale in _scales)
            if (!scale.Decide(theta).Converges)
                return Violation(scale, theta);
        return null;
    }

    /// <summary>The hyperplanes that limit the set, one for each end that does not converge for every θ.</summary>
    public ImmutableArray<Wall> Walls() => _walls;

    private static bool AllFinite(ReadOnlySpan<double> theta)
    {
        foreach (var value in theta)
            if (!double.IsFinite(value))
                return false;
        return true;
    }

    // The first level from here on that parameters still move where the levels above it meet their bounds, or the
    // verdict of the first one that they do not move.
    private static (WallMembership Membership, Wall? Wall) WallFrom(EndScale scale, int first, Equalities met)
    {
        for (var i = first; i < scale.Levels.Length; i++)
        {
            var level = scale.Levels[i];
            if (met.Add(level.Weights.AsSpan(), level.Constant - level.Bound) is not { } excess)
            {
                var (membership, refinement) = WallFrom(scale, i + 1, met);
                var wall = new Wall(
                    scale.End.Where, level.Weights, level.Constant, level.Bound, level.Text, membership, refinement);
                return (WallMembership.Conditional, wall);
            }

            if (excess != 0)
                return (excess < 0 ? WallMembership.Included : WallMembership.Excluded, null);
        }

        return (WallMembership.Excluded, null);
    }

    private static string Violation(EndScale scale, ReadOnlySpan<double> theta)
    {
        if (WallFrom(scale, 0, new()).Wall is not { } outer)
            return $"the normalizer is infinite at {scale.End.Where} for every parameter";
        var values = "";
        for (var wall = outer; wall is not null; wall = wall.Value(theta) == 0 ? wall.Refinement : null)
        {
            var value = CoefficientLevel.Excess(wall.Weights, theta, wall.Constant, 0);
            values += string.Create(CultureInfo.InvariantCulture, $"{(values == "" ? "" : " and ")}{wall.Text} = {value}");
        }

        return $"the normalizer is finite at {scale.End.Where} only if {outer.Condition}; here {values}";
    }
}
