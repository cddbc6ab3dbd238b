using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using Xunit;

namespace FamilyGen.Generator.Tests.Algebra;

/// <summary>What a kernel is split into: statistics, natural parameters, base measure.</summary>
public class TradeFormTests
{
    private static readonly double[] s_positive = [0.3, 0.8, 1.4, 2.6, 3.9, 7.5];
    private static readonly double[] s_counts = [0, 1, 2, 3, 5, 8];

    [Fact]
    public void Coefficients_are_read_as_written()
    {
        var family = FamilyText.Interval("0", observation: "hours").LogKernel("shape rate delay", "(shape - 1) * Log(hours) - rate * hours - delay / hours");
        Check(family, "0", "log(hours) by shape − 1", "hours by −rate", "1/hours by −delay");
        Assert.Equal(["logHours", "hours", "reciprocalHours"], family.Form().Statistics.Select(s => s.Parameter));
        Assert.Equal(["LogHours", "Hours", "ReciprocalHours"], family.Form().Statistics.Select(s => s.Name));
    }

    [Fact]
    public void Piecewise_hazard_has_five_statistics_and_three_parameters()
    {
        var family = FamilyText.Interval("0", observation: "hours").LogKernel(
            "early steady late",
            "(hours < 200 ? Log(early) : hours < 4000 ? Log(steady) : Log(late)) - early * Min(hours, 200) - steady * Max(0, Min(hours, 4000) - 200) - late * Max(0, hours - 4000)");
        Check(
            family,
            "0",
            "[hours < 200] by log(early) − log(late)",
            "[200 ≤ hours < 4000] by log(steady) − log(late)",
            "min(hours, 200) by −early",
            "max(0, min(hours, 4000) − 200) by −steady",
            "max(0, hours − 4000) by −late");
        var curved = Assert.Single(family.Normalize().Findings);
        Assert.Equal(("FG0502", "3", "5"), (curved.Id, curved.Arguments[0], curved.Arguments[1]));
        Assert.Equal(30, Agreement.OfTrade(family, [10, 150, 201, 900, 2500, 3999, 4000, 4500, 7000, 12000]));
    }

    [Fact]
    public void Branches_with_different_functions_are_pieces()
    {
        var family = FamilyText.Interval("0", known: "large").LogKernel(
            "shape rate tail jump", "x < large ? (shape - 1) * Log(x) - rate * x : jump - (tail + 1) * Log(x)");
        Check(family, "0", "log(x)·[x < large] by shape − 1", "x·[x < large] by −rate", "[x ≥ large] by jump", "log(x)·[x ≥ large] by −(tail + 1)");
    }

    [Fact]
    public void Points_of_their_own()
    {
        Check(
            FamilyText.Counts("0").LogKernel("a b c", "x == 0 ? a : x == 1 ? b : c * x - FactorialLn(x)"),
            "−log Γ(x + 1)·[x ≠ 0 and x ≠ 1]",
            "[x = 0] by a",
            "[x = 1] by b",
            "x·[x ≠ 0 and x ≠ 1] by c");
        Check(
            FamilyText.Interval("0").Mass("0").LogKernel("p rate", "x == 0 ? Log(p) : Log(1 - p) + Log(rate) - rate * x"),
            "0",
            "[x = 0] by log(p) − log(1 − p) − log(rate)",
            "x·[x ≠ 0] by −rate");
    }

    [Fact]
    public void Known_values_go_with_the_observation()
    {
        var family = FamilyText.Interval("0", known: "#claims").LogKernel("shape rate", "(claims * shape - 1) * Log(x) - claims * rate * x");
        Check(family, "−log(x)", "claims·log(x) by shape", "claims·x by −rate");
    }

    [Fact]
    public void A_known_value_may_be_tied_to_a_parameter()
    {
        var family = FamilyText.Interval("0", observation: "hours", known: "shape").LogKernel("scale", "(shape - 1) * Log(hours) - Pow(hours / scale, shape)");
        Check(family, "shape·log(hours) − log(hours)", "hours^shape by −scale^(−shape)");
    }

    [Fact]
    public void Waves_with_a_shifted_phase_split_by_the_addition_theorem()
    {
        var family = FamilyText.Circle("24", "hour").LogKernel(
            "day dayPeak half halfPeak", "day * Cos(2 * PI * (hour - dayPeak) / 24) + half * Cos(4 * PI * (hour - halfPeak) / 24)");
        Check(
            family,
            "0",
            "cos(π·hour/12) by day·cos(π·dayPeak/12)",
            "sin(π·hour/12) by day·sin(π·dayPeak/12)",
            "cos(π·hour/6) by half·cos(π·halfPeak/6)",
            "sin(π·hour/6) by half·sin(π·halfPeak/6)");
    }

    [Fact]
    public void A_shifted_square_is_one_statistic()
    {
        Check(FamilyText.Interval(null).LogKernel("rate", "-rate * Pow(x - 3, 2)"), "0", "(x − 3)² by −rate");
        Check(FamilyText.Interval(null, known: "centre").LogKernel("rate", "-rate * (x - centre) * (x - centre)"), "0", "(x − centre)² by −rate");
        Check(FamilyText.Interval(null).LogKernel("mean sd", "-(x - mean) * (x - mean) / (2 * sd * sd) - Log(sd)"), "0", "x² by −0.5/sd²", "x by mean/sd²");
    }

    [Fact]
    public void Affine_combinations_of_earlier_coefficients_merge()
    {
        Check(FamilyText.Interval("0").LogKernel("a", "a * x + (2 * a - 3) * Log(x)"), "−3·log(x)", "x + 2·log(x) by a");
        Check(FamilyText.Interval("0").LogKernel("a b", "a * x + b * Log(x) + (a - PI * b + 1) / x"), "1/x", "x + 1/x by a", "log(x) − π/x by b");
        Check(FamilyText.Interval("0", known: "k").LogKernel("a", "a * k * x + a * Log(x)"), "0", "k·x + log(x) by a");
    }

    [Fact]
    public void Indicators_that_sum_to_one_fold_into_the_normalizer()
    {
        Check(
            FamilyText.Counts("0").LogKernel("p", "Log(x == 0 ? p : (1 - p) * Pow(0.5, x))"),
            "−log(2)·x·[x ≠ 0]",
            "[x = 0] by log(p) − log(1 − p)");
        Check(
            FamilyText.Counts("0").LogKernel("a b", "(x == 0 ? a : 0) + (x > 0 ? 3 * b - a : 0) - b * x"),
            "0",
            "[x = 0] by 2·a − 3·b",
            "x by −b");
    }

    [Theory]
    [InlineData("Log(rate * Exp(-rate * x))", "0", "x by −rate")]
    [InlineData("Log(x * Exp(-x * x * rate))", "log(x)", "x² by −rate")]
    [InlineData("Log(Pow(rate * x, 3)) - rate * x", "3·log(x)", "x by −rate")]
    [InlineData("Log(Sqrt(x) / (1 + x)) - rate * x", "0.5·log(x) − log(x + 1)", "x by −rate")]
    [InlineData("-Log(Exp(rate) * x + Exp(rate)) * rate", "0", "log(x + 1) by −rate")]
    [InlineData("rate * Log(2 * x)", "0", "log(x) by rate")]
    [InlineData("-Exp(rate + x)", "0", "exp(x) by −exp(rate)")]
    [InlineData("Exp(rate * Log(x)) - Pow(x, rate) - rate * x", "0", "x by −rate")]
    [InlineData("rate * Log(Pow(x - 3, 2))", "0", "log(|x − 3|) by 2·rate")]
    [InlineData("-rate / (1 + x * x)", "0", "1/(x² + 1) by −rate")]
    [InlineData("-rate * (2 * x + 2) / (x * x + x)", "0", "1/x by −2·rate")]
    [InlineData("-rate * Max(x, -1)", "0", "x by −rate")]
    [InlineData("-rate * Abs(2 * x - 6)", "0", "|x − 3| by −2·rate")]
    [InlineData("rate * GammaLn(x + 3) - rate * GammaLn(x + 1)", "0", "log(x + 1) + log(x + 2) by rate")]
    [InlineData("rate * Log(1 + Exp(2 * x)) - x", "−x", "log(exp(2·x) + 1) by rate")]
    [InlineData("x * Log(x) * (rate - 2)", "0", "x·log(x) by rate − 2")]
    [InlineData("Log(x) * Log(x) * rate", "0", "log(x)² by rate")]
    [InlineData("rate * Score(x)", "0", "Score(x) by rate")]
    public void Rules_of_the_functions(string kernel, string logBase, params string[] parts) =>
        Check(FamilyText.Interval("0").LogKernel("rate", kernel), logBase, parts, kernel.Contains("Score"));

    [Fact]
    public void Half_line_below_turns_the_sign()
    {
        Check(FamilyText.Interval(null, "0").LogKernel("a rate", "a * Log(-rate * x) + rate * x"), "0", "log(−x) by a", "x by rate");
        Check(FamilyText.Interval("threshold", null, known: "threshold").LogKernel("a rate", "a * Log(rate * (x - threshold)) - rate * x"), "0", false, "log(x − threshold) by a", "x by −rate");
    }

    [Fact]
    public void Skewed_logistic_separates()
    {
        var family = FamilyText.Interval(null).LogKernel("a", "Log(a * Exp(-x) * Pow(1 + Exp(-x), -a - 1))");
        Check(family, "−x", "log(exp(−x) + 1) by −a − 1");
    }

    [Fact]
    public void Fixed_shape_is_a_power()
    {
        Check(FamilyText.Interval("0").LogKernel("s", "Log(x * Exp(-x * x / s))"), "log(x)", "x² by −1/s");
        Check(FamilyText.Interval("0").LogKernel("scale", "0.5 * Log(x) - Pow(x / scale, 1.5)"), "0.5·log(x)", "x^1.5 by −1/scale^1.5");
    }

    [Fact]
    public void Branch_without_mass_narrows_the_base_measure()
    {
        var family = FamilyText.Counts("0").LogKernel("rate", "x % 2 == 1 ? double.NegativeInfinity : x * Log(rate) - FactorialLn(x)");
        Check(family, "(−∞)·[(x mod 2) = 1] − log Γ(x + 1)", "x by log(rate)");
    }

    [Theory]
    [InlineData("(mean * size - 1) * Log(x) + ((1 - mean) * size - 1) * Log(1 + x)", "mean·size − 1", "size·(1 − mean) − 1")]
    [InlineData("-size * mean * x - size * (1 - mean) * x * x", "−mean·size", "−size·(1 − mean)")]
    [InlineData("-Pow(size + mean, 2) * x - size * Log(x)", "−(size + mean)²", "−size")]
    public void Coefficients_keep_their_brackets(string kernel, params string[] naturals) => Assert.Equal(
        naturals, FamilyText.Interval("0").LogKernel("mean size", kernel).Form().Statistics.Select(s => Rendering.Text(s.Natural!)));

    private static void Check(FamilyText family, string logBase, params string[] parts) => Check(family, logBase, parts, false);

    private static void Check(FamilyText family, string logBase, bool isCompared, params string[] parts) => Check(family, logBase, parts, !isCompared);

    private static void Check(FamilyText family, string logBase, string[] parts, bool isOpaque)
    {
        var form = family.Form();
        Assert.Equal(parts, form.Statistics.Select(s => $"{Rendering.Text(s.Body)} by {Rendering.Text(s.Natural!)}"));
        Assert.Equal(logBase.Replace(" − log Γ(x + 1)", ""), Sorted(form, logBase));
        if (!isOpaque)
        {
            IReadOnlyList<double> points = family.Declaration().Support is { IsLattice: true } ? s_counts
                : family.Declaration().Support is { Upper: not null, Lower: null } ? [.. s_positive.Select(x => -x)]
                : s_positive;
            Assert.True(Agreement.OfTrade(family, points) > 3);
        }
    }

    private static string Sorted(Model.NormalForm form, string expected)
    {
        var text = Rendering.Text(form.LogBase);
        return expected.EndsWith(" − log Γ(x + 1)", System.StringComparison.Ordinal) ? text.Replace("−log Γ(x + 1) + ", "").Replace(" − log Γ(x + 1)", "") : text;
    }
}
