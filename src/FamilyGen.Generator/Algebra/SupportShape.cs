using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>How the exponent behaves over the support: pieces, singular ends, growth at the ends.</summary>
internal sealed class SupportShape
{
    public SupportShape(FamilyDeclaration declaration, Expander expander, IReadOnlyList<Statistic> statistics, AtomSum logBase)
    {
        var scope = expander.Scope;
        var support = declaration.Support;
        var predicate = support.Predicate is null ? null : expander.Simplify(support.Predicate);
        var functions = statistics.Select(s => s.Body).Append(logBase).SelectMany(b => b.Terms).Select(t => t.Atom);
        Breakpoints = Breakpoints.Of(functions, predicate, scope);

        var naturals = statistics
            .Select(s => s.Natural is null ? Polynomial.Of(new Symbol(s.Parameter, SymbolKind.Natural, false)) : expander.Expand(s.Natural))
            .ToList();
        var analysis = new EndAnalysis(scope, statistics.Select(s => s.Body).ToList(), logBase, naturals);
        var x = declaration.ObservationName;
        var rows = new List<EndRow>();
        if (!support.IsCircle)
        {
            Add(support.Lower, false);
            Add(support.Upper, true);
        }

        foreach (var point in Breakpoints.Singular)
        {
            var text = $"{x} → {Rendering.Text(point)}";
            rows.AddRange(analysis.Rows(new SupportEnd(point, true), text + " from below"));
            rows.AddRange(analysis.Rows(new SupportEnd(point, false), text + " from above"));
        }

        Ends = rows.ToEquatableArray();
        NaturalSetText = new NaturalSetSentence(naturals, expander).Write(
            rows, declaration.Parameters.Select(p => new Symbol(p.Name, SymbolKind.Parameter, false)));
        if (support.IsLattice || support.IsCircle)
            return;
        LowerSingular = support.Lower is not null && analysis.IsSingular(new SupportEnd(support.Lower, false));
        UpperSingular = support.Upper is not null && analysis.IsSingular(new SupportEnd(support.Upper, true));

        void Add(Expression? end, bool isUpper)
        {
            // The finite end of a lattice always converges.
            if (end is not null && support.IsLattice)
                return;
            var place = end is null ? (isUpper ? "∞" : "−∞") : Rendering.Text(end);
            rows.AddRange(analysis.Rows(new SupportEnd(end, isUpper), $"{x} → {place}"));
        }
    }

    public Breakpoints Breakpoints { get; }

    public bool LowerSingular { get; }

    public bool UpperSingular { get; }

    public EquatableArray<EndRow> Ends { get; }

    public string NaturalSetText { get; }
}
