using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Catalogue;

/// <summary>Reads an exponent in y = x − origin. The origin is chosen so that a square (x − c)² has no linear part and
/// log(e^σ + e^(kx)) no shift: nothing is then left to cancel at run time.</summary>
internal sealed class LinearCoordinate
{
    private readonly Piece _piece;
    private readonly AtomRows _rows;
    private readonly Shapes _shapes;
    private Polynomial _origin = Polynomial.Zero;

    private LinearCoordinate(Piece piece, AtomRows rows) => (_piece, _rows, _shapes) = (piece, rows, new Shapes(rows.Parameters));

    public static LineReading? Read(Piece piece, AtomRows rows)
    {
        var reader = new LinearCoordinate(piece, rows);
        reader._origin = reader.Origin();
        reader._shapes.Add(rows.Constant);
        foreach (var (atom, row) in rows.Atoms)
        {
            if (!reader.Add(atom, row))
                return null;
        }

        return new LineReading(reader._shapes, piece, reader.End(piece.Lower), reader.End(piece.Upper), false, reader._origin, 1, Polynomial.One);
    }

    private Expression? End(Expression? x) => x is null ? null : (_piece.Value(x) - _origin).ToSortedExpression();

    private Polynomial Origin()
    {
        foreach (var (atom, _) in _rows.Atoms)
        {
            if (atom is Call { Function: Function.Log } log && TwoExponentials.Of(log.Arguments[0], _piece) is { } pair)
                return pair.Shift * pair.Rate.Inverse() * (Rational)(-1);
        }

        var (square, linear) = (RowOf(2), RowOf(1));
        if (square is null || linear is null)
            return Polynomial.Zero;
        for (var j = 0; j <= _rows.Parameters; j++)
        {
            var leading = j < _rows.Parameters ? square.Weights[j] : square.Constant;
            var next = j < _rows.Parameters ? linear.Weights[j] : linear.Constant;
            if (!leading.IsZero)
                return leading.IsSingleTerm ? next * leading.Inverse() * new Rational(-1, 2) : Polynomial.Zero;
        }

        return Polynomial.Zero;
    }

    private AffineRow? RowOf(int degree) => _rows.Atoms.Where(a => Degree(a.Atom) == degree).Select(a => a.Row).FirstOrDefault();

    private static int Degree(Expression atom) => atom switch
    {
        Symbol => 1,
        Power { Base: Symbol { Kind: SymbolKind.Observation }, Exponent: Number { Value: var exponent } } when exponent == 2 => 2,
        _ => 0,
    };

    private bool Add(Expression atom, AffineRow row)
    {
        switch (Degree(atom))
        {
            case 1:
                _shapes.Add(row * _origin);
                _shapes.Add(ShapeKind.Linear, Polynomial.One, row);
                return true;
            case 2:
                _shapes.Add(row * (_origin * _origin));
                _shapes.Add(ShapeKind.Linear, Polynomial.One, row * (_origin * (Rational)2));
                _shapes.Add(ShapeKind.Square, Polynomial.One, row);
                return true;
        }

        return atom is Call call && call.Arguments.Count == 1 && call.Function switch
        {
            Function.Log => AddSoftplus(call.Arguments[0], row),
            Function.Exp => AddExponential(call.Arguments[0], row),
            Function.Cos or Function.Sin => AddWave(call.Function, call.Arguments[0], row),
            _ => false,
        };
    }

    private bool AddExponential(Expression argument, AffineRow row)
    {
        if (Affine.In(argument, _piece.Observation) is not { } affine)
            return false;
        var rate = _piece.Value(affine.Slope);
        var shift = _piece.Value(affine.Intercept) + (rate * _origin);
        _shapes.Add(ShapeKind.Exponential, rate, row * _piece.Value(Formula.Exp(shift.ToSortedExpression())));
        return true;
    }

    private bool AddSoftplus(Expression argument, AffineRow row)
    {
        if (TwoExponentials.Of(argument, _piece) is not { } pair || !(pair.Shift + (pair.Rate * _origin)).IsZero)
            return false;
        _shapes.Add(row * (pair.LogFactor + (pair.OuterRate * _origin)));
        _shapes.Add(ShapeKind.Linear, Polynomial.One, row * pair.OuterRate);
        _shapes.Add(ShapeKind.Softplus, pair.Rate, row);
        return true;
    }

    private bool AddWave(Function function, Expression argument, AffineRow row)
    {
        if (Affine.In(argument, _piece.Observation) is not { } affine)
            return false;
        var rate = _piece.Value(affine.Slope);
        var phase = (_piece.Value(affine.Intercept) + (rate * _origin)).ToSortedExpression();
        var (cosine, sine) = (_piece.Value(Formula.Call(Function.Cos, phase)), _piece.Value(Formula.Call(Function.Sin, phase)));
        if (function == Function.Cos)
        {
            _shapes.Add(ShapeKind.Cosine, rate, row * cosine);
            _shapes.Add(ShapeKind.Sine, rate, row * sine * (Rational)(-1));
        }
        else
        {
            _shapes.Add(ShapeKind.Cosine, rate, row * sine);
            _shapes.Add(ShapeKind.Sine, rate, row * cosine);
        }

        return true;
    }
}
