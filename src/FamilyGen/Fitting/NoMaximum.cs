using System;
using System.Globalization;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>The account of why the data have no maximum of the likelihood, in the modeller's words.</summary>
internal static class NoMaximum
{
    private const string Advice = "More varied data may determine it; else leave the statistic out, or make its parameter a known value";

    /// <summary>What can be said before any search, or null.</summary>
    public static string? BeforeSearch<TKernel>(StatisticSums<TKernel> sums, string family)
        where TKernel : struct, IKernel
    {
        if (sums.Count == 0)
            return $"{family} cannot be fitted: there are no observations.";
        return sums.TotalWeight > 0 ? null : $"{family} cannot be fitted: the weights of all {Number(sums.Count)} observations are 0.";
    }

    /// <summary>The account of a search that found no maximum.</summary>
    public static string Account<TKernel>(StatisticSums<TKernel> sums, string family, SearchPath path)
        where TKernel : struct, IKernel
    {
        if (path.Points.Count == 0)
            return $"{family} cannot be fitted: the search for the maximum of the likelihood found no place to start. {Sentence(path.Reason)}{Cause(sums)}{Advice}.";
        if (path.Direction() is { } direction)
            return $"{family} has no maximum-likelihood fit to these data: the likelihood never stops rising as {direction}. {Cause(sums)}{Advice}.";
        return $"{family} could not be fitted: the search for the maximum of the likelihood stopped after {Number(path.Points.Count - 1)} steps at "
            + $"{Values(path.Names, path.Points[^1])}. {Sentence(path.Reason)}{Cause(sums)}{Advice}.";
    }

    /// <summary>A sentence, with a blank after it, on what in the data leaves the parameters undetermined.</summary>
    public static string Cause<TKernel>(StatisticSums<TKernel> sums)
        where TKernel : struct, IKernel
    {
        var distinct = sums.Distinct.Values;
        var domain = sums.Kernel.Domain;
        if (distinct.Length == 1)
        {
            var end = distinct[0] == domain.Lower ? ", the smallest value the support allows"
                : distinct[0] == domain.Upper ? ", the largest value the support allows"
                : "";
            return sums.Count == 1
                ? $"There is a single observation, {ObservationRule.Text(distinct[0])}{end}. "
                : $"Every one of the {Number(sums.Count)} observations is {ObservationRule.Text(distinct[0])}{end}. ";
        }

        for (var j = 0; j < TKernel.Count; j++)
        {
            if (sums.Smallest[j] == sums.Largest[j] && ExtremeOf(sums, j) is { } extreme)
            {
                return $"The statistic of '{TKernel.NaturalNames[j]}' is {ObservationRule.Text(sums.Smallest[j])} in every observation, "
                    + $"and no value of the support has a {extreme} one. ";
            }
        }

        if (distinct.Length > 0 && distinct.Length <= TKernel.Count + 1)
        {
            var values = new string[distinct.Length];
            for (var i = 0; i < values.Length; i++)
                values[i] = ObservationRule.Text(distinct[i]);
            return $"The {Number(sums.Count)} observations take only the values {string.Join(", ", values[..^1])} and {values[^1]}, "
                + $"which do not determine {Number(TKernel.Count)} parameter{(TKernel.Count == 1 ? "" : "s")}. ";
        }

        return "The means of the statistics lie on the edge of what the laws of the family can have. ";
    }

    /// <summary>Whether the value that statistic j has in all data is the least ("smaller") or the greatest ("larger") on the
    /// support; null when neither.</summary>
    private static string? ExtremeOf<TKernel>(StatisticSums<TKernel> sums, int j)
        where TKernel : struct, IKernel
    {
        var value = new double[TKernel.Count + 1];
        var remainder = new double[TKernel.Count + 1];
        var constant = sums.Smallest[j];
        var (isLeast, isGreatest) = (true, true);
        foreach (var x in SupportProbe.Points(sums.Kernel.Domain, sums.Minimum, sums.Maximum))
        {
            sums.Kernel.Evaluate(sums.Kernel.Domain.At(x), value, remainder);
            if (!double.IsFinite(value[TKernel.Count]))
                continue;
            isLeast &= !(value[j] < constant);
            isGreatest &= !(value[j] > constant);
        }

        return isLeast == isGreatest ? null : isLeast ? "smaller" : "larger";
    }

    private static string Values(string[] names, double[] values)
    {
        var parts = new string[names.Length];
        for (var i = 0; i < parts.Length; i++)
            parts[i] = $"{names[i]} = {values[i].ToString("G6", CultureInfo.InvariantCulture)}";
        return string.Join(", ", parts);
    }

    private static string Sentence(string? reason) => reason is null ? "" : $"{char.ToUpperInvariant(reason[0])}{reason[1..].TrimEnd('.')}. ";

    private static string Number(long n) => n.ToString(CultureInfo.InvariantCulture);
}
