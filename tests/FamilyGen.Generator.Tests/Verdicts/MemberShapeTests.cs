using System.Threading.Tasks;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Tests.Reading;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.Diagnostics;

namespace FamilyGen.Generator.Tests.Verdicts;

/// <summary>FG0001 on a member: its signature, and what its body may say.</summary>
public class MemberShapeTests
{
    [Theory]
    [InlineData("[SufficientStatistic] double {|FG0001:Other|}(int x) => x;")]
    [InlineData("[SufficientStatistic] static double {|FG0001:Other|}() => 1;")]
    [InlineData("[SufficientStatistic] static double {|FG0001:Other|}([Known] int n) => n;")]
    [InlineData("[SufficientStatistic] static bool {|FG0001:Other|}(int x) => x > 1;")]
    [InlineData("[SufficientStatistic] static float {|FG0001:Other|}(int x) => x;")]
    [InlineData("[SufficientStatistic] static double Other(short {|FG0001:x|}) => x;")]
    [InlineData("[SufficientStatistic] static double Other(long {|FG0001:x|}) => x;")]
    [InlineData("[SufficientStatistic] static double Other(double {|FG0001:x|}) => x;")]
    [InlineData("[SufficientStatistic] static double {|FG0001:Other|}(in int x) => x;")]
    [InlineData("[SufficientStatistic] static double {|FG0001:Other|}<T>(int x) => x;")]
    [InlineData("[SufficientStatistic] static double Other(int x, [Known] float {|FG0001:n|}) => x * n;")]
    [InlineData("[SufficientStatistic] static double Other(int x, [Known] string {|FG0001:n|}) => x;")]
    [InlineData("[SufficientStatistic(Parameter = \"log rate\")] static double {|FG0001:Other|}(int x) => x * x;")]
    [InlineData("[SufficientStatistic] static double A(int x, [Known] int n) => x * n; [SufficientStatistic] static double B(int x, int {|FG0001:n|}) => x * n;")]
    [InlineData("[Support] static bool {|FG0001:Open|} => true;")]
    [InlineData("[Support] static bool {|FG0001:Open|}([Known] int n) => n > 1;")]
    [InlineData("[SufficientStatistic] static extern double {|FG0001:Other|}(int x);")]
    public Task Signatures(string member) => Verify.Findings($$"""
        [Family] public partial class Stoppages
        {
            [Support] static CountRange Range => CountRange.From(0);
            [SufficientStatistic] static double Total(int x) => x;
            {{member}}
        }
        """);

    [Theory]
    [InlineData("[LogKernel] static double {|FG0001:Kernel|}(double x) => -x;")]
    [InlineData("[LogKernel] double {|FG0001:Kernel|}(double x, double rate) => -rate * x;")]
    [InlineData("[LogKernel] static double Kernel(double x, int {|FG0001:rate|}) => -rate * x;")]
    [InlineData("[LogKernel] static double Kernel(double x, double rate) => -rate * x; [Support] static bool {|FG0001:Open|}(double x) => x > 1;")]
    public Task Kernels(string member) => Verify.Findings($$"""
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => Interval.Above(0);
            {{member}}
        }
        """);

    [Theory]
    [InlineData("static double {|FG0001:Range|} => 1;", "int")]
    [InlineData("static CountRange? {|FG0001:Range|} => CountRange.From(0);", "int")]
    [InlineData("static (int, int) {|FG0001:Range|} => (0, 1);", "int")]
    [InlineData("static CountRange {|FG0001:Range|} => CountRange.From(0);", "double")]
    [InlineData("static Interval {|FG0001:Range|} => Interval.Above(0);", "int")]
    [InlineData("CountRange {|FG0001:Range|} => CountRange.From(0);", "int")]
    [InlineData("static CountRange Range(int {|FG0001:x|}) => CountRange.From(0);", "int")]
    [InlineData("static CountRange Range([Known] int n) => {|FG0001:n > 5 ? CountRange.From(0) : CountRange.From(1)|};", "int")]
    [InlineData("static CountRange Range([Known] int n) { {|FG0001:if (n > 5) return CountRange.From(0);|} return CountRange.From(1); }", "int")]
    [InlineData("static Interval Range => {|FG0001:(Interval)(object)Interval.RealLine|};", "double")]
    [InlineData("static Interval Range => {|FG0001:Interval.Above(0) with { }|};", "double")]
    [InlineData("static Interval Range => Interval.Above({|FG0001:Interval.RealLine.Lower|});", "double")]
    [InlineData("static readonly CountRange {|FG0001:Range|};", "int")]
    public async Task Supports(string member, string type)
    {
        var source = $$"""
            [Family] public partial class Stoppages
            {
                [Support] {{member}}
                [SufficientStatistic] static double Total({{type}} x) => x;
            }
            """;
        if (member.Contains("readonly"))
            await Verify.FindingsBesideCompilerErrors(source);
        else
            await Verify.Findings(source);
    }

    [Theory]
    [InlineData("double sum = 0; {|FG0001:for (var i = 1; i <= x; i++) sum += Log(i);|} return sum;")]
    [InlineData("{|FG0001:while (x > 3) x--;|} return x;")]
    [InlineData("{|FG0001:foreach (var i in new int[3]) { }|} return x;")]
    [InlineData("{|FG0001:try { return x; } finally { }|}")]
    [InlineData("if (x > 3) {|FG0001:throw new Exception();|} return x;")]
    [InlineData("double sum = Sum(); return sum; double Sum() { {|FG0001:while (true) { }|} }")]
    [InlineData("var y = x; return F() + y; int F() { {|FG0001:y++|}; return 1; }")]
    [InlineData("var pair = {|FG0001:(x, 2)|}; return {|FG0001:pair.Item1|};")]
    [InlineData("int y; y = {|FG0001:x = 2|}; return y;")]
    [InlineData("Func<int, int> f = {|FG0001:i => i|}; return 1;")]
    public Task Statements(string body) => Verify.Findings($$"""
        [Family] public partial class Stoppages
        {
            [Support] static CountRange Range => CountRange.From(0);
            [SufficientStatistic] static double Total(int x) { {{body}} }
        }
        """);

    [Theory]
    [InlineData("x * {|FG0001:s_table[1]|}", "static readonly double[] s_table = [1, 2];")]
    [InlineData("x * ({|FG0001:x << 2|})", "")]
    [InlineData("{|FG0001:x & 1|}", "")]
    [InlineData("{|FG0001:~x|}", "")]
    [InlineData("x switch { 0 => 1, _ => {|FG0001:throw new Exception()|} }", "")]
    [InlineData("{|FG0001:x.CompareTo(3)|}", "")]
    [InlineData("{|FG0001:x.ToString().Length|}", "")]
    [InlineData("{|FG0001:\"crane\".Length|} * x", "")]
    [InlineData("{|FG0001:double.Parse(\"3\")|} * x", "")]
    [InlineData("{|FG0001:new Half(x) * x|}", "class Half(double x) { public static double operator *(Half h, double y) => y; public double X => x; }")]
    [InlineData("x is {|FG0001:{ }|} ? 1 : 0", "")]
    [InlineData("{|FG0001:Twice<int>(x)|}", "static double Twice<T>(int a) => 2 * a;")]
    [InlineData("{|FG0001:Swap(ref x)|}", "static double Swap(ref int a) => a;")]
    [InlineData("Even(x)", "static double Even(int n) => n == 0 ? 1 : Odd(n - 1); static double Odd(int n) => n == 0 ? 0 : {|FG0001:Even(n - 1)|};")]
    [InlineData("{|FG0001:InSupport(x)|} ? 1 : 0", "")]
    [InlineData("{|FG0001:LogBase(x)|}", "")]
    public Task Expressions(string body, string members) => Verify.Findings($$"""
        [Family] public partial class Stoppages
        {
            [Support] static CountRange Range => CountRange.From(0);
            [SufficientStatistic] static double Total(int x) => {{body}};
            {{members}}
        }
        """);

    [Fact]
    public void ThePlaceIsInTheFileThatIsFollowed()
    {
        var findings = DeclaredSource.Findings(
            """
            [Family] public partial class Stoppages
            {
                [Support] static CountRange Range => CountRange.From(0);
                [SufficientStatistic] static double Total(int x) => Sums.Harmonic(x);
            }
            """,
            """
            static class Sums
            {
                public static double Harmonic(int n) { double s = 0; for (var i = 1; i <= n; i++) s += 1.0 / i; return s; }
            }
            """);
        Assert.Equal(["FG0001 at `for (var i = 1; i <= n; i++) s += 1.0 / i;`"], findings);
    }

    [Fact]
    public async Task MembersThatAnotherGeneratorWrites()
    {
        // The generator sees the first file only, the analyzer both.
        var generated = DeclaredSource.Generate(DeclaredSource.Compile("""
            [Family] public partial class Stoppages
            {
                [Support] static CountRange Range => CountRange.From(Tides.Least);
                [SufficientStatistic] static double Total(int x) => x;
            }
            """));
        var complete = generated.AddSyntaxTrees(CSharpSyntaxTree.ParseText("static class Tides { public const int Least = 1; }", DeclaredSource.Parse));
        var diagnostic = Assert.Single(await complete.WithAnalyzers([new FamilyAnalyzer()]).GetAnalyzerDiagnosticsAsync());
        Assert.Equal("'Stoppages' uses something that another source generator writes, and generators do not see each other's code; write it into a source file", diagnostic.GetMessage());
    }

    [Fact]
    public async Task Messages() => Assert.Equal(
        ["FG0001: A loop is not read as a formula; write the sum or product in closed form"],
        await Verify.Messages("""
            [Family] public partial class Stoppages
            {
                [Support] static CountRange Range => CountRange.From(0);
                [SufficientStatistic] static double Total(int x) { while (x > 0) x--; return x; }
            }
            """));
}
