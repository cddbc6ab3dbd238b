using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Catalogue;

/// <summary>Closed forms on an interval: one entry over the whole, or one over each piece between breakpoints, and the
/// points that carry probability of their own.</summary>
internal static class LineSupport
{
    private const int MostPieces = 12;

    public static ClosedFormMatch? Find(FamilyFunctions functions, LawParameters laws, IEnumerable<Expression> breakpoints)
    {
        var points = new List<AffineRow>();
        foreach (var mass in functions.Declaration.Support.Masses)
        {
            if (functions.At(mass) is not { } row)
                return null;
            points.Add(row);
        }

        var cuts = ClosedFormFinder.InOrder(breakpoints);
        if (Entries(functions, laws, cuts ?? []) is not { Count: > 0 } entries)
            return null;
        var law = Name(laws, entries);
        if (points.Count > 0)
            law = law with { Name = $"{law.Name} with probability of its own at {string.Join(", ", functions.Declaration.Support.Masses.Select(Rendering.Text))}" };
        return new ClosedFormMatch(
            entries.Select(e => e.Entry.Part()).ToEquatableArray(), ClosedFormFinder.Rows(points), ClosedFormFinder.Rows([]), law);
    }

    private static List<Found>? Entries(FamilyFunctions functions, LawParameters laws, IReadOnlyList<Expression> cuts)
    {
        var support = functions.Declaration.Support;
        if (FindOn(support.Lower, support.Upper) is { } whole)
            return [whole];
        if (cuts.Count == 0 || cuts.Count >= MostPieces)
            return null;

        // Neighbours with one exponent are one piece: only a single point lies between them.
        var ends = new List<Expression?> { support.Lower };
        ends.AddRange(cuts);
        ends.Add(support.Upper);
        var pieces = new List<(Expression? Lower, Expression? Upper, AtomRows Rows)>();
        for (var i = 0; i + 1 < ends.Count; i++)
        {
            var rows = AtomRows.Read(functions.All, new Piece(functions.Declaration, ends[i], ends[i + 1]).Expander);
            if (pieces.Count > 0 && pieces[pieces.Count - 1].Rows.Same(rows))
                pieces[pieces.Count - 1] = pieces[pieces.Count - 1] with { Upper = ends[i + 1] };
            else
                pieces.Add((ends[i], ends[i + 1], rows));
        }

        var found = new List<Found>();
        foreach (var (lower, upper, rows) in pieces.Where(p => !p.Rows.IsEmpty))
        {
            if (FindOn(lower, upper) is not { } part)
                return null;
            found.Add(part);
        }

        return found;

        Found? FindOn(Expression? lower, Expression? upper)
        {
            var piece = new Piece(functions.Declaration, lower, upper);
            return LinePieces.Find(piece, functions.On(piece), [Formula.Zero, .. cuts, .. Middles(piece, functions.All)]) is var (entry, reading, isFolded)
                ? new Found(entry, reading, new LineLaws(laws, entry, reading, isFolded).Find())
                : null;
        }
    }

    // The point about which a quadratic under a logarithm is even.
    private static IEnumerable<Expression> Middles(Piece piece, IEnumerable<Expression> functions)
    {
        foreach (var log in functions.SelectMany(Dependences.Parts).OfType<Call>().Where(c => c.Function == Function.Log))
        {
            if (Derivative.Of(log.Arguments[0], s => s.Kind == SymbolKind.Observation) is { } slope
                && Affine.In(piece.Value(slope).ToSortedExpression(), piece.Observation) is { } affine && !affine.Slope.IsZero())
            {
                yield return piece.Value(affine.Root()).ToSortedExpression();
            }
        }
    }

    private static Law Name(LawParameters laws, List<Found> found)
    {
        if (found.Count == 1)
            return found[0].Law;
        if (found.Count == 2 && found.All(f => f.Entry.Entry == "ExponentialForm" && !f.Reading.IsLog)
            && found[0].Reading.Lower is null && found[1].Reading.Upper is null)
        {
            return laws.Law(
                "asymmetric Laplace law", ("location", found[1].Reading.Lower!),
                ("rate below", laws.Of(found[0].Entry.Coefficients[0])), ("rate above", LawParameters.Minus(laws.Of(found[1].Entry.Coefficients[0]))));
        }

        return new Law($"law in {found.Count} pieces ({string.Join(", ", found.Select(f => f.Law.Name).Select(Short))})", EquatableArray<LawParameter>.Empty);
    }

    private static string Short(string name) => name.EndsWith(" law", StringComparison.Ordinal) ? name.Substring(0, name.Length - 4) : name;

    private sealed record Found(EntryMatch Entry, LineReading Reading, Law Law);
}
