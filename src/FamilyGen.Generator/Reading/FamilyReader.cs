using System.Collections.Immutable;
using System.Linq;
using System.Threading;
using FamilyGen.Generator.Model;
using Microsoft.CodeAnalysis;

namespace FamilyGen.Generator.Reading;

/// <summary>Reads one declaration: the class that carries [Family], with its members as formulas.</summary>
internal static class FamilyReader
{
    public const string FamilyAttribute = "FamilyGen.FamilyAttribute";

    /// <summary>The reading, and for every origin in it the place in the source.</summary>
    public static (FamilyReading Reading, ImmutableArray<Location> Locations) Read(
        Compilation compilation, INamedTypeSymbol family, CancellationToken cancellation)
    {
        var first = ReadOnce(compilation, family, cancellation);
        if (first.Reading.IsReadable || !first.Reading.CanBeCompleted)
            return first;

        // A name did not bind. It may be one that we generate, so look again with those in place.
        var completed = MissingFace.Complete(compilation, family, first.Reading.Declaration, cancellation);
        return completed.Assembly.GetTypeByMetadataName(first.Reading.Declaration.MetadataName) is { } again
            ? ReadOnce(completed, again, cancellation)
            : first;
    }

    private static (FamilyReading Reading, ImmutableArray<Location> Locations) ReadOnce(
        Compilation compilation, INamedTypeSymbol family, CancellationToken cancellation)
    {
        var session = new ReadingSession(compilation, family, cancellation);
        var canBeCompleted = ClassShape.Check(session);
        var members = DeclaredMembers.Find(session);
        var declaration = new DeclarationReader(session, members).Read();
        declaration = NamesInUse.Collect(session, declaration);
        var reading = new FamilyReading(
            declaration, canBeCompleted, session.IsReadable, session.Faults, session.Dependencies, session.Names) { IntegerSteps = session.IntegerSteps };
        return (reading, session.Locations.ToImmutableArray());
    }
}
