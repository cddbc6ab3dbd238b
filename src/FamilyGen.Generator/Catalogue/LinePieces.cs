using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Catalogue;

/// <summary>Finds an entry on one piece of the line: in x itself, in the logarithm of its distance from a pole, or, for a
/// function that is even about the piece's middle, on one half of it.</summary>
internal static class LinePieces
{
    public static (EntryMatch Entry, LineReading Reading, bool IsFolded)? Find(Piece piece, IReadOnlyList<Expression> functions, IReadOnlyList<Expression> centres)
    {
        if (Direct(piece, functions) is { } direct)
            return (direct.Entry, direct.Reading, false);
        foreach (var centre in Centres(piece, centres).Where(c => IsEven(piece, functions, c)))
        {
            if (Direct(new Piece(piece.Declaration, centre, piece.Upper), functions) is { } half)
                return (half.Entry.Plus(piece.Value(Formula.Log(Formula.Of(2)))), half.Reading, true);
        }

        return null;
    }

    private static (EntryMatch Entry, LineReading Reading)? Direct(Piece piece, IReadOnlyList<Expression> functions)
    {
        var rows = AtomRows.Read(functions, piece.Expander);
        if (LinearCoordinate.Read(piece, rows) is { } linear && LineEntries.Find(linear) is { } entry)
            return (entry, linear);
        foreach (var (pole, side) in Poles(piece, rows))
        {
            if (LogCoordinate.Read(piece, functions, pole, side) is { } log && LineEntries.Find(log) is { } found)
                return (found, log);
        }

        return null;
    }

    // Roots of what stands under logarithms and powers, then the ends.
    private static IEnumerable<(Expression Pole, int Side)> Poles(Piece piece, AtomRows rows)
    {
        var seen = new List<(Polynomial Pole, int Side)>();
        var candidates = rows.Atoms.SelectMany(a => Dependences.Parts(a.Atom)).Select(p => Inner(p) is { } inner ? Root(piece, inner) : null)
            .Where(r => r is not null).Select(r => r!.Value).ToList();
        if (piece.Lower is not null)
            candidates.Add((piece.Value(piece.Lower), 1));
        if (piece.Upper is not null)
            candidates.Add((piece.Value(piece.Upper), -1));
        foreach (var (pole, side) in candidates)
        {
            if (seen.Any(s => s.Side == side && Polynomial.Same(s.Pole, pole)))
                continue;
            seen.Add((pole, side));
            yield return (pole.ToSortedExpression(), side);
        }
    }

    private static Expression? Inner(Expression part) => part switch
    {
        Call { Function: Function.Log } log => log.Arguments[0],
        Power { Base: Sum or Symbol { Kind: SymbolKind.Observation } } power => power.Base,
        _ => null,
    };

    private static (Polynomial Pole, int Side)? Root(Piece piece, Expression inner)
    {
        if (Affine.In(inner, piece.Observation) is not { } affine || affine.Slope.IsZero())
            return null;
        var slope = piece.Scope.RangeOf(affine.Slope);
        return slope.IsPositive ? (piece.Value(affine.Root()), 1) : slope.IsNegative ? (piece.Value(affine.Root()), -1) : null;
    }

    private static IEnumerable<Expression> Centres(Piece piece, IReadOnlyList<Expression> candidates)
    {
        if (piece.Lower is { } lower && piece.Upper is { } upper)
            return [piece.Value(Formula.Product(Formula.Of(new Rational(1, 2)), Formula.Sum(lower, upper))).ToSortedExpression()];
        return piece.Lower is null && piece.Upper is null ? candidates : [];
    }

    private static bool IsEven(Piece piece, IReadOnlyList<Expression> functions, Expression centre)
    {
        var x = new Symbol(piece.Observation, SymbolKind.Observation, false);
        var mirrored = Formula.Difference(Formula.Product(Formula.Of(2), centre), x);
        return functions.All(f => Polynomial.Same(
            piece.Value(f), piece.Value(f.Rewrite(e => e is Symbol { Kind: SymbolKind.Observation } ? mirrored : null))));
    }
}
