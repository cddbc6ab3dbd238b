using System;
using System.Globalization;
using System.Runtime.CompilerServices;
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

    /// <summary>The account of statistics that are tied to each other.</summary>
    public static string AccountOfTie<TKernel>(StatisticSums<TKernel> sums, string family, string relation)
        where TKernel : struct, IKernel =>
        $"{family} cannot be fitted: {relation}. Leave one of these statistics out{KnownValues(sums.Kernel)}.";

    /// <summary>The account of a search in the natural parameters that found no maximum.</summary>
    public static string Account<TKernel>(StatisticSums<TKernel> sums, string family, SearchPath path)
        where TKernel : struct, IKernel => Account(sums, family, path, path.Direction(Extremes(sums)) ?? path.Direction());

    /// <summary>The account of a search that can be told in the trade parameters.</summary>
    public static string Account<TKernel>(StatisticSums<TKernel> sums, string family, SearchPath trade, SearchPath natural)
        where TKernel : struct, IKernel => trade.Direction() is { } direction
        ? Account(sums, family, trade, direction)
        : Account(sums, family, natural);

    private static string Account<TKernel>(StatisticSums<TKernel> sums, string family, SearchPath path, string? direction)
        where TKernel : struct, IKernel
    {
        var cause = Cause(sums);
        if (direction is not null)
        {
            cause ??= FewValues(sums);
            cause ??= "The means of the statistics lie on the edge of what the laws of the family can have";
            return $"{family} has no maximum-likelihood fit to these data: the likelihood never stops rising as {direction}. {cause}. {Advice}.";
        }

        var where = path.Points.Count == 0
            ? $"{family} cannot be fitted: the search for the maximum of the likelihood found no place to start"
            : $"{family} could not be fitted: the search for the maximum of the likelihood stopped after {Number(path.Points.Count - 1)} steps at {Values(path.Names, path.Points[^1])}";
        return cause is null
            ? $"{where}. {Sentence(path.Reason)}Observations in another unit, or counted from a point among them, may be easier to fit."
            : $"{where}. {Sentence(path.Reason)}{cause}. {Advice}.";
    }

    /// <summary>What in the data leaves the parameters undetermined; null when nothing is known.</summary>
    private static string? Cause<TKernel>(StatisticSums<TKernel> sums)
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
                ? $"There is a single observation, {ObservationRule.Text(distinct[0])}{end}"
                : $"Every one of the {Number(sums.Count)} observations is {ObservationRule.Text(distinct[0])}{end}";
        }

        var extremes = Extremes(sums);
        for (var j = 0; j < TKernel.Count; j++)
        {
            if (extremes[j] != 0)
            {
                return $"The statistic of '{TKernel.NaturalNames[j]}' is {ObservationRule.Text(sums.Smallest[j])} in every observation, "
                    + $"and no value of the support has a {(extremes[j] > 0 ? "larger" : "smaller")} one";
            }
        }

        return null;
    }

    /// <summary>The observations' values where they are too few; null where they are not.</summary>
    private static string? FewValues<TKernel>(StatisticSums<TKernel> sums)
        where TKernel : struct, IKernel
    {
        var distinct = sums.Distinct.Values;
        if (distinct.Length == 0 || distinct.Length > TKernel.Count + 1)
            return null;
        var values = new string[distinct.Length];
        for (var i = 0; i < values.Length; i++)
            values[i] = ObservationRule.Text(distinct[i]);
        return $"The {Number(sums.Count)} observations take only the values {string.Join(", ", values[..^1])} and {values[^1]}, "
            + $"which do not determine {Number(TKernel.Count)} parameter{(TKernel.Count == 1 ? "" : "s")}";
    }

    /// <summary>For each statistic 1 where all data have the largest value it takes on the support, −1 where they have the
    /// smallest, else 0: in that direction of its parameter the likelihood cannot stop rising.</summary>
    private static int[] Extremes<TKernel>(StatisticSums<TKernel> sums)
        where TKernel : struct, IKernel
    {
        var k = TKernel.Count;
        var (isLeast, isGreatest) = (new bool[k], new bool[k]);
        for (var j = 0; j < k; j++)
            isLeast[j] = isGreatest[j] = sums.Smallest[j] == sums.Largest[j];
        var value = new double[k + 1];
        var remainder = new double[k + 1];
        foreach (var x in SupportProbe.Points(sums.Kernel.Domain, sums.Minimum, sums.Maximum))
        {
            sums.Kernel.Evaluate(sums.Kernel.Domain.At(x), value, remainder);
            if (!double.IsFinite(value[k]))
                continue;
            for (var j = 0; j < k; j++)
            {
                isLeast[j] &= !(value[j] < sums.Smallest[j]);
                isGreatest[j] &= !(value[j] > sums.Largest[j]);
            }
        }

        var signs = new int[k];
        for (var j = 0; j < k; j++)
            signs[j] = isLeast[j] == isGreatest[j] ? 0 : isGreatest[j] ? 1 : -1;
        return signs;
    }

    /// <summary>A hint at the known values, for a kernel that has any: one without fields takes a single byte.</summary>
    private static string KnownValues<TKernel>(TKernel kernel)
        where TKernel : struct, IKernel =>
        Unsafe.SizeOf<TKernel>() > 1 ? $", or choose other known values than {kernel} if these bring it about" : "";

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
