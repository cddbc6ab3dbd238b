using System.Collections.Generic;

namespace FamilyGen.Generator.Algebra;

/// <summary>What would mend a kernel that does not separate.</summary>
internal static class Hints
{
    public static string Declare(IReadOnlyList<string> parameters) =>
        "declare " + string.Join(" and ", parameters) + " as [Known]";

    /// <summary>For a power the exponent is enough; inside a function all its parameters must be known.</summary>
    public static string For(Factor factor, IReadOnlyList<string> all)
    {
        var inExponent = Dependences.Names(factor.Exponent.ToExpression(), SymbolKind.Parameter);
        return Declare(factor.Base is Symbol { Kind: SymbolKind.Observation } && inExponent.Count > 0 ? inExponent : all);
    }
}
