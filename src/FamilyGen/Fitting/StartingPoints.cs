using System;
using System.Collections.Generic;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>Natural parameters from which a search may start.</summary>
internal static class StartingPoints<TKernel>
    where TKernel : struct, IKernel
{
    // A start within a standard deviation or so of the data's means needs no rival.
    private const double CloseEnough = 1.5;

    /// <summary>The best of a few points inside the parameter set; null, with a reason, when none can be evaluated.</summary>
    public static ModelPoint<TKernel>? Best(StatisticSums<TKernel> sums, Face face, double[] unit, out string? reason)
    {
        ModelPoint<TKernel>? best = null;
        reason = "no parameters were found for which the normalizer is finite";
        foreach (var theta in Candidates(sums, face, unit))
        {
            if (ModelPoint<TKernel>.TryAt(sums, theta, out var failure) is { } point && NewtonSystem<TKernel>.TryAt(point, face) is { } system)
            {
                if (best is null || point.Objective > best.Objective)
                    best = point;
                if (system.Decrement < CloseEnough)
                    return point;
            }
            else
            {
                reason = failure ?? reason;
            }
        }

        return best;
    }

    /// <summary>For each natural parameter a change that matters: the reciprocal of the statistic's spread over the data.</summary>
    public static double[] Units(StatisticSums<TKernel> sums)
    {
        var unit = new double[TKernel.Count];
        for (var j = 0; j < unit.Length; j++)
        {
            var spread = sums.Largest[j] - sums.Smallest[j];
            if (!(spread > 0))
                spread = Math.Abs(sums.Largest[j]);
            unit[j] = spread > 0 && double.IsFinite(1 / spread) ? 1 / spread : 1;
        }

        return unit;
    }

    private static IEnumerable<double[]> Candidates(StatisticSums<TKernel> sums, Face face, double[] unit)
    {
        var mean = sums.MeanObservation();
        var deviation = sums.Deviation();
        foreach (var widening in new[] { 1.0, 0.1 })
        {
            if (face.Held.Count == 0 && LikeNormal(sums.Kernel, mean, deviation / widening) is { } theta)
                yield return sums.Kernel.NaturalSet.IsInterior(theta) ? theta : face.InteriorPoint(theta, unit) ?? theta;
        }

        foreach (var scale in new[] { 1.0, 1e-3, 1e3 })
        {
            var scaled = new double[unit.Length];
            for (var j = 0; j < scaled.Length; j++)
                scaled[j] = unit[j] * scale;
            if (face.InteriorPoint(new double[unit.Length], scaled) is { } inside)
                yield return inside;
        }
    }

    /// <summary>Parameters for which the exponent has its top at the data's mean and there the curvature of a normal law with
    /// the data's spread, the smallest such parameters when there are several; null where the slopes do not tell.</summary>
    public static double[]? LikeNormal(TKernel kernel, double mean, double deviation)
    {
        var domain = kernel.Domain;
        if (!(deviation > 0))
            deviation = Math.Max(Math.Abs(mean), 1) / 2;
        var step = Math.Min(deviation / 2, Math.Min(mean - domain.Lower, domain.Upper - mean) / 2);
        if (!(step > 0) || !double.IsFinite(step))
            return null;
        var k = TKernel.Count;
        Span<double> below = stackalloc double[k + 1];
        Span<double> at = stackalloc double[k + 1];
        Span<double> above = stackalloc double[k + 1];
        kernel.Slopes(Reference(domain, mean - step), below);
        kernel.Slopes(Reference(domain, mean), at);
        kernel.Slopes(Reference(domain, mean + step), above);

        // Two equations, made comparable by the deviation: slope 0 and curvature −1.
        var rows = new double[2, k + 1];
        for (var j = 0; j <= k; j++)
        {
            rows[0, j] = at[j] * deviation;
            rows[1, j] = (above[j] - below[j]) / (2 * step) * deviation * deviation;
        }

        return SmallestSolution(rows, [-rows[0, k], -rows[1, k] - 1], k);
    }

    private static double[]? SmallestSolution(double[,] rows, double[] rightSide, int k)
    {
        // Each parameter in units of its own effect, so that none is preferred.
        var unit = new double[k];
        for (var j = 0; j < k; j++)
        {
            var effect = Math.Abs(rows[0, j]) + Math.Abs(rows[1, j]);
            unit[j] = effect > 0 ? 1 / effect : 0;
        }

        var normal = new double[2, 2];
        for (var a = 0; a < 2; a++)
        {
            for (var b = 0; b < 2; b++)
            {
                for (var j = 0; j < k; j++)
                    normal[a, b] += rows[a, j] * unit[j] * rows[b, j] * unit[j];
            }
        }

        var theta = new double[k];
        if (k > 1 && Cholesky.TryFactor(normal) is { } factor)
        {
            var multiplier = factor.Solve(rightSide);
            for (var j = 0; j < k; j++)
                theta[j] = unit[j] * unit[j] * ((rows[0, j] * multiplier[0]) + (rows[1, j] * multiplier[1]));
        }
        else if (normal[0, 0] > 0)
        {
            for (var j = 0; j < k; j++)
                theta[j] = unit[j] * unit[j] * rows[0, j] * rightSide[0] / normal[0, 0];
        }
        else
        {
            return null;
        }

        return Array.TrueForAll(theta, double.IsFinite) ? theta : null;
    }

    private static Point Reference(Domain domain, double x) => domain.At(x) with
    {
        RatioToLower = 0,
        RatioToUpper = 0,
        Integer = domain.IsLattice ? (long)Math.Floor(x) : 0,
    };
}
