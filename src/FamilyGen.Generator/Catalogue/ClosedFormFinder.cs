using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Catalogue;

/// <summary>Finds the closed form of a family's normalizer, if the catalogue has one: its atoms, up to an affine change of x
/// (on integers a shift or reflection) and an affine map of θ, are those of an entry, piece by piece of the support.</summary>
internal static class ClosedFormFinder
{
    // Kernels of more parameters keep to the numeric partition: the sum over pieces would not be faster.
    private const int MostParameters = 16;

    public static ClosedFormMatch? Find(FamilyDeclaration declaration, NormalForm form)
    {
        if (form.IsOpaque || !form.Period.IsOne() || form.Statistics.Count > MostParameters)
            return null;
        var functions = new FamilyFunctions(declaration, form);
        var laws = new LawParameters(declaration, form);
        return declaration.Support.IsLattice
            ? CountSupport.Find(functions, laws, form.Breakpoints)
            : LineSupport.Find(functions, laws, form.Breakpoints);
    }

    /// <summary>Breakpoints in ascending order; null where their order is not known.</summary>
    internal static IReadOnlyList<Expression>? InOrder(IEnumerable<Expression> breakpoints)
    {
        var points = breakpoints.ToList();
        if (points.Count < 2)
            return points;
        var values = points.Select(p => Evaluator.Evaluate(p, _ => double.NaN)).ToList();
        return values.Any(double.IsNaN) ? null : points.Select((p, i) => (p, values[i])).OrderBy(p => p.Item2).Select(p => p.p).ToList();
    }

    internal static EquatableArray<EquatableArray<Expression>> Rows(IEnumerable<AffineRow> rows) =>
        rows.Select(r => r.Entries().ToEquatableArray()).ToEquatableArray();
}
