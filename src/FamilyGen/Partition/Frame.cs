using System;
using FamilyGen.Kernels;
using FamilyGen.Special;

namespace FamilyGen.Partition;

/// <summary>A chart about a reference point m: points are placed by their offset v = u − u(m), so that neither x − m nor
/// (x − end)/(m − end) loses digits.</summary>
internal readonly struct Frame
{
    private readonly Chart _chart;
    private readonly Coordinate _kind;
    private readonly bool _hasLower;
    private readonly bool _hasUpper;
    private readonly bool _isFine;

    // m − lower and upper − m, and for Coordinate.Between the logarithms of their shares of the width
    private readonly double _above;
    private readonly double _below;
    private readonly double _logShareAbove;
    private readonly double _logShareBelow;

    // between which observations lie, for conditions to see
    private readonly double _innerLower;
    private readonly double _innerUpper;

    public Frame(Chart chart, Point reference)
        : this(chart, reference, double.NegativeInfinity, double.PositiveInfinity)
    {
    }

    public Frame(Chart chart, Point reference, double innerLower, double innerUpper)
    {
        (_innerLower, _innerUpper) = (innerLower, innerUpper);
        _chart = chart;
        _kind = chart.Kind;
        Reference = reference;
        _hasLower = !chart.IsLattice && double.IsFinite(chart.Lower);
        _hasUpper = !chart.IsLattice && double.IsFinite(chart.Upper);
        _above = reference.X - chart.Lower;
        _below = chart.Upper - reference.X;
        _isFine = true;
        if (_kind is Coordinate.AboveLower or Coordinate.Between && !Chart.IsFineGrained(reference.X, chart.Lower))
            (_above, _isFine) = (Math.Exp(reference.LogAboveLower), false);
        if (_kind is Coordinate.BelowUpper or Coordinate.Between && !Chart.IsFineGrained(reference.X, chart.Upper))
            (_below, _isFine) = (Math.Exp(reference.LogBelowUpper), false);
        if (_kind == Coordinate.Between)
        {
            var logWidth = Math.Log(chart.Upper - chart.Lower);
            (_logShareAbove, _logShareBelow) = (reference.LogAboveLower - logWidth, reference.LogBelowUpper - logWidth);
        }
    }

    /// <summary>The reference point m.</summary>
    public Point Reference { get; }

    public Chart Chart => _chart;

    /// <summary>The point at offset v; on a lattice with the given representative of its residue class and piece.</summary>
    public Point At(double v, long integer = 0)
    {
        double displacement, x, toLower = double.NaN, toUpper = double.NaN;
        switch (_kind)
        {
            case Coordinate.Identity:
                displacement = v;
                x = Reference.X + v;
                if (_hasLower)
                    toLower = Ratio(v, _above);
                if (_hasUpper)
                    toUpper = Ratio(-v, _below);
                break;
            case Coordinate.AboveLower:
                displacement = _above * Elementary.ExpM1(v);
                x = _chart.Lower + (_isFine ? _above * Math.Exp(v) : Math.Exp(Reference.LogAboveLower + v));
                toLower = v;
                if (_hasUpper)
                    toUpper = Ratio(-displacement, _below);
                break;
            case Coordinate.BelowUpper:
                displacement = -_below * Elementary.ExpM1(-v);
                x = _chart.Upper - (_isFine ? _below * Math.Exp(-v) : Math.Exp(Reference.LogBelowUpper - v));
                toUpper = -v;
                if (_hasLower)
                    toLower = Ratio(displacement, _above);
                break;
            default:
                // with p and q the shares of the width below and above m: log of the ratio of distances is
                // −log(p + q e^−v) to the lower end and −log(q + p e^v) to the upper
                toLower = -LogMixture(_logShareAbove, _logShareBelow, -v);
                toUpper = -LogMixture(_logShareBelow, _logShareAbove, v);
                displacement = _above * Elementary.ExpM1(toLower);
                var (logAbove, logBelow) = (Reference.LogAboveLower + toLower, Reference.LogBelowUpper + toUpper);
                x = logAbove < logBelow ? _chart.Lower + Math.Exp(logAbove) : _chart.Upper - Math.Exp(logBelow);
                break;
        }

        return new Point
        {
            X = x < _innerLower ? _innerLower : x > _innerUpper ? _innerUpper : x,
            Displacement = displacement,
            RatioToLower = toLower,
            RatioToUpper = toUpper,
            LogAboveLower = Reference.LogAboveLower + toLower,
            LogBelowUpper = Reference.LogBelowUpper + toUpper,
            Integer = integer,
        };
    }

    /// <summary>An observation as seen from the reference point.</summary>
    public Point Observation(double x)
    {
        if (_chart.IsLattice)
            return At(x - Reference.X, ToInteger(x)) with { X = x };
        var displacement = _isFine ? x - Reference.X
            : _kind == Coordinate.BelowUpper ? _below - (_chart.Upper - x)
            : x - _chart.Lower - _above;
        return new Point
        {
            X = x,
            Displacement = displacement,
            LogAboveLower = EndDistance.LogAbove(x, _chart.Lower, _chart.Upper),
            LogBelowUpper = EndDistance.LogBelow(x, _chart.Lower, _chart.Upper),
            RatioToLower = _hasLower ? Ratio(displacement, _above, x - _chart.Lower, Reference.LogAboveLower) : double.NaN,
            RatioToUpper = _hasUpper ? Ratio(-displacement, _below, _chart.Upper - x, Reference.LogBelowUpper) : double.NaN,
        };
    }

    /// <summary>The offset of an observation.</summary>
    public double OffsetOf(double x)
    {
        if (_kind == Coordinate.Identity)
            return x - Reference.X;
        var point = Observation(x);
        return _kind switch
        {
            Coordinate.AboveLower => point.RatioToLower,
            Coordinate.BelowUpper => -point.RatioToUpper,
            _ => point.RatioToLower - point.RatioToUpper,
        };
    }

    /// <summary>log dx/du at the point less its value at the reference point.</summary>
    public double LogJacobian(in Point x) => _kind switch
    {
        Coordinate.Identity => 0,
        Coordinate.AboveLower => x.RatioToLower,
        Coordinate.BelowUpper => x.RatioToUpper,
        _ => x.RatioToLower + x.RatioToUpper,
    };

    /// <summary>log dx/du at the reference point.</summary>
    public double LogJacobianAtReference => _kind switch
    {
        Coordinate.Identity => 0,
        Coordinate.AboveLower => Reference.LogAboveLower,
        Coordinate.BelowUpper => Reference.LogBelowUpper,
        _ => Reference.LogAboveLower + _logShareBelow,
    };

    /// <summary>The integer at a lattice point, or the nearest end of the range of long.</summary>
    public static long ToInteger(double x) => x >= long.MaxValue ? long.MaxValue : x <= long.MinValue ? long.MinValue : (long)x;

    // log((distance + step)/distance)
    private static double Ratio(double step, double distance)
    {
        var z = step / distance;
        return z > -1 ? Elementary.Log1P(z) : double.NegativeInfinity;
    }

    private static double Ratio(double step, double reference, double distance, double logReference)
    {
        var z = step / reference;
        return Math.Abs(z) < 0.5 ? Elementary.Log1P(z) : Math.Log(distance) - logReference;
    }

    // log(a + b e^v) for shares a + b = 1 given by their logarithms
    private static double LogMixture(double logA, double logB, double v)
    {
        if (Math.Abs(v) < 1)
            return Elementary.Log1P(Math.Exp(logB) * Elementary.ExpM1(v));
        return logA + Elementary.LogOnePlusExp(logB + v - logA);
    }
}
