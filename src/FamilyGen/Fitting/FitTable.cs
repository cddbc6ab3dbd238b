using System;
using System.Collections.Generic;
using System.Globalization;
using System.Text;

namespace FamilyGen.Fitting;

/// <summary>The table by which a fit presents itself.</summary>
internal static class FitTable
{
    private const int NumberWidth = 13;

    public static string Write(string family, FitNumbers numbers, double aic, double bic)
    {
        var rows = new List<(string Label, double Value, double Error)>();
        for (var i = 0; i < numbers.Parameters.Names.Length; i++)
            rows.Add((numbers.Parameters.Names[i], numbers.Parameters.Values[i], numbers.Parameters.StandardErrors[i]));
        var parameters = rows.Count;
        rows.Add(("mean", numbers.Landmarks.Value.Mean, 0));
        rows.Add(("95 % quantile", numbers.Landmarks.Value.Quantile, 0));
        rows.Add(("log-likelihood", numbers.LogLikelihood, 0));
        rows.Add(("AIC", aic, 0));
        rows.Add(("BIC", bic, 0));

        var width = 0;
        foreach (var row in rows)
            width = Math.Max(width, row.Label.Length);
        var text = new StringBuilder();
        text.Append(family).Append(" fitted to ").Append(numbers.Observations.ToString(CultureInfo.InvariantCulture)).Append(" observations");
        if (numbers.TotalWeight != numbers.Observations)
            text.Append(" of total weight ").Append(Number(numbers.TotalWeight));
        text.Append('\n').Append(' ', width).Append("estimate".PadLeft(NumberWidth)).Append("std. error".PadLeft(NumberWidth)).Append('\n');
        for (var i = 0; i < rows.Count; i++)
        {
            text.Append(rows[i].Label.PadRight(width)).Append(Number(rows[i].Value).PadLeft(NumberWidth));
            if (i < parameters)
                text.Append((double.IsNaN(rows[i].Error) ? "held" : Number(rows[i].Error)).PadLeft(NumberWidth));
            text.Append('\n');
        }

        text.Append("status".PadRight(width)).Append("  ").Append(Describe(numbers)).Append('\n');
        foreach (var condition in numbers.Boundary)
        {
            text.Append("held".PadRight(width)).Append("  ").Append(condition.Condition).Append("; multiplier ")
                .Append(Number(condition.Multiplier)).Append('\n');
        }

        foreach (var note in numbers.Notes)
            text.Append("note".PadRight(width)).Append("  ").Append(note).Append('\n');
        return text.ToString();
    }

    private static string Describe(FitNumbers numbers)
    {
        var kind = numbers.Status switch
        {
            FitStatus.OnBoundary => "maximum on the boundary of the parameter set",
            FitStatus.LocalMaximum => "local maximum, the highest that several starts found",
            _ => "interior maximum, the only one",
        };
        return $"{kind} ({numbers.Iterations.ToString(CultureInfo.InvariantCulture)} iterations)";
    }

    private static string Number(double value) => double.IsInfinity(value)
        ? (value > 0 ? "∞" : "−∞")
        : value.ToString("G6", CultureInfo.InvariantCulture);
}
