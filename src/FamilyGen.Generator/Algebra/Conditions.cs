using System;
using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>Conditions in a form in which equal ones look equal, and their conjunction with contradictions and
/// implications between comparisons of one quantity with numbers taken out.</summary>
internal static class Conditions
{
    public static Condition Not(Condition condition) => condition switch
    {
        Comparison { Relation: Relation.Less } c => new Comparison(Relation.LessOrEqual, c.Right, c.Left) { Origin = c.Origin },
        Comparison { Relation: Relation.LessOrEqual } c => new Comparison(Relation.Less, c.Right, c.Left) { Origin = c.Origin },
        Not not => not.Operand,
        And and => Or(Not(and.Left), Not(and.Right)),
        Or or => And(Not(or.Left), Not(or.Right)),
        Always always => new Always(!always.Value) { Origin = always.Origin },
        _ => new Not(condition) { Origin = condition.Origin },
    };

    public static Condition Or(Condition a, Condition b)
    {
        if (a is Always left)
            return left.Value ? a : b;
        if (b is Always right)
            return right.Value ? b : a;
        if (StructuralOrder.Same(a, b))
            return a;
        return StructuralOrder.Same(a, Not(b)) ? new Always(true) : new Or(a, b) { Origin = a.Origin };
    }

    public static Condition And(Condition a, Condition b)
    {
        var parts = new List<Condition>();
        foreach (var part in Conjuncts(a).Concat(Conjuncts(b)))
        {
            if (!Add(parts, part))
                return new Always(false);
        }

        parts.Sort(StructuralOrder.Compare);
        return parts.Count == 0 ? new Always(true) : parts.Aggregate((l, r) => new And(l, r) { Origin = l.Origin });
    }

    public static IEnumerable<Condition> Conjuncts(Condition condition) =>
        condition is And and ? Conjuncts(and.Left).Concat(Conjuncts(and.Right)) : new[] { condition };

    /// <summary>Every comparison in a condition.</summary>
    public static IEnumerable<Comparison> Comparisons(Condition condition) => condition switch
    {
        Comparison comparison => new[] { comparison },
        Not not => Comparisons(not.Operand),
        And and => Comparisons(and.Left).Concat(Comparisons(and.Right)),
        Or or => Comparisons(or.Left).Concat(Comparisons(or.Right)),
        _ => Enumerable.Empty<Comparison>(),
    };

    /// <summary>Every condition on which a formula branches, from the outside in.</summary>
    public static IEnumerable<Condition> In(Expression expression) =>
        Dependences.Parts(expression).OfType<Conditional>().Select(c => c.Condition);

    // False when the part contradicts what is there.
    private static bool Add(List<Condition> parts, Condition part)
    {
        if (part is Always always)
            return always.Value;
        for (var i = 0; i < parts.Count; i++)
        {
            if (StructuralOrder.Same(parts[i], part))
                return true;
            if (StructuralOrder.Same(parts[i], Not(part)))
                return false;
            if (Excluded(part) is { } excluded && Limit.Of(parts[i]) is { } limit && StructuralOrder.Same(limit.Quantity, excluded.Quantity))
            {
                // x = 1 says that x ≠ 0.
                if (Limit.Exclude(limit, excluded))
                    return true;
                continue;
            }

            if (Excluded(parts[i]) is { } gone && Limit.Of(part) is { } next && StructuralOrder.Same(next.Quantity, gone.Quantity) && Limit.Exclude(next, gone))
            {
                parts.RemoveAt(i);
                return Add(parts, part);
            }

            if (Limit.Of(parts[i]) is not { } old || Limit.Of(part) is not { } added || !StructuralOrder.Same(old.Quantity, added.Quantity))
                continue;
            if (Limit.Exclude(old, added))
                return false;
            if (old.Implies(added))
                return true;
            if (added.Implies(old))
            {
                parts.RemoveAt(i);
                return Add(parts, part);
            }
        }

        parts.Add(part);
        return true;
    }

    // The point that a ≠ leaves out.
    private static Limit? Excluded(Condition condition) =>
        condition is Not { Operand: Comparison { Relation: Relation.Equal } equal } ? Limit.Of(equal) : null;

    // quantity < number, quantity ≤ number, quantity > number …, as the interval it leaves.
    private readonly record struct Limit(Expression Quantity, double Lower, bool LowerOpen, double Upper, bool UpperOpen)
    {
        public static Limit? Of(Condition condition)
        {
            if (condition is not Comparison comparison)
                return null;
            var open = comparison.Relation == Relation.Less;
            var equal = comparison.Relation == Relation.Equal;
            if (Value(comparison.Right) is { } right)
                return new Limit(comparison.Left, equal ? right : double.NegativeInfinity, !equal, right, open);
            if (Value(comparison.Left) is { } left)
                return new Limit(comparison.Right, left, open, equal ? left : double.PositiveInfinity, !equal);
            return null;
        }

        public static bool Exclude(Limit a, Limit b) => a.EndsBefore(b) || b.EndsBefore(a);

        public bool Implies(Limit other) =>
            (Lower > other.Lower || (Lower == other.Lower && (LowerOpen || !other.LowerOpen)))
            && (Upper < other.Upper || (Upper == other.Upper && (UpperOpen || !other.UpperOpen)));

        private bool EndsBefore(Limit other) => Upper < other.Lower || (Upper == other.Lower && (UpperOpen || other.LowerOpen));

        private static double? Value(Expression expression) => expression switch
        {
            Number number => number.Value.ToDouble(),
            Constant constant => constant.Value,
            _ => null,
        };
    }
}
