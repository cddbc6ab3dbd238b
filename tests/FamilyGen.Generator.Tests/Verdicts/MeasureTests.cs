using System.Threading.Tasks;

namespace FamilyGen.Generator.Tests.Verdicts;

/// <summary>FG0301: a base measure that is negative somewhere, or leaves nothing to observe.</summary>
public class MeasureTests
{
    [Theory]
    [InlineData("Interval.Between(0, 1)", "x - 0.5")]
    [InlineData("Interval.Between(0, 1)", "x > 0.25 && x < 0.5 ? -1 : 1")]
    [InlineData("Interval.Between(0, 1).IncludingUpper()", "x < 1 ? 1 : -1")]
    [InlineData("Interval.Above(0)", "Exp(-x) - 0.001")]
    [InlineData("Interval.Above(0).WithMassAt(0)", "x == 0 ? -1 : Exp(-x)")]
    [InlineData("Interval.Circle(24)", "Cos(PI * x / 12)")]
    [InlineData("Interval.Between(0, 1)", "x > 2 ? 1 : 0")]
    [InlineData("Interval.Between(0, 1)", "x == 0.5 ? 1 : 0")]
    [InlineData("Interval.Between(0, 1)", "0")]
    public Task Reported(string range, string body) => Verify.Findings($$"""
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => {{range}};
            [SufficientStatistic] static double Hours(double x) => x;
            [BaseMeasure] static double Weight(double x) => {|FG0301:{{body}}|};
        }
        """);

    [Theory]
    [InlineData("Interval.Between(0, 1)", "Max(0, x - 0.5)")]
    [InlineData("Interval.Between(0, 1)", "x > 0.25 && x < 0.5 ? 0 : 1")]
    [InlineData("Interval.Above(0)", "Exp(-x)")]
    [InlineData("Interval.Above(0).WithMassAt(0)", "x == 0 ? 2 : Exp(-x)")]
    [InlineData("Interval.Circle(24)", "1 + Cos(PI * x / 12)")]
    [InlineData("Interval.Between(0, 1)", "x * (1 - x)")]
    [InlineData("Interval.Between(0, 1)", "(x - 0.5) * (x - 0.5)")]
    public Task Legitimate(string range, string body) => Verify.Findings($$"""
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => {{range}};
            [SufficientStatistic] static double Hours(double x) => -x;
            [BaseMeasure] static double Weight(double x) => {{body}};
        }
        """);

    [Fact]
    public Task LogarithmThatIsNowhereFinite() => Verify.Findings("""
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => Interval.Above(3);
            [LogKernel] static double Kernel(double hours, double rate) => {|FG0301:hours < 3 ? -rate * hours : double.NegativeInfinity|};
        }
        """);

    [Fact]
    public async Task Messages() => Assert.Equal(
        ["FG0301: 'Weight' is negative at x = 0.2; a weight is at least 0: narrow the support, cut it off with Math.Max(0, …), or give its logarithm as [LogBaseMeasure]"],
        await Verify.Messages("""
            [Family] public partial class Shares
            {
                [Support] static Interval Range => Interval.Between(0, 1);
                [SufficientStatistic] static double Share(double x) => x;
                [BaseMeasure] static double Weight(double x) => x - 0.5;
            }
            """));
}
