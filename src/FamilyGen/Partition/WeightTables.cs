using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Kernels;

namespace FamilyGen.Partition;

/// <summary>The panels of all basins of a distribution, as parts of the whole probability.</summary>
internal sealed class WeightTables<TKernel>
    where TKernel : struct, IKernel
{
    private readonly PanelTable<TKernel>[] _tables;
    private readonly double[] _unit;

    public WeightTables(TKernel kernel, double[] theta)
    {
        var tables = new List<PanelTable<TKernel>>();
        Partition = RangePartition<TKernel>.Over(kernel, theta, SubRange.Whole, MomentPlan.None, _ =>
        {
            tables.Add(new PanelTable<TKernel>());
            return tables[^1];
        });
        _tables = [.. tables];
        _unit = new double[_tables.Length];
        for (var i = 0; i < _tables.Length; i++)
        {
            _tables[i].Complete(Partition.Parts[i]);
            _unit[i] = Partition.Shares[i] / Partition.Parts[i].Scale;
        }

        // residue classes of a lattice lie side by side, everything else follows one another
        IsOrdered = _tables.All(table => table.Part.Basin.Piece.Step <= 1);
        if (IsOrdered)
            Order = [.. Enumerable.Range(0, _tables.Length).OrderBy(i => _tables[i].Part.Basin.Lower).ThenBy(i => _tables[i].Part.Basin.Upper)];
    }

    public RangePartition<TKernel> Partition { get; }

    /// <summary>The panels, basin by basin.</summary>
    public ReadOnlySpan<PanelTable<TKernel>> Tables => _tables;

    /// <summary>The probability of a unit of weight in each basin.</summary>
    public ReadOnlySpan<double> Unit => _unit;

    /// <summary>Whether the basins follow one another, in <see cref="Order"/>.</summary>
    public bool IsOrdered { get; }

    /// <summary>The basins from the lowest up.</summary>
    public int[] Order { get; } = [];

    /// <summary>P(X ≤ x), to about 1e−16.</summary>
    public double UpTo(double x)
    {
        var sum = 0.0;
        for (var i = 0; i < _tables.Length; i++)
            sum += _unit[i] * _tables[i].WeightUpTo(x);
        return Math.Min(1, sum);
    }

    /// <summary>P(X > x), to about 1e−16.</summary>
    public double Above(double x)
    {
        var sum = 0.0;
        for (var i = 0; i < _tables.Length; i++)
            sum += _unit[i] * _tables[i].WeightAbove(x);
        return Math.Min(1, sum);
    }
}
