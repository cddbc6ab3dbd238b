using System.Collections.Generic;
using System.Collections.Immutable;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;
using Microsoft.CodeAnalysis;

namespace FamilyGen.Generator.Reading;

/// <summary>Turns the declared members into the model. Every part is made even where something is wrong, so that stubs can
/// be added to an invalid declaration.</summary>
internal sealed class DeclarationReader(ReadingSession session, DeclaredMembers members)
{
    private readonly OperationReader _reader = new(session);
    private readonly Signatures _signatures = new(session, members);

    public FamilyDeclaration Read()
    {
        var family = session.Family;
        var range = ReadSupport();
        var statistics = members.Statistics.Select(ReadStatistic).ToEquatableArray();
        var baseMeasure = ReadBaseMeasure();
        var kernel = members.Kernel is { } member ? ReadFormula(member) : null;
        return new FamilyDeclaration(
            family.ContainingNamespace.IsGlobalNamespace ? "" : family.ContainingNamespace.ToDisplayString(),
            Outer(family),
            SyntaxFactsOf.Accessibility(family),
            family.Name,
            _signatures.Observation,
            _signatures.ObservationName,
            range,
            _signatures.Known,
            statistics,
            baseMeasure,
            kernel,
            members.Kernel is null ? null : Describe(members.Kernel),
            _signatures.Parameters);
    }

    private static EquatableArray<TypeShell> Outer(INamedTypeSymbol family)
    {
        var shells = new List<TypeShell>();
        for (var outer = family.ContainingType; outer is not null; outer = outer.ContainingType)
            shells.Insert(0, new TypeShell(SyntaxFactsOf.Keyword(outer), outer.Name));
        return shells.ToEquatableArray();
    }

    private static DeclaredMember Describe(AttributedMember member) => new(
        member.Symbol.Name, member.Symbol is IMethodSymbol, member.Arguments.Select(a => a.Name).ToEquatableArray());

    private SupportDeclaration ReadSupport()
    {
        var range = members.Range is { } member ? ReadMember(member) as RangeValue : null;
        var isLattice = range?.IsLattice ?? _signatures.Observation != ObservationType.Double;
        range ??= new RangeValue(isLattice, null, null, isLattice, isLattice, false, EquatableArray<Expression>.Empty);
        var predicate = members.Predicate is { } condition ? ReadMember(condition) as TruthValue : null;
        return new SupportDeclaration(
            range.IsLattice, range.Lower, range.Upper, range.LowerIncluded, range.UpperIncluded, range.IsCircle, range.Masses,
            predicate?.Condition,
            members.Range is null ? new DeclaredMember("", false, EquatableArray<string>.Empty) : Describe(members.Range),
            members.Predicate is null ? null : Describe(members.Predicate));
    }

    private StatisticDeclaration ReadStatistic(AttributedMember member) =>
        new(member.Symbol.Name, _signatures.NaturalName(member), ReadFormula(member), Describe(member));

    private BaseMeasureDeclaration? ReadBaseMeasure() => members.BaseMeasure is { } member
        ? new BaseMeasureDeclaration(member.Attribute == "LogBaseMeasureAttribute", ReadFormula(member), Describe(member))
        : null;

    private Expression ReadFormula(AttributedMember member) =>
        ReadMember(member) is NumberValue number ? number.Expression : OperationReader.Placeholder(-1);

    /// <summary>Reads the member; where it is an instance member this is for the sake of finding the parameter that it
    /// reads, which says more than that it is not static.</summary>
    private Value? ReadMember(AttributedMember member)
    {
        session.Enter(member.Role, member.Symbol);
        var (scope, canRead) = _signatures.ScopeOf(member);
        canRead &= !NamesInUse.CallsItself(session, member.Symbol);
        var before = session.DependencyCount;
        var value = canRead ? _reader.ReadMember(member.Symbol, scope) : null;
        if (!member.Symbol.IsStatic && session.DependencyCount == before && session.IsReadable)
            session.Refuse(session.Mark(member.Symbol), ShapeFault.NotStatic(member.Symbol.Name));
        if (value is null || FormulaSize.IsManageable(value))
            return value;
        session.Refuse(session.Mark(member.Symbol), ShapeFault.TooLarge());
        return null;
    }
}
