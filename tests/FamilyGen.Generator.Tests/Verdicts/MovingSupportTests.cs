using System.Threading.Tasks;

namespace FamilyGen.Generator.Tests.Verdicts;

/// <summary>FG0101: the support depends on a parameter.</summary>
public class MovingSupportTests
{
    [Theory]
    [InlineData("[Support] static Interval Range(double {|FG0101:delay|}) => Interval.Above(delay);")]
    [InlineData("[Support] static Interval Range(double {|FG0101:delay|}) => Interval.Above(0);")]
    [InlineData("[Support] static Interval Range(double {|FG0101:shape|}, [Known] double top, double {|FG0101:delay|}) => Interval.Between(delay, shape + top);")]
    [InlineData("[Support] Interval Range => Interval.Above({|FG0101:Delay|});")]
    [InlineData("[Support] Interval Range => Interval.Above({|FG0101:this.Delay|});")]
    [InlineData("[Support] Interval Range() { var low = 2 * {|FG0101:Delay|}; return Interval.Above(low); }")]
    [InlineData("[Support] Interval Range => Interval.Above(Lowest); double Lowest => Math.Max(0, Start()); double Start() => {|FG0101:Delay|} + 1;")]
    [InlineData("[Support] Interval Range => Usual; Interval Usual => Interval.Above(0).WithMassAt({|FG0101:Delay|});")]
    [InlineData("[Support] Interval Range => Interval.Above({|FG0101:Mean|});")]
    [InlineData("[Support] Interval Range => Interval.Above({|FG0101:Quantile(0.5)|});")]
    [InlineData("[Support] Interval Range => Interval.Above({|FG0101:Natural|}[0]);")]
    public Task ByTheSupportMember(string support) => Verify.Findings($$"""
        [Family] public partial class RepairHours
        {
            {{support}}
            [LogKernel] static double Kernel(double x, double shape, double rate, double delay) => (shape - 1) * Log(x) - rate * x - delay / x;
        }
        """);

    // Names that only our stubs know, or that nobody knows: the compiler has its own word to say.
    [Theory]
    [InlineData("[Support] Interval Range => Interval.Above({|FG0101:delay|});")]
    [InlineData("[Support] static Interval Range => Interval.Above({|FG0101:delay|});")]
    [InlineData("[Support] static Interval Range => Interval.Above({|FG0101:Delay|});")]
    public async Task ByAPropertyOutOfReach(string support) => Assert.Equal(
        [support.Substring(support.IndexOf("FG0101", System.StringComparison.Ordinal), 6) + " at `" + (support.Contains("delay|") ? "delay" : "Delay") + "`"],
        await Task.FromResult(Reading.DeclaredSource.Findings($$"""
            [Family] public partial class RepairHours
            {
                {{support.Replace("{|FG0101:", "").Replace("|}", "")}}
                [LogKernel] static double Kernel(double x, double shape, double rate, double delay) => (shape - 1) * Log(x) - rate * x - delay / x;
            }
            """)));

    [Theory]
    [InlineData("{|FG0101:x < delay|} ? double.NegativeInfinity : -rate * x")]
    [InlineData("{|FG0101:x >= delay|} ? -rate * x : double.NegativeInfinity")]
    [InlineData("-rate * x + Log({|FG0101:x > delay|} ? 1 : 0)")]
    [InlineData("-rate * x + ({|FG0101:x > delay + 1|} ? 0 : -1 / 0.0)")]
    [InlineData("{|FG0101:x - delay > 0|} ? -rate * x : double.NegativeInfinity")]
    [InlineData("-rate * x + Log({|FG0101:Max(0, x - delay)|})")]
    [InlineData("-rate * x + Log({|FG0101:x > delay|} && x < 100 ? 1 : 0)")]
    [InlineData("-rate * x + Log(Exp(-delay) * ({|FG0101:x > delay|} ? 1 : 0))")]
    [InlineData("-rate * x + ({|FG0101:Sign(x - delay) > 0|} ? 0 : double.NegativeInfinity)")]
    [InlineData("x switch { < 1 => double.NegativeInfinity, var y when {|FG0101:y < delay|} => double.NegativeInfinity, _ => -rate * x }")]
    public Task ByTheKernel(string kernel) => Verify.Findings($$"""
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => Interval.Above(0);
            [LogKernel] static double Kernel(double x, double rate, double delay) => {{kernel}};
        }
        """);

    [Fact]
    public Task ByTheKernelsStatements() => Verify.Findings("""
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => Interval.Above(0);
            [LogKernel] static double Kernel(double x, double rate, double delay)
            {
                if ({|FG0101:x < delay|})
                    return double.NegativeInfinity;
                return -rate * x;
            }
        }
        """);

    [Theory]
    [InlineData("[Support] static bool Allowed(int x, double {|FG0101:least|}) => x >= least;")]
    [InlineData("[Support] bool Allowed(int x) => x >= {|FG0101:Least|};")]
    public Task ByThePredicate(string predicate) => Verify.Findings($$"""
        [Family] public partial class Stoppages
        {
            [Support] static CountRange Range => CountRange.From(0);
            {{predicate}}
            [LogKernel] static double Kernel(int x, double rate, double least) => Log(rate) * x + least * Sqrt(x);
        }
        """);

    [Fact]
    public Task CanonicalFormTakesAnUnknown() => Verify.Findings("""
        [Family] public partial class Stoppages
        {
            [Support] static CountRange Range(int {|FG0101:least|}) => CountRange.From(least);
            [SufficientStatistic] static double Total(int x) => x;
        }
        """);

    [Theory]
    [InlineData("[Support] static Interval Range => Interval.Above(Low); const double Low = 1;", "-rate * x")]
    [InlineData("[Support] static Interval Range([Known] double low) => Interval.Above(low);", "-rate * x")]
    [InlineData("[Support] static Interval Range => Interval.Above(0);", "Log(rate * Exp(-rate * x))")]
    [InlineData("[Support] static Interval Range => Interval.Above(0);", "x < 8 ? double.NegativeInfinity : -rate * x")]
    [InlineData("[Support] static Interval Range => Interval.Above(0);", "x < low ? double.NegativeInfinity : -rate * x")]
    [InlineData("[Support] static Interval Range => Interval.Above(0);", "x < 8 ? -rate * x : -2 * rate * x")]
    public Task Legitimate(string support, string kernel) => Verify.Findings($$"""
        [Family] public partial class RepairHours
        {
            {{support}}
            [LogKernel] static double Kernel(double x, double rate{{(kernel.Contains("low") ? ", [Known] double low" : "")}}) => {{kernel}};
        }
        """);

    [Fact]
    public async Task Message() => Assert.Equal(
        ["FG0101: The support depends on the parameter 'Delay' (Range → Lowest → Delay), so an observation that is possible for one value of 'Delay' is impossible for another, and this is no exponential family; bound the support by constants or by [Known] values"],
        await Verify.Messages("""
            [Family] public partial class RepairHours
            {
                [Support] Interval Range => Interval.Above(Lowest);
                double Lowest => Delay;
                [LogKernel] static double Kernel(double x, double rate, double delay) => -rate * x - delay / x;
            }
            """));

    [Fact]
    public async Task MessageOfTheKernel() => Assert.Equal(
        ["FG0101: The support depends on the parameter 'delay' (x < delay → −∞), so an observation that is possible for one value of 'delay' is impossible for another, and this is no exponential family; bound the support by constants or by [Known] values"],
        await Verify.Messages("""
            [Family] public partial class RepairHours
            {
                [Support] static Interval Range => Interval.Above(0);
                [LogKernel] static double Kernel(double x, double rate, double delay) => x < delay ? double.NegativeInfinity : -rate * x;
            }
            """));
}
