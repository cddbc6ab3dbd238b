using System.Threading.Tasks;
using FamilyGen.Generator.Tests.Reading;

namespace FamilyGen.Generator.Tests.Verdicts;

/// <summary>What people of three trades type on their first day: in order, or refused for the right reason.</summary>
public class FirstDayFamiliesTests
{
    [Theory]
    [InlineData("""
        [Family] public partial class AverageClaim
        {
            [Support] static Interval Range => Interval.Above(0);
            [LogKernel] static double Kernel(double x, double shape, double rate, [Known] int claims)
                => (claims * shape - 1) * Log(x) - claims * rate * x;
        }
        """)]
    [InlineData("""
        [Family] public partial class LiabilityLoss
        {
            [Support] static Interval Range => Interval.Above(0);
            [LogKernel] static double Kernel(double x, double shape, double rate, double tail, double jump, [Known] double large)
                => x < large ? (shape - 1) * Log(x) - rate * x : jump - (tail + 1) * Log(x);
        }
        """)]
    [InlineData("""
        [Family] public partial class BearingLife
        {
            const double RunIn = 200, Wear = 4000;        // hours
            [Support] static Interval Range => Interval.Above(0);
            [LogKernel] static double Kernel(double hours, double early, double steady, double late)
                => (hours < RunIn ? Log(early) : hours < Wear ? Log(steady) : Log(late))
                 - early * Min(hours, RunIn) - steady * Max(0, Min(hours, Wear) - RunIn) - late * Max(0, hours - Wear);
        }
        """)]
    [InlineData("""
        [Family] public partial class OrderQuantity
        {
            [Support] static CountRange Range => CountRange.From(1);
            [SufficientStatistic] static double Units(int x) => x;
            [SufficientStatistic] static double LogUnits(int x) => Log(x);
            [SufficientStatistic] static double FullPallet(int x, [Known] int perPallet) => x % perPallet == 0 ? 1 : 0;
        }
        """)]
    [InlineData("""
        [Family] public partial class ArrivalHour
        {
            [Support] static Interval Range => Interval.Circle(24);
            [LogKernel] static double Kernel(double hour, double day, double dayPeak, double half, double halfPeak)
                => day * Cos(2 * PI * (hour - dayPeak) / 24) + half * Cos(4 * PI * (hour - halfPeak) / 24);
        }
        """)]
    [InlineData("""
        [Family] public partial class LifeToWearOut
        {
            [Support] static Interval Range => Interval.Above(0);
            [LogKernel] static double Kernel(double hours, [Known] double shape, double scale)
                => (shape - 1) * Log(hours) - Pow(hours / scale, shape);
        }
        """)]
    [InlineData("""
        [Family] public partial class LifeToWearOut
        {
            [Support] static Interval Range => Interval.Above(0);
            [LogKernel] static double Kernel(double hours, double shape, double scale)
                => (shape - 1) * Log(hours) - {|FG0501:Pow(hours / scale, shape)|};
        }
        """)]
    public Task Families(string source) => Verify.Findings(source);

    [Fact]
    public void PiecesKeepTheirConditions()
    {
        var kernel = DeclaredSource.ReadValid("""
            [Family] public partial class LiabilityLoss
            {
                [Support] static Interval Range => Interval.Above(0);
                [LogKernel] static double Kernel(double x, double shape, double rate, double tail, double jump, [Known] double large)
                {
                    if (x < large)
                        return (shape - 1) * Log(x) - rate * x;
                    return jump - (tail + 1) * Log(x);
                }
            }
            """).Kernel!;
        Assert.Equal(
            "if((x < #large), ((($shape + (-1 * 1)) * Log(x)) + (-1 * ($rate * x))), ($jump + (-1 * (($tail + 1) * Log(x)))))",
            FormulaText.Of(kernel));
    }
}
