using System.Collections.Generic;
using Microsoft.CodeAnalysis.CSharp;

namespace FamilyGen.Generator.Emission;

/// <summary>C# names made from the modeller's own.</summary>
internal static class Names
{
    /// <summary>shape → Shape.</summary>
    public static string Pascal(string name) =>
        name.Length == 0 ? name : char.ToUpperInvariant(name[0]) + name.Substring(1);

    /// <summary>A name as an identifier: keywords get their @.</summary>
    public static string Identifier(string name) =>
        SyntaxFacts.GetKeywordKind(name) != SyntaxKind.None || SyntaxFacts.GetContextualKeywordKind(name) != SyntaxKind.None
            ? "@" + name
            : name;

    /// <summary>The preferred name, or the first of preferred2, preferred3 … that is not taken.</summary>
    public static string Unique(string preferred, ICollection<string> taken)
    {
        var name = preferred;
        for (var i = 2; taken.Contains(name); i++)
            name = preferred + i;
        return name;
    }
}
