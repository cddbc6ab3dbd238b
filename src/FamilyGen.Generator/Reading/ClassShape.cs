using System.Linq;
using FamilyGen.Generator.Diagnostics;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.CSharp.Syntax;

namespace FamilyGen.Generator.Reading;

/// <summary>Whether the class is one that generated code can complete.</summary>
internal static class ClassShape
{
    /// <summary>Reports what is wrong; false where not even stubs can be added.</summary>
    public static bool Check(ReadingSession session)
    {
        var family = session.Family;
        var origin = session.Mark(family);
        return CheckPartial(session, origin) & CheckKind(session, origin) & CheckBase(session, origin) & CheckGeneric(session, origin);
    }

    private static bool CheckPartial(ReadingSession session, int origin)
    {
        var family = session.Family;
        if (!IsPartial(family, session))
        {
            session.Refuse(origin, ShapeFault.NotPartial(family.Name));
            return false;
        }

        for (var outer = family.ContainingType; outer is not null; outer = outer.ContainingType)
        {
            if (IsPartial(outer, session))
                continue;
            session.Refuse(session.Mark(outer), ShapeFault.OuterNotPartial(outer.Name, family.Name));
            return false;
        }

        return true;
    }

    private static bool IsPartial(INamedTypeSymbol type, ReadingSession session) =>
        type.DeclaringSyntaxReferences.Any(r =>
            r.GetSyntax(session.Cancellation) is TypeDeclarationSyntax declaration && declaration.Modifiers.Any(SyntaxKind.PartialKeyword));

    private static bool CheckKind(ReadingSession session, int origin)
    {
        var family = session.Family;
        var what = family switch
        {
            { IsRecord: true } => "a record",
            { TypeKind: not TypeKind.Class } => "a " + family.TypeKind.ToString().ToLowerInvariant(),
            { IsStatic: true } => "a static class",
            { IsAbstract: true } => "an abstract class",
            { IsFileLocal: true } => "a class of one file only",
            _ => null,
        };
        if (what is null)
            return true;
        session.Refuse(origin, ShapeFault.NotAnOrdinaryClass(family.Name, what));
        return false;
    }

    private static bool CheckBase(ReadingSession session, int origin)
    {
        var family = session.Family;
        if (family.InstanceConstructors.Any(c => c.DeclaringSyntaxReferences.Any(r => r.GetSyntax(session.Cancellation) is TypeDeclarationSyntax)))
        {
            session.Refuse(origin, ShapeFault.PrimaryConstructor(family.Name));
            return false;
        }

        CheckConstructors(session);
        if (family.BaseType is not { SpecialType: not SpecialType.System_Object, TypeKind: not TypeKind.Error } parent
            || parent.InstanceConstructors.Any(c => c.Parameters.All(p => p.IsOptional) && session.Compilation.IsSymbolAccessibleWithin(c, family)))
        {
            return true;
        }

        session.Refuse(origin, ShapeFault.BaseWithoutConstructor(family.Name, parent.Name));
        return false;
    }

    // A constructor that does not pass its values on would leave an instance without parameters.
    private static void CheckConstructors(ReadingSession session)
    {
        foreach (var constructor in session.Family.InstanceConstructors)
        {
            if (!constructor.IsImplicitlyDeclared && !GeneratedFace.IsGenerated(constructor) && !IsChained(constructor, session))
                session.Refuse(session.Mark(constructor), ShapeFault.UnchainedConstructor(session.Family.Name));
        }
    }

    /// <summary>Whether a constructor calls another one of its class.</summary>
    public static bool IsChained(IMethodSymbol constructor, ReadingSession session) =>
        constructor.DeclaringSyntaxReferences.Any(r =>
            r.GetSyntax(session.Cancellation) is ConstructorDeclarationSyntax { Initializer.RawKind: (int)SyntaxKind.ThisConstructorInitializer });

    private static bool CheckGeneric(ReadingSession session, int origin)
    {
        var family = session.Family;
        if (family.TypeParameters.Length > 0)
        {
            session.Refuse(origin, ShapeFault.Generic(family.Name));
            return false;
        }

        for (var outer = family.ContainingType; outer is not null; outer = outer.ContainingType)
        {
            if (outer.TypeParameters.Length == 0)
                continue;
            session.Refuse(session.Mark(outer), ShapeFault.InGeneric(outer.Name, family.Name));
            return false;
        }

        return true;
    }
}
