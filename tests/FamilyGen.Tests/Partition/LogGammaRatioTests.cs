using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using FamilyGen.Kernels;
using FamilyGen.Special;

namespace FamilyGen.Tests.Partition;

/// <summary>The difference of two log-gamma functions against values with 20 digits.</summary>
public class LogGammaRatioTests
{
    [Fact]
    public void Keeps_its_digits()
    {
        var failures = new List<string>();
        using var stream = typeof(LogGammaRatioTests).Assembly.GetManifestResourceStream("log-gamma-ratios.tsv")!;
        using var reader = new StreamReader(stream);
        while (reader.ReadLine() is { } line)
        {
            var cells = line.Split('\t');
            var (x, shift, step) = (Hexadecimal(cells[0]), Hexadecimal(cells[1]), Hexadecimal(cells[2]));
            var (value, slope, residual) = (Number(cells[3]), Number(cells[4]), Number(cells[5]));
            Compare(value, LogGammaRatio.Value(x, shift), 4e-15 * Math.Max(Math.Abs(value), Math.Min(1, Math.Abs(shift))), line, failures);
            Compare(slope, LogGammaRatio.Derivative(x, shift), 4e-15 * Math.Abs(slope), line, failures);

            // rounding of the value itself is what a short step leaves
            Compare(residual, Residual.LogGammaRatio(x, shift, step), 3e-13 * Math.Abs(residual) + 1e-15 * Math.Max(1, Math.Abs(slope * step)), line, failures);
        }

        Assert.True(failures.Count == 0, string.Join('\n', failures));
    }

    private static void Compare(double expected, double actual, double tolerance, string what, List<string> failures)
    {
        if (!(Math.Abs(actual - expected) <= tolerance))
            failures.Add(string.Create(CultureInfo.InvariantCulture, $"{what}: {actual:R} instead of {expected:R}, off by {Math.Abs(actual - expected) / tolerance:G3} times the tolerance"));
    }

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);

    // the notation of C and Python: 0x1.8p+3
    private static double Hexadecimal(string text)
    {
        var sign = text[0] == '-' ? -1 : 1;
        var parts = text.TrimStart('-')[2..].Split('p');
        var digits = parts[0].Split('.');
        var mantissa = (double)long.Parse(digits[0], CultureInfo.InvariantCulture);
        if (digits.Length > 1)
            mantissa += (double)long.Parse(digits[1], NumberStyles.HexNumber, CultureInfo.InvariantCulture) / Math.Pow(16, digits[1].Length);
        return sign * Math.ScaleB(mantissa, int.Parse(parts[1], CultureInfo.InvariantCulture));
    }
}
