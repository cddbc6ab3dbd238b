using System;

namespace FamilyGen.Fitting;

/// <summary>A sum of doubles, and of products of two doubles, without any rounding: the same terms give the same bits in
/// whatever order and in however many parts they are added.</summary>
/// <remarks>A fixed-point number in 64-bit limbs that carry 32 bits each, so that a thousand terms can be added before
/// carries are moved (Kulisch and Miranker 1986; in this form Neal 2015). Only the limbs that the data reach are kept.</remarks>
internal sealed class ExactSum
{
    // Bit 0 of limb 0 stands for 2^-Bias: below the last bit of any product of two doubles.
    private const int Bias = 68 * 32;
    private const int LimbBits = 32;
    private const long LimbMask = (1L << LimbBits) - 1;

    // Each addition changes a limb by less than 2^53 in magnitude; this many, upon a carried limb, stay below 2^63.
    private const int AdditionsBetweenCarries = 1000;

    // At first the limbs of the numbers from 2^-64 to 2^64, so that most sums never grow.
    private long[] _limbs = new long[5];
    private int _first = (Bias / LimbBits) - 2;
    private int _additions;

    /// <summary>Adds a finite number.</summary>
    public void Add(double value)
    {
        Split(value, out var significand, out var bit);
        var limbs = _limbs;
        var index = (bit >> 5) - _first;
        if ((uint)index >= (uint)(limbs.Length - 1))
        {
            if (significand == 0)
                return;
            index = Reach(bit >> 5, 2);
            limbs = _limbs;
        }

        var shift = bit & (LimbBits - 1);
        limbs[index] += (significand << shift) & LimbMask;
        limbs[index + 1] += significand >> (LimbBits - shift);
        if (++_additions >= AdditionsBetweenCarries)
            Carry();
    }

    /// <summary>Adds the product of two finite numbers, all of its 106 bits.</summary>
    public void AddProduct(double a, double b)
    {
        if (a == 0 || b == 0)
            return;
        Split(a, out var significandA, out var bitA);
        Split(b, out var significandB, out var bitB);
        var product = (Int128)significandA * significandB;
        var bit = bitA + bitB - Bias;
        var shift = bit & (LimbBits - 1);
        var index = Reach(bit >> 5, 4);
        _limbs[index] += (long)(product << shift) & LimbMask;
        product >>= LimbBits - shift;
        _limbs[index + 1] += (long)product & LimbMask;
        product >>= LimbBits;
        _limbs[index + 2] += (long)product & LimbMask;
        _limbs[index + 3] += (long)(product >> LimbBits);
        if (++_additions >= AdditionsBetweenCarries)
            Carry();
    }

    /// <summary>Adds another sum; <paramref name="other"/> is only read.</summary>
    public void Add(ExactSum other)
    {
        var carried = other.Copy();
        carried.Carry();
        var index = Reach(carried._first, carried._limbs.Length);
        for (var i = 0; i < carried._limbs.Length; i++)
            _limbs[index + i] += carried._limbs[i];
        if (++_additions >= AdditionsBetweenCarries)
            Carry();
    }

    /// <summary>The sum rounded once to the nearest double, ties to even; infinite when it is beyond the largest double.</summary>
    public double Round()
    {
        var magnitude = Copy();
        var negative = magnitude.CarryToMagnitude();
        var limbs = magnitude._limbs;
        var top = limbs.Length - 1;
        while (top >= 0 && limbs[top] == 0)
            top--;
        if (top < 0)
            return 0;

        // The leading 96 bits decide the significand; of the rest it matters only whether it is zero.
        UInt128 leading = 0;
        for (var i = 0; i < 3; i++)
            leading = (leading << LimbBits) | (UInt128)(top - i >= 0 ? (ulong)limbs[top - i] : 0);
        var rest = false;
        for (var i = top - 3; i >= 0 && !rest; i--)
            rest = limbs[i] != 0;

        var exponent = ((magnitude._first + top - 2) * LimbBits) - Bias;
        var length = 128 - (int)UInt128.LeadingZeroCount(leading);
        var dropped = Math.Max(length - 53, -1074 - exponent);
        if (dropped > length + 1)
            return negative ? -0.0 : 0;
        if (dropped > 0)
        {
            var half = UInt128.One << (dropped - 1);
            var below = leading & ((half << 1) - 1);
            leading >>= dropped;
            if (below > half || (below == half && (rest || !UInt128.IsEvenInteger(leading))))
                leading++;
            exponent += dropped;
        }

        var value = Math.ScaleB((double)(ulong)leading, exponent);
        return negative ? -value : value;
    }

    /// <summary>The sum as an unevaluated pair High + Low, each rounded once: about 107 bits.</summary>
    public (double High, double Low) RoundToPair()
    {
        var high = Round();
        if (!double.IsFinite(high))
            return (high, 0);
        var rest = Copy();
        rest.Add(-high);
        return (high, rest.Round());
    }

    private static void Split(double value, out long significand, out int bit)
    {
        var bits = BitConverter.DoubleToInt64Bits(value);
        var exponent = (int)(bits >> 52) & 0x7FF;
        significand = bits & 0xF_FFFF_FFFF_FFFF;
        if (exponent == 0)
            exponent = 1;
        else
            significand |= 1L << 52;
        var sign = bits >> 63;
        significand = (significand ^ sign) - sign;
        bit = exponent - 1075 + Bias;
    }

    private ExactSum Copy() => new() { _limbs = (long[])_limbs.Clone(), _first = _first, _additions = _additions };

    /// <summary>The index of a limb in the array, which is made to hold it and those above it.</summary>
    private int Reach(int limb, int count)
    {
        var index = limb - _first;
        if (index >= 0 && index + count <= _limbs.Length)
            return index;
        Widen(limb, count);
        return limb - _first;
    }

    private void Widen(int limb, int count)
    {
        var first = Math.Min(_first, limb);
        var end = Math.Max(_first + _limbs.Length, limb + count);
        var wider = new long[end - first];
        _limbs.CopyTo(wider, _first - first);
        _limbs = wider;
        _first = first;
    }

    /// <summary>Brings every limb but the highest into [0, 2^32); the highest carries the sign and stays below 2^32.</summary>
    private void Carry()
    {
        _additions = 0;
        long carry = 0;
        for (var i = 0; i < _limbs.Length - 1; i++)
        {
            var limb = _limbs[i] + carry;
            carry = limb >> LimbBits;
            _limbs[i] = limb & LimbMask;
        }

        _limbs[^1] += carry;
        if (_limbs[^1] > LimbMask || _limbs[^1] < -LimbMask)
        {
            Widen(_first + _limbs.Length, 1);
            _limbs[^1] = _limbs[^2] >> LimbBits;
            _limbs[^2] &= LimbMask;
        }
    }

    /// <summary>Carries, and replaces the sum by its magnitude.</summary>
    /// <returns>Whether the sum is negative.</returns>
    private bool CarryToMagnitude()
    {
        Carry();
        if (_limbs[^1] >= 0)
            return false;
        for (var i = 0; i < _limbs.Length; i++)
            _limbs[i] = -_limbs[i];
        Carry();
        return true;
    }
}
