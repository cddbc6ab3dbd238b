using System.Collections.Immutable;
using System.Linq;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp.Syntax;
using Microsoft.CodeAnalysis.Operations;

namespace FamilyGen.Generator.Reading;

/// <summary>Finds the operations of members that are written in the compilation itself. A member of a referenced project
/// is never opened: the IDE would see its source and the command line would not.</summary>
internal static class MemberBody
{
    public static bool IsInSource(ISymbol member, ReadingSession session) =>
        SymbolEqualityComparer.Default.Equals(member.ContainingAssembly, session.Compilation.Assembly)
        && !member.DeclaringSyntaxReferences.IsEmpty;

    /// <summary>The statements of a method, or of a property's getter; null where there are none.</summary>
    public static ImmutableArray<IOperation>? Statements(ISymbol member, ReadingSession session)
    {
        if (!IsInSource(member, session))
            return null;
        if (member is IMethodSymbol { PartialImplementationPart: { } implementation })
            member = implementation;
        foreach (var reference in member.DeclaringSyntaxReferences)
        {
            SyntaxNode? body = reference.GetSyntax(session.Cancellation) switch
            {
                BaseMethodDeclarationSyntax method => (SyntaxNode?)method.Body ?? method.ExpressionBody,
                LocalFunctionStatementSyntax function => (SyntaxNode?)function.Body ?? function.ExpressionBody,
                PropertyDeclarationSyntax { ExpressionBody: { } expression } => expression,
                PropertyDeclarationSyntax { AccessorList: { } accessors } => Getter(accessors),
                _ => null,
            };
            if (body is not null && Operation(body, session) is IBlockOperation block)
                return block.Operations;
        }

        return null;
    }

    /// <summary>The value that a field or an automatic property starts with, unless a static constructor has the last word.</summary>
    public static IOperation? Initializer(ISymbol member, ReadingSession session)
    {
        if (!IsInSource(member, session) || IsNamedInStaticConstructor(member, session))
            return null;
        foreach (var reference in member.DeclaringSyntaxReferences)
        {
            var initializer = reference.GetSyntax(session.Cancellation) switch
            {
                VariableDeclaratorSyntax variable => variable.Initializer,
                PropertyDeclarationSyntax property => property.Initializer,
                _ => null,
            };
            if (initializer is not null && Operation(initializer, session) is ISymbolInitializerOperation operation)
                return operation.Value;
        }

        return null;
    }

    private static bool IsNamedInStaticConstructor(ISymbol member, ReadingSession session) =>
        member.ContainingType.StaticConstructors.SelectMany(c => c.DeclaringSyntaxReferences)
            .SelectMany(r => r.GetSyntax(session.Cancellation).DescendantNodes().OfType<IdentifierNameSyntax>())
            .Any(n => n.Identifier.ValueText == member.Name);

    private static SyntaxNode? Getter(AccessorListSyntax accessors)
    {
        var getter = accessors.Accessors.FirstOrDefault(a => a.Keyword.ValueText == "get");
        return (SyntaxNode?)getter?.Body ?? getter?.ExpressionBody;
    }

    private static IOperation? Operation(SyntaxNode node, ReadingSession session) =>
        session.Compilation.GetSemanticModel(node.SyntaxTree).GetOperation(node, session.Cancellation);
}
