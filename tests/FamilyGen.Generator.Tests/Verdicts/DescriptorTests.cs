using System.IO;
using System.Linq;
using System.Threading.Tasks;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Tests.Reading;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp.Testing;
using Microsoft.CodeAnalysis.Testing;

namespace FamilyGen.Generator.Tests.Verdicts;

/// <summary>Every diagnostic has its help page, and one case of each in the compiler's own test harness.</summary>
public class DescriptorTests
{
    [Fact]
    public void EachHasAHelpPage()
    {
        foreach (var descriptor in Descriptors.All)
        {
            var page = Path.Combine(Checkout.Root, descriptor.HelpLinkUri);
            Assert.True(File.Exists(page), page);
            var text = File.ReadAllText(page);
            Assert.StartsWith("# " + descriptor.Id + ": ", text);
            Assert.Contains("**" + (descriptor.DefaultSeverity == DiagnosticSeverity.Info ? "Info" : descriptor.DefaultSeverity.ToString()) + ".**", text);
            Assert.Contains("```csharp", text);
        }

        var pages = Directory.GetFiles(Path.Combine(Checkout.Root, "src/FamilyGen.Generator/Diagnostics/help"), "*.md").Select(Path.GetFileNameWithoutExtension);
        Assert.Equal(Descriptors.All.Select(d => d.Id).Order(), pages.Order());
    }

    [Fact]
    public void SeveritiesAgree() =>
        Assert.All(Descriptors.All, d => Assert.Equal(d.DefaultSeverity == DiagnosticSeverity.Error, Severities.IsError(d.Id)));

    [Theory]
    [InlineData("FG0001", "[Support] static CountRange Range => CountRange.From(0); [SufficientStatistic] double {|FG0001:Total|}(int x) => x;")]
    [InlineData("FG0002", "[Support] static CountRange Range => CountRange.From(0); [SufficientStatistic] static double {|FG0002:Mean|}(int x) => x;")]
    [InlineData("FG0003", "[Support] static CountRange Range([Known] int locks) => CountRange.From(locks); [SufficientStatistic] static double Total(int x, [Known] long {|FG0003:locks|}) => x * locks;")]
    [InlineData("FG0101", "[Support] static CountRange Range(int {|FG0101:least|}) => CountRange.From(least); [SufficientStatistic] static double Total(int x) => x;")]
    [InlineData("FG0102", "static int least = 1; [Support] static CountRange Range => CountRange.From({|FG0102:least|}); [SufficientStatistic] static double Total(int x) => x;")]
    [InlineData("FG0103", "[Support] static CountRange Range => CountRange.Between(5, {|FG0103:3|}); [SufficientStatistic] static double Total(int x) => x;")]
    [InlineData("FG0201", "[Support] static CountRange Range => CountRange.From(0); [SufficientStatistic] static double Total(int x, double {|FG0201:rate|}) => x * rate;")]
    [InlineData("FG0202", "[Support] static CountRange Range => CountRange.From(0); [SufficientStatistic] static double Total(int x) => x * {|FG0202:DateTime.Now|}.Hour;")]
    [InlineData("FG0203", "[Support] static CountRange Range => CountRange.From(0); [SufficientStatistic] static double LogTotal(int x) => -{|FG0203:Log(x)|};")]
    [InlineData("FG0204", "[Support] static CountRange Range => CountRange.Between(1, 2); [SufficientStatistic] static double Total(int x) => x; [SufficientStatistic] static double LogTotal(int x) => {|FG0204:Log(x)|};")]
    [InlineData("FG0205", "[Support] static CountRange Range => CountRange.From(0); [SufficientStatistic] static double Half(int x) => -({|FG0205:x / 2|});")]
    [InlineData("FG0301", "[Support] static CountRange Range => CountRange.From(0); [SufficientStatistic] static double Total(int x) => x; [BaseMeasure] static double Weight(int x) => {|FG0301:1 - x|};")]
    [InlineData("FG0401", "[Support] static CountRange Range => CountRange.AllIntegers; [SufficientStatistic] static double Total(int x) => x;")]
    [InlineData("FG0403", "[Support] static CountRange Range => CountRange.Between(0, 5); [SufficientStatistic] static double Rounded(int x) => {|FG0403:Round(x * 1.5)|};")]
    [InlineData("FG0405", "[Support] static CountRange Range => CountRange.From(0); [SufficientStatistic] static double Total(int x) => x; [SufficientStatistic] static double Crowding(int x) => -FactorialLn(x);")]
    [InlineData("FG0406", "[Support] static Interval Range => Interval.RealLine; [SufficientStatistic] static double Spread(double x) => x * x; [SufficientStatistic] static double Skew(double x) => {|FG0406:x * x * x|};")]
    [InlineData("FG0501", "[Support] static CountRange Range => CountRange.From(1); [LogKernel] static double Kernel(int x, double power) => -{|FG0501:Pow(x, power)|};")]
    [InlineData("FG0502", "[Support] static CountRange Range => CountRange.From(1); [LogKernel] static double Kernel(int x, double pace) => {|FG0502:-pace * x - pace * pace * Log(x)|};")]
    [InlineData("FG0503", "[Support] static CountRange Range => CountRange.From(1); [LogKernel] static double Kernel(int x, double {|FG0503:rate|}, double factor) => -rate * factor * x;")]
    public Task InTheHarness(string id, string members)
    {
        var test = new CSharpAnalyzerTest<FamilyAnalyzer, DefaultVerifier>
        {
            TestCode = DeclaredSource.Usings + "[Family] public partial class " + ClassName(id) + " { " + members + " }",
            ReferenceAssemblies = new ReferenceAssemblies("net10.0"),
            CompilerDiagnostics = CompilerDiagnostics.None,
        };
        test.TestState.AdditionalReferences.AddRange(DeclaredSource.References);
        return test.RunAsync();
    }

    // What is said of the parameter set is said of the whole class.
    private static string ClassName(string id) => id is "FG0401" or "FG0405" ? "{|" + id + ":ShiftStoppages|}" : "ShiftStoppages";

}
