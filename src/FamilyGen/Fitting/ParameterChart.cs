using System;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>Coordinates y on the whole line for trade parameters φ with open ranges: log of the distance to a single end,
/// logit between two ends, arsinh where there is none, so that a search sees every scale alike and never leaves a range.</summary>
internal sealed class ParameterChart
{
    private readonly double[] _lower;
    private readonly double[] _upper;

    private ParameterChart(double[] lower, double[] upper) => (_lower, _upper) = (lower, upper);

    /// <summary>The number of parameters.</summary>
    public int Count => _lower.Length;

    public ReadOnlySpan<double> Lower => _lower;

    public ReadOnlySpan<double> Upper => _upper;

    public static ParameterChart Of<TKernel>(TKernel kernel)
        where TKernel : struct, ITradeKernel
    {
        var count = TKernel.ParameterNames.Length;
        var (lower, upper) = (new double[count], new double[count]);
        kernel.ParameterRange(lower, upper);
        return new(lower, upper);
    }

    /// <summary>φ from y.</summary>
    public double[] Parameters(ReadOnlySpan<double> y)
    {
        var result = new double[y.Length];
        for (var i = 0; i < result.Length; i++)
            result[i] = Map(i, y[i]).Value;
        return result;
    }

    /// <summary>y from φ.</summary>
    public double[] Coordinates(ReadOnlySpan<double> parameters)
    {
        var result = new double[parameters.Length];
        for (var i = 0; i < result.Length; i++)
        {
            result[i] = (double.IsFinite(_lower[i]), double.IsFinite(_upper[i])) switch
            {
                (true, true) => Math.Log((parameters[i] - _lower[i]) / (_upper[i] - parameters[i])),
                (true, false) => Math.Log(parameters[i] - _lower[i]),
                (false, true) => -Math.Log(_upper[i] - parameters[i]),
                _ => Math.Asinh(parameters[i]),
            };
        }

        return result;
    }

    /// <summary>φᵢ(y) with its first and second derivative.</summary>
    public (double Value, double First, double Second) Map(int i, double y)
    {
        switch (double.IsFinite(_lower[i]), double.IsFinite(_upper[i]))
        {
            case (true, true):
                var share = 1 / (1 + Math.Exp(-Math.Abs(y)));
                var (width, spread) = (_upper[i] - _lower[i], share * (1 - share));
                var value = y < 0 ? _lower[i] + (width * Math.Exp(y) * share) : _upper[i] - (width * Math.Exp(-y) * share);
                return (value, width * spread, width * spread * (y < 0 ? (2 * share) - 1 : 1 - (2 * share)));
            case (true, false):
                var above = Math.Exp(y);
                return (_lower[i] + above, above, above);
            case (false, true):
                var below = Math.Exp(-y);
                return (_upper[i] - below, below, -below);
            default:
                return (Math.Sinh(y), Math.Cosh(y), Math.Sinh(y));
        }
    }

    /// <summary>Well-spread points, the n-th of a fixed sequence, within the given size of each coordinate (Halton 1960).</summary>
    public double[] Spread(int n, double size)
    {
        ReadOnlySpan<int> primes = [2, 3, 5, 7, 11, 13, 17, 19, 23, 29];
        var y = new double[Count];
        for (var i = 0; i < y.Length; i++)
            y[i] = size * ((2 * Digits(n, primes[i % primes.Length])) - 1);
        return y;
    }

    private static double Digits(int n, int radix)
    {
        var (fraction, unit) = (0.0, 1.0);
        for (; n > 0; n /= radix)
        {
            unit /= radix;
            fraction += unit * (n % radix);
        }

        return fraction;
    }
}
