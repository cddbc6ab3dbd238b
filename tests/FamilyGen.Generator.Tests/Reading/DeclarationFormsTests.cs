using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Tests.Reading;

/// <summary>The three ways to declare a family, as the documentation shows them.</summary>
public class DeclarationFormsTests
{
    [Fact]
    public void CanonicalForm()
    {
        var declaration = DeclaredSource.ReadValid("""
            namespace Harbour.Cranes;

            [Family]
            public partial class ShiftStoppages
            {
                [Support] static CountRange Range => CountRange.From(0);
                [SufficientStatistic] static double Total(int x) => x;
                [SufficientStatistic(Parameter = "packing")] static double Crowding(int x) => -FactorialLn(x);
            }
            """);
        Assert.Equal("Harbour.Cranes.ShiftStoppages", declaration.MetadataName);
        Assert.Equal("public", declaration.Accessibility);
        Assert.Equal(ObservationType.Int, declaration.Observation);
        Assert.Equal("x", declaration.ObservationName);
        Assert.True(declaration.Support.IsLattice);
        Assert.Equal("0", FormulaText.Of(declaration.Support.Lower!));
        Assert.Null(declaration.Support.Upper);
        Assert.Equal(new DeclaredMember("Range", false, EquatableArray<string>.Empty), declaration.Support.Range);
        Assert.Equal(["total", "packing"], [declaration.Statistics[0].Parameter, declaration.Statistics[1].Parameter]);
        Assert.Equal("x", FormulaText.Of(declaration.Statistics[0].Body));
        Assert.Equal("(-1 * LogGamma((x + 1)))", FormulaText.Of(declaration.Statistics[1].Body));
        Assert.False(declaration.IsTrade);
        Assert.Equal(["Range", "Total", "Crowding"], declaration.MemberNames);
    }

    [Fact]
    public void TradeForm()
    {
        var declaration = DeclaredSource.ReadValid("""
            [Family]
            internal partial class RepairHours
            {
                [Support] static Interval Range => Interval.Above(0);
                [LogKernel] static double Kernel(double hours, double shape, [Positive] double rate, double delay)
                    => (shape - 1) * Log(hours) - rate * hours - delay / hours;
            }
            """);
        Assert.Equal("internal", declaration.Accessibility);
        Assert.Equal(ObservationType.Double, declaration.Observation);
        Assert.Equal("hours", declaration.ObservationName);
        Assert.Equal([new("shape", false), new("rate", true), new("delay", false)], declaration.Parameters);
        Assert.Equal(
            "(((($shape + (-1 * 1)) * Log(hours)) + (-1 * ($rate * hours))) + (-1 * ($delay * hours^-1)))",
            FormulaText.Of(declaration.Kernel!));
        Assert.Equal(new DeclaredMember("Kernel", true, EquatableArray.Of("hours", "shape", "rate", "delay")), declaration.KernelMember);
    }

    [Fact]
    public void KnownValues()
    {
        var declaration = DeclaredSource.ReadValid("""
            [Family]
            public partial class FaultyTwistlocks
            {
                [Support] static CountRange Range([Known] int checkedLocks) => CountRange.Between(0, checkedLocks);
                [SufficientStatistic] static double Faulty(int x) => x;
                [LogBaseMeasure] static double Ways(int x, [Known] int checkedLocks) => BinomialLn(checkedLocks, x);
            }
            """);
        Assert.Equal([new KnownValue("checkedLocks", "int")], declaration.Known);
        Assert.Equal("#checkedLocks", FormulaText.Of(declaration.Support.Upper!));
        Assert.True(declaration.BaseMeasure!.IsLogarithm);
        Assert.Equal(
            "(LogGamma((#checkedLocks + 1)) + (-1 * LogGamma((x + 1))) + (-1 * LogGamma(((#checkedLocks + (-1 * x)) + 1))))",
            FormulaText.Of(declaration.BaseMeasure.Body));
        Assert.Equal(new DeclaredMember("Ways", true, EquatableArray.Of("x", "checkedLocks")), declaration.BaseMeasure.Member);
    }
}
