using System;
using System.Globalization;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>What a single observation and its weight must satisfy before they may count, and the sentence that says so.</summary>
internal static class ObservationRule
{
    /// <summary>The rule that the observation breaks by where it lies, or null.</summary>
    public static string? BrokenBy(double x, Domain domain)
    {
        if (double.IsNaN(x))
            return "an observation must be a number. Leave the row out, or find what it should have been";
        if (double.IsInfinity(x))
            return "an observation must be finite. Leave the row out, or find what it should have been";
        if (domain.IsLattice && x != Math.Floor(x))
            return $"the support is {Describe(domain)}, and this is no whole number. Round it if it is a count; declare an Interval if it is a measurement";
        if (IsInside(x, domain))
            return null;
        if (x == domain.Lower || x == domain.Upper)
        {
            return $"the support is {Describe(domain)}, which is open at this end. If such values are genuine, close the end "
                + $"(.{(x == domain.Lower ? "IncludingLower" : "IncludingUpper")}()) or give the point a probability of its own (.WithMassAt)";
        }

        return $"the support is {Describe(domain)}. Correct the row, leave it out, or declare the support that the data have";
    }

    /// <summary>The rule that the kernel's values at the observation break, or null; the last entry belongs to log h.</summary>
    public static string? BrokenBy(ReadOnlySpan<double> values, ReadOnlySpan<string> names)
    {
        for (var j = 0; j < names.Length; j++)
        {
            if (double.IsFinite(values[j]))
                continue;
            return $"the statistic of '{names[j]}' is {Text(values[j])} there, and only finite statistics can be summed. "
                + "Change the unit of measurement, or write the statistic so that it is finite on the whole support";
        }

        var logBase = values[names.Length];
        if (double.IsNegativeInfinity(logBase))
            return "the base measure is 0 there (log h = −∞), so no parameters give it any probability. Correct the row, or leave it out";
        return double.IsFinite(logBase)
            ? null
            : $"log h is {Text(logBase)} there, and must be finite where an observation lies";
    }

    /// <summary>The rule that the weight breaks, or null.</summary>
    public static string? BrokenByWeight(double weight)
    {
        if (double.IsNaN(weight))
            return "a weight must be a number";
        if (weight < 0)
            return "a weight says how often the observation occurred and cannot be negative";
        return double.IsInfinity(weight) ? "a weight must be finite" : null;
    }

    /// <summary>The support as a person would write it.</summary>
    public static string Describe(Domain domain)
    {
        var masses = domain.Masses.IsEmpty ? "" : " with a probability of its own at " + string.Join(", ", Texts(domain));
        if (!domain.IsLattice)
        {
            return $"the {(domain.IsCircle ? "circle" : "interval")} {(domain.LowerIncluded ? '[' : '(')}{Text(domain.Lower)}, "
                + $"{Text(domain.Upper)}{(domain.UpperIncluded ? ']' : ')')}{masses}";
        }

        return (double.IsInfinity(domain.Lower), double.IsInfinity(domain.Upper)) switch
        {
            (true, true) => "all integers",
            (true, false) => $"the integers up to {Text(domain.Upper)}",
            (false, true) => $"the integers from {Text(domain.Lower)} on",
            _ => $"the integers {Text(domain.Lower)} to {Text(domain.Upper)}",
        };
    }

    /// <summary>A number in invariant writing.</summary>
    public static string Text(double x) => double.IsNaN(x) ? "NaN"
        : double.IsInfinity(x) ? (x > 0 ? "∞" : "−∞")
        : (x + 0.0).ToString("R", CultureInfo.InvariantCulture);

    private static bool IsInside(double x, Domain domain) =>
        (x > domain.Lower && x < domain.Upper)
        || (x == domain.Lower && (domain.LowerIncluded || domain.IsLattice))
        || (x == domain.Upper && (domain.UpperIncluded || domain.IsLattice))
        || domain.Masses.Contains(x);

    private static string[] Texts(Domain domain)
    {
        var texts = new string[domain.Masses.Length];
        for (var i = 0; i < texts.Length; i++)
            texts[i] = Text(domain.Masses[i]);
        return texts;
    }
}
