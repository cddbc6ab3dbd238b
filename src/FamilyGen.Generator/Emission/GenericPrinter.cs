using System;
using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Emission;

/// <summary>Formulas over a type parameter TNumber, written once and evaluated as numbers, ranges or derivatives.</summary>
/// <param name="observation">The observation as a TNumber.</param>
/// <param name="symbol">What known values and parameters are called.</param>
/// <param name="conditions">How conditions are decided: by a point of the same piece.</param>
internal sealed class GenericPrinter(string observation, Func<Symbol, string> symbol, DoublePrinter conditions) : FormulaPrinter
{
    protected override string SymbolText(Symbol s) => s.Kind == SymbolKind.Observation ? observation
        : s.Kind == SymbolKind.Known && s.IsInteger ? "(double)" + symbol(s)
        : symbol(s);

    protected override string CallText(Call call)
    {
        string Arg(int i) => Print(call.Arguments[i]);
        return call.Function switch
        {
            Function.Exp or Function.Log or Function.Sin or Function.Cos or Function.Abs or Function.LogGamma or Function.Digamma =>
                $"TNumber.{call.Function}({Arg(0)})",

            Function.DigammaDifference => $"TNumber.DigammaDifference({Arg(0)}, {conditions.Print(call.Arguments[1])})",

            // Minimum and maximum through |a − b|, whose derivative at equality is their mean.
            Function.Min => $"((({Arg(0)}) + ({Arg(1)}) - TNumber.Abs({Arg(0)} - ({Arg(1)}))) / 2)",
            Function.Max => $"((({Arg(0)}) + ({Arg(1)}) + TNumber.Abs({Arg(0)} - ({Arg(1)}))) / 2)",

            // Constant on a piece and along a residue class, so the piece's point decides.
            Function.Sign or Function.Remainder => $"({conditions.Print(call)})",
            Function.IntegerQuotient => $"(({Arg(0)} - {Print(new Call(Function.Remainder, call.Arguments))}) / {Factor(call.Arguments[1])})",
            _ => "TNumber.Unknown",
        };
    }

    protected override string OpaqueText(Opaque opaque) => "TNumber.Unknown";

    protected override string PowerText(Expression @base, Expression exponent) => exponent switch
    {
        Number { Value: var e } when e == 2 && @base is Symbol => $"({Print(@base)} * {Print(@base)})",
        Number { Value: var e } => $"TNumber.Pow({Print(@base)}, {Literal(e.ToDouble())})",
        _ when IsKnown(exponent) => $"TNumber.Pow({Print(@base)}, {conditions.Print(exponent)})",
        _ => $"TNumber.Pow({Print(@base)}, {Print(exponent)})",
    };

    protected override string ConditionalText(Conditional c) =>
        $"{Print(c.Condition)} ? {Print(c.WhenTrue)} : {Print(c.WhenFalse)}";

    public override string Print(Condition condition) => conditions.Print(condition);

    private static bool IsKnown(Expression e) => e switch
    {
        Number or Constant => true,
        Symbol s => s.Kind == SymbolKind.Known,
        Sum s => s.Terms.All(IsKnown),
        Product p => p.Factors.All(IsKnown),
        Power p => IsKnown(p.Base) && IsKnown(p.Exponent),
        Call c => c.Arguments.All(IsKnown),
        _ => false,
    };
}
