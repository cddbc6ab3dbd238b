using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Emission;

/// <summary>Whether a formula mentions a symbol, so that no unused local is emitted.</summary>
internal static class Mentions
{
    public static bool Symbol(Expression e, string name) => e switch
    {
        Symbol s => s.Name == name,
        Sum s => s.Terms.Any(t => Symbol(t, name)),
        Product p => p.Factors.Any(f => Symbol(f, name)),
        Power p => Symbol(p.Base, name) || Symbol(p.Exponent, name),
        Call c => c.Arguments.Any(a => Symbol(a, name)),
        Opaque o => o.Arguments.Any(a => Symbol(a, name)),
        Conditional c => Symbol(c.WhenTrue, name) || Symbol(c.WhenFalse, name) || Symbol(c.Condition, name),
        _ => false,
    };

    private static bool Symbol(Condition condition, string name) => condition switch
    {
        Comparison c => Symbol(c.Left, name) || Symbol(c.Right, name),
        Not n => Symbol(n.Operand, name),
        And a => Symbol(a.Left, name) || Symbol(a.Right, name),
        Or o => Symbol(o.Left, name) || Symbol(o.Right, name),
        _ => false,
    };
}
