using System.Linq;
using System.Threading.Tasks;
using FamilyGen.Generator.Tests.Reading;
using FamilyGen.Generator.Verdicts;

namespace FamilyGen.Generator.Tests.Verdicts;

/// <summary>FG0401, FG0403, FG0405 and FG0406: what the ends of the support leave of the natural parameters.</summary>
public class ParameterSetTests
{
    [Theory]
    [InlineData("Interval.Above(0)", "Log(x)")]
    [InlineData("Interval.RealLine", "x")]
    [InlineData("Interval.RealLine", "Cos(x)")]
    [InlineData("Interval.RealLine", "x * x * x")]
    [InlineData("Interval.Above(0)", "1 / x")]
    public Task InfiniteForEveryParameter(string range, string body) => Verify.Findings($$"""
        [Family] public partial class {|FG0401:RepairHours|}
        {
            [Support] static Interval Range => {{range}};
            [SufficientStatistic] static double Formula(double x) => {{body}};
        }
        """);

    [Fact]
    public Task InfiniteForEveryParameterOfAKernel() => Verify.Findings("""
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => Interval.Above(0);
            [LogKernel] static double Kernel(double hours, double pace) => {|FG0401:Exp(pace) * hours|};
        }
        """);

    [Theory]
    [InlineData("Interval.RealLine", "x", "-x * x", "{|FG0406:x * x * x|}")]
    [InlineData("Interval.RealLine", "-Abs(x)", "-x * x", "{|FG0406:Exp(x) - Exp(-x)|}")]
    [InlineData("Interval.RealLine", "x", "-x * x", "{|FG0406:x == 0 ? 0 : 1 / x|}")]
    public Task ForcedParameter(string range, string first, string second, string third) => Verify.Findings($$"""
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => {{range}};
            [SufficientStatistic] static double First(double x) => {{first}};
            [SufficientStatistic] static double Second(double x) => {{second}};
            [SufficientStatistic] static double Third(double x) => {{third}};
        }
        """);

    [Fact]
    public Task ForcedParameterOfAKernel() => Verify.Findings("""
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => Interval.RealLine;
            [LogKernel] static double Kernel(double x, double a, double b, double c) => a * x - b * x * x + {|FG0406:c * x * x * x|};
        }
        """);

    [Theory]
    [InlineData("{|FG0403:MathNet.Numerics.SpecialFunctions.Erf(x)|}")]
    [InlineData("1 + {|FG0403:Round(x)|}")]
    [InlineData("{|FG0403:x * Sin(x)|}")]
    [InlineData("{|FG0403:Exp(Cos(x) * x)|}")]
    [InlineData("{|FG0403:Floor(x)|}")]
    public Task Unproved(string body) => Verify.Findings($$"""
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => Interval.RealLine;
            [SufficientStatistic] static double Formula(double x) => {{body}};
            [SufficientStatistic] static double Square(double x) => x * x;
        }
        """);

    [Theory]
    [InlineData("Sin(x)")]
    [InlineData("Cos(x * x)")]
    [InlineData("Sin(x) / (1 + x * x)")]
    [InlineData("Log(3 + Cos(x))")]
    [InlineData("x * DateTime.DaysInMonth(2024, 2)")]
    public Task Proved(string body) => Verify.Findings($$"""
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => Interval.RealLine;
            [SufficientStatistic] static double Formula(double x) => {{body}};
            [SufficientStatistic] static double Square(double x) => x * x;
        }
        """);

    [Theory]
    [InlineData("-FactorialLn(x)", true)]
    [InlineData("Log(x + 1)", true)]
    [InlineData("Sqrt(x)", true)]
    [InlineData("x == 0 ? 1 : 0", false)]
    [InlineData("Exp(-x)", false)]
    public void NotOpen(string body, bool expected)
    {
        var (reading, _) = DeclaredSource.Read($$"""
            [Family] public partial class Stoppages
            {
                [Support] static CountRange Range => CountRange.From(0);
                [SufficientStatistic] static double Total(int x) => x;
                [SufficientStatistic] static double Formula(int x) => {{body}};
            }
            """);
        Assert.Equal(expected ? ["FG0405"] : [], Judgement.Of(reading).Findings.Select(f => f.Id));
    }

    [Theory]
    [InlineData(
        "FG0401: The normalizer is infinite for every parameter: it asks as x → 0 for formula > −1, and as x → ∞ for formula < −1; add a statistic or a base measure that makes the density fall off as x → 0 and x → ∞, or bound the support",
        "Log(x)")]
    [InlineData(
        "FG0401: The normalizer is infinite for every parameter: as x → ∞ the density does not fall off; add a statistic or a base measure that makes the density fall off as x → ∞, or bound the support",
        "1 / (1 + x)")]
    [InlineData(
        "FG0403: '⌊x⌋' breaks at points that cannot be listed, so it cannot be proved that every mode of the density is found; write it with comparisons at known points, or use counts and %",
        "Floor(x)")]
    public async Task Messages(string message, string body) => Assert.Equal(
        [message],
        await Verify.Messages($$"""
            [Family] public partial class RepairHours
            {
                [Support] static Interval Range => Interval.Above(0);
                [SufficientStatistic] static double Formula(double x) => {{body}};
            }
            """));

    [Fact]
    public async Task MessageOfAForcedParameter() => Assert.Equal(
        [
            "FG0406: The normalizer is finite only where skew = 0, which leaves nothing to estimate: it asks as x → −∞ for skew ≥ 0, and as x → ∞ for skew ≤ 0; leave out 'Skew', or bound the support",
        ],
        await Verify.Messages("""
            [Family] public partial class Levels
            {
                [Support] static Interval Range => Interval.RealLine;
                [SufficientStatistic] static double Level(double x) => x;
                [SufficientStatistic] static double Spread(double x) => x * x;
                [SufficientStatistic] static double Skew(double x) => x * x * x;
            }
            """));
}
