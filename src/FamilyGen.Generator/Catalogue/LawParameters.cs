using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Catalogue;

/// <summary>The parameters of laws as formulas in those of the family: its trade parameters where it has them, its natural
/// ones else.</summary>
internal sealed class LawParameters
{
    private readonly IReadOnlyList<Expression> _parameters;
    private readonly Expander _expander;

    public LawParameters(FamilyDeclaration declaration, NormalForm form)
    {
        _parameters = form.Statistics.Select(s => s.Natural ?? new Symbol(s.Parameter, SymbolKind.Natural, false)).ToList();
        _expander = new Expander(new Scope(declaration));
    }

    public Expression Of(AffineRow row) => row.In(_parameters);

    public Law Law(string name, params (string Name, Expression Value)[] parameters) => new(
        name, parameters.Select(p => new LawParameter(p.Name, _expander.Expand(p.Value).ToSortedExpression().WithoutOrigins())).ToEquatableArray());

    public static Expression Minus(Expression value) => Formula.Negate(value);

    public static Expression Times(Rational factor, Expression value) => Formula.Product(Formula.Of(factor), value);

    public static Expression Over(Expression a, Expression b) => Formula.Quotient(a, b);

    public static Expression Root(Expression value) => Formula.Power(value, new Rational(1, 2));

    public static Expression Sum(Expression a, Expression b) => Formula.Sum(a, b);
}
