using System.Collections.Immutable;
using System.Linq;
using FamilyGen.Generator.Model;
using FamilyGen.Generator.Reading;
using FamilyGen.Generator.Verdicts;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Diagnostics;

namespace FamilyGen.Generator.Diagnostics;

/// <summary>Reports what the rules find in every declared family. It reads and judges with the same functions as the
/// generator, and adds only the places in the source.</summary>
[DiagnosticAnalyzer(LanguageNames.CSharp)]
public sealed class FamilyAnalyzer : DiagnosticAnalyzer
{
    /// <inheritdoc/>
    public override ImmutableArray<DiagnosticDescriptor> SupportedDiagnostics => Descriptors.All;

    /// <inheritdoc/>
    public override void Initialize(AnalysisContext context)
    {
        context.ConfigureGeneratedCodeAnalysis(GeneratedCodeAnalysisFlags.None);
        context.EnableConcurrentExecution();
        context.RegisterSymbolAction(Analyze, Microsoft.CodeAnalysis.SymbolKind.NamedType);
    }

    private static void Analyze(SymbolAnalysisContext context)
    {
        var type = (INamedTypeSymbol)context.Symbol;
        if (!type.GetAttributes().Any(a => a.AttributeClass?.ToDisplayString() == FamilyReader.FamilyAttribute))
            return;
        var (reading, locations) = FamilyReader.Read(context.Compilation, type, context.CancellationToken);
        var judgement = Judgement.Of(reading);
        foreach (var finding in judgement.Findings)
        {
            var place = finding.Origin >= 0 && finding.Origin < locations.Length ? locations[finding.Origin] : type.Locations[0];
            context.ReportDiagnostic(ToDiagnostic(finding, place));
        }

        // What reads well here was not readable for the generator: it has seen less.
        if (judgement.Form is not null && GeneratedFace.IsStub(type))
            context.ReportDiagnostic(Diagnostic.Create(Descriptors.Shape, type.Locations[0], ShapeFault.WrittenByAnotherGenerator(type.Name)));
    }

    private static Diagnostic ToDiagnostic(Finding finding, Location location) =>
        Diagnostic.Create(Descriptors.ById[finding.Id], location, finding.Arguments.ToArray<object?>());
}
