using System;
using System.Collections.Generic;
using FamilyGen.Kernels;

namespace FamilyGen.Partition;

/// <summary>Looks for modes by heights alone, where the slope is unknown because a function could not be read: a grid over
/// all scales, from 1e−300 to 1e300 on a half-line, and a golden-section search (Kiefer 1953) about each of its peaks. A
/// spike between grid points that its surroundings do not announce stays unseen.</summary>
internal readonly ref struct HeightScan<TKernel>
    where TKernel : struct, IKernel
{
    private const double LogStep = 0.5;
    private const int UniformSteps = 1024;
    private const int ConsecutiveTerms = 512;
    private const double GoldenShare = 0.3819660112501051;

    private readonly SlopeField<TKernel> _field;
    private readonly Chart _chart;

    public HeightScan(SlopeField<TKernel> field, Chart chart)
    {
        _field = field;
        _chart = chart;
    }

    /// <summary>Adds the basins about all peaks of the grid; on a lattice one basin about the highest.</summary>
    public void Find(Piece piece, double from, double to, List<Basin> basins)
    {
        var grid = Grid(piece, from, to);
        var height = new double[grid.Count];
        for (var i = 0; i < height.Length; i++)
            height[i] = _field.Height(grid[i]);
        if (_chart.IsLattice)
        {
            AddHighest(piece, grid, height, basins);
            return;
        }

        var lower = piece.Lower;
        var valley = -1;
        for (var i = 0; i < height.Length; i++)
        {
            if (valley >= 0 && height[i] < height[valley])
                valley = i;
            if (double.IsNegativeInfinity(height[i]) || (i > 0 && height[i] <= height[i - 1]) || (i + 1 < height.Length && height[i] < height[i + 1]))
                continue;
            if (valley >= 0)
            {
                var end = _chart.ReferenceNear(grid[valley]).X;
                basins[^1] = basins[^1] with { Upper = end };
                lower = end;
            }

            var mode = Peak(grid[Math.Max(0, i - 1)], grid[Math.Min(height.Length - 1, i + 1)]);
            basins.Add(new(piece, _chart.ReferenceNear(mode), lower, piece.Upper, false));
            valley = i;
        }
    }

    private void AddHighest(Piece piece, List<double> grid, double[] height, List<Basin> basins)
    {
        var best = 0;
        for (var i = 1; i < height.Length; i++)
        {
            if (height[i] > height[best])
                best = i;
        }

        if (double.IsNegativeInfinity(height[best]))
            return;
        var (low, high) = (grid[Math.Max(0, best - 1)], grid[Math.Min(height.Length - 1, best + 1)]);
        while (high - low > 2 * piece.Step)
        {
            // thirds, rounded to the lattice
            var third = Math.Max(piece.Step, Math.Floor((high - low) / 3 / piece.Step) * piece.Step);
            if (_field.Height(low + third) < _field.Height(high - third))
                low += third;
            else
                high -= third;
        }

        var mode = low;
        for (var x = low; x <= high; x += piece.Step)
        {
            if (_field.Height(x) > _field.Height(mode))
                mode = x;
        }

        basins.Add(new(piece, _chart.Reference(mode), piece.Lower, piece.Upper, false));
    }

    private double Peak(double low, double high)
    {
        var (a, b) = (low + GoldenShare * (high - low), high - GoldenShare * (high - low));
        var (atA, atB) = (_field.Height(a), _field.Height(b));
        for (var step = 0; step < 80 && b > a; step++)
        {
            if (atA >= atB)
            {
                (high, b, atB) = (b, a, atA);
                a = low + GoldenShare * (high - low);
                atA = _field.Height(a);
            }
            else
            {
                (low, a, atA) = (a, b, atB);
                b = high - GoldenShare * (high - low);
                atB = _field.Height(b);
            }
        }

        return atA >= atB ? a : b;
    }

    private List<double> Grid(Piece piece, double from, double to)
    {
        var grid = new List<double>();
        if (_chart.IsLattice)
        {
            AddLattice(piece, grid);
        }
        else if (_chart.Kind != Coordinate.Identity)
        {
            var steps = Math.Max(UniformSteps / 2, (int)((to - from) / LogStep));
            for (var i = 0; i <= steps; i++)
                grid.Add(i == steps ? to : from + (to - from) * i / steps);
        }
        else if (to - from < 1e300 && double.IsFinite(piece.Lower) && double.IsFinite(piece.Upper))
        {
            for (var i = 1; i < UniformSteps; i++)
                grid.Add(from + (to - from) * i / UniformSteps);
        }
        else
        {
            for (var exponent = 1000.0; exponent >= -1000; exponent -= LogStep)
                AddInside(-Math.Pow(2, exponent), from, to, grid);
            AddInside(0, from, to, grid);
            for (var exponent = -1000.0; exponent <= 1000; exponent += LogStep)
                AddInside(Math.Pow(2, exponent), from, to, grid);
        }

        return grid;
    }

    private static void AddInside(double x, double from, double to, List<double> grid)
    {
        if (x > from && x < to)
            grid.Add(x);
    }

    // Every term near the finite end, or near zero, and then terms ever farther apart.
    private static void AddLattice(Piece piece, List<double> grid)
    {
        var (down, up) = (double.IsInfinity(piece.Lower), double.IsInfinity(piece.Upper));
        var start = !down ? piece.Lower : !up ? piece.Upper : piece.Integer;
        var members = new List<double>();
        for (double i = 0, stride = 1; i < 9e18; i += stride)
        {
            members.Add(i);
            if (members.Count > ConsecutiveTerms)
                stride = Math.Floor(stride * 1.02) + 1;
        }

        for (var i = members.Count - 1; down && i > 0; i--)
            grid.Add(start - members[i] * piece.Step);
        for (var i = 0; i < members.Count; i++)
        {
            var x = start + members[i] * piece.Step;
            if (x > piece.Upper || (down && !up && i > 0))
                break;
            grid.Add(x);
        }

        if (grid[^1] < piece.Upper && !up)
            grid.Add(piece.Upper);
    }
}
