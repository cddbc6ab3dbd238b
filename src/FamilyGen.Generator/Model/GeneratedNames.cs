using System.Collections.Generic;

namespace FamilyGen.Generator.Model;

/// <summary>The names that generated code takes in every family.</summary>
internal static class GeneratedNames
{
    private static readonly HashSet<string> s_ofParameters =
    [
        "Natural", "LogNormalizer", "MeanStatistics", "StatisticCovariance", "LogDensity", "Density", "Cdf", "Survival",
        "Hazard", "Quantile", "Mean", "Variance", "Entropy", "Sample",
    ];

    private static readonly HashSet<string> s_ofDeclaration =
    [
        "Statistics", "LogBase", "InSupport", "IsNatural", "FromNatural", "Fit", "TryFit", "Accumulator", "KernelForm", "At",
        "_distribution",
    ];

    private static readonly HashSet<string> s_ofKernel =
    [
        "Count", "Domain", "NaturalSet", "NaturalNames", "Evaluate", "Slopes", "Residuals", "Derivative", "ParameterNames",
        "TryParameters", "ParameterRange", "Equals", "GetHashCode", "ToString", "GetType", "Deconstruct",
    ];

    /// <summary>Members whose value depends on the parameters.</summary>
    public static bool DependsOnParameters(string name) => s_ofParameters.Contains(name);

    /// <summary>Members of every family.</summary>
    public static bool IsReserved(string name) => s_ofParameters.Contains(name) || s_ofDeclaration.Contains(name);

    /// <summary>Members of the kernel inside it, whose properties the known values become.</summary>
    public static bool IsReservedInKernel(string name) => s_ofKernel.Contains(name);

    /// <summary>The property that a trade parameter or known value becomes: shape → Shape.</summary>
    public static string PropertyOf(string parameter) => parameter.Length == 0 ? "" : char.ToUpperInvariant(parameter[0]) + parameter.Substring(1);

    /// <summary>The natural parameter that a statistic's name stands for: LogUnits → logUnits.</summary>
    public static string ParameterOf(string statistic) => statistic.Length == 0 ? "" : char.ToLowerInvariant(statistic[0]) + statistic.Substring(1);
}
