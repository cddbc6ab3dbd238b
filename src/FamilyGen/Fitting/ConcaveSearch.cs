using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>How a search for the maximum of a concave likelihood ended.</summary>
/// <param name="Maximum">The maximum; null when there is none.</param>
/// <param name="Face">The face of the parameter set on which it lies.</param>
/// <param name="Multipliers">For each wall of the face, the rise of the likelihood of a unit of weight beyond it.</param>
/// <param name="Path">The parameters that the search went through.</param>
/// <param name="Iterations">The steps taken, those on tried faces included.</param>
/// <param name="IsEndless">Whether the search went on, without a sign of an end, until it was stopped.</param>
/// <param name="Reason">Why an evaluation failed, if one did.</param>
/// <param name="Tie">A relation between the statistics that holds on the whole support, if there is one.</param>
internal sealed record SearchOutcome<TKernel>(
    ModelPoint<TKernel>? Maximum,
    Face Face,
    double[] Multipliers,
    IReadOnlyList<double[]> Path,
    int Iterations,
    bool IsEndless,
    string? Reason,
    string? Tie = null)
    where TKernel : struct, IKernel;

/// <summary>Newton's method for the likelihood in the natural parameters, where it is concave, so that the one maximum is
/// found from anywhere or shown to be missing.</summary>
/// <remarks>A step that would cross a wall of the parameter set goes along it instead. It is shortened until the slope along
/// it has not turned further than it may; differences of the likelihood itself, which rounding drowns near the maximum, are
/// asked only where they are large. A wall whose points belong to the set is tried as a face: its maximum is the answer when
/// the likelihood would rise beyond the wall (the Karush–Kuhn–Tucker conditions, sufficient by concavity); if not, the maximum
/// is inside.</remarks>
internal sealed class ConcaveSearch<TKernel>(StatisticSums<TKernel> sums)
    where TKernel : struct, IKernel
{
    private const int MaximalSteps = 300;
    private const int StepsThatProveDivergence = 40;
    private const double Converged = 1e-14;

    // Where θ itself has too few digits for the decrement to become small, it stands still at the size of their rounding.
    private const int MaximalStandstill = 6;
    private const double LargestRounding = 1e-3;

    // A free step ends short of a wall, and a step along a wall goes this part of the way to it.
    private const double NearestPart = 0.9;
    private const double WallPart = 0.8;
    private const double LongestStep = 1024;

    // Below this decrement the law is quadratic to within rounding if it is near a maximum at all.
    private const double Quadratic = 1e-5;

    private readonly double[] _unit = StartingPoints<TKernel>.Units(sums);
    private int _iterations;

    /// <summary>Searches the whole parameter set.</summary>
    public SearchOutcome<TKernel> Run()
    {
        var face = Face.Whole(sums.Kernel.NaturalSet, TKernel.Count);
        if (Concentration.Path(sums) is { } path)
            return new(null, face, [], path, path.Count, true, null);
        var start = StartingPoints<TKernel>.Best(sums, face, _unit, out var reason);
        return start is null ? new(null, face, [], [], 0, false, reason, AffineDependence.Find(sums)) : Climb(start, face);
    }

    private SearchOutcome<TKernel> Climb(ModelPoint<TKernel> point, Face face)
    {
        var path = new List<double[]> { point.Theta };
        var trials = new Dictionary<Wall, int>();
        string? reason = null;
        var best = (Point: point, Decrement: double.PositiveInfinity);
        var (isSteady, sinceBest, unsteady) = (false, 0, 0);
        for (var steps = 0; steps < MaximalSteps && unsteady < StepsThatProveDivergence; steps++)
        {
            if (NewtonSystem<TKernel>.TryAt(point, face) is not { } system)
                break;
            sinceBest = system.Decrement < 0.25 * best.Decrement ? 0 : sinceBest + 1;
            if (system.Decrement < best.Decrement)
                best = (point, system.Decrement);
            if (isSteady && IsConverged(best.Decrement, sinceBest))
                return new(best.Point, face, Multipliers(best.Point, face), path, _iterations, false, null);

            var (step, walls) = StepInside(system, face, point.Theta);
            if (walls.Count > 0 && IsDueTrial(walls[0], step, trials, face) && OnFace(face.With(walls[0]), walls[0], point, system) is { } held)
                return held;

            var limit = walls.Count > 0 ? 1 : Math.Min(LongestStep, NearestPart * Room(face, point.Theta, step.Change, walls).Room);
            var (next, length) = LineSearch(point, step, limit, system.Decrement < Quadratic, out reason);
            if (next is null)
                break;
            var ratio = next.CurvatureAlong(step.Change) / point.CurvatureAlong(step.Change);
            isSteady = ratio is > 0.7 and < 1.4 && length == 1 && walls.Count == 0;
            unsteady = isSteady || length < 1 || walls.Count > 0 ? 0 : unsteady + 1;
            point = next;
            path.Add(point.Theta);
            _iterations++;
        }

        return new(null, face, Multipliers(point, face), path, _iterations, unsteady > 3, reason);
    }

    private static bool IsConverged(double decrement, int sinceBest) =>
        decrement <= Converged
        || (sinceBest > 0 && decrement < Quadratic)
        || (sinceBest > MaximalStandstill && decrement < LargestRounding);

    /// <summary>Newton's step, or where it would cross walls, the best step that goes most of the way to them.</summary>
    private static (Step Step, List<Wall> Walls) StepInside(NewtonSystem<TKernel> system, Face face, double[] theta)
    {
        var step = system.Full();
        var (walls, advances) = (new List<Wall>(), new List<double>());
        while (walls.Count < face.Limits!.Count)
        {
            var (room, wall) = Room(face, theta, step.Change, walls);
            if (wall is null || NearestPart * room > 1)
                break;
            walls.Add(wall);
            advances.Add(-WallPart * wall.Value(theta));
            if (system.Towards(walls, advances) is not { } along)
                break;
            step = along;
        }

        return (step, walls);
    }

    /// <summary>Whether a wall is to be tried as a face: when a search along it has come close, and again at its end.</summary>
    private static bool IsDueTrial(Wall wall, Step step, Dictionary<Wall, int> trials, Face face)
    {
        var trial = trials.GetValueOrDefault(wall);
        if (!face.CanHold(wall) || step.Rise > (trial == 0 ? 1e-2 : 1e-10) || trial > 1)
            return false;
        trials[wall] = trial + 1;
        return true;
    }

    /// <summary>What the search on a face finds, if it holds for the whole set.</summary>
    private SearchOutcome<TKernel>? OnFace(Face face, Wall wall, ModelPoint<TKernel> from, NewtonSystem<TKernel> system)
    {
        if (face.Limits is null)
            return null;
        var theta = system.Towards([wall], [-wall.Value(from.Theta)]) is { } across
            ? from.Basis.Step(from.Theta, across.Centred)
            : (double[])from.Theta.Clone();
        face.Restore(theta);
        if (face.Dimension == 0)
        {
            if (ModelPoint<TKernel>.TryAt(sums, theta, out _) is not { } corner || Multipliers(corner, face) is not { } rise || rise.Any(IsInward))
                return null;
            return new(corner, face, rise, [theta], _iterations, false, null);
        }

        var start = sums.Kernel.NaturalSet.Contains(theta) && ModelPoint<TKernel>.TryAt(sums, theta, out _) is { } point
            && NewtonSystem<TKernel>.TryAt(point, face) is not null
            ? point
            : StartingPoints<TKernel>.Best(sums, face, _unit, out _);
        if (start is null)
            return null;

        // Where the likelihood rises without end on the face and the wall keeps it from rising further, it does so on the
        // whole set: the face's account is the answer too.
        var outcome = Climb(start, face);
        return outcome.Maximum is null && !outcome.IsEndless || outcome.Multipliers.Any(IsInward) ? null : outcome;
    }

    /// <summary>A rise towards the inside, beyond what rounding can feign.</summary>
    private static bool IsInward(double multiplier) => !(multiplier >= 0);

    /// <summary>The solution of gradient = Σ multiplier·weights over the walls of the face, rounding removed.</summary>
    private static double[] Multipliers(ModelPoint<TKernel> point, Face face)
    {
        if (face.Held.Count == 0)
            return [];
        var gradient = point.NaturalGradient();
        var walls = face.Held.Count;
        var products = new double[walls, walls];
        var sides = new double[walls];
        for (var a = 0; a < walls; a++)
        {
            for (var j = 0; j < gradient.Length; j++)
            {
                var weight = face.Held[a].Weights[j];
                if (weight == 0)
                    continue;
                sides[a] += weight * gradient[j];
                for (var b = 0; b < walls; b++)
                    products[a, b] += weight * face.Held[b].Weights[j];
            }
        }

        // An infinite mean on the face is one that grows without bound towards the inside: the likelihood rises there.
        if (!Array.TrueForAll(sides, double.IsFinite) || Cholesky.TryFactor(products) is not { } factor)
            return [double.NegativeInfinity];
        var multipliers = factor.Solve(sides);
        for (var a = 0; a < walls; a++)
        {
            var noise = 0.0;
            for (var j = 0; j < gradient.Length; j++)
            {
                var deviation = Math.Sqrt(Math.Abs(point.CurvatureAlong(Unit(j, gradient.Length))));
                if (face.Held[a].Weights[j] != 0 && double.IsFinite(deviation))
                    noise += 1e-10 * deviation / Math.Abs(face.Held[a].Weights[j]);
            }

            if (Math.Abs(multipliers[a]) <= noise)
                multipliers[a] = 0;
        }

        return multipliers;
    }

    private static double[] Unit(int index, int count)
    {
        var unit = new double[count];
        unit[index] = 1;
        return unit;
    }

    /// <summary>The multiple of a change at which the first wall other than those given is met, and that wall.</summary>
    private static (double Room, Wall? Wall) Room(Face face, double[] theta, double[] change, List<Wall> others)
    {
        var (room, first) = (double.PositiveInfinity, (Wall?)null);
        foreach (var wall in face.Limits!)
        {
            double rate = 0;
            for (var j = 0; j < change.Length; j++)
                rate += wall.Weights[j] * change[j];
            var distance = -wall.Value(theta);
            if (rate > 0 && distance / rate < room && !others.Contains(wall))
                (room, first) = (distance / rate, wall);
        }

        return (room, first);
    }

    /// <summary>A point along the step at which the likelihood is higher.</summary>
    private (ModelPoint<TKernel>? Point, double Length) LineSearch(ModelPoint<TKernel> from, Step step, double limit, bool isTiny, out string? reason)
    {
        reason = null;
        var length = Math.Min(1, limit);
        var (low, lowRise, high) = (0.0, step.Rise, double.PositiveInfinity);
        ModelPoint<TKernel>? best = null;
        for (var trial = 0; trial < 60; trial++)
        {
            var next = ModelPoint<TKernel>.TryAt(sums, from.Basis.Step(from.Theta, Scaled(step.Centred, length)), out var failure);
            reason = failure ?? reason;
            var slope = next?.SlopeAlong(step.Change) ?? double.NaN;
            var isLower = next is null || next.Objective < from.Objective - (1e-9 * (1 + Math.Abs(from.Objective)));
            if (next is null || (!isTiny && (isLower || slope < -0.5 * step.Rise)))
            {
                if (best is not null)
                    break;
                high = length;
                var secant = slope < 0 ? lowRise / (lowRise - slope) : 0.25;
                length = low + (Math.Clamp(secant, 0.1, 0.9) * (high - low));
                continue;
            }

            (best, low, lowRise) = (next, length, slope);
            if (!(slope > 0.5 * step.Rise) || isTiny || length >= limit || double.IsFinite(high))
                break;
            length = Math.Min(2 * length, limit);
        }

        return (best, low);
    }

    private static double[] Scaled(double[] change, double factor)
    {
        var result = new double[change.Length];
        for (var j = 0; j < result.Length; j++)
            result[j] = factor * change[j];
        return result;
    }
}
