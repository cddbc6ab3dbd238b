using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>FG0205: arithmetic in integers that drops a fraction, or that can overflow on counts that may well occur.</summary>
internal static class IntegerArithmeticRule
{
    // Where the support sets no end: the largest count that is taken to occur.
    private const double LargestCount = 1e6;

    private const double LargestKnown = 1000;

    private const int LargestDivisor = 1000;

    public static IEnumerable<Finding> Find(FamilyReading reading)
    {
        var findings = reading.IntegerSteps
            .Select(s => (Step: s, Finding: Judge(s, reading.Declaration)))
            .Where(f => f.Finding is not null)
            .ToList();

        // The innermost step is the first to go wrong; in double it takes the outer ones with it.
        return findings
            .Where(f => !findings.Any(g => g.Step.Origin != f.Step.Origin && Holds(f.Step, g.Step.Origin)))
            .Select(f => f.Finding!);
    }

    private static bool Holds(IntegerStep step, int origin) =>
        Dependences.Parts(step.Left).Concat(Dependences.Parts(step.Right)).Any(p => p.Origin == origin);

    private static Finding? Judge(IntegerStep step, FamilyDeclaration declaration)
    {
        switch (step.Kind)
        {
            case IntegerStepKind.Quotient when !IsWhole(step, declaration):
                var inDouble = step.Right is Number ? $"{Operand(step.Left)} / {Operand(step.Right)}.0" : $"(double){Operand(step.Left)} / {Operand(step.Right)}";
                return Report(step, $"{Operand(step.Left)} / {Operand(step.Right)}", "drops the fraction", $"write '{inDouble}' if the fraction is meant, or 'Floor({inDouble})' if it is not");
            case IntegerStepKind.Product when Largest(step, declaration) > Limit(step.Type):
                var product = $"{Operand(step.Left)} * {Operand(step.Right)}";
                return Report(step, product, "can overflow", $"write '(double){product}'");
            case IntegerStepKind.Conversion when !new EnclosingEvaluator(declaration.Support.IsLattice).IsInteger(step.Left):
                return Report(step, $"({step.Type})({Text(step.Left)})", "drops the fraction", $"write '{Text(step.Left)}' if the fraction is meant, or 'Floor(…)' of it if it is not");
            default:
                return null;
        }
    }

    private static Finding Report(IntegerStep step, string what, string how, string mend) =>
        new(DiagnosticIds.IntegerArithmetic, step.Origin, EquatableArray.Of(what, step.Type, how, mend));

    private static string Operand(Expression operand) => operand is Sum or Conditional ? $"({Text(operand)})" : Text(operand);

    // As C# writes it.
    private static string Text(Expression operand) => Rendering.Text(operand).Replace('−', '-').Replace("·", " * ");

    // Whether the division leaves no remainder, whatever the count: x·(x − 1)/2. It is enough to try each residue.
    private static bool IsWhole(IntegerStep step, FamilyDeclaration declaration)
    {
        var evaluator = new EnclosingEvaluator(declaration.Support.IsLattice);
        if (evaluator.Of(step.Right, Enclosure.Line).Exact is not { IsInteger: true, IsZero: false } divisor || Rational.Abs(divisor) > LargestDivisor
            || !IsPolynomial(step.Left))
        {
            return false;
        }

        return Enumerable.Range(0, (int)Rational.Abs(divisor).Numerator)
            .All(r => evaluator.Of(step.Left, Enclosure.Of((Rational)r)).Exact is { } value && (value / divisor).IsInteger);
    }

    private static bool IsPolynomial(Expression expression) => expression switch
    {
        Number => true,
        Symbol symbol => symbol.Kind == SymbolKind.Observation,
        Sum or Product => expression.Children().All(IsPolynomial),
        _ => false,
    };

    private static double Largest(IntegerStep step, FamilyDeclaration declaration)
    {
        var support = EffectiveSupport.Declared(declaration);
        var x = Enclosure.Between(
            support.Lower?.ToDouble() ?? -LargestCount,
            support.Upper?.ToDouble() ?? Math.Max(LargestCount, support.Lower?.ToDouble() ?? 0));
        var evaluator = new EnclosingEvaluator(declaration.Support.IsLattice, _ => Enclosure.Between(-LargestKnown, LargestKnown));
        var product = evaluator.Of(Formula.Product(step.Left, step.Right), x);
        return product.IsNeverFinite ? 0 : Math.Max(-product.Lower, product.Upper);
    }

    private static double Limit(string type) => type switch
    {
        "int" => int.MaxValue,
        "uint" => uint.MaxValue,
        "ulong" => ulong.MaxValue,
        _ => long.MaxValue,
    };
}
