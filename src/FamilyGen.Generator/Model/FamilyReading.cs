using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Model;

/// <summary>What a declared member is for.</summary>
internal enum MemberRole
{
    Support,
    Statistic,
    BaseMeasure,
    Kernel,
}

internal enum DependencyKind
{
    /// <summary>A parameter of the family: an argument that is not marked as known, or a generated property.</summary>
    Parameter,

    /// <summary>Something that may differ from one call to the next: a mutable field, the clock, a random source, I/O.</summary>
    Changing,
}

/// <summary>Something other than the observation, constants and known values that a declared member depends on.</summary>
/// <param name="Kind">Parameter or changing thing.</param>
/// <param name="Role">What the member is for.</param>
/// <param name="Member">The declared member's name.</param>
/// <param name="Name">The name of the thing, as the modeller would say it.</param>
/// <param name="Reason">For a changing thing: what it is ("a field that can be assigned", "the clock").</param>
/// <param name="Origin">Where it is used.</param>
/// <param name="Path">The names that lead from the member to the thing, both included.</param>
internal sealed record Dependency(
    DependencyKind Kind,
    MemberRole Role,
    string Member,
    string Name,
    string Reason,
    int Origin,
    EquatableArray<string> Path)
{
    /// <summary>"Range → Lowest → Shape".</summary>
    public string PathText => string.Join(" → ", Path);
}

internal enum NamedPieceKind
{
    /// <summary>A member that the user wrote into the class.</summary>
    Member,

    /// <summary>A member of a base class.</summary>
    Inherited,

    /// <summary>A trade parameter, which becomes a property.</summary>
    TradeParameter,

    /// <summary>A natural parameter of the canonical form, which becomes a constructor argument.</summary>
    NaturalParameter,

    /// <summary>A known value, which becomes an argument of generated members.</summary>
    Known,

    /// <summary>The observation, which becomes an argument of generated members.</summary>
    Observation,

    /// <summary>A constructor that the user wrote with the arguments of the generated one.</summary>
    Constructor,

    /// <summary>A declared member that calls a function of the language by the member's own name.</summary>
    CallOfItself,
}

/// <summary>A name in the declaration that may collide with another; <paramref name="Detail"/> is a known value's type.</summary>
internal sealed record NamedPiece(string Name, NamedPieceKind Kind, int Origin, string Detail = "");

internal enum IntegerStepKind
{
    /// <summary>A division that drops the fraction.</summary>
    Quotient,

    /// <summary>A product, which may overflow.</summary>
    Product,

    /// <summary>A conversion of a real number, which drops the fraction.</summary>
    Conversion,
}

/// <summary>Arithmetic that C# does in integers, in a place where a number goes into a formula.</summary>
/// <param name="Kind">What is done.</param>
/// <param name="Type">The integer type, as a C# keyword.</param>
/// <param name="Left">The first operand.</param>
/// <param name="Right">The second operand; of a conversion the operand once more.</param>
/// <param name="Origin">Where it stands.</param>
internal sealed record IntegerStep(IntegerStepKind Kind, string Type, Expression Left, Expression Right, int Origin);

/// <summary>All that was read of one declaration, valid or not: plain data, equal when the source says the same.</summary>
/// <param name="Declaration">The declaration as far as it could be read.</param>
/// <param name="CanBeCompleted">Whether code can be added to the class at all (partial, not generic, a class …).</param>
/// <param name="IsReadable">False where the compiler reports an error inside a declared member: nothing can then be said
/// about the formula.</param>
/// <param name="Faults">What is wrong with the shape, found while reading.</param>
/// <param name="Dependencies">What members depend on beside the observation, constants and known values.</param>
/// <param name="Names">The names that may collide.</param>
internal sealed record FamilyReading(
    FamilyDeclaration Declaration,
    bool CanBeCompleted,
    bool IsReadable,
    EquatableArray<Finding> Faults,
    EquatableArray<Dependency> Dependencies,
    EquatableArray<NamedPiece> Names)
{
    /// <summary>Where statistics, base measure and kernel are computed in integers.</summary>
    public EquatableArray<IntegerStep> IntegerSteps { get; init; } = EquatableArray<IntegerStep>.Empty;
}
