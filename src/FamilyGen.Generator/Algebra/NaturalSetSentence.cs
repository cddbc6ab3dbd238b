using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>The natural parameter set in words: the conditions that the ends put on the coefficients, strongest rank
/// first.</summary>
internal sealed class NaturalSetSentence(IReadOnlyList<Polynomial> naturals, Expander expander)
{
    /// <summary>The sentence, empty where every value will do. The ranges of trade parameters are part of it.</summary>
    public string Write(IEnumerable<EndRow> ends, IEnumerable<Symbol> parameters)
    {
        var whole = parameters.Select(InRange).Aggregate(SetCondition.Always, SetCondition.Both);
        var notes = new List<string>();
        foreach (var end in ends)
        {
            if (!end.IsVerified)
            {
                notes.Add($"it cannot be proved what holds as {end.Where}");
                continue;
            }

            var condition = Decide(Levels(end), 0);
            if (condition.IsNever)
                return $"no parameters: the normalizer is infinite as {end.Where}";
            whole = SetCondition.Both(whole, condition);
        }

        if (whole.IsNever)
            return "no parameters: no value makes the normalizer finite at all ends";
        return string.Join("; ", new[] { whole.Text }.Concat(notes.Distinct()).Where(t => t.Length > 0));
    }

    /// <summary>What one end asks for; empty where it asks for nothing, or for the impossible.</summary>
    public string Condition(EndRow end) => Decide(Levels(end), 0).Text;

    /// <summary>Whether what one end asks for holds in a neighbourhood wherever it holds.</summary>
    public bool IsOpen(EndRow end) => Decide(Levels(end), 0).IsOpen;

    /// <summary>What its strongest rank asks for at the least: "cubic ≤ 0".</summary>
    public string Leading(EndRow end)
    {
        foreach (var (coefficient, bound) in Levels(end))
        {
            if (coefficient.AsRational() is null)
                return SetCondition.Below(coefficient, bound, SetCondition.Always).Text;
            if (coefficient.AsRational() != bound)
                break;
        }

        return "";
    }

    private SetCondition InRange(Symbol parameter)
    {
        var range = expander.Scope.RangeOf(parameter);
        var result = SetCondition.Always;
        if (Exact(range.Lower) is { } lower)
            result = SetCondition.Both(result, SetCondition.Below(Polynomial.Of(parameter) * -1, -lower, SetCondition.Never));
        if (Exact(range.Upper) is { } upper)
            result = SetCondition.Both(result, SetCondition.Below(Polynomial.Of(parameter), upper, SetCondition.Never));
        return result;
    }

    private static Rational? Exact(double bound) => double.IsInfinity(bound) || double.IsNaN(bound)
        ? null
        : Rational.Parse(bound.ToString("R", System.Globalization.CultureInfo.InvariantCulture));

    private List<(Polynomial Coefficient, Rational Bound)> Levels(EndRow end)
    {
        var levels = new List<(Polynomial, Rational)>();
        var (log, logLog) = (Polynomial.Zero, Polynomial.Zero);
        foreach (var rank in end.Ranks)
        {
            var coefficient = EndAnalysis.Coefficient(rank.Weights.Append(rank.Constant).Select(expander.Expand).ToList(), naturals);
            if (rank.Kind == "Log")
                log = coefficient;
            else if (rank.Kind == "LogLog")
                logLog = coefficient;
            else if (AsymptoticTerm.Estimate(expander.Expand(rank.Order)) > 0)
                levels.Add((coefficient, Rational.Zero));
        }

        // ∫ xᶜ dx at an infinite end, ∫ d⁻ᶜ dd at a finite one; at the bound ∫ (log x)ᶜ dx/x is left.
        levels.Add((log, end.IsInfinite ? -1 : 1));
        levels.Add((logLog, -1));
        return levels;
    }

    private SetCondition Decide(List<(Polynomial Coefficient, Rational Bound)> levels, int at)
    {
        if (at == levels.Count)
            return SetCondition.Never;
        var (coefficient, bound) = levels[at];
        var excess = coefficient - Polynomial.Of(bound);
        if (excess.IsZero)
            return Decide(levels, at + 1);
        var range = expander.Scope.RangeOf(excess.ToSortedExpression());
        if (range.IsNegative)
            return SetCondition.Always;
        if (range.IsPositive)
            return SetCondition.Never;
        return SetCondition.Below(coefficient, bound, Decide(AtEquality(levels, at), at + 1));
    }

    // What the lower ranks are where this one meets its bound, if that fixes one parameter.
    private List<(Polynomial Coefficient, Rational Bound)> AtEquality(List<(Polynomial Coefficient, Rational Bound)> levels, int at)
    {
        var (coefficient, bound) = levels[at];
        var moving = coefficient.Where(t => !t.IsNumber);
        if (!moving.IsSingleTerm || moving.Terms[0].Factors.Count != 1 || moving.Terms[0].Factors[0] is not { Base: Symbol symbol, Exponent.IsOne: true })
            return levels;
        var constant = (coefficient - moving).AsRational() ?? Rational.Zero;
        var value = Formula.Of((bound - constant) / moving.Terms[0].Coefficient);
        return levels
            .Select((l, i) => i <= at ? l : (expander.Expand(l.Coefficient.ToExpression().Substitute(symbol.Kind, symbol.Name, value)), l.Bound))
            .ToList();
    }
}
