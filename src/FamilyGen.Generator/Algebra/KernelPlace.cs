using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>Where in a kernel, as it was written, a function of the observation stands that the algebra took out of it.</summary>
internal static class KernelPlace
{
    /// <summary>The origin of the shortest summand of the kernel that has the function's last atom; the kernel's own where
    /// there is none.</summary>
    public static int Of(FamilyDeclaration declaration, AtomSum function)
    {
        var kernel = declaration.Kernel!;
        if (function.Terms.Count == 0)
            return kernel.Origin;
        var expander = new Expander(new Scope(declaration));
        var wanted = expander.Expand(function.Terms[function.Terms.Count - 1].Atom).Terms.Select(Part).ToList();
        var shortest = int.MaxValue;
        var place = kernel.Origin;
        foreach (var summand in Summands(kernel).Where(s => s.Origin >= 0))
        {
            var terms = expander.Expand(summand).Terms.Select(Part).ToList();
            if (terms.Count < shortest && wanted.All(w => terms.Any(t => Term.CompareFactors(t, w) == 0)))
                (shortest, place) = (terms.Count, summand.Origin);
        }

        return place;
    }

    private static Term Part(Term term) => term.Keep(f => f.Dependence.HasObservation());

    // The sums of a kernel taken apart, with their signs and branches left aside.
    private static IEnumerable<Expression> Summands(Expression expression) => expression switch
    {
        Sum sum => sum.Terms.SelectMany(Summands),
        Product product when product.Factors.Count(f => f is not Number) == 1 && product.Factors.Last() is Sum sum => Summands(sum),
        Product product when product.Factors.Count == 2 && product.Factors[0] is Number && product.Factors[1] is { Origin: >= 0 } inner => new[] { inner },
        Conditional conditional => Summands(conditional.WhenTrue).Concat(Summands(conditional.WhenFalse)),
        _ => new[] { expression },
    };
}
