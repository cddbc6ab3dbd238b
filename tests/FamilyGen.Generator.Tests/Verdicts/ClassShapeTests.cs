using System.Threading.Tasks;
using FamilyGen.Generator.Tests.Reading;

namespace FamilyGen.Generator.Tests.Verdicts;

/// <summary>FG0001 on the class: what cannot be completed, and which members are missing or too many.</summary>
public class ClassShapeTests
{
    private const string Members = """
        [Support] static CountRange Range => CountRange.From(0);
        [SufficientStatistic] static double Total(int x) => x;
        """;

    [Theory]
    [InlineData("public class {|FG0001:Stoppages|} { $ }")]
    [InlineData("public partial class {|FG0001:Stoppages|}<T> { $ }")]
    [InlineData("public partial record {|FG0001:Stoppages|} { $ }")]
    [InlineData("public static partial class {|FG0001:Stoppages|} { $ }")]
    [InlineData("public abstract partial class {|FG0001:Stoppages|} { $ }")]
    [InlineData("file partial class {|FG0001:Stoppages|} { $ }")]
    [InlineData("public partial class Stoppages { $ public {|FG0001:Stoppages|}() { } }")]
    [InlineData("public partial class Stoppages { $ {|FG0001:Stoppages|}(string label) : base() => Label = label; public string Label { get; } }")]
    [InlineData("public partial class {|FG0001:Stoppages|}(int unused) { $ public int Unused => unused; }")]
    public Task TheClass(string declaration) => Verify.Findings("[Family] " + declaration.Replace("$", Members));

    [Theory]
    [InlineData("public class {|FG0001:Crane|} { [Family] public partial class Stoppages { $ } }")]
    [InlineData("public partial class {|FG0001:Crane|}<T> { [Family] public partial class Stoppages { $ } }")]
    [InlineData("public partial class Yard { public class {|FG0001:Crane|} { [Family] public partial class Stoppages { $ } } }")]
    [InlineData("public class Yard(int n) { public int N => n; } [Family] public partial class {|FG0001:Stoppages|} : Yard { $ }")]
    public async Task AroundTheClass(string declaration)
    {
        // A base class without a fitting constructor is the compiler's business too.
        var source = declaration.Replace("$", Members);
        if (declaration.Contains("Yard("))
            await Verify.FindingsBesideCompilerErrors(source);
        else
            await Verify.Findings(source);
    }

    [Theory]
    [InlineData("public partial class Stoppages { $ }")]
    [InlineData("internal sealed partial class Stoppages { $ }")]
    [InlineData("partial class Stoppages : IComparable { $ public int CompareTo(object? other) => 0; }")]
    [InlineData("partial class Stoppages : Yard { $ } class Yard { }")]
    [InlineData("public partial class Stoppages { $ } public partial class Stoppages { public string Label => \"stoppages\"; }")]
    [InlineData("public partial class Stoppages { $ public Stoppages(string rate) : this(double.Parse(rate)) { } }")]
    [InlineData("public partial class Stoppages { $ public string Label { get; set; } = \"\"; }")]
    public void LegitimateClasses(string declaration) => Assert.Empty(DeclaredSource.Findings("[Family] " + declaration.Replace("$", Members)));

    [Theory]
    [InlineData("public partial class Crane { [Family] private protected partial class Stoppages { $ } }")]
    [InlineData("public partial struct Crane { [Family] internal partial class Stoppages { $ } }")]
    [InlineData("public partial record Crane { [Family] internal partial class Stoppages { $ } }")]
    [InlineData("partial interface ICrane { [Family] public partial class Stoppages { $ } }")]
    public void LegitimateNesting(string declaration) => Assert.Empty(DeclaredSource.Findings(declaration.Replace("$", Members)));

    [Fact]
    public Task MembersInAnotherPart() => Verify.Findings(
        "[Family] public partial class Stoppages { [Support] static CountRange Range => CountRange.From(0); }",
        "public partial class Stoppages { [SufficientStatistic] static double {|FG0001:Total|}(int x) => x; }");

    [Theory]
    [InlineData("{|FG0001:Stoppages|}", "[SufficientStatistic] static double Total(int x) => x;")]
    [InlineData("{|FG0001:Stoppages|}", "[Support] static CountRange Range => CountRange.From(0);")]
    [InlineData("Stoppages", "[Support] static CountRange Range => CountRange.From(0); [Support] static CountRange {|FG0001:Other|} => CountRange.From(0); [SufficientStatistic] static double Total(int x) => x;")]
    [InlineData("Stoppages", Members + "[BaseMeasure] static double H(int x) => 1; [LogBaseMeasure] static double {|FG0001:G|}(int x) => 0;")]
    [InlineData("Stoppages", Members + "[Support] static bool A(int x) => x > 1; [Support] static bool {|FG0001:B|}(int x) => x > 2;")]
    [InlineData("Stoppages", "[Support] static CountRange Range => CountRange.From(0); [SufficientStatistic] static double {|FG0001:Total|}(int x) => x; [LogKernel] static double K(int x, double rate) => rate * x;")]
    [InlineData("Stoppages", "[Support] static CountRange Range => CountRange.From(0); [LogBaseMeasure] static double {|FG0001:H|}(int x) => x; [LogKernel] static double K(int x, double rate) => rate * x;")]
    [InlineData("Stoppages", "[Support] static CountRange Range => CountRange.From(0); [LogKernel] static double K(int x, double rate) => rate * x; [LogKernel] static double {|FG0001:L|}(int x, double rate) => rate * x;")]
    [InlineData("Stoppages", "[Support] static CountRange Range => CountRange.From(0); [SufficientStatistic, LogBaseMeasure] static double {|FG0001:Total|}(int x) => x;")]
    public Task Combinations(string name, string members) => Verify.Findings($$"""[Family] public partial class {{name}} { {{members}} }""");

    [Fact]
    public async Task NothingDeclared() => Assert.Equal(
        ["FG0001 at `Empty`", "FG0001 at `Empty`"],
        await Task.FromResult(DeclaredSource.Findings("[Family] public partial class Empty;")));

    [Fact]
    public async Task Messages() => Assert.Equal(
        ["FG0001: 'Stoppages' cannot be completed because it is not partial; write 'partial class Stoppages'"],
        await Verify.Messages("[Family] public class Stoppages { " + Members + " }"));
}
