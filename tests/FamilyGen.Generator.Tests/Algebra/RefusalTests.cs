using System.Linq;
using Xunit;

namespace FamilyGen.Generator.Tests.Algebra;

/// <summary>Kernels that are no exponential family, each with the place that is wrong.</summary>
public class RefusalTests
{
    [Theory]
    [InlineData("hours / scale", "(shape - 1) * Log(x) - Pow(x / scale, shape)", "shape scale", "Pow(x / scale, shape)", "x", "shape", "declare shape as [Known]")]
    [InlineData("student", "-(nu + 1) / 2 * Log(1 + x * x / nu)", "nu", "Log(1 + x * x / nu)", "x²", "nu", "declare nu as [Known]")]
    [InlineData("student as a power", "Log(Pow(1 + x * x / nu, -(nu + 1) / 2))", "nu", "1 + x * x / nu", "x²", "nu", "declare nu as [Known]")]
    [InlineData("cauchy", "-Log(1 + Pow(x - m, 2))", "m", "Log(1 + Pow(x - m, 2))", "x², x", "m", "declare m as [Known]")]
    [InlineData("laplace", "-Abs(x - m)", "m", "Abs(x - m)", "x", "m", "declare m as [Known]")]
    [InlineData("rate in the exponent", "-Exp(k * x) - x", "k", "Exp(k * x)", "x", "k", "declare k as [Known]")]
    [InlineData("frequency", "a * Cos(w * x)", "a w", "Cos(w * x)", "x", "w", "declare w as [Known]")]
    [InlineData("gamma function", "GammaLn(x + r) - x", "r", "GammaLn(x + r)", "x", "r", "declare r as [Known]")]
    [InlineData("opaque", "a * Score(x, b)", "a b", "Score(x, b)", "x", "b", "declare b as [Known]")]
    [InlineData("mixture", "Log(p * Exp(-x) + (1 - p) * Exp(-2 * x))", "p", "Log(p * Exp(-x) + (1 - p) * Exp(-2 * x))", "exp(−x), exp(−2·x)", "p", "declare p as [Known]")]
    public void Tied_factor_is_reported_at_its_place(string _, string kernel, string parameters, string place, string part, string names, string hint)
    {
        var family = FamilyText.Interval("0").LogKernel(parameters, kernel);
        var finding = family.Refusal();
        Assert.Equal("FG0501", finding.Id);
        Assert.Equal(place, family.Sources[finding.Origin]);
        Assert.Equal([part, names, hint], finding.Arguments.Skip(1));
    }

    [Theory]
    [InlineData("x < b ? -a * x : -2 * a * x", "x < b")]
    [InlineData("-a * Max(x, b)", "Max(x, b)")]
    [InlineData("-a * Min(x - b, 3)", "Min(x - b, 3)")]
    public void Kink_that_moves_is_not_separable(string kernel, string place)
    {
        var family = FamilyText.Interval("0").LogKernel("a b", kernel);
        var finding = family.Refusal();
        Assert.Equal(("FG0501", place), (finding.Id, family.Sources[finding.Origin]));
        Assert.Equal("b", finding.Arguments[2]);
    }

    [Theory]
    [InlineData("x > t ? -rate * (x - t) : double.NegativeInfinity", "x > t", "x ≤ t → −∞")]
    [InlineData("x < t ? double.NegativeInfinity : -rate * x", "x < t", "x < t → −∞")]
    [InlineData("Log(x > t ? Exp(-rate * x) : 0)", "x > t", "x ≤ t → −∞")]
    [InlineData("Log((x > t ? 1 : 0) * Exp(-rate * x))", "x > t", "x ≤ t → −∞")]
    [InlineData("Log(Max(0, x - t)) - rate * x", "Max(0, x - t)", "x < t → −∞")]
    [InlineData("x < t ? -rate * x : x < 9 ? -2 * rate * x : double.NegativeInfinity", "x < t", "x ≥ t → −∞")]
    [InlineData("2 * x > 3 * t && x < 9 ? -rate * x : double.NegativeInfinity", "2 * x > 3 * t", "x ≤ 1.5·t → −∞")]
    public void Support_that_moves(string kernel, string place, string what)
    {
        var family = FamilyText.Interval("0").LogKernel("rate t", kernel);
        var finding = family.Refusal();
        Assert.Equal(("FG0101", place), (finding.Id, family.Sources[finding.Origin]));
        Assert.Equal(["t", what], finding.Arguments);
    }

    [Theory]
    [InlineData("a b", "-a * b * x", "a, b", "only −a·b matters")]
    [InlineData("a b c", "-(a + b) * x - c * Log(x)", "a, b", "only −(a + b) matters")]
    [InlineData("a b", "-a * x + Log(b)", "b", "no statistic is multiplied by anything with them")]
    [InlineData("a b", "Log(Exp(a) * x + Exp(a)) - b * x", "a", "no statistic is multiplied by anything with them")]
    [InlineData("a b c", "-a * b * x - a * c * x * x - b", "a, b, c", "only −a·b and −a·c matter")]
    [InlineData("a b c", "-Exp(a + b) * x - c * Exp(a + b) * x * x", "a, b", "only −exp(a + b) and −exp(a + b)·c matter")]
    public void Parameters_that_cannot_be_told_apart(string parameters, string kernel, string names, string what)
    {
        var finding = FamilyText.Interval("0").LogKernel(parameters, kernel).Refusal();
        Assert.Equal(("FG0503", names, what), (finding.Id, finding.Arguments[0], finding.Arguments[1]));
    }

    [Fact]
    public void Work_is_bounded()
    {
        var large = string.Join(" * ", Enumerable.Range(0, 40).Select(i => $"(x - a{i})"));
        var result = FamilyText.Interval("0").LogKernel(string.Join(" ", Enumerable.Range(0, 40).Select(i => $"a{i}")), large).Normalize();
        Assert.Null(result.Form);
        Assert.All(result.Findings, f => Assert.Equal("FG0501", f.Id));

        var deep = string.Concat(Enumerable.Repeat("Exp(", 400)) + "a * x" + new string(')', 400);
        Assert.Null(FamilyText.Interval("0").LogKernel("a", deep).Normalize().Form);
    }
}
