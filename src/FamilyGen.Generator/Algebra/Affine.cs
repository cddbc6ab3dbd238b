using System.Collections.Generic;

namespace FamilyGen.Generator.Algebra;

/// <summary>slope·x + intercept, both free of x.</summary>
internal sealed record Affine(Expression Slope, Expression Intercept)
{
    /// <summary>Reads a formula as an affine function of the observation; null when it is none.</summary>
    public static Affine? In(Expression expression, string observation)
    {
        var slope = Polynomial.Zero;
        var intercept = Polynomial.Zero;
        foreach (var term in Plain(expression).Terms)
        {
            if (!term.Dependence.HasObservation())
            {
                intercept += Polynomial.Of(term);
                continue;
            }

            var rest = new List<Factor>();
            var degree = 0;
            foreach (var factor in term.Factors)
            {
                if (factor.Base is Symbol { Kind: SymbolKind.Observation } symbol && symbol.Name == observation && factor.Exponent.IsOne)
                    degree++;
                else
                    rest.Add(factor);
            }

            if (degree != 1 || rest.Exists(f => f.Dependence.HasObservation()))
                return null;
            slope += Polynomial.Of(Term.Of(term.Coefficient, rest));
        }

        return new Affine(slope.ToSortedExpression(), intercept.ToSortedExpression());
    }

    /// <summary>The exact value where the observation takes the given value, if it is a number.</summary>
    public static Rational? ValueAt(Affine affine, Expression observation) =>
        (Plain(Formula.Product(affine.Slope, observation)) + Plain(affine.Intercept)).AsRational();

    /// <summary>Where the function is zero.</summary>
    public Expression Root() => Plain(Formula.Product(Formula.Of(-1), Intercept, Formula.Power(Slope, -1))).ToSortedExpression();

    // Sums, products and integer powers alone: no functions are taken apart, so that signs can be asked meanwhile.
    private static Polynomial Plain(Expression expression)
    {
        switch (expression)
        {
            case Sum sum:
                var total = Polynomial.Zero;
                foreach (var term in sum.Terms)
                    total += Plain(term);
                return total;
            case Product product:
                var result = Polynomial.One;
                foreach (var factor in product.Factors)
                    result *= Plain(factor);
                return result;
            case Power { Exponent: Number { Value.IsInteger: true } exponent } power:
                var inner = Plain(power.Base);
                if (inner.IsSingleTerm)
                    return SingleTerms.Raise(inner.Terms[0], exponent.Value);
                return Polynomial.Of(Term.Of(power.Base.WithoutOrigins(), Polynomial.Of(exponent.Value), -1));
            default:
                return Polynomial.Of(expression);
        }
    }
}
