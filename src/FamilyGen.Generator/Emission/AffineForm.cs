using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Emission;

/// <summary>slope·x + intercept with both free of the observation.</summary>
internal sealed record AffineForm(Expression Slope, Expression Intercept, Expression Whole)
{
    private static readonly Expression s_zero = new Number(Rational.Zero);
    private static readonly Expression s_one = new Number(Rational.One);

    public bool IsObservation => Slope is Number { Value: var s } && s == Rational.One && Intercept is Number { Value.IsZero: true };

    public static AffineForm? Match(Expression e)
    {
        switch (e)
        {
            case Symbol { Kind: SymbolKind.Observation }:
                return new(s_one, s_zero, e);
            case Product p:
                var rest = p.Factors.Where(f => f is not Symbol { Kind: SymbolKind.Observation }).ToList();
                return rest.Count == p.Factors.Count - 1 && rest.All(IsFree)
                    ? new(rest.Count == 1 ? rest[0] : new Product(new(rest)), s_zero, e)
                    : null;
            case Sum s:
                var free = new List<Expression>();
                AffineForm? linear = null;
                foreach (var term in s.Terms)
                {
                    if (IsFree(term))
                        free.Add(term);
                    else if (linear is null && Match(term) is { } match)
                        linear = match;
                    else
                        return null;
                }

                return linear is null ? null
                    : new(linear.Slope, free.Count == 0 ? s_zero : free.Count == 1 ? free[0] : new Sum(new(free)), e);
            default:
                return null;
        }
    }

    /// <summary>Whether an expression does not mention the observation.</summary>
    public static bool IsFree(Expression e) => e switch
    {
        Number or Constant => true,
        Symbol s => s.Kind != SymbolKind.Observation,
        Sum s => s.Terms.All(IsFree),
        Product p => p.Factors.All(IsFree),
        Power p => IsFree(p.Base) && IsFree(p.Exponent),
        Call c => c.Arguments.All(IsFree),
        Opaque o => o.Arguments.All(IsFree),
        _ => false,
    };

    /// <summary>Whether the form vanishes at the given end of the support, on the side of the support positive.</summary>
    public bool VanishesAt(Expression? end, bool isLower)
    {
        if (end is null)
            return false;
        switch (Slope, Intercept, end)
        {
            case (Number k, Number c, Number e):
                return k.Value.Sign == (isLower ? 1 : -1) && (k.Value * e.Value) + c.Value == Rational.Zero;
            case (Number { Value: var k }, Product { Factors: var f }, Symbol known) when f.Count == 2:
                // x − known and known on the lower side.
                return k == Rational.One && isLower && f[0] is Number { Value: var m } && m == -Rational.One && f[1].Equals(known);
            case (Number { Value: var k }, Symbol c, Symbol known):
                return k == -Rational.One && !isLower && c.Equals(known);
            default:
                return false;
        }
    }
}
