using System;
using System.Collections.Generic;
using System.Globalization;
using FamilyGen.Kernels;
using MathNet.Numerics.LinearAlgebra;

namespace FamilyGen.Fitting;

/// <summary>A relation Σ weightⱼTⱼ(x) = constant that holds on all of the support, so that the parameters cannot be told apart;
/// known values can bring it about.</summary>
internal static class AffineDependence
{
    /// <summary>The relation as a sentence; null when the statistics are independent.</summary>
    public static string? Find<TKernel>(StatisticSums<TKernel> sums)
        where TKernel : struct, IKernel
    {
        var (k, points) = (TKernel.Count, Points(sums));
        if (points.Count == 0)
            return null;
        var unit = new double[k];
        for (var j = 0; j < k; j++)
        {
            foreach (var point in points)
                unit[j] = Math.Max(unit[j], Math.Abs(point[j] - points[0][j]));
        }

        var constant = Array.FindIndex(unit, size => size == 0);
        if (constant >= 0)
            return Sentence<TKernel>(Single(constant, k), points[0][constant]);

        var spread = Matrix<double>.Build.Dense(points.Count, k, (i, j) => (points[i][j] - points[0][j]) / unit[j]);
        var decomposition = spread.TransposeThisAndMultiply(spread).Evd(Symmetricity.Symmetric);
        var weights = new double[k];
        var largest = 0.0;
        for (var j = 0; j < k; j++)
        {
            weights[j] = decomposition.EigenVectors[j, 0] / unit[j];
            largest = Math.Abs(weights[j]) > Math.Abs(largest) ? weights[j] : largest;
        }

        for (var j = 0; j < k; j++)
            weights[j] = Math.Abs(weights[j] / largest) < 1e-10 ? 0 : weights[j] / largest;
        var level = Combine(weights, points[0]);
        foreach (var point in points)
        {
            var scale = 0.0;
            for (var j = 0; j < k; j++)
                scale += Math.Abs(weights[j]) * (Math.Abs(point[j]) + unit[j]);
            if (Math.Abs(Combine(weights, point) - level) > 1e-11 * scale)
                return null;
        }

        return Sentence<TKernel>(weights, level);
    }

    private static List<double[]> Points<TKernel>(StatisticSums<TKernel> sums)
        where TKernel : struct, IKernel
    {
        const int Most = 2000;
        var points = new List<double[]>();
        var (value, remainder) = (new double[TKernel.Count + 1], new double[TKernel.Count + 1]);
        foreach (var x in SupportProbe.Points(sums.Kernel.Domain, sums.Minimum, sums.Maximum))
        {
            sums.Kernel.Evaluate(sums.Kernel.Domain.At(x), value, remainder);
            if (points.Count < Most && Array.TrueForAll(value, double.IsFinite))
                points.Add(value[..^1]);
        }

        return points;
    }

    private static string Sentence<TKernel>(double[] weights, double level)
        where TKernel : struct, IKernel
    {
        var text = "";
        for (var j = 0; j < weights.Length; j++)
        {
            if (weights[j] == 0)
                continue;
            var sign = text == "" ? (weights[j] < 0 ? "−" : "") : weights[j] < 0 ? " − " : " + ";
            var size = Math.Abs(weights[j]) == 1 ? "" : Math.Abs(weights[j]).ToString("G6", CultureInfo.InvariantCulture) + "·";
            text += $"{sign}{size}T({TKernel.NaturalNames[j]})";
        }

        var right = Math.Abs(level) < 1e-9 ? "0" : level.ToString("G6", CultureInfo.InvariantCulture).Replace('-', '−');
        return $"the statistics are tied on the whole support, {text} = {right}, so that their parameters cannot be told apart";
    }

    private static double[] Single(int index, int count)
    {
        var weights = new double[count];
        weights[index] = 1;
        return weights;
    }

    private static double Combine(double[] weights, double[] point)
    {
        var sum = (TwoSum)0;
        for (var j = 0; j < weights.Length; j++)
            sum += (TwoSum)weights[j] * point[j];
        return sum.High;
    }
}
