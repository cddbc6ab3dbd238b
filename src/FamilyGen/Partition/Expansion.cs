using System;
using System.Threading;
using FamilyGen.Kernels;

namespace FamilyGen.Partition;

/// <summary>The exponent f = Σ θⱼTⱼ + log h about a reference point m.</summary>
/// <remarks>f(x) − f(m) = s·d + Σ θⱼrⱼ + r_h with d = x − m, the residuals r of the kernel and the tangent
/// s = Σ θⱼ slopeⱼ + slope_h, which nearly vanishes at a mode and is therefore summed in compensated arithmetic. Far from m
/// the two parts may cancel; the plain difference of values is then the better one and is taken.</remarks>
internal sealed partial class Expansion<TKernel>
    where TKernel : struct, IKernel
{
    // Parts beyond this size, in units of the exponent, make the plain difference worth a look.
    private const double LargePart = 256;

    private const double ValueNoise = 4e-16;
    private const double UnreadNoise = 1e-12;

    private readonly TKernel _kernel;
    private readonly double[] _theta;
    private readonly double[] _slope;
    private readonly double[] _value;
    private readonly double[] _remainder;
    private readonly double _tangent;
    private readonly CompensatedSum _level;
    private FarTail<TKernel>? _far;

    public Expansion(TKernel kernel, double[] theta, Frame frame, long integer)
    {
        (_kernel, _theta, Frame) = (kernel, theta, frame);
        var count = TKernel.Count;
        _slope = new double[count + 1];
        _value = new double[count + 1];
        _remainder = new double[count + 1];
        var m = frame.Reference with { Integer = integer };
        Reference = m;
        _kernel.Evaluate(m, _value, _remainder);
        _kernel.Slopes(m, _slope);
        CompensatedSum tangent = default, level = default;
        var noise = kernel.Domain.IsOpaque ? UnreadNoise : 0;
        for (var j = 0; j <= count; j++)
        {
            var factor = j < count ? theta[j] : 1;
            if (factor == 0)
                continue;
            tangent.AddProduct(factor, _slope[j]);
            level.AddProduct(factor, _value[j]);
            if (_slope[j] == 0)
                noise += ValueNoise * Math.Abs(factor * _value[j]);
            level.AddProduct(factor, _remainder[j]);
        }

        Noise = noise;
        _tangent = tangent.Value;
        _level = level;
    }

    /// <summary>The place of points relative to m.</summary>
    public Frame Frame { get; }

    /// <summary>The reference point m.</summary>
    public Point Reference { get; }

    /// <summary>The rounding that may show in the exponent: functions without a tangent are plain differences of values,
    /// and those that could not be read may carry more.</summary>
    public double Noise { get; }

    /// <summary>f(m).</summary>
    public CompensatedSum Level => _level;

    /// <summary>The slopes of the functions at m.</summary>
    public ReadOnlySpan<double> Slopes => _slope;

    /// <summary>Whether the exponent and its slopes at m are numbers, so that m can serve as a reference.</summary>
    public bool IsUsable
    {
        get
        {
            foreach (var slope in _slope)
            {
                if (!double.IsFinite(slope))
                    return false;
            }

            foreach (var value in _value)
            {
                if (!double.IsFinite(value))
                    return false;
            }

            return true;
        }
    }

    /// <summary>Tⱼ(m), rounded, and log h(m) last.</summary>
    public ReadOnlySpan<double> Values => _value;

    /// <summary>f − f(m) at an offset, with residuals and differences as for a point, the displacement, and the logarithm of
    /// the integrand, log dx/du included, less its value at m. The size is that of the terms that were added, by which
    /// rounding is judged.</summary>
    public double At(double offset, Span<double> residual, Span<double> difference, out double displacement, out double log, out double size)
    {
        double exponent;
        if (FarTail<TKernel>.Reaches(Frame, offset))
        {
            exponent = Far.At(offset, difference, out log);
            displacement = double.PositiveInfinity;
            size = Math.Abs(exponent);
            return exponent;
        }

        var x = Frame.At(offset, Reference.Integer);
        displacement = x.Displacement;
        exponent = Difference(x, residual, difference, out size);
        log = exponent + Frame.LogJacobian(x);

        // ∞ − ∞ where a power or the observation itself overflows: beyond every mode
        if (double.IsNaN(log) && (!(Math.Abs(x.X) < 1e100) || !(Math.Abs(offset) < 300)))
            log = double.NegativeInfinity;
        return exponent;
    }

    /// <summary>f(x) − f(m), with the residuals rⱼ(x) and the differences Tⱼ(x) − Tⱼ(m).</summary>
    public double Difference(in Point x, Span<double> residual, Span<double> difference) =>
        Difference(x, residual, difference, out _);

    private double Difference(in Point x, Span<double> residual, Span<double> difference, out double size)
    {
        _kernel.Residuals(Reference, x, residual);
        var displacement = x.Displacement;
        var count = _theta.Length;
        var exponent = _tangent == 0 ? 0 : _tangent * displacement;
        size = Math.Abs(exponent);
        var isCancelled = false;
        for (var j = 0; j <= count; j++)
        {
            var r = residual[j];
            var linear = _slope[j] == 0 ? 0 : _slope[j] * displacement;
            var total = linear + r;
            difference[j] = total;
            if (!(Math.Abs(linear) <= 16 * Math.Abs(total)))
                isCancelled = true;
            var factor = j < count ? _theta[j] : 1;
            if (factor == 0)
                continue;
            var term = factor * r;
            exponent += term;
            size += Math.Abs(term);
        }

        return !isCancelled && (size <= LargePart || size <= 2 * Math.Abs(exponent))
            ? exponent
            : PlainDifference(x, exponent, ref size, residual, difference);
    }

    private FarTail<TKernel> Far => Volatile.Read(ref _far) ?? PublishFar();

    private FarTail<TKernel> PublishFar()
    {
        var far = new FarTail<TKernel>(_kernel.NaturalSet, _theta, this);
        Volatile.Write(ref _far, far);
        return far;
    }

    private double PlainDifference(in Point x, double exponent, ref double size, ReadOnlySpan<double> residual, Span<double> difference)
    {
        var count = _theta.Length;
        Span<double> value = stackalloc double[count + 1];
        Span<double> remainder = stackalloc double[count + 1];
        _kernel.Evaluate(x, value, remainder);
        double plain = 0, plainSize = 0;
        for (var j = 0; j <= count; j++)
        {
            var linear = _slope[j] == 0 ? 0 : Math.Abs(_slope[j] * x.Displacement);
            var error = linear + Math.Abs(residual[j]);
            var size2 = Math.Abs(value[j]) + Math.Abs(_value[j]);
            if (!(error <= size2))
            {
                difference[j] = (value[j] - _value[j]) + (remainder[j] - _remainder[j]);
                error = size2;
            }

            var factor = j < count ? _theta[j] : 1;
            if (factor == 0)
                continue;
            plain += factor * difference[j];
            plainSize += Math.Abs(factor) * error;
        }

        if (!(plainSize < size) && !double.IsNaN(exponent))
            return exponent;
        size = plainSize;
        return plain;
    }
}
