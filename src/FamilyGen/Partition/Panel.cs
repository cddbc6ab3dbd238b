namespace FamilyGen.Partition;

/// <summary>How the weight of a panel was found.</summary>
internal enum PanelKind
{
    /// <summary>A Gauss rule over an interval of the integration coordinate.</summary>
    Interval,

    /// <summary>Lattice points, one by one.</summary>
    Terms,

    /// <summary>A Gauss rule over a run of lattice points.</summary>
    Run,
}

/// <summary>One panel of a sweep, from its lowest point up.</summary>
/// <param name="Kind">How its weight was found.</param>
/// <param name="Start">The offset of its lower end from the basin's reference point; on a lattice of its first point.</param>
/// <param name="Step">On a lattice, the distance between neighbouring points.</param>
/// <param name="Extent">Its width, or its number of points.</param>
/// <param name="Weight">Its weight relative to the integrand at the basin's reference point.</param>
internal readonly record struct Panel(PanelKind Kind, double Start, double Step, double Extent, double Weight)
{
    /// <summary>The offset of the upper end, or of the last point.</summary>
    public double End => Kind == PanelKind.Interval ? Start + Extent : Start + Step * (Extent - 1);
}
