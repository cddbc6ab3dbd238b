using System.Linq;
using Microsoft.CodeAnalysis;

namespace FamilyGen.Generator.Reading;

/// <summary>How a type is spelled when a further part of it is written.</summary>
internal static class SyntaxFactsOf
{
    public static string Accessibility(Accessibility accessibility) => accessibility switch
    {
        Microsoft.CodeAnalysis.Accessibility.Public => "public",
        Microsoft.CodeAnalysis.Accessibility.Private => "private",
        Microsoft.CodeAnalysis.Accessibility.Protected => "protected",
        Microsoft.CodeAnalysis.Accessibility.ProtectedOrInternal => "protected internal",
        Microsoft.CodeAnalysis.Accessibility.ProtectedAndInternal => "private protected",
        _ => "internal",
    };

    public static string Keyword(INamedTypeSymbol type) => type switch
    {
        { IsRecord: true, TypeKind: TypeKind.Struct } => "record struct",
        { IsRecord: true } => "record",
        { TypeKind: TypeKind.Struct } => "struct",
        { TypeKind: TypeKind.Interface } => "interface",
        _ => "class",
    };

    public static string TypeParameters(INamedTypeSymbol type) => type.TypeParameters.IsEmpty
        ? ""
        : "<" + string.Join(", ", type.TypeParameters.Select(p => p.Name)) + ">";
}
