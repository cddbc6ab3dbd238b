using System;

namespace FamilyGen;

/// <summary>A support on the integers, both ends inclusive.</summary>
public readonly record struct CountRange
{
    /// <summary>The smallest count, or <c>null</c> when there is none.</summary>
    public long? Min { get; private init; }

    /// <summary>The largest count, or <c>null</c> when there is none.</summary>
    public long? Max { get; private init; }

    /// <summary>The counts min, min + 1, ….</summary>
    public static CountRange From(long min) => new() { Min = min };

    /// <summary>The counts min, …, max.</summary>
    public static CountRange Between(long min, long max) => new() { Min = min, Max = max };

    /// <summary>All integers.</summary>
    public static CountRange AllIntegers => default;

    /// <summary>Whether the count lies in the range.</summary>
    public bool Contains(long count) => !(count < Min) && !(count > Max);

    /// <inheritdoc/>
    public override string ToString() => FormattableString.Invariant($"{{{Min?.ToString() ?? "…"}, …, {Max?.ToString() ?? "…"}}}");
}
