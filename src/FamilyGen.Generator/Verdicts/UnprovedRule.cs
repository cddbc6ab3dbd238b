using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>FG0403: something stands in the way of a proof that the normalizer is finite and the exponent smooth between known
/// points.</summary>
internal static class UnprovedRule
{
    private const string Finiteness = "that the normalizer is finite";
    private const string Smoothness = "that every mode of the density is found";

    public static IEnumerable<Finding> Find(FamilyDeclaration declaration, NormalForm form)
    {
        var opaque = Bodies(declaration).SelectMany(Dependences.Parts).OfType<Opaque>().Where(o => Dependences.Of(o).HasObservation()).ToList();
        if (opaque.Count > 0)
            return opaque.Select(o => Report(o.Origin, OpaqueCall(o), Finiteness, "write its formula here, or in a static method of this assembly")).Distinct();
        return declaration.Support.Predicate is { } predicate && form.IsOpaque && IsSparse(declaration, predicate)
            ? [Report(predicate.Origin, "which counts this condition allows follows no pattern of residues and ranges", "how fast the sum over them converges", "use comparisons and remainders (%), or list few counts")]
            : OfFunctions(declaration, form);
    }

    private static IEnumerable<Finding> OfFunctions(FamilyDeclaration declaration, NormalForm form)
    {
        if (!form.IsOpaque && form.Ends.All(e => e.IsVerified))
            yield break;
        var none = new AtomSum(EquatableArray<WeightedAtom>.Empty);
        foreach (var (sum, origin) in Functions(declaration, form))
        {
            var alone = new SupportShape(declaration, new Expander(new Scope(declaration)), [new Statistic("T", "t", sum, null)], none);
            var text = Rendering.Text(sum);
            if (alone.Ends.FirstOrDefault(e => !e.IsVerified) is { } end)
            {
                var waves = sum.Terms.SelectMany(t => Dependences.Parts(t.Atom)).Any(p => p is Call { Function: Function.Sin or Function.Cos });
                if (!waves && DependsOnKnown(declaration, sum))
                    continue;
                yield return Report(
                    origin,
                    waves ? $"'{text}' oscillates without bound as {end.Where}" : $"how '{text}' grows as {end.Where} is beyond the known scale of growth",
                    Finiteness,
                    waves ? "damp the oscillation, or bound the support" : "write it with powers, logarithms and exponentials, or bound the support");
            }
            else if (alone.Breakpoints.IsOpaque)
            {
                yield return Report(origin, $"'{text}' breaks at points that cannot be listed", Smoothness, "write it with comparisons at known points, or use counts and %");
            }
        }
    }

    private static bool DependsOnKnown(FamilyDeclaration declaration, AtomSum sum) =>
        declaration.Known.Count > 0 && sum.Terms.Any(t => Dependences.Names(t.Atom, SymbolKind.Known).Count > 0);

    private static bool IsSparse(FamilyDeclaration declaration, Condition predicate) =>
        Breakpoints.Of([], predicate, new Scope(declaration)).IsOpaque;

    private static IEnumerable<(AtomSum Sum, int Origin)> Functions(FamilyDeclaration declaration, NormalForm form)
    {
        for (var i = 0; i < form.Statistics.Count; i++)
        {
            var body = form.Statistics[i].Body;
            yield return (body, declaration.IsTrade ? KernelPlace.Of(declaration, body) : declaration.Statistics[i].Body.Origin);
        }

        if (form.LogBase.Terms.Count > 0)
            yield return (form.LogBase, declaration.IsTrade ? KernelPlace.Of(declaration, form.LogBase) : declaration.BaseMeasure?.Body.Origin ?? -1);
    }

    private static IEnumerable<Expression> Bodies(FamilyDeclaration declaration)
    {
        var bodies = declaration.Statistics.Select(s => s.Body);
        if (declaration.Kernel is { } kernel)
            bodies = bodies.Append(kernel);
        if (declaration.BaseMeasure is { } measure)
            bodies = bodies.Append(measure.Body);
        return declaration.Support.Predicate is { } predicate ? bodies.Concat(predicate.Operands()) : bodies;
    }

    private static string OpaqueCall(Opaque opaque)
    {
        var name = opaque.Text.Split('(')[0].Split('.').Last().TrimStart('@');
        return opaque.Text.StartsWith("(double)(float)", System.StringComparison.Ordinal)
            ? "the conversion to float drops digits"
            : $"nothing is known about '{(name.Length > 0 ? name : Rendering.Text(opaque))}'";
    }

    private static Finding Report(int origin, string what, string unproved, string mend) =>
        new(DiagnosticIds.Unproved, origin, EquatableArray.Of(char.ToUpperInvariant(what[0]) + what.Substring(1), unproved, mend));
}
