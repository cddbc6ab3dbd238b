using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Emission;

/// <summary>How one atom is written about a reference point m so that nothing cancels: its slope at m, and the residual
/// f(x) − f(m) − slope·(x − m). An atom without such a form has slope 0 and its plain difference as residual.</summary>
/// <param name="Slope">C# of the slope at m, or null for 0.</param>
/// <param name="Residual">C# of the residual, or null for 0.</param>
internal readonly record struct AtomForm(string? Slope, string? Residual)
{
    private const string Library = "global::FamilyGen.Kernels.Residual";

    public static AtomForm Of(Expression atom, KernelText text)
    {
        switch (atom)
        {
            case Number:
                return new(null, null);
            case Symbol { Kind: SymbolKind.Observation }:
                return new("1", null);
            case Call { Function: Function.Log } c when AffineForm.Match(c.Arguments[0]) is { } w:
                return new(Over(w, text), text.EndRatio(w) is { } ratio ? $"{Library}.LogAtEnd({ratio})" : $"{Library}.Log({At(w, text)}, {Step(w, text)})");
            case Call { Function: Function.Log } c when SoftplusOf(c.Arguments[0]) is { } w:
                return new($"{text.AtM.Factor(w.Slope)} / (1 + global::System.Math.Exp(-({At(w, text)})))", $"{Library}.Softplus({At(w, text)}, {Step(w, text)})");
            case Power { Exponent: Number n } p when AffineForm.Match(p.Base) is { } w:
                return PowerForm(w, n, text);
            case Power { Exponent: Number { Value: { IsInteger: true } n } } p when n > 1 && LogOf(p.Base) is { } w:
                return LogPowerForm(w, n, text);
            case Product { Factors.Count: 2 } p when XLogX(p) is { } w:
                return XLogXForm(w, text);
            case Call { Function: Function.Exp } c when AffineForm.Match(c.Arguments[0]) is { } w:
                return new($"{Times(w, text)}global::System.Math.Exp({At(w, text)})", $"{Library}.Exp({At(w, text)}, {Step(w, text)})");
            case Call { Function: Function.Cos } c when AffineForm.Match(c.Arguments[0]) is { } w:
                return new($"-{Times(w, text)}global::System.Math.Sin({At(w, text)})", $"{Library}.Cos({At(w, text)}, {Step(w, text)})");
            case Call { Function: Function.Sin } c when AffineForm.Match(c.Arguments[0]) is { } w:
                return new($"{Times(w, text)}global::System.Math.Cos({At(w, text)})", $"{Library}.Sin({At(w, text)}, {Step(w, text)})");
            case Call { Function: Function.Abs } c when AffineForm.Match(c.Arguments[0]) is { } w:
                return new($"{Times(w, text)}global::System.Math.Sign({At(w, text)})", $"{Library}.Abs({At(w, text)}, {Step(w, text)})");
            case Call { Function: Function.LogGamma } c when AffineForm.Match(c.Arguments[0]) is { } w:
                return new($"{Times(w, text)}global::FamilyGen.Special.Digamma.Value({At(w, text)})", $"{Library}.LogGamma({At(w, text)}, {Step(w, text)})");
            case Call { Function: Function.LogGammaRatio } c when AffineForm.Match(c.Arguments[0]) is { } w:
                var shift = text.AtM.Print(c.Arguments[1]);
                return new($"global::FamilyGen.Special.LogGammaRatio.Derivative({At(w, text)}, {shift})", $"{Library}.LogGammaRatio({At(w, text)}, {shift}, {Step(w, text)})");
            default:
                return new(null, $"({text.AtX.Print(atom)}) - ({text.AtM.Print(atom)})");
        }
    }

    private static AtomForm PowerForm(AffineForm w, Number exponent, KernelText text)
    {
        var p = exponent.Value;
        var less = p - Rational.One;
        var derivative = new Product(EquatableArray.Of<Expression>(exponent, less == Rational.One ? w.Whole : new Power(w.Whole, new Number(less))));
        var slope = Times(w, text) + text.AtM.Factor(derivative);
        if (p.IsInteger && p > 1 && p < 64)
            return new(slope, $"{Library}.Power({At(w, text)}, {Step(w, text)}, {p})");
        var literal = FormulaPrinter.Literal(p.ToDouble());
        return new(slope, text.EndRatio(w) is { } ratio
            ? $"{Library}.PowerAtEnd({At(w, text)}, {ratio}, {literal})"
            : $"{Library}.Power({At(w, text)}, {Step(w, text)}, {literal})");
    }

    private static AtomForm LogPowerForm(AffineForm w, Rational n, KernelText text)
    {
        var log = new Call(Function.Log, EquatableArray.Of(w.Whole));
        var power = n == 2 ? (Expression)log : new Power(log, new Number(n - Rational.One));
        var slope = $"{n} * {text.AtM.Factor(power)} * {Over(w, text)}";
        return new(slope, text.EndRatio(w) is { } ratio
            ? $"{Library}.LogPowerAtEnd({text.AtM.Print(log)}, {ratio}, {n})"
            : $"{Library}.LogPower({At(w, text)}, {Step(w, text)}, {n})");
    }

    private static AtomForm XLogXForm(AffineForm w, KernelText text)
    {
        var log = new Call(Function.Log, EquatableArray.Of(w.Whole));
        var slope = $"{Times(w, text)}({text.AtM.Print(log)} + 1)";
        return new(slope, text.EndRatio(w) is { } ratio
            ? $"{Library}.XLogXAtEnd({At(w, text)}, {ratio})"
            : $"{Library}.XLogX({At(w, text)}, {Step(w, text)})");
    }

    private static AffineForm? LogOf(Expression e) =>
        e is Call { Function: Function.Log } c ? AffineForm.Match(c.Arguments[0]) : null;

    private static AffineForm? XLogX(Product p)
    {
        for (var i = 0; i < 2; i++)
        {
            if (LogOf(p.Factors[i]) is { } w && w.Whole.Equals(p.Factors[1 - i]))
                return w;
        }

        return null;
    }

    private static AffineForm? SoftplusOf(Expression e) =>
        e is Sum { Terms.Count: 2 } s && s.Terms.Any(t => t is Number { Value: var v } && v == Rational.One)
            ? s.Terms.OfType<Call>().Where(c => c.Function == Function.Exp).Select(c => AffineForm.Match(c.Arguments[0])).FirstOrDefault()
            : null;

    /// <summary>The inner function at m.</summary>
    private static string At(AffineForm w, KernelText text) => text.AtM.Print(w.Whole);

    /// <summary>By how much the inner function moves from m to x.</summary>
    private static string Step(AffineForm w, KernelText text) => Times(w, text) + "x.Displacement";

    private static string Times(AffineForm w, KernelText text) =>
        w.Slope is Number { Value: var k } && k == Rational.One ? "" : text.AtM.Factor(w.Slope) + " * ";

    private static string Over(AffineForm w, KernelText text) =>
        $"{text.AtM.Factor(w.Slope)} / {(w.IsObservation ? At(w, text) : $"({At(w, text)})")}";
}
