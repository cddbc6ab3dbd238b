using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Catalogue;

/// <summary>Reads an exponent in y = log(u/scale), where u &gt; 0 is the distance of x from a pole. The scale is chosen so
/// that log(c + d·uᵏ) becomes log(1 ± e^(ky)).</summary>
internal sealed class LogCoordinate
{
    private readonly Piece _piece;
    private readonly Shapes _shapes;
    private readonly Polynomial _scale;
    private readonly Polynomial _logScale;

    private LogCoordinate(Piece piece, AtomRows rows)
    {
        _piece = piece;
        _shapes = new Shapes(rows.Parameters);
        _scale = rows.Atoms.Select(a => a.Atom is Call { Function: Function.Log } log ? Binomial.Of(log.Arguments[0], piece) : null)
            .FirstOrDefault(b => b is not null)?.Scale(piece) ?? Polynomial.One;
        _logScale = Log(_scale);
    }

    /// <summary>Reads the functions where x = pole + side·u.</summary>
    public static LineReading? Read(Piece piece, IReadOnlyList<Expression> functions, Expression pole, int side)
    {
        var (from, to) = side > 0 ? (piece.Lower, piece.Upper) : (piece.Upper, piece.Lower);
        if (from is null || Distance(piece, from, pole, side) is not { } lower)
            return null;
        var x = new Symbol(piece.Observation, SymbolKind.Observation, false);
        var moved = new Piece(piece.Declaration, lower, to is null ? null : Distance(piece, to, pole, side));
        var place = Formula.Sum(pole, side > 0 ? x : Formula.Negate(x));
        var rows = AtomRows.Read(functions.Select(f => f.Rewrite(e => e is Symbol { Kind: SymbolKind.Observation } ? place : null)).ToList(), moved.Expander);
        var reader = new LogCoordinate(moved, rows);

        // du = scale·eʸ dy
        reader._shapes.Add(rows.Constant + reader._logScale);
        reader._shapes.Add(ShapeKind.Linear, Polynomial.One, AffineRow.Of(rows.Parameters, Polynomial.One));
        foreach (var (atom, row) in rows.Atoms)
        {
            if (!reader.Add(atom, row))
                return null;
        }

        return new LineReading(
            reader._shapes, moved, lower.IsZero() ? null : reader.End(lower), reader.End(moved.Upper), true, piece.Value(pole), side, reader._scale);
    }

    private static Expression? Distance(Piece piece, Expression x, Expression pole, int side)
    {
        var distance = (piece.Value(x) - piece.Value(pole)) * (Rational)side;
        return distance.AsRational() is { Sign: < 0 } ? null : distance.ToSortedExpression();
    }

    private Expression? End(Expression? u) =>
        u is null ? null : (_piece.Value(Formula.Log(u)) - _logScale).ToSortedExpression();

    private Polynomial Log(Polynomial value) => _piece.Value(Formula.Log(value.ToSortedExpression()));

    private bool Add(Expression atom, AffineRow row)
    {
        switch (atom)
        {
            case Symbol:
                _shapes.Add(ShapeKind.Exponential, Polynomial.One, row * _scale);
                return true;
            case Power { Base: Symbol { Kind: SymbolKind.Observation }, Exponent: var exponent } when !Dependences.Of(exponent).HasObservation():
                var rate = _piece.Value(exponent);
                _shapes.Add(ShapeKind.Exponential, rate, row * _piece.Value(new Power(_scale.ToSortedExpression(), exponent)));
                return true;
            case Power { Base: Call { Function: Function.Log } log, Exponent: Number { Value: var two } } when two == 2 && log.Arguments[0] is Symbol { Kind: SymbolKind.Observation }:
                _shapes.Add(row * (_logScale * _logScale));
                _shapes.Add(ShapeKind.Linear, Polynomial.One, row * (_logScale * (Rational)2));
                _shapes.Add(ShapeKind.Square, Polynomial.One, row);
                return true;
            case Call { Function: Function.Log } log when log.Arguments[0] is Symbol { Kind: SymbolKind.Observation }:
                _shapes.Add(row * _logScale);
                _shapes.Add(ShapeKind.Linear, Polynomial.One, row);
                return true;
            case Call { Function: Function.Log } log:
                return AddBinomial(log.Arguments[0], row);
            default:
                return false;
        }
    }

    private bool AddBinomial(Expression argument, AffineRow row)
    {
        if (Binomial.Of(argument, _piece) is not { } binomial || !Polynomial.Same(binomial.Scale(_piece), _scale))
            return false;
        _shapes.Add(row * Log(binomial.Constant));
        _shapes.Add(binomial.IsRising ? ShapeKind.Softplus : ShapeKind.LogOneMinus, binomial.Power, row);
        return true;
    }
}
