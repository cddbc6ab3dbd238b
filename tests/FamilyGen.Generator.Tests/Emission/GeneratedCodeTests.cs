using System.Linq;
using System.Text.RegularExpressions;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.CSharp.Syntax;

namespace FamilyGen.Generator.Tests.Emission;

/// <summary>What every generated file must be: clean under the strictest settings, documented, deterministic.</summary>
public class GeneratedCodeTests
{
    public static TheoryData<string> Names => Declarations.Names;

    [Theory]
    [MemberData(nameof(Names))]
    public void Compiles_without_warnings_under_a_culture_with_another_minus_sign(string name)
    {
        GeneratedFamily.Compile(Declarations.All[name], out var diagnostics);
        Assert.Empty(diagnostics);
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Loads_and_gives_a_member_of_the_family(string name)
    {
        var type = GeneratedFamily.Load(Declarations.All[name], name);
        Assert.Contains(type.GetMembers(), m => m.Name == "Fit");
        Assert.NotEmpty(type.GetConstructors());
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Is_the_same_text_each_time(string name) =>
        Assert.Equal(GeneratedFamily.Sources(Declarations.All[name]), GeneratedFamily.Sources(Declarations.All[name]));

    [Theory]
    [MemberData(nameof(Names))]
    public void Marks_and_documents_every_public_member(string name)
    {
        foreach (var source in GeneratedFamily.Sources(Declarations.All[name]))
        {
            var root = CSharpSyntaxTree.ParseText(source).GetRoot();
            foreach (var member in root.DescendantNodes().OfType<MemberDeclarationSyntax>().Where(m => m.Modifiers.Any(k => k.IsKind(SyntaxKind.PublicKeyword))))
            {
                Assert.Contains("///", member.GetLeadingTrivia().ToFullString());
                var type = member.FirstAncestorOrSelf<TypeDeclarationSyntax>(t => t.AttributeLists.ToString().Contains("GeneratedCode"));
                Assert.True(type is not null || member.AttributeLists.ToString().Contains("GeneratedCode"), member.ToString());
            }
        }
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Calls_every_declared_member(string name)
    {
        var declaration = Declarations.All[name];
        var generated = string.Concat(GeneratedFamily.Sources(declaration));
        var declared = Regex.Matches(declaration, @"\[(?:Support|SufficientStatistic|BaseMeasure|LogBaseMeasure|LogKernel)[^\]]*\]\s*(?:private\s+)?static\s+(?:readonly\s+)?\w+\s+(\w+)");
        Assert.NotEmpty(declared);
        foreach (Match member in declared)
            Assert.Matches($@"\b{member.Groups[1].Value}\b[\(\.;]", generated);
    }

    [Fact]
    public void Has_a_kernel_that_fits_a_screen()
    {
        var kernel = GeneratedFamily.Sources(Declarations.All["ShiftStoppages"]).Single(s => s.Contains("struct KernelForm"));
        Assert.InRange(kernel.Split('\n').Length, 40, 90);
    }
}
