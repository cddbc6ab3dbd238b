using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Catalogue;

/// <summary>An entry found on a piece of the support: its settings, the rows that lead to it, and on a lattice the points
/// that the entry has beyond the piece.</summary>
/// <param name="Entry">The run-time type.</param>
/// <param name="Settings">Its settings.</param>
/// <param name="Offset">The row of the added constant.</param>
/// <param name="Coefficients">The rows of the entry's coefficients.</param>
internal sealed record EntryMatch(string Entry, IReadOnlyList<Expression> Settings, AffineRow Offset, IReadOnlyList<AffineRow> Coefficients)
{
    /// <summary>Integers that the entry sums over and the piece does not have.</summary>
    public IReadOnlyList<Rational> Beyond { get; init; } = [];

    /// <summary>The first integer that the entry counts from, or the last where it counts downwards.</summary>
    public Polynomial Start { get; init; } = Polynomial.Zero;

    /// <summary>Whether a count entry counts downwards.</summary>
    public bool IsReflected { get; init; }

    public ClosedFormPart Part() => new(
        Entry,
        Settings.Select(s => s.WithoutOrigins()).ToEquatableArray(),
        new[] { Offset }.Concat(Coefficients).SelectMany(r => r.Entries()).ToEquatableArray());

    /// <summary>The same entry with a number added to its logarithm.</summary>
    public EntryMatch Plus(Polynomial constant) => this with { Offset = Offset + constant };
}
