using System;
using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Emission;

/// <summary>Formulas over plain doubles.</summary>
/// <param name="real">The observation as a double.</param>
/// <param name="integer">The observation as an integer, for residues and integer quotients; null where there is none.</param>
/// <param name="symbol">What known values, parameters and natural parameters are called.</param>
/// <param name="shortcut">A better way to write some calls (a logarithm that the engine carries along), or null.</param>
internal sealed class DoublePrinter(string real, string? integer, Func<Symbol, string> symbol, Func<Expression, string?>? shortcut = null)
    : FormulaPrinter
{
    protected override string SymbolText(Symbol s) => s.Kind == SymbolKind.Observation ? real
        : s.IsInteger ? "(double)" + symbol(s)
        : symbol(s);

    protected override string CallText(Call call)
    {
        if (shortcut?.Invoke(call) is { } text)
            return text;
        string Arg(int i) => Print(call.Arguments[i]);
        return call.Function switch
        {
            Function.Log when OnePlus(call.Arguments[0]) is { } rest => $"global::FamilyGen.Special.Elementary.Log1P({Print(rest)})",
            Function.LogGamma => $"global::FamilyGen.Special.LogGamma.Value({Arg(0)})",
            Function.LogGammaRatio => $"global::FamilyGen.Special.LogGammaRatio.Value({Arg(0)}, {Arg(1)})",
            Function.DigammaDifference => $"global::FamilyGen.Special.LogGammaRatio.Derivative({Arg(0)}, {Arg(1)})",
            Function.Digamma => $"global::FamilyGen.Special.Digamma.Value({Arg(0)})",
            Function.Sign => $"(double)global::System.Math.Sign({Arg(0)})",
            Function.Atan2 or Function.Min or Function.Max => $"global::System.Math.{call.Function}({Arg(0)}, {Arg(1)})",
            Function.Remainder => InIntegers(call) is { } whole ? $"({whole})" : $"({Factor(call.Arguments[0])} % {Atomic(call.Arguments[1])})",
            Function.IntegerQuotient => QuotientText(call),
            _ => $"global::System.Math.{call.Function}({Arg(0)})",
        };
    }

    protected override string OpaqueText(Opaque opaque) =>
        opaque.Arguments.Select((a, i) => (Place: $"{{{i}}}", Text: InIntegers(a) ?? Print(a)))
            .Aggregate(opaque.Text, (text, argument) => text.Replace(argument.Place, argument.Text));

    protected override string PowerText(Expression @base, Expression exponent) => exponent switch
    {
        Number { Value: var e } when e == new Rational(1, 2) => $"global::System.Math.Sqrt({Print(@base)})",
        Number { Value: var e } when e == 2 && @base is Symbol => $"({Print(@base)} * {Print(@base)})",
        _ => $"global::System.Math.Pow({Print(@base)}, {Print(exponent)})",
    };

    protected override string ConditionalText(Conditional c) => $"{Print(c.Condition)} ? {Print(c.WhenTrue)} : {Print(c.WhenFalse)}";

    public override string Print(Condition condition) => condition switch
    {
        Always a => a.Value ? "true" : "false",
        Not n => $"!({Print(n.Operand)})",
        And a => $"{Conjunct(a.Left)} && {Conjunct(a.Right)}",
        Or o => $"{Print(o.Left)} || {Print(o.Right)}",
        Comparison c => $"{Side(c, c.Left)} {Sign(c.Relation)} {Side(c, c.Right)}",
        _ => throw new InvalidOperationException("unknown condition " + condition.GetType().Name),
    };

    private string Conjunct(Condition condition) => condition is Or ? $"({Print(condition)})" : Print(condition);

    private static string Sign(Relation relation) => relation switch
    {
        Relation.Less => "<",
        Relation.LessOrEqual => "<=",
        _ => "==",
    };

    /// <summary>A residue is compared as the integer it is; all else as doubles.</summary>
    private string Side(Comparison comparison, Expression side) =>
        IsResidual(comparison.Left) || IsResidual(comparison.Right) ? InIntegers(side) ?? Print(side) : Print(side);

    private static bool IsResidual(Expression e) => e is Call { Function: Function.Remainder };

    private string QuotientText(Call call)
    {
        // (x − x mod n)/n continues integer division to the reals between the integers of one residue class.
        var (dividend, divisor) = (call.Arguments[0], call.Arguments[1]);
        return InIntegers(dividend) is { } a && InIntegers(divisor) is { } b
            ? $"(({Print(dividend)} - ({a}) % ({b})) / {Atomic(divisor)})"
            : $"global::System.Math.Truncate({Print(dividend)} / {Atomic(divisor)})";
    }

    private string Atomic(Expression e) => Write(e, 3);

    /// <summary>The expression in integer arithmetic, or null where it is not made of integers alone.</summary>
    private string? InIntegers(Expression e)
    {
        switch (e)
        {
            case Number { Value: { IsInteger: true } v }:
                return v.ToString();
            case Symbol { Kind: SymbolKind.Observation, IsInteger: true }:
                return integer;
            case Symbol { IsInteger: true } s:
                return symbol(s);
            case Sum s:
                return Joined(s.Terms, " + ");
            case Product p:
                return Joined(p.Factors, " * ");
            case Call { Function: Function.Remainder } c:
                return Joined(c.Arguments, " % ");
            case Call { Function: Function.IntegerQuotient } c:
                return Joined(c.Arguments, " / ");
            default:
                return null;
        }
    }

    private string? Joined(Model.EquatableArray<Expression> parts, string separator)
    {
        var texts = parts.Select(p => InIntegers(p) is { } t ? (p is Symbol or Number { Value.Sign: >= 0 } ? t : $"({t})") : null).ToList();
        return texts.Contains(null) ? null : string.Join(separator, texts);
    }

    private static Expression? OnePlus(Expression e)
    {
        if (e is not Sum s || s.Terms.Count < 2)
            return null;
        var rest = s.Terms.Where(t => t is not Number { Value: var v } || v != Rational.One).ToList();
        return rest.Count != s.Terms.Count - 1 ? null : rest.Count == 1 ? rest[0] : new Sum(new(rest));
    }
}
