using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Catalogue;

/// <summary>The exponent on a piece of the line in a canonical coordinate y.</summary>
/// <param name="Shapes">The exponent in y, Jacobian included.</param>
/// <param name="Piece">The piece as x, or as the distance u from the pole, runs over it.</param>
/// <param name="Lower">The lower end in y; null at −∞.</param>
/// <param name="Upper">The upper end in y; null at +∞.</param>
/// <param name="IsLog">Whether y is the logarithm of u: u = scale·eʸ; else x = origin + y.</param>
/// <param name="Origin">The pole from which u counts, or the origin of y.</param>
/// <param name="Side">1 where u counts upwards from the pole, −1 where it counts downwards.</param>
/// <param name="Scale">The scale of u.</param>
internal sealed record LineReading(
    Shapes Shapes, Piece Piece, Expression? Lower, Expression? Upper, bool IsLog, Polynomial Origin, int Side, Polynomial Scale)
{
    /// <summary>Whether y runs over the whole line.</summary>
    public bool IsWhole => Lower is null && Upper is null;
}
