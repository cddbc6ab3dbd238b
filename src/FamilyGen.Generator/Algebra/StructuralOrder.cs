using System;
using System.Collections.Generic;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>A total order of formulas by what they say: origins do not count. Numbers come first, then known values,
/// parameters, the observation, and what is built from them, so that a sorted product reads 2·claims·shape·log x.</summary>
internal sealed class StructuralOrder : IComparer<Expression>, IEqualityComparer<Expression>
{
    public static StructuralOrder Instance { get; } = new();

    public static bool Same(Expression a, Expression b) => Instance.Compare(a, b) == 0;

    public static bool Same(Condition a, Condition b) => Compare(a, b) == 0;

    public bool Equals(Expression? a, Expression? b) => a is null ? b is null : b is not null && Compare(a, b) == 0;

    public int Compare(Expression? a, Expression? b)
    {
        if (ReferenceEquals(a, b))
            return 0;
        var rank = Rank(a!).CompareTo(Rank(b!));
        if (rank != 0)
            return rank;
        switch (a)
        {
            case Number number:
                return number.Value.CompareTo(((Number)b!).Value);
            case Constant constant:
                return constant.Value.CompareTo(((Constant)b!).Value);
            case Symbol symbol:
                return string.CompareOrdinal(symbol.Name, ((Symbol)b!).Name);
            case Power power:
                var other = (Power)b!;
                var byBase = Compare(power.Base, other.Base);
                return byBase != 0 ? byBase : Compare(power.Exponent, other.Exponent);
            case Call call:
                var otherCall = (Call)b!;
                return call.Function != otherCall.Function
                    ? call.Function.CompareTo(otherCall.Function)
                    : CompareAll(call.Arguments, otherCall.Arguments);
            case Product product:
                return CompareAll(product.Factors, ((Product)b!).Factors);
            case Sum sum:
                return CompareAll(sum.Terms, ((Sum)b!).Terms);
            case Opaque opaque:
                var byName = string.CompareOrdinal(opaque.Text, ((Opaque)b!).Text);
                return byName != 0 ? byName : CompareAll(opaque.Arguments, ((Opaque)b!).Arguments);
            case Conditional conditional:
                var second = (Conditional)b!;
                var byCondition = Compare(conditional.Condition, second.Condition);
                if (byCondition != 0)
                    return byCondition;
                var byTrue = Compare(conditional.WhenTrue, second.WhenTrue);
                return byTrue != 0 ? byTrue : Compare(conditional.WhenFalse, second.WhenFalse);
            default:
                throw new ArgumentException("Unknown formula.", nameof(a));
        }
    }

    public int GetHashCode(Expression expression) => unchecked(expression switch
    {
        Number number => number.Value.GetHashCode(),
        Constant constant => constant.Value.GetHashCode() * 3,
        Symbol symbol => StringComparer.Ordinal.GetHashCode(symbol.Name) * 5,
        Power power => (GetHashCode(power.Base) * 31) + (GetHashCode(power.Exponent) * 7),
        Call call => HashAll((int)call.Function + 101, call.Arguments),
        Product product => HashAll(211, product.Factors),
        Sum sum => HashAll(307, sum.Terms),
        Opaque opaque => HashAll(StringComparer.Ordinal.GetHashCode(opaque.Text), opaque.Arguments),
        Conditional conditional => (GetHashCode(conditional.WhenTrue) * 17) + (GetHashCode(conditional.WhenFalse) * 29) + 401,
        _ => 0,
    });

    public static int Compare(Condition a, Condition b)
    {
        if (ReferenceEquals(a, b))
            return 0;
        var rank = Rank(a).CompareTo(Rank(b));
        if (rank != 0)
            return rank;
        switch (a)
        {
            case Comparison comparison:
                var other = (Comparison)b;
                if (comparison.Relation != other.Relation)
                    return comparison.Relation.CompareTo(other.Relation);
                var left = Instance.Compare(comparison.Left, other.Left);
                return left != 0 ? left : Instance.Compare(comparison.Right, other.Right);
            case Not not:
                return Compare(not.Operand, ((Not)b).Operand);
            case And and:
                var first = Compare(and.Left, ((And)b).Left);
                return first != 0 ? first : Compare(and.Right, ((And)b).Right);
            case Or or:
                var second = Compare(or.Left, ((Or)b).Left);
                return second != 0 ? second : Compare(or.Right, ((Or)b).Right);
            default:
                return ((Always)a).Value.CompareTo(((Always)b).Value);
        }
    }

    private static int CompareAll(EquatableArray<Expression> a, EquatableArray<Expression> b)
    {
        for (var i = 0; i < a.Count && i < b.Count; i++)
        {
            var order = Instance.Compare(a[i], b[i]);
            if (order != 0)
                return order;
        }

        return a.Count.CompareTo(b.Count);
    }

    private int HashAll(int seed, EquatableArray<Expression> items)
    {
        var hash = seed;
        foreach (var item in items)
            hash = unchecked((hash * 31) + GetHashCode(item));
        return hash;
    }

    private static int Rank(Expression expression) => expression switch
    {
        Number => 0,
        Constant => 1,
        Symbol { Kind: SymbolKind.Known } => 2,
        Symbol { Kind: SymbolKind.Parameter } => 3,
        Symbol { Kind: SymbolKind.Natural } => 4,
        Symbol => 5,
        Power => 6,
        Call => 7,
        Sum => 8,
        Product => 9,
        Opaque => 10,
        _ => 11,
    };

    private static int Rank(Condition condition) => condition switch
    {
        Comparison => 0,
        Not => 1,
        And => 2,
        Or => 3,
        _ => 4,
    };
}
