using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Model;

internal enum ObservationType
{
    Int,
    Long,
    Double,
}

/// <summary>One type around the declared one, from the outside in: "class", "Outer".</summary>
internal sealed record TypeShell(string Keyword, string Name);

/// <summary>A known value: an argument of declared members that is never estimated. <paramref name="Type"/> is a C#
/// keyword: int, long or double.</summary>
internal sealed record KnownValue(string Name, string Type);

internal sealed record TradeParameter(string Name, bool IsPositive);

/// <summary>A member as the user wrote it, so that generated code can call it: T(x), Range, Kernel(x, shape, rate).
/// <paramref name="Arguments"/> are argument names in order (the observation's, parameters', known values').</summary>
internal sealed record DeclaredMember(string Name, bool IsMethod, EquatableArray<string> Arguments);

internal sealed record StatisticDeclaration(string Name, string Parameter, Expression Body, DeclaredMember Member);

/// <summary>The base measure: its logarithm, or the measure itself.</summary>
internal sealed record BaseMeasureDeclaration(bool IsLogarithm, Expression Body, DeclaredMember Member);

/// <summary>The support with bounds that are free of parameters; null bounds are infinite.</summary>
internal sealed record SupportDeclaration(
    bool IsLattice,
    Expression? Lower,
    Expression? Upper,
    bool LowerIncluded,
    bool UpperIncluded,
    bool IsCircle,
    EquatableArray<Expression> Masses,
    Condition? Predicate,
    DeclaredMember Range,
    DeclaredMember? PredicateMember);

/// <summary>A declaration as it was read: plain data, without symbols, syntax or locations, equal when the source says the
/// same.</summary>
internal sealed record FamilyDeclaration(
    string Namespace,
    EquatableArray<TypeShell> Outer,
    string Accessibility,
    string Name,
    ObservationType Observation,
    string ObservationName,
    SupportDeclaration Support,
    EquatableArray<KnownValue> Known,
    EquatableArray<StatisticDeclaration> Statistics,
    BaseMeasureDeclaration? BaseMeasure,
    Expression? Kernel,
    DeclaredMember? KernelMember,
    EquatableArray<TradeParameter> Parameters)
{
    /// <summary>The names of all members that the user's class has, so that a stub does not declare them again.</summary>
    public EquatableArray<string> MemberNames { get; init; } = EquatableArray<string>.Empty;

    /// <summary>Whether the family is written with a kernel and trade parameters.</summary>
    public bool IsTrade => Kernel is not null;

    /// <summary>The full metadata name, from which the hint name is made.</summary>
    public string MetadataName
    {
        get
        {
            var name = Namespace.Length == 0 ? "" : Namespace + ".";
            foreach (var shell in Outer)
                name += shell.Name + "+";
            return name + Name;
        }
    }
}
