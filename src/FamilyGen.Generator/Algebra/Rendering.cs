using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Text;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>Formulas as a person would write them in a message: log(hours), hours², 1/hours, −rate.</summary>
internal static class Rendering
{
    private const int InSum = 0;
    private const int InProduct = 1;
    private const int InPower = 2;

    public static string Text(Expression expression) => Write(expression, InSum);

    public static string Text(AtomSum sum) => Text(sum.ToExpression());

    public static string Text(Condition condition) => condition switch
    {
        Comparison comparison => Text(comparison),
        And { Left: Comparison left, Right: Comparison right } when Chain(left, right) is { } chain => chain,
        And and => $"{Operand(and.Left)} and {Operand(and.Right)}",
        Or or => $"{Operand(or.Left)} or {Operand(or.Right)}",
        Not { Operand: Comparison { Relation: Relation.Equal } equal } => $"{Text(equal.Left)} ≠ {Text(equal.Right)}",
        Not not => $"not ({Text(not.Operand)})",
        Always always => always.Value ? "always" : "never",
        _ => "",
    };

    /// <summary>A number, with a true minus sign and no culture's separators.</summary>
    public static string Number(double value) =>
        double.IsNegativeInfinity(value) ? "−∞"
        : double.IsPositiveInfinity(value) ? "∞"
        : value.ToString("R", CultureInfo.InvariantCulture).Replace('-', '−');

    public static string Number(Rational value)
    {
        var asDouble = value.ToDouble();
        var decimals = asDouble.ToString("R", CultureInfo.InvariantCulture);
        if (value.IsInteger)
            return value.ToString().Replace('-', '−');
        return decimals.Length <= 8 && decimals.IndexOf('E') < 0 && Rational.Parse(decimals) == value ? decimals.Replace('-', '−') : value.ToString().Replace('-', '−');
    }

    private static string Text(Comparison comparison)
    {
        // A bound before the quantity reads better after it: hours > 200.
        var (left, right) = (Text(comparison.Left), Text(comparison.Right));
        var flipped = Dependences.Of(comparison.Right).HasObservation() && !Dependences.Of(comparison.Left).HasObservation();
        return (comparison.Relation, flipped) switch
        {
            (Relation.Less, false) => $"{left} < {right}",
            (Relation.Less, true) => $"{right} > {left}",
            (Relation.LessOrEqual, false) => $"{left} ≤ {right}",
            (Relation.LessOrEqual, true) => $"{right} ≥ {left}",
            _ => $"{left} = {right}",
        };
    }

    private static string? Chain(Comparison a, Comparison b)
    {
        if (a.Relation == Relation.Equal || b.Relation == Relation.Equal)
            return null;
        if (StructuralOrder.Same(a.Left, b.Right))
            (a, b) = (b, a);
        return StructuralOrder.Same(a.Right, b.Left) ? $"{Text(a.Left)} {Sign(a)} {Text(a.Right)} {Sign(b)} {Text(b.Right)}" : null;

        static string Sign(Comparison c) => c.Relation == Relation.Less ? "<" : "≤";
    }

    private static string Operand(Condition condition) => condition is Or or And ? $"({Text(condition)})" : Text(condition);

    private static string Write(Expression expression, int place)
    {
        switch (expression)
        {
            case Number number:
                return Parenthesized(Number(number.Value), (number.Value.Sign < 0 && place > InSum) || (place >= InPower && Number(number.Value).IndexOf('/') >= 0));
            case Constant constant:
                return constant.Value == Math.PI ? "π" : constant.Value == Math.E ? "e" : Parenthesized(Number(constant.Value), constant.Value < 0 && place > InSum);
            case Symbol symbol:
                return symbol.Name;
            case Sum sum:
                return Parenthesized(WriteSum(sum.Terms), place > InSum && sum.Terms.Count > 1);
            case Product product:
                return WriteProduct(product.Factors, place);
            case Power { Exponent: Number { Value: var exponent } } power:
                return WritePower(power, exponent, place);
            case Power power:
                return $"{Write(power.Base, InPower)}^{Write(power.Exponent, InPower)}";
            case Call call:
                return WriteCall(call);
            case Opaque opaque:
                return $"{opaque.Text.Substring(opaque.Text.LastIndexOf('.') + 1)}({Arguments(opaque.Arguments)})";
            case Conditional conditional when conditional.IsIndicator():
                return $"[{Text(conditional.Condition)}]";
            case Conditional { WhenFalse: Number { Value.IsZero: true } } piece:
                return $"{Write(piece.WhenTrue, InProduct)}·[{Text(piece.Condition)}]";
            case Conditional conditional:
                return $"({Text(conditional.Condition)} ? {Text(conditional.WhenTrue)} : {Text(conditional.WhenFalse)})";
            default:
                return "";
        }
    }

    private static string WriteSum(EquatableArray<Expression> terms)
    {
        if (terms.Count == 0)
            return "0";
        var text = new StringBuilder(Write(terms[0], InSum));
        foreach (var term in terms.Skip(1))
        {
            var next = Write(term, InSum);
            text.Append(next.StartsWith("−", StringComparison.Ordinal) ? " − " + next.Substring(1) : " + " + next);
        }

        return text.ToString();
    }

    private static string WriteProduct(EquatableArray<Expression> factors, int place)
    {
        var above = new List<string>();
        var below = new List<string>();
        var sign = 1;
        foreach (var factor in factors.SelectMany(Flat))
        {
            switch (factor)
            {
                case Number { Value: var value }:
                    sign *= value.Sign;
                    var size = Rationals.Abs(value);
                    var text = Number(size);
                    if (size == Rational.One)
                        break;
                    if (text.IndexOf('/') < 0)
                        above.Insert(0, text);
                    else
                        AddFraction(size, above, below);
                    break;
                case Power { Exponent: Number { Value.Sign: < 0, Value: var exponent } } power:
                    below.Add(Write(exponent == -1 ? power.Base : power with { Exponent = Formula.Of(-exponent) }, InPower));
                    break;
                default:
                    above.Add(Write(factor, InProduct));
                    break;
            }
        }

        if (sign == 0)
            return "0";
        var numerator = above.Count == 0 ? "1" : string.Join("·", above);
        var denominator = below.Count == 0 ? "" : below.Count == 1 ? "/" + below[0] : "/(" + string.Join("·", below) + ")";
        var result = (sign < 0 ? "−" : "") + numerator + denominator;
        return Parenthesized(result, (sign < 0 && place > InSum) || (place >= InPower && (above.Count > 1 || below.Count > 0)));
    }

    private static void AddFraction(Rational size, List<string> above, List<string> below)
    {
        if (!size.Numerator.IsOne)
            above.Insert(0, Number(new Rational(size.Numerator, 1)));
        below.Insert(0, Number(new Rational(size.Denominator, 1)));
    }

    private static IEnumerable<Expression> Flat(Expression factor) => factor is Product product ? product.Factors.SelectMany(Flat) : new[] { factor };

    private static string WritePower(Power power, Rational exponent, int place)
    {
        if (exponent.Sign < 0)
            return WriteProduct(EquatableArray.Of<Expression>(power), place);
        if (exponent == new Rational(1, 2))
            return $"√{Write(power.Base, InPower)}";
        var inner = Write(power.Base, InPower);
        if (exponent == 1)
            return inner;
        if (!exponent.IsInteger)
            return $"{inner}^{Write(power.Exponent, InPower)}";
        return inner + Superscript(exponent.ToString());
    }

    private static string Superscript(string digits) => new(digits.Select(d => "⁰¹²³⁴⁵⁶⁷⁸⁹"[d - '0']).ToArray());

    private static string WriteCall(Call call)
    {
        var arguments = Arguments(call.Arguments);
        return call.Function switch
        {
            Function.Abs => $"|{arguments}|",
            Function.LogGamma => $"log Γ({arguments})",
            Function.Digamma => $"ψ({arguments})",
            Function.Remainder => $"({Write(call.Arguments[0], InPower)} mod {Write(call.Arguments[1], InPower)})",
            Function.IntegerQuotient => $"⌊{Write(call.Arguments[0], InPower)}/{Write(call.Arguments[1], InPower)}⌋",
            Function.Floor => $"⌊{arguments}⌋",
            _ => $"{call.Function.ToString().ToLowerInvariant()}({arguments})",
        };
    }

    private static string Arguments(EquatableArray<Expression> arguments) => string.Join(", ", arguments.Select(Text));

    private static string Parenthesized(string text, bool needed) => needed ? $"({text})" : text;
}
