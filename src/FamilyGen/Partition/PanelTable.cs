using System;
using System.Collections.Generic;
using FamilyGen.Kernels;

namespace FamilyGen.Partition;

/// <summary>The panels of one basin in ascending order with the weight below and above each, from which partial weights,
/// and with them distribution functions, quantiles and draws, are found.</summary>
internal sealed class PanelTable<TKernel> : IPanelSink
    where TKernel : struct, IKernel
{
    private readonly List<Panel> _recorded = [];
    private Panel[] _panels = [];
    private double[] _below = [];
    private double[] _above = [];

    /// <summary>The panels in ascending order.</summary>
    public ReadOnlySpan<Panel> Panels => _panels;

    /// <summary>The weight of all panels below each, and last the whole weight.</summary>
    public ReadOnlySpan<double> Below => _below;

    /// <summary>The weight of each panel and all above it, and last 0.</summary>
    public ReadOnlySpan<double> Above => _above;

    /// <summary>The basin that the panels cover.</summary>
    public BasinPart<TKernel> Part { get; private set; } = null!;

    /// <inheritdoc/>
    public void AddInterval(double start, double width, double weight) =>
        _recorded.Add(new(PanelKind.Interval, start, 0, width, weight));

    /// <inheritdoc/>
    public void AddTerms(double start, double step, int count, double weight) =>
        _recorded.Add(new(PanelKind.Terms, start, step, count, weight));

    /// <inheritdoc/>
    public void AddRun(double start, double step, double count, double weight) =>
        _recorded.Add(new(PanelKind.Run, start, step, count, weight));

    /// <summary>Orders the panels once the sweep is over.</summary>
    public void Complete(BasinPart<TKernel> part)
    {
        Part = part;
        _panels = [.. _recorded];
        _recorded.Clear();
        Array.Sort(_panels, static (a, b) => a.Start.CompareTo(b.Start));
        _below = new double[_panels.Length + 1];
        _above = new double[_panels.Length + 1];
        for (var i = 0; i < _panels.Length; i++)
            _below[i + 1] = _below[i] + _panels[i].Weight;
        for (var i = _panels.Length - 1; i >= 0; i--)
            _above[i] = _above[i + 1] + _panels[i].Weight;
    }

    /// <summary>The weight of the points at or below an observation.</summary>
    public double WeightUpTo(double x)
    {
        if (x >= Part.Basin.Upper)
            return _below[^1];
        if (x < Part.Basin.Lower)
            return 0;
        var offset = Part.Expansion.Frame.OffsetOf(x);
        var index = PanelAt(offset);
        if (index < 0)
            return 0;
        return _below[index] + PartBelow(_panels[index], offset);
    }

    /// <summary>The weight of the points above an observation.</summary>
    public double WeightAbove(double x)
    {
        if (x >= Part.Basin.Upper)
            return 0;
        if (x < Part.Basin.Lower)
            return _above[0];
        var offset = Part.Expansion.Frame.OffsetOf(x);
        var index = PanelAt(offset);
        if (index < 0)
            return _above[0];
        return _above[index + 1] + PartAbove(_panels[index], offset);
    }

    /// <summary>The last panel that starts at or below an offset, −1 where there is none.</summary>
    public int PanelAt(double offset)
    {
        var (low, high) = (-1, _panels.Length);
        while (high - low > 1)
        {
            var middle = (low + high) / 2;
            if (_panels[middle].Start <= offset)
                low = middle;
            else
                high = middle;
        }

        return low;
    }

    /// <summary>The weight of a panel's points at or below an offset.</summary>
    public double PartBelow(in Panel panel, double offset)
    {
        if (offset >= panel.End)
            return panel.Weight;
        if (panel.Kind == PanelKind.Interval)
            return Part.Expansion.Integral(panel.Start, offset);
        var count = Math.Floor((offset - panel.Start) / panel.Step) + 1;
        return count <= 0 ? 0 : Part.Expansion.LatticeSum(panel.Start, panel.Step, count);
    }

    /// <summary>The weight of a panel's points above an offset.</summary>
    public double PartAbove(in Panel panel, double offset)
    {
        if (offset >= panel.End)
            return 0;
        if (panel.Kind == PanelKind.Interval)
            return Part.Expansion.Integral(Math.Max(offset, panel.Start), panel.End);
        var count = Math.Clamp(Math.Floor((offset - panel.Start) / panel.Step) + 1, 0, panel.Extent);
        return count == panel.Extent ? 0 : Part.Expansion.LatticeSum(panel.Start + panel.Step * count, panel.Step, panel.Extent - count);
    }
}
