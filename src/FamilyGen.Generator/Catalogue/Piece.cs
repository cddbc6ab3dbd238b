using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Catalogue;

/// <summary>A piece of the support between two of its breakpoints, null where it reaches to infinity; on a lattice both ends
/// belong to it. The expander knows that x lies there.</summary>
internal sealed class Piece
{
    public Piece(FamilyDeclaration declaration, Expression? lower, Expression? upper)
    {
        (Declaration, Lower, Upper) = (declaration, lower, upper);
        var support = declaration.Support;
        Expander = new Expander(new Scope(declaration with
        {
            Support = support with
            {
                Lower = lower,
                Upper = upper,
                LowerIncluded = support.IsLattice,
                UpperIncluded = support.IsLattice,
                Masses = EquatableArray<Expression>.Empty,
                Predicate = null,
            },
        }));
    }

    public FamilyDeclaration Declaration { get; }

    public Expression? Lower { get; }

    public Expression? Upper { get; }

    public Expander Expander { get; }

    public Scope Scope => Expander.Scope;

    public string Observation => Declaration.ObservationName;

    /// <summary>The first and last integer of a finite piece of a lattice with known ends.</summary>
    public (long First, long Last)? Range =>
        Lower is Number { Value: { IsInteger: true } first } && Upper is Number { Value: { IsInteger: true } last }
        && Rationals.Abs(first) < Limit && Rationals.Abs(last) < Limit
            ? ((long)first.Numerator, (long)last.Numerator)
            : null;

    private static Rational Limit => 1_000_000_000_000_000L;

    /// <summary>A formula free of x, expanded.</summary>
    public Polynomial Value(Expression expression) => Expander.Expand(expression);

    /// <summary>Whether two formulas free of x are the same number.</summary>
    public bool Same(Expression a, Expression b) => (Value(a) - Value(b)).IsZero;
}
