using System;
using System.Collections.Generic;
using System.Collections.Immutable;
using System.Linq;
using System.Threading.Tasks;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Tests.Reading;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.Diagnostics;

namespace FamilyGen.Generator.Tests.Pipeline;

/// <summary>Whatever is typed, neither generator nor analyzer throws.</summary>
public class OddDeclarationsTests
{
    private static readonly string[] s_corpus =
    [
        """
        [Family] public partial class FaultyTwistlocks
        {
            const int Spare = 2;
            [Support] static CountRange Range([Known] int checkedLocks) => CountRange.Between(0, checkedLocks);
            [Support] static bool Allowed(int x) => x != 3 && x is not (4 or > 90);
            [SufficientStatistic(Parameter = "logit")] static double Faulty(int x) => x;
            [SufficientStatistic] static double Even(int x) { double y = 0; if (x % 2 == 0) y = 1; else { return y; } return y; }
            [LogBaseMeasure] static double Ways(int x, [Known] int checkedLocks) => BinomialLn(checkedLocks + Spare, x);
        }
        """,
        """
        namespace Harbour;
        partial struct Crane
        {
            [Family] internal sealed partial class RepairHours : IComparable
            {
                [Support] Interval Range => Interval.Above(Lowest).IncludingLower().WithMassAt(0);
                double Lowest => 2 * Delay;
                [LogKernel] static double Kernel(double x, double shape, [Positive] double rate, double delay)
                    => x switch { < 0 => 0, > 5 and < 7 => Log(x), _ => (shape - 1) * Log(x) - rate * x - Ratio(delay, x) };
                static double Ratio(double a, double b) { switch (a) { case 0: return 0; default: break; } return a / b; }
                public int CompareTo(object? other) => 0;
            }
        }
        """,
        """
        [Family] partial class Stoppages
        {
            static readonly Random s_random = new(1);
            [Support] static readonly CountRange Range = CountRange.From(long.MinValue);
            [SufficientStatistic] static double Log(long x) => Log(x + s_random.NextDouble());
            [BaseMeasure] static double Weight(long x) { foreach (var i in "abc") { } return x / (x - x); }
        }
        """,
    ];

    private static readonly string[] s_inserts =
    [
        "static", "partial", "<T>", "?", "ref", "[Known]", "[Support]", "[LogKernel]", "[Family]", "double", "int x", "()", "=>", "{", "}", ";", "default",
        "null", "new()", "this", "base", "throw", "await", "x", "Shape", "1e999", "'c'", "\"s\"", "checked", "unsafe", "1/0", "-", "..", "is", "with { }", "@class", "record", "out _",
    ];

    [Fact]
    public async Task MutatedDeclarations()
    {
        var random = new Random(20240229);
        for (var round = 0; round < 150; round++)
            await Check(Mutate(s_corpus[round % s_corpus.Length], random));
    }

    [Theory]
    [InlineData("[Family]")]
    [InlineData("[Family] class")]
    [InlineData("[Family] public partial class A : A { [Support] CountRange R => R; [SufficientStatistic] static double T(int x) => T(x); }")]
    [InlineData("[Family] partial class A { [Support] static Interval R => Q; static Interval Q => R; [SufficientStatistic] static double T(double x) => x; }")]
    [InlineData("[Family] partial class A { [Support] static Interval R => Interval.Above(a); const double a = b; const double b = a; [SufficientStatistic] static double T(double x) => x; }")]
    [InlineData("[Family] partial class A { [Support] static CountRange R => CountRange.From(1 / 0); [SufficientStatistic] static double T(int x) => x % 0; }")]
    [InlineData("[Family] partial class A { [Support] static dynamic R => 1; [SufficientStatistic] static dynamic T(dynamic x) => x; }")]
    [InlineData("[Family] partial class A { [Support] static CountRange R => CountRange.From(0); [SufficientStatistic] static double T(int x) => M(x); static double M(params int[] a) => 1; }")]
    [InlineData("[Family] partial class A { [Support] static CountRange R => CountRange.From(0); [SufficientStatistic] static double T(int _) => _; }")]
    [InlineData("[Family] partial class A { [Support] static CountRange R => CountRange.From(0); [SufficientStatistic] static double T(int @class) => @class; [SufficientStatistic] static double @long(int x) => x; }")]
    [InlineData("[Family] partial class A { [Support] static CountRange R => CountRange.From(0); [SufficientStatistic(Parameter = null!)] static double T(int x) => x; [SufficientStatistic(Parameter = \"\")] static double U(int x) => x; }")]
    [InlineData("[Family] partial class A { [Support] static Interval R { init { } } [Support] static Interval S { set { } } [LogKernel] static double K(double x, __arglist) => x; }")]
    [InlineData("[Family] partial class A { [Support] static Interval R => Interval.RealLine; [LogKernel] static async System.Threading.Tasks.Task<double> K(double x, double a) => await null; }")]
    [InlineData("[Family] partial class A { [Support] static Interval R => Interval.RealLine; [LogKernel] static double K(double x, double a) { goto end; end: return x; } }")]
    [InlineData("[Family] partial class A { [Support] static Interval R => Interval.RealLine; [LogKernel] static double K(double x, double a) => x is var y && y > 0 ? a * y : 1; }")]
    [InlineData("[Family] partial class A { [Support] static Interval R => Interval.RealLine; [LogKernel] static double K(double x, double a) => 0.1e-99999 * x * a; }")]
    [InlineData("[Family] partial class A { [Support] static Interval R => Interval.RealLine; [LogKernel] static double K(double x, double a) => x * a * 79228162514264337593543950335m; }")]
    [InlineData("[Family] partial class A { [Support] static Interval R => Interval.RealLine; [Support] extern static bool B(double x); [LogKernel] static partial double K(double x, double a); static partial double K(double x, double a) => a * x; }")]
    public Task OddOnes(string source) => Check(source);

    public static TheoryData<string, string> Enormous => new()
    {
        { "a long sum", "return " + string.Join(" + ", Enumerable.Repeat("x", 3000)) + ";" },
        { "brackets", "return " + new string('(', 300) + "x" + new string(')', 300) + ";" },
        { "nested calls", "return " + string.Concat(Enumerable.Repeat("Log(1.0 + ", 200)) + "x" + new string(')', 200) + ";" },
        { "repeated squares", "double y = x;" + string.Concat(Enumerable.Repeat("y = y * y;", 40)) + "return y;" },
        { "repeated conditions", "bool y = x > 1;" + string.Concat(Enumerable.Repeat("y = y && y;", 40)) + "return y ? 1 : 0;" },
        { "many ways out", "double y = 0;" + string.Concat(Enumerable.Range(0, 40).Select(i => $"if (x > {i}) {{ if (x == {2 * i}) return {i}; y += {i}; }}")) + "return y;" },
        { "many choices", "double y = x;" + string.Concat(Enumerable.Range(0, 40).Select(i => $"if (y > {i}) y *= y; else y = -y;")) + "return y;" },
    };

    [Theory]
    [MemberData(nameof(Enormous))]
    public Task EnormousFormulas(string what, string body)
    {
        Assert.NotEmpty(what);
        return Check("[Family] partial class A { [Support] static CountRange R => CountRange.From(0); [SufficientStatistic] static double T(int x) { " + body + " } }");
    }

    private static string Mutate(string source, Random random)
    {
        var tokens = CSharpSyntaxTree.ParseText(source).GetRoot().DescendantTokens().Select(t => t.ToString()).ToList();
        for (var edits = 1 + random.Next(3); edits > 0; edits--)
        {
            var at = random.Next(tokens.Count);
            switch (random.Next(4))
            {
                case 0:
                    tokens.RemoveAt(at);
                    break;
                case 1:
                    tokens.Insert(at, s_inserts[random.Next(s_inserts.Length)]);
                    break;
                case 2:
                    tokens[at] = s_inserts[random.Next(s_inserts.Length)];
                    break;
                default:
                    (tokens[at], tokens[^1]) = (tokens[random.Next(tokens.Count)], tokens[^1]);
                    break;
            }
        }

        return string.Join(" ", tokens);
    }

    private static async Task Check(string source)
    {
        var compilation = DeclaredSource.Compile(source);
        CSharpGeneratorDriver.Create([new FamilyGenerator().AsSourceGenerator()], parseOptions: DeclaredSource.Parse)
            .RunGeneratorsAndUpdateCompilation(compilation, out var generated, out var problems);
        Assert.True(problems.IsEmpty, source + "\n" + string.Join("\n", problems));
        foreach (var seen in new[] { compilation, generated })
        {
            var diagnostics = await seen.WithAnalyzers([new FamilyAnalyzer()]).GetAnalyzerDiagnosticsAsync();
            Assert.True(diagnostics.All(d => d.Id != "AD0001"), source + "\n" + string.Join("\n", diagnostics));
        }

        // Refused or in order, but never silent: code that compiles and yet is no family has a message.
        if (!compilation.GetDiagnostics().Any(d => d.Severity == DiagnosticSeverity.Error) && Silent(generated))
            Assert.Fail("nothing is generated and nothing said:\n" + source);
    }

    private static bool Silent(Compilation generated) =>
        generated.SyntaxTrees.Last().ToString().Contains("is not a valid family", StringComparison.Ordinal)
        && !generated.WithAnalyzers([new FamilyAnalyzer()]).GetAnalyzerDiagnosticsAsync().Result.Any(d => d.Severity == DiagnosticSeverity.Error);
}
