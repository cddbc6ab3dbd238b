using System.Linq;
using System.Text;
using System.Threading;
using FamilyGen.Generator.Model;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;

namespace FamilyGen.Generator.Reading;

/// <summary>Lets a use of a generated member bind although the member is not generated yet: a support that reads the
/// property Shape is then read in the generator as it is in the analyzer.</summary>
internal static class MissingFace
{
    /// <summary>The compilation with the family's missing members made up.</summary>
    public static Compilation Complete(
        Compilation compilation, INamedTypeSymbol family, FamilyDeclaration declaration, CancellationToken cancellation)
    {
        var options = compilation.SyntaxTrees.FirstOrDefault()?.Options as CSharpParseOptions;
        var tree = CSharpSyntaxTree.ParseText(
            Text(family, declaration), options, GeneratedFace.MadeUpFile, cancellationToken: cancellation);
        return compilation.AddSyntaxTrees(tree);
    }

    private static string Text(INamedTypeSymbol family, FamilyDeclaration declaration)
    {
        var text = new StringBuilder("#nullable enable\n");
        if (declaration.Namespace.Length > 0)
            text.Append("namespace ").Append(declaration.Namespace).Append(";\n");
        foreach (var shell in declaration.Outer)
            text.Append("partial ").Append(shell.Keyword).Append(" @").Append(shell.Name).Append(" {\n");
        text.Append("partial class @").Append(declaration.Name).Append(" {\n");
        foreach (var member in GeneratedFace.MissingMembers(declaration, family))
            text.Append(member).Append('\n');
        text.Append('}', declaration.Outer.Count + 1);
        return text.ToString();
    }
}
