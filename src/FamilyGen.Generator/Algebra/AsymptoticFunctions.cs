using System;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>Known functions of asymptotic series.</summary>
internal static class AsymptoticFunctions
{
    private static Polynomial Half { get; } = Polynomial.Of(new Rational(1, 2));

    public static AsymptoticSeries Power(AsymptoticSeries s, Polynomial exponent)
    {
        if (exponent.AsInteger() is { } n && n >= 0 && n <= 12)
        {
            var product = AsymptoticSeries.Of(Polynomial.One);
            for (var i = 0; i < n; i++)
                product *= s;
            return product;
        }

        if (s.Split() is not var (leading, ratio))
            return AsymptoticSeries.Unknown;
        var power = new AsymptoticTerm(
            Raise(leading.Coefficient, exponent), leading.Rate * exponent, leading.Order * exponent, Rational.Zero, Rational.Zero, false);
        if (exponent.AsRational() is { } rational)
            power = power with { LogOrder = leading.LogOrder * rational, LogLogOrder = leading.LogLogOrder * rational };
        else if (!leading.LogOrder.IsZero || !leading.LogLogOrder.IsZero)
            return AsymptoticSeries.Unknown;
        var result = AsymptoticSeries.Of(power) * AsymptoticSeries.PowerSeries(ratio, i => Binomial(exponent, i));
        return exponent.AsInteger() is null && AsymptoticSeries.SignOf(leading.Coefficient) < 0 ? result.Unverified() : result;
    }

    public static AsymptoticSeries Log(AsymptoticSeries s)
    {
        if (s.Split() is not var (leading, ratio) || AsymptoticSeries.SignOf(leading.Coefficient) < 0)
            return AsymptoticSeries.Unknown;
        var result = AsymptoticSeries.Of(
            AsymptoticTerm.Constant(LogOf(leading.Coefficient)),
            AsymptoticTerm.Power(leading.Rate, Polynomial.One),
            AsymptoticTerm.Log with { Coefficient = leading.Order },
            AsymptoticTerm.LogLog with { Coefficient = Polynomial.Of(leading.LogOrder) });
        result += AsymptoticSeries.PowerSeries(ratio, i => i == 0 ? Polynomial.Zero : Polynomial.Of(new Rational(i % 2 == 0 ? -1 : 1, i)));
        return leading.LogLogOrder.IsZero ? result : result.Unverified();
    }

    public static AsymptoticSeries Exp(AsymptoticSeries s)
    {
        if (s.Error > 0)
            return AsymptoticSeries.Unknown;
        var factor = AsymptoticTerm.Constant(Polynomial.One);
        var small = s;
        foreach (var term in s.Terms.Where(t => t.IsWavering ? !t.Shrinks : !t.Shrinks || t.IsSymbolic).ToList())
        {
            small -= AsymptoticSeries.Of(term);
            if (term.IsWavering)
                factor = term.Grows ? factor with { Coefficient = Polynomial.Zero } : factor with { IsWavering = true };
            else if (term.IsConstant)
                factor *= AsymptoticTerm.Constant(ExpOf(term.Coefficient));
            else if (term.Rate.IsZero && term.Order.IsOne && term.LogOrder.IsZero && term.LogLogOrder.IsZero)
                factor = factor with { Rate = factor.Rate + term.Coefficient };
            else if (term.Rate.IsZero && term.Order.IsZero && term.LogOrder == 1 && term.LogLogOrder.IsZero)
                factor = factor with { Order = factor.Order + term.Coefficient };
            else if (term.IsConstant is false && term.Grows && AsymptoticSeries.SignOf(s.Leading!.Coefficient) < 0 && !s.Leading.IsWavering)
                return AsymptoticSeries.Zero;
            else
                return AsymptoticSeries.Unknown;
        }

        if (factor.Coefficient.IsZero)
            return AsymptoticSeries.Unknown;
        return AsymptoticSeries.Of(factor) * AsymptoticSeries.PowerSeries(small, i => Polynomial.Of(Rational.One / Factorial(i)));
    }

    /// <summary>log Γ by Stirling's series at infinity, by Γ(s) = Γ(1 + s)/s where the argument vanishes.</summary>
    public static AsymptoticSeries LogGamma(AsymptoticSeries s)
    {
        if (s.Leading is not { IsWavering: false } leading)
            return AsymptoticSeries.Unknown;
        if (leading.Grows)
        {
            if (s.Sign is not > 0)
                return AsymptoticSeries.Unknown;
            var log = Log(s);
            var inverse = Power(s, Polynomial.Of(-1));
            return (s * log) - (log * Half) - s + AsymptoticSeries.Of(Polynomial.Of(Formula.Call(Function.LogGamma, Formula.Of(new Rational(1, 2)))))
                + (inverse * Polynomial.Of(new Rational(1, 12))).WithError(-3 * leading.OrderEstimate);
        }

        if (leading.Shrinks)
            return s.Sign is > 0 ? (Log(s) * Polynomial.Of(-1)).WithError(leading.OrderEstimate) : AsymptoticSeries.Unknown;
        return s.Sign is < 0
            ? AsymptoticSeries.Unknown
            : Smooth(s, c => Formula.Call(Function.LogGamma, c), c => Formula.Call(Function.Digamma, c));
    }

    public static AsymptoticSeries Digamma(AsymptoticSeries s)
    {
        if (s.Leading is not { IsWavering: false } leading || s.Sign is not > 0)
            return AsymptoticSeries.Unknown;
        var inverse = Power(s, Polynomial.Of(-1));
        if (leading.Grows)
            return Log(s) - (inverse * Half).WithError(-2 * leading.OrderEstimate);
        return leading.Shrinks
            ? (inverse * Polynomial.Of(-1)).WithError(0)
            : AsymptoticSeries.Of(Polynomial.Of(Formula.Call(Function.Digamma, leading.Coefficient.ToSortedExpression()))).WithError(NextOrder(s));
    }

    /// <summary>cos or sin: a wave where the argument grows, Taylor's series where it has a limit.</summary>
    public static AsymptoticSeries Wave(Function function, AsymptoticSeries s)
    {
        if (!s.IsVerified || s.Error > 0 || s.Terms.Any(t => t.Grows || t.IsWavering))
            return AsymptoticSeries.Of(AsymptoticTerm.Wave);
        var limit = s.Terms.FirstOrDefault(t => t.IsConstant)?.Coefficient ?? Polynomial.Zero;
        var small = s - AsymptoticSeries.Of(limit);
        var cos = AsymptoticSeries.PowerSeries(small, i => i % 2 == 0 ? Alternating(i / 2, i) : Polynomial.Zero);
        var sin = AsymptoticSeries.PowerSeries(small, i => i % 2 == 1 ? Alternating((i - 1) / 2, i) : Polynomial.Zero);
        if (limit.IsZero)
            return function == Function.Cos ? cos : sin;
        var c = AtLimit(Function.Cos, limit);
        var d = AtLimit(Function.Sin, limit);
        return function == Function.Cos ? (cos * c) - (sin * d) : (sin * c) + (cos * d);
    }

    private static AsymptoticSeries Smooth(AsymptoticSeries s, Func<Expression, Expression> value, Func<Expression, Expression> slope)
    {
        var limit = s.Leading!.Coefficient.ToSortedExpression();
        var small = s - AsymptoticSeries.Of(s.Leading.Coefficient);
        return AsymptoticSeries.Of(Polynomial.Of(value(limit))) + (small * Polynomial.Of(slope(limit))).WithError(2 * NextOrder(s));
    }

    private static double NextOrder(AsymptoticSeries s) => s.Terms.Count > 1 ? s.Terms[1].OrderEstimate : s.Error;

    private static Polynomial Alternating(int n, int factorial) => Polynomial.Of((n % 2 == 0 ? Rational.One : -1) / Factorial(factorial));

    // cos π is −1 and sin π is 0, whatever the rounding of π says.
    private static Polynomial AtLimit(Function wave, Polynomial limit)
    {
        var formula = Formula.Call(wave, limit.ToSortedExpression());
        if (limit.Dependence != Dependence.None)
            return Polynomial.Of(formula);
        var value = AsymptoticTerm.Estimate(Polynomial.Of(formula));
        return Math.Abs(value - Math.Round(value)) < 1e-14 ? Polynomial.Of((Rational)(int)Math.Round(value)) : Polynomial.Of(formula);
    }

    private static Rational Factorial(int n) => Enumerable.Range(1, n).Aggregate(Rational.One, (product, i) => product * i);

    private static Polynomial Binomial(Polynomial n, int k)
    {
        var result = Polynomial.One;
        for (var i = 0; i < k; i++)
            result *= (n - Polynomial.Of((Rational)i)) * new Rational(1, i + 1);
        return result;
    }

    private static Polynomial Raise(Polynomial coefficient, Polynomial exponent)
    {
        if (coefficient.IsOne)
            return Polynomial.One;
        if (coefficient.IsSingleTerm && exponent.AsRational() is { IsInteger: true } n)
            return SingleTerms.Raise(coefficient.Terms[0], n);
        return Polynomial.Of(Term.Of(coefficient.ToSortedExpression(), exponent, -1));
    }

    private static Polynomial LogOf(Polynomial coefficient) =>
        coefficient.IsOne ? Polynomial.Zero : Polynomial.Of(Formula.Log(coefficient.ToSortedExpression()));

    private static Polynomial ExpOf(Polynomial coefficient) =>
        coefficient.IsZero ? Polynomial.One : Polynomial.Of(Term.Of(Formula.E, coefficient, -1));
}
