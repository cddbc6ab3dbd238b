using System;
using System.Linq;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Tests.Reading;
using FamilyGen.Generator.Verdicts;

namespace FamilyGen.Generator.Tests.Verdicts;

/// <summary>Declarations get the verdict that they deserve: none is accepted or refused wrongly.</summary>
public class DeclarationTableTests
{
    [Theory]
    [MemberData(nameof(DeclarationTable.Agreed), MemberType = typeof(DeclarationTable))]
    public void Agreed(string number, string expected, string members)
    {
        Assert.NotEmpty(number);
        Verdict(expected, members);
    }

    [Theory]
    [MemberData(nameof(DeclarationTable.Finiteness), MemberType = typeof(DeclarationTable))]
    [MemberData(nameof(DeclarationTable.Dependence), MemberType = typeof(DeclarationTable))]
    [MemberData(nameof(DeclarationTable.Measures), MemberType = typeof(DeclarationTable))]
    [MemberData(nameof(DeclarationTable.NaturalSets), MemberType = typeof(DeclarationTable))]
    [MemberData(nameof(DeclarationTable.Integer), MemberType = typeof(DeclarationTable))]
    public void Verdict(string expected, string members)
    {
        var (reading, _) = DeclaredSource.Read("[Family] public partial class Stoppages { " + members + " }");
        Assert.True(reading.IsReadable);
        var ids = Judgement.Of(reading).Findings.Select(f => f.Id).Where(id => !IsInformation(id)).Distinct();
        Assert.Equal(expected, string.Join(", ", ids));
    }

    private static bool IsInformation(string id) =>
        Descriptors.ById[id].DefaultSeverity == Microsoft.CodeAnalysis.DiagnosticSeverity.Info;
}
