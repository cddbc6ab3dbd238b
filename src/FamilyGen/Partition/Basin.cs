namespace FamilyGen.Partition;

/// <summary>A part of a piece on which the integrand has one mode: the mode, and the ends of the part as observations. On a
/// lattice the ends are its first and last point.</summary>
/// <param name="Piece">The piece.</param>
/// <param name="Mode">The mode.</param>
/// <param name="Lower">The lower end.</param>
/// <param name="Upper">The upper end.</param>
/// <param name="IsProven">Whether it is proved to have no second mode.</param>
internal readonly record struct Basin(Piece Piece, Kernels.Point Mode, double Lower, double Upper, bool IsProven);
