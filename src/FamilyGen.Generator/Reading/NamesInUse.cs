using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp.Syntax;

namespace FamilyGen.Generator.Reading;

/// <summary>Collects the names of the class that may collide with generated ones.</summary>
internal static class NamesInUse
{
    /// <summary>Notes the members that the user wrote and what the class inherits; the declaration with the former.</summary>
    public static FamilyDeclaration Collect(ReadingSession session, FamilyDeclaration declaration)
    {
        var own = new List<string>();
        foreach (var member in session.Family.GetMembers().Where(m => HasNameOfItsOwn(m) && !GeneratedFace.IsGenerated(m)))
        {
            session.Name(member.Name, NamedPieceKind.Member, session.Mark(member));
            own.Add(member.Name);
        }

        foreach (var constructor in session.Family.InstanceConstructors.Where(c => HasGeneratedArguments(c, declaration) && !GeneratedFace.IsGenerated(c)))
        {
            // One that hands nothing on is refused for that.
            if (ClassShape.IsChained(constructor, session))
                session.Name(session.Family.Name, NamedPieceKind.Constructor, session.Mark(constructor));
            own.Add(constructor.Name);
        }

        var family = session.Mark(session.Family);
        session.Name(session.Family.Name, NamedPieceKind.Member, family);
        for (var parent = session.Family.BaseType; parent is not null; parent = parent.BaseType)
        {
            foreach (var member in parent.GetMembers().Where(m => HasNameOfItsOwn(m) && m.DeclaredAccessibility != Accessibility.Private))
                session.Name(member.Name, NamedPieceKind.Inherited, family);
        }

        return declaration with { MemberNames = own.Distinct().ToEquatableArray() };
    }

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

    private static bool HasGeneratedArguments(IMethodSymbol constructor, FamilyDeclaration declaration)
    {
        var parameters = declaration.IsTrade ? declaration.Parameters.Count : declaration.Statistics.Count;
        var types = Enumerable.Repeat("double", parameters).Concat(declaration.Known.Select(k => k.Type));
        return !constructor.IsImplicitlyDeclared && constructor.Parameters.Select(p => p.Type.ToDisplayString()).SequenceEqual(types);
    }

    private static bool HasNameOfItsOwn(ISymbol member) =>
        !member.IsImplicitlyDeclared
        && member.CanBeReferencedByName
        && member is not IMethodSymbol { AssociatedSymbol: not null };
}
