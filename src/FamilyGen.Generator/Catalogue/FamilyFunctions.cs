using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Catalogue;

/// <summary>The statistics and, last, log h as formulas, and the exponent at single points.</summary>
internal sealed class FamilyFunctions
{
    private readonly Expander _expander;

    public FamilyFunctions(FamilyDeclaration declaration, NormalForm form)
    {
        Declaration = declaration;
        Parameters = form.Statistics.Count;
        _expander = new Expander(new Scope(declaration));
        var logBase = form.LogBase.ToExpression();
        if (declaration.Support.Predicate is { } predicate)
            logBase = Formula.Sum(logBase, new Conditional(Conditions.Not(predicate), Formula.NegativeInfinity, Formula.Zero));
        All = [.. form.Statistics.Select(s => s.Body.ToExpression()), logBase];
    }

    public FamilyDeclaration Declaration { get; }

    public int Parameters { get; }

    public IReadOnlyList<Expression> All { get; }

    /// <summary>The statistics and log h at a point; null where the base measure vanishes or a function is not a number.</summary>
    public AffineRow? At(Expression point)
    {
        var row = AffineRow.Zero(Parameters);
        for (var j = 0; j < All.Count; j++)
        {
            var value = _expander.Expand(All[j].Rewrite(e => e is Symbol { Kind: SymbolKind.Observation } ? point : null));
            if (value.IsNegativeInfinity || value.Dependence.HasObservation())
                return null;
            row += AffineRow.Single(Parameters, j, value);
        }

        return row;
    }

    /// <summary>The functions as they are on a piece.</summary>
    public IReadOnlyList<Expression> On(Piece piece) => [.. All.Select(f => piece.Value(f).ToExpression())];
}
