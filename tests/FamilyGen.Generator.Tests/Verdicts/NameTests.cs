using System.Threading.Tasks;
using FamilyGen.Generator.Tests.Reading;

namespace FamilyGen.Generator.Tests.Verdicts;

/// <summary>FG0002 and FG0003: names that collide, hide or nearly agree.</summary>
public class NameTests
{
    [Theory]
    [InlineData("[SufficientStatistic] static double {|FG0002:Mean|}(int x) => x * x;")]
    [InlineData("[SufficientStatistic] static double {|FG0002:Statistics|}(int x) => x * x;")]
    [InlineData("static double {|FG0002:Density|} => 2;")]
    [InlineData("static double {|FG0002:Fit|}(string path) => path.Length;")]
    [InlineData("class {|FG0002:Accumulator|} { }")]
    [InlineData("[SufficientStatistic] static double Square(int x) => x * x; [SufficientStatistic(Parameter = \"square\")] static double {|FG0002:Cube|}(int x) => x * x * x;")]
    [InlineData("[SufficientStatistic] static double Scaled(int x, [Known] int {|FG0002:total|}) => x * total;")]
    [InlineData("[SufficientStatistic] static double Scaled(int y, [Known] int {|FG0002:x|}) => x * y;")]
    [InlineData("[SufficientStatistic] static double Scaled(int x, [Known] int {|FG0002:mean|}) => x * mean;")]
    [InlineData("[SufficientStatistic] static double Scaled(int x, [Known] int {|FG0002:count|}) => x * count;")]
    [InlineData("[SufficientStatistic] static double Scaled(int x, [Known] int {|FG0002:berths|}) => x * berths; static int Berths => 3;")]
    public Task Canonical(string members) => Verify.Findings($$"""
        [Family] public partial class Stoppages
        {
            [Support] static CountRange Range => CountRange.From(0);
            [SufficientStatistic] static double Total(int x) => x;
            {{members}}
        }
        """);

    [Fact]
    public Task ConstructorOfTheSameArguments() => Verify.FindingsBesideCompilerErrors("""
        [Family] public partial class Stoppages
        {
            [Support] static CountRange Range => CountRange.From(0);
            [SufficientStatistic] static double Total(int x, [Known] int berths) => x * berths;
            public {|FG0002:Stoppages|}(double a, int b) : this("") { }
            Stoppages(string label) : this(label.Length, 2) { }
        }
        """);

    [Fact]
    public Task ConstructorOfTheSameArgumentsThatKeepsThem() => Verify.Findings("""
        [Family] public partial class Stoppages
        {
            [Support] static CountRange Range => CountRange.From(0);
            [SufficientStatistic] static double Total(int x, [Known] int berths) => x * berths;
            public {|FG0001:Stoppages|}(double a, int b) { }
        }
        """);

    [Theory]
    [InlineData("double {|FG0002:mean|}", "-mean * x", "")]
    [InlineData("double {|FG0002:natural|}", "-natural * x", "")]
    [InlineData("double {|FG0002:e|}", "-e * x", "")]
    [InlineData("double {|FG0002:repairHours|}", "-repairHours * x", "")]
    [InlineData("double {|FG0002:rate|}", "-rate * x", "static double Rate => 2;")]
    [InlineData("double {|FG0002:range|}", "-range * x", "")]
    [InlineData("double {|FG0002:getType|}", "-getType * x", "")]
    [InlineData("double rate, double {|FG0002:Rate|}", "-rate * x - Rate / x", "")]
    [InlineData("double rate, [Known] double {|FG0002:Rate|}", "-rate * x - Rate / x", "")]
    public Task Trade(string parameters, string kernel, string members) => Verify.Findings($$"""
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => Interval.Above(0);
            [LogKernel] static double Kernel(double x, {{parameters}}) => {{kernel}};
            {{members}}
        }
        """);

    [Theory]
    [InlineData("[SufficientStatistic] static double Log(double x) => {|FG0002:Log|}(x);")]
    [InlineData("[SufficientStatistic] static double Sqrt(double x) => 2 * {|FG0002:Sqrt|}(x) + {|FG0002:Sqrt|}(2 * x);")]
    [InlineData("[LogBaseMeasure] static double GammaLn(double x) { return {|FG0002:GammaLn|}(x); }")]
    public async Task HidesTheFunction(string member)
    {
        var source = $$"""
            [Family] public partial class RepairHours
            {
                [Support] static Interval Range => Interval.Above(0);
                [SufficientStatistic] static double Hours(double x) => x;
                {{member}}
            }
            """;
        await Verify.Findings(source);
    }

    [Fact]
    public Task HidesTheFunctionOfACount() => Verify.FindingsBesideCompilerErrors("""
        [Family] public partial class Stoppages
        {
            [Support] static CountRange Range => CountRange.From(1);
            [SufficientStatistic] static double Log(int x) => {|FG0002:Log|}(x + 0.5);
        }
        """);

    [Theory]
    [InlineData("[SufficientStatistic] static double Log(double x) => Math.Log(x);")]
    [InlineData("[SufficientStatistic] static double Square(double x) => Sqrt(x); static double Twice(double x) => 2 * x;")]
    [InlineData("[SufficientStatistic] static double Median(double x) => Log(x);")]
    public void Legitimate(string member) => Assert.Empty(DeclaredSource.Findings($$"""
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => Interval.Above(0);
            [SufficientStatistic] static double Hours(double x) => x;
            {{member}}
        }
        """));

    [Theory]
    [InlineData("int checkedLocks", "int {|FG0003:checkedLock|}")]
    [InlineData("int checkedLocks", "int {|FG0003:chekedLocks|}")]
    [InlineData("int checkedLocks", "int {|FG0003:checkedLocks2|}")]
    [InlineData("int checkedLocks", "long {|FG0003:checkedLocks|}")]
    [InlineData("int checkedLocks", "int totalLocks")]
    [InlineData("int checkedLocks", "int checkedLocks")]
    [InlineData("int berth1", "int berth2")]
    [InlineData("int n", "int m")]
    public void NearlyEqualKnownValues(string first, string second)
    {
        var plain = second.Replace("{|FG0003:", "").Replace("|}", "");
        var name = plain.Split(' ')[1];
        var findings = DeclaredSource.Findings($$"""
            [Family] public partial class FaultyTwistlocks
            {
                [Support] static CountRange Range([Known] {{first}}) => CountRange.Between(0, {{first.Split(' ')[1]}});
                [SufficientStatistic] static double Faulty(int x) => x;
                [LogBaseMeasure] static double Ways(int x, [Known] {{plain}}) => -FactorialLn(x) * {{name}};
            }
            """);
        Assert.Equal(second.Contains("FG0003") ? [$"FG0003 at `{name}`"] : [], findings);
    }

    [Fact]
    public async Task Messages() => Assert.Equal(
        ["FG0002: The name 'mean' cannot be used here: the parameter becomes the property 'Mean', and every family has a generated member 'Mean'; choose another name"],
        await Verify.Messages("""
            [Family] public partial class RepairHours
            {
                [Support] static Interval Range => Interval.Above(0);
                [LogKernel] static double Kernel(double x, double mean) => -x / mean;
            }
            """));
}
