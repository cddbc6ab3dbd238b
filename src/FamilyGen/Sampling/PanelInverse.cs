using System;
using FamilyGen.Partition;

namespace FamilyGen.Sampling;

/// <summary>Inverts the cumulative mass within one panel of a sweep, an interval or a run of L consecutive lattice
/// points, from the integrand's values at the panel's Gauss nodes. Places within the panel run from −1 to 1, masses
/// from 0 to 1.</summary>
/// <remarks>
/// The values give the integrand's expansion Σ cₙφₙ in the polynomials φₙ orthonormal under the panel's uniform measure,
/// xφₙ = rₙ₊₁φₙ₊₁ + rₙφₙ₋₁. The mass below x (on a run that of the points before x and half that of x) is then
/// ½c₀ + ρ Σ cₙ(rₙ₊₁φₙ₊₁/(n + 1) − rₙφₙ₋₁/n), ρ = ½, on a run (L − 1)/(2L): by partial summation it is orthogonal to
/// all polynomials below degree n − 1, and its leading coefficient is that of the integral.
/// </remarks>
internal sealed class PanelInverse
{
    private const int Degree = QuadratureRule.NodeCount;
    private const int Cells = 32;
    private const double CellWidth = 2.0 / Cells;
    private const int MostSteps = 60;
    private const double Tolerance = 1e-14;

    private readonly double[] _root;                            // r₀ … r₂₀
    private readonly double[] _density = new double[Degree];
    private readonly double[] _mass = new double[Degree + 1];
    private readonly double[] _knotMass = new double[Cells + 1];
    private readonly double[] _knotDensity = new double[Cells + 1];
    private readonly double _count;
    private readonly bool _isSmooth;
    private readonly double _rate;

    /// <summary>The inverse for a panel.</summary>
    /// <param name="rule">The rule of the panel.</param>
    /// <param name="values">The integrand at the rule's nodes, in any unit.</param>
    /// <param name="count">The number of points of a run; infinite for an interval.</param>
    public PanelInverse(QuadratureRule rule, ReadOnlySpan<double> values, double count)
    {
        _root = rule.Recurrence;
        _count = count;
        _isSmooth = rule == QuadratureRule.Interval;
        _rate = _isSmooth ? 0.5 : 0.5 - (0.5 / count);
        Expand(rule, values);
        for (var k = 0; k <= Cells; k++)
            _knotMass[k] = MassBelow(-1 + (k * CellWidth), out _knotDensity[k]);
    }

    /// <summary>The place below which this part of the panel's mass lies.</summary>
    public double Place(double mass)
    {
        var cell = CellOf(mass);
        var (low, high) = (-1 + (cell * CellWidth), -1 + ((cell + 1) * CellWidth));
        var x = low + (CellWidth * Guess(cell, mass));
        for (var step = 0; step < MostSteps; step++)
        {
            var excess = MassBelow(x, out var density) - mass;
            if (Math.Abs(excess) <= Tolerance)
                break;
            (low, high) = excess > 0 ? (low, x) : (x, high);
            var next = x - (excess / (_rate * density));
            if (!(next > low && next < high))
                next = (low + high) / 2;
            if (next == x)
                break;
            x = next;
        }

        return x;
    }

    /// <summary>On a run, the index of the first point up to which at least this part of the mass lies.</summary>
    public double Index(double mass)
    {
        var last = _count - 1;
        if (_isSmooth)                              // so long a run that its points fill the interval
            return Math.Min(Math.Floor((Place(mass) + 1) / 2 * _count), last);

        // x = −1 + 2·index/(L − 1), and the smooth curve passes through the middle of every step
        var index = Math.Clamp(Math.Round((Place(mass) + 1) / 2 * last), 0, last);
        for (var step = 0; step < 2 && index < last && MassUpTo(index) < mass; step++)
            index++;
        for (var step = 0; step < 2 && index > 0 && MassUpTo(index - 1) >= mass; step++)
            index--;
        return index;
    }

    private double MassUpTo(double index)
    {
        var below = MassBelow((2 * index / (_count - 1)) - 1, out var density);
        return below + (density / (2 * _count));
    }

    private void Expand(QuadratureRule rule, ReadOnlySpan<double> values)
    {
        Span<double> polynomial = stackalloc double[Degree];
        for (var i = 0; i < values.Length; i++)
        {
            rule.Orthonormal(rule.Nodes[i], polynomial);
            for (var n = 0; n < Degree; n++)
                _density[n] += rule.Weights[i] * values[i] * polynomial[n];
        }

        var mean = _density[0];
        for (var n = 0; n < Degree; n++)
            _density[n] /= mean;
        _mass[0] = 0.5 - (_rate * _density[1] * _root[1]);
        for (var n = 1; n <= Degree; n++)
        {
            var above = n + 1 < Degree ? _density[n + 1] * _root[n + 1] / (n + 1) : 0;
            _mass[n] = _rate * ((_density[n - 1] * _root[n] / n) - above);
        }
    }

    private double MassBelow(double x, out double density)
    {
        var (before, current) = (0.0, 1.0);
        var mass = _mass[0];
        density = _density[0];
        for (var n = 1; n < Degree; n++)
        {
            (before, current) = (current, ((x * current) - (_root[n - 1] * before)) / _root[n]);
            mass += _mass[n] * current;
            density += _density[n] * current;
        }

        return mass + (_mass[Degree] * (((x * current) - (_root[Degree - 1] * before)) / _root[Degree]));
    }

    private int CellOf(double mass)
    {
        var (low, high) = (0, Cells);
        while (high - low > 1)
        {
            var middle = (low + high) / 2;
            (low, high) = _knotMass[middle] <= mass ? (middle, high) : (low, middle);
        }

        return low;
    }

    // The place within a cell, by Hermite's cubic for the inverse where the density does not vary too much, else linear.
    private double Guess(int cell, double mass)
    {
        var height = _knotMass[cell + 1] - _knotMass[cell];
        var s = Math.Clamp((mass - _knotMass[cell]) / height, 0, 1);
        if (!(height > 0))
            return 0.5;
        var scale = height / (_rate * CellWidth);
        var (first, last) = (scale / _knotDensity[cell], scale / _knotDensity[cell + 1]);
        if (!(first is > 0 and < 3 && last is > 0 and < 3))
            return s;
        var t = 1 - s;
        return (s * s * (3 - (2 * s))) + (s * t * ((first * t) - (last * s)));
    }
}
