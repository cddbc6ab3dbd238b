using System;
using System.Collections.Generic;
using System.Globalization;
using System.Text;

namespace FamilyGen.Fitting;

/// <summary>The table by which a fit presents itself.</summary>
internal static class FitTable
{
    private const int NumberWidth = 16;
    private const int FewestDigits = 6;
    private const int MostDigits = 15;

    public static string Write(string family, FitNumbers numbers, double aic, double bic)
    {
        var rows = new List<(string Label, string Value, string Error)>();
        for (var i = 0; i < numbers.Parameters.Names.Length; i++)
        {
            var (value, error) = (numbers.Parameters.Values[i], numbers.Parameters.StandardErrors[i]);
            rows.Add((numbers.Parameters.Names[i], Number(value, error / 100), double.IsNaN(error) ? "held" : Number(error)));
        }

        var law = numbers.Landmarks.Value;
        rows.Add(("mean", Number(law.Mean, law.Deviation / 1000), ""));
        rows.Add(("95 % quantile", Number(law.Quantile, law.Deviation / 1000), ""));
        rows.Add(("log-likelihood", Number(numbers.LogLikelihood, 1e-3), ""));
        rows.Add(("AIC", Number(aic, 1e-3), ""));
        rows.Add(("BIC", Number(bic, 1e-3), ""));

        var width = 0;
        foreach (var row in rows)
            width = Math.Max(width, row.Label.Length);
        var text = new StringBuilder();
        text.Append(family).Append(" fitted to ").Append(numbers.Observations.ToString(CultureInfo.InvariantCulture)).Append(" observations");
        if (numbers.TotalWeight != numbers.Observations)
            text.Append(" of total weight ").Append(Number(numbers.TotalWeight));
        text.Append('\n').Append(' ', width).Append("estimate".PadLeft(NumberWidth)).Append("std. error".PadLeft(NumberWidth)).Append('\n');
        foreach (var (label, value, error) in rows)
        {
            text.Append(label.PadRight(width)).Append(value.PadLeft(NumberWidth));
            if (error != "")
                text.Append(error.PadLeft(NumberWidth));
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

    /// <summary>A number with digits down to the size that matters, six at least.</summary>
    private static string Number(double value, double smallest = double.NaN)
    {
        if (double.IsInfinity(value))
            return value > 0 ? "∞" : "−∞";
        var digits = Math.Ceiling(Math.Log10(Math.Abs(value) / smallest));
        digits = double.IsNaN(digits) ? FewestDigits : Math.Clamp(digits, FewestDigits, MostDigits);
        return value.ToString("G" + digits.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
    }
}
