using System.Collections.Immutable;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;
using Microsoft.CodeAnalysis;

namespace FamilyGen.Generator.Reading;

/// <summary>What an operation stands for.</summary>
internal abstract record Value;

internal sealed record NumberValue(Expression Expression) : Value;

internal sealed record TruthValue(Condition Condition) : Value;

/// <summary>A CountRange or an Interval.</summary>
internal sealed record RangeValue(
    bool IsLattice,
    Expression? Lower,
    Expression? Upper,
    bool LowerIncluded,
    bool UpperIncluded,
    bool IsCircle,
    EquatableArray<Expression> Masses) : Value;

/// <summary>The values of arguments and locals at one point of a body.</summary>
internal sealed class Scope
{
    public static readonly Scope Empty = new(ImmutableDictionary.Create<ISymbol, Value>(SymbolEqualityComparer.Default));

    private Scope(ImmutableDictionary<ISymbol, Value> values) => Values = values;

    public ImmutableDictionary<ISymbol, Value> Values { get; }

    public Value? Find(ISymbol symbol) => Values.TryGetValue(symbol, out var value) ? value : null;

    public Scope With(ISymbol symbol, Value value) => new(Values.SetItem(symbol, value));
}
