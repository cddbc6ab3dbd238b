using System;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>Derivatives with respect to one symbol. Pieces are differentiated piece by piece; the kinks themselves are left
/// to whoever asked.</summary>
internal static class Derivative
{
    /// <summary>d/dx with respect to the observation; null where a function without a known derivative stands in the way.</summary>
    public static Expression? Of(Expression expression) => Of(expression, s => s.Kind == SymbolKind.Observation);

    /// <summary>The derivative with respect to the symbol that <paramref name="which"/> picks; null where there is none.</summary>
    public static Expression? Of(Expression expression, Func<Symbol, bool> which)
    {
        if (!Dependences.Symbols(expression).Any(which))
            return Formula.Zero;
        switch (expression)
        {
            case Symbol symbol:
                return which(symbol) ? Formula.One : Formula.Zero;
            case Sum sum:
                var terms = sum.Terms.Select(t => Of(t, which)).ToList();
                return terms.Any(t => t is null) ? null : Add(terms!);
            case Product product:
                return OfProduct(product, which);
            case Power power:
                return OfPower(power, which);
            case Call call:
                return OfCall(call, which);
            case Conditional conditional:
                return Of(conditional.WhenTrue, which) is { } whenTrue && Of(conditional.WhenFalse, which) is { } whenFalse
                    ? whenTrue.IsZero() && whenFalse.IsZero() ? Formula.Zero : new Conditional(conditional.Condition, whenTrue, whenFalse)
                    : null;
            default:
                return null;
        }
    }

    private static Expression? OfProduct(Product product, Func<Symbol, bool> which)
    {
        var terms = new System.Collections.Generic.List<Expression>();
        for (var i = 0; i < product.Factors.Count; i++)
        {
            if (Of(product.Factors[i], which) is not { } slope)
                return null;
            if (slope.IsZero())
                continue;
            var others = product.Factors.Where((_, j) => j != i).ToList();
            terms.Add(Multiply(others.Concat(new[] { slope }).ToArray()));
        }

        return Add(terms);
    }

    private static Expression? OfPower(Power power, Func<Symbol, bool> which)
    {
        if (Of(power.Base, which) is not { } baseSlope || Of(power.Exponent, which) is not { } exponentSlope)
            return null;
        var terms = new System.Collections.Generic.List<Expression>();
        if (!baseSlope.IsZero())
        {
            var lower = power.Exponent is Number { Value: var n } ? Formula.Of(n - 1) : Formula.Sum(power.Exponent, Formula.Of(-1));
            terms.Add(Multiply(power.Exponent, lower.IsOne() ? power.Base : new Power(power.Base, lower), baseSlope));
        }

        if (!exponentSlope.IsZero())
            terms.Add(Multiply(power, Formula.Log(power.Base), exponentSlope));
        return Add(terms);
    }

    private static Expression? OfCall(Call call, Func<Symbol, bool> which)
    {
        var argument = call.Arguments[0];
        if (call.Function is Function.Min or Function.Max && call.Arguments.Count == 2)
        {
            var (first, second) = (Of(argument, which), Of(call.Arguments[1], which));
            if (first is null || second is null)
                return null;
            var less = new Comparison(Relation.Less, argument, call.Arguments[1]);
            return call.Function == Function.Min ? new Conditional(less, first, second) : new Conditional(less, second, first);
        }

        if (Of(argument, which) is not { } slope)
            return null;
        Expression? outer = call.Function switch
        {
            Function.Exp => call,
            Function.Log => Formula.Power(argument, -1),
            Function.Sin => Formula.Call(Function.Cos, argument),
            Function.Cos => Formula.Negate(Formula.Call(Function.Sin, argument)),
            Function.Abs => Formula.Call(Function.Sign, argument),
            Function.LogGamma => Formula.Call(Function.Digamma, argument),
            Function.LogGammaRatio => Formula.Call(Function.DigammaDifference, argument, call.Arguments[1]),
            Function.Floor or Function.Sign => Formula.Zero,

            // On integers both are continued along one residue class: x mod n stays, x / n is (x − x mod n)/n.
            Function.Remainder when IsInteger(call) => Formula.Zero,
            Function.IntegerQuotient => Formula.Power(call.Arguments[1], -1),
            Function.Remainder when !Dependences.Symbols(call.Arguments[1]).Any(which) => Formula.One,
            _ => null,
        };
        return outer is null ? null : outer.IsZero() ? Formula.Zero : Multiply(outer, slope);
    }

    private static bool IsInteger(Call call) => call.Arguments.SelectMany(Dependences.Symbols).All(s => s.IsInteger);

    private static Expression Add(System.Collections.Generic.IEnumerable<Expression> terms)
    {
        var kept = terms.Where(t => !t.IsZero()).ToList();
        return kept.Count == 0 ? Formula.Zero : kept.Count == 1 ? kept[0] : new Sum(kept.ToEquatableArray());
    }

    private static Expression Multiply(params Expression[] factors)
    {
        var kept = factors.Where(f => !f.IsOne()).ToList();
        return kept.Count == 0 ? Formula.One : kept.Count == 1 ? kept[0] : new Product(kept.ToEquatableArray());
    }
}
