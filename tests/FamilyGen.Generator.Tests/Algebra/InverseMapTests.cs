using System.Linq;
using FamilyGen.Generator.Algebra;
using Xunit;

namespace FamilyGen.Generator.Tests.Algebra;

/// <summary>Trade parameters from natural ones. The algebra checks every inverse by numbers before it gives it out; what is
/// tested here is that it finds one, in a short form.</summary>
public class InverseMapTests
{
    [Theory]
    [InlineData("shape rate", "(shape - 1) * Log(x) - rate * x", "logX + 1", "−x")]
    [InlineData("mean shape", "(shape - 1) * Log(x) - shape / mean * x", "−logX/x − 1/x", "logX + 1")]
    [InlineData("mu sigma", "-Pow(Log(x) - mu, 2) / (2 * sigma * sigma) - Log(x)", "−0.5·logX/logXSquared − 0.5/logXSquared", "0.5·√2/√(−logXSquared)")]
    [InlineData("mean shape", "-shape * Pow(x - mean, 2) / (2 * mean * mean * x) - 1.5 * Log(x)", "1/√(x/reciprocalX)", "−2·reciprocalX")]
    [InlineData("rate p", "-rate * p * x - rate * (1 - p) * x * x", "−x − xSquared", "x/(x + xSquared)")]
    [InlineData("a b", "-(a + b) * x - (a - b) * x * x", "−0.5·x − 0.5·xSquared", "0.5·xSquared − 0.5·x")]
    [InlineData("a b", "-Exp(a) * x - Exp(a + b) * Log(x)", "log(−x)", "log(logX/x)")]
    [InlineData("a b", "-a * a * x - a * b * Log(x)", "√(−x)", "−logX/√(−x)")]
    [InlineData("scale", "2 * Log(x) - Pow(x / scale, 2)", "1/√(−xSquared)")]
    [InlineData("scale", "-Pow(x / scale, 1.5)", "1/(−xPower3_2)^(2/3)")]
    [InlineData("a b c", "-a * x - a * b * x * x - a * b * c * Log(x)", "−x", "xSquared/x", "logX/xSquared")]
    public void Half_line(string parameters, string kernel, params string[] inverse) =>
        Assert.Equal(inverse, Of(FamilyText.Interval("0").LogKernel(parameters, kernel)));

    [Fact]
    public void Normal_law() =>
        Assert.Equal(["−0.5·x/xSquared", "0.5·√2/√(−xSquared)"], Of(FamilyText.Interval(null).LogKernel("mean sd", "-0.5 * Pow((x - mean) / sd, 2) - Log(sd)")));

    [Fact]
    public void Log_odds()
    {
        Assert.Equal(["exp(x)/(exp(x) + 1)"], Of(FamilyText.Counts("0", "n", known: "#n").LogKernel("p", "BinomialLn(n, x) + x * Log(p) + (n - x) * Log(1 - p)")));
        Assert.Equal(["exp(x)"], Of(FamilyText.Counts("0").LogKernel("rate", "x * Log(rate) - rate - FactorialLn(x)")));
    }

    [Fact]
    public void Amplitude_and_angle()
    {
        var day = FamilyText.Circle("24", "hour").LogKernel(
            "day dayPeak half halfPeak", "day * Cos(2 * PI * (hour - dayPeak) / 24) + half * Cos(4 * PI * (hour - halfPeak) / 24)");
        Assert.Equal(
            ["√(cosHour² + sinHour²)", "12·atan2(sinHour, cosHour)/π", "√(cosHour2² + sinHour2²)", "6·atan2(sinHour2, cosHour2)/π"],
            Of(day));
        Assert.Equal(["√(cosX² + sinX²)", "atan2(cosX, sinX)"], Of(FamilyText.Circle("2 * PI").LogKernel("k m", "k * Sin(x + m)")));
    }

    [Fact]
    public void Known_values_stay_in_the_inverse() =>
        Assert.Equal(["(−xToShape)^(−1/shape)"], Of(FamilyText.Interval("0", known: "shape").LogKernel("scale", "(shape - 1) * Log(x) - Pow(x / scale, shape)")));

    [Fact]
    public void Curved_and_transcendental_maps_have_none()
    {
        Assert.Empty(Of(FamilyText.Interval("0").LogKernel("a", "a * x + a * a * Log(x)")));
        Assert.Empty(Of(FamilyText.Interval("0").LogKernel("a", "-(a + Exp(a)) * x")));
    }

    [Fact]
    public void Ranges_come_from_the_use_of_the_parameters()
    {
        var form = FamilyText.Interval("0").LogKernel("a b c +d", "-Log(a) * x + Log(2 - b) * Log(x) - x * x / (c * c) - d / x").Form();
        Assert.Equal([0, double.NegativeInfinity, 0, 0], form.ParameterLower);
        Assert.Equal([double.PositiveInfinity, 2, double.PositiveInfinity, double.PositiveInfinity], form.ParameterUpper);
    }

    private static string[] Of(FamilyText family) => [.. family.Form().Inverse.Select(Rendering.Text)];
}
