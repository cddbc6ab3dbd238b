using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Catalogue;

/// <summary>The entries on the line: which shapes over which range of y make which.</summary>
internal static class LineEntries
{
    private static readonly Expression s_minusInfinity = Formula.NegativeInfinity;
    private static readonly Expression s_infinity = new Constant(double.PositiveInfinity, "∞");

    public static EntryMatch? Find(LineReading reading)
    {
        var shapes = reading.Shapes;
        return shapes.Only(ShapeKind.Linear) ? Exponential(reading)
            : shapes.Only(ShapeKind.Linear, ShapeKind.Square) ? Gaussian(reading)
            : shapes.Only(ShapeKind.Linear, ShapeKind.Exponential) ? Exponentials(reading)
            : shapes.Only(ShapeKind.Linear, ShapeKind.Softplus) ? Softplus(reading)
            : shapes.Only(ShapeKind.Linear, ShapeKind.LogOneMinus) ? LogOneMinus(reading)
            : shapes.Only(ShapeKind.Cosine, ShapeKind.Sine) ? Wave(reading)
            : null;
    }

    private static EntryMatch? Exponential(LineReading reading) => reading.IsWhole
        ? null
        : new EntryMatch("ExponentialForm", Ends(reading.Lower, reading.Upper), reading.Shapes.Constant, [reading.Shapes.Linear]);

    private static EntryMatch Gaussian(LineReading reading)
    {
        AffineRow[] rows = [reading.Shapes.Linear, reading.Shapes.Square];
        return reading.IsWhole
            ? new EntryMatch("GaussianForm", [], reading.Shapes.Constant, rows)
            : new EntryMatch("GaussianSegmentForm", Ends(reading.Lower, reading.Upper), reading.Shapes.Constant, rows);
    }

    private static EntryMatch? Exponentials(LineReading reading)
    {
        var (linear, constant) = (reading.Shapes.Linear, reading.Shapes.Constant);
        var exponentials = reading.Shapes.Of(ShapeKind.Exponential);
        if (exponentials.Count == 1)
        {
            var (rate, row) = exponentials[0];
            if (reading.IsWhole)
                return new EntryMatch("GammaForm", [rate.ToSortedExpression()], constant, [linear, row]);
            return linear.Is(rate) ? InPower(reading, rate, row) : null;
        }

        if (exponentials.Count != 2 || !reading.IsWhole || !(exponentials[0].Rate + exponentials[1].Rate).IsZero)
            return null;
        var (up, down) = exponentials[0].Rate.AsRational() is { Sign: < 0 } ? (exponentials[1], exponentials[0]) : (exponentials[0], exponentials[1]);
        if (linear.Is(up.Rate * new Rational(-1, 2)))
            return new EntryMatch("InverseGaussianForm", [up.Rate.ToSortedExpression()], constant, [up.Row, down.Row]);
        if (linear.Is(down.Rate * new Rational(-1, 2)))
            return new EntryMatch("InverseGaussianForm", [down.Rate.ToSortedExpression()], constant, [down.Row, up.Row]);
        return new EntryMatch("BesselKForm", [up.Rate.ToSortedExpression()], constant, [linear, up.Row, down.Row]);
    }

    // ∫ e^(ky)·exp(q·e^(ky)) dy is an exponential law of v = e^(ky): Weibull of known shape, cut off
    private static EntryMatch? InPower(LineReading reading, Polynomial rate, AffineRow row)
    {
        if (rate.AsRational() is not { } k)
            return null;
        var (lower, upper) = (End(reading.Lower, Formula.Zero, s_minusInfinity), End(reading.Upper, s_infinity, s_infinity));
        var offset = reading.Shapes.Constant + reading.Piece.Value(Formula.Log(Formula.Of(Rationals.Abs(k)))) * (Rational)(-1);
        return k.Sign > 0
            ? new EntryMatch("ExponentialForm", [lower, upper], offset, [row])
            : new EntryMatch("ExponentialForm", [End(reading.Upper, Formula.Zero, s_minusInfinity), End(reading.Lower, s_infinity, s_infinity)], offset, [row]);

        Expression End(Expression? y, Expression whole, Expression none) =>
            y is null ? (ReferenceEquals(none, s_minusInfinity) ? whole : none)
            : reading.Piece.Value(Formula.Exp(Formula.Product(rate.ToSortedExpression(), y))).ToSortedExpression();
    }

    // p·y + q·log(1 + e^(ky)) with u = F(ky): α = p/k, β = −q − p/k
    private static EntryMatch? Softplus(LineReading reading)
    {
        var softplus = reading.Shapes.Of(ShapeKind.Softplus);
        if (softplus.Count != 1 || !reading.IsWhole)
            return null;
        var (rate, row) = softplus[0];
        var alpha = reading.Shapes.Linear * rate.Inverse();
        return new EntryMatch("BetaForm", [], reading.Shapes.Constant + LogSize(reading, rate), [alpha, (row + alpha) * (Rational)(-1)]);
    }

    // p·y + q·log(1 − e^(ky)) for ky < 0 with u = e^(ky): α = p/k, β = q + 1
    private static EntryMatch? LogOneMinus(LineReading reading)
    {
        var shapes = reading.Shapes.Of(ShapeKind.LogOneMinus);
        if (shapes.Count != 1 || reading.Lower is not null || reading.Upper is not { } upper || !reading.Piece.Value(upper).IsZero)
            return null;
        var (rate, row) = shapes[0];
        if (rate.AsRational() is { Sign: < 0 })
            return null;
        return new EntryMatch(
            "BetaForm", [], reading.Shapes.Constant + LogSize(reading, rate), [reading.Shapes.Linear * rate.Inverse(), row + Polynomial.One]);
    }

    private static EntryMatch? Wave(LineReading reading)
    {
        var waves = reading.Shapes.Of(ShapeKind.Cosine).Select(w => (w.Rate, w.Row, IsCosine: true))
            .Concat(reading.Shapes.Of(ShapeKind.Sine).Select(w => (w.Rate, w.Row, IsCosine: false))).ToList();
        if (reading.IsLog || reading.Lower is null || reading.Upper is null || waves.Count == 0 || waves.Any(w => !Polynomial.Same(w.Rate, waves[0].Rate)))
            return null;
        var length = Formula.Difference(reading.Upper, reading.Lower);
        var turns = Formula.Quotient(Formula.Product(waves[0].Rate.ToSortedExpression(), length), Formula.Product(Formula.Of(2), new Constant(System.Math.PI, "π")));
        if (!IsWholeNumber(reading.Piece.Value(turns)))
            return null;
        var zero = AffineRow.Zero(reading.Shapes.Constant.Weights.Count);
        return new EntryMatch("VonMisesForm", [reading.Piece.Value(length).ToSortedExpression()], reading.Shapes.Constant,
            [.. new[] { true, false }.Select(cosine => waves.Where(w => w.IsCosine == cosine).Aggregate(zero, (sum, w) => sum + w.Row))]);
    }

    private static bool IsWholeNumber(Polynomial turns)
    {
        if (turns.AsRational() is { } exact)
            return exact.IsInteger && !exact.IsZero;
        if (turns.Dependence != Dependence.None)
            return false;
        var value = Evaluator.Evaluate(turns.ToSortedExpression(), _ => double.NaN);
        return System.Math.Abs(value) > 0.5 && System.Math.Abs(value - System.Math.Round(value)) < 1e-14 * System.Math.Abs(value);
    }

    private static Polynomial LogSize(LineReading reading, Polynomial rate) =>
        reading.Piece.Value(Formula.Log(Formula.Call(Function.Abs, rate.ToSortedExpression()))) * (Rational)(-1);

    private static IReadOnlyList<Expression> Ends(Expression? lower, Expression? upper) => [lower ?? s_minusInfinity, upper ?? s_infinity];
}
