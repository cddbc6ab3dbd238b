using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Emission;

/// <summary>The maps between trade and natural parameters.</summary>
internal sealed class TradeEmitter(FamilyDeclaration declaration, NormalForm form, SourceWriter writer)
{
    private const string Inherit = "/// <inheritdoc/>";
    private const string ReadOnlySpan = "global::System.ReadOnlySpan";

    // Names that the methods' own arguments and locals take.
    private static readonly string[] s_taken = ["parameters", "theta", "lower", "upper", "x", "piece"];

    public void Write()
    {
        writer.Line();
        writer.Line(Inherit);
        writer.Line($"public static {ReadOnlySpan}<string> ParameterNames => new[] {{ {string.Join(", ", declaration.Parameters.Select(p => $"\"{p.Name}\""))} }};");
        WriteNatural();
        WriteInverse();
        WriteRange();
    }

    private void WriteNatural()
    {
        writer.Line();
        writer.Line(Inherit);
        writer.Line($"public void Natural<TNumber>({ReadOnlySpan}<TNumber> parameters, global::System.Span<TNumber> theta)");
        writer.Open($"    where TNumber : struct, global::FamilyGen.Kernels.IArithmetic<TNumber>");
        var names = Locals(declaration.Parameters.Select(p => p.Name));
        var naturals = form.Statistics.Select(s => s.Natural!).ToList();
        for (var i = 0; i < declaration.Parameters.Count; i++)
        {
            if (naturals.Any(n => Mentions(n, declaration.Parameters[i].Name)))
                writer.Line($"var {names[declaration.Parameters[i].Name]} = parameters[{i}];");
        }

        string SymbolText(Symbol s) => s.Kind == SymbolKind.Known ? Names.Pascal(s.Name) : names[s.Name];
        var printer = new GenericPrinter("x", SymbolText, new DoublePrinter("x", null, SymbolText));
        for (var j = 0; j < naturals.Count; j++)
            writer.Line($"theta[{j}] = {printer.Print(naturals[j])};");
        writer.Close();
    }

    private void WriteInverse()
    {
        writer.Line();
        writer.Line(Inherit);
        writer.Open($"public bool TryParameters({ReadOnlySpan}<double> theta, global::System.Span<double> parameters)");
        if (form.Inverse.Count == 0)
        {
            writer.Line("return false;");
        }
        else
        {
            var names = Locals(form.Statistics.Select(s => s.Parameter));
            for (var j = 0; j < form.Statistics.Count; j++)
            {
                if (form.Inverse.Any(e => Mentions(e, form.Statistics[j].Parameter)))
                    writer.Line($"var {names[form.Statistics[j].Parameter]} = theta[{j}];");
            }

            string SymbolText(Symbol s) => s.Kind == SymbolKind.Known ? Names.Pascal(s.Name) : names[s.Name];
            var printer = new DoublePrinter("x", null, SymbolText);
            for (var i = 0; i < form.Inverse.Count; i++)
                writer.Line($"parameters[{i}] = {printer.Print(form.Inverse[i])};");
            writer.Line("return global::FamilyGen.Fitting.TradeParameters.AreInRange(this, parameters);");
        }

        writer.Close();
    }

    private void WriteRange()
    {
        writer.Line();
        writer.Line(Inherit);
        writer.Open("public void ParameterRange(global::System.Span<double> lower, global::System.Span<double> upper)");
        for (var i = 0; i < declaration.Parameters.Count; i++)
            writer.Line($"(lower[{i}], upper[{i}]) = ({FormulaPrinter.Literal(form.ParameterLower[i])}, {FormulaPrinter.Literal(form.ParameterUpper[i])});");
        writer.Close();
    }

    private static bool Mentions(Expression formula, string name) => Dependences.Symbols(formula).Any(s => s.Name == name);

    private static Dictionary<string, string> Locals(IEnumerable<string> names)
    {
        var taken = new HashSet<string>(s_taken);
        var result = new Dictionary<string, string>();
        foreach (var name in names.Distinct())
        {
            var local = Names.Unique(name, taken);
            taken.Add(local);
            result[name] = Names.Identifier(local);
        }

        return result;
    }
}
