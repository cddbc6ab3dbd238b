using System.Linq;

namespace FamilyGen.Generator.Tests.Reading;

/// <summary>Supports in all their shapes.</summary>
public class SupportReadingTests
{
    [Theory]
    [InlineData("Interval Range => Interval.RealLine;", "(−∞, ∞)")]
    [InlineData("Interval Range => Interval.Above(0);", "(0, ∞)")]
    [InlineData("Interval Range => Interval.Below(2.5);", "(−∞, 5/2)")]
    [InlineData("Interval Range => Interval.Between(0, 1);", "(0, 1)")]
    [InlineData("Interval Range => Interval.Between(double.NegativeInfinity, 1);", "(−∞, 1)")]
    [InlineData("Interval Range => Interval.Above(0).IncludingLower();", "[0, ∞)")]
    [InlineData("Interval Range => Interval.Between(0, 1).IncludingUpper().IncludingLower();", "[0, 1]")]
    [InlineData("Interval Range => Interval.Above(0).WithMassAt(0).WithMassAt(0.5);", "(0, ∞) 0 1/2")]
    [InlineData("Interval Range => Interval.Circle(24);", "circle [0, 24)")]
    [InlineData("Interval Range() => Interval.Above(0);", "(0, ∞)")]
    [InlineData("Interval Range() { var low = 1; return Interval.Above(low).IncludingLower(); }", "[1, ∞)")]
    [InlineData("Interval Range { get { return Interval.Above(0); } }", "(0, ∞)")]
    [InlineData("Interval Range { get; } = Interval.Above(0);", "(0, ∞)")]
    [InlineData("readonly Interval Range = Interval.Above(Low); const double Low = 2 * 3;", "(6, ∞)")]
    [InlineData("Interval Range => Usual; static Interval Usual => Interval.Above(0);", "(0, ∞)")]
    [InlineData("Interval Range([Known] double low) => Interval.Above(low);", "(#low, ∞)")]
    [InlineData("Interval Range([Known] double low, [Known] int span) => Interval.Between(low, low + span);", "(#low, (#low + #span))")]
    public void Intervals(string member, string expected) => Assert.Equal(expected, Read(member, "double"));

    [Theory]
    [InlineData("CountRange Range => CountRange.From(0);", "{0, ∞}")]
    [InlineData("CountRange Range => CountRange.Between(-3, 7);", "{-3, 7}")]
    [InlineData("CountRange Range => CountRange.AllIntegers;", "{−∞, ∞}")]
    [InlineData("CountRange Range => default;", "{−∞, ∞}")]
    [InlineData("CountRange Range([Known] int n) => CountRange.Between(0, n > 5 ? n : 5);", "{0, if((5 < #n), #n, 5)}")]
    [InlineData("CountRange Range([Known] int n) => CountRange.Between(max: 2 * n, min: 0);", "{0, (2 * #n)}")]
    public void Counts(string member, string expected)
    {
        Assert.Equal(expected, Read(member, "int"));
        Assert.Equal(expected, Read(member, "long"));
    }

    [Fact]
    public void Predicate()
    {
        var support = DeclaredSource.ReadValid("""
            [Family] public partial class Stoppages
            {
                [Support] static CountRange Range => CountRange.From(0);
                [Support] static bool Allowed(int x, [Known] int every) => x % every == 0;
                [SufficientStatistic] static double T(int x) => x;
            }
            """).Support;
        Assert.Equal("(Remainder(x, #every) = 0)", FormulaText.Of(support.Predicate!));
        Assert.Equal(new Model.DeclaredMember("Allowed", true, Model.EquatableArray.Of("x", "every")), support.PredicateMember);
    }

    private static string Read(string member, string type)
    {
        var s = DeclaredSource.ReadValid($$"""
            [Family] public partial class Stoppages
            {
                [Support] static {{member}}
                [SufficientStatistic] static double T({{type}} x) => x;
            }
            """).Support;
        var lower = s.Lower is null ? "−∞" : FormulaText.Of(s.Lower);
        var upper = s.Upper is null ? "∞" : FormulaText.Of(s.Upper);
        if (s.IsLattice)
            return "{" + lower + ", " + upper + "}";
        return (s.IsCircle ? "circle " : "") + (s.LowerIncluded ? "[" : "(") + lower + ", " + upper + (s.UpperIncluded ? "]" : ")")
            + string.Concat(s.Masses.Select(m => " " + FormulaText.Of(m)));
    }
}
