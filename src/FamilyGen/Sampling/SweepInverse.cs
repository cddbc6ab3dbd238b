using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using FamilyGen.Kernels;
using FamilyGen.Partition;

namespace FamilyGen.Sampling;

/// <summary>Inverts the cumulative sweep of a partition: from a probability to the observation below which it lies. The
/// panels are those by which the normalizer itself is evaluated; each is inverted when it is first met.</summary>
/// <remarks>The integrand's expansion on a panel is good to 1e-10 of the whole before it is integrated, so the probability
/// that belongs to a draw is off by less than that.</remarks>
internal sealed class SweepInverse<TKernel>
    where TKernel : struct, IKernel
{
    private readonly (Panel Panel, Expansion<TKernel> Expansion)[] _panels;
    private readonly double[] _below;               // the probability below each panel, and 1 at the end
    private readonly int[] _guide;                  // for each part of (0, 1), the panel that holds its lower end
    private readonly object?[] _inverses;           // PanelInverse, or double[] of cumulative terms
    private readonly double _least;
    private readonly double _greatest;

    public SweepInverse(WeightTables<TKernel> tables, Domain domain)
    {
        _least = domain.LowerIncluded ? domain.Lower : Math.BitIncrement(domain.Lower);
        _greatest = domain.UpperIncluded ? domain.Upper : Math.BitDecrement(domain.Upper);
        var panels = new List<(Panel, Expansion<TKernel>)>();
        var below = new List<double> { 0 };
        foreach (var i in tables.IsOrdered ? tables.Order : Enumerable.Range(0, tables.Tables.Length))
        {
            var table = tables.Tables[i];
            foreach (var panel in table.Panels)
            {
                if (!(panel.Weight > 0))
                    continue;
                panels.Add((panel, table.Part.Expansion));
                below.Add(below[^1] + (tables.Unit[i] * panel.Weight));
            }
        }

        _panels = [.. panels];
        _below = [.. below.Select(sum => sum / below[^1])];
        _guide = Guide(_below, 2 * _panels.Length);
        _inverses = new object?[_panels.Length];
    }

    /// <summary>The observation at a probability in (0, 1). One that would round to an open end of the support, or
    /// overflow, is the nearest number inside.</summary>
    public double At(double probability)
    {
        var i = _guide[(int)(probability * _guide.Length)];
        while (i + 1 < _panels.Length && _below[i + 1] <= probability)
            i++;
        var mass = Math.Clamp((probability - _below[i]) / (_below[i + 1] - _below[i]), 0, 1);
        var (panel, expansion) = _panels[i];
        var inverse = InverseOf(i);
        var offset = panel.Start + (panel.Kind switch
        {
            PanelKind.Interval => panel.Extent * (((PanelInverse)inverse).Place(mass) + 1) / 2,
            PanelKind.Run => panel.Step * ((PanelInverse)inverse).Index(mass),
            _ => panel.Step * IndexOf((double[])inverse, mass),
        });
        var x = expansion.Frame.At(offset, expansion.Reference.Integer).X;
        return panel.Kind == PanelKind.Interval ? Math.Clamp(x, _least, _greatest) : x;
    }

    private object InverseOf(int i)
    {
        if (Volatile.Read(ref _inverses[i]) is { } known)
            return known;
        var (panel, expansion) = _panels[i];
        object inverse = panel.Kind switch
        {
            PanelKind.Interval => Inverse(expansion, QuadratureRule.Interval, panel.Start + (panel.Extent / 2), panel.Extent / 2, double.PositiveInfinity),
            PanelKind.Run => Inverse(
                expansion,
                QuadratureRule.Lattice((int)Math.Log2(panel.Extent), out var half),
                panel.Start + (panel.Step * (panel.Extent - 1) / 2),
                panel.Step * half,
                panel.Extent),
            _ => Cumulative(expansion, panel),
        };
        Volatile.Write(ref _inverses[i], inverse);
        return inverse;
    }

    private static PanelInverse Inverse(Expansion<TKernel> expansion, QuadratureRule rule, double middle, double halfWidth, double count)
    {
        Span<double> values = stackalloc double[QuadratureRule.NodeCount];
        for (var k = 0; k < values.Length; k++)
            values[k] = Math.Exp(expansion.LogIntegrand(middle + (halfWidth * rule.Nodes[k])));
        return new(rule, values, count);
    }

    private static double[] Cumulative(Expansion<TKernel> expansion, Panel panel)
    {
        var cumulative = new double[(int)panel.Extent];
        var sum = 0.0;
        for (var k = 0; k < cumulative.Length; k++)
            cumulative[k] = sum += Math.Exp(expansion.LogIntegrand(panel.Start + (panel.Step * k)));
        return cumulative;
    }

    // the first index up to which the cumulative sum reaches this part of its total
    private static int IndexOf(double[] cumulative, double mass)
    {
        var index = Array.BinarySearch(cumulative, mass * cumulative[^1]);
        return Math.Min(index >= 0 ? index : ~index, cumulative.Length - 1);
    }

    // Chen and Asau 1974
    private static int[] Guide(double[] below, int length)
    {
        var guide = new int[length];
        var panel = 0;
        for (var k = 0; k < length; k++)
        {
            while (panel + 2 < below.Length && below[panel + 1] <= (double)k / length)
                panel++;
            guide[k] = panel;
        }

        return guide;
    }
}
