namespace FamilyGen.Generator.Tests.Reading;

/// <summary>Conditions, statements and members that are followed.</summary>
public class BodyReadingTests
{
    [Theory]
    [InlineData("x > 3 ? 1 : 0", "if((3 < x), 1, 0)")]
    [InlineData("x <= 3 && !(x == 1) ? x : 0", "if(((x <= 3) & !(x = 1)), x, 0)")]
    [InlineData("x != 3 || x >= 5 ? x : 0", "if((!(x = 3) | (5 <= x)), x, 0)")]
    [InlineData("x is 0 ? 1 : 0", "if((x = 0), 1, 0)")]
    [InlineData("x is > 0 and < 5 ? 1 : 0", "if(((0 < x) & (x < 5)), 1, 0)")]
    [InlineData("x is not (1 or 2) ? 1 : 0", "if(!((x = 1) | (x = 2)), 1, 0)")]
    [InlineData("x switch { 0 => 1, < 5 => 2, _ => 3 }", "if((x = 0), 1, if((x < 5), 2, 3))")]
    [InlineData("x switch { < 0 => 1, >= 0 => 2 }", "if((x < 0), 1, 2)")]
    [InlineData("x switch { var y when y > 3 => y, _ => 0 }", "if((true & (3 < x)), x, 0)")]
    [InlineData("(x > 3) switch { true => 1, false => 0 }", "if((3 < x), 1, 0)")]
    [InlineData("(x > 3) == (x > 4) ? 1 : 0", "if((((3 < x) & (4 < x)) | (!(3 < x) & !(4 < x))), 1, 0)")]
    public void Conditions(string body, string formula) => Assert.Equal(formula, DeclaredSource.Formula(body, "int"));

    [Theory]
    [InlineData("double y = x + 1.0; return y * y;", "((x + 1) * (x + 1))")]
    [InlineData("const double half = 0.5; return half * x;", "(1/2 * x)")]
    [InlineData("if (x > 3) return 1; return 0;", "if((3 < x), 1, 0)")]
    [InlineData("if (x > 3) { return 1; } else { return 0; }", "if((3 < x), 1, 0)")]
    [InlineData("double y = 0; if (x > 3) y = 1; return y + x;", "(if((3 < x), 1, 0) + x)")]
    [InlineData("double y = 0; if (x > 3) { y = 1; } else y -= 2; return y;", "if((3 < x), 1, (0 + (-1 * 2)))")]
    [InlineData("var y = x; y++; y *= 2; return y;", "((x + 1) * 2)")]
    [InlineData("var y = x; y /= 2; return y;", "IntegerQuotient(x, 2)")]
    [InlineData("x += 1; return x;", "(x + 1)")]
    [InlineData("bool far = x > 3; return far ? 1 : 0;", "if((3 < x), 1, 0)")]
    [InlineData("if (x > 5) { if (x > 7) return 2; } return 1;", "if((5 < x), if((7 < x), 2, 1), 1)")]
    [InlineData("switch (x) { case 0: return 1; case 1: case 2: return 2; default: return 3; }", "if((x = 0), 1, if(((x = 1) | (x = 2)), 2, 3))")]
    [InlineData("double y = 0; switch (x) { case 0: y = 1; break; case > 5: y = 2; break; } return y;", "if((x = 0), 1, if((5 < x), 2, 0))")]
    [InlineData("switch (x) { default: return 3; case 0: return 1; }", "if((x = 0), 1, 3)")]
    [InlineData("double y = 0; switch (x) { case 0: if (x > 9) break; y = 1; break; } return y;", "if((x = 0), if((9 < x), 0, 1), 0)")]
    [InlineData("double F(double a) => a * x; return F(2.0);", "(2 * x)")]
    [InlineData("return F(2); double F(double a) { a += x; return a; }", "(2 + x)")]
    [InlineData("{ double y = 2; return y * x; }", "(2 * x)")]
    public void Statements(string body, string formula) => Assert.Equal(formula, DeclaredSource.Formula(body, "int"));

    [Theory]
    [InlineData("Twice(x)", "static double Twice(double a) => 2 * a;", "(2 * x)")]
    [InlineData("Scale(x)", "static double Scale(double a, double by = 3) => by * a;", "(3 * x)")]
    [InlineData("x * Third", "const double Third = 1.0 / 3;", "(x * (1 * 3^-1))")]
    [InlineData("x * Third", "static readonly double Third = 1.0 / 3;", "(x * (1 * 3^-1))")]
    [InlineData("x * Third", "static double Third => 1.0 / 3;", "(x * (1 * 3^-1))")]
    [InlineData("x * Third", "static double Third { get; } = 1.0 / 3;", "(x * (1 * 3^-1))")]
    [InlineData("x * Third", "static double Third { get { return 1.0 / 3; } }", "(x * (1 * 3^-1))")]
    [InlineData("x * Limits.Wear", "static class Limits { public const int Wear = 4000; }", "(x * 4000)")]
    [InlineData("Above(x, 3) ? 1 : 0", "static bool Above(double a, double b) => a > b;", "if((3 < x), 1, 0)")]
    [InlineData("Outer(x)", "static double Outer(double a) => Inner(a) + Inner(2 * a); static double Inner(double b) { if (b > 1) return b; return 1; }",
        "(if((1 < x), x, 1) + if((1 < (2 * x)), (2 * x), 1))")]
    [InlineData("x * Tide", "static readonly double Tide = 2; static Stoppages() { Tide = 3; }", "(x * «global::Stoppages.@Tide»)")]
    [InlineData("x * (double)Berth.North", "enum Berth { South, North = 4 }", "(x * 4)")]
    public void MembersAreFollowed(string body, string members, string formula) =>
        Assert.Equal(formula, DeclaredSource.Formula(body, members: members));

    [Fact]
    public void MembersOfOtherFilesAreFollowed()
    {
        var declaration = DeclaredSource.ReadValid(
            """
            [Family] public partial class Stoppages
            {
                [Support] static Interval Range => Interval.Above(Tides.Low);
                [SufficientStatistic] static double T(double x) => x.Squared() * Tides.Height;
            }
            """,
            """
            static class Tides
            {
                public const double Low = -1;
                public static readonly double Height = 2.5;
                public static double Squared(this double a) => a * a;
            }
            """);
        Assert.Equal("((x * x) * 5/2)", FormulaText.Of(declaration.Statistics[0].Body));
        Assert.Equal("-1", FormulaText.Of(declaration.Support.Lower!));
    }

    [Fact]
    public void PrivateNestedPartialIsSpelledFromTheOutside()
    {
        var declaration = DeclaredSource.ReadValid("""
            namespace Harbour;
            public partial class Crane
            {
                internal partial struct Hoist
                {
                    [Family] private partial class Stoppages
                    {
                        [Support] static CountRange Range => CountRange.From(0);
                        [SufficientStatistic] static double T(long x) => x;
                    }
                }
            }
            """);
        Assert.Equal("Harbour.Crane+Hoist+Stoppages", declaration.MetadataName);
        Assert.Equal("private", declaration.Accessibility);
        Assert.Equal([new("class", "Crane"), new("struct", "Hoist")], declaration.Outer);
    }
}
