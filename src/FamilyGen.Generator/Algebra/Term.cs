using System.Collections.Generic;
using System.Linq;
using System.Numerics;

namespace FamilyGen.Generator.Algebra;

/// <summary>base^exponent inside a term. The base is irreducible: a symbol, a known function, a sum that does not factor,
/// an indicator; e^… is the base e. The origin leads to the power or function that made it.</summary>
internal sealed class Factor(Expression @base, Polynomial exponent, int origin)
{
    public Expression Base { get; } = @base;

    public Polynomial Exponent { get; } = exponent;

    public int Origin { get; } = origin;

    public Dependence Dependence { get; } = Dependences.Of(@base) | exponent.Dependence;

    public bool IsIndicator => Base.IsIndicator();

    public Expression ToExpression()
    {
        if (Base is Constant { Text: "e" })
            return new Call(Function.Exp, Model.EquatableArray.Of(Exponent.ToSortedExpression())) { Origin = Origin };
        return Exponent.IsOne ? Base : new Power(Base, Exponent.ToSortedExpression()) { Origin = Origin };
    }
}

/// <summary>A rational number times powers of irreducible factors, which are sorted and distinct.</summary>
internal sealed class Term
{
    private Term(Rational coefficient, IReadOnlyList<Factor> factors)
    {
        Coefficient = coefficient;
        Factors = factors;
        Dependence = factors.Aggregate(Dependence.None, (all, f) => all | f.Dependence);
    }

    public Rational Coefficient { get; }

    public IReadOnlyList<Factor> Factors { get; }

    public Dependence Dependence { get; }

    public bool IsNumber => Factors.Count == 0;

    public static Term Of(Rational value) => new(value, System.Array.Empty<Factor>());

    public static Term Of(Expression @base, Polynomial exponent, int origin) => Of(Rational.One, new[] { new Factor(@base, exponent, origin) })!;

    public static Term Of(Expression @base, int origin) => Of(@base, Polynomial.One, origin);

    public Term WithCoefficient(Rational coefficient) => new(coefficient, Factors);

    /// <summary>The same term without some of its factors, and with coefficient 1.</summary>
    public Term Keep(System.Func<Factor, bool> which) => new(Rational.One, Factors.Where(which).ToList());

    /// <summary>The term with a factor more, which may have a base that is there already: only for splitting a power
    /// into the part with x and the part with parameters.</summary>
    public Term With(Factor factor)
    {
        var factors = Factors.Concat(new[] { factor }).ToList();
        factors.Sort((f, g) => StructuralOrder.Instance.Compare(f.Base, g.Base) is var order && order != 0 ? order : Polynomial.Compare(f.Exponent, g.Exponent));
        return new Term(Coefficient, factors);
    }

    /// <summary>The product, or null when it is zero: indicators of conditions that exclude each other.</summary>
    public static Term? Multiply(Term a, Term b) =>
        b.IsNumber ? a.WithCoefficient(a.Coefficient * b.Coefficient)
        : a.IsNumber ? b.WithCoefficient(a.Coefficient * b.Coefficient)
        : Of(a.Coefficient * b.Coefficient, a.Factors.Concat(b.Factors));

    /// <summary>Collects equal bases.</summary>
    public static Term? Of(Rational coefficient, IEnumerable<Factor> factors)
    {
        var collected = new List<Factor>();
        Condition? condition = null;
        var conditionOrigin = -1;
        foreach (var factor in factors)
        {
            if (factor.IsIndicator)
            {
                var own = ((Conditional)factor.Base).Condition;
                condition = condition is null ? own : Conditions.And(condition, own);
                conditionOrigin = conditionOrigin < 0 ? factor.Base.Origin : conditionOrigin;
                continue;
            }

            var index = collected.FindIndex(f => StructuralOrder.Same(f.Base, factor.Base));
            if (index < 0)
                collected.Add(factor);
            else
                collected[index] = Join(collected[index], factor);
        }

        if (condition is Always always)
        {
            if (!always.Value)
                return null;
        }
        else if (condition is not null)
        {
            collected.Add(new Factor(Formula.Indicator(condition) with { Origin = conditionOrigin }, Polynomial.One, conditionOrigin));
        }

        var kept = new List<Factor>();
        foreach (var factor in collected)
        {
            if (factor.Exponent.IsZero)
                continue;
            if (factor.Base is Number number && factor.Exponent.AsRational() is { } exponent)
                coefficient *= Whole(number.Value, exponent, factor, kept);
            else
                kept.Add(factor);
        }

        if (coefficient.IsZero)
            return null;
        kept.Sort((f, g) => StructuralOrder.Instance.Compare(f.Base, g.Base));
        return new Term(coefficient, kept);
    }

    public Expression ToExpression()
    {
        var parts = new List<Expression>();
        Condition? condition = null;
        var origin = -1;
        foreach (var factor in Factors)
        {
            if (factor.IsIndicator)
            {
                condition = ((Conditional)factor.Base).Condition;
                origin = factor.Base.Origin;
            }
            else
            {
                parts.Add(factor.ToExpression());
            }
        }

        if (parts.Count == 0 || Coefficient != Rational.One)
            parts.Insert(0, Formula.Of(Coefficient));
        var product = parts.Count == 1 ? parts[0] : Formula.Product(parts.ToArray());
        return condition is null ? product : new Conditional(condition, product, Formula.Zero) { Origin = origin };
    }

    /// <summary>Compares the factors alone.</summary>
    public static int CompareFactors(Term a, Term b)
    {
        for (var i = 0; i < a.Factors.Count && i < b.Factors.Count; i++)
        {
            var order = StructuralOrder.Instance.Compare(a.Factors[i].Base, b.Factors[i].Base);
            if (order == 0)
                order = Polynomial.Compare(b.Factors[i].Exponent, a.Factors[i].Exponent);
            if (order != 0)
                return order;
        }

        return b.Factors.Count.CompareTo(a.Factors.Count);
    }

    /// <summary>The order in which terms are written: higher powers of x first, then what is free of x.</summary>
    public static int CompareInSum(Term a, Term b)
    {
        if (a.Dependence.HasObservation() != b.Dependence.HasObservation())
            return a.Dependence.HasObservation() ? -1 : 1;
        var byObservation = a.Dependence.HasObservation()
            ? CompareFactors(a.Keep(f => f.Dependence.HasObservation()), b.Keep(f => f.Dependence.HasObservation()))
            : 0;
        return byObservation != 0 ? byObservation : CompareFactors(a, b);
    }

    private static Factor Join(Factor a, Factor b)
    {
        var origin = b.Exponent.Dependence > a.Exponent.Dependence ? b.Origin : a.Origin;
        return new Factor(a.Base, a.Exponent + b.Exponent, origin);
    }

    // value^exponent as a rational number; what is left of a root is added to the factors with an exponent in (0, 1).
    private static Rational Whole(Rational value, Rational exponent, Factor factor, List<Factor> rest)
    {
        var floor = BigInteger.Divide(exponent.Numerator, exponent.Denominator);
        if (exponent.Sign < 0 && !exponent.IsInteger)
            floor -= 1;
        if (Rationals.IsTooLarge(value, exponent) || (value.IsZero && floor.Sign < 0))
        {
            rest.Add(factor);
            return Rational.One;
        }

        var fraction = exponent - new Rational(floor, 1);
        if (!fraction.IsZero)
            rest.Add(new Factor(factor.Base, Polynomial.Of(fraction), factor.Origin));
        return Rationals.Power(value, (int)floor);
    }
}
