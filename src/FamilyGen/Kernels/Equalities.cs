using System;
using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Kernels;

/// <summary>Linear equations Σ weightⱼθⱼ + offset = 0 that hold together, in echelon form.</summary>
internal sealed class Equalities
{
    // what elimination may leave of a weight that cancels
    private const double Negligible = 1e-12;

    private readonly List<(double[] Row, int Pivot)> _rows = [];

    /// <summary>Takes one more equation. When the earlier ones already fix the left side, it is left out and the value
    /// that they give it is returned.</summary>
    public double? Add(ReadOnlySpan<double> weights, double offset)
    {
        if (!weights.ContainsAnyExcept(0))
            return offset;
        double[] row = [.. weights, offset];
        var size = row.Max(Math.Abs);
        foreach (var (known, pivot) in _rows)
        {
            var factor = row[pivot] / known[pivot];
            for (var j = 0; j < row.Length; j++)
                row[j] -= factor * known[j];
        }

        var largest = Enumerable.Range(0, weights.Length).MaxBy(j => Math.Abs(row[j]));
        if (Math.Abs(row[largest]) <= Negligible * size)
            return Math.Abs(row[^1]) <= Negligible * size ? 0 : row[^1];
        _rows.Add((row, largest));
        return null;
    }
}
