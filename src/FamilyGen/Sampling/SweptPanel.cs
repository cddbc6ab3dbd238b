namespace FamilyGen.Sampling;

internal enum PanelShape
{
    /// <summary>An interval of the integration coordinate, of width Step.</summary>
    Interval,

    /// <summary>Lattice points that were summed one by one, Step apart.</summary>
    Terms,

    /// <summary>A run of lattice points under a Gauss rule, Step apart.</summary>
    Run,
}

/// <summary>A panel of a sweep, given by its lowest point as an offset in the frame of its part of the partition.</summary>
internal readonly record struct SweptPanel(PanelShape Shape, int Part, double Start, double Step, double Count, double Weight);
