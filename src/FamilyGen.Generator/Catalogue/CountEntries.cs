using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Catalogue;

/// <summary>The entries on counts, brought to n = 0, 1, … by a shift, or a reflection where the piece has only an upper end.
/// An entry may have points beyond the piece; they are listed, to be taken away.</summary>
internal static class CountEntries
{
    /// <summary>More points than these are not summed one by one.</summary>
    public const int MostPoints = 32;

    public static EntryMatch? Find(Piece piece, IReadOnlyList<Expression> functions)
    {
        if (CountAtoms.Of(AtomRows.Read(functions, piece.Expander), piece) is not { } atoms)
            return null;
        if (atoms.Rising.Count + atoms.Falling.Count + atoms.Logarithms.Count == 0)
            return Geometric(piece, atoms);
        if (atoms.Logarithms.Count == 0)
            return atoms.Rising.Count == 1 && atoms.Falling.Count == 1 ? Binomial(piece, atoms) : Factorial(piece, atoms);
        return atoms.Rising.Count + atoms.Falling.Count == 0 ? Logarithmic(piece, atoms) : null;
    }

    private static EntryMatch? Geometric(Piece piece, CountAtoms atoms)
    {
        if (piece.Lower is { } lower)
        {
            var start = piece.Value(lower);
            var offset = atoms.Constant + (atoms.Linear * start);
            return piece.Upper is { } last
                ? new EntryMatch("GeometricSegmentForm", [(piece.Value(last) - start).ToSortedExpression()], offset, [atoms.Linear]) { Start = start }
                : new EntryMatch("NegativeBinomialForm", [Formula.One], offset, [atoms.Linear]) { Start = start };
        }

        if (piece.Upper is not { } upper)
            return null;
        var end = piece.Value(upper);
        return new EntryMatch("NegativeBinomialForm", [Formula.One], atoms.Constant + (atoms.Linear * end), [atoms.Linear * (Rational)(-1)])
        {
            Start = end,
            IsReflected = true,
        };
    }

    // −log Γ(x + g) alone, or with log Γ(x + r): n = x + g − 1
    private static EntryMatch? Factorial(Piece piece, CountAtoms atoms)
    {
        var reflected = atoms.Rising.Count == 0;
        var gammas = reflected ? atoms.Falling : atoms.Rising;
        if ((reflected ? atoms.Rising : atoms.Falling).Count > 0 || (reflected ? piece.Lower : piece.Upper) is not null)
            return null;
        var below = gammas.Where(g => g.Row.Is(-1)).ToList();
        var above = gammas.Where(g => g.Row.Is(1)).ToList();
        if (below.Count != 1 || above.Count > 1 || gammas.Count != 1 + above.Count)
            return null;

        // Γ(x + g) starts at x = 1 − g, Γ(g − x) at x = g − 1
        var start = (below[0].Shift - Polynomial.One) * (Rational)(reflected ? 1 : -1);
        if (Beyond(piece, start, null, reflected) is not { } beyond)
            return null;
        var slope = reflected ? atoms.Linear * (Rational)(-1) : atoms.Linear;
        var offset = atoms.Constant + (atoms.Linear * start);
        if (above.Count == 0)
            return new EntryMatch("PoissonForm", [], offset, [slope]) { Start = start, Beyond = beyond, IsReflected = reflected };
        var size = (above[0].Shift - below[0].Shift + Polynomial.One).ToSortedExpression();
        return new EntryMatch("NegativeBinomialForm", [size], offset + piece.Value(Formula.Call(Function.LogGamma, size)), [slope])
        {
            Start = start,
            Beyond = beyond,
            IsReflected = reflected,
        };
    }

    // −log Γ(x + g) − log Γ(h − x): n = x + g − 1 of N = g + h − 2
    private static EntryMatch? Binomial(Piece piece, CountAtoms atoms)
    {
        var ((g, rising), (h, falling)) = (atoms.Rising[0], atoms.Falling[0]);
        if (!rising.Is(-1) || !falling.Is(-1))
            return null;
        var start = (g - Polynomial.One) * (Rational)(-1);
        var trials = g + h - Polynomial.Of(2);
        if (Beyond(piece, start, start + trials, false) is not { } beyond)
            return null;
        var ways = piece.Value(Formula.Call(Function.LogGamma, (trials + Polynomial.One).ToSortedExpression()));
        return new EntryMatch(
            "BinomialForm", [trials.ToSortedExpression()], atoms.Constant + (atoms.Linear * start) + (ways * (Rational)(-1)), [atoms.Linear])
        {
            Start = start,
            Beyond = beyond,
        };
    }

    private static EntryMatch? Logarithmic(Piece piece, CountAtoms atoms)
    {
        if (piece.Lower is not { } lower || piece.Upper is not null)
            return null;
        if (atoms.Logarithms.Count == 1 && atoms.Linear.IsZero)
        {
            // n + q = x + shift, counted from the piece's own end
            var (shift, row) = atoms.Logarithms[0];
            var first = piece.Value(lower);
            return new EntryMatch("ZetaForm", [(first + shift).ToSortedExpression()], atoms.Constant, [row]) { Start = first };
        }

        if (atoms.Logarithms.Count == 1 && atoms.Logarithms[0].Row.Is(-1))
        {
            // n = x + shift from 1 on
            var start = Polynomial.One - atoms.Logarithms[0].Shift;
            return Beyond(piece, start, null, false) is { } beyond
                ? new EntryMatch("LogSeriesForm", [], atoms.Constant + (atoms.Linear * (start - Polynomial.One)), [atoms.Linear]) { Start = start, Beyond = beyond }
                : null;
        }

        return RisingProduct(piece, atoms);
    }

    // (x + i)(x + i + 1)…(x + j) = (j − i + 1)!·Γ(n + r)/(Γ(r)n!) with n = x + i − 1 and r = j − i + 2
    private static EntryMatch? RisingProduct(Piece piece, CountAtoms atoms)
    {
        var shifts = atoms.Logarithms.Select(l => l.Shift.AsRational()).OrderBy(s => s ?? Rational.Zero).ToList();
        if (atoms.Logarithms.Any(l => !l.Row.Is(1)) || shifts.Any(s => s is null) || shifts.Where((s, i) => s!.Value != shifts[0]!.Value + i).Any())
            return null;
        var start = Polynomial.Of(1 - shifts[0]!.Value);
        var size = Formula.Of(shifts.Count + 1);
        return Beyond(piece, start, null, false) is { } beyond
            ? new EntryMatch(
                "NegativeBinomialForm", [size], atoms.Constant + (atoms.Linear * start) + piece.Value(Formula.Call(Function.LogGamma, size)), [atoms.Linear])
            {
                Start = start,
                Beyond = beyond,
            }
            : null;
    }

    /// <summary>What an entry from its start (to its end) has beyond the piece; null where that is not known, is too much, or
    /// where the piece goes further than the entry.</summary>
    private static IReadOnlyList<Rational>? Beyond(Piece piece, Polynomial start, Polynomial? end, bool reflected)
    {
        var beyond = new List<Rational>();
        var near = reflected ? piece.Upper : piece.Lower;
        if (near is null || Missing(piece.Value(near), start, reflected ? -1 : 1) is not { } first)
            return null;
        beyond.AddRange(first);
        if (end is null)
            return beyond;
        if (piece.Upper is not { } upper || Missing(piece.Value(upper), end, -1) is not { } last)
            return null;
        beyond.AddRange(last);
        return beyond.Count <= MostPoints ? beyond : null;
    }

    // the integers from the entry's end up (or down) to, and without, that of the piece
    private static IEnumerable<Rational>? Missing(Polynomial ofPiece, Polynomial ofEntry, int direction)
    {
        if (((ofPiece - ofEntry) * (Rational)direction).AsRational() is not { IsInteger: true, Sign: >= 0 } count || count > MostPoints)
            return null;
        if (count.IsZero)
            return [];
        if (ofEntry.AsRational() is not { } from)
            return null;
        return Enumerable.Range(0, (int)count.Numerator).Select(i => from + (direction * i));
    }
}
