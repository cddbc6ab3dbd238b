using System.Threading.Tasks;
using FamilyGen.Generator.Tests.Reading;

namespace FamilyGen.Generator.Tests.Verdicts;

/// <summary>FG0501 and FG0503 at the very term that is wrong.</summary>
public class SeparationTests
{
    [Theory]
    [InlineData("(shape - 1) * Log(hours) - {|FG0501:Pow(hours / scale, shape)|}", "double shape, double scale")]
    [InlineData("-{|FG0501:Log(1 + Pow((hours - centre) / scale, 2))|}", "double centre, double scale")]
    [InlineData("-rate * hours + {|FG0501:Log(hours + shift)|}", "double rate, double shift")]
    [InlineData("{|FG0501:Cos(speed * hours)|}", "double speed")]
    [InlineData("{|FG0501:hours < delay|} ? -rate * hours : -2 * rate * hours", "double rate, double delay")]
    [InlineData("{|FG0501:Log(weight * Exp(-hours) + (1 - weight) * Exp(-2 * hours))|}", "double weight")]
    public async Task Tied(string kernel, string parameters)
    {
        // Where exactly inside the term the place lies is the algebra's choice; it must be inside what is marked.
        var plain = kernel.Replace("{|FG0501:", "").Replace("|}", "");
        var start = kernel.IndexOf("{|FG0501:", System.StringComparison.Ordinal) + 9;
        var marked = kernel.Substring(start, kernel.IndexOf("|}", System.StringComparison.Ordinal) - start);
        var findings = await Task.FromResult(DeclaredSource.Findings($$"""
            [Family] public partial class RepairHours
            {
                [Support] static Interval Range => Interval.Above(0);
                [LogKernel] static double Kernel(double hours, {{parameters}}) => {{plain}};
            }
            """));
        var finding = Assert.Single(findings);
        Assert.StartsWith("FG0501 at `", finding);
        Assert.Contains(finding.Substring(11).TrimEnd('`'), marked);
    }

    [Fact]
    public void TiedInAFunctionOfTheUsersOwn()
    {
        var findings = DeclaredSource.Findings(
            """
            [Family] public partial class RepairHours
            {
                [Support] static Interval Range => Interval.Above(0);
                [LogKernel] static double Kernel(double hours, double shape, double scale) => (shape - 1) * Log(hours) - Hazards.Cumulative(hours, shape, scale);
            }
            """,
            "static class Hazards { public static double Cumulative(double t, double a, double b) { var ratio = t / b; return Pow(ratio, a); } }");
        Assert.Equal(["FG0501 at `Pow(ratio, a)`"], findings);
    }

    [Theory]
    [InlineData("-(rate1 + rate2) * hours", "double rate1, double rate2")]
    [InlineData("-rate * scale * hours", "double rate, double scale")]
    public void NotToldApart(string kernel, string parameters)
    {
        var finding = Assert.Single(DeclaredSource.Findings($$"""
            [Family] public partial class RepairHours
            {
                [Support] static Interval Range => Interval.Above(0);
                [LogKernel] static double Kernel(double hours, {{parameters}}) => {{kernel}};
            }
            """));
        Assert.StartsWith("FG0503 at `rate", finding);
    }

    [Theory]
    [InlineData("(shape - 1) * Log(hours) - Pow(hours / scale, shape)", "[Known] double shape, double scale")]
    [InlineData("(shape - 1) * Log(hours) - rate * hours", "double shape, double rate")]
    [InlineData("-Pow(hours - centre, 2) / (2 * spread * spread)", "double centre, double spread")]
    [InlineData("Log(rate * Exp(-rate * hours))", "double rate")]
    public void Legitimate(string kernel, string parameters) => Assert.Empty(DeclaredSource.Findings($$"""
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => Interval.Above(0);
            [LogKernel] static double Kernel(double hours, {{parameters}}) => {{kernel}};
        }
        """));

    [Fact]
    public async Task Messages() => Assert.Equal(
        ["FG0501: 'hours^shape' ties hours and shape together, so the kernel does not separate into statistics of the observation and functions of the parameters, and this is no exponential family; declare shape as [Known]"],
        await Verify.Messages("""
            [Family] public partial class LifeToWearOut
            {
                [Support] static Interval Range => Interval.Above(0);
                [LogKernel] static double Kernel(double hours, double shape, double scale)
                    => (shape - 1) * Log(hours) - Pow(hours / scale, shape);
            }
            """));
}
