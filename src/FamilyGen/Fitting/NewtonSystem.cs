using System;
using System.Collections.Generic;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>A step in the parameters.</summary>
/// <param name="Centred">The step in the basis of the point it starts from.</param>
/// <param name="Change">The step in θ.</param>
/// <param name="Rise">The rate at which the likelihood rises at its start, for the whole step.</param>
internal sealed record Step(double[] Centred, double[] Change, double Rise);

/// <summary>The quadratic model of the likelihood at a point, on a face of the parameter set.</summary>
internal sealed class NewtonSystem<TKernel>
    where TKernel : struct, IKernel
{
    private readonly ModelPoint<TKernel> _point;
    private readonly double[,] _directions;
    private readonly double[] _gradient;
    private readonly Cholesky _factor;
    private readonly double[] _along;

    private NewtonSystem(ModelPoint<TKernel> point, double[,] directions, double[] gradient, Cholesky factor, double[] along, double decrement)
    {
        (_point, _directions, _gradient, _factor, _along) = (point, directions, gradient, factor, along);
        Decrement = decrement;
    }

    /// <summary>The length of Newton's step in the metric of the information, √(gᵀH⁻¹g): how many standard deviations of one
    /// unit of weight the mean statistics are off.</summary>
    public double Decrement { get; }

    /// <summary>The model; null when the information on the face is not positive definite or not finite.</summary>
    public static NewtonSystem<TKernel>? TryAt(ModelPoint<TKernel> point, Face face)
    {
        var directions = Directions(point, face);
        var gradient = Project(directions, point.Gradient);
        if (Cholesky.TryFactor(Project(directions, point.Covariance)) is not { } factor)
            return null;
        var along = factor.Solve(gradient);
        var decrement = Math.Sqrt(Math.Max(0, Dot(along, gradient)));
        return double.IsFinite(decrement) ? new(point, directions, gradient, factor, along, decrement) : null;
    }

    /// <summary>Newton's step, to the top of the model.</summary>
    public Step Full() => Along(_along);

    /// <summary>The step to the top of the model among those that advance by the given amounts towards the walls.</summary>
    public Step? Towards(IReadOnlyList<Wall> walls, IReadOnlyList<double> advances)
    {
        var n = walls.Count;
        var rows = new double[n][];
        var solved = new double[n][];
        var excess = new double[n];
        for (var a = 0; a < n; a++)
        {
            rows[a] = Project(_directions, Transform(walls[a]));
            solved[a] = _factor.Solve(rows[a]);
            excess[a] = Dot(rows[a], _along) - advances[a];
        }

        var products = new double[n, n];
        for (var a = 0; a < n; a++)
        {
            for (var b = 0; b < n; b++)
                products[a, b] = Dot(rows[a], solved[b]);
        }

        if (Cholesky.TryFactor(products) is not { } factor)
            return null;
        var pressures = factor.Solve(excess);
        var along = (double[])_along.Clone();
        for (var a = 0; a < n; a++)
        {
            for (var f = 0; f < along.Length; f++)
                along[f] -= pressures[a] * solved[a][f];
        }

        return Along(along);
    }

    /// <summary>The inverse information of a unit of weight about θ.</summary>
    public double[,] Covariance()
    {
        var inner = _factor.Inverse();
        var (k, free) = (_directions.GetLength(0), _directions.GetLength(1));
        var covariance = new double[k, k];
        for (var i = 0; i < k; i++)
        {
            for (var j = 0; j < k; j++)
            {
                for (var a = 0; a < free; a++)
                {
                    for (var b = 0; b < free; b++)
                        covariance[i, j] += _directions[i, a] * inner[a, b] * _directions[j, b];
                }
            }
        }

        return _point.Basis.ToNatural(covariance);
    }

    private Step Along(double[] along)
    {
        var k = _point.Gradient.Length;
        var centred = new double[k];
        for (var j = 0; j < k; j++)
        {
            for (var f = 0; f < along.Length; f++)
                centred[j] += _directions[j, f] * along[f];
        }

        return new(centred, _point.Basis.Step(new double[k], centred), Dot(along, _gradient));
    }

    private double[] Transform(Wall wall) => Transform(_point, wall);

    private static double[] Transform(ModelPoint<TKernel> point, Wall wall)
    {
        var weights = new TwoSum[point.Gradient.Length];
        for (var j = 0; j < weights.Length; j++)
            weights[j] = wall.Weights[j];
        return point.Basis.Transform(weights);
    }

    private static double Dot(double[] a, double[] b)
    {
        double sum = 0;
        for (var i = 0; i < a.Length; i++)
            sum += a[i] * b[i];
        return sum;
    }

    /// <summary>A basis, in ψ, of the directions along the face: one column for each free parameter.</summary>
    private static double[,] Directions(ModelPoint<TKernel> point, Face face)
    {
        var k = point.Gradient.Length;
        var rows = new List<double[]>();
        var pivots = new List<int>();
        foreach (var wall in face.Held)
        {
            var row = Transform(point, wall);
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
