using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Emission;

/// <summary>The part of a normal form that signatures need, for a declaration that has none.</summary>
internal static class StubForm
{
    private static readonly AtomSum s_nothing = new(EquatableArray<WeightedAtom>.Empty);

    public static NormalForm Of(FamilyDeclaration declaration) => new(
        declaration.Statistics.Select(s => new Statistic(s.Name, s.Parameter, s_nothing, null)).ToEquatableArray(),
        s_nothing,
        EquatableArray<Expression>.Empty,
        new Number(Rational.One),
        false,
        false,
        false,
        EquatableArray<EndRow>.Empty,
        "",
        EquatableArray<Expression>.Empty,
        EquatableArray<double>.Empty,
        EquatableArray<double>.Empty);
}
