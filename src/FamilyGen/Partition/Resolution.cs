using System;

namespace FamilyGen.Partition;

/// <summary>Whether a Gauss rule resolves the integrand and its moments on a panel: by their highest expansion
/// coefficients, and by what the expansion gives at the panel's two ends, where a layer too thin for any node would
/// hide.</summary>
internal sealed class Resolution
{
    // The highest coefficients may be this large beside the whole: those of the degrees that a Gauss rule leaves out are
    // about their square.
    private const double Tolerance = 1e-10;

    // Where they fall slowly, as beside a kink or a branch point, the fall is continued to the degrees left out.
    private const double Neglected = 1e-16;

    // A layer beyond the outermost node takes less than a two-hundredth of the panel.
    private const double EndTolerance = 3e-11;

    // An expansion magnifies the rounding of its values at its ends.
    private const double EndNoise = 32;

    private const int Columns = QuadratureRule.WitnessCount + 2;
    private const int AtStart = QuadratureRule.WitnessCount;
    private const int AtEnd = QuadratureRule.WitnessCount + 1;

    private readonly MomentPlan _plan;
    private readonly double[] _witness;

    public Resolution(MomentPlan plan)
    {
        _plan = plan;
        _witness = new double[(plan.Size + 1) * Columns];
    }

    /// <summary>Forgets the panel before.</summary>
    public void Clear() => Array.Clear(_witness);

    /// <summary>Adds the value of the integrand at a node, and the basis functions there.</summary>
    public void Add(QuadratureRule rule, int node, double value, ReadOnlySpan<double> basis)
    {
        var row = rule.Witness.AsSpan(node * Columns, Columns);
        Accumulate(row, value, _witness.AsSpan(0, Columns));
        var order = _plan.Order;
        for (var i = 0; i < order.Length; i++)
        {
            if (order[i] > 0)
                Accumulate(row, Moment(i, value, basis), _witness.AsSpan((i + 1) * Columns, Columns));
        }
    }

    /// <summary>Takes the value at an end of the panel from what the expansion gives there.</summary>
    public void CompareEnd(bool isStart, double value, ReadOnlySpan<double> basis)
    {
        var column = isStart ? AtStart : AtEnd;
        _witness[column] -= value;
        for (var i = 0; i < _plan.Order.Length; i++)
        {
            if (_plan.Order[i] > 0)
                _witness[(i + 1) * Columns + column] -= Moment(i, value, basis);
        }
    }

    /// <summary>Leaves an end out at which the integrand has no value.</summary>
    public void SkipEnd(bool isStart)
    {
        for (var i = isStart ? AtStart : AtEnd; i < _witness.Length; i += Columns)
            _witness[i] = 0;
    }

    /// <summary>The largest of the judgements beside their tolerances: at most 1 where the panel is resolved.</summary>
    /// <param name="measure">The measure of the panel.</param>
    /// <param name="own">Its sums, before the measure.</param>
    /// <param name="total">The sums before the panel.</param>
    /// <param name="noise">What rounding leaves of coefficients that should vanish, beside the panel's own part.</param>
    public double Excess(double measure, Sums own, Sums total, double noise)
    {
        var worst = Excess(0, measure, measure * own.Weight, total.Weight, noise);
        for (var i = 0; i < _plan.Size; i++)
        {
            if (_plan.Order[i] > 0)
                worst = Math.Max(worst, Excess(i + 1, measure, measure * own.Scale[i], total.Scale[i], noise));
        }

        return worst;
    }

    private double Excess(int function, double measure, double own, double others, double noise)
    {
        ReadOnlySpan<double> witness = _witness.AsSpan(function * Columns, Columns);
        var scale = own + others;
        if (!double.IsFinite(scale) || scale == 0)
            return 0;
        var atEnds = measure * Math.Max(Math.Abs(witness[AtStart]), Math.Abs(witness[AtEnd]));
        var atEnd = atEnds > EndNoise * noise * own ? atEnds / (EndTolerance * scale) : 0;
        var last = measure * Math.Max(Math.Abs(witness[0]), Math.Abs(witness[1]));
        var before = measure * Math.Max(Math.Abs(witness[2]), Math.Abs(witness[3]));
        var largest = Math.Max(last, before);
        if (!(largest > noise * own))
            return atEnd;
        var excess = Math.Max(atEnd, largest / (Tolerance * scale));
        if (excess > 1)
            return excess;

        // what the rule leaves out starts another twenty degrees on; a fall from degree 17 to 19 by decay is one by decay⁶
        // from 19 to 40 if it is that of a power of the degree
        var decay = Math.Min(1, last / before);
        var beyond = last * (decay * decay) * (decay * decay) * (decay * decay) / (Neglected * scale);
        return beyond <= 1 ? excess : Math.Max(excess, beyond);
    }

    private double Moment(int function, double value, ReadOnlySpan<double> basis) =>
        _plan.Order[function] == 1 ? value * basis[function] : value * basis[function] * basis[function];

    private static void Accumulate(ReadOnlySpan<double> row, double value, Span<double> sums)
    {
        for (var q = 0; q < sums.Length; q++)
            sums[q] += value * row[q];
    }
}
