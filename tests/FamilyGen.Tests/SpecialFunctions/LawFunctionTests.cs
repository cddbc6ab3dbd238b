using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Special;

namespace FamilyGen.Tests.SpecialFunctions;

/// <summary>The special functions behind closed forms against their table of 60-digit values (laws.py).</summary>
public class LawFunctionTests
{
    private static readonly Dictionary<string, Func<double[], double>> s_functions = new()
    {
        ["LogBeta"] = a => LogBeta.Value(a[0], a[1]),
        ["DigammaDifference"] = a => DigammaDifference.Value(a[0], a[1]),
        ["TrigammaDifference"] = a => TrigammaDifference.Value(a[0], a[1]),
        ["Erfcx"] = a => Erfcx.Value(a[0]),
        ["BesselI.0"] = a => BesselIRatio.LogScaledI0(a[0]),
        ["BesselI.1"] = a => BesselIRatio.Value(a[0]),
        ["BesselI.2"] = a => BesselIRatio.Slope(a[0]),
        ["NormalTail.0"] = a => Tail(a)[0],
        ["NormalTail.1"] = a => Tail(a)[1],
        ["NormalTail.2"] = a => Tail(a)[2],
        ["NormalTail.3"] = a => Tail(a)[3],
        ["NormalTail.4"] = a => Tail(a)[4],
        ["NormalTail.5"] = a => Tail(a)[6],
        ["BesselK.0"] = a => K(a).Log,
        ["HurwitzZeta.0"] = a => Zeta(a).Log,
        ["HurwitzZeta.1"] = a => Zeta(a).Mean,
        ["HurwitzZeta.2"] = a => Zeta(a).Variance,
    };

    [Theory]
    [InlineData("DigammaDifference", 3)]
    [InlineData("TrigammaDifference", 4)]
    [InlineData("Erfcx", 3)]
    [InlineData("BesselI.1", 5)]
    [InlineData("BesselI.2", 4000)]
    [InlineData("NormalTail.1", 20)]
    [InlineData("NormalTail.2", 20)]
    [InlineData("NormalTail.3", 1500)]
    [InlineData("NormalTail.4", 1500)]
    [InlineData("NormalTail.5", 1500)]
    public void Stays_within_its_relative_error(string function, double units) =>
        Check(function, (row, computed) => row.ErrorInUlp(computed) / units);

    [Theory]
    [InlineData("HurwitzZeta.0")]
    [InlineData("HurwitzZeta.1")]
    [InlineData("HurwitzZeta.2")]
    public void Loses_no_more_than_the_rounding_of_a_power(string function) =>
        Check(function, (row, computed) => row.ErrorInUlp(computed) / (8 + row.Arguments[0]));

    [Theory]
    [InlineData("LogBeta", 4)]
    [InlineData("BesselI.0", 20)]
    [InlineData("NormalTail.0", 2)]
    [InlineData("BesselK.0", 15)]
    public void Stays_within_its_error_beside_one(string function, double units) =>
        Check(function, (row, computed) => Error(row, computed) / (units * 2.2e-16 * (1 + Math.Abs(row.High))));

    [Fact]
    public void Moments_of_the_Bessel_integrand_stay_within_their_error()
    {
        foreach (var row in ReferenceTable.Read("laws.tsv").Where(row => row.Function.StartsWith("BesselK", StringComparison.Ordinal)))
        {
            var index = row.Function[^1] - '0';
            if (index == 0)
                continue;
            var (_, mean, covariance) = K(row.Arguments);
            if (index <= 3)
            {
                var deviation = Math.Sqrt(covariance[(index - 1) * 4]);
                Assert.True(Error(row, mean[index - 1]) <= 1e-14 * deviation, $"{row} but computed {mean[index - 1]:R}");
            }
            else
            {
                var (i, j) = new[] { (0, 0), (1, 0), (1, 1), (2, 0), (2, 1), (2, 2) }[index - 4];
                var scale = Math.Sqrt(covariance[i * 4] * covariance[j * 4]);
                Assert.True(Error(row, covariance[(i * 3) + j]) <= 2e-14 * scale, $"{row} but computed {covariance[(i * 3) + j]:R}");
            }
        }
    }

    [Fact]
    public void Arguments_outside_the_domain_give_no_number()
    {
        Assert.True(double.IsNaN(LogBeta.Value(0, 1)));
        Assert.True(double.IsNaN(DigammaDifference.Value(-1, 1)));
        Assert.True(double.IsNaN(TrigammaDifference.Value(1, -1)));
        Assert.True(double.IsNaN(Erfcx.Value(-1)));
        Assert.True(double.IsNaN(Erfcx.Value(double.NaN)));
        Assert.Equal(1, Erfcx.Value(0), 1e-15);
        Assert.False(HurwitzZeta.TryEvaluate(1, 1, out _, out _, out _));
        Assert.False(HurwitzZeta.TryEvaluate(2, 0, out _, out _, out _));
    }

    private static void Check(string function, Func<ReferenceTable.Row, double, double> excess)
    {
        var rows = ReferenceTable.Read("laws.tsv").Where(row => row.Function == function).ToList();
        Assert.True(rows.Count > 30);
        var worst = rows.MaxBy(row => excess(row, s_functions[function](row.Arguments)))!;
        var computed = s_functions[function](worst.Arguments);
        Assert.True(excess(worst, computed) <= 1, $"{worst} but computed {computed:R}: {excess(worst, computed)} of what is allowed");
    }

    private static double Error(ReferenceTable.Row row, double computed) => Math.Abs(computed - row.High - row.Low);

    private static double[] Tail(double[] a)
    {
        var moments = new double[6];
        NormalTail.Evaluate(a[0], out var log, moments.AsSpan(0, 2), moments.AsSpan(2));
        return [log, .. moments];
    }

    private static (double Log, double[] Mean, double[] Covariance) K(double[] a)
    {
        var (mean, covariance) = (new double[3], new double[9]);
        Assert.True(BesselKMoments.TryEvaluate(a[0], a[1], out var log, mean, covariance));
        return (log, mean, covariance);
    }

    private static (double Log, double Mean, double Variance) Zeta(double[] a)
    {
        Assert.True(HurwitzZeta.TryEvaluate(a[0], a[1], out var log, out var mean, out var variance));
        return (log, mean, variance);
    }
}
