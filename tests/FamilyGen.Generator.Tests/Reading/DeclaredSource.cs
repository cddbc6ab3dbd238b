using System.Collections.Immutable;
using System.Linq;
using System.Threading;
using Basic.Reference.Assemblies;
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

    /// <summary>A compilation of the sources, each with the usual usings in front.</summary>
    public static CSharpCompilation Compile(params string[] sources) => CSharpCompilation.Create(
        "Harbour",
        sources.Select((s, i) => CSharpSyntaxTree.ParseText(Usings + s, Parse, $"Harbour{i}.cs")),
        References,
        new CSharpCompilationOptions(OutputKind.DynamicallyLinkedLibrary, nullableContextOptions: NullableContextOptions.Enable));

    /// <summary>Reads the only family in the sources.</summary>
    public static (FamilyReading Reading, ImmutableArray<Location> Locations) Read(params string[] sources) =>
        Read(Compile(sources));

    public static (FamilyReading Reading, ImmutableArray<Location> Locations) Read(Compilation compilation) =>
        FamilyReader.Read(compilation, Family(compilation), CancellationToken.None);

    /// <summary>A declaration that reads without any finding.</summary>
    public static FamilyDeclaration ReadValid(params string[] sources)
    {
        var (reading, _) = Read(sources);
        Assert.True(reading.IsReadable);
        Assert.Empty(Judgement.Of(reading).Findings);
        return reading.Declaration;
    }

    /// <summary>The findings as "FG0101 at `shape`", which generator and analyzer must agree on.</summary>
    public static string[] Findings(params string[] sources)
    {
        var compilation = Compile(sources);
        var (reading, locations) = Read(compilation);
        var findings = Places(Judgement.Of(reading), locations);

        // The analyzer sees what is generated.
        CSharpGeneratorDriver.Create([new FamilyGenerator().AsSourceGenerator()], parseOptions: Parse)
            .RunGeneratorsAndUpdateCompilation(compilation, out var generated, out var problems);
        Assert.Empty(problems);
        var (again, placesAgain) = Read(generated);
        Assert.Equal(findings, Places(Judgement.Of(again), placesAgain));
        return findings;
    }

    /// <summary>The errors and warnings that the compiler itself reports once code is generated.</summary>
    public static string[] CompilerMessages(params string[] sources)
    {
        CSharpGeneratorDriver.Create([new FamilyGenerator().AsSourceGenerator()], parseOptions: Parse)
            .RunGeneratorsAndUpdateCompilation(Compile(sources), out var generated, out _);
        return generated.GetDiagnostics().Where(d => d.Severity >= DiagnosticSeverity.Warning).Select(d => d.ToString()).ToArray();
    }

    private static string[] Places(Judgement judgement, ImmutableArray<Location> locations) =>
        judgement.Findings.Select(f => f.Id + " at `" + Text(locations[f.Origin]) + "`").ToArray();

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
