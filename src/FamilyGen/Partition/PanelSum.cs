using System;
using System.Globalization;
using FamilyGen.Kernels;

namespace FamilyGen.Partition;

/// <summary>One panel of a sweep at a time: a Gauss rule over an interval or over consecutive lattice points, or the plain
/// sum over a few of them.</summary>
internal sealed class PanelSum<TKernel>
    where TKernel : struct, IKernel
{
    // The highest expansion coefficients of a panel's integrands may be this large beside the whole: those of the degrees
    // that a Gauss rule leaves out are about their square.
    private const double Tolerance = 1e-10;

    // Where they fall slowly, as beside a kink or a branch point, the fall is continued to the degrees left out.
    private const double Neglected = 1e-16;
    private const double Rounding = 2e-15;

    // A fall of the exponent that a rule must not step over before its first node.
    private const double SteepFall = 10;
    private const double NegligibleLog = -60;

    private readonly Expansion<TKernel> _expansion;
    private readonly MomentPlan _plan;
    private readonly Frame _frame;
    private readonly double[] _residual;
    private readonly double[] _difference;
    private readonly double[] _basis;
    private readonly double[] _witness;

    public PanelSum(Expansion<TKernel> expansion, MomentPlan plan)
    {
        (_expansion, _plan, _frame) = (expansion, plan, expansion.Frame);
        _residual = new double[TKernel.Count + 1];
        _difference = new double[TKernel.Count + 1];
        _basis = new double[plan.Size];
        _witness = new double[(plan.Size + 1) * QuadratureRule.WitnessCount];
        Sums = new Sums(plan);
    }

    /// <summary>The sums of the last panel, before its measure.</summary>
    public Sums Sums { get; }

    /// <summary>The logarithm of the integrand at the last node of the last panel.</summary>
    public double LastLog { get; private set; }

    /// <summary>f − f(m) and the logarithm of the integrand at an offset.</summary>
    public double Log(double offset, out double exponent)
    {
        exponent = _expansion.At(offset, _residual, _difference, out var displacement, out var log);
        if (double.IsNaN(log))
            throw new PartitionException(string.Create(CultureInfo.InvariantCulture, $"The exponent is not a number at {_frame.At(offset).X:R}."));
        FillBasis(displacement);
        return log;
    }

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
            LastLog = Log(first + step * i, out var exponent);
            var weight = Math.Exp(LastLog);
            if (weight > 0)
                Sums.Add(weight, _basis, exponent);
        }
    }

    /// <summary>Applies a rule about a center; the half width has the sign of the direction away from the mode.</summary>
    /// <param name="rule">The rule.</param>
    /// <param name="center">The offset of the panel's middle.</param>
    /// <param name="halfWidth">Half its width, signed.</param>
    /// <param name="measure">The length of the panel, or its number of points.</param>
    /// <param name="startLog">The logarithm of the integrand where the panel starts.</param>
    /// <param name="total">The sums before the panel, against which its error is judged.</param>
    /// <returns>The size of the highest expansion coefficients beside the tolerance: at most 1 where the panel is resolved,
    /// infinite where the integrand falls before the first node.</returns>
    public double Apply(QuadratureRule rule, double center, double halfWidth, double measure, double startLog, Sums total)
    {
        Sums.Clear();
        Array.Clear(_witness);
        for (var i = 0; i < QuadratureRule.NodeCount; i++)
        {
            var log = Log(center + halfWidth * rule.Nodes[i], out var exponent);
            LastLog = log;
            if (i == 0 && log < startLog - SteepFall && startLog > NegligibleLog)
                return double.PositiveInfinity;
            var value = Math.Exp(log);
            if (value == 0)
                continue;
            if (!(value < double.PositiveInfinity))
                throw new PartitionException(string.Create(CultureInfo.InvariantCulture, $"The integrand rises without bound near {_frame.At(center).X:R}."));
            Sums.Add(value * rule.Weights[i], _basis, exponent);
            AddWitness(value, rule.Witness, i * QuadratureRule.WitnessCount);
        }

        return Unresolved(measure, total);
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

    private void AddWitness(double value, double[] table, int row)
    {
        Span<double> witness = _witness;
        for (var q = 0; q < QuadratureRule.WitnessCount; q++)
            witness[q] += value * table[row + q];
        var order = _plan.Order;
        for (var i = 0; i < order.Length; i++)
        {
            if (order[i] == 0)
                continue;
            var moment = order[i] == 1 ? value * _basis[i] : value * _basis[i] * _basis[i];
            for (var q = 0; q < QuadratureRule.WitnessCount; q++)
                witness[(i + 1) * QuadratureRule.WitnessCount + q] += moment * table[row + q];
        }
    }

    private double Unresolved(double measure, Sums total)
    {
        var worst = Excess(0, measure, total.Weight + measure * Sums.Weight);
        for (var i = 0; i < _plan.Size; i++)
        {
            if (_plan.Order[i] > 0)
                worst = Math.Max(worst, Excess(i + 1, measure, total.Scale[i] + measure * Sums.Scale[i]));
        }

        return worst;
    }

    private double Excess(int function, double measure, double scale)
    {
        var row = function * QuadratureRule.WitnessCount;
        var last = Math.Max(Math.Abs(_witness[row]), Math.Abs(_witness[row + 1]));
        var before = Math.Max(Math.Abs(_witness[row + 2]), Math.Abs(_witness[row + 3]));
        if (!(Math.Max(last, before) > 0) || !double.IsFinite(scale))
            return 0;
        last *= measure / scale;
        before *= measure / scale;
        var excess = Math.Max(last, before) / Tolerance;
        if (Math.Max(last, before) <= _expansion.Noise)
            return 0;
        if (excess > 1 || last <= Rounding)
            return excess;

        // what the rule leaves out starts another twenty degrees on; a fall from degree 17 to 19 by decay is one by decay⁶
        // from 19 to 40 if it is that of a power of the degree
        var decay = Math.Min(1, last / before);
        var beyond = last * decay * decay * decay * decay * decay * decay / Neglected;
        return beyond <= 1 ? excess : Math.Max(excess, beyond);
    }
}
