using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Numerics;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Emission;

/// <summary>Formulas as C# text. What a symbol is called, how a function is called and how a constant is written differ
/// between plain doubles, points of the engine and generic numbers; the subclasses say so.</summary>
internal abstract class FormulaPrinter
{
    // Precedences of C#, as far as formulas need them.
    private const int Additive = 1;
    private const int Multiplicative = 2;
    private const int Unary = 3;
    private const int Primary = 4;

    public string Print(Expression expression) => Write(expression, 0);

    /// <summary>The formula as an operand of * or /, in parentheses where needed.</summary>
    public string Factor(Expression expression) => Write(expression, Multiplicative);

    public abstract string Print(Condition condition);

    protected abstract string SymbolText(Symbol symbol);

    protected abstract string CallText(Call call);

    protected abstract string OpaqueText(Opaque opaque);

    protected abstract string PowerText(Expression @base, Expression exponent);

    protected abstract string ConditionalText(Conditional conditional);

    /// <summary>A constant that is no integer.</summary>
    protected virtual string NumberText(double value) => Literal(value);

    /// <summary>A double as C# source that reads back as the same bits.</summary>
    public static string Literal(double value)
    {
        if (double.IsNaN(value))
            return "double.NaN";
        if (double.IsInfinity(value))
            return value > 0 ? "double.PositiveInfinity" : "double.NegativeInfinity";
        var text = value.ToString("R", CultureInfo.InvariantCulture);
        return text.Contains("E") || text.Contains(".") ? text : text + "d";
    }

    protected string Write(Expression expression, int outer)
    {
        var (text, precedence) = expression switch
        {
            Number n => NumberOf(n.Value),
            Constant c => (NumberText(c.Value), c.Value < 0 ? Unary : Primary),
            Symbol s => (SymbolText(s), Primary),
            Sum s => (SumText(s), Additive),
            Product p => ProductOf(p),
            Power { Base: Number b, Exponent: Number { Value: var e } } when e.IsInteger && Rational.Abs(e) < 64 => NumberOf(Rational.Pow(b.Value, (int)e.Numerator)),
            Power { Exponent: Number { Value: var e } } p when e.IsInteger && e.Sign < 0 => ("1 / " + Write(Reciprocal(p), Unary), Multiplicative),
            Power p => (PowerText(p.Base, p.Exponent), Primary),
            Call c => (CallText(c), Primary),
            Opaque o => (OpaqueText(o), Primary),
            Conditional c => (ConditionalText(c), 0),
            _ => throw new InvalidOperationException("unknown formula node " + expression.GetType().Name),
        };
        return precedence < outer ? "(" + text + ")" : text;
    }

    private static Expression Reciprocal(Power power)
    {
        var exponent = -((Number)power.Exponent).Value;
        return exponent == Rational.One ? power.Base : new Power(power.Base, new Number(exponent));
    }

    private (string, int) NumberOf(Rational value)
    {
        // Integers up to 2^31 are written as integers and converted by the operation they stand in.
        var text = value.IsInteger && BigInteger.Abs(value.Numerator) < int.MaxValue
            ? value.Numerator.ToString(CultureInfo.InvariantCulture)
            : NumberText(value.ToDouble());
        return (text, value.Sign < 0 ? Unary : Primary);
    }

    private string SumText(Sum sum)
    {
        var text = "";
        foreach (var term in Terms(sum))
        {
            var (negative, magnitude) = Sign(term);
            if (text.Length == 0)
                text = negative ? "-" + Write(magnitude, Unary) : Write(magnitude, Additive);
            else
                text += (negative ? " - " : " + ") + Write(magnitude, Multiplicative);
        }

        return text.Length == 0 ? "0" : text;
    }

    private (string, int) ProductOf(Product product)
    {
        product = Folded(product);
        var (negative, magnitude) = Sign(product);
        if (negative)
            return ("-" + Write(magnitude, Unary), Unary);
        var numerator = "";
        var denominator = "";
        foreach (var factor in product.Factors)
        {
            if (factor is Power { Exponent: Number { Value: var e } } p && e.IsInteger && e.Sign < 0)
                denominator += " / " + Write(Reciprocal(p), Unary);
            else
                numerator += (numerator.Length == 0 ? "" : " * ") + Write(factor, numerator.Length == 0 ? Multiplicative : Unary);
        }

        return ((numerator.Length == 0 ? "1" : numerator) + denominator, Multiplicative);
    }

    /// <summary>One flat product whose numbers are multiplied into its first factor: π·x/12 has one number, not two.</summary>
    private static Product Folded(Product product)
    {
        var factors = Flat(product).ToList();
        var rational = factors.OfType<Number>().Aggregate(Rational.One, (all, n) => all * n.Value);
        var constants = factors.OfType<Constant>().ToList();
        var others = factors.Where(f => f is not (Number or Constant)).ToList();
        if (constants.Count > 0)
        {
            var value = constants.Aggregate(1.0, (all, c) => all * c.Value);
            others.Insert(0, new Constant(value * (double)rational.Numerator / (double)rational.Denominator, ""));
        }
        else if (rational != Rational.One || others.Count == 0)
        {
            others.Insert(0, new Number(rational));
        }

        return new Product(new(others));
    }

    private static IEnumerable<Expression> Flat(Expression e) => e is Product p ? p.Factors.SelectMany(Flat) : [e];

    private static IEnumerable<Expression> Terms(Expression e) => e is Sum s ? s.Terms.SelectMany(Terms) : [e is Product p ? Folded(p) : e];

    /// <summary>Takes a leading minus off a term.</summary>
    private static (bool Negative, Expression Magnitude) Sign(Expression term) => term switch
    {
        Number { Value.Sign: < 0 } n => (true, new Number(-n.Value)),
        Constant { Value: < 0 } c => (true, new Constant(-c.Value, c.Text)),
        Product p when p.Factors.Count > 1 && p.Factors[0] is Constant { Value: < 0 } c =>
            (true, new Product(new(new Expression[] { new Constant(-c.Value, c.Text) }.Concat(p.Factors.Skip(1))))),
        Product p when p.Factors.Count > 0 && p.Factors[0] is Number { Value.Sign: < 0 } n =>
            (true, n.Value == -Rational.One && p.Factors.Count > 1
                ? p.Factors.Count == 2 ? p.Factors[1] : new Product(new(p.Factors.Skip(1)))
                : new Product(new(new Expression[] { new Number(-n.Value) }.Concat(p.Factors.Skip(1))))),
        _ => (false, term),
    };
}
