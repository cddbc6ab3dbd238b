using System.Threading.Tasks;

namespace FamilyGen.Generator.Tests.Verdicts;

/// <summary>FG0201 and FG0202: a statistic, base measure or kernel is more than a function of the observation.</summary>
public class StatisticTests
{
    [Theory]
    [InlineData("[SufficientStatistic] static double Scaled(double x, double {|FG0201:rate|}) => rate * x;")]
    [InlineData("[SufficientStatistic] static double Scaled(double x, int {|FG0201:rate|}) => x;")]
    [InlineData("[BaseMeasure] static double Weight(double x, double {|FG0201:rate|}) => Exp(-rate * x);")]
    [InlineData("[LogBaseMeasure] static double Weight(double x, [Known] int n, double {|FG0201:rate|}) => -rate * x * n;")]
    [InlineData("[SufficientStatistic] double Scaled(double x) => {|FG0201:Mean|} * x;")]
    [InlineData("[SufficientStatistic] double Scaled(double x) => Centre() * x; double Centre() => {|FG0201:Natural|}[0];")]
    public Task OnAParameter(string member) => Verify.Findings($$"""
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => Interval.Above(0);
            [SufficientStatistic] static double Hours(double x) => x;
            {{member}}
        }
        """);

    [Theory]
    [InlineData("{|FG0202:s_unit|} * x", "static double s_unit = 60;")]
    [InlineData("Unit() * x", "static double Unit() => {|FG0202:s_unit|}; static double s_unit = 60;")]
    [InlineData("{|FG0202:Unit|} * x", "static double Unit { get; set; } = 60;")]
    [InlineData("{|FG0202:Unit|} * x", "internal static double Unit { get; private set; } = 60;")]
    [InlineData("Unit * x", "static double Unit => Deeper; static double Deeper { get { return {|FG0202:DateTime.Now|}.Hour; } }")]
    [InlineData("{|FG0202:DateTime.Today|}.Month * x", "")]
    [InlineData("{|FG0202:Random.Shared.Next()|} * x", "")]
    [InlineData("{|FG0202:Console.Read()|} * x", "")]
    [InlineData("{|FG0202:System.Diagnostics.Stopwatch.GetTimestamp()|} * x", "")]
    [InlineData("x + Convert.ToDouble({|FG0202:Environment.ProcessorCount|})", "")]
    [InlineData("MathNet.Numerics.Distributions.{|FG0202:Normal.Sample(0, 1)|} * x", "")]
    public Task Impure(string body, string members)
    {
        // The markup starts at the expression, qualified names included.
        body = body.Replace("MathNet.Numerics.Distributions.{|FG0202:", "{|FG0202:MathNet.Numerics.Distributions.");
        return Verify.Findings($$"""
            [Family] public partial class RepairHours
            {
                [Support] static Interval Range => Interval.Above(0);
                [SufficientStatistic] static double Hours(double x) => {{body}};
                {{members}}
            }
            """);
    }

    [Theory]
    [InlineData("{|FG0202:s_calls|}++; return x;")]
    [InlineData("{|FG0202:s_calls|} = 2; return x;")]
    [InlineData("{|FG0202:s_calls|} += 2; return x;")]
    [InlineData("{|FG0202:Console.WriteLine()|}; return x;")]
    public Task SideEffects(string body) => Verify.Findings($$"""
        [Family] public partial class RepairHours
        {
            static int s_calls = 0;
            static int Calls => s_calls;
            [Support] static Interval Range => Interval.Above(0);
            [SufficientStatistic] static double Hours(double x) { {{body}} }
        }
        """);

    [Fact]
    public Task ImpureKernelAndBaseMeasure() => Verify.Findings("""
        [Family] public partial class RepairHours
        {
            static double s_unit = 60;
            [Support] static Interval Range => Interval.Above(0);
            [LogKernel] static double Kernel(double x, double rate) => -rate * x / {|FG0202:s_unit|};
        }
        """);

    [Theory]
    [InlineData("Unit * x", "const double Unit = 60;")]
    [InlineData("Unit * x", "static readonly double Unit = 60;")]
    [InlineData("Unit * x", "static double Unit { get; } = 60;")]
    [InlineData("x * TimeSpan.TicksPerSecond", "")]
    [InlineData("x * DateTime.DaysInMonth(2024, 2)", "")]
    [InlineData("x * MathNet.Numerics.Constants.Ln2", "")]
    public async Task Legitimate(string body, string members) => Assert.Empty(await Task.FromResult(Reading.DeclaredSource.Findings($$"""
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => Interval.Above(0);
            [SufficientStatistic] static double Hours(double x) => {{body}};
            {{members}}
        }
        """)));

    [Fact]
    public async Task Messages() => Assert.Equal(
        [
            "FG0201: 'Scaled' depends on the parameter 'rate' (Scaled → rate), but it must be a function of the observation alone; mark 'rate' as [Known] if it is never estimated, or write the family as a [LogKernel] with 'rate' among its parameters",
            "FG0202: 'Minutes' depends on 's_unit' (Minutes → Unit → s_unit), which is a field that can be assigned, so the same observation need not give the same value twice; use constants, static readonly fields or [Known] values",
        ],
        await Verify.Messages("""
            [Family] public partial class RepairHours
            {
                [Support] static Interval Range => Interval.Above(0);
                [SufficientStatistic] static double Scaled(double x, double rate) => rate * x;
                [SufficientStatistic] static double Minutes(double x) => x * Unit();
                static double Unit() => s_unit;
                static double s_unit = 60;
            }
            """));
}
