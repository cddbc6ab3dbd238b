namespace FamilyGen.Partition;

/// <summary>Receives the panels of a sweep. Offsets are those of the basin's frame; every panel is given by its lowest
/// point and carries its weight relative to the integrand at the reference point.</summary>
internal interface IPanelSink
{
    /// <summary>An interval of the integration coordinate.</summary>
    void AddInterval(double start, double width, double weight);

    /// <summary>Lattice points that were summed one by one.</summary>
    void AddTerms(double start, double step, int count, double weight);

    /// <summary>A run of lattice points under a Gauss rule.</summary>
    void AddRun(double start, double step, double count, double weight);
}
