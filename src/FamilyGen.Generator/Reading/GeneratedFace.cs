using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;
using Microsoft.CodeAnalysis;

namespace FamilyGen.Generator.Reading;

/// <summary>The generated members as the reader meets them: the generator never sees them and the analyzer does, and both
/// must read the same.</summary>
internal static class GeneratedFace
{
    /// <summary>The path of the file in which members are made up while they are not generated yet.</summary>
    public const string MadeUpFile = "FamilyGen.MadeUpFace.g.cs";

    // Each with the declaration by which it is made up. All are static there, so that a use binds in whatever member.
    private static readonly (string Name, string Declaration)[] s_declarations =
    [
        ("Natural", "double[] Natural => null!;"),
        ("LogNormalizer", "double LogNormalizer => 0;"),
        ("MeanStatistics", "double[] MeanStatistics => null!;"),
        ("StatisticCovariance", "double[,] StatisticCovariance => null!;"),
        ("LogDensity", "double LogDensity(double x) => 0;"),
        ("Density", "double Density(double x) => 0;"),
        ("Cdf", "double Cdf(double x) => 0;"),
        ("Survival", "double Survival(double x) => 0;"),
        ("Hazard", "double Hazard(double x) => 0;"),
        ("Quantile", "double Quantile(double p) => 0;"),
        ("Mean", "double Mean => 0;"),
        ("Variance", "double Variance => 0;"),
        ("Entropy", "double Entropy => 0;"),
        ("Sample", "double Sample(global::System.Random random) => 0;"),
        ("LogBase", "double LogBase(double x) => 0;"),
        ("InSupport", "bool InSupport(double x) => true;"),
        ("IsNatural", "bool IsNatural(double[] natural) => true;"),
    ];

    /// <summary>The declarations of those members that a class, as the reader sees it, does not have yet.</summary>
    public static IEnumerable<string> MissingMembers(FamilyDeclaration declaration, INamedTypeSymbol family)
    {
        foreach (var (name, text) in s_declarations)
        {
            if (family.GetMembers(name).IsEmpty)
                yield return "static " + text;
        }

        var parameters = declaration.Parameters.SelectMany(p => new[] { GeneratedNames.PropertyOf(p.Name), p.Name });
        foreach (var name in parameters.Concat(declaration.Statistics.Select(s => s.Parameter)).Distinct())
        {
            if (name.Length > 0 && family.GetMembers(name).IsEmpty)
                yield return "static double @" + name + " => 0;";
        }
    }

    /// <summary>Whether a member exists only because the generator (or <see cref="MissingFace"/>) wrote it.</summary>
    public static bool IsGenerated(ISymbol symbol) =>
        !symbol.DeclaringSyntaxReferences.IsEmpty && symbol.DeclaringSyntaxReferences.All(r => IsGeneratedFile(r.SyntaxTree.FilePath));

    /// <summary>Whether what was generated for the family is only the stub of a refused declaration.</summary>
    public static bool IsStub(INamedTypeSymbol family) =>
        family.GetTypeMembers("KernelForm").IsEmpty && family.GetMembers("LogNormalizer").Any(IsGenerated);

    private static bool IsGeneratedFile(string path) =>
        path == MadeUpFile || path.IndexOf(typeof(FamilyGenerator).FullName, StringComparison.Ordinal) >= 0;
}
