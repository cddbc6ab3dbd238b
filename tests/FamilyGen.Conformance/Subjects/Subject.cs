using System;
using System.Collections.Generic;

namespace FamilyGen.Conformance.Subjects;

/// <summary>One law of a family, with what the reference values speak about.</summary>
internal sealed record Law(double LogNormalizer, double[] Mean, double[,] Covariance, Func<double, double> LogDensity);

/// <summary>A generated family seen through delegates, so that one test serves them all.</summary>
/// <param name="Name">The file of reference values.</param>
/// <param name="IsCount">Whether observations are counts.</param>
/// <param name="At">The law at natural parameters.</param>
/// <param name="IsNatural">Whether the normalizer is finite there.</param>
/// <param name="Terms">T₁(x) …, log h(x): the sizes of what is added up in a log-density.</param>
/// <param name="Outside">Natural parameters that are plainly outside the set.</param>
internal sealed record Subject(
    string Name,
    bool IsCount,
    Func<double[], Law> At,
    Func<double[], bool> IsNatural,
    Func<double, double[]> Terms,
    double[][] Outside)
{
    /// <summary>Every family of <c>reference/values</c>.</summary>
    public static IReadOnlyDictionary<string, Subject> All { get; } = Index([.. CountSubjects.All(), .. IntervalSubjects.All()]);

    private static Dictionary<string, Subject> Index(Subject[] subjects)
    {
        var index = new Dictionary<string, Subject>();
        foreach (var subject in subjects)
            index.Add(subject.Name, subject);
        return index;
    }
}
