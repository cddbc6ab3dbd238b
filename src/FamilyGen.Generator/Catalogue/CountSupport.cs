using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Catalogue;

/// <summary>Closed forms on counts: one entry over the whole, or entries over runs of counts with one exponent, where a few
/// counts may stand out; these, and short finite pieces, are summed one by one.</summary>
internal sealed class CountSupport
{
    private const int MostPieces = 24;

    private readonly FamilyFunctions _functions;
    private readonly List<EntryMatch> _entries = new();
    private readonly List<AffineRow> _added = new();
    private readonly List<AffineRow> _removed = new();
    private readonly List<Rational> _own = new();
    private readonly List<Rational> _taken = new();

    private CountSupport(FamilyFunctions functions) => _functions = functions;

    public static ClosedFormMatch? Find(FamilyFunctions functions, LawParameters laws, IEnumerable<Expression> breakpoints)
    {
        var support = new CountSupport(functions);
        var range = functions.Declaration.Support;
        var whole = new Piece(functions.Declaration, range.Lower, range.Upper);
        if (!support.AddEntry(whole, functions.On(whole)) && !(ClosedFormFinder.InOrder(breakpoints) is { } cuts && support.AddPieces(cuts)))
            return null;
        return support._added.Count + support._removed.Count > 2 * CountEntries.MostPoints ? null : new ClosedFormMatch(
            support._entries.Select(e => e.Part()).ToEquatableArray(),
            ClosedFormFinder.Rows(support._added),
            ClosedFormFinder.Rows(support._removed),
            support.Name(laws));
    }

    private bool AddPieces(IReadOnlyList<Expression> cuts)
    {
        if (cuts.Count > MostPieces || cuts.Any(c => c is not Number { Value.IsInteger: true }))
            return false;
        var support = _functions.Declaration.Support;
        var starts = new List<Expression?> { support.Lower };
        starts.AddRange(cuts);
        var pieces = new List<Piece>();
        for (var i = 0; i < starts.Count; i++)
            pieces.Add(new Piece(_functions.Declaration, starts[i], i + 1 < starts.Count ? Formula.Of(((Number)starts[i + 1]!).Value - Rational.One) : support.Upper));
        for (var i = 0; i < pieces.Count; i++)
        {
            var last = EndOfRun(pieces, i);
            if (!AddRun(pieces, i, last))
                return false;
            i = last;
        }

        return _entries.Count + _added.Count > 0;
    }

    // The last piece with the exponent of this one, with no more than a few counts between.
    private int EndOfRun(List<Piece> pieces, int first)
    {
        if (IsPoint(pieces[first]))
            return first;
        var rows = AtomRows.Read(_functions.All, pieces[first].Expander);
        var (last, between) = (first, 0L);
        for (var i = first + 1; i < pieces.Count && between <= CountEntries.MostPoints; i++)
        {
            if (!IsPoint(pieces[i]) && AtomRows.Read(_functions.All, pieces[i].Expander).Same(rows))
                (last, between) = (i, 0);
            else if (pieces[i].Range is var (from, to))
                between += to - from + 1;
            else
                break;
        }

        return last;
    }

    private static bool IsPoint(Piece piece) => piece.Range is var (first, last) && first == last;

    private bool AddRun(List<Piece> pieces, int first, int last)
    {
        var piece = pieces[first];
        if (IsPoint(piece))
            return AddPoints(piece);
        if (AtomRows.Read(_functions.All, piece.Expander).IsEmpty)
            return Enumerable.Range(first + 1, last - first).All(i => AddPoints(pieces[i]));
        var hull = new Piece(_functions.Declaration, piece.Lower, pieces[last].Upper);
        if (!AddEntry(hull, _functions.On(piece)))
            return Enumerable.Range(first, last - first + 1).All(i => AddPoints(pieces[i]));
        var rows = AtomRows.Read(_functions.On(piece), hull.Expander);
        for (var i = first + 1; i < last; i++)
        {
            if (!IsPoint(pieces[i]) && AtomRows.Read(_functions.All, pieces[i].Expander).Same(AtomRows.Read(_functions.All, piece.Expander)))
                continue;
            foreach (var point in Points(pieces[i])!)
            {
                if (rows.At(Formula.Of(point), hull.Expander) is not { } removed)
                    return false;
                _removed.Add(removed);
                _taken.Add(point);
            }

            if (!AddPoints(pieces[i]))
                return false;
        }

        return true;
    }

    private bool AddEntry(Piece piece, IReadOnlyList<Expression> functions)
    {
        if (CountEntries.Find(piece, functions) is not { } entry)
            return false;
        var rows = AtomRows.Read(functions, piece.Expander);
        var removed = entry.Beyond.Select(p => rows.At(Formula.Of(p), piece.Expander)).ToList();
        if (removed.Any(r => r is null))
            return false;
        _entries.Add(entry);
        _removed.AddRange(removed.Select(r => r!));
        _taken.AddRange(entry.Beyond);
        return true;
    }

    private bool AddPoints(Piece piece)
    {
        if (Points(piece) is not { } points)
            return false;
        foreach (var point in points)
        {
            if (_functions.At(Formula.Of(point)) is not { } row)
                continue;
            _added.Add(row);
            _own.Add(point);
        }

        return true;
    }

    private static List<Rational>? Points(Piece piece) =>
        piece.Range is var (first, last) && last - first < CountEntries.MostPoints
            ? Enumerable.Range(0, (int)(last - first) + 1).Select(i => (Rational)(first + i)).ToList()
            : null;

    private Law Name(LawParameters laws)
    {
        if (_entries.Count == 0)
        {
            var isSaturated = _added.Count == _functions.Parameters + 1;
            return new Law(isSaturated ? $"categorical law on {_added.Count} values" : $"sum over {_added.Count} values", EquatableArray<LawParameter>.Empty);
        }

        if (_entries.Count == 2 && _entries.All(e => e.Entry == "NegativeBinomialForm" && e.Settings[0].IsOne()) && _entries[0].IsReflected)
        {
            return laws.Law(
                "discrete Laplace law", ("log-ratio below", laws.Of(_entries[0].Coefficients[0])), ("log-ratio above", laws.Of(_entries[1].Coefficients[0])));
        }

        if (_entries.Count > 1)
            return new Law($"law in {_entries.Count} pieces", EquatableArray<LawParameter>.Empty);
        var law = CountLaws.Find(laws, _entries[0]);
        var without = _taken.Except(_own).ToList();
        if (without.Count > 0)
            law = law with { Name = $"{law.Name} without {Values(without)}" };
        if (_own.Count > 0)
            law = law with { Name = $"{law.Name} with weights of their own at {Values(_own)}" };
        return law;
    }

    private static string Values(IEnumerable<Rational> points) => string.Join(", ", points.Select(Rendering.Number));
}
