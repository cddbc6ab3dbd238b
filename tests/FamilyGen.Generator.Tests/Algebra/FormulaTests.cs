using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using Xunit;

namespace FamilyGen.Generator.Tests.Algebra;

/// <summary>Evaluation, derivatives, texts and exact numbers.</summary>
public class FormulaTests
{
    private static readonly Dictionary<string, Symbol> s_symbols = new()
    {
        ["x"] = new("x", SymbolKind.Observation, false),
        ["n"] = new("n", SymbolKind.Observation, true),
        ["rate"] = new("rate", SymbolKind.Parameter, false),
    };

    [Theory]
    [InlineData("Pow(x, 3) - 2 / x + Sqrt(x)")]
    [InlineData("Log(1 + Exp(-2 * x)) * Cos(x)")]
    [InlineData("GammaLn(x + 0.5) * Sin(3 * x)")]
    [InlineData("Pow(x, x)")]
    [InlineData("Abs(x - 5) * Min(x, 2) + Max(x, 1)")]
    [InlineData("x < 3 ? x * x : Log(x)")]
    [InlineData("Pow(2, x) / (1 + x * x)")]
    public void Derivatives_agree_with_differences(string text)
    {
        var f = Read(text);
        var slope = Derivative.Of(f)!;
        foreach (var x in (double[])[0.3, 1.7, 4.2, 6.1])
        {
            const double Step = 1e-5;
            var difference = (At(f, x + Step) - At(f, x - Step)) / (2 * Step);
            Assert.Equal(difference, At(slope, x), 1e-6 * (1 + Math.Abs(difference)));
        }
    }

    [Fact]
    public void Opaque_functions_have_no_derivative() => Assert.Null(Derivative.Of(Read("x * Score(x)")));

    [Theory]
    [InlineData("x * x", "x·x")]
    [InlineData("Pow(x, 2) / 3", "x²/3")]
    [InlineData("1 / x", "1/x")]
    [InlineData("-rate * x", "−rate·x")]
    [InlineData("1 - rate", "1 − rate")]
    [InlineData("(1 - rate) * Log(x)", "(1 − rate)·log(x)")]
    [InlineData("x / (2 * rate)", "x/(2·rate)")]
    [InlineData("Sqrt(x)", "√x")]
    [InlineData("Abs(x - 3)", "|x − 3|")]
    [InlineData("x < 2 ? 1 : 0", "[x < 2]")]
    [InlineData("2 < x && x <= 3 ? 1 : 0", "[2 < x ≤ 3]")]
    [InlineData("n % 2 == 0 ? 1 : 0", "[(n mod 2) = 0]")]
    [InlineData("2.5 * x + 0.001", "2.5·x + 0.001")]
    public void Texts(string text, string expected) => Assert.Equal(expected, Rendering.Text(Read(text)));

    [Theory]
    [InlineData(0.1, 2.2527126517342059599)]
    [InlineData(0.5, 0.57236494292470008707)]
    [InlineData(3.7, 1.4280723266653279)]
    [InlineData(25, 54.784729398112319190)]
    [InlineData(1e6, 12815504.569147611)]
    [InlineData(-1.5, 0.86004701537648098)]
    public void Log_gamma(double x, double expected) => Assert.Equal(expected, GammaFunctions.LogGamma(x), 1e-13 * (1 + Math.Abs(expected)));

    [Theory]
    [InlineData(1, -0.57721566490153286061)]
    [InlineData(0.25, -4.2274535333762654081)]
    [InlineData(10, 2.2517525890667211077)]
    public void Digamma(double x, double expected) => Assert.Equal(expected, GammaFunctions.Digamma(x), 1e-13 * (1 + Math.Abs(expected)));

    [Theory]
    [InlineData("2.5", 5, 2)]
    [InlineData("1e-3", 1, 1000)]
    [InlineData("-0.125", -1, 8)]
    [InlineData("12E2", 1200, 1)]
    public void Literals_are_exact(string text, int numerator, int denominator) => Assert.Equal(new Rational(numerator, denominator), Rational.Parse(text));

    [Fact]
    public void Fractions_round_to_the_nearest_double()
    {
        Assert.Equal(1.0 / 3, new Rational(1, 3).ToDouble());
        Assert.Equal(-2.0 / 7, new Rational(-2, 7).ToDouble());
        Assert.Equal(0.1, Rational.Parse("0.1").ToDouble());
        Assert.Equal(1e-300, Rational.Parse("1e-300").ToDouble());
        Assert.Equal(1.7976931348623157e308, Rational.Parse("1.7976931348623157e308").ToDouble());
    }

    [Fact]
    public void Sign_changes_are_found()
    {
        var scope = new Scope(FamilyText.Interval("0").Statistic("A", "x").Declaration());
        Assert.Equal(["1", "2"], Roots.Of(Read("x * x - 3 * x + 2"), scope)!.Select(Rendering.Text));
        Assert.Empty(Roots.Of(Read("x * x + 1"), scope)!);
        Assert.Null(Roots.Of(Read("x - rate"), scope));
    }

    [Fact]
    public void Conditions_that_exclude_each_other_are_known_to()
    {
        static Condition Condition(string text) => new FormulaReader(text, s_symbols).ReadCondition();
        Assert.Equal("never", Rendering.Text(Conditions.And(Condition("x < 1"), Condition("x > 2"))));
        Assert.Equal("x < 1", Rendering.Text(Conditions.And(Condition("x < 1"), Condition("x < 2"))));
        Assert.Equal("1 < x < 2", Rendering.Text(Conditions.And(Condition("x < 2"), Condition("x > 1"))));
        Assert.Equal("x ≥ 1", Rendering.Text(Conditions.Not(Condition("x < 1"))));
    }

    private static Expression Read(string text) => new FormulaReader(text, s_symbols).Read();

    private static double At(Expression expression, double x) => Evaluator.Evaluate(expression, _ => x);
}
