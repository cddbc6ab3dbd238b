using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;
using Xunit;

namespace FamilyGen.Generator.Tests.Algebra;

/// <summary>Statistics and base measures as weighted atoms, pieces, periods and singular ends.</summary>
public class CanonicalFormTests
{
    [Theory]
    [InlineData("Pow(x - 3, 2) + 2", "(x − 3)² + 2")]
    [InlineData("(x - 3) * (x - 3)", "(x − 3)²")]
    [InlineData("Log(2 * x)", "log(x) + log(2)")]
    [InlineData("3 * x + 1", "3·x + 1")]
    [InlineData("x / 3", "x/3")]
    [InlineData("x < 2 ? 5 : 3", "2·[x < 2] + 3")]
    [InlineData("x < 2 ? 0 : x", "x·[x ≥ 2]")]
    [InlineData("x > 2 ? x - 2 : 0", "((x − 2)·[x > 2])")]
    [InlineData("x < 2 ? x : 4 - x", "(x < 2 ? x : 4 − x)")]
    [InlineData("Min(x, 5)", "min(x, 5)")]
    [InlineData("Exp(2 * Log(x))", "x²")]
    [InlineData("Sqrt(x * x)", "x")]
    [InlineData("x > -1 ? x : 0", "x")]
    public void Statistics_on_the_half_line(string body, string expected) =>
        Assert.Equal(expected.Trim('(', ')'), Rendering.Text(FamilyText.Interval("0").Statistic("A", body).Form().Statistics[0].Body).Trim('(', ')'));

    [Theory]
    [InlineData("x > 0.5 ? 1 : 0", "(−∞)·[x ≤ 0.5]")]
    [InlineData("x * (1 - x)", "log(x) + log(1 − x)")]
    [InlineData("Exp(-x) / Sqrt(x)", "−x − 0.5·log(x)")]
    [InlineData("2", "log(2)")]
    public void Base_measures(string body, string expected) =>
        Assert.Equal(expected, Rendering.Text(FamilyText.Interval("0", "1").Statistic("A", "x").Base(body).Form().LogBase));

    [Fact]
    public void Point_mass_at_an_open_end_belongs_to_the_support()
    {
        var family = FamilyText.Interval("0").Mass("0").Statistic("A", "x == 0 ? 0 : Log(x)").Statistic("B", "x").Statistic("Zero", "x == 0 ? 1 : 0");
        var form = family.Form();
        Assert.Equal("log(x)·[x ≠ 0]", Rendering.Text(form.Statistics[0].Body));
        Assert.Equal("[x = 0]", Rendering.Text(form.Statistics[2].Body));
        Assert.True(form.LowerSingular);
        Assert.Empty(form.Breakpoints);
    }

    [Fact]
    public void Breakpoints_of_an_interval()
    {
        Assert.Equal(["200", "4000"], Points(FamilyText.Interval("0").Statistic("A", "Min(x, 200) + Max(0, Min(x, 4000) - 200)")));
        Assert.Equal(["large"], Points(FamilyText.Interval("0", known: "large").Statistic("A", "x < large ? x : 0")));
        Assert.Equal(["3"], Points(FamilyText.Interval(null).Statistic("A", "Abs(2 * x - 6)")));
        Assert.Equal(["−2", "2"], Points(FamilyText.Interval(null).Statistic("A", "x * x < 4 ? x : 0")));
        Assert.Equal(["1"], Points(FamilyText.Interval(null).Statistic("A", "Log(Abs(x - 1))").LogBase("-x * x")));
        Assert.Empty(Points(FamilyText.Interval("0").Statistic("A", "Abs(x + 2)")));
    }

    [Fact]
    public void Breakpoints_of_a_lattice_start_new_pieces()
    {
        Assert.Equal(["3", "4"], Points(FamilyText.Counts("0").Statistic("A", "x == 3 ? 1 : 0")));
        Assert.Equal(["4"], Points(FamilyText.Counts("0").Statistic("A", "x <= 3 ? x : 0")));
        Assert.Equal(["3"], Points(FamilyText.Counts("0").Statistic("A", "x < 3 ? x : 0")));
        Assert.Equal(["1"], Points(FamilyText.Counts("0").Statistic("A", "x == 0 ? 1 : 0")));
        Assert.Equal(["m + 1"], Points(FamilyText.Counts("0", known: "#m").Statistic("A", "x > m ? x : 0")));
    }

    [Fact]
    public void Periods()
    {
        Assert.Equal("perPallet", Period(FamilyText.Counts("1", known: "#perPallet").Statistic("A", "x % perPallet == 0 ? 1 : 0")));
        Assert.Equal("12", Period(FamilyText.Counts("0").Statistic("A", "Div(x, 4)").Statistic("B", "x % 6 == 1 ? 1 : 0")));
        Assert.Equal("6", Period(FamilyText.Counts("0").Statistic("A", "Div(x, 2)").Where("x % 3 != 1")));
        Assert.Equal("3", Period(FamilyText.Counts("0").Statistic("A", "Floor(x / 3)")));
        Assert.Equal("1", Period(FamilyText.Counts("0").Statistic("A", "x")));
    }

    [Fact]
    public void What_cannot_be_read_is_opaque()
    {
        Assert.True(FamilyText.Counts("0").Statistic("A", "Score(x)").Form().IsOpaque);
        Assert.True(FamilyText.Interval("0").Statistic("A", "Floor(x)").Form().IsOpaque);
        Assert.False(FamilyText.Counts("0").Statistic("A", "x").Form().IsOpaque);
    }

    [Theory]
    [InlineData("Log(x)", true, false)]
    [InlineData("Log(1 - x)", false, true)]
    [InlineData("1 / x", true, false)]
    [InlineData("x * Log(x)", true, false)]
    [InlineData("Sqrt(1 - x)", false, true)]
    [InlineData("Log(1 + x)", false, false)]
    [InlineData("x * x", false, false)]
    public void Singular_ends(string body, bool lower, bool upper)
    {
        var form = FamilyText.Interval("0", "1").Statistic("A", body).Form();
        Assert.Equal((lower, upper), (form.LowerSingular, form.UpperSingular));
    }

    [Fact]
    public void Equal_declarations_have_equal_forms()
    {
        static NormalFormResult Once() => FamilyText.Interval("0", known: "k").LogKernel(
            "a b", "(a - 1) * Log(x + k) - b * Pow(x, 1.5) - Log(x < 2 ? Exp(a * x) : 1) + Cos(x - b)").Normalize();
        Assert.Equal(Once(), Once());
        Assert.Equal(Once().GetHashCode(), Once().GetHashCode());
        Assert.NotNull(Once().Form);
    }

    private static string[] Points(FamilyText family) => [.. family.Form().Breakpoints.Select(Rendering.Text)];

    private static string Period(FamilyText family) => Rendering.Text(family.Form().Period);
}
