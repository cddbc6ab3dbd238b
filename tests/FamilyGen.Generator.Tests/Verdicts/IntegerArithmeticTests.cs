using System.Threading.Tasks;

namespace FamilyGen.Generator.Tests.Verdicts;

/// <summary>FG0205: the innermost step that is computed in integers and should not be.</summary>
public class IntegerArithmeticTests
{
    [Theory]
    [InlineData("int", "2 * ({|FG0205:x / 3|})")]
    [InlineData("long", "{|FG0205:x / 3|}")]
    [InlineData("int", "x * ({|FG0205:1 / 2|} + 1)")]
    [InlineData("int", "{|FG0205:-x * x|} * x")]
    [InlineData("int", "-({|FG0205:(x + 1) * x|})")]
    [InlineData("int", "-({|FG0205:5000 * x|})")]
    [InlineData("int", "2 * {|FG0205:(int)(x / 7.0)|}")]
    [InlineData("int", "{|FG0205:(long)(0.5 * x)|}")]
    [InlineData("int", "Log(1 + {|FG0205:x / 2|})")]
    public Task Reported(string type, string body) => Verify.Findings($$"""
        [Family] public partial class Stoppages
        {
            [Support] static CountRange Range => CountRange.From(0);
            [SufficientStatistic] static double Formula({{type}} x) => {{body}};
            [LogBaseMeasure] static double Fall({{type}} x) => -Pow(x, 6);
        }
        """);

    [Theory]
    [InlineData("x / 3.0")]
    [InlineData("(double)x / 3")]
    [InlineData("-(double)x * x")]
    [InlineData("x % 3")]
    [InlineData("1000 * x")]
    [InlineData("x / 10 == 3 ? 1 : 0")]
    [InlineData("x / 10 is 3 or 5 ? 1 : 0")]
    [InlineData("(int)Floor(x / 3.0)")]
    [InlineData("(long)x")]
    [InlineData("6 / 3 * x")]
    public Task Legitimate(string body) => Verify.Findings($$"""
        [Family] public partial class Stoppages
        {
            [Support] static CountRange Range => CountRange.From(0);
            [SufficientStatistic] static double Formula(int x) => {{body}};
            [LogBaseMeasure] static double Fall(int x) => -Pow(x, 6);
        }
        """);

    [Fact]
    public async Task Messages() => Assert.Equal(
        [
            "FG0205: 'x / 2' is computed in int and drops the fraction; write 'x / 2.0' if the fraction is meant, or 'Floor(x / 2.0)' if it is not",
            "FG0205: '-x * x' is computed in int and can overflow; write '(double)-x * x'",
            "FG0205: '(int)(0.3 * x)' is computed in int and drops the fraction; write '0.3 * x' if the fraction is meant, or 'Floor(…)' of it if it is not",
        ],
        await Verify.Messages("""
            [Family] public partial class Stoppages
            {
                [Support] static CountRange Range => CountRange.From(0);
                [SufficientStatistic] static double Half(int x) => x / 2;
                [SufficientStatistic] static double Square(int x) => -x * x;
                [SufficientStatistic] static double Cut(int x) => (int)(0.3 * x);
            }
            """));
}
