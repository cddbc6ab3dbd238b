using System;
using MathNet.Numerics.LinearAlgebra;

namespace FamilyGen.Fitting;

/// <summary>The step that maximizes g·s + ½ s·H·s within a ball in the given units, whatever the signs of H's eigenvalues
/// (Moré and Sorensen 1983).</summary>
internal static class TrustRegion
{
    /// <summary>The step, with the rise of the quadratic model along it; null when H is not finite.</summary>
    public static (double[] Step, double Rise, bool IsOnRim)? Step(double[] gradient, double[,] hessian, double[] unit, double radius)
    {
        var n = gradient.Length;
        var scaled = Matrix<double>.Build.Dense(n, n, (i, j) => -hessian[i, j] * unit[i] * unit[j]);
        foreach (var value in scaled.Enumerate())
        {
            if (!double.IsFinite(value))
                return null;
        }

        var eigen = scaled.Evd(Symmetricity.Symmetric);
        var values = new double[n];
        var along = new double[n];
        for (var i = 0; i < n; i++)
        {
            values[i] = eigen.EigenValues[i].Real;
            for (var j = 0; j < n; j++)
                along[i] += eigen.EigenVectors[j, i] * gradient[j] * unit[j];
        }

        var shift = Shift(values, along, radius, out var isOnRim);
        var step = new double[n];
        double rise = 0;
        for (var i = 0; i < n; i++)
        {
            if (along[i] == 0)
                continue;
            var length = along[i] / (values[i] + shift);
            rise += length * (along[i] - (0.5 * values[i] * length));
            for (var j = 0; j < n; j++)
                step[j] += eigen.EigenVectors[j, i] * length * unit[j];
        }

        return (step, rise, isOnRim);
    }

    /// <summary>The smallest shift μ ≥ 0 that makes every eigenvalue positive and the step along/(values + μ) short enough.</summary>
    private static double Shift(double[] values, double[] along, double radius, out bool isOnRim)
    {
        var smallest = double.PositiveInfinity;
        double size = 0;
        for (var i = 0; i < values.Length; i++)
        {
            smallest = Math.Min(smallest, values[i]);
            size = Math.Max(size, Math.Abs(values[i]));
        }

        isOnRim = false;
        if (smallest > 1e-12 * size && Length(values, along, 0) <= radius)
            return 0;
        isOnRim = true;
        var low = Math.Max(0, -smallest);
        var high = low + (Norm(along) / radius) + (1e-12 * size);
        for (var step = 0; step < 200 && high - low > 1e-6 * high; step++)
        {
            var middle = (low + high) / 2;
            if (Length(values, along, middle) > radius)
                low = middle;
            else
                high = middle;
        }

        return high;
    }

    private static double Length(double[] values, double[] along, double shift)
    {
        double sum = 0;
        for (var i = 0; i < values.Length; i++)
        {
            if (along[i] == 0)
                continue;
            if (!(values[i] + shift > 0))
                return double.PositiveInfinity;
            var length = along[i] / (values[i] + shift);
            sum += length * length;
        }

        return Math.Sqrt(sum);
    }

    private static double Norm(double[] vector)
    {
        double sum = 0;
        foreach (var value in vector)
            sum += value * value;
        return Math.Sqrt(sum);
    }
}
