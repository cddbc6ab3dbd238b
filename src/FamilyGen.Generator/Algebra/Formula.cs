using System;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>Short ways to write formulas down. Nothing is simplified here.</summary>
internal static class Formula
{
    public static Expression Zero { get; } = new Number(Rational.Zero);

    public static Expression One { get; } = new Number(Rational.One);

    public static Constant E { get; } = new(Math.E, "e");

    public static Constant NegativeInfinity { get; } = new(double.NegativeInfinity, "−∞");

    public static Expression Of(Rational value) => new Number(value);

    public static Expression Sum(params Expression[] terms) => new Sum(terms.ToEquatableArray());

    public static Expression Product(params Expression[] factors) => new Product(factors.ToEquatableArray());

    public static Expression Power(Expression @base, Rational exponent) => new Power(@base, Of(exponent));

    public static Expression Negate(Expression value) => Product(Of(-1), value);

    public static Expression Difference(Expression a, Expression b) => Sum(a, Negate(b));

    public static Expression Quotient(Expression a, Expression b) => Product(a, Power(b, -1));

    public static Expression Call(Function function, params Expression[] arguments) => new Call(function, arguments.ToEquatableArray());

    public static Expression Log(Expression value) => Call(Function.Log, value);

    public static Expression Exp(Expression value) => Call(Function.Exp, value);

    public static Expression Indicator(Condition condition) => new Conditional(condition, One, Zero);

    public static bool IsZero(this Expression expression) => expression is Number { Value.IsZero: true };

    public static bool IsOne(this Expression expression) => expression is Number number && number.Value == Rational.One;

    /// <summary>Whether the formula is the indicator of a condition.</summary>
    public static bool IsIndicator(this Expression expression) => expression is Conditional { WhenTrue: var t, WhenFalse: var f } && t.IsOne() && f.IsZero();

    public static bool IsNegativeInfinity(this Expression expression) => expression is Constant constant && double.IsNegativeInfinity(constant.Value);

    /// <summary>The formula without the numbers that lead back to the source, so that equal formulas are equal records.</summary>
    public static Expression WithoutOrigins(this Expression expression) => expression switch
    {
        Number number => number with { Origin = -1 },
        Constant constant => constant with { Origin = -1 },
        Symbol symbol => symbol with { Origin = -1 },
        Sum sum => new Sum(sum.Terms.Select(WithoutOrigins).ToEquatableArray()),
        Product product => new Product(product.Factors.Select(WithoutOrigins).ToEquatableArray()),
        Power power => new Power(power.Base.WithoutOrigins(), power.Exponent.WithoutOrigins()),
        Call call => new Call(call.Function, call.Arguments.Select(WithoutOrigins).ToEquatableArray()),
        Opaque opaque => new Opaque(opaque.Text, opaque.Arguments.Select(WithoutOrigins).ToEquatableArray()),
        Conditional conditional => new Conditional(
            conditional.Condition.WithoutOrigins(), conditional.WhenTrue.WithoutOrigins(), conditional.WhenFalse.WithoutOrigins()),
        _ => throw new ArgumentException("Unknown formula.", nameof(expression)),
    };

    public static Condition WithoutOrigins(this Condition condition) => condition switch
    {
        Comparison comparison => new Comparison(comparison.Relation, comparison.Left.WithoutOrigins(), comparison.Right.WithoutOrigins()),
        Not not => new Not(not.Operand.WithoutOrigins()),
        And and => new And(and.Left.WithoutOrigins(), and.Right.WithoutOrigins()),
        Or or => new Or(or.Left.WithoutOrigins(), or.Right.WithoutOrigins()),
        Always always => new Always(always.Value),
        _ => throw new ArgumentException("Unknown condition.", nameof(condition)),
    };

    /// <summary>The formula with every part that <paramref name="replace"/> knows put in place of the old one, from the
    /// outside in; null leaves a part as it stands.</summary>
    public static Expression Rewrite(this Expression expression, Func<Expression, Expression?> replace)
    {
        if (replace(expression) is { } replaced)
            return replaced;
        return expression switch
        {
            Sum sum => sum with { Terms = sum.Terms.Select(t => t.Rewrite(replace)).ToEquatableArray() },
            Product product => product with { Factors = product.Factors.Select(f => f.Rewrite(replace)).ToEquatableArray() },
            Power power => power with { Base = power.Base.Rewrite(replace), Exponent = power.Exponent.Rewrite(replace) },
            Call call => call with { Arguments = call.Arguments.Select(a => a.Rewrite(replace)).ToEquatableArray() },
            Opaque opaque => opaque with { Arguments = opaque.Arguments.Select(a => a.Rewrite(replace)).ToEquatableArray() },
            Conditional conditional => conditional with
            {
                Condition = conditional.Condition.Rewrite(replace),
                WhenTrue = conditional.WhenTrue.Rewrite(replace),
                WhenFalse = conditional.WhenFalse.Rewrite(replace),
            },
            _ => expression,
        };
    }

    public static Condition Rewrite(this Condition condition, Func<Expression, Expression?> replace) => condition switch
    {
        Comparison comparison => comparison with { Left = comparison.Left.Rewrite(replace), Right = comparison.Right.Rewrite(replace) },
        Not not => not with { Operand = not.Operand.Rewrite(replace) },
        And and => and with { Left = and.Left.Rewrite(replace), Right = and.Right.Rewrite(replace) },
        Or or => or with { Left = or.Left.Rewrite(replace), Right = or.Right.Rewrite(replace) },
        _ => condition,
    };

    /// <summary>The formula with a symbol replaced.</summary>
    public static Expression Substitute(this Expression expression, SymbolKind kind, string name, Expression value) =>
        expression.Rewrite(e => e is Symbol symbol && symbol.Kind == kind && symbol.Name == name ? value : null);
}
