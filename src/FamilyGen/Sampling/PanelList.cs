using System.Collections.Generic;
using System.Linq;
using FamilyGen.Partition;

namespace FamilyGen.Sampling;

/// <summary>Keeps the panels of one part of a partition that carry any weight.</summary>
internal sealed class PanelList(int part) : IPanelSink
{
    private readonly List<SweptPanel> _panels = [];

    public IEnumerable<SweptPanel> Ordered() => _panels.OrderBy(panel => panel.Start);

    public void AddInterval(double start, double width, double weight) =>
        Add(new(PanelShape.Interval, part, start, width, double.PositiveInfinity, weight));

    public void AddTerms(double start, double step, int count, double weight) =>
        Add(new(PanelShape.Terms, part, start, step, count, weight));

    public void AddRun(double start, double step, double count, double weight) =>
        Add(new(PanelShape.Run, part, start, step, count, weight));

    private void Add(SweptPanel panel)
    {
        if (panel.Weight > 0)
            _panels.Add(panel);
    }
}
