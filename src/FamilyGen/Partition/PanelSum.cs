using System;
using System.Globalization;
using FamilyGen.Kernels;

namespace FamilyGen.Partition;

/// <summary>One panel of a sweep at a time: a Gauss rule over an interval or over consecutive lattice points, or the plain
/// sum over a few of them.</summary>
internal sealed class PanelSum<TKernel>
    where TKernel : struct, IKernel
{
    // What rounding leaves of coefficients that should vanish, beside the panel's own part; the second one for each unit of
    // the exponent.
    private const double Rounding = 2e-15;
    private const double RoundingOfTerms = 1e-15;

    // A fall of the exponent that a rule must not step over before its first node.
    private const double SteepFall = 10;
    private const double NegligibleLog = -60;

    private readonly Expansion<TKernel> _expansion;
    private readonly MomentPlan _plan;
    private readonly Frame _frame;
    private readonly double[] _residual;
    private readonly double[] _difference;
    private readonly double[] _basis;
    private readonly Resolution _resolution;
    private double _size;

    public PanelSum(Expansion<TKernel> expansion, MomentPlan plan)
    {
        (_expansion, _plan, _frame) = (expansion, plan, expansion.Frame);
        _residual = new double[TKernel.Count + 1];
        _difference = new double[TKernel.Count + 1];
        _basis = new double[plan.Size];
        _resolution = new Resolution(plan);
        Sums = new Sums(plan);
    }

    /// <summary>The sums of the last panel, before its measure.</summary>
    public Sums Sums { get; }

    /// <summary>f − f(m) and the logarithm of the integrand at an offset.</summary>
    public double Log(double offset, out double exponent)
    {
        exponent = _expansion.At(offset, _residual, _difference, out var displacement, out var log, out _size);
        if (double.IsNaN(log))
            throw new PartitionException(string.Create(CultureInfo.InvariantCulture, $"The exponent is not a number at {_frame.At(offset).X:R}."));
        FillBasis(displacement);
        return log;
    }

    /// <summary>The basis functions at the offset that was looked at last.</summary>
    public ReadOnlySpan<double> Basis => _basis;

    /// <summary>The residuals at the offset that was looked at last.</summary>
    public ReadOnlySpan<double> Residuals => _residual;

    /// <summary>The differences at the offset that was looked at last.</summary>
    public ReadOnlySpan<double> Differences => _difference;

    /// <summary>Sums over a run of lattice points, from the nearest to the mode outward.</summary>
    public void SumTerms(double first, double step, int count)
    {
        Sums.Clear();
        for (var i = 0; i < count; i++)
        {
            var weight = Math.Exp(Log(first + step * i, out var exponent));
            if (weight > 0)
                Sums.Add(weight, _basis, exponent);
        }
    }

    /// <summary>Applies a rule about a center; the half width has the sign of the direction away from the mode.</summary>
    /// <param name="rule">The rule.</param>
    /// <param name="center">The offset of the panel's middle.</param>
    /// <param name="halfWidth">Half its width, signed.</param>
    /// <param name="measure">The length of the panel, or its number of points.</param>
    /// <param name="total">The sums before the panel, against which its error is judged.</param>
    /// <returns>The size of what is unresolved beside the tolerance: at most 1 where the panel is resolved, infinite where the
    /// integrand falls before the first node.</returns>
    public double Apply(QuadratureRule rule, double center, double halfWidth, double measure, Sums total)
    {
        Sums.Clear();
        _resolution.Clear();
        var startLog = CompareEnd(center - halfWidth, isStart: true);
        var noise = 0.0;
        for (var i = 0; i < QuadratureRule.NodeCount; i++)
        {
            var log = Log(center + halfWidth * rule.Nodes[i], out var exponent);
            if (i == 0 && log < startLog - SteepFall && startLog > NegligibleLog)
                return double.PositiveInfinity;
            var value = Math.Exp(log);
            if (value == 0)
                continue;
            if (!(value < double.PositiveInfinity))
                throw new PartitionException(string.Create(CultureInfo.InvariantCulture, $"The integrand rises without bound near {_frame.At(center).X:R}."));
            Sums.Add(value * rule.Weights[i], _basis, exponent);
            _resolution.Add(rule, i, value, _basis);
            noise += value * rule.Weights[i] * (_size + Math.Abs(log - exponent));
        }

        CompareEnd(center + halfWidth, isStart: false);
        noise = Rounding + _expansion.Noise + (Sums.Weight > 0 ? RoundingOfTerms * noise / Sums.Weight : 0);
        return _resolution.Excess(measure, Sums, total, noise);
    }

    private double CompareEnd(double offset, bool isStart)
    {
        _expansion.At(offset, _residual, _difference, out var displacement, out var log, out _);
        if (double.IsFinite(log) && Math.Exp(log) is var value && double.IsFinite(value))
        {
            FillBasis(displacement);
            _resolution.CompareEnd(isStart, value, _basis);
        }
        else if (!double.IsNegativeInfinity(log))
        {
            _resolution.SkipEnd(isStart);
        }

        return log;
    }

    private void FillBasis(double displacement)
    {
        if (_basis.Length == 0)
            return;
        _basis[0] = displacement;
        var tangential = _plan.Tangential;
        for (var j = 0; j < tangential.Length; j++)
            _basis[j + 1] = tangential[j] ? _residual[j] : _difference[j];
    }
}
