using System.Collections.Immutable;
using System.Linq;
using System.Threading;
using Basic.Reference.Assemblies;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;
using FamilyGen.Generator.Reading;
using FamilyGen.Generator.Verdicts;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;

namespace FamilyGen.Generator.Tests.Reading;

/// <summary>Declarations as source text, and what is read and found in them.</summary>
internal static class DeclaredSource
{
    public const string Usings = """
        using System;
        using FamilyGen;
        using static System.Math;
        using static MathNet.Numerics.SpecialFunctions;

        """;

    public static readonly CSharpParseOptions Parse = new(LanguageVersion.Latest);

    public static readonly ImmutableArray<MetadataReference> References =
    [
        .. Net100.References.All,
        MetadataReference.CreateFromFile(typeof(FamilyAttribute).Assembly.Location),
        MetadataReference.CreateFromFile(typeof(MathNet.Numerics.SpecialFunctions).Assembly.Location),
    ];

    // All compilations grow from one, so that the references are bound once.
    private static readonly CSharpCompilation s_empty = CSharpCompilation.Create(
        "Harbour",
        references: References,
        options: new CSharpCompilationOptions(
            OutputKind.DynamicallyLinkedLibrary,
            nullableContextOptions: NullableContextOptions.Enable,

            // As the SDK does: MathNet was built against an older runtime.
            specificDiagnosticOptions: [new("CS1701", ReportDiagnostic.Suppress), new("CS1702", ReportDiagnostic.Suppress)]));

    /// <summary>A compilation of the sources, each with the usual usings in front.</summary>
    public static CSharpCompilation Compile(params string[] sources) =>
        s_empty.AddSyntaxTrees(sources.Select((s, i) => CSharpSyntaxTree.ParseText(Usings + s, Parse, $"Harbour{i}.cs")));

    /// <summary>The compilation as the analyzer sees it, with what is generated.</summary>
    public static Compilation Generate(Compilation compilation)
    {
        CSharpGeneratorDriver.Create([new FamilyGenerator().AsSourceGenerator()], parseOptions: Parse)
            .RunGeneratorsAndUpdateCompilation(compilation, out var generated, out var problems);
        Assert.Empty(problems);
        return generated;
    }

    /// <summary>Reads the only family in the sources.</summary>
    public static (FamilyReading Reading, ImmutableArray<Location> Locations) Read(params string[] sources) =>
        Read(Compile(sources));

    public static (FamilyReading Reading, ImmutableArray<Location> Locations) Read(Compilation compilation) =>
        FamilyReader.Read(compilation, Family(compilation), CancellationToken.None);

    /// <summary>A declaration in which the reader sees nothing wrong.</summary>
    public static FamilyDeclaration ReadValid(params string[] sources)
    {
        var (reading, _) = Read(sources);
        Assert.True(reading.IsReadable);
        Assert.Empty(reading.Faults);
        Assert.Empty(reading.Dependencies);
        return reading.Declaration;
    }

    /// <summary>The errors and warnings as "FG0101 at `shape`", which generator and analyzer must agree on.</summary>
    public static string[] Findings(params string[] sources)
    {
        var compilation = Compile(sources);
        var findings = Places(compilation);
        Assert.Equal(findings, Places(Generate(compilation)));
        return findings;
    }

    private static string[] Places(Compilation compilation)
    {
        var (reading, locations) = Read(compilation);
        return Judgement.Of(reading).Findings
            .Where(f => Descriptors.ById[f.Id].DefaultSeverity > DiagnosticSeverity.Info)
            .Select(f => f.Id + (f.Origin < 0 ? " at the class" : " at `" + Text(locations[f.Origin]) + "`"))
            .ToArray();
    }

    /// <summary>The formula that a body of the given text is read as, with an observation x of the type.</summary>
    public static string Formula(string body, string type = "double", string members = "")
    {
        var support = type == "double" ? "Interval Range => Interval.RealLine" : "CountRange Range => CountRange.AllIntegers";
        var block = body.Contains("return") ? "{ " + body + " }" : "=> " + body + ";";
        var declaration = ReadValid($$"""
            [Family] public partial class Stoppages
            {
                [Support] static {{support}};
                [SufficientStatistic] static double T({{type}} x) {{block}}
                {{members}}
            }
            """);
        return FormulaText.Of(declaration.Statistics[0].Body);
    }

    public static string Text(Location location) => location.SourceTree!.GetText().ToString(location.SourceSpan);

    private static INamedTypeSymbol Family(Compilation compilation) => compilation.GetSymbolsWithName(_ => true, SymbolFilter.Type)
        .OfType<INamedTypeSymbol>().Single(t => t.GetAttributes().Any(a => a.AttributeClass?.Name == "FamilyAttribute"));
}
