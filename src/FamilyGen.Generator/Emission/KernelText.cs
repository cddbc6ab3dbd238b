using System;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Emission;

/// <summary>The ways in which formulas appear inside the kernel of one family.</summary>
internal sealed class KernelText
{
    private readonly FamilyDeclaration _declaration;

    public KernelText(FamilyDeclaration declaration)
    {
        _declaration = declaration;
        AtX = ForPoint("x");
        AtM = ForPoint("m");
        Generic = new GenericPrinter("x", KernelSymbol, ForPoint("piece"));
    }

    /// <summary>Formulas at the point x.</summary>
    public DoublePrinter AtX { get; }

    /// <summary>Formulas at the reference point m.</summary>
    public DoublePrinter AtM { get; }

    /// <summary>Derivatives in x over generic numbers.</summary>
    public GenericPrinter Generic { get; }

    /// <summary>Known values are fields of the kernel.</summary>
    public static string KernelSymbol(Symbol symbol) =>
        symbol.Kind == SymbolKind.Known ? Names.Pascal(symbol.Name) : symbol.Name;

    /// <summary>log((x − end)/(m − end)) where the form vanishes at a finite end of an interval, so that it stays exact
    /// there; null elsewhere.</summary>
    public string? EndRatio(AffineForm w) => EndOf(w) switch
    {
        true => "x.RatioToLower",
        false => "x.RatioToUpper",
        null => null,
    };

    private bool? EndOf(AffineForm w)
    {
        var support = _declaration.Support;
        if (support.IsLattice || support.IsCircle)
            return null;
        return w.VanishesAt(support.Lower, true) ? true : w.VanishesAt(support.Upper, false) ? false : null;
    }

    private DoublePrinter ForPoint(string point)
    {
        // The engine carries the logarithm of the distance to an end, which stays exact where the distance underflows.
        string? Shortcut(Expression e)
        {
            if (e is not Call { Function: Function.Log } c || AffineForm.Match(c.Arguments[0]) is not { } w || EndOf(w) is not { } lower)
                return null;
            var log = point + (lower ? ".LogAboveLower" : ".LogBelowUpper");
            var scale = w.Slope is Number n ? Math.Abs(n.Value.ToDouble()) : double.NaN;
            return scale == 1 ? log : $"({log} + {FormulaPrinter.Literal(Math.Log(scale))})";
        }

        var integer = _declaration.Observation == ObservationType.Double ? null : point + ".Integer";
        return new DoublePrinter(point + ".X", integer, KernelSymbol, Shortcut);
    }
}
