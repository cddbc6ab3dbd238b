using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.ClosedForms;
using FamilyGen.Tests.SpecialFunctions;

namespace FamilyGen.Tests.ClosedForms;

/// <summary>Every entry of the catalogue against its table of 60-digit values (entries.py).</summary>
public class EntryTests
{
    private const double Unit = 2.220446049250313e-16;

    private static readonly Dictionary<string, (int Settings, int Count, double Relative, Evaluation Evaluate)> s_entries = new()
    {
        ["GammaForm"] = Of<GammaForm>(1),
        ["BetaForm"] = Of<BetaForm>(0),
        ["BesselKForm"] = Of<BesselKForm>(1),
        ["InverseGaussianForm"] = Of<InverseGaussianForm>(1),
        ["GaussianForm"] = Of<GaussianForm>(0),
        ["GaussianSegmentForm"] = Of<GaussianSegmentForm>(2),
        ["ExponentialForm"] = Of<ExponentialForm>(2),
        ["VonMisesForm"] = Of<VonMisesForm>(1),
        ["PoissonForm"] = Of<PoissonForm>(0),
        ["BinomialForm"] = Of<BinomialForm>(1),
        ["NegativeBinomialForm"] = Of<NegativeBinomialForm>(1),
        ["GeometricSegmentForm"] = Of<GeometricSegmentForm>(1),
        ["LogSeriesForm"] = Of<LogSeriesForm>(0),
        ["ZetaForm"] = Of<ZetaForm>(1),
    };

    private delegate bool Evaluation(
        ReadOnlySpan<double> settings, ReadOnlySpan<double> coefficients, out double logNormalizer, Span<double> mean, Span<double> covariance);

    public static TheoryData<string> Entries => [.. s_entries.Keys];

    [Theory]
    [MemberData(nameof(Entries))]
    public void Agrees_with_the_reference_values(string entry)
    {
        var (settings, count, relative, evaluate) = s_entries[entry];
        var answered = 0;
        var points = ReferenceTable.Read("entries.tsv").Where(row => row.Function.StartsWith(entry + ".", StringComparison.Ordinal))
            .GroupBy(row => string.Join(" ", row.Arguments)).ToList();
        Assert.True(points.Count >= 20);
        foreach (var point in points)
        {
            var rows = point.ToArray();
            var arguments = rows[0].Arguments;
            Assert.Equal(settings + count, arguments.Length);
            var (mean, covariance) = (new double[count], new double[count * count]);
            if (!evaluate(arguments.AsSpan(0, settings), arguments.AsSpan(settings), out var log, mean, covariance))
                continue;
            answered++;
            Assert.True(evaluate(arguments.AsSpan(0, settings), arguments.AsSpan(settings), out var alone, [], []));
            Assert.Equal(log, alone);
            CheckLog(rows[0], log, arguments[settings..], mean);
            for (var i = 0; i < count; i++)
            {
                var deviation = Math.Sqrt(covariance[i * (count + 1)]);
                Assert.True(Error(rows[1 + i], mean[i]) <= (2e-13 * deviation) + (4 * Unit * Math.Abs(mean[i])), $"{rows[1 + i]} but computed {mean[i]:R}");
            }

            var at = 1 + count;
            for (var i = 0; i < count; i++)
            {
                for (var j = 0; j <= i; j++, at++)
                {
                    var size = Math.Sqrt(covariance[i * (count + 1)]) * Math.Sqrt(covariance[j * (count + 1)]);
                    var value = covariance[(i * count) + j];
                    Assert.Equal(value, covariance[(j * count) + i]);
                    Assert.True(Error(rows[at], value) <= relative * size, $"{rows[at]} but computed {value:R}");
                }
            }
        }

        Assert.True(answered >= 0.6 * points.Count, $"{answered} of {points.Count}");
    }

    [Fact]
    public void Laws_of_one_dominant_count_keep_their_small_normalizer()
    {
        foreach (var (entry, arguments) in new (string, double[])[]
        {
            ("BinomialForm", [1, -40]), ("PoissonForm", [-40]), ("NegativeBinomialForm", [1, -30]), ("ZetaForm", [1, -40]), ("GeometricSegmentForm", [1, -40]),
        })
        {
            var row = ReferenceTable.Read("entries.tsv").Single(row => row.Function == entry + ".0" && row.Arguments.SequenceEqual(arguments));
            var (settings, _, _, evaluate) = s_entries[entry];
            Assert.True(evaluate(arguments.AsSpan(0, settings), arguments.AsSpan(settings), out var log, [], []));
            Assert.True(row.ErrorInUlp(log) < 4, $"{row} but computed {log:R}");
        }
    }

    [Theory]
    [InlineData("GammaForm", new double[] { 1, 0, -1 })]
    [InlineData("GammaForm", new double[] { 1, 1, 0 })]
    [InlineData("GammaForm", new double[] { -1, 1, -1 })]
    [InlineData("BetaForm", new double[] { 0, 1 })]
    [InlineData("BesselKForm", new double[] { 1, 1, 1, -1 })]
    [InlineData("BesselKForm", new double[] { 1, 1, 0, -1 })]
    [InlineData("InverseGaussianForm", new double[] { 1, -1, 0 })]
    [InlineData("GaussianForm", new double[] { 0, 0 })]
    [InlineData("GaussianSegmentForm", new double[] { 0, 1, 1, 1 })]
    [InlineData("GaussianSegmentForm", new double[] { 1, 1, 1, -1 })]
    [InlineData("ExponentialForm", new double[] { 0, double.PositiveInfinity, 1 })]
    [InlineData("ExponentialForm", new double[] { 0, double.PositiveInfinity, 0 })]
    [InlineData("ExponentialForm", new double[] { 2, 1, 1 })]
    [InlineData("VonMisesForm", new double[] { 1, double.NaN, 0 })]
    [InlineData("PoissonForm", new double[] { 800 })]
    [InlineData("BinomialForm", new double[] { -1, 0 })]
    [InlineData("NegativeBinomialForm", new double[] { 1, 0 })]
    [InlineData("GeometricSegmentForm", new double[] { -1, 0 })]
    [InlineData("LogSeriesForm", new double[] { 0 })]
    [InlineData("ZetaForm", new double[] { 1, -1 })]
    public void Refuses_what_its_condition_excludes(string entry, double[] arguments)
    {
        var (settings, count, _, evaluate) = s_entries[entry];
        Assert.False(evaluate(arguments.AsSpan(0, settings), arguments.AsSpan(settings), out _, [], []));
        Assert.False(evaluate(arguments.AsSpan(0, settings), arguments.AsSpan(settings), out _, new double[count], new double[count * count]));
    }

    [Fact]
    public void Faces_of_the_generalised_inverse_Gaussian_law_have_a_normalizer()
    {
        Assert.True(BesselKForm.TryEvaluate([1], [2.5, -3, 0], out var gamma, [], []));
        Assert.True(GammaForm.TryEvaluate([1], [2.5, -3], out var same, [], []));
        Assert.Equal(same, gamma);
        Assert.True(BesselKForm.TryEvaluate([1], [2.5, -3, -1e-13], out var near, [], []));
        Assert.Equal(gamma, near, 1e-11);
        Assert.True(BesselKForm.TryEvaluate([1], [-2.5, 0, -3], out var inverse, [], []));
        Assert.Equal(same, inverse, 1e-14);
        Assert.False(BesselKForm.TryEvaluate([1], [2.5, 0, -3], out _, [], []));
        Assert.False(BesselKForm.TryEvaluate([1], [2.5, -3, 0], out _, new double[3], new double[9]));
    }

    private static void CheckLog(ReferenceTable.Row row, double log, ReadOnlySpan<double> coefficients, double[] mean)
    {
        var largest = Math.Abs(log);
        for (var i = 0; i < mean.Length; i++)
            largest = Math.Max(largest, Math.Abs(coefficients[i] * mean[i]));
        Assert.True(Error(row, log) <= 1e-14 + (6 * Unit * largest), $"{row} but computed {log:R}");
    }

    private static double Error(ReferenceTable.Row row, double computed) => Math.Abs(computed - row.High - row.Low);

    private static (int, int, double, Evaluation) Of<TForm>(int settings)
        where TForm : IClosedForm => (settings, TForm.Count, TForm.RelativeError, TForm.TryEvaluate);
}
