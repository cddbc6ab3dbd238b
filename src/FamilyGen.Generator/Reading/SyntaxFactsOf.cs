using Microsoft.CodeAnalysis;

namespace FamilyGen.Generator.Reading;

/// <summary>How a type is spelled when a further part of it is written.</summary>
internal static class SyntaxFactsOf
{
    /// <summary>From where a type can be named: "public", "internal", or "private" where an enclosing type hides it.</summary>
    public static string Accessibility(INamedTypeSymbol type)
    {
        var widest = "public";
        for (var current = type; current is not null; current = current.ContainingType)
        {
            switch (current.DeclaredAccessibility)
            {
                case Microsoft.CodeAnalysis.Accessibility.Public:
                    break;
                case Microsoft.CodeAnalysis.Accessibility.Internal or Microsoft.CodeAnalysis.Accessibility.ProtectedOrInternal:
                    widest = "internal";
                    break;
                default:
                    return "private";
            }
        }

        return widest;
    }

    public static string Keyword(INamedTypeSymbol type) => type switch
    {
        { IsRecord: true, TypeKind: TypeKind.Struct } => "record struct",
        { IsRecord: true } => "record",
        { TypeKind: TypeKind.Struct } => "struct",
        { TypeKind: TypeKind.Interface } => "interface",
        _ => "class",
    };
}
