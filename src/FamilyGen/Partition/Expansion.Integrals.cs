using System;

namespace FamilyGen.Partition;

internal sealed partial class Expansion<TKernel>
{
    /// <summary>The logarithm of the integrand in the integration coordinate at an offset, less its value at m.</summary>
    public double LogIntegrand(double offset)
    {
        Span<double> residual = stackalloc double[_theta.Length + 1];
        Span<double> difference = stackalloc double[_theta.Length + 1];
        return LogIntegrand(offset, residual, difference);
    }

    /// <summary>∫ exp(G(u) − G(m)) du between two offsets inside one resolved panel.</summary>
    public double Integral(double from, double to)
    {
        Span<double> residual = stackalloc double[_theta.Length + 1];
        Span<double> difference = stackalloc double[_theta.Length + 1];
        var half = (to - from) / 2;
        return Sum(QuadratureRule.Interval, from + half, half, residual, difference) * (2 * half);
    }

    /// <summary>Σ exp(f(x) − f(m)) over consecutive lattice points inside one resolved panel.</summary>
    public double LatticeSum(double first, double step, double count)
    {
        Span<double> residual = stackalloc double[_theta.Length + 1];
        Span<double> difference = stackalloc double[_theta.Length + 1];
        var sum = 0.0;
        while (count >= QuadratureRule.ShortestRun)
        {
            var power = (int)Math.Floor(Math.Log2(count));
            var length = Math.ScaleB(1, power);
            if (length > count)
                length = Math.ScaleB(1, --power);
            var rule = QuadratureRule.Lattice(power, out var half);
            sum += Sum(rule, first + step * (length - 1) / 2, step * half, residual, difference) * length;
            first += step * length;
            count -= length;
        }

        for (var i = 0; i < count; i++)
            sum += Math.Exp(LogIntegrand(first + step * i, residual, difference));
        return sum;
    }

    private double Sum(QuadratureRule rule, double center, double half, Span<double> residual, Span<double> difference)
    {
        var sum = 0.0;
        for (var i = 0; i < QuadratureRule.NodeCount; i++)
            sum += rule.Weights[i] * Math.Exp(LogIntegrand(center + half * rule.Nodes[i], residual, difference));
        return sum;
    }

    private double LogIntegrand(double offset, Span<double> residual, Span<double> difference)
    {
        At(offset, residual, difference, out _, out var log, out _);
        return double.IsNaN(log) ? double.NegativeInfinity : log;
    }
}
