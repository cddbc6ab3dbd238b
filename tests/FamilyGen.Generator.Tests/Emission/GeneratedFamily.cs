using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Reflection;
using System.Runtime.Loader;
using Basic.Reference.Assemblies;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;

namespace FamilyGen.Generator.Tests.Emission;

/// <summary>Compiles a declaration together with what the generator makes of it, under the strictest settings a user may
/// have, and loads the result.</summary>
internal static class GeneratedFamily
{
    private const string Usings = """
        using System;
        using FamilyGen;
        using static System.Math;
        using static MathNet.Numerics.SpecialFunctions;

        """;

    private static readonly CSharpParseOptions s_parse = new(LanguageVersion.Latest, DocumentationMode.Diagnose);

    private static readonly MetadataReference[] s_references =
    [
        .. Net100.References.All,
        MetadataReference.CreateFromFile(typeof(FamilyAttribute).Assembly.Location),
        MetadataReference.CreateFromFile(typeof(MathNet.Numerics.SpecialFunctions).Assembly.Location),
    ];

    /// <summary>The generated files of a declaration.</summary>
    public static IReadOnlyList<string> Sources(string declaration) =>
        [.. Driver().RunGenerators(Compilation(declaration)).GetRunResult().Results.Single().GeneratedSources.Select(s => s.SourceText.ToString())];

    /// <summary>The family's type, compiled and loaded; fails on any warning.</summary>
    public static Type Load(string declaration, string name)
    {
        var compilation = Compile(declaration, out var diagnostics);
        Assert.Empty(diagnostics);
        using var image = new MemoryStream();
        var emitted = compilation.Emit(image);
        Assert.Empty(emitted.Diagnostics.Where(d => d.Severity >= DiagnosticSeverity.Warning));
        image.Position = 0;
        var context = new AssemblyLoadContext(name, isCollectible: true);
        return context.LoadFromStream(image).GetType(name, throwOnError: true)!;
    }

    /// <summary>The compilation with generated code, and everything in it of severity warning or above.</summary>
    public static Compilation Compile(string declaration, out IReadOnlyList<Diagnostic> diagnostics)
    {
        // Swedish writes its minus as U+2212: a generator that formats by the current culture fails here.
        var culture = CultureInfo.CurrentCulture;
        CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo("sv-SE");
        try
        {
            var compilation = Compilation(declaration);
            Driver().RunGeneratorsAndUpdateCompilation(compilation, out var output, out var reported);
            diagnostics = [.. reported, .. output.GetDiagnostics().Where(d => d.Severity >= DiagnosticSeverity.Warning)];
            return output;
        }
        finally
        {
            CultureInfo.CurrentCulture = culture;
        }
    }

    private static CSharpCompilation Compilation(string declaration) => CSharpCompilation.Create(
        "Harbour",
        [CSharpSyntaxTree.ParseText(Usings + declaration, s_parse, "Harbour.cs")],
        s_references,
        new CSharpCompilationOptions(
            OutputKind.DynamicallyLinkedLibrary,
            nullableContextOptions: NullableContextOptions.Enable,
            warningLevel: 9999,
            generalDiagnosticOption: ReportDiagnostic.Error,

            // Off in every project of the SDK, or about the test's own source: assemblies of an older runtime, comments that
            // the declarations here do without, usings that one of them does not need.
            specificDiagnosticOptions: new[] { "CS1701", "CS1702", "CS1591", "CS8019" }.Select(id => KeyValuePair.Create(id, ReportDiagnostic.Suppress))));

    private static GeneratorDriver Driver() => CSharpGeneratorDriver.Create([new FamilyGenerator().AsSourceGenerator()], parseOptions: s_parse);
}
