using System;
using System.Collections.Generic;
using System.Collections.Immutable;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;
using FamilyGen.Kernels;
using Xunit;

namespace FamilyGen.Generator.Tests.Algebra;

/// <summary>The natural set that the library derives from the growth rows, against the known ones.</summary>
public class GrowthTests
{
    [Fact]
    public void Duration_with_delay()
    {
        var family = FamilyText.Interval("0").Statistic("A", "Log(x)").Statistic("B", "x").Statistic("C", "1 / x");
        Check(family, [[0, -1, -1], [50, -1, -1], [-50, -1, -1], [0.5, -1, 0], [-2, 0, -1]], [[-1, -1, 0], [-1, 0, -1], [0, 1, -1], [0, -1, 1], [0, 0, 0]]);
        Assert.Equal("(c < 0, or c = 0 and a > −1) and (b < 0, or b = 0 and a < −1)", family.Form().NaturalSetText);
    }

    [Fact]
    public void Dispersed_counts()
    {
        var family = FamilyText.Counts("0").Statistic("Total", "x").Statistic("Crowding", "-FactorialLn(x)");
        Check(family, [[3, 1], [-3, 0.01], [-0.1, 0]], [[0, 0], [1, 0], [-5, -0.1]]);
        Assert.Equal("crowding > 0, or crowding = 0 and total < 0", family.Form().NaturalSetText);
        var end = Assert.Single(family.Form().Ends);
        Assert.Equal(["PowerTimesLog", "Power", "Log"], end.Ranks.Select(r => r.Kind));
        Assert.Equal(["−crowding", "crowding + total", "−0.5·crowding"], end.Ranks.Select(r => r.Text));
    }

    [Fact]
    public void Open_interval_with_two_logarithms() =>
        Check(
            FamilyText.Interval("0", "1").Statistic("A", "Log(x)").Statistic("B", "Log(1 - x)").Statistic("C", "x"),
            [[0, 0, 0], [-0.99, -0.99, 30], [4, 9, -30]],
            [[-1, 0, 0], [0, -1, 0]]);

    [Fact]
    public void Double_exponential_has_a_bounded_set()
    {
        var family = FamilyText.Interval(null).Statistic("A", "x").LogBase("-Abs(x)");
        Check(family, [[0], [0.999], [-0.999]], [[1], [-1], [3]]);
        Assert.Equal("a > −1 and a < 1", family.Form().NaturalSetText);
    }

    [Fact]
    public void Normal_law()
    {
        var family = FamilyText.Interval(null).Statistic("A", "x").Statistic("B", "x * x");
        Check(family, [[0, -1], [9, -0.01]], [[0, 0], [1, 0], [-1, 0.1]]);
        Assert.Equal("b < 0", family.Form().NaturalSetText);
        Check(FamilyText.Interval("0").Statistic("A", "x").Statistic("B", "x * x"), [[-1, 0], [9, -1]], [[0, 0], [1, 0]]);
    }

    [Fact]
    public void Power_tails()
    {
        Check(FamilyText.Interval("0").Statistic("A", "Log(x)").Statistic("B", "Log(1 + x)"), [[0, -2], [-0.9, -0.2]], [[0, -1], [-1, -9], [2, -3]]);
        Check(FamilyText.Interval("1").Statistic("A", "Log(x)"), [[-1.1]], [[-1], [0]]);
        Check(FamilyText.Counts("1").Statistic("A", "Log(x)"), [[-1.001]], [[-1], [0]]);
        Check(FamilyText.Counts("2").Statistic("A", "Log(x)").Statistic("B", "Log(Log(x))"), [[-1, -1.5], [-2, 3]], [[-1, -1], [-0.5, -9]]);
    }

    [Fact]
    public void Sets_that_are_empty_say_so()
    {
        var family = FamilyText.Interval("0").Statistic("A", "Log(x)");
        Check(family, [], [[0], [-1], [-2]]);
        Assert.StartsWith("no parameters", family.Form().NaturalSetText);
        Assert.StartsWith("no parameters", FamilyText.Counts(null).Statistic("A", "x").Form().NaturalSetText);
        Assert.Equal("a = 0", FamilyText.Interval("-1", "1", closed: true).Statistic("A", "1 / x").Form().NaturalSetText);
    }

    [Fact]
    public void Logarithmic_normal() =>
        Check(
            FamilyText.Interval("0").Statistic("A", "Log(x)").Statistic("B", "Pow(Log(x), 2)").LogBase("-Log(x)"),
            [[0, -1], [9, -0.1]],
            [[0, 0], [1, 0], [0, 1]]);

    [Fact]
    public void Fixed_size_of_a_negative_binomial() =>
        Check(FamilyText.Counts("0").Statistic("A", "x").LogBase("GammaLn(x + 2.5) - GammaLn(2.5) - GammaLn(x + 1)"), [[-0.001], [-9]], [[0], [1]]);

    [Fact]
    public void Softplus_and_exponentials()
    {
        Check(FamilyText.Interval(null).Statistic("A", "-Log(1 + Exp(-x))").LogBase("-x - Log(1 + Exp(-x))"), [[0.1], [7]], [[0], [-0.5]]);
        Check(FamilyText.Interval(null).Statistic("A", "Exp(x)").Statistic("B", "x"), [[-1, 1]], [[0, 1], [-1, 0], [-1, -1], [1, 1]]);
    }

    [Fact]
    public void Residues_must_all_converge()
    {
        var family = FamilyText.Counts("1").Statistic("A", "x % 2 == 0 ? x : -x").Statistic("B", "x");
        Check(family, [[0, -1], [0.5, -1]], [[1, -1], [-1, -1], [0, 0]]);
        Assert.Equal(2, family.Form().Ends.Count);
    }

    [Fact]
    public void Known_orders_are_decided_at_run_time()
    {
        var family = FamilyText.Interval("0", known: "k").Statistic("A", "Pow(x, k)").Statistic("B", "Log(x)");
        Check(family, [[-1, 0], [-1, 9]], [[-1, -1], [1, 0], [0, 0]], ("k", 2));
        Check(family, [[-1, -9]], [[-1, 0], [1, -9]], ("k", -2));
    }

    [Fact]
    public void Known_ends_and_thresholds()
    {
        var tail = FamilyText.Interval("lo", null, known: "lo").LogKernel("a", "-(a + 1) * Log(x)");
        Check(tail, [[-1.5]], [[-1], [0]], ("lo", 2));
        Assert.Equal("a > 0", tail.Form().NaturalSetText);
        Assert.False(tail.Form().LowerSingular);

        var capped = FamilyText.Interval("0", known: "cap").LogKernel("a b", "-a * Min(x, cap) - b * Max(0, x - cap)").Form();
        Assert.Equal(("b > 0", false), (capped.NaturalSetText, capped.LowerSingular));

        var share = FamilyText.Interval("lo", "hi", known: "lo hi").LogKernel("a b", "(a - 1) * Log((x - lo) / (hi - lo)) + (b - 1) * Log((hi - x) / (hi - lo))");
        Check(share, [[-0.9, 3]], [[-1, 0], [0, -1]], ("lo", 2), ("hi", 5));
        Assert.Equal(["logXMinusLo", "logHiMinusX"], share.Form().Statistics.Select(s => s.Parameter));
    }

    [Fact]
    public void Claims_of_known_number()
    {
        var family = FamilyText.Interval("0", known: "#claims").LogKernel("shape rate", "(claims * shape - 1) * Log(x) - claims * rate * x");
        Check(family, [[0.5, -1], [4, -0.1]], [[0, -1], [1, 0]], ("claims", 3));
    }

    [Theory]
    [InlineData("x * Cos(x)")]
    [InlineData("Score(x)")]
    [InlineData("Exp(x * x)")]
    [InlineData("x * x * Sin(3 * x) - Pow(x, 4)")]
    public void What_is_beyond_the_argument_is_said_to_be(string statistic) =>
        Assert.All(FamilyText.Interval(null).Statistic("A", statistic).LogBase("-x * x").Form().Ends, e => Assert.False(e.IsVerified));

    [Fact]
    public void Trade_names_and_ranges_enter_the_sentence()
    {
        Assert.Equal("sd > 0", FamilyText.Interval(null).LogKernel("mean sd", "-Pow(x - mean, 2) / (2 * sd * sd) - Log(sd)").Form().NaturalSetText);
        Assert.Equal("p > 0 and p < 1", FamilyText.Counts("0", "5").LogKernel("p", "BinomialLn(5, x) + x * Log(p) + (5 - x) * Log(1 - p)").Form().NaturalSetText);
        Assert.Equal("shape > 0 and (rate > 0, or rate = 0 and shape < 0)", FamilyText.Interval("0").LogKernel("shape rate", "(shape - 1) * Log(x) - rate * x").Form().NaturalSetText);
    }

    [Theory]
    [InlineData("x * Log(1 + x)")]
    [InlineData("GammaLn(x + 2.5) - 0.5 * GammaLn(2 * x + 1)")]
    [InlineData("Pow(x + 1, 2.5) + Sqrt(x)")]
    [InlineData("Log(x * x + 3 * x) * Log(x + 2)")]
    [InlineData("x * Exp(1 / x) + Pow(x, 3) * Cos(2 / x)")]
    [InlineData("Log(1 + Exp(0.01 * x)) + Abs(x - 7) * Max(x, 12)")]
    [InlineData("x * DiGamma(x + 1) - Log(Log(x + 1))")]
    [InlineData("Pow(x * x + 1, -0.5) * Pow(x, 3)")]
    [InlineData("(x < 20 ? x * x : Log(x)) + Floor(x) - x % 7")]
    public void Ranks_describe_the_function(string statistic)
    {
        // f minus its ranks stays bounded: between x and 64x it moves less than the weakest unbounded rank would.
        var family = FamilyText.Interval("0").Statistic("A", statistic);
        var end = family.Form().Ends.Single(e => e.IsInfinite);
        Assert.True(end.IsVerified);
        var body = family.Declaration().Statistics[0].Body;
        var rest = new[] { 500.3, 4000.7, 32000.1 }.Select(x => Evaluator.Evaluate(body, _ => x) - end.Ranks.Sum(r =>
            Evaluator.Evaluate(r.Weights[0], _ => 0) * Rank(r.Kind, Evaluator.Evaluate(r.Order, _ => 0), x))).ToList();
        Assert.True(rest.Max() - rest.Min() < 8, string.Join(", ", rest));
    }

    private static double Rank(string kind, double order, double x) => kind switch
    {
        "Exponential" => Math.Exp(order * x),
        "Power" => Math.Pow(x, order),
        "PowerTimesLog" => Math.Pow(x, order) * Math.Log(x),
        "LogPower" => Math.Pow(Math.Log(x), order),
        "Log" => Math.Log(x),
        _ => Math.Log(Math.Log(x)),
    };

    private static void Check(FamilyText family, double[][] inside, double[][] outside, params (string Name, double Value)[] known)
    {
        var form = family.Form();
        Assert.All(form.Ends, e => Assert.True(e.IsVerified, e.Where));
        var set = new NaturalSet([.. form.Ends.Select(e => End(e, known))]);
        foreach (var theta in inside)
            Assert.True(set.Contains(theta), $"({string.Join(", ", theta)}): {set.Violation(theta)}");
        foreach (var theta in outside)
            Assert.False(set.Contains(theta), $"({string.Join(", ", theta)}) belongs to the set");
    }

    private static EndGrowth End(EndRow end, (string Name, double Value)[] known)
    {
        double Value(Expression e) => Evaluator.Evaluate(e, s => known.Single(k => k.Name == s.Name).Value);
        Growth Growth(string kind, Expression order) => new(Enum.Parse<GrowthKind>(kind), Value(order));
        return new EndGrowth(
            end.Where,
            end.IsInfinite,
            end.IsUpper,
            [.. end.Ranks.Select(r => new Rank(Growth(r.Kind, r.Order), [.. r.Weights.Select(Value)], Value(r.Constant), r.Text))],
            [.. end.Statistics.Select(g => Growth(g.Kind, g.Order))]);
    }
}
