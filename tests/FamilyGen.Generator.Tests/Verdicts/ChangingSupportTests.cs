using System.Threading.Tasks;

namespace FamilyGen.Generator.Tests.Verdicts;

/// <summary>FG0102: the support depends on something that can change.</summary>
public class ChangingSupportTests
{
    [Theory]
    [InlineData("[Support] static Interval Range => Interval.Above({|FG0102:low|}); static double low = 1;")]
    [InlineData("[Support] static Interval Range => Interval.Above({|FG0102:Low|}); static double Low { get; set; }")]
    [InlineData("[Support] static Interval Range => Interval.Above({|FG0102:Settings.Low|}); static class Settings { public static double Low = 1; }")]
    [InlineData("[Support] static Interval Range => Interval.Above(Lowest()); static double Lowest() => 2 * {|FG0102:low|}; static double low = 1;")]
    [InlineData("[Support] static Interval Range => Interval.Above({|FG0102:DateTime.Now|}.Hour);")]
    [InlineData("[Support] static Interval Range => Interval.Above(({|FG0102:DateTime.UtcNow|} - DateTime.UnixEpoch).TotalDays);")]
    [InlineData("[Support] static Interval Range => Interval.Above({|FG0102:Random.Shared.NextDouble()|});")]
    [InlineData("[Support] static Interval Range => Interval.Above({|FG0102:s_random.NextDouble()|}); static readonly Random s_random = new(1);")]
    [InlineData("[Support] static Interval Range => Interval.Above({|FG0102:new Random(1).NextDouble()|});")]
    [InlineData("[Support] static Interval Range => Interval.Above({|FG0102:Environment.TickCount64|});")]
    [InlineData("[Support] static Interval Range => Interval.Above({|FG0102:System.IO.File.ReadAllBytes(\"low\")|}.Length);")]
    [InlineData("[Support] static Interval Range => Interval.Above(double.Parse({|FG0102:Console.ReadLine()|}!));")]
    [InlineData("[Support] static readonly Interval Range = Interval.Above({|FG0102:DateTime.Now|}.Hour);")]
    [InlineData("[Support] static Interval Range => Interval.Above(s_start); static readonly double s_start = {|FG0102:DateTime.Now|}.Hour;")]
    [InlineData("[Support] static Interval {|FG0102:Range|} = Interval.Above(0);")]
    [InlineData("[Support] static Interval {|FG0102:Range|} { get; set; } = Interval.Above(0);")]
    [InlineData("[Support] Interval Range => Interval.Above({|FG0102:low|}); double low = 1;")]
    public Task Changing(string support) => Verify.Findings($$"""
        [Family] public partial class RepairHours
        {
            {{support}}
            [SufficientStatistic] static double Hours(double x) => x;
        }
        """);

    [Fact]
    public Task ChangingPredicate() => Verify.Findings("""
        [Family] public partial class Stoppages
        {
            static int s_every = 2;
            [Support] static CountRange Range => CountRange.From(0);
            [Support] static bool Allowed(int x) => x % {|FG0102:s_every|} == 0;
            [SufficientStatistic] static double Total(int x) => x;
        }
        """);

    [Theory]
    [InlineData("[Support] static Interval Range => Interval.Above(low); const double low = 1;")]
    [InlineData("[Support] static Interval Range => Interval.Above(low); static readonly double low = 1;")]
    [InlineData("[Support] static Interval Range => Interval.Above(Low); static double Low { get; } = 1;")]
    [InlineData("[Support] static Interval Range => Interval.Above(Low); static double Low => 2 * Sqrt(3);")]
    [InlineData("[Support] static Interval Range => Interval.Above(Math.Round(1.4));")]
    [InlineData("[Support] static readonly Interval Range = Interval.Above(0);")]
    [InlineData("[Support] static Interval Range { get; } = Interval.Above(0);")]
    public async Task Legitimate(string support) => Assert.Empty(await Task.FromResult(Reading.DeclaredSource.Findings($$"""
        [Family] public partial class RepairHours
        {
            {{support}}
            [SufficientStatistic] static double Hours(double x) => x;
        }
        """)));

    [Fact]
    public async Task Message() => Assert.Equal(
        ["FG0102: The support depends on 'DateTime.Now' (Range → Start → DateTime.Now), which is the clock, so an observation that is possible now may be impossible later; use a constant, a static readonly field or a [Known] value"],
        await Verify.Messages("""
            [Family] public partial class RepairHours
            {
                static double Start => DateTime.Now.Hour;
                [Support] static Interval Range => Interval.Above(Start);
                [SufficientStatistic] static double Hours(double x) => x;
            }
            """));
}
