using System;
using System.Globalization;
using FamilyGen.Generator.Algebra;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp.Syntax;
using Microsoft.CodeAnalysis.Operations;

namespace FamilyGen.Generator.Reading;

/// <summary>Constants as exact fractions. A real literal is the decimal fraction that was written, not the double next to
/// it: 0.1 is one tenth.</summary>
internal static class ConstantNumber
{
    /// <summary>A literal, a constant integer expression, or an infinite or undefined constant. Other constant expressions
    /// are read piece by piece, so that 1.0/3 stays a third.</summary>
    public static Expression? TryRead(IOperation operation, int origin)
    {
        if (operation is ILiteralOperation { ConstantValue: { HasValue: true, Value: double } } literal
            && literal.Syntax is LiteralExpressionSyntax { Token.Text: var text })
        {
            return new Number(Rational.Parse(Digits(text))) { Origin = origin };
        }

        if (operation.ConstantValue is not { HasValue: true, Value: { } value })
            return null;
        return value switch
        {
            double d when double.IsNaN(d) || double.IsInfinity(d) => Of(value, origin),
            double when operation is not ILiteralOperation => null,
            float when operation is not ILiteralOperation => null,
            decimal when operation is not ILiteralOperation => null,
            _ => Of(value, origin),
        };
    }

    /// <summary>The value of a constant of the language, or null when it is no number.</summary>
    public static Expression? Of(object? value, int origin) => value switch
    {
        double.PositiveInfinity => new Constant(double.PositiveInfinity, "∞") { Origin = origin },
        double.NegativeInfinity => new Constant(double.NegativeInfinity, "−∞") { Origin = origin },
        double.NaN => new Constant(double.NaN, "NaN") { Origin = origin },
        Math.PI => new Constant(Math.PI, "π") { Origin = origin },
        Math.E => new Constant(Math.E, "e") { Origin = origin },
        2 * Math.PI => new Constant(2 * Math.PI, "τ") { Origin = origin },
        double d => new Number(Rational.Parse(d.ToString("R", CultureInfo.InvariantCulture))) { Origin = origin },
        float f => Of((double)f, origin),
        decimal d => new Number(Rational.Parse(d.ToString(CultureInfo.InvariantCulture))) { Origin = origin },
        sbyte or byte or short or ushort or int or uint or long or ulong =>
            new Number(Rational.Parse(((IFormattable)value).ToString(null, CultureInfo.InvariantCulture))) { Origin = origin },
        char c => new Number((int)c) { Origin = origin },
        _ => null,
    };

    private static string Digits(string literal) => literal.Replace("_", "").TrimEnd('d', 'D');
}
