using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using SymbolKind = FamilyGen.Generator.Algebra.SymbolKind;

namespace FamilyGen.Generator.Reading;

/// <summary>The arguments of the declared members: which is the observation, which are known values, which parameters.</summary>
internal sealed class Signatures
{
    private readonly ReadingSession _session;
    private readonly DeclaredMembers _members;
    private readonly Dictionary<string, (ObservationType Type, string Member)> _known = new(StringComparer.Ordinal);
    private readonly List<string> _knownNames = [];
    private readonly List<TradeParameter> _parameters = [];
    private (IParameterSymbol Argument, ObservationType Type, string Member)? _observation;

    public Signatures(ReadingSession session, DeclaredMembers members)
    {
        (_session, _members) = (session, members);
        foreach (var member in members.All)
            CollectKnown(member);
        foreach (var member in members.All)
            CollectObservation(member);
        if (members.Kernel is { } kernel)
            CollectParameters(kernel);
    }

    public ObservationType Observation => _observation?.Type
        ?? (_members.Range?.Type.Name == "CountRange" ? ObservationType.Int : ObservationType.Double);

    public string ObservationName => _observation?.Argument.Name ?? "x";

    public EquatableArray<KnownValue> Known =>
        _knownNames.Select(n => new KnownValue(n, Keyword(_known[n].Type))).ToEquatableArray();

    public EquatableArray<TradeParameter> Parameters => _parameters.ToEquatableArray();

    public string NaturalName(AttributedMember statistic)
    {
        var name = statistic.Data.NamedArguments.FirstOrDefault(a => a.Key == "Parameter").Value.Value as string;
        if (name is null)
        {
            name = GeneratedNames.ParameterOf(statistic.Symbol.Name);
        }
        else if (!SyntaxFacts.IsValidIdentifier(name))
        {
            _session.Refuse(_session.Mark(statistic.Symbol), ShapeFault.BadParameterName(name));
            name = GeneratedNames.ParameterOf(statistic.Symbol.Name);
        }

        _session.Name(name, NamedPieceKind.NaturalParameter, _session.Mark(statistic.Symbol));
        return name;
    }

    /// <summary>What the member's arguments stand for, and whether its body can be read at all.</summary>
    public (Scope Scope, bool CanRead) ScopeOf(AttributedMember member)
    {
        var scope = Scope.Empty;
        var observation = ObservationOf(member);
        foreach (var argument in member.Arguments)
        {
            var kind = SymbolEqualityComparer.Default.Equals(argument, observation) ? SymbolKind.Observation
                : IsKnown(argument) ? SymbolKind.Known : SymbolKind.Parameter;
            var origin = _session.Mark(argument);
            if (kind == SymbolKind.Parameter && member.Role != MemberRole.Kernel && !ReportedInstead(argument, member, origin))
                _session.Depend(DependencyKind.Parameter, argument.Name, "", origin);
            var isInteger = TypeOf(argument.Type) is ObservationType.Int or ObservationType.Long;
            scope = scope.With(argument, new NumberValue(new Symbol(argument.Name, kind, isInteger) { Origin = origin }));
        }

        return (scope, CheckMember(member, observation));
    }

    private static bool IsKnown(IParameterSymbol argument) =>
        argument.GetAttributes().Any(a => a.AttributeClass?.ToDisplayString() == "FamilyGen.KnownAttribute");

    private static bool IsPositive(IParameterSymbol argument) =>
        argument.GetAttributes().Any(a => a.AttributeClass?.ToDisplayString() == "FamilyGen.PositiveAttribute");

    private static ObservationType? TypeOf(ITypeSymbol type) => type.SpecialType switch
    {
        SpecialType.System_Int32 => ObservationType.Int,
        SpecialType.System_Int64 => ObservationType.Long,
        SpecialType.System_Double => ObservationType.Double,
        _ => null,
    };

    private static string Keyword(ObservationType type) => type.ToString().ToLowerInvariant();

    private static IParameterSymbol? ObservationOf(AttributedMember member) =>
        member.Role == MemberRole.Support && !member.IsPredicate ? null : member.Arguments.FirstOrDefault(a => !IsKnown(a));

    private void CollectKnown(AttributedMember member)
    {
        foreach (var argument in member.Arguments.Where(a => IsKnown(a) && a.Type.TypeKind != TypeKind.Error))
        {
            var origin = _session.Mark(argument);
            if (TypeOf(argument.Type) is not { } type)
            {
                _session.Refuse(origin, ShapeFault.KnownType(argument.Name, argument.Type.ToDisplayString()));
                type = ObservationType.Double;
            }

            _session.Name(argument.Name, NamedPieceKind.Known, origin, Keyword(type));
            if (!_known.TryGetValue(argument.Name, out var seen))
                _knownNames.Add(argument.Name);

            // The narrowest type converts to all the others.
            if (seen.Member is null || type < seen.Type)
                _known[argument.Name] = (type, seen.Member ?? member.Symbol.Name);
        }
    }

    private void CollectObservation(AttributedMember member)
    {
        if (ObservationOf(member) is not { Type.TypeKind: not TypeKind.Error } argument)
            return;
        var origin = _session.Mark(argument);
        var spelled = argument.Type.ToDisplayString();
        if (TypeOf(argument.Type) is not { } type)
            _session.Refuse(origin, ShapeFault.ObservationType(argument.Name, spelled, member.Symbol.Name));
        else if (_observation is { } first && first.Type != type)
            _session.Refuse(origin, ShapeFault.OtherObservationType(argument.Name, member.Symbol.Name, spelled, first.Member, Keyword(first.Type)));
        else
            _observation ??= (argument, type, member.Symbol.Name);
        _session.Name(argument.Name, NamedPieceKind.Observation, origin);
    }

    private void CollectParameters(AttributedMember kernel)
    {
        var observation = ObservationOf(kernel);
        foreach (var argument in kernel.Arguments.Where(a => !IsKnown(a) && !SymbolEqualityComparer.Default.Equals(a, observation)))
        {
            var origin = _session.Mark(argument);
            if (_known.TryGetValue(argument.Name, out var known))
                _session.Refuse(origin, ShapeFault.KnownHereOnly(argument.Name, kernel.Symbol.Name, known.Member));
            if (TypeOf(argument.Type) != ObservationType.Double && argument.Type.TypeKind != TypeKind.Error)
                _session.Refuse(origin, ShapeFault.ParameterType(argument.Name, argument.Type.ToDisplayString()));
            _session.Name(argument.Name, NamedPieceKind.TradeParameter, origin);
            _parameters.Add(new TradeParameter(argument.Name, IsPositive(argument)));
        }

        if (_parameters.Count == 0)
            _session.Refuse(_session.Mark(kernel.Symbol), ShapeFault.NoParameters(kernel.Symbol.Name));
    }

    /// <summary>An argument that is no parameter in earnest: a known value whose mark was forgotten, or the observation
    /// handed to a support.</summary>
    private bool ReportedInstead(IParameterSymbol argument, AttributedMember member, int origin)
    {
        if (_known.TryGetValue(argument.Name, out var known))
        {
            _session.Refuse(origin, ShapeFault.KnownHereOnly(argument.Name, member.Symbol.Name, known.Member));
            return true;
        }

        if (member.Role != MemberRole.Support || argument.Name != _observation?.Argument.Name)
            return false;
        _session.Refuse(origin, ShapeFault.SupportTakesObservation(argument.Name, member.Symbol.Name));
        return true;
    }

    private bool CheckMember(AttributedMember member, IParameterSymbol? observation)
    {
        // An unknown type or a missing name in a signature is the compiler's to report.
        if (member.Type.TypeKind == TypeKind.Error || member.Symbol.Name.Length == 0
            || member.Arguments.Any(a => a.Type.TypeKind == TypeKind.Error || a.Name.Length == 0))
        {
            _session.LeaveToCompiler();
            return false;
        }

        var faults = SignatureFaults(member, observation).ToList();
        foreach (var fault in faults)
            _session.Refuse(_session.Mark(member.Symbol), fault);
        return faults.Count == 0;
    }

    private IEnumerable<string> SignatureFaults(AttributedMember member, IParameterSymbol? observation)
    {
        var name = member.Symbol.Name;
        if (member.Symbol is IMethodSymbol { TypeParameters.Length: > 0 })
            yield return ShapeFault.GenericMember(name);
        foreach (var argument in member.Arguments.Where(a => a.RefKind != RefKind.None))
            yield return ShapeFault.PassedByReference(argument.Name, name);
        if (member.Role == MemberRole.Support)
        {
            foreach (var fault in SupportFaults(member, observation))
                yield return fault;
            yield break;
        }

        if (observation is null)
            yield return ShapeFault.NoObservation(name);
        if (TypeOf(member.Type) is null)
            yield return ShapeFault.ReturnType(name, member.Type.ToDisplayString(), "double");
    }

    private IEnumerable<string> SupportFaults(AttributedMember member, IParameterSymbol? observation)
    {
        var name = member.Symbol.Name;
        if (member.IsPredicate)
        {
            if (observation is null)
                yield return ShapeFault.PredicateNotMethod(name);
            else if (_members.Range?.Type.Name == "Interval")
                yield return ShapeFault.PredicateOnInterval(name, _members.Range.Symbol.Name);
            yield break;
        }

        var type = member.Type.ToDisplayString();
        if (type is not ("FamilyGen.CountRange" or "FamilyGen.Interval"))
            yield return ShapeFault.SupportType(name, member.Type.ToDisplayString());
        else if (_observation is { } seen && (type == "FamilyGen.CountRange") == (seen.Type == ObservationType.Double))
            yield return ShapeFault.SupportForOtherObservation(name, type == "FamilyGen.CountRange" ? "a CountRange" : "an Interval", Keyword(seen.Type));
    }
}
