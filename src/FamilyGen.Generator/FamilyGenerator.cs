using System.Text;
using FamilyGen.Generator.Emission;
using FamilyGen.Generator.Model;
using FamilyGen.Generator.Reading;
using FamilyGen.Generator.Verdicts;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp.Syntax;
using Microsoft.CodeAnalysis.Text;

namespace FamilyGen.Generator;

/// <summary>Generates the face and the kernel of every class that is marked as a family.</summary>
[Generator(LanguageNames.CSharp)]
public sealed class FamilyGenerator : IIncrementalGenerator
{
    /// <summary>The names by which the steps are tracked.</summary>
    internal static class Steps
    {
        public const string Read = "Read";
        public const string Judge = "Judge";
        public const string Emit = "Emit";
    }

    /// <inheritdoc/>
    public void Initialize(IncrementalGeneratorInitializationContext context)
    {
        var readings = context.SyntaxProvider
            .ForAttributeWithMetadataName(
                FamilyReader.FamilyAttribute,
                static (node, _) => node is TypeDeclarationSyntax,
                static (found, cancellation) => FamilyReader.Read(found.SemanticModel.Compilation, (INamedTypeSymbol)found.TargetSymbol, cancellation).Reading)
            .WithTrackingName(Steps.Read);

        var judgements = readings
            .Select(static (reading, _) => Judgement.Of(reading))
            .WithTrackingName(Steps.Judge);

        var sources = judgements
            .Select(static (judgement, _) => GeneratedFile.Of(judgement))
            .WithTrackingName(Steps.Emit);

        context.RegisterSourceOutput(sources, static (output, files) =>
        {
            foreach (var file in files)
                output.AddSource(file.HintName, SourceText.From(file.Text, Encoding.UTF8));
        });
    }

    private sealed record GeneratedFile(string HintName, string Text)
    {
        /// <summary>The family's face and kernel, stubs where the declaration is refused, nothing where the class cannot be
        /// added to.</summary>
        public static EquatableArray<GeneratedFile> Of(Judgement judgement)
        {
            if (!judgement.Reading.CanBeCompleted)
                return EquatableArray<GeneratedFile>.Empty;
            var declaration = judgement.Reading.Declaration;
            var name = declaration.MetadataName;
            return judgement.Form is { } form
                ? EquatableArray.Of(
                    new GeneratedFile(name + ".g.cs", FamilyEmitter.EmitFace(declaration, form)),
                    new GeneratedFile(name + ".Kernel.g.cs", FamilyEmitter.EmitKernel(declaration, form)))
                : EquatableArray.Of(new GeneratedFile(name + ".g.cs", FamilyEmitter.EmitStub(declaration)));
        }
    }
}
