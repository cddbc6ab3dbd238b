using System.Threading.Tasks;

namespace FamilyGen.Generator.Tests.Verdicts;

/// <summary>FG0103: nothing, or one value only, can be observed.</summary>
public class EmptySupportTests
{
    [Theory]
    [InlineData("CountRange.Between(5, {|FG0103:3|})")]
    [InlineData("CountRange.Between(3, {|FG0103:3|})")]
    [InlineData("CountRange.Between(Top, {|FG0103:Top / 2|})")]
    [InlineData("CountRange.Between(0, {|FG0103:Top - 9|})")]
    public Task Counts(string range) => Verify.Findings($$"""
        [Family] public partial class Stoppages
        {
            const int Top = 8;
            [Support] static CountRange Range => {{range}};
            [SufficientStatistic] static double Total(int x) => x;
        }
        """);

    [Theory]
    [InlineData("Interval.Between(5, {|FG0103:3|})")]
    [InlineData("Interval.Between(5, {|FG0103:5|})")]
    [InlineData("Interval.Between(5, {|FG0103:5|}).IncludingLower().IncludingUpper()")]
    [InlineData("Interval.Above({|FG0103:double.NaN|})")]
    [InlineData("Interval.Above({|FG0103:Sqrt(-1)|})")]
    [InlineData("Interval.Between(0, {|FG0103:0.0 / 0|})")]
    [InlineData("Interval.Above({|FG0103:double.PositiveInfinity|})")]
    [InlineData("Interval.Below({|FG0103:double.NegativeInfinity|})")]
    [InlineData("Interval.Circle({|FG0103:0|})")]
    [InlineData("Interval.Circle({|FG0103:-24|})")]
    [InlineData("Interval.Circle({|FG0103:double.PositiveInfinity|})")]
    [InlineData("Interval.Above(0).WithMassAt({|FG0103:double.NaN|})")]
    public Task Intervals(string range) => Verify.Findings($$"""
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => {{range}};
            [SufficientStatistic] static double Hours(double x) => x;
        }
        """);

    [Theory]
    [InlineData("[Support] static bool Allowed(int x) => {|FG0103:x > 10|};")]
    [InlineData("[Support] static bool Allowed(int x) => {|FG0103:x % 7 == 5|};")]
    [InlineData("[Support] static bool Allowed(int x) => {|FG0103:false|};")]
    public Task Predicates(string predicate) => Verify.Findings($$"""
        [Family] public partial class Stoppages
        {
            [Support] static CountRange Range => CountRange.Between(0, 10);
            {{predicate}}
            [SufficientStatistic] static double Total(int x) => x;
        }
        """);

    [Theory]
    [InlineData("CountRange Range => CountRange.Between(3, 4);", "int")]
    [InlineData("CountRange Range => CountRange.Between(-1, 0);", "int")]
    [InlineData("CountRange Range([Known] int n) => CountRange.Between(n, n);", "int")]
    [InlineData("CountRange Range => CountRange.Between(0, 1); [Support] static bool Allowed(int x) => x >= 0;", "int")]
    [InlineData("Interval Range => Interval.Between(0, double.PositiveInfinity);", "double")]
    [InlineData("Interval Range => Interval.Between(0, 1e-300);", "double")]
    [InlineData("Interval Range => Interval.Above(0).WithMassAt(0);", "double")]
    public async Task Legitimate(string range, string type) => Assert.Empty(await Task.FromResult(Reading.DeclaredSource.Findings($$"""
        [Family] public partial class Stoppages
        {
            [Support] static {{range}}
            [SufficientStatistic] static double Total({{type}} x) => x;
        }
        """)));

    [Fact]
    public async Task Message() => Assert.Equal(
        ["FG0103: The support is empty because its lower end 5 lies above its upper end 3; exchange the ends"],
        await Verify.Messages("""
            [Family] public partial class Stoppages
            {
                [Support] static CountRange Range => CountRange.Between(5, 3);
                [SufficientStatistic] static double Total(int x) => x;
            }
            """));
}
