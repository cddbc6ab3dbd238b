using System;
using FamilyGen.Kernels;

namespace FamilyGen.Partition;

/// <summary>G(u) = f(x(u)) + log dx/du, the logarithm of the integrand in the integration coordinate, on one piece: its
/// height, its slope, and guaranteed ranges of its slope.</summary>
internal readonly ref struct SlopeField<TKernel>
    where TKernel : struct, IKernel
{
    private readonly TKernel _kernel;
    private readonly ReadOnlySpan<double> _theta;
    private readonly Chart _chart;
    private readonly Piece _piece;
    private readonly Point _representative;

    public SlopeField(TKernel kernel, ReadOnlySpan<double> theta, Chart chart, Piece piece, Point representative)
    {
        _kernel = kernel;
        _theta = theta;
        _chart = chart;
        _piece = piece;
        _representative = representative;
    }

    /// <summary>G′(u), NaN where it is unknown.</summary>
    public double Slope(double u)
    {
        if (_chart.Kind == Coordinate.Identity)
            return _kernel.Derivative<Scalar>(_theta, u, _representative).Value;
        var range = Slope(u, u);
        var middle = range.Lower / 2 + range.Upper / 2;
        return double.IsNaN(middle) && !double.IsInfinity(range.Lower) ? range.Lower : middle;
    }

    /// <summary>A range that holds G′ everywhere between two coordinates.</summary>
    public Bounds Slope(double from, double to)
    {
        if (_chart.Kind == Coordinate.Identity)
            return _kernel.Derivative<Bounds>(_theta, new Bounds(from, to), _representative);
        switch (_chart.Kind)
        {
            case Coordinate.AboveLower:
                return TimesDistance(_chart.Lower, 1, Exp(from, to)) + 1;
            case Coordinate.BelowUpper:
                return TimesDistance(_chart.Upper, -1, Exp(-to, -from)) - 1;
            default:
                var width = _chart.Upper - _chart.Lower;
                var below = Share(from, to);
                var above = Share(-to, -from);
                var slope = to <= 0
                    ? TimesDistance(_chart.Lower, 1, width * below) * above
                    : TimesDistance(_chart.Upper, -1, width * above) * below;
                return slope + (above - below);
        }
    }

    /// <summary>G(u) up to a constant, by plain values: for scans.</summary>
    public double Height(double u)
    {
        var count = TKernel.Count;
        Span<double> value = stackalloc double[count + 1];
        Span<double> remainder = stackalloc double[count + 1];
        var m = _chart.ReferenceNear(u);
        if (m.X < _piece.InnerLower || m.X > _piece.InnerUpper)
            m = _chart.Reference(Math.Clamp(m.X, _piece.InnerLower, _piece.InnerUpper));
        m = m with { Integer = _representative.Integer };
        _kernel.Evaluate(m, value, remainder);
        var sum = value[count] + new Frame(_chart, m).LogJacobianAtReference;
        for (var j = 0; j < count; j++)
        {
            if (_theta[j] != 0)
                sum += _theta[j] * value[j];
        }

        return double.IsNaN(sum) ? double.NegativeInfinity : sum;
    }

    private Bounds TimesDistance(double end, double direction, Bounds distance) =>
        _kernel.Derivative<ScaleFree>(_theta, ScaleFree.Affine(end, direction, distance), _representative).RangeTimes(distance);

    private static Bounds Exp(double from, double to)
    {
        const double Slack = 1e-14;
        return new(
            Math.BitDecrement(Math.Exp(from) * (1 - Slack)),
            Math.BitIncrement(Math.Exp(to) * (1 + Slack)));
    }

    private static Bounds Share(double from, double to)
    {
        var (low, high) = (Exp(from, from), Exp(to, to));
        return new(
            low.Lower / (1 + low.Lower) * (1 - 1e-15),
            double.IsInfinity(high.Upper) ? 1 : Math.Min(1, high.Upper / (1 + high.Upper) * (1 + 1e-15)));
    }
}
