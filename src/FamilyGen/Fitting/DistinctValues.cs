using System;

namespace FamilyGen.Fitting;

/// <summary>The different values among the observations as long as they are few: enough to tell data that cannot determine
/// the parameters from data that can. The content depends on the set of values alone, not on their order.</summary>
internal sealed class DistinctValues(int limit)
{
    private readonly double[] _sorted = new double[limit];
    private int _count;

    /// <summary>Whether there were more than the limit; the values themselves are then no longer kept.</summary>
    public bool AreMany { get; private set; }

    /// <summary>The values in ascending order; empty when they are many.</summary>
    public ReadOnlySpan<double> Values => AreMany ? [] : _sorted.AsSpan(0, _count);

    /// <summary>Notes a value.</summary>
    public void Add(double x)
    {
        if (AreMany)
            return;
        x += 0.0; // −0 and 0 are one value
        var index = _sorted.AsSpan(0, _count).BinarySearch(x);
        if (index >= 0)
            return;
        if (_count == limit)
        {
            AreMany = true;
            return;
        }

        index = ~index;
        _sorted.AsSpan(index, _count - index).CopyTo(_sorted.AsSpan(index + 1));
        _sorted[index] = x;
        _count++;
    }

    /// <summary>Notes all values of another set.</summary>
    public void Add(DistinctValues other)
    {
        AreMany |= other.AreMany;
        foreach (var x in other.Values)
            Add(x);
    }
}
