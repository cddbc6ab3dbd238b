using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>Conditionals: conditions brought to a plain form, branches split into pieces.</summary>
internal sealed partial class Expander
{
    private const int MostLifts = 64;

    private int _lifts;

    /// <summary>The condition with comparisons solved for the observation where they are affine in it, and decided where the
    /// support decides them.</summary>
    public Condition Simplify(Condition condition) => condition switch
    {
        Comparison comparison => Simplify(comparison),
        Not not => Conditions.Not(Simplify(not.Operand)),
        And and => Conditions.And(Simplify(and.Left), Simplify(and.Right)),
        Or or => Conditions.Or(Simplify(or.Left), Simplify(or.Right)),
        _ => condition,
    };

    private Condition Simplify(Comparison comparison)
    {
        var (left, right) = (Expand(comparison.Left), Expand(comparison.Right));
        var difference = left - right;
        var expression = difference.ToSortedExpression();
        var range = Scope.RangeOf(expression);
        var decided = comparison.Relation switch
        {
            Relation.Less => range.IsNegative ? true : range.IsNonNegative ? false : (bool?)null,
            Relation.LessOrEqual => range.IsNonPositive ? true : range.IsPositive ? false : null,
            _ => difference.IsZero ? true : range.IsPositive || range.IsNegative ? false : null,
        };
        if (decided is { } value)
            return new Always(value) { Origin = comparison.Origin };

        if (Affine.In(expression, Scope.Observation.Name) is { } affine && Expand(affine.Slope) is { IsZero: false } slope)
        {
            var slopeRange = Scope.RangeOf(affine.Slope);
            if (slopeRange.IsPositive || slopeRange.IsNegative || comparison.Relation == Relation.Equal)
            {
                Expression x = Scope.Observation;
                var root = Sorted(affine.Root());
                return slopeRange.IsNegative && comparison.Relation != Relation.Equal
                    ? new Comparison(comparison.Relation, root, x) { Origin = comparison.Origin }
                    : new Comparison(comparison.Relation, x, root) { Origin = comparison.Origin };
            }
        }

        return new Comparison(comparison.Relation, left.ToSortedExpression(), right.ToSortedExpression()) { Origin = comparison.Origin };
    }

    private Polynomial OfConditional(Conditional conditional)
    {
        var condition = Simplify(conditional.Condition);
        if (condition is Always always)
            return Expand(always.Value ? conditional.WhenTrue : conditional.WhenFalse);
        var (whenTrue, whenFalse) = (Expand(conditional.WhenTrue), Expand(conditional.WhenFalse));
        if (Polynomial.Same(whenTrue, whenFalse))
            return whenTrue;
        var dependence = Dependences.Of(condition);
        if (dependence.Ties())
            return Moving(condition, conditional, whenTrue, whenFalse);
        if (whenTrue.IsNegativeInfinity || whenFalse.IsNegativeInfinity)
        {
            var finite = whenTrue.IsNegativeInfinity ? whenFalse : whenTrue;
            if (!dependence.HasObservation())
                return finite;
            var where = whenTrue.IsNegativeInfinity ? condition : Conditions.Not(condition);
            return finite + Polynomial.Of(new Conditional(where, Formula.NegativeInfinity, Formula.Zero) { Origin = conditional.Origin }, conditional.Origin);
        }

        return dependence.HasObservation() && !whenTrue.Dependence.HasParameter() && !whenFalse.Dependence.HasParameter()
            ? Whole(condition, conditional, whenTrue, whenFalse)
            : Pieces(condition, conditional, whenTrue, whenFalse);
    }

    // The place where the function changes moves with a parameter.
    private Polynomial Moving(Condition condition, Conditional conditional, Polynomial whenTrue, Polynomial whenFalse)
    {
        if (Conditions.Comparisons(condition).FirstOrDefault(c => Dependences.Of(c).Ties()) is { } tied)
            condition = tied;
        var origin = condition.Origin >= 0 ? condition.Origin : conditional.Origin;
        var names = condition.Operands().SelectMany(e => Dependences.Names(e, SymbolKind.Parameter)).Distinct().ToList();
        var text = Rendering.Text(condition);
        if (HasNoMassSomewhere(whenTrue) || HasNoMassSomewhere(whenFalse))
        {
            var path = Rendering.Text(HasNoMassSomewhere(whenTrue) ? condition : Conditions.Not(condition)) + " → −∞";
            _findings.Add(new Finding("FG0101", origin, EquatableArray.Of(string.Join(", ", names), path)));
            return whenTrue.IsNegativeInfinity ? whenFalse : whenTrue;
        }

        _findings.Add(new Finding("FG0501", origin, EquatableArray.Of(text, Scope.Observation.Name, string.Join(", ", names), Hints.Declare(names))));
        return whenTrue;
    }

    private static bool HasNoMassSomewhere(Polynomial branch) =>
        branch.Terms.Any(t => t.Factors.Any(f => Dependences.Parts(f.Base).Any(p => p.IsNegativeInfinity())));

    // A piecewise function free of parameters is one function of x; constants are brought to an indicator.
    private static Polynomial Whole(Condition condition, Conditional conditional, Polynomial whenTrue, Polynomial whenFalse)
    {
        if (whenFalse.AsRational() is { } low && whenTrue.AsRational() is { } high)
            return Polynomial.Of(low) + (Indicator(condition, conditional.Origin) * (high - low));
        if (whenFalse.IsZero && whenTrue.IsSingleTerm)
            return whenTrue * Indicator(condition, conditional.Origin).Terms[0];
        if (whenTrue.IsZero && whenFalse.IsSingleTerm)
            return whenFalse * Indicator(Conditions.Not(condition), conditional.Origin).Terms[0];
        return Polynomial.Of(
            new Conditional(condition, whenTrue.ToExpression(), whenFalse.ToExpression()) { Origin = conditional.Origin }, conditional.Origin);
    }

    // Each branch times its indicator. Of the constants of the two branches the second goes before, since the indicators sum
    // to one: only their difference tells the branches apart.
    private static Polynomial Pieces(Condition condition, Conditional conditional, Polynomial whenTrue, Polynomial whenFalse)
    {
        var (allTrue, allFalse) = (whenTrue, whenFalse);
        var common = whenTrue.Where(t => whenFalse.Terms.Any(u => Term.CompareFactors(t, u) == 0 && t.Coefficient == u.Coefficient) && !HasCompany(t));
        whenTrue -= common;
        whenFalse -= common;
        var constantTrue = whenTrue.Where(t => !t.Dependence.HasObservation());
        var constantFalse = whenFalse.Where(t => !t.Dependence.HasObservation());
        if (!constantTrue.IsZero && !constantFalse.IsZero)
        {
            common += constantFalse;
            whenTrue -= constantFalse;
            whenFalse -= constantFalse;
        }

        var here = Indicator(condition, conditional.Origin).Terms[0];
        var there = Indicator(Conditions.Not(condition), conditional.Origin).Terms[0];
        return (whenTrue * here) + (whenFalse * there) + common;

        // The −log x of (shape − 1)·log x stays with shape, so that the coefficient is the one that was written.
        bool HasCompany(Term term) => allTrue.Terms.Concat(allFalse.Terms).Any(t =>
            Term.CompareFactors(t, term) != 0 && Term.CompareFactors(t.Keep(f => f.Dependence.HasObservation()), term.Keep(f => f.Dependence.HasObservation())) == 0);
    }

    private static Polynomial Indicator(Condition condition, int origin) =>
        Polynomial.Of(Formula.Indicator(condition) with { Origin = origin }, origin);

    // f(c ? a : b) is c ? f(a) : f(b).
    private Expression? Lifted(Expression function)
    {
        var arguments = function is Power power ? Dependences.Parts(power.Base).Concat(Dependences.Parts(power.Exponent)) : function.Children().SelectMany(Dependences.Parts);
        Expression? branching = arguments.OfType<Conditional>().FirstOrDefault();
        branching ??= arguments.OfType<Call>().FirstOrDefault(IsMovingExtreme);
        if (branching is null || ++_lifts > MostLifts)
            return null;
        var conditional = branching as Conditional ?? AsConditional((Call)branching, branching.Children().First(), branching.Children().Last());
        return new Conditional(
            conditional.Condition,
            function.Rewrite(e => IsThis(e) ? conditional.WhenTrue : null),
            function.Rewrite(e => IsThis(e) ? conditional.WhenFalse : null)) { Origin = conditional.Origin };

        bool IsThis(Expression e) => ReferenceEquals(e, branching) || StructuralOrder.Same(e, branching);
    }

    // Log(Max(0, x − t)): a support that moves, in disguise.
    private static bool IsMovingExtreme(Call call) =>
        call.Function is Function.Min or Function.Max && call.Arguments.Count == 2 && Dependences.Of(call).Ties();
}
