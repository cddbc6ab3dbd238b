using System;
using System.Collections.Generic;
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
    private readonly RangePartition<TKernel> _partition;
    private readonly SweptPanel[] _panels;
    private readonly double[] _below;               // the probability below each panel, and 1 at the end
    private readonly int[] _guide;                  // for each part of (0, 1), the panel that holds its lower end
    private readonly object?[] _inverses;           // PanelInverse, or double[] of cumulative terms
    private readonly double _least;
    private readonly double _greatest;

    public SweepInverse(TKernel kernel, double[] theta)
    {
        var domain = kernel.Domain;
        _least = domain.LowerIncluded ? domain.Lower : Math.BitIncrement(domain.Lower);
        _greatest = domain.UpperIncluded ? domain.Upper : Math.BitDecrement(domain.Upper);
        var sinks = new List<PanelList>();
        _partition = RangePartition<TKernel>.Over(kernel, theta, SubRange.Whole, MomentPlan.None, part =>
        {
            sinks.Add(new(part));
            return sinks[^1];
        });
        var panels = new List<SweptPanel>();
        foreach (var sink in sinks)
            panels.AddRange(sink.Ordered());
        _panels = [.. panels];
        _inverses = new object?[_panels.Length];
        _below = Accumulate();
        _guide = Guide(_below, 2 * _panels.Length);
    }

    /// <summary>The observation at a probability in (0, 1). One that would round to an open end of the support, or
    /// overflow, is the nearest number inside.</summary>
    public double At(double probability)
    {
        var i = _guide[(int)(probability * _guide.Length)];
        while (i + 1 < _panels.Length && _below[i + 1] <= probability)
            i++;
        ref readonly var panel = ref _panels[i];
        var mass = (probability - _below[i]) / (_below[i + 1] - _below[i]);
        var part = _partition.Parts[panel.Part];
        var x = part.Expansion.Frame.At(Offset(i, panel, Math.Clamp(mass, 0, 1)), part.Expansion.Reference.Integer).X;
        return panel.Shape == PanelShape.Interval ? Math.Clamp(x, _least, _greatest) : x;
    }

    private double Offset(int i, in SweptPanel panel, double mass)
    {
        var inverse = Volatile.Read(ref _inverses[i]);
        if (inverse is null)
        {
            inverse = Invert(panel);
            Volatile.Write(ref _inverses[i], inverse);
        }

        if (panel.Shape == PanelShape.Interval)
            return panel.Start + (panel.Step * (((PanelInverse)inverse).Place(mass) + 1) / 2);
        var index = panel.Shape == PanelShape.Run ? ((PanelInverse)inverse).Index(mass) : IndexOf((double[])inverse, mass);
        return panel.Start + (panel.Step * index);
    }

    private object Invert(in SweptPanel panel)
    {
        var sum = new PanelSum<TKernel>(_partition.Parts[panel.Part].Expansion, MomentPlan.None);
        if (panel.Shape == PanelShape.Terms)
        {
            var cumulative = new double[(int)panel.Count];
            var total = 0.0;
            for (var k = 0; k < cumulative.Length; k++)
                cumulative[k] = total += Math.Exp(sum.Log(panel.Start + (panel.Step * k), out _));
            return cumulative;
        }

        var rule = QuadratureRule.Interval;
        var half = 0.5;
        var middle = 0.5;
        if (panel.Shape == PanelShape.Run)
        {
            rule = QuadratureRule.Lattice((int)Math.Log2(panel.Count), out half);
            middle = (panel.Count - 1) / 2;
        }

        Span<double> values = stackalloc double[QuadratureRule.NodeCount];
        for (var k = 0; k < values.Length; k++)
            values[k] = Math.Exp(sum.Log(panel.Start + (panel.Step * (middle + (half * rule.Nodes[k]))), out _));
        return new PanelInverse(rule, values, panel.Count);
    }

    // the first index up to which the cumulative sum reaches this part of its total
    private static int IndexOf(double[] cumulative, double mass)
    {
        var index = Array.BinarySearch(cumulative, mass * cumulative[^1]);
        return Math.Min(index >= 0 ? index : ~index, cumulative.Length - 1);
    }

    private double[] Accumulate()
    {
        var below = new double[_panels.Length + 1];
        for (var i = 0; i < _panels.Length; i++)
        {
            var part = _panels[i].Part;
            below[i + 1] = below[i] + (_partition.Shares[part] * _panels[i].Weight / _partition.Parts[part].Scale);
        }

        var total = below[^1];
        for (var i = 0; i < below.Length; i++)
            below[i] /= total;
        return below;
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
