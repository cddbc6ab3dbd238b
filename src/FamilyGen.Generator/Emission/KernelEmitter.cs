using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Emission;

/// <summary>The nested struct that tells the library about the family: one method for each thing it may ask.</summary>
internal sealed class KernelEmitter(FamilyDeclaration declaration, NormalForm form, SourceWriter writer)
{
    private const string Kernels = "global::FamilyGen.Kernels.";
    private const string Span = "global::System.Span<double>";
    private const string Inherit = "/// <inheritdoc/>";

    private readonly KernelText _text = new(declaration);
    private readonly List<AtomSum> _functions = form.Statistics.Select(s => s.Body).Append(form.LogBase).Select(GammaPairs.Joined).ToList();

    private bool HasKnown => declaration.Known.Count > 0;

    public void Write()
    {
        var fields = string.Join(", ", declaration.Known.Select(k => $"{k.Type} {Names.Pascal(k.Name)}"));
        writer.Line("/// <summary>What the library computes with: each statistic and log h with its slope, its residual about a reference point");
        writer.Line("/// m, and its derivative; the last entry of every span belongs to log h.</summary>");
        foreach (var known in declaration.Known)
            writer.Line($"/// <param name=\"{Names.Pascal(known.Name)}\">The known value {known.Name}.</param>");
        writer.Line(FamilyEmitter.Generated);
        writer.Open($"internal readonly record struct KernelForm{(HasKnown ? $"({fields})" : "")} : {Kernels}{(declaration.IsTrade ? "ITradeKernel" : "IKernel")}");
        WriteNames();
        WriteDomain();
        new NaturalSetEmitter(form, writer).Write(HasKnown);
        WriteEvaluate();
        WriteSlopes();
        WriteResiduals();
        WriteDerivative();
        if (declaration.IsTrade)
            new TradeEmitter(declaration, form, writer).Write();
        writer.Close();
    }

    private void WriteNames()
    {
        writer.Line(Inherit);
        writer.Line($"public static int Count => {form.Statistics.Count};");
        writer.Line();
        writer.Line(Inherit);
        writer.Line($"public static global::System.ReadOnlySpan<string> NaturalNames => new[] {{ {Quoted(form.Statistics.Select(s => s.Parameter))} }};");
        writer.Line();
        if (!HasKnown)
            return;
        var values = string.Join(", ", declaration.Known.Select(k => $"{k.Name} = {{{Names.Pascal(k.Name)}}}"));
        writer.Line("/// <summary>The known values, as messages quote them.</summary>");
        writer.Line($"public override string ToString() => global::System.FormattableString.Invariant($\"{values}\");");
        writer.Line();
    }

    private void WriteDomain()
    {
        var settings = new List<string>();
        if (form.LowerSingular)
            settings.Add("LowerSingular = true");
        if (form.UpperSingular)
            settings.Add("UpperSingular = true");
        if (form.Breakpoints.Count > 0)
            settings.Add($"Breakpoints = {Kernels}Domain.Ascending({string.Join(", ", form.Breakpoints.Select(_text.AtX.Print))})");
        if (form.Period is not Number { Value: var one } || one != Rational.One)
            settings.Add($"Period = (long)({_text.AtX.Print(form.Period)})");
        if (form.IsOpaque)
            settings.Add("IsOpaque = true");
        var range = FamilyEmitter.Call(declaration.Support.Range, declaration, "x", Names.Pascal);
        var value = $"{Kernels}Domain.Of({range}){(settings.Count > 0 ? $" with {{ {string.Join(", ", settings)} }}" : "")}";
        writer.Line(Inherit);
        if (HasKnown)
        {
            writer.Line($"public {Kernels}Domain Domain => {value};");
        }
        else
        {
            writer.Line($"public {Kernels}Domain Domain => s_domain;");
            writer.Line();
            writer.Line($"private static readonly {Kernels}Domain s_domain = {value};");
        }

        writer.Line();
    }

    private void WriteEvaluate()
    {
        writer.Line(Inherit);
        writer.Open($"public void Evaluate(in {Kernels}Point x, {Span} value, {Span} remainder)");
        writer.Line("remainder.Clear();");
        for (var i = 0; i < _functions.Count; i++)
        {
            writer.Line($"value[{i}] = {Guarded(i, _functions[i].Terms.Count == 0 ? "0" : _text.AtX.Print(_functions[i].ToExpression()))};");
            if (ExactSquare(_functions[i]) is { } sign)
                writer.Line($"remainder[{i}] = global::System.Math.FusedMultiplyAdd({sign}x.X, x.X, -value[{i}]);");
        }

        writer.Close();
        writer.Line();
    }

    private void WriteSlopes()
    {
        writer.Line(Inherit);
        writer.Open($"public void Slopes(in {Kernels}Point m, {Span} slope)");
        for (var i = 0; i < _functions.Count; i++)
            writer.Line($"slope[{i}] = {Combined(_functions[i], a => AtomForm.Of(a, _text).Slope)};");
        writer.Close();
        writer.Line();
    }

    private void WriteResiduals()
    {
        writer.Line(Inherit);
        writer.Open($"public void Residuals(in {Kernels}Point m, in {Kernels}Point x, {Span} residual)");
        for (var i = 0; i < _functions.Count; i++)
            writer.Line($"residual[{i}] = {Guarded(i, Combined(_functions[i], a => AtomForm.Of(a, _text).Residual))};");
        writer.Close();
        writer.Line();
    }

    private void WriteDerivative()
    {
        writer.Line(Inherit);
        writer.Line($"public TNumber Derivative<TNumber>(global::System.ReadOnlySpan<double> theta, TNumber x, in {Kernels}Point piece)");
        writer.Indented($"where TNumber : struct, {Kernels}IArithmetic<TNumber> =>");
        var terms = new List<Expression>();
        for (var i = 0; i < _functions.Count; i++)
        {
            if (Derivative.Of(_functions[i].ToExpression()) is not { } slope)
            {
                writer.Indented("TNumber.Unknown;");
                return;
            }

            if (!slope.IsZero())
                terms.Add(i == form.Statistics.Count ? slope : Formula.Product(new Symbol($"theta[{i}]", SymbolKind.Natural, false), slope));
        }

        writer.Indented(_text.Generic.Print(new Sum(terms.ToEquatableArray())) + ";");
    }

    /// <summary>Σ coefficient · part(atom); parts that are null vanish.</summary>
    private string Combined(AtomSum sum, System.Func<Expression, string?> part)
    {
        var text = "";
        foreach (var term in sum.Terms)
        {
            if (part(term.Atom) is not { } body || body == "0")
                continue;
            var (negative, factor) = Coefficient(term.Coefficient);
            body = factor.Length == 0 ? body : factor + " * " + Parenthesised(body);
            text += text.Length == 0
                ? (negative ? "-" + (factor.Length == 0 ? Parenthesised(body) : body) : body)
                : (negative ? " - " + (factor.Length == 0 ? Parenthesised(body) : body) : " + " + body);
        }

        return text.Length == 0 ? "0" : text;
    }

    private (bool Negative, string Factor) Coefficient(Expression coefficient) => coefficient switch
    {
        Number { Value: var v } when v == Rational.One => (false, ""),
        Number { Value: var v } when v == -Rational.One => (true, ""),
        Number { Value: var v } when v.Sign < 0 => (true, FormulaPrinter.Literal((-v).ToDouble())),
        Number { Value: var v } => (false, FormulaPrinter.Literal(v.ToDouble())),
        _ => (false, _text.AtX.Factor(coefficient)),
    };

    private static string Parenthesised(string body)
    {
        var depth = 0;
        foreach (var c in body)
        {
            depth += c is '(' or '[' ? 1 : c is ')' or ']' ? -1 : 0;
            if (depth == 0 && c is ' ')
                return $"({body})";
        }

        return body;
    }

    /// <summary>log h is −∞ where the support's predicate says no.</summary>
    private string Guarded(int index, string body)
    {
        if (index < form.Statistics.Count || declaration.Support.PredicateMember is not { } predicate)
            return body;
        var cast = declaration.Observation == ObservationType.Int ? "(int)x.Integer" : "x.Integer";
        return $"{FamilyEmitter.Call(predicate, declaration, cast, Names.Pascal)} ? {body} : double.NegativeInfinity";
    }

    private static string? ExactSquare(AtomSum sum) =>
        sum.Terms.Count == 1
        && sum.Terms[0] is { Coefficient: Number { Value: var c }, Atom: Power { Base: Symbol { Kind: SymbolKind.Observation }, Exponent: Number { Value: var two } } }
        && two == 2 && Rational.Abs(c) == Rational.One
            ? (c.Sign < 0 ? "-" : "")
            : null;

    private static string Quoted(IEnumerable<string> names) => string.Join(", ", names.Select(n => $"\"{n}\""));
}
