using Microsoft.CodeAnalysis;

namespace FamilyGen.Generator;

/// <summary>Generates the face and the kernel of every class that is marked as a family.</summary>
[Generator(LanguageNames.CSharp)]
public sealed class FamilyGenerator : IIncrementalGenerator
{
    /// <inheritdoc/>
    public void Initialize(IncrementalGeneratorInitializationContext context)
    {
    }
}
