using System;
using System.Collections.Immutable;
using System.Linq;
using FamilyGen.Generator.Tests.Reading;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.Text;

namespace FamilyGen.Generator.Tests.Pipeline;

/// <summary>What runs again after an edit, and what does not.</summary>
public class IncrementalTests
{
    private const string Family = """
        [Family] public partial class RepairHours
        {
            const double Least = 0.25;
            [Support] static Interval Range => Interval.Above(Least);
            [LogKernel] static double Kernel(double hours, double shape, double rate) => (shape - 1) * Log(Tides.Scaled(hours)) - rate * hours;
        }
        """;

    private const string OtherFamily = """
        [Family] public partial class ShiftStoppages
        {
            [Support] static CountRange Range => CountRange.From(0);
            [SufficientStatistic] static double Total(int x) => x;
        }
        """;

    private const string Functions = """
        static class Tides
        {
            public static double Scaled(double x) => 2 * x;
            public static int Other() => 1;
        }
        """;

    private static readonly string[] s_laterSteps = [FamilyGenerator.Steps.Judge, FamilyGenerator.Steps.Emit];

    [Theory]
    [InlineData(0, "const double", "/* in hours */ const double")]
    [InlineData(0, "const double", "// in hours\n\n    const double")]
    [InlineData(0, " - rate * hours", "\n            -   rate*hours")]
    [InlineData(0, "0.25", "0.250")]
    [InlineData(2, "=> 1", "=> 2")]
    [InlineData(2, "static class", "// tides\nstatic class")]
    [InlineData(2, "2 * x;", "2 /* twice */ * x;")]
    public void NothingRunsAgain(int file, string before, string after)
    {
        var (first, second) = Edit(file, before, after);
        Assert.All(Reasons(second, FamilyGenerator.Steps.Read), r => Assert.True(r is IncrementalStepRunReason.Cached or IncrementalStepRunReason.Unchanged));
        foreach (var step in s_laterSteps)
            Assert.All(Reasons(second, step), r => Assert.Equal(IncrementalStepRunReason.Cached, r));
        Assert.All(second.TrackedOutputSteps.SelectMany(s => s.Value).SelectMany(s => s.Outputs), o => Assert.Equal(IncrementalStepRunReason.Cached, o.Reason));
        Assert.Equal(Texts(first), Texts(second));
    }

    [Theory]
    [InlineData(0, "- 1)", "- 2)", true)]
    [InlineData(0, "double rate", "double pace, double rate", true)]
    [InlineData(2, "2 * x", "2 + x", true)]
    [InlineData(2, "2 * x", "3 * x", false)] // log 2x and log 3x differ by a constant, which the normalizer takes
    [InlineData(0, "0.25", "0.5", false)] // the end is taken from the declared member
    public void OneFamilyRunsAgain(int file, string before, string after, bool isOtherCode)
    {
        var (_, second) = Edit(file, before, after);
        string[] steps = [FamilyGenerator.Steps.Read, FamilyGenerator.Steps.Judge, .. isOtherCode ? [FamilyGenerator.Steps.Emit] : Array.Empty<string>()];
        foreach (var step in steps)
        {
            var reasons = Reasons(second, step);
            Assert.Equal(2, reasons.Length);
            Assert.Single(reasons, r => r == IncrementalStepRunReason.Modified);
            Assert.Single(reasons, r => r is IncrementalStepRunReason.Cached or IncrementalStepRunReason.Unchanged);
        }
    }

    [Fact]
    public void AnInvalidDeclarationIsRememberedToo()
    {
        var (_, second) = Run(Family.Replace("Least;\n", "Shape;\n").Replace("=> Interval.Above(Least)", "=> Interval.Above(shape)"), "=> 1", "=> 2");
        Assert.All(Reasons(second, FamilyGenerator.Steps.Judge), r => Assert.Equal(IncrementalStepRunReason.Cached, r));
    }

    private static (GeneratorRunResult First, GeneratorRunResult Second) Edit(int file, string before, string after)
    {
        string[] sources = [Family, OtherFamily, Functions];
        return Run(sources, file, before, after);
    }

    private static (GeneratorRunResult First, GeneratorRunResult Second) Run(string family, string before, string after) =>
        Run([family, OtherFamily, Functions], 2, before, after);

    private static (GeneratorRunResult First, GeneratorRunResult Second) Run(string[] sources, int file, string before, string after)
    {
        Assert.Contains(before, sources[file]);
        var compilation = DeclaredSource.Compile(sources);
        GeneratorDriver driver = CSharpGeneratorDriver.Create(
            [new FamilyGenerator().AsSourceGenerator()],
            parseOptions: DeclaredSource.Parse,
            driverOptions: new GeneratorDriverOptions(IncrementalGeneratorOutputKind.None, trackIncrementalGeneratorSteps: true));
        driver = driver.RunGenerators(compilation);
        var first = driver.GetRunResult().Results.Single();
        var tree = compilation.SyntaxTrees[file];
        var edited = tree.WithChangedText(SourceText.From(tree.GetText().ToString().Replace(before, after)));
        driver = driver.RunGenerators(compilation.ReplaceSyntaxTree(tree, edited));
        return (first, driver.GetRunResult().Results.Single());
    }

    private static ImmutableArray<IncrementalStepRunReason> Reasons(GeneratorRunResult result, string step) =>
        result.TrackedSteps[step].SelectMany(s => s.Outputs).Select(o => o.Reason).ToImmutableArray();

    private static string Texts(GeneratorRunResult result) => string.Join("\n", result.GeneratedSources.Select(s => s.HintName + s.SourceText));
}
