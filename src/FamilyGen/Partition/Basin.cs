namespace FamilyGen.Partition;

/// <summary>A part of a piece on which the integrand has one mode: the mode, and the ends of the part as observations. On a
/// lattice the ends are its first and last point.</summary>
internal readonly record struct Basin(Piece Piece, Kernels.Point Mode, double Lower, double Upper);
