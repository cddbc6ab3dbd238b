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

    // parts of the panel's mass: where a root is good, and from where one more step of Newton's makes it so
    private const double Tolerance = 1e-14;
    private const double AlmostThere = 1e-8;

    private readonly double[] _root;                            // r₀ … r₂₀
    private readonly double[] _inverseRoot;
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
        _inverseRoot = rule.InverseRecurrence;
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
            if (Math.Abs(excess) <= AlmostThere * density)
                return Math.Clamp(next, low, high);
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
        for (var step = 0; step < 2; step++)
        {
            var below = MassBelow((2 * index / last) - 1, out var density);
            var half = density / (2 * _count);
            var move = below + half < mass ? 1 : below - half >= mass ? -1 : 0;
            if (move == 0 || index + move < 0 || index + move > last)
                break;
            index += move;
        }

        return index;
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
        ReadOnlySpan<double> root = _root, inverseRoot = _inverseRoot, massTerms = _mass, densityTerms = _density;
        var (before, current) = (0.0, 1.0);
        var mass = massTerms[0];
        density = densityTerms[0];
        for (var n = 1; n < densityTerms.Length; n++)
        {
            (before, current) = (current, ((x * current) - (root[n - 1] * before)) * inverseRoot[n]);
            mass += massTerms[n] * current;
            density += densityTerms[n] * current;
        }

        return mass + (massTerms[Degree] * ((x * current) - (root[Degree - 1] * before)) * inverseRoot[Degree]);
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
