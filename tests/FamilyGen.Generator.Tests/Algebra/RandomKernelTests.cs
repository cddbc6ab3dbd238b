using System;
using System.Linq;
using FamilyGen.Generator.Algebra;
using Xunit;

namespace FamilyGen.Generator.Tests.Algebra;

/// <summary>Random formulas: the normal form, where there is one, says the same as the kernel; nothing ever throws.</summary>
public class RandomKernelTests
{
    private static readonly double[] s_positive = [0.21, 0.5, 1, 1.7, 2.4, 3, 4.9, 7.3];
    private static readonly double[] s_line = [-3.1, -1, -0.4, 0.3, 1, 2.2, 5];
    private static readonly double[] s_counts = [0, 1, 2, 3, 4, 5, 9, 14];

    [Theory]
    [InlineData("half-line", 1, 400)]
    [InlineData("line", 2, 400)]
    [InlineData("counts", 3, 400)]
    public void Normal_form_agrees_with_the_kernel(string space, int seed, int count)
    {
        var random = new Random(seed);
        var (forms, refusals) = (0, 0);
        for (var i = 0; i < count; i++)
        {
            var text = string.Join(" + ", Enumerable.Range(0, random.Next(1, 4)).Select(_ => Term(random, space, 2)));
            var family = space switch
            {
                "half-line" => FamilyText.Interval("0", known: "k"),
                "line" => FamilyText.Interval(null, known: "k"),
                _ => FamilyText.Counts("0", known: "k #n"),
            };
            family.LogKernel(string.Join(" ", "abc".Where(p => Uses(text, p)).Select(p => p == 'c' ? "+c" : p.ToString())), text);
            try
            {
                var result = family.Normalize();
                if (result.Form is null)
                {
                    Assert.NotEmpty(result.Findings);
                    Assert.All(result.Findings, f => Assert.True(f.Origin >= 0, f.Id));
                    refusals++;
                    continue;
                }

                if (result.Form.Statistics.Count > 0)
                    forms += Math.Sign(Agreement.OfTrade(family, space switch { "half-line" => s_positive, "line" => s_line, _ => s_counts }));
            }
            catch (Exception e)
            {
                Assert.Fail($"{text}: {e.Message} {e.StackTrace}");
            }
        }

        Assert.True(forms > count / 10, $"{forms} forms");
        Assert.True(refusals > count / 10, $"{refusals} refusals");
    }

    [Theory]
    [InlineData("half-line", 4)]
    [InlineData("line", 5)]
    [InlineData("counts", 6)]
    public void Any_statistic_has_a_normal_form_that_agrees(string space, int seed)
    {
        var random = new Random(seed);
        for (var i = 0; i < 150; i++)
        {
            var text = Free(random, "xxk", 3, space);
            var family = space switch
            {
                "half-line" => FamilyText.Interval("0", known: "k"),
                "line" => FamilyText.Interval(null, known: "k"),
                _ => FamilyText.Counts("0", known: "k"),
            };
            family.Statistic("A", text);
            var body = family.Form().Statistics[0].Body;
            foreach (var x in space switch { "half-line" => s_positive, "line" => s_line, _ => s_counts })
            {
                double Value(Symbol s) => s.Kind == SymbolKind.Observation ? x : 1.3;
                var (expected, actual) = (Evaluator.Evaluate(family.Declaration().Statistics[0].Body, Value), Agreement.Evaluate(body, Value));
                if (double.IsFinite(expected) && Math.Abs(expected) < 1e6 && double.IsFinite(actual))
                    Assert.True(Math.Abs(expected - actual) <= 1e-9 * (1 + Math.Abs(expected)), $"{text} at {x}: {expected}, {actual}");
            }
        }
    }

    private static string Term(Random random, string space, int depth) =>
        $"{(random.Next(2) == 0 ? Free(random, "abck", depth - 1) : Pick(random, "a", "b", "c", "2", "0.5", "k"))} * {Free(random, random.Next(3) == 0 ? "xak" : "xk", depth, space)}";

    // A formula in the given letters.
    private static string Free(Random random, string letters, int depth, string space = "")
    {
        if (depth <= 0 || random.Next(5) == 0)
            return random.Next(4) == 0 ? Pick(random, "1", "2", "3", "0.5") : letters[random.Next(letters.Length)].ToString();
        string Next() => Free(random, letters, depth - 1, space);
        return random.Next(space == "counts" ? 17 : 15) switch
        {
            0 or 1 => $"({Next()} + {Next()})",
            2 => $"({Next()} - {Next()})",
            3 or 4 => $"({Next()} * {Next()})",
            5 => $"({Next()} / {Next()})",
            6 => $"Pow({Next()}, {Pick(random, "2", "3", "-1", "0.5", "-2", "k")})",
            7 or 8 => $"Log({Next()})",
            9 => $"Exp({Next()})",
            10 => $"{Pick(random, "Cos", "Sin")}({Next()})",
            11 => $"Abs({Next()})",
            12 => $"{Pick(random, "Min", "Max")}({Next()}, {Next()})",
            13 => $"(x {Pick(random, "<", "<=", ">", "==")} {Pick(random, "1", "2", "k", "2.5")} ? {Next()} : {Next()})",
            14 => $"-{Next()}",
            15 => $"GammaLn({Next()} + {Pick(random, "1", "2", "0.5")})",
            _ => $"(x % {Pick(random, "2", "3")} == 0 ? {Next()} : {Next()})",
        };
    }

    private static bool Uses(string text, char name) => System.Text.RegularExpressions.Regex.IsMatch(text, $"\\b{name}\\b");

    private static string Pick(Random random, params string[] choices) => choices[random.Next(choices.Length)];
}
