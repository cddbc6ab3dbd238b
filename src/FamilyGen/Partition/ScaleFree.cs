using System;
using FamilyGen.Kernels;

namespace FamilyGen.Partition;

/// <summary>Guaranteed ranges of functions of y, the distance to an end of the support, kept as powers yᵖ·factor or as
/// offset + slope·y for as long as they have that form: so that y·(θ/y) is θ, over however wide a range of y.</summary>
/// <remarks>A derivative on a logarithmic scale, y·f′, is a sum of such terms; in plain interval arithmetic y and 1/y
/// would be bounded as if they varied apart from each other, and a mode could be excluded only on very short
/// ranges.</remarks>
internal readonly struct ScaleFree : IArithmetic<ScaleFree>
{
    // A number is offset + factor·y (power 1) or factor·y^power (offset 0). Constants have power 0 and may have no y.
    private readonly double _power;
    private readonly double _offset;
    private readonly Bounds _factor;
    private readonly Bounds _y;
    private readonly bool _hasY;

    private ScaleFree(Bounds factor, double power, double offset, Bounds y, bool hasY) =>
        (_factor, _power, _offset, _y, _hasY) = (factor, power, offset, y, hasY);

    /// <summary>offset + slope·y for y in a range.</summary>
    public static ScaleFree Affine(double offset, double slope, Bounds y) => new(slope, 1, offset, y, true);

    /// <summary>The range of values.</summary>
    public Bounds Range => _offset != 0 ? _offset + _factor * _y
        : _power == 0 ? _factor
        : _factor * Bounds.Pow(_y, _power);

    /// <summary>The range of values of y times the number; y is given again for a number that is free of it.</summary>
    public Bounds RangeTimes(Bounds y) => _offset != 0 ? (_offset + _factor * y) * y
        : _power == -1 ? _factor
        : _factor * Bounds.Pow(y, _power + 1);

    private bool IsConstant => _power == 0 && _factor.Lower == _factor.Upper;

    private bool IsAffine => _power == 1 && _factor.Lower == _factor.Upper;

    public static ScaleFree Unknown => new(Bounds.Unknown, 0, 0, default, false);

    public static implicit operator ScaleFree(double value) => new(value, 0, 0, default, false);

    public static ScaleFree operator +(ScaleFree a, ScaleFree b)
    {
        var (y, hasY) = Common(a, b);
        if (a._offset == 0 && b._offset == 0 && a._power == b._power)
            return new(a._factor + b._factor, a._power, 0, y, hasY);
        if (a.IsConstant && b.IsAffine)
            return new(b._factor, 1, b._offset + a._factor.Lower, y, hasY);
        if (b.IsConstant && a.IsAffine)
            return new(a._factor, 1, a._offset + b._factor.Lower, y, hasY);
        if (a.IsAffine && b.IsAffine)
        {
            var slope = a._factor.Lower + b._factor.Lower;
            return slope == 0 ? (ScaleFree)(a._offset + b._offset) : new(slope, 1, a._offset + b._offset, y, hasY);
        }

        if (IsZero(a))
            return b;
        if (IsZero(b))
            return a;
        // one over y is the form in which the product with y is free of it
        return new(a.RangeTimes(y) + b.RangeTimes(y), -1, 0, y, hasY);
    }

    public static ScaleFree operator -(ScaleFree a, ScaleFree b) => a + -b;

    public static ScaleFree operator -(ScaleFree a) => new(-a._factor, a._power, -a._offset, a._y, a._hasY);

    public static ScaleFree operator *(ScaleFree a, ScaleFree b)
    {
        var (y, hasY) = Common(a, b);
        if (a.IsConstant && b.IsAffine)
            return Scaled(b, a._factor.Lower, y);
        if (b.IsConstant && a.IsAffine)
            return Scaled(a, b._factor.Lower, y);
        var (p, q) = (a.AsPower(), b.AsPower());
        return new(p._factor * q._factor, p._power + q._power, 0, y, hasY);
    }

    public static ScaleFree operator /(ScaleFree a, ScaleFree b)
    {
        var (y, hasY) = Common(a, b);
        var (p, q) = (a.AsPower(), b.AsPower());
        return new(p._factor / q._factor, p._power - q._power, 0, y, hasY);
    }

    public static ScaleFree Exp(ScaleFree a) => a.With(Bounds.Exp(a.Range));

    public static ScaleFree Log(ScaleFree a)
    {
        if (a._power == 0 || a._offset != 0)
            return a.With(Bounds.Log(a.Range));
        return a.With(Bounds.Log(a._factor) + a._power * Bounds.Log(a._y));
    }

    public static ScaleFree Pow(ScaleFree a, double b)
    {
        var p = a.AsPower();
        return new(Bounds.Pow(p._factor, b), p._power * b, 0, p._y, p._hasY);
    }

    public static ScaleFree Pow(ScaleFree a, ScaleFree b) =>
        b.IsConstant ? Pow(a, b._factor.Lower) : (a._hasY ? a : b).With(Bounds.Pow(a.Range, b.Range));

    public static ScaleFree Sin(ScaleFree a) => a.With(Bounds.Sin(a.Range));

    public static ScaleFree Cos(ScaleFree a) => a.With(Bounds.Cos(a.Range));

    public static ScaleFree Abs(ScaleFree a) =>
        a._offset != 0 ? a.With(Bounds.Abs(a.Range)) : new(Bounds.Abs(a._factor), a._power, 0, a._y, a._hasY);

    public static ScaleFree LogGamma(ScaleFree a) => a.With(Bounds.LogGamma(a.Range));

    public static ScaleFree Digamma(ScaleFree a) => a.With(Bounds.Digamma(a.Range));

    public static ScaleFree DigammaDifference(ScaleFree a, double shift) => a.With(Bounds.DigammaDifference(a.Range, shift));

    private static bool IsZero(ScaleFree a) => a._offset == 0 && a._factor.Lower == 0 && a._factor.Upper == 0;

    private static (Bounds Y, bool HasY) Common(ScaleFree a, ScaleFree b) => (a._hasY ? a._y : b._y, a._hasY || b._hasY);

    private static ScaleFree Scaled(ScaleFree affine, double by, Bounds y) =>
        by == 0 ? (ScaleFree)0 : new(affine._factor.Lower * by, 1, affine._offset * by, y, true);

    private ScaleFree AsPower() => _offset == 0 ? this : With(Range);

    private ScaleFree With(Bounds range) => new(range, 0, 0, _y, _hasY);
}
