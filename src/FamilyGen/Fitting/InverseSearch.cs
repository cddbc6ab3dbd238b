using System;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>Solves η(φ) = θ by damped Gauss–Newton steps (Levenberg 1944, Marquardt 1963) from several starts.</summary>
internal static class InverseSearch
{
    private const int Starts = 48;
    private const double Solved = 1e-10;

    public static bool TrySolve<TKernel>(TKernel kernel, ReadOnlySpan<double> theta, Span<double> parameters)
        where TKernel : struct, ITradeKernel
    {
        var chart = ParameterChart.Of(kernel);
        var unit = new double[theta.Length];
        for (var j = 0; j < unit.Length; j++)
        {
            if (!double.IsFinite(theta[j]))
                return false;
            unit[j] = theta[j] == 0 ? 1 : Math.Abs(theta[j]);
        }

        for (var n = 0; n < Starts; n++)
        {
            var y = Nearest(kernel, chart, theta, unit, chart.Spread(n, n < Starts / 2 ? 3 : 12), out var distance);
            if (distance > Solved)
                continue;
            chart.Parameters(y).CopyTo(parameters);
            SettleAtZero(kernel, theta, unit, parameters, distance);
            return TradeParameters.AreInRange(kernel, parameters);
        }

        return false;
    }

    /// <summary>The coordinates near a start at which η comes nearest to θ, deviations measured in the units given.</summary>
    public static double[] Nearest<TKernel>(
        TKernel kernel, ParameterChart chart, ReadOnlySpan<double> theta, ReadOnlySpan<double> unit, double[] start, out double distance)
        where TKernel : struct, ITradeKernel
    {
        var y = start;
        var damping = 1e-3;
        distance = double.PositiveInfinity;
        var map = Map(kernel, chart, y);
        var misfit = Misfit(map, theta, unit);
        for (var step = 0; step < 100 && double.IsFinite(misfit); step++)
        {
            distance = misfit;
            if (misfit == 0 || GaussNewton(chart, map, y, theta, unit, damping) is not { } change)
                break;
            var next = new double[y.Length];
            for (var i = 0; i < y.Length; i++)
                next[i] = y[i] + change[i];
            var nextMap = Map(kernel, chart, next);
            var nextMisfit = Misfit(nextMap, theta, unit);
            if (nextMisfit < misfit)
            {
                var isSettled = misfit < Solved && nextMisfit > misfit / 4;
                (y, map, misfit) = (next, nextMap, nextMisfit);
                damping = Math.Max(damping / 10, 1e-15);
                distance = misfit;
                if (isSettled)
                    break;
            }
            else
            {
                damping *= 10;
                if (damping > 1e8)
                    break;
            }
        }

        return y;
    }

    /// <summary>Replaces parameters that are all but 0 by 0 where η is then no farther from θ: a maximum on the boundary of the
    /// parameter set needs it exactly.</summary>
    private static void SettleAtZero<TKernel>(TKernel kernel, ReadOnlySpan<double> theta, ReadOnlySpan<double> unit, Span<double> parameters, double distance)
        where TKernel : struct, ITradeKernel
    {
        for (var i = 0; i < parameters.Length; i++)
        {
            var before = parameters[i];
            if (!(Math.Abs(before) < 1e-9))
                continue;
            parameters[i] = 0;
            if (!TradeParameters.AreInRange(kernel, parameters) || !(Misfit(NaturalMap.At(kernel, parameters), theta, unit) <= distance))
                parameters[i] = before;
        }
    }

    private static NaturalMap Map<TKernel>(TKernel kernel, ParameterChart chart, double[] y)
        where TKernel : struct, ITradeKernel => NaturalMap.At(kernel, chart.Parameters(y));

    private static double Misfit(NaturalMap map, ReadOnlySpan<double> theta, ReadOnlySpan<double> unit)
    {
        double sum = 0;
        for (var j = 0; j < theta.Length; j++)
        {
            var residual = (map.Theta[j] - theta[j]) / unit[j];
            sum += residual * residual;
        }

        return double.IsNaN(sum) ? double.PositiveInfinity : Math.Sqrt(sum);
    }

    private static double[]? GaussNewton(
        ParameterChart chart, NaturalMap map, double[] y, ReadOnlySpan<double> theta, ReadOnlySpan<double> unit, double damping)
    {
        var p = y.Length;
        var normal = new double[p, p];
        var side = new double[p];
        for (var a = 0; a < p; a++)
        {
            var first = chart.Map(a, y[a]).First;
            for (var j = 0; j < theta.Length; j++)
            {
                var slope = map.First(j, a) * first / unit[j];
                side[a] += slope * (theta[j] - map.Theta[j]) / unit[j];
                for (var b = 0; b <= a; b++)
                {
                    normal[a, b] += slope * map.First(j, b) * chart.Map(b, y[b]).First / unit[j];
                    normal[b, a] = normal[a, b];
                }
            }
        }

        for (var a = 0; a < p; a++)
            normal[a, a] = (normal[a, a] * (1 + damping)) + 1e-300;
        return Cholesky.TryFactor(normal)?.Solve(side);
    }
}
