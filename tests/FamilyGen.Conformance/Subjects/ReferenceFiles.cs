using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text.Json;

namespace FamilyGen.Conformance.Subjects;

/// <summary>One observation with its log-density.</summary>
internal sealed record DensityValue(double X, ReferenceNumber LogDensity);

/// <summary>One parameter point of a family with A, its gradient, its Hessian and log-densities.</summary>
internal sealed record ValuePoint(
    double[] Theta, ReferenceNumber LogNormalizer, ReferenceNumber[] Gradient, ReferenceNumber[,] Hessian, DensityValue[] Densities);

/// <summary>A maximum-likelihood estimate with its log-likelihood and standard errors.</summary>
internal sealed record FitValue(ReferenceNumber[] Theta, ReferenceNumber LogLikelihood, ReferenceNumber[] StandardErrors, int Observations);

/// <summary>Reads the tables under <c>reference</c>.</summary>
internal static class ReferenceFiles
{
    private static readonly string s_root = Path.Combine(AppContext.BaseDirectory, "reference");

    public static IEnumerable<string> Names(string folder) =>
        Directory.EnumerateFiles(Path.Combine(s_root, folder), "*.json").Select(f => Path.GetFileNameWithoutExtension(f)!).Order();

    public static ValuePoint[] Values(string family)
    {
        using var document = Open("values", family);
        return [.. document.RootElement.GetProperty("points").EnumerateArray().Select(point => new ValuePoint(
            [.. Numbers(point.GetProperty("theta")).Select(n => n.Nearest)],
            Number(point.GetProperty("A")),
            [.. Numbers(point.GetProperty("grad"))],
            Matrix(point.GetProperty("hess")),
            [.. point.GetProperty("log_density").EnumerateArray().Select(d => new DensityValue(
                Number(d.GetProperty("x")).Nearest, LogDensity(d.GetProperty("log_density"))))]))];
    }

    public static FitValue Fit(string name)
    {
        using var document = Open("fits", name);
        var root = document.RootElement;
        return new FitValue(
            [.. Numbers(root.GetProperty("theta"))],
            Number(root.GetProperty("log_likelihood")),
            [.. Numbers(root.GetProperty("standard_errors"))],
            root.GetProperty("n").GetInt32());
    }

    /// <summary>The rows of a data set, each column by its name.</summary>
    public static IReadOnlyList<IReadOnlyDictionary<string, string>> Rows(string dataset)
    {
        var lines = File.ReadAllLines(Path.Combine(s_root, "datasets", dataset + ".csv"));
        var names = lines[0].Split(',');
        return [.. lines.Skip(1).Where(l => l.Length > 0).Select(line =>
            (IReadOnlyDictionary<string, string>)names.Zip(line.Split(',')).ToDictionary(p => p.First, p => p.Second))];
    }

    public static double[] Column(string dataset, string column) =>
        [.. Rows(dataset).Select(row => double.Parse(row[column], CultureInfo.InvariantCulture))];

    /// <summary>A frequency table written out, one entry an observation.</summary>
    public static int[] Repeated(string dataset, string value, string frequency) =>
        [.. Rows(dataset).SelectMany(row => Enumerable.Repeat(
            int.Parse(row[value], CultureInfo.InvariantCulture), int.Parse(row[frequency], CultureInfo.InvariantCulture)))];

    private static JsonDocument Open(string folder, string name) =>
        JsonDocument.Parse(File.ReadAllText(Path.Combine(s_root, folder, name + ".json")));

    private static ReferenceNumber Number(JsonElement element) => ReferenceNumber.Parse(element.GetString()!);

    private static ReferenceNumber LogDensity(JsonElement element) => element.GetString() == "-inf"
        ? new(double.NegativeInfinity, 0)
        : Number(element);

    private static IEnumerable<ReferenceNumber> Numbers(JsonElement element) => element.EnumerateArray().Select(Number);

    private static ReferenceNumber[,] Matrix(JsonElement element)
    {
        var rows = element.EnumerateArray().Select(row => Numbers(row).ToArray()).ToArray();
        var matrix = new ReferenceNumber[rows.Length, rows.Length];
        for (var i = 0; i < rows.Length; i++)
            for (var j = 0; j < rows.Length; j++)
                matrix[i, j] = rows[i][j];
        return matrix;
    }
}
