using System.Threading.Tasks;

namespace FamilyGen.Generator.Tests.Verdicts;

/// <summary>FG0203: the innermost part that is not finite at an observation which can occur.</summary>
public class FiniteStatisticTests
{
    [Theory]
    [InlineData("Interval.RealLine", "x * {|FG0203:Log(x)|}")]
    [InlineData("Interval.RealLine", "1 + {|FG0203:Sqrt(x - 2)|}")]
    [InlineData("Interval.RealLine", "Exp(-x) * ({|FG0203:3 / (x - 1)|})")]
    [InlineData("Interval.RealLine", "{|FG0203:Pow(x, 0.3)|}")]
    [InlineData("Interval.RealLine", "x > 2 ? 0 : {|FG0203:Log(x)|}")]
    [InlineData("Interval.Between(0, 7)", "x + {|FG0203:Tan(x)|}")]
    [InlineData("Interval.Above(0).IncludingLower()", "x * {|FG0203:Log(x)|}")]
    [InlineData("Interval.Between(0, 1).IncludingUpper()", "x - {|FG0203:Log(1 - x)|}")]
    [InlineData("Interval.Above(0).WithMassAt(0)", "-x + {|FG0203:Log(x)|}")]
    [InlineData("Interval.Above(0).WithMassAt(-1)", "-x + {|FG0203:Log(x + 0.5)|}")]
    public Task OfNumbers(string range, string body) => Verify.Findings($$"""
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => {{range}};
            [SufficientStatistic] static double Formula(double x) => {{body}};
            [LogBaseMeasure] static double Fall(double x) => -Exp(x * x);
        }
        """);

    [Theory]
    [InlineData("CountRange.From(0)", "{|FG0203:Log(x)|}")]
    [InlineData("CountRange.From(0)", "{|FG0203:1.0 / x|}")]
    [InlineData("CountRange.From(0)", "{|FG0203:1.0 / (x - 40)|}")]
    [InlineData("CountRange.From(0)", "Part(x); static double Part(int y) => 2 * {|FG0203:Log(y - 7)|}")]
    [InlineData("CountRange.AllIntegers", "{|FG0203:FactorialLn(x)|}")]
    [InlineData("CountRange.Between(0, 20)", "{|FG0203:BinomialLn(10, x)|}")]
    public Task OfCounts(string range, string body) => Verify.Findings($$"""
        [Family] public partial class Stoppages
        {
            [Support] static CountRange Range => {{range}};
            [SufficientStatistic] static double Formula(int x) => {{body}};
            [LogBaseMeasure] static double Fall(int x) => -Exp(x * (double)x);
        }
        """);

    [Theory]
    [InlineData("Interval.Above(0).IncludingLower()", "(shape - 1) * {|FG0203:Log(hours)|} - rate * hours")]
    [InlineData("Interval.RealLine", "-rate * hours * hours - shape / {|FG0203:(hours * hours - 4)|}")]
    [InlineData("Interval.RealLine", "-rate * hours * hours + {|FG0203:Log(hours + 1)|} - shape * hours")]
    public Task OfKernels(string range, string body)
    {
        // A quotient is one place.
        body = body.Replace("shape / {|FG0203:(hours * hours - 4)|}", "{|FG0203:shape / (hours * hours - 4)|}");
        return Verify.Findings($$"""
            [Family] public partial class RepairHours
            {
                [Support] static Interval Range => {{range}};
                [LogKernel] static double Kernel(double hours, double shape, double rate) => {{body}};
            }
            """);
    }

    [Fact]
    public async Task Messages() => Assert.Equal(
        [
            "FG0203: 'LogHours' is not finite at hours = 0, which can occur: log(hours) is the logarithm of 0; leave this end of the support open, or write a value for it with 'hours == 0 ? … : …'",
            "FG0203: 'Slope' is not finite at hours about 1.570796, which can occur: 1/cos(hours) divides by 0; narrow the support so that this cannot be observed",
        ],
        await Verify.Messages("""
            [Family] public partial class RepairHours
            {
                [Support] static Interval Range => Interval.Between(0, 3).IncludingLower();
                [SufficientStatistic] static double LogHours(double hours) => Log(hours);
                [SufficientStatistic] static double Slope(double hours) => Tan(hours);
            }
            """));

    [Fact]
    public async Task MessageAtAKnownEnd() => Assert.Equal(
        [
            "FG0203: 'Unchecked' is not finite at x = locks, which can occur: log(0) is the logarithm of 0; narrow the support so that this cannot be observed, or write a value for it with 'x == locks ? … : …'",
        ],
        await Verify.Messages("""
            [Family] public partial class FaultyTwistlocks
            {
                [Support] static CountRange Range([Known] int locks) => CountRange.Between(0, locks);
                [SufficientStatistic] static double Unchecked(int x, [Known] int locks) => Log(locks - x);
            }
            """));
}
