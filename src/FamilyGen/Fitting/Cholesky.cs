using System;

namespace FamilyGen.Fitting;

/// <summary>The triangular factor of a small symmetric positive definite matrix, scaled to unit diagonal first, so that
/// parameters in different units do not disturb one another.</summary>
internal sealed class Cholesky
{
    private readonly double[,] _factor;
    private readonly double[] _scale;

    private Cholesky(double[,] factor, double[] scale) => (_factor, _scale) = (factor, scale);

    /// <summary>Factors a matrix; null when it is not positive definite to working precision, or not finite.</summary>
    public static Cholesky? TryFactor(double[,] matrix)
    {
        const double Smallest = 1e-14;
        var n = matrix.GetLength(0);
        var scale = new double[n];
        for (var i = 0; i < n; i++)
        {
            if (!(matrix[i, i] > 0) || !double.IsFinite(matrix[i, i]))
                return null;
            scale[i] = 1 / Math.Sqrt(matrix[i, i]);
        }

        var factor = new double[n, n];
        for (var i = 0; i < n; i++)
        {
            for (var j = 0; j <= i; j++)
            {
                var rest = i == j ? 1 : matrix[i, j] * scale[i] * scale[j];
                for (var l = 0; l < j; l++)
                    rest -= factor[i, l] * factor[j, l];
                if (i == j)
                {
                    if (!(rest > Smallest))
                        return null;
                    factor[i, i] = Math.Sqrt(rest);
                }
                else
                {
                    factor[i, j] = rest / factor[j, j];
                }
            }
        }

        return new(factor, scale);
    }

    /// <summary>The solution of matrix · x = right side.</summary>
    public double[] Solve(ReadOnlySpan<double> rightSide)
    {
        var n = _scale.Length;
        var x = new double[n];
        for (var i = 0; i < n; i++)
        {
            var rest = rightSide[i] * _scale[i];
            for (var l = 0; l < i; l++)
                rest -= _factor[i, l] * x[l];
            x[i] = rest / _factor[i, i];
        }

        for (var i = n - 1; i >= 0; i--)
        {
            for (var l = i + 1; l < n; l++)
                x[i] -= _factor[l, i] * x[l];
            x[i] /= _factor[i, i];
        }

        for (var i = 0; i < n; i++)
            x[i] *= _scale[i];
        return x;
    }

    /// <summary>The inverse matrix.</summary>
    public double[,] Inverse()
    {
        var n = _scale.Length;
        var inverse = new double[n, n];
        var unit = new double[n];
        for (var j = 0; j < n; j++)
        {
            Array.Clear(unit);
            unit[j] = 1;
            var column = Solve(unit);
            for (var i = 0; i < n; i++)
                inverse[i, j] = column[i];
        }

        return inverse;
    }
}
