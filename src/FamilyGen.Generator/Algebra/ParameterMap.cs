using System;
using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>The generic rank of the map from trade parameters to natural ones, found at a few points: the derivative is
/// analytic, so that the rank at a point drawn without design is the generic one.</summary>
internal static class ParameterMap
{
    private const int Attempts = 12;

    /// <summary>The rank, and the parameters that a change of which leaves θ as it is (empty at full rank); null when the map
    /// could not be evaluated anywhere.</summary>
    public static (int Rank, IReadOnlyList<string> Free)? Rank(IReadOnlyList<Expression> naturals, IReadOnlyList<string> parameters, Scope scope)
    {
        var jacobian = naturals
            .Select(n => parameters.Select(p => Derivative.Of(n, s => s.Kind == SymbolKind.Parameter && s.Name == p)).ToList())
            .ToList();
        if (jacobian.Any(row => row.Any(d => d is null)))
            return null;
        (int Rank, IReadOnlyList<string> Free)? best = null;
        var draws = new Draws(naturals.Count + (31 * parameters.Count));
        for (var attempt = 0; attempt < Attempts; attempt++)
        {
            var at = draws.Point(attempt);
            var matrix = new double[naturals.Count, parameters.Count];
            var finite = true;
            for (var i = 0; i < naturals.Count; i++)
            {
                for (var j = 0; j < parameters.Count; j++)
                {
                    matrix[i, j] = Evaluator.Evaluate(jacobian[i][j]!, s => at(s, scope));
                    finite &= !double.IsNaN(matrix[i, j]) && !double.IsInfinity(matrix[i, j]);
                }
            }

            if (!finite)
                continue;
            var (rank, free) = Eliminate(matrix, parameters);
            if (best is null || rank > best.Value.Rank)
                best = (rank, free);
            if (rank == Math.Min(naturals.Count, parameters.Count))
                break;
        }

        return best;
    }

    // Gauss–Jordan with full pivoting on rows scaled to unit size. A null vector through a column without a pivot names the
    // columns that it moves.
    private static (int Rank, IReadOnlyList<string> Free) Eliminate(double[,] matrix, IReadOnlyList<string> parameters)
    {
        var (rows, columns) = (matrix.GetLength(0), matrix.GetLength(1));
        for (var i = 0; i < rows; i++)
        {
            var size = Enumerable.Range(0, columns).Max(j => Math.Abs(matrix[i, j]));
            for (var j = 0; size > 0 && j < columns; j++)
                matrix[i, j] /= size;
        }

        var pivotOf = Enumerable.Repeat(-1, columns).ToArray();
        var rank = 0;
        while (rank < rows)
        {
            var (row, column, largest) = (-1, -1, 1e-9);
            for (var i = rank; i < rows; i++)
            {
                for (var j = 0; j < columns; j++)
                {
                    if (pivotOf[j] < 0 && Math.Abs(matrix[i, j]) > largest)
                        (row, column, largest) = (i, j, Math.Abs(matrix[i, j]));
                }
            }

            if (row < 0)
                break;
            for (var j = 0; j < columns; j++)
                (matrix[rank, j], matrix[row, j]) = (matrix[row, j], matrix[rank, j]);
            for (var i = 0; i < rows; i++)
            {
                if (i == rank)
                    continue;
                var multiple = matrix[i, column] / matrix[rank, column];
                for (var j = 0; j < columns; j++)
                    matrix[i, j] -= multiple * matrix[rank, j];
            }

            pivotOf[column] = rank++;
        }

        var open = Enumerable.Range(0, columns).Where(j => pivotOf[j] < 0).ToList();
        var free = Enumerable.Range(0, columns)
            .Where(j => pivotOf[j] < 0 || open.Any(o => Math.Abs(matrix[pivotOf[j], o] / matrix[pivotOf[j], j]) > 1e-7))
            .Select(j => parameters[j])
            .ToList();
        return (rank, free);
    }

    // Reproducible points without design: fractional parts of multiples of irrational numbers.
    private sealed class Draws(int seed)
    {
        private readonly Dictionary<string, double> _values = new(StringComparer.Ordinal);
        private int _next = seed;

        public Func<Symbol, Scope, double> Point(int attempt)
        {
            _values.Clear();
            return (symbol, scope) =>
            {
                if (_values.TryGetValue(symbol.Name, out var value))
                    return value;
                var unit = Unit();
                var range = scope.RangeOf(symbol);
                value = (attempt % 4) switch
                {
                    0 => 0.6 + (2.3 * unit),
                    1 => 0.1 + (0.8 * unit),
                    2 when !range.IsPositive => -2.5 + (5 * unit),
                    _ => 1 + (9 * unit),
                };
                if (symbol.IsInteger)
                    value = Math.Ceiling(4 * Math.Abs(value));
                return _values[symbol.Name] = value;
            };
        }

        private double Unit()
        {
            var value = ++_next * 0.6180339887498949;
            value = (value * 7.41421356237) + Math.Sin(_next);
            return value - Math.Floor(value);
        }
    }
}
