using System;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>Formulas free of x as fractions. What is irrational is taken at its nearest double, the same one wherever it
/// occurs, so that what cancels in the formulas cancels in the fractions.</summary>
internal static class Approximation
{
    public static Rational Of(Polynomial value, Func<Symbol, double> known)
    {
        if (value.AsRational() is { } exact)
            return exact;
        var sum = Rational.Zero;
        foreach (var term in value.Terms)
        {
            var factor = Rational.One;
            foreach (var part in term.Factors)
                factor *= Of(part, known);
            sum += term.Coefficient * factor;
        }

        return sum;
    }

    private static Rational Of(Factor factor, Func<Symbol, double> known)
    {
        if (factor.Base is Symbol symbol && factor.Exponent.AsInteger() is { } n && Math.Abs(n) < 50 && Exact(known(symbol)) is { } b && (n > 0 || !b.IsZero))
            return Rational.Pow(b, n);

        // What cannot be evaluated is given like a known value.
        return Exact(Evaluator.Evaluate(factor.ToExpression(), known))
            ?? Exact(known(new Symbol(Rendering.Text(factor.ToExpression()), SymbolKind.Known, false))) ?? Rational.One;
    }

    private static Rational? Exact(double value) => double.IsNaN(value) || double.IsInfinity(value) ? null : Doubles.ToRational(value);
}
