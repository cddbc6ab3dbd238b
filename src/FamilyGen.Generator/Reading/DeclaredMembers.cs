using System.Collections.Generic;
using System.Collections.Immutable;
using System.Linq;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp.Syntax;

namespace FamilyGen.Generator.Reading;

/// <summary>A member that carries one of the attributes of a declaration.</summary>
internal sealed record AttributedMember(ISymbol Symbol, MemberRole Role, string Attribute, AttributeData Data)
{
    public ImmutableArray<IParameterSymbol> Arguments =>
        Symbol is IMethodSymbol method ? method.Parameters : ImmutableArray<IParameterSymbol>.Empty;

    public ITypeSymbol Type => Symbol switch
    {
        IMethodSymbol method => method.ReturnType,
        IPropertySymbol property => property.Type,
        _ => ((IFieldSymbol)Symbol).Type,
    };

    /// <summary>Whether the member is a bool, and so narrows a range rather than being one.</summary>
    public bool IsPredicate => Role == MemberRole.Support && Type.SpecialType == SpecialType.System_Boolean;
}

/// <summary>The members of one declaration, each with the role that it will play; second ones of a kind are refused.</summary>
internal sealed record DeclaredMembers(
    AttributedMember? Range,
    AttributedMember? Predicate,
    ImmutableArray<AttributedMember> Statistics,
    AttributedMember? BaseMeasure,
    AttributedMember? Kernel)
{
    private static readonly Dictionary<string, MemberRole> s_roles = new()
    {
        ["SupportAttribute"] = MemberRole.Support,
        ["SufficientStatisticAttribute"] = MemberRole.Statistic,
        ["BaseMeasureAttribute"] = MemberRole.BaseMeasure,
        ["LogBaseMeasureAttribute"] = MemberRole.BaseMeasure,
        ["LogKernelAttribute"] = MemberRole.Kernel,
    };

    public IEnumerable<AttributedMember> All =>
        new[] { Range, Predicate }.Concat(Statistics).Concat([BaseMeasure, Kernel]).OfType<AttributedMember>()
            .OrderBy(m => m.Symbol.Locations[0].SourceSpan.Start);

    public static DeclaredMembers Find(ReadingSession session)
    {
        var found = session.Family.GetMembers().SelectMany(m => Attributed(m, session)).ToImmutableArray();
        var home = Home(session);
        foreach (var member in found)
        {
            if (!IsIn(member.Symbol, home, session))
                session.Refuse(session.Mark(member.Symbol), ShapeFault.OtherPart(member.Symbol.Name, session.Family.Name));
        }

        var members = new DeclaredMembers(
            Single(found.Where(m => m.Role == MemberRole.Support && !m.IsPredicate), "range of values", session),
            Single(found.Where(m => m.IsPredicate), "condition on the range", session),
            found.Where(m => m.Role == MemberRole.Statistic).ToImmutableArray(),
            Single(found.Where(m => m.Role == MemberRole.BaseMeasure), "base measure", session),
            Single(found.Where(m => m.Role == MemberRole.Kernel), "kernel", session));
        members.CheckComplete(session);
        return members;
    }

    private static IEnumerable<AttributedMember> Attributed(ISymbol symbol, ReadingSession session)
    {
        if (symbol is not (IMethodSymbol or IPropertySymbol or IFieldSymbol) || symbol.Locations.IsEmpty || symbol.IsImplicitlyDeclared)
            yield break;
        AttributedMember? first = null;
        foreach (var data in symbol.GetAttributes())
        {
            if (data.AttributeClass is not { } type || type.ContainingNamespace?.ToDisplayString() != "FamilyGen"
                || !s_roles.TryGetValue(type.Name, out var role))
            {
                continue;
            }

            if (first is not null)
            {
                session.Refuse(session.Mark(symbol), ShapeFault.TwoRoles(symbol.Name));
                yield break;
            }

            first = new AttributedMember(symbol, role, type.Name, data);
            yield return first;
        }
    }

    private static SyntaxNode? Home(ReadingSession session)
    {
        foreach (var data in session.Family.GetAttributes())
        {
            if (data.AttributeClass?.ToDisplayString() == FamilyReader.FamilyAttribute)
                return data.ApplicationSyntaxReference?.GetSyntax(session.Cancellation).FirstAncestorOrSelf<TypeDeclarationSyntax>();
        }

        return null;
    }

    private static bool IsIn(ISymbol member, SyntaxNode? home, ReadingSession session) =>
        home is null || member.DeclaringSyntaxReferences.Any(r =>
            r.GetSyntax(session.Cancellation).FirstAncestorOrSelf<TypeDeclarationSyntax>() == home);

    private static AttributedMember? Single(IEnumerable<AttributedMember> members, string role, ReadingSession session)
    {
        AttributedMember? first = null;
        foreach (var member in members)
        {
            if (first is null)
                first = member;
            else
                session.Refuse(session.Mark(member.Symbol), ShapeFault.SecondMember(member.Symbol.Name, first.Symbol.Name, role));
        }

        return first;
    }

    private void CheckComplete(ReadingSession session)
    {
        var name = session.Family.Name;
        if (Range is null)
            session.Refuse(session.Mark(session.Family), ShapeFault.NoSupport(name));
        if (Kernel is null && Statistics.IsEmpty)
            session.Refuse(session.Mark(session.Family), ShapeFault.NoStatistic(name));
        if (Kernel is null)
            return;
        foreach (var member in Statistics.Concat(new[] { BaseMeasure }.OfType<AttributedMember>()))
            session.Refuse(session.Mark(member.Symbol), ShapeFault.BothForms(member.Symbol.Name, Kernel.Symbol.Name));
    }
}
