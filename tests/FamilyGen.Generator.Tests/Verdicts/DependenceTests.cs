using System.Threading.Tasks;

namespace FamilyGen.Generator.Tests.Verdicts;

/// <summary>FG0204: the relation is spelled out, at the statistic that the earlier ones determine.</summary>
public class DependenceTests
{
    [Fact]
    public Task OfCategories() => Verify.Findings("""
        [Family] public partial class Weather
        {
            [Support] static CountRange Range => CountRange.Between(0, 2);
            [SufficientStatistic] static double Calm(int x) => x == 0 ? 1 : 0;
            [SufficientStatistic] static double Breeze(int x) => x == 1 ? 1 : 0;
            [SufficientStatistic] static double Gale(int x) => {|FG0204:x == 2 ? 1 : 0|};
        }
        """);

    [Fact]
    public Task OfTermsInAKernel() => Verify.Findings("""
        [Family] public partial class Failure
        {
            [Support] static CountRange Range => CountRange.Between(0, 1);
            [LogKernel] static double Kernel(int x, double level, double bend) => level * x - {|FG0204:bend * x * x|};
        }
        """);

    [Theory]
    [InlineData("Tripled = 3·Hours + 1", "3 * x + 1")]
    [InlineData("Tripled = −0.5·Hours", "-x / 2")]
    [InlineData("Tripled = 7", "7")]
    [InlineData("Hours + Tripled = 2", "2 - x")]
    [InlineData("2·Hours + 3·Tripled = 1", "(1 - 2 * x) / 3")]
    [InlineData("Tripled = Hours + log(2)", "x + Log(2)")]
    [InlineData("Tripled = π·Hours", "PI * x")]
    [InlineData("Tripled = unit·Hours + unit²", "Scaled(x, unit); static double Scaled(double y, double unit) => (y + unit) * unit")]
    public async Task Relations(string relation, string body)
    {
        relation = relation == "Tripled = −0.5·Hours" ? "Hours + 2·Tripled = 0" : relation;
        var known = body.Contains("unit") ? ", [Known] double unit" : "";
        var messages = await Verify.Messages($$"""
            [Family] public partial class RepairHours
            {
                [Support] static Interval Range => Interval.Above(0);
                [SufficientStatistic] static double Hours(double x) => x;
                [SufficientStatistic] static double Tripled(double x{{known}}) => {{body}};
            }
            """);
        Assert.StartsWith("FG0204: " + relation + " on the whole support, so ", Assert.Single(messages));
    }

    [Fact]
    public async Task Messages() => Assert.Equal(
        [
            "FG0204: Calm + Breeze + Gale = 1 on the whole support, so the parameters of these statistics cannot be told apart; leave out 'Gale', or replace it by a function that the others do not determine",
        ],
        await Verify.Messages("""
            [Family] public partial class Weather
            {
                [Support] static CountRange Range => CountRange.Between(0, 2);
                [SufficientStatistic] static double Calm(int x) => x == 0 ? 1 : 0;
                [SufficientStatistic] static double Breeze(int x) => x == 1 ? 1 : 0;
                [SufficientStatistic] static double Gale(int x) => x == 2 ? 1 : 0;
            }
            """));
}
