using System.Linq;
using FamilyGen.Generator.Model;
using FamilyGen.Generator.Reading;
using FamilyGen.Generator.Tests.Reading;
using Microsoft.CodeAnalysis;

namespace FamilyGen.Generator.Tests.Pipeline;

/// <summary>The list of taken names is what is really generated.</summary>
public class GeneratedNamesTests
{
    [Theory]
    [InlineData("Stoppages", """
        [Family] public partial class Stoppages
        {
            [Support] static CountRange Range([Known] int berths) => CountRange.Between(0, berths);
            [SufficientStatistic] static double Total(int x) => x;
            [BaseMeasure] static double Weight(int x) => x + 1;
        }
        """)]
    [InlineData("RepairHours", """
        [Family] public partial class RepairHours
        {
            [Support] static Interval Range => Interval.Above(0).WithMassAt(0);
            [LogKernel] static double Kernel(double x, double rate, [Known] double berths) => x > 0 ? -rate * x / berths : 0;
        }
        """)]
    public void EveryGeneratedNameIsOnTheList(string name, string declaration)
    {
        var family = DeclaredSource.Generate(DeclaredSource.Compile(declaration)).Assembly.GetTypeByMetadataName(name)!;
        Assert.False(GeneratedFace.IsStub(family));
        var generated = family.GetMembers()
            .Where(m => m.CanBeReferencedByName && !m.IsImplicitlyDeclared && GeneratedFace.IsGenerated(m)).ToList();
        Assert.NotEmpty(generated);

        // LogKernel(x) is an overload beside the declared kernel, whatever that is called.
        var unlisted = generated.Select(m => m.Name).Distinct()
            .Where(n => !GeneratedNames.IsReserved(n) && n is not ("Rate" or "Berths" or "LogKernel"));
        Assert.Empty(unlisted);

        var kernel = family.GetTypeMembers("KernelForm").Single();
        var unlistedInKernel = kernel.GetMembers().Where(m => m.DeclaredAccessibility == Accessibility.Public && m.CanBeReferencedByName)
            .Select(m => m.Name).Distinct().Where(n => !GeneratedNames.IsReservedInKernel(n) && n is not ("Natural" or "Berths"));
        Assert.Empty(unlistedInKernel);
    }
}
