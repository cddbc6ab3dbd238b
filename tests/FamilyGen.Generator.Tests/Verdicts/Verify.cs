using System;
using System.Collections.Generic;
using System.Collections.Immutable;
using System.Linq;
using System.Threading.Tasks;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Tests.Reading;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Diagnostics;
using Microsoft.CodeAnalysis.Testing;
using Microsoft.CodeAnalysis.Text;

namespace FamilyGen.Generator.Tests.Verdicts;

/// <summary>Checks what is reported on declarations with marked places: {|FG0101:shape|}.</summary>
internal static class Verify
{
    /// <summary>The analyzer reports exactly what is marked, with and without the generated code; and the compiler itself has
    /// nothing to add to our messages.</summary>
    public static async Task Findings(params string[] markedSources) =>
        Assert.Equal("", string.Join("\n", await CheckMarks(markedSources)));

    /// <summary>The same for a declaration that the compiler refuses as well.</summary>
    public static async Task FindingsBesideCompilerErrors(params string[] markedSources) =>
        Assert.NotEmpty(await CheckMarks(markedSources));

    /// <summary>The messages on a declaration, generated code included.</summary>
    public static async Task<string[]> Messages(string source)
    {
        var diagnostics = await Analyze(DeclaredSource.Generate(DeclaredSource.Compile(source)));
        return diagnostics.Select(d => d.Id + ": " + d.GetMessage()).ToArray();
    }

    private static async Task<string[]> CheckMarks(string[] markedSources)
    {
        var sources = new List<string>();
        var marks = new List<string>();
        foreach (var source in markedSources)
        {
            TestFileMarkupParser.GetSpans(DeclaredSource.Usings + source, out var plain, out ImmutableDictionary<string, ImmutableArray<TextSpan>> spans);
            marks.AddRange(spans.SelectMany(s => s.Value.Select(span => Place(s.Key, sources.Count, span, plain))));
            sources.Add(plain.Substring(DeclaredSource.Usings.Length));
        }

        marks.Sort(StringComparer.Ordinal);
        var compilation = DeclaredSource.Compile([.. sources]);
        Assert.Equal(marks, Places(compilation, await Analyze(compilation)));
        var generated = DeclaredSource.Generate(compilation);
        Assert.Equal(marks, Places(generated, await Analyze(generated)));
        return generated.GetDiagnostics().Where(d => d.Severity >= DiagnosticSeverity.Warning).Select(d => d.ToString()).ToArray();
    }

    private static string[] Places(Compilation compilation, IEnumerable<Diagnostic> diagnostics)
    {
        var trees = compilation.SyntaxTrees.ToList();
        return diagnostics
            .Select(d => Place(d.Id, trees.IndexOf(d.Location.SourceTree!), d.Location.SourceSpan, d.Location.SourceTree!.GetText().ToString()))
            .Order(StringComparer.Ordinal).ToArray();
    }

    private static string Place(string id, int file, TextSpan span, string text) =>
        $"{id} at {file}:{span.Start}: {text.Substring(span.Start, span.Length)}";

    private static async Task<IEnumerable<Diagnostic>> Analyze(Compilation compilation)
    {
        var diagnostics = await compilation.WithAnalyzers([new FamilyAnalyzer()]).GetAnalyzerDiagnosticsAsync();
        return diagnostics.Where(d => d.Severity >= DiagnosticSeverity.Warning).OrderBy(d => d.Location.SourceSpan.Start);
    }
}
