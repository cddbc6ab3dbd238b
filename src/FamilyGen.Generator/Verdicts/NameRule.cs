using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>FG0002: names that collide with generated members, with each other once generated, or that hide the function
/// which their own body calls.</summary>
internal static class NameRule
{
    // Properties of these names would hide the constants of System.Math.
    private static readonly HashSet<string> s_constants = ["E", "PI", "Tau"];

    public static IEnumerable<Finding> Find(FamilyReading reading)
    {
        var pieces = reading.Names;
        return pieces.SelectMany(piece => Reasons(piece, reading).Take(1).Select(why => Collision(piece, why)));
    }

    private static IEnumerable<string> Reasons(NamedPiece piece, FamilyReading reading) => piece.Kind switch
    {
        NamedPieceKind.Member => OfMember(piece),
        NamedPieceKind.TradeParameter => OfParameter(piece, reading),
        NamedPieceKind.NaturalParameter => OfNaturalParameter(piece, reading),
        NamedPieceKind.Known => OfKnown(piece, reading),
        NamedPieceKind.Constructor => ["the generated constructor takes the same arguments"],
        NamedPieceKind.CallOfItself => [$"'{piece.Name}' hides the function '{piece.Name}' that its body calls, so it would call itself"],
        _ => [],
    };

    private static Finding Collision(NamedPiece piece, string why) =>
        new(DiagnosticIds.NameCollision, piece.Origin, EquatableArray.Of(piece.Name, why));

    private static IEnumerable<string> OfMember(NamedPiece piece)
    {
        if (GeneratedNames.IsReserved(piece.Name))
            yield return GeneratedAnyway(piece.Name);
    }

    private static IEnumerable<string> OfParameter(NamedPiece piece, FamilyReading reading)
    {
        var property = GeneratedNames.PropertyOf(piece.Name);
        if (GeneratedNames.IsReserved(property))
            yield return $"the parameter becomes the property '{property}', and {GeneratedAnyway(property)}";
        else if (s_constants.Contains(property))
            yield return $"the parameter becomes the property '{property}', which hides the constant of that name in every formula of the class";
        foreach (var other in reading.Names.Where(n => n.Kind is NamedPieceKind.Member or NamedPieceKind.Inherited && n.Name == property))
            yield return $"the parameter becomes the property '{property}', and the class has {(other.Kind == NamedPieceKind.Member ? "" : "inherited ")}'{property}' already";
        foreach (var other in Before(piece, reading, NamedPieceKind.TradeParameter).Where(n => n.Name != piece.Name && GeneratedNames.PropertyOf(n.Name) == property))
            yield return $"the parameters '{other.Name}' and '{piece.Name}' would both become the property '{property}'";
    }

    private static IEnumerable<string> OfNaturalParameter(NamedPiece piece, FamilyReading reading)
    {
        if (Before(piece, reading, NamedPieceKind.NaturalParameter).Any(n => n.Name == piece.Name))
            yield return "another statistic has the same natural parameter";
    }

    private static IEnumerable<string> OfKnown(NamedPiece piece, FamilyReading reading)
    {
        var property = GeneratedNames.PropertyOf(piece.Name);
        if (Before(piece, reading, NamedPieceKind.Known).Any(n => n.Name == piece.Name))
            yield break;
        if (GeneratedNames.IsReserved(property))
            yield return $"the known value becomes the property '{property}', and {GeneratedAnyway(property)}";
        else if (GeneratedNames.IsReservedInKernel(property))
            yield return $"the known value becomes the property '{property}' of the generated kernel, which has a member '{property}' of its own";
        else if (s_constants.Contains(property))
            yield return $"the known value becomes the property '{property}', which hides the constant of that name in every formula of the class";
        foreach (var other in reading.Names.Where(n => n != piece))
        {
            switch (other.Kind)
            {
                case NamedPieceKind.Member or NamedPieceKind.Inherited when other.Name == property:
                    yield return $"the known value becomes the property '{property}', and the class has '{property}' already";
                    break;
                case NamedPieceKind.Observation or NamedPieceKind.NaturalParameter when other.Name == piece.Name:
                    yield return $"{(other.Kind == NamedPieceKind.Observation ? "the observation" : "a natural parameter")} has it too, and both are arguments of generated members";
                    break;
                case NamedPieceKind.TradeParameter when other.Name != piece.Name && GeneratedNames.PropertyOf(other.Name) == property:
                    yield return $"the parameter '{other.Name}' and the known value '{piece.Name}' would both become the property '{property}'";
                    break;
                case NamedPieceKind.Known when other.Origin < piece.Origin && other.Name != piece.Name && GeneratedNames.PropertyOf(other.Name) == property:
                    yield return $"the known values '{other.Name}' and '{piece.Name}' would both become the property '{property}'";
                    break;
            }
        }
    }

    private static IEnumerable<NamedPiece> Before(NamedPiece piece, FamilyReading reading, NamedPieceKind kind) =>
        reading.Names.Where(n => n.Kind == kind && n.Origin < piece.Origin);

    private static string GeneratedAnyway(string name) => $"every family has a generated member '{name}'";
}
