using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;
using Microsoft.CodeAnalysis;

namespace FamilyGen.Generator.Reading;

/// <summary>The names of the members that are generated for every family. The generator never sees them and the analyzer
/// does, so both ask here, by name.</summary>
internal static class GeneratedFace
{
    /// <summary>The path of the file in which members are made up while they are not generated yet.</summary>
    public const string MadeUpFile = "FamilyGen.MadeUpFace.g.cs";

    // Each with the declaration by which it is made up. All are static there, so that a use binds in whatever member.
    private static readonly (string Name, string Declaration)[] s_ofParameters =
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
    ];

    private static readonly string[] s_ofDeclaration =
    [
        "Statistics", "LogBase", "InSupport", "IsNatural", "FromNatural", "Fit", "TryFit", "Accumulator", "KernelForm", "At",
    ];

    /// <summary>Members whose value depends on the parameters.</summary>
    public static bool DependsOnParameters(string name) => s_ofParameters.Any(m => m.Name == name);

    public static bool IsReserved(string name) => DependsOnParameters(name) || s_ofDeclaration.Contains(name);

    /// <summary>The property that a trade parameter becomes: shape → Shape.</summary>
    public static string PropertyName(string parameter)
    {
        var first = char.ToUpperInvariant(parameter[0]);
        return first + parameter.Substring(1);
    }

    /// <summary>The parameter that a statistic's name stands for: LogUnits → logUnits.</summary>
    public static string ParameterName(string statistic)
    {
        var first = char.ToLowerInvariant(statistic[0]);
        return first + statistic.Substring(1);
    }

    /// <summary>The declarations of those members that a class, as the reader sees it, does not have yet.</summary>
    public static IEnumerable<string> MissingMembers(FamilyDeclaration declaration, INamedTypeSymbol family)
    {
        foreach (var (name, text) in s_ofParameters)
        {
            if (family.GetMembers(name).IsEmpty)
                yield return "static " + text;
        }

        foreach (var name in declaration.Parameters.SelectMany(p => new[] { PropertyName(p.Name), p.Name }).Distinct())
        {
            if (family.GetMembers(name).IsEmpty)
                yield return "static double @" + name + " => 0;";
        }
    }

    /// <summary>Whether a member exists only because the generator (or <see cref="MissingFace"/>) wrote it.</summary>
    public static bool IsGenerated(ISymbol symbol) =>
        !symbol.DeclaringSyntaxReferences.IsEmpty && symbol.DeclaringSyntaxReferences.All(r => IsGeneratedFile(r.SyntaxTree.FilePath));

    private static bool IsGeneratedFile(string path) =>
        path == MadeUpFile || path.IndexOf(typeof(FamilyGenerator).FullName, StringComparison.Ordinal) >= 0;
}
