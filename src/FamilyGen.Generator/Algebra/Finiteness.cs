using System;
using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>A formula that is not finite at an observation, and the part of it that is to blame.</summary>
/// <param name="At">The observation.</param>
/// <param name="Part">The innermost part that is not finite.</param>
/// <param name="Reason">Why: "log(hours) is the logarithm of −1".</param>
/// <param name="Origin">Where the part stands in the source; −1 where the algebra made it.</param>
internal sealed record NotFinite(Witness At, Expression Part, string Reason, int Origin);

/// <summary>Looks for observations that can occur and at which a formula is certainly not finite.</summary>
internal sealed class Finiteness(EffectiveSupport support, string observation)
{
    private readonly SupportSearch _search = new(support);

    /// <summary>Looks for such an observation. A logarithm of a measure may be −∞.</summary>
    public NotFinite? Find(Expression formula, bool mayBeNegativeInfinity = false)
    {
        var ignored = mayBeNegativeInfinity ? Beyond.NegativeInfinity : Beyond.None;
        Crossing? crossing = null;
        var found = _search.Find(
            SpecialPoints.Of(new[] { formula }, observation),
            x => (support.Evaluator.Of(formula, x).Beyond & ~ignored) != 0,
            x => support.In(x) == Presence.In && IsBad(support.Evaluator.Of(formula, x)),
            (lower, upper) => (crossing = mayBeNegativeInfinity ? null : Vanishing(formula, lower, upper))?.At);
        if (found is not { } witness)
            return null;
        return crossing is { } root && !witness.IsExact
            ? Describe(witness, root.Part, root.Origin, Rational.Zero)
            : Blame(formula, witness);

        bool IsBad(Enclosure value) => value.IsNeverFinite && (value.Beyond & ~ignored) == value.Beyond;
    }

    /// <summary>The part that is to blame for a formula that is not finite at a point; null where it may be finite there.</summary>
    public NotFinite? Blame(Expression formula, Witness at)
    {
        var evaluator = support.Evaluator;
        var x = Enclosure.Of(at.Point);
        if (!evaluator.Of(formula, x).IsNeverFinite)
            return null;
        var origin = formula.Origin;
        var part = formula;
        while (Next(part) is { } inner)
        {
            part = inner;
            origin = part.Origin >= 0 ? part.Origin : origin;
        }

        return Describe(at, part, origin, part switch
        {
            Call call => evaluator.Of(call.Arguments[call.Function is Function.Remainder or Function.IntegerQuotient ? 1 : 0], x).Exact,
            Power power => evaluator.Of(power.Base, x).Exact,
            _ => null,
        });

        Expression? Next(Expression e) => e is Conditional conditional
            ? evaluator.Holds(conditional.Condition, x) switch { true => conditional.WhenTrue, false => conditional.WhenFalse, _ => null }
            : e.Children().FirstOrDefault(c => evaluator.Of(c, x).IsNeverFinite);
    }

    private static NotFinite Describe(Witness at, Expression part, int origin, Rational? argument)
    {
        var value = argument is { } exact ? Rendering.Number(exact) : "a negative number";
        var text = Rendering.Text(part);
        var reason = part switch
        {
            Call { Function: Function.Log } => $"{text} is the logarithm of {value}",
            Call { Function: Function.LogGamma or Function.Digamma } => $"{text} has a pole there",
            Call { Function: Function.Remainder or Function.IntegerQuotient } => $"{text} divides by 0",
            Power { Exponent: Number { Value.IsInteger: true } } => $"{text} divides by 0",
            Power when argument is { IsZero: true } => $"{text} divides by 0",
            Power => $"{text} is a root of {value}",
            Constant { Value: var v } when double.IsNaN(v) => "it is not a number there",
            Constant { Value: > 0 } => "it is ∞ there",
            Constant => "it is −∞ there",
            _ => $"{text} has no finite value there",
        };
        return new NotFinite(at, part, reason, origin);
    }

    // A denominator, or the argument of a logarithm, that is continuous over a range of observations which can all occur
    // and has opposite signs at its ends: somewhere between it vanishes.
    private Crossing? Vanishing(Expression formula, double lower, double upper)
    {
        var range = Enclosure.Between(lower, upper);
        if (support.IsLattice || double.IsInfinity(lower) || double.IsInfinity(upper) || support.In(range) != Presence.In)
            return null;
        foreach (var (part, argument, origin) in Reached(formula, range, formula.Origin))
        {
            var value = support.Evaluator.Of(argument, range);
            if (value.IsFinite && value.IsContinuous && Root(argument, lower, upper) is { } root)
                return new Crossing(root, part, origin);
        }

        return null;
    }

    private IEnumerable<(Expression Part, Expression Argument, int Origin)> Reached(Expression formula, Enclosure range, int origin)
    {
        if (formula.Origin >= 0)
            origin = formula.Origin;
        if (formula is Conditional conditional)
        {
            return support.Evaluator.Holds(conditional.Condition, range) is { } holds
                ? Reached(holds ? conditional.WhenTrue : conditional.WhenFalse, range, origin)
                : Array.Empty<(Expression, Expression, int)>();
        }

        var inner = formula.Children().SelectMany(c => Reached(c, range, origin));
        return formula switch
        {
            Power { Exponent: Number { Value.Sign: < 0 } } power => inner.Append((power, power.Base, origin)),
            Call { Function: Function.Log } log => inner.Append((log, log.Arguments[0], origin)),
            _ => inner,
        };
    }

    private double? Root(Expression argument, double lower, double upper)
    {
        int? Sign(double x)
        {
            var value = support.Evaluator.Of(argument, Enclosure.Of(Doubles.ToRational(x)));
            return value.IsPositive ? 1 : value.IsNegative ? -1 : null;
        }

        if (Sign(lower) is not { } first || Sign(upper) is not { } last || first == last)
            return null;
        for (var i = 0; i < 60; i++)
        {
            var middle = lower + ((upper - lower) / 2);
            if (middle <= lower || middle >= upper || Sign(middle) is not { } sign)
                return middle;
            if (sign == first)
                lower = middle;
            else
                upper = middle;
        }

        return lower;
    }

    private sealed record Crossing(double At, Expression Part, int Origin);
}
