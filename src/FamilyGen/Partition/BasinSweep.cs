using System;
using FamilyGen.Kernels;

namespace FamilyGen.Partition;

/// <summary>Integrates over one basin, from its mode outward on both sides, in panels whose width follows the highest
/// expansion coefficients of the integrand, until nothing is left.</summary>
internal sealed class BasinSweep<TKernel>
    where TKernel : struct, IKernel
{
    // What a panel adds at the end, beside the whole: the rest is smaller still, since the integrand falls from here on.
    private const double Negligible = 1e-18;

    private const double FarthestOffset = 1e300;
    private const int MostPanels = 4000;
    private const double MostTerms = 4e6;

    // Where modes are not proved to be all, a sweep goes on past this many panels, or runs of terms, without a contribution.
    private const int QuietPanels = 8;
    private const int QuietRunsTermByTerm = 16;

    private readonly PanelSum<TKernel> _panel;
    private readonly IPanelSink? _sink;
    private readonly bool _termByTerm;
    private readonly double _step;
    private readonly int _quiet;
    private readonly MomentTail<TKernel> _momentTail;
    private int _panels;

    /// <summary>Sweeps a basin.</summary>
    /// <param name="expansion">The exponent about the basin's reference point.</param>
    /// <param name="basin">The basin.</param>
    /// <param name="termByTerm">On a lattice, whether every term is to be summed.</param>
    /// <param name="plan">The moments to gather; its choice of basis is completed here.</param>
    /// <param name="sink">Where the panels go, if anybody wants them.</param>
    public BasinSweep(Expansion<TKernel> expansion, Basin basin, bool termByTerm, MomentPlan plan, IPanelSink? sink)
    {
        _panel = new PanelSum<TKernel>(expansion, plan);
        _momentTail = new MomentTail<TKernel>(_panel, plan, expansion.Frame.Chart.Kind);
        _sink = sink;
        _termByTerm = termByTerm;
        _step = basin.Piece.Step;
        _quiet = termByTerm ? QuietRunsTermByTerm : basin.IsProven ? 0 : QuietPanels;
        Total = new Sums(plan);
        var lower = expansion.Frame.OffsetOf(basin.Lower);
        var upper = expansion.Frame.OffsetOf(basin.Upper);
        if (_step > 0)
        {
            _sink?.AddTerms(0, _step, 1, 1);
            SweepLattice(Math.Round(-lower / _step), -_step);
            SweepLattice(Math.Round(upper / _step), _step);
        }
        else
        {
            // the reference point lies in the basin unless slopes overflow there
            var origin = Math.Clamp(0, lower, upper);
            SweepInterval(origin, origin - lower, -1);
            SweepInterval(origin, upper - origin, 1);
        }
    }

    /// <summary>The sums over the basin, relative to the integrand at the reference point, whose own term they leave out
    /// on a lattice.</summary>
    public Sums Total { get; }

    /// <summary>A distance from an offset at which the integrand has fallen by about one, from a first guess; at most the
    /// given end.</summary>
    public static double FoldDistance(PanelSum<TKernel> panel, double origin, double guess, double end, double direction)
    {
        var distance = Math.Min(guess, end);
        var top = origin == 0 ? 0 : panel.Log(origin, out _);
        for (var i = 0; i < 60; i++)
        {
            var fall = top - panel.Log(origin + direction * distance, out _);
            if (fall is > 0.25 and < 4)
                break;
            if (fall <= 0.25 && distance >= end)
                break;
            // as if the fall were quadratic
            var factor = fall > 0 ? Math.Clamp(1 / Math.Sqrt(fall), 1e-8, 64) : 64;
            var next = Math.Min(distance * factor, end);
            if (next == 0 || next == distance)
                break;
            distance = next;
        }

        return distance;
    }

    private void SweepInterval(double origin, double end, double direction)
    {
        if (!(end > 0))
            return;
        var start = 0.0;
        var quiet = 0;
        var width = 2 * FoldDistance(_panel, origin, Math.Min(1, end / 2), end, direction);
        while (start < end)
        {
            Count();
            if (start > FarthestOffset)
                throw new PartitionException("The tail is too heavy: it still counts where doubles end.");
            var size = Math.Min(width, end - start);
            if (start + size == start)
                break;
            if (_momentTail.IsReached(origin, start, ref size, direction))
            {
                if (quiet == 0)
                    _momentTail.Complete(origin, start, direction, Total);
                break;
            }

            var excess = _panel.Apply(QuadratureRule.Interval, origin + direction * (start + size / 2), direction * size / 2, size, Total);
            if (excess > 1)
            {
                width = size * Growth(excess, 0.5);
                continue;
            }

            var share = Share(size);
            Total.Add(_panel.Sums, size);
            _sink?.AddInterval(origin + (direction > 0 ? start : -(start + size)), size, _panel.Sums.Weight * size);
            start += size;
            width = size * Growth(excess, 4);
            quiet = share <= Negligible ? quiet + 1 : 0;
            if (quiet > _quiet)
                break;
        }
    }

    private void SweepLattice(double end, double step)
    {
        if (!(end >= 1))
            return;
        var next = 1.0;
        double width = end <= QuadratureRule.ShortestRun || _termByTerm
            ? 1
            : 2 * Math.Ceiling(FoldDistance(_panel, 0, Math.Min(Math.Abs(step), end * Math.Abs(step)), end * Math.Abs(step), Math.Sign(step)) / Math.Abs(step));
        double terms = 0;
        var quiet = 0;
        while (next <= end)
        {
            Count();
            var left = end - next + 1;
            var power = (int)Math.Min(Math.Floor(Math.Log2(Math.Min(width, left))), 1000);
            double share;
            if (Math.ScaleB(1, power) < QuadratureRule.ShortestRun || left < 2 * QuadratureRule.ShortestRun)
            {
                var count = (int)Math.Min(left, left < 2 * QuadratureRule.ShortestRun ? left : QuadratureRule.ShortestRun);
                _panel.SumTerms(step * next, step, count);
                share = Share(1);
                Total.Add(_panel.Sums, 1);
                _sink?.AddTerms(step > 0 ? step * next : step * (next + count - 1), Math.Abs(step), count, _panel.Sums.Weight);
                next += count;
                width = _termByTerm ? 1 : Math.Max(2 * width, QuadratureRule.ShortestRun);
                terms += count;
                if (terms > MostTerms)
                    throw new PartitionException($"A sum over the integers needs more than {MostTerms:N0} terms.");
                if (_termByTerm)
                    _panels = 0;
            }
            else
            {
                var rule = QuadratureRule.Lattice(power, out var half);
                var length = Math.ScaleB(1, power);
                var excess = _panel.Apply(rule, step * (next + (length - 1) / 2), step * half, length, Total);
                if (excess > 1)
                {
                    width = length * Math.Min(0.5, Growth(excess, 0.5));
                    continue;
                }

                share = Share(length);
                Total.Add(_panel.Sums, length);
                _sink?.AddRun(step > 0 ? step * next : step * (next + length - 1), Math.Abs(step), length, _panel.Sums.Weight * length);
                next += length;
                width = length * Math.Max(1, Growth(excess, 4));
            }

            quiet = share <= Negligible ? quiet + 1 : 0;
            if (quiet > _quiet)
                break;
            if (double.IsInfinity(end) && !(next < 1e290))
                throw new PartitionException("The tail of the sum over the integers is too heavy: it still counts beyond 1e290.");
        }
    }

    // The panel's part of each sum, the largest of them.
    private double Share(double measure)
    {
        var panel = _panel.Sums;
        var share = panel.Weight * measure / (Total.Weight + panel.Weight * measure);
        for (var i = 0; i < panel.Scale.Length; i++)
        {
            if (panel.Scale[i] > 0 && panel.Scale[i] < double.PositiveInfinity)
                share = Math.Max(share, panel.Scale[i] * measure / (Total.Scale[i] + panel.Scale[i] * measure));
        }

        return double.IsNaN(share) ? 0 : share;
    }

    // Coefficients of degree n of a smooth function go with the n-th power of the width.
    private static double Growth(double excess, double most) =>
        Math.Clamp(0.9 * Math.Pow(excess, -1.0 / (QuadratureRule.NodeCount - 2)), double.IsInfinity(excess) ? 0.1 : 0.25, most);

    private void Count()
    {
        if (++_panels > MostPanels)
            throw new PartitionException($"More than {MostPanels} panels are needed: the exponent oscillates or is not smooth.");
    }
}
