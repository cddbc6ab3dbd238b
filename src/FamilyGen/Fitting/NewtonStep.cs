using System;
using System.Collections.Generic;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>Newton's step for the likelihood on a face of the parameter set.</summary>
/// <param name="Centred">The step in the basis of the point it starts from.</param>
/// <param name="Change">The step in θ.</param>
/// <param name="Decrement">The length of the step in the metric of the information, √(gᵀH⁻¹g): how many standard deviations
/// of one unit of weight the mean statistics are off.</param>
internal sealed record NewtonStep(double[] Centred, double[] Change, double Decrement)
{
    /// <summary>The step; null when the information on the face is not positive definite or not finite.</summary>
    public static NewtonStep? TryFrom<TKernel>(ModelPoint<TKernel> point, Face face)
        where TKernel : struct, IKernel
    {
        var directions = Directions(point, face);
        var gradient = Project(directions, point.Gradient);
        if (Cholesky.TryFactor(Project(directions, point.Covariance)) is not { } factor)
            return null;
        var along = factor.Solve(gradient);
        double squared = 0;
        for (var f = 0; f < along.Length; f++)
            squared += along[f] * gradient[f];

        var k = point.Gradient.Length;
        var centred = new double[k];
        for (var j = 0; j < k; j++)
        {
            for (var f = 0; f < along.Length; f++)
                centred[j] += directions[j, f] * along[f];
        }

        var decrement = Math.Sqrt(Math.Max(0, squared));
        return double.IsFinite(decrement) ? new(centred, point.Basis.Step(new double[k], centred), decrement) : null;
    }

    /// <summary>The inverse information of a unit of weight about θ on the face; null as for the step.</summary>
    public static double[,]? Covariance<TKernel>(ModelPoint<TKernel> point, Face face)
        where TKernel : struct, IKernel
    {
        var directions = Directions(point, face);
        if (Cholesky.TryFactor(Project(directions, point.Covariance)) is not { } factor)
            return null;
        var inner = factor.Inverse();
        var (k, free) = (directions.GetLength(0), directions.GetLength(1));
        var covariance = new double[k, k];
        for (var i = 0; i < k; i++)
        {
            for (var j = 0; j < k; j++)
            {
                for (var a = 0; a < free; a++)
                {
                    for (var b = 0; b < free; b++)
                        covariance[i, j] += directions[i, a] * inner[a, b] * directions[j, b];
                }
            }
        }

        return point.Basis.ToNatural(covariance);
    }

    /// <summary>A basis, in ψ, of the directions along the face: one column for each free parameter.</summary>
    private static double[,] Directions<TKernel>(ModelPoint<TKernel> point, Face face)
        where TKernel : struct, IKernel
    {
        var k = point.Gradient.Length;
        var rows = new List<double[]>();
        var pivots = new List<int>();
        foreach (var wall in face.Held)
        {
            var weights = new TwoSum[k];
            for (var j = 0; j < k; j++)
                weights[j] = wall.Weights[j];
            var row = point.Basis.Transform(weights);
            for (var i = 0; i < rows.Count; i++)
                Subtract(row, rows[i], pivots[i]);
            var pivot = Pivot(row, point.Covariance);
            var lead = row[pivot];
            for (var j = 0; j < k; j++)
                row[j] /= lead;
            foreach (var other in rows)
                Subtract(other, row, pivot);
            rows.Add(row);
            pivots.Add(pivot);
        }

        var directions = new double[k, k - rows.Count];
        var column = 0;
        for (var j = 0; j < k; j++)
        {
            if (pivots.Contains(j))
                continue;
            directions[j, column] = 1;
            for (var i = 0; i < rows.Count; i++)
                directions[pivots[i], column] = -rows[i][j];
            column++;
        }

        return directions;
    }

    private static void Subtract(double[] row, double[] other, int pivot)
    {
        var factor = row[pivot];
        if (factor == 0)
            return;
        for (var j = 0; j < row.Length; j++)
            row[j] -= factor * other[j];
        row[pivot] = 0;
    }

    /// <summary>The parameter that a wall determines best: the largest weight in units of the parameters' own precision.</summary>
    private static int Pivot(double[] row, double[,] covariance)
    {
        var (pivot, best) = (0, -1.0);
        for (var j = 0; j < row.Length; j++)
        {
            if (row[j] == 0)
                continue;
            var size = Math.Abs(row[j]) / Math.Sqrt(covariance[j, j]);
            if (!double.IsFinite(size))
                size = 0;
            if (size > best)
                (pivot, best) = (j, size);
        }

        return pivot;
    }

    private static double[] Project(double[,] directions, double[] vector)
    {
        var (k, free) = (directions.GetLength(0), directions.GetLength(1));
        var result = new double[free];
        for (var f = 0; f < free; f++)
        {
            for (var j = 0; j < k; j++)
            {
                if (directions[j, f] != 0)
                    result[f] += directions[j, f] * vector[j];
            }
        }

        return result;
    }

    private static double[,] Project(double[,] directions, double[,] matrix)
    {
        var (k, free) = (directions.GetLength(0), directions.GetLength(1));
        var result = new double[free, free];
        for (var a = 0; a < free; a++)
        {
            for (var b = 0; b < free; b++)
            {
                for (var i = 0; i < k; i++)
                {
                    for (var j = 0; j < k; j++)
                    {
                        if (directions[i, a] != 0 && directions[j, b] != 0)
                            result[a, b] += directions[i, a] * directions[j, b] * matrix[i, j];
                    }
                }
            }
        }

        return result;
    }
}
