using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>The part of the natural parameter set on which some of its walls hold with equality: the whole set when none
/// does.</summary>
internal sealed class Face
{
    private readonly NaturalSet _set;
    private readonly int _count;
    private readonly List<(double[] Weights, double Value, int Pivot)> _rows = [];

    private Face(NaturalSet set, int count, IEnumerable<Wall> held)
    {
        (_set, _count) = (set, count);
        Held = [.. held];
        foreach (var wall in Held)
            Eliminate(wall);
        Limits = FindLimits();
    }

    /// <summary>The walls that hold with equality.</summary>
    public IReadOnlyList<Wall> Held { get; }

    /// <summary>The walls that limit the face itself; null when no point of the face belongs to the set.</summary>
    public IReadOnlyList<Wall>? Limits { get; }

    /// <summary>The number of parameters left free.</summary>
    public int Dimension => _count - _rows.Count;

    /// <summary>The whole set.</summary>
    public static Face Whole(NaturalSet set, int count) => new(set, count, []);

    /// <summary>The part of this face on which one more wall holds with equality.</summary>
    public Face With(Wall wall) => new(_set, _count, Held.Append(wall));

    /// <summary>Whether the wall can be held: a refinement of a wall cannot, since near the face it is no limit of the set.</summary>
    public bool CanHold(Wall wall) => wall.Membership != WallMembership.Excluded && !Held.Contains(wall) && _set.Walls().Contains(wall);

    /// <summary>Puts a point back on the face, exactly, by the parameters that the walls determine.</summary>
    public void Restore(Span<double> theta)
    {
        foreach (var (weights, value, pivot) in _rows)
        {
            TwoSum rest = value;
            for (var j = 0; j < _count; j++)
            {
                if (j != pivot && weights[j] != 0)
                    rest -= (TwoSum)weights[j] * theta[j];
            }

            theta[pivot] = rest.High + 0.0;
        }
    }

    /// <summary>Which parameters are determined by the walls alone, whatever the others are.</summary>
    public bool IsFixed(int parameter)
    {
        foreach (var (weights, _, pivot) in _rows)
        {
            if (pivot == parameter)
                return !Enumerable.Range(0, _count).Any(j => j != pivot && weights[j] != 0);
        }

        return false;
    }

    /// <summary>A point of the face that is inside all its limits by a margin, near <paramref name="theta"/>; null when none
    /// was found. Relaxation (Agmon 1954) in units in which a change of 1 matters.</summary>
    public double[]? InteriorPoint(ReadOnlySpan<double> theta, ReadOnlySpan<double> unit)
    {
        if (Limits is null)
            return null;
        for (var margin = 1.0; margin > 1e-9; margin /= 8)
        {
            var point = theta.ToArray();
            Restore(point);
            for (var step = 0; step < 200; step++)
            {
                if (MoveInside(point, unit, margin))
                    return _set.Contains(point) ? point : null;
            }
        }

        return null;
    }

    private bool MoveInside(double[] point, ReadOnlySpan<double> unit, double margin)
    {
        Wall? worst = null;
        double[]? normal = null;
        double excess = 0;
        foreach (var wall in Limits!)
        {
            var along = Along(wall, unit);
            var length = Math.Sqrt(along.Sum(w => w * w));
            var depth = (wall.Value(point) / length) + margin;
            if (!(depth > margin * 1e-6) || depth <= excess)
                continue;
            (worst, normal, excess) = (wall, along, depth);
            for (var j = 0; j < _count; j++)
                normal[j] /= length;
        }

        if (worst is null)
            return true;
        for (var j = 0; j < _count; j++)
            point[j] -= 1.2 * excess * normal![j] * unit[j];
        Restore(point);
        return false;
    }

    /// <summary>The weights of a wall in the free parameters, in the given units.</summary>
    private double[] Along(Wall wall, ReadOnlySpan<double> unit)
    {
        var weights = Reduce(wall).Weights;
        for (var j = 0; j < _count; j++)
            weights[j] *= unit[j];
        return weights;
    }

    private void Eliminate(Wall wall)
    {
        var (weights, value) = Reduce(wall);
        var pivot = 0;
        for (var j = 1; j < _count; j++)
        {
            if (Math.Abs(weights[j]) > Math.Abs(weights[pivot]))
                pivot = j;
        }

        var lead = weights[pivot];
        for (var j = 0; j < _count; j++)
            weights[j] /= lead;
        value /= lead;
        for (var i = 0; i < _rows.Count; i++)
        {
            var (other, otherValue, otherPivot) = _rows[i];
            var factor = other[pivot];
            if (factor == 0)
                continue;
            for (var j = 0; j < _count; j++)
                other[j] -= factor * weights[j];
            other[pivot] = 0;
            _rows[i] = (other, otherValue - (factor * value), otherPivot);
        }

        _rows.Add((weights, value, pivot));
    }

    /// <summary>The wall's equation weights·θ = value with the determined parameters eliminated.</summary>
    private (double[] Weights, double Value) Reduce(Wall wall)
    {
        var weights = new double[_count];
        for (var j = 0; j < wall.Weights.Length; j++)
            weights[j] = wall.Weights[j];
        var value = wall.Bound - wall.Constant;
        var size = weights.Max(Math.Abs);
        foreach (var (row, rowValue, pivot) in _rows)
        {
            var factor = weights[pivot];
            if (factor == 0)
                continue;
            for (var j = 0; j < _count; j++)
                weights[j] -= factor * row[j];
            weights[pivot] = 0;
            value -= factor * rowValue;
        }

        for (var j = 0; j < _count; j++)
        {
            if (Math.Abs(weights[j]) < 1e-14 * size)
                weights[j] = 0;
        }

        return (weights, value);
    }

    private List<Wall>? FindLimits()
    {
        var limits = new List<Wall>();
        foreach (var outer in _set.Walls())
        {
            for (var wall = outer; wall is not null; wall = wall.Refinement)
            {
                var (weights, value) = Reduce(wall);
                if (weights.Any(w => w != 0))
                {
                    limits.Add(wall);
                    break;
                }

                // On the face the left side is a constant: 0 < value holds, fails, or leaves it to the next rank.
                if (value > 0)
                    break;
                if (value < 0 || wall.Membership == WallMembership.Excluded)
                    return null;
                if (wall.Membership == WallMembership.Included)
                    break;
            }
        }

        return limits;
    }
}
