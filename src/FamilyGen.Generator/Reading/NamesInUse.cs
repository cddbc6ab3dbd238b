using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp.Syntax;

namespace FamilyGen.Generator.Reading;

/// <summary>Collects the names of the class that may collide with generated ones.</summary>
internal static class NamesInUse
{
    /// <summary>The members that the user wrote, and what the class inherits.</summary>
    public static void Collect(ReadingSession session)
    {
        foreach (var member in OwnMembers(session))
            session.Name(member.Name, NamedPieceKind.Member, session.Mark(member));
        var family = session.Mark(session.Family);
        session.Name(session.Family.Name, NamedPieceKind.Member, family);
        for (var parent = session.Family.BaseType; parent is not null; parent = parent.BaseType)
        {
            foreach (var member in parent.GetMembers().Where(m => HasNameOfItsOwn(m) && m.DeclaredAccessibility != Accessibility.Private))
                session.Name(member.Name, NamedPieceKind.Inherited, family);
        }
    }

    /// <summary>The names of the members that the user wrote.</summary>
    public static IEnumerable<string> Own(ReadingSession session) => OwnMembers(session).Select(m => m.Name).Distinct();

    /// <summary>Whether a member calls a known function by the member's own name, and so itself instead.</summary>
    public static bool CallsItself(ReadingSession session, ISymbol member)
    {
        if (!SupportedFunctions.HasName(member.Name))
            return false;
        var calls = member.DeclaringSyntaxReferences
            .SelectMany(r => r.GetSyntax(session.Cancellation).DescendantNodes().OfType<InvocationExpressionSyntax>())
            .Select(c => c.Expression).OfType<IdentifierNameSyntax>().Where(n => n.Identifier.ValueText == member.Name)
            .ToList();
        foreach (var call in calls)
            session.Name(member.Name, NamedPieceKind.CallOfItself, session.Mark(call));
        return calls.Count > 0;
    }

    private static IEnumerable<ISymbol> OwnMembers(ReadingSession session) =>
        session.Family.GetMembers().Where(m => HasNameOfItsOwn(m) && !GeneratedFace.IsGenerated(m));

    private static bool HasNameOfItsOwn(ISymbol member) =>
        !member.IsImplicitlyDeclared
        && member.CanBeReferencedByName
        && member is not IMethodSymbol { AssociatedSymbol: not null };
}
