using System;
using System.Collections.Generic;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>How one climb in the trade parameters ended.</summary>
/// <param name="End">The last point; a maximum only when <paramref name="IsMaximum"/>.</param>
/// <param name="IsMaximum">Whether the gradient vanishes there and the curvature is that of a maximum.</param>
/// <param name="Path">The trade parameters that were gone through.</param>
/// <param name="Iterations">The steps taken.</param>
/// <param name="Flat">A parameter about which the data say nothing, if there is one.</param>
/// <param name="IsOnly">Whether the maximum is certified to be the only one.</param>
internal sealed record CurvedClimb<TKernel>(CurvedPoint<TKernel> End, bool IsMaximum, IReadOnlyList<double[]> Path, int Iterations, int? Flat, bool IsOnly = false)
    where TKernel : struct, ITradeKernel;

/// <summary>Trust-region Newton for a likelihood in trade parameters that need not be concave.</summary>
internal sealed class CurvedSearch<TKernel>(StatisticSums<TKernel> sums)
    where TKernel : struct, ITradeKernel
{
    private const int MaximalSteps = 80;
    private const int StepsThatProveDivergence = 25;
    private const int RefinedStarts = 5;
    private const int SurveyedStarts = 32;
    private const double Converged = 1e-13;
    private const double Quadratic = 1e-5;

    // A region this small, in standard deviations of one unit of weight, is left by no step that matters.
    private const double SmallestRadius = 1e-5;

    private readonly ParameterChart _chart = ParameterChart.Of(sums.Kernel);

    /// <summary>Climbs from several starts, the given natural parameters' nearest trade parameters first.</summary>
    /// <returns>The ends of the climbs, the highest first; none when no start can be evaluated.</returns>
    public List<CurvedClimb<TKernel>> Run(IEnumerable<ModelPoint<TKernel>> guides, out string? reason)
    {
        var starts = new List<(double[] Y, CurvedPoint<TKernel> Point)>();
        reason = "no trade parameters were found for which the normalizer is finite";
        foreach (var guide in guides)
        {
            for (var n = 0; n < SurveyedStarts / 4; n++)
                AddStart(starts, InverseSearch.Nearest(sums.Kernel, _chart, guide.Theta, Units(guide), _chart.Spread(n, 4), out _), ref reason);
        }

        for (var n = 0; n < SurveyedStarts; n++)
            AddStart(starts, _chart.Spread(n, n < SurveyedStarts / 2 ? 3 : 9), ref reason);

        starts.Sort((a, b) => b.Point.Law.Objective.CompareTo(a.Point.Law.Objective));
        var climbs = new List<CurvedClimb<TKernel>>();
        for (var n = 0; n < starts.Count && n < RefinedStarts; n++)
        {
            var climb = Climb(starts[n].Y, starts[n].Point);
            if (climb.IsMaximum && SeparableLikelihood.HasOneMaximum(sums, climb.End))
                return [climb with { IsOnly = true }];
            if (climb.Flat is not null)
                return [climb];
            climbs.Add(climb);
        }

        climbs.Sort((a, b) => b.End.Law.Objective.CompareTo(a.End.Law.Objective));
        return climbs;
    }

    private static double[] Units(ModelPoint<TKernel> guide)
    {
        var unit = new double[guide.Theta.Length];
        for (var j = 0; j < unit.Length; j++)
        {
            var direction = new double[unit.Length];
            direction[j] = 1;
            var curvature = guide.CurvatureAlong(direction);
            unit[j] = curvature > 0 && double.IsFinite(curvature) ? 1 / Math.Sqrt(curvature) : 1;
        }

        return unit;
    }

    private void AddStart(List<(double[] Y, CurvedPoint<TKernel> Point)> starts, double[] y, ref string? reason)
    {
        if (CurvedPoint<TKernel>.TryAt(sums, _chart.Parameters(y), out var failure) is not { } point)
        {
            reason = failure ?? reason;
            return;
        }

        foreach (var other in starts)
        {
            var distance = 0.0;
            for (var i = 0; i < y.Length; i++)
                distance = Math.Max(distance, Math.Abs(other.Y[i] - y[i]));
            if (distance < 1e-3)
                return;
        }

        starts.Add((y, point));
    }

    private CurvedClimb<TKernel> Climb(double[] y, CurvedPoint<TKernel> point)
    {
        var path = new List<double[]> { point.Parameters };
        var radius = 1.0;
        var previous = double.PositiveInfinity;
        double[]? lastStep = null;
        var lastBend = double.NaN;
        var unsteady = 0;
        for (var steps = 0; steps < MaximalSteps && unsteady < StepsThatProveDivergence; steps++)
        {
            var (gradient, hessian, unit) = InChart(y, point);
            var decrement = Decrement(gradient, hessian);

            // Along a road to infinity the decrement vanishes too, but the curvature goes on changing from step to step.
            var isSteady = lastStep is not null && Bend(hessian, lastStep) / lastBend is > 0.7 and < 1.4;
            unsteady = isSteady ? 0 : unsteady + 1;
            if (isSteady && decrement < Quadratic && (decrement <= Converged || decrement > previous / 4))
            {
                var flat = point.FlatParameter();
                return new(point, flat is null, path, steps, flat);
            }

            previous = decrement;

            var moved = false;
            while (!moved && radius > SmallestRadius)
            {
                if (TrustRegion.Step(gradient, hessian, unit, radius) is not var (step, rise, isOnRim))
                    return new(point, false, path, steps, point.FlatParameter());
                var next = new double[y.Length];
                for (var i = 0; i < y.Length; i++)
                    next[i] = y[i] + step[i];
                var reached = CurvedPoint<TKernel>.TryAt(sums, _chart.Parameters(next), out _);
                if (reached is null || !IsRise(point, reached, rise))
                {
                    radius = Math.Min(radius, Length(step, unit)) / 4;
                    continue;
                }

                if (isOnRim && reached.Law.Objective - point.Law.Objective > 0.5 * rise)
                    radius *= 2;
                (y, point, moved) = (next, reached, true);
                (lastStep, lastBend) = (step, Bend(hessian, step));
                path.Add(point.Parameters);
            }

            if (!moved)
                return new(point, isSteady && decrement < Quadratic && point.FlatParameter() is null, path, steps, point.FlatParameter());
        }

        return new(point, false, path, path.Count - 1, point.FlatParameter());
    }

    /// <summary>A rise of at least a part of what the model promised, or one too small to be told from rounding.</summary>
    private static bool IsRise(CurvedPoint<TKernel> from, CurvedPoint<TKernel> to, double promised)
    {
        var rounding = 1e-11 * (1 + Math.Abs(from.Law.Objective));
        return to.Law.Objective - from.Law.Objective > (0.05 * promised) - rounding;
    }

    /// <summary>Gradient and Hessian in the chart's coordinates, and the coordinates' units: one standard deviation of a unit
    /// of weight, or 1 where that is more.</summary>
    private (double[] Gradient, double[,] Hessian, double[] Unit) InChart(double[] y, CurvedPoint<TKernel> point)
    {
        var p = y.Length;
        var (gradient, hessian, unit) = (new double[p], new double[p, p], new double[p]);
        var map = new (double Value, double First, double Second)[p];
        for (var a = 0; a < p; a++)
            map[a] = _chart.Map(a, y[a]);
        for (var a = 0; a < p; a++)
        {
            gradient[a] = point.Gradient[a] * map[a].First;
            for (var b = 0; b < p; b++)
                hessian[a, b] = point.Hessian[a, b] * map[a].First * map[b].First;
            hessian[a, a] += point.Gradient[a] * map[a].Second;
            var deviation = 1 / (Math.Sqrt(point.Information[a, a]) * map[a].First);
            unit[a] = deviation > 0 ? Math.Min(1, deviation) : 1;
        }

        return (gradient, hessian, unit);
    }

    private static double Bend(double[,] hessian, double[] step)
    {
        double sum = 0;
        for (var a = 0; a < step.Length; a++)
        {
            for (var b = 0; b < step.Length; b++)
                sum += step[a] * step[b] * hessian[a, b];
        }

        return sum;
    }

    private static double Decrement(double[] gradient, double[,] hessian)
    {
        var p = gradient.Length;
        var negative = new double[p, p];
        for (var a = 0; a < p; a++)
        {
            for (var b = 0; b < p; b++)
                negative[a, b] = -hessian[a, b];
        }

        if (Cholesky.TryFactor(negative) is not { } factor)
            return double.PositiveInfinity;
        var step = factor.Solve(gradient);
        double squared = 0;
        for (var a = 0; a < p; a++)
            squared += step[a] * gradient[a];
        return Math.Sqrt(Math.Max(0, squared));
    }

    private static double Length(double[] step, double[] unit)
    {
        double sum = 0;
        for (var i = 0; i < step.Length; i++)
            sum += step[i] / unit[i] * (step[i] / unit[i]);
        return Math.Sqrt(sum);
    }
}
