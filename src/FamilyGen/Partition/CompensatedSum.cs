using System;

namespace FamilyGen.Partition;

/// <summary>A sum of doubles and of products kept as an unevaluated pair high + low, good to about 2⁻¹⁰⁰ of its largest
/// term (Dekker 1971; Ogita, Rump and Oishi 2005).</summary>
internal struct CompensatedSum
{
    private double _high;
    private double _low;

    /// <summary>The sum rounded to a double.</summary>
    public readonly double Value => _high + _low;

    /// <summary>Adds a number.</summary>
    public void Add(double value)
    {
        var sum = _high + value;
        if (double.IsFinite(sum))
        {
            var part = sum - _high;
            _low += (_high - (sum - part)) + (value - part);
        }

        _high = sum;
    }

    /// <summary>Adds a product without rounding it first.</summary>
    public void AddProduct(double a, double b)
    {
        var product = a * b;
        Add(product);
        if (double.IsFinite(product))
            _low += Math.FusedMultiplyAdd(a, b, -product);
    }

    /// <summary>Adds another compensated sum.</summary>
    public void Add(in CompensatedSum other)
    {
        Add(other._high);
        _low += other._low;
    }

    /// <summary>The difference of two sums, rounded once.</summary>
    public static double Difference(in CompensatedSum a, in CompensatedSum b)
    {
        var difference = a;
        difference.Add(-b._high);
        difference._low -= b._low;
        return difference.Value;
    }
}
