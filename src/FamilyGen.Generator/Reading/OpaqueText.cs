using System.Linq;
using Microsoft.CodeAnalysis;

namespace FamilyGen.Generator.Reading;

/// <summary>The C# expression by which an opaque member is evaluated, with {0}, {1} … for its arguments.</summary>
internal static class OpaqueText
{
    public static string Of(ISymbol member)
    {
        var name = member.ContainingType.ToDisplayString(SymbolDisplayFormat.FullyQualifiedFormat) + ".@" + member.Name;
        return member switch
        {
            IMethodSymbol method => Wrap(
                name + "(" + string.Join(", ", method.Parameters.Select((p, i) => Argument(p.Type, i))) + ")", method.ReturnType),
            IPropertySymbol property => Wrap(name, property.Type),
            IFieldSymbol field => Wrap(name, field.Type),
            _ => name,
        };
    }

    private static string Argument(ITypeSymbol type, int index) => type.SpecialType switch
    {
        SpecialType.System_Double => $"{{{index}}}",
        SpecialType.System_Boolean => $"({{{index}}}) != 0",
        _ => $"({type.ToDisplayString(SymbolDisplayFormat.FullyQualifiedFormat)})({{{index}}})",
    };

    private static string Wrap(string call, ITypeSymbol type) => type.SpecialType switch
    {
        SpecialType.System_Double => call,
        SpecialType.System_Boolean => $"({call} ? 1.0 : 0.0)",
        _ => "(double)" + call,
    };
}
