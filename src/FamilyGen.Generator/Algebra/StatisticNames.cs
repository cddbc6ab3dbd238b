using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>Names for the natural parameters of a kernel, after the function of the observation that each multiplies:
/// logHours, hours, reciprocalHours.</summary>
internal sealed class StatisticNames(IEnumerable<string> taken)
{
    private readonly HashSet<string> _taken = new(taken, StringComparer.OrdinalIgnoreCase);

    /// <summary>A name that no other one in the declaration has.</summary>
    public string Next(AtomSum statistic)
    {
        var words = statistic.Terms.Count == 0 ? new[] { "statistic" } : Words(statistic.Terms[0].Atom).ToArray();
        var name = words[0] + string.Concat(words.Skip(1).Select(Capital));
        if (name.Length > 40)
            name = "statistic";
        var unique = name;
        for (var i = 2; !_taken.Add(unique); i++)
            unique = name + i.ToString(System.Globalization.CultureInfo.InvariantCulture);
        return unique;
    }

    public static string Capital(string word) => word.Length == 0 ? word : char.ToUpperInvariant(word[0]) + word.Substring(1);

    private static IEnumerable<string> Words(Expression atom)
    {
        switch (atom)
        {
            case Symbol symbol:
                return new[] { Small(symbol.Name) };
            case Power { Exponent: Number { Value: var n } } power:
                return Powered(Words(power.Base), n);
            case Power power:
                return Words(power.Base).Concat(new[] { "to" }).Concat(Words(power.Exponent));
            case Call { Function: Function.LogGamma, Arguments: var a } when a[0] is Sum { Terms: var t } && t.Count == 2 && t[1].IsOne():
                return new[] { "log", "factorial" }.Concat(Words(t[0]));
            case Call call:
                return Prefix(call.Function).Concat(Words(call.Arguments.FirstOrDefault(a => Dependences.Of(a).HasObservation()) ?? call.Arguments[0]));
            case Opaque opaque:
                return new[] { Small(opaque.Text.Substring(opaque.Text.LastIndexOf('.') + 1)) };
            case Conditional conditional when conditional.IsIndicator():
                return Words(conditional.Condition);
            case Conditional conditional:
                return Words(conditional.WhenTrue).Concat(new[] { "where" }).Concat(Words(conditional.Condition));
            case Sum { Terms: { Count: 2 } t }:
                return OfTwo(t[0], t[1]);
            case Sum sum:
                return sum.Terms.Where(t => t is not Number).Take(1).SelectMany(Words);
            case Product product:
                return product.Factors.Where(f => f is not Number).SelectMany(Words);
            default:
                return Enumerable.Empty<string>();
        }
    }

    // one minus x, x plus one, x minus threshold
    private static IEnumerable<string> OfTwo(Expression first, Expression second)
    {
        var (joint, rest) = second switch
        {
            Product { Factors: { Count: 2 } f } when f[0] is Number { Value: var n } && n == -1 => ("minus", f[1]),
            Number { Value.Sign: < 0 } number => ("minus", Formula.Of(-number.Value)),
            _ => ("plus", second),
        };
        var (left, right) = (Simple(first), Simple(rest));
        return left.Concat(right.Length == 0 || left.Length == 0 ? right : new[] { joint }.Concat(right));

        static string[] Simple(Expression part) => part is Number { Value: var n } && n == 1 ? new[] { "one" }
            : part is Number { Value: { IsInteger: true, Sign: > 0 } m } ? new[] { m.ToString() }
            : Words(part).ToArray();
    }

    private static IEnumerable<string> Words(Condition condition) => condition switch
    {
        And { Left: Comparison { Right: Symbol { Kind: SymbolKind.Observation } x } above, Right: Comparison below } =>
            Words(x).Concat(new[] { "from" }).Concat(Value(above.Left)).Concat(Words(below).Skip(1)),
        And { Left: Comparison { Left: Symbol { Kind: SymbolKind.Observation } }, Right: Comparison { Right: Symbol { Kind: SymbolKind.Observation } } } and =>
            Words(new And(and.Right, and.Left)),
        And and => Words(and.Left).Concat(Words(and.Right).Skip(1)),
        Comparison { Left: Symbol { Kind: SymbolKind.Observation } x, Relation: Relation.Equal } equal => Words(x).Concat(new[] { "is" }).Concat(Value(equal.Right)),
        Comparison { Left: Symbol { Kind: SymbolKind.Observation } x } below => Words(x).Concat(new[] { "below" }).Concat(Value(below.Right)),
        Comparison { Right: Symbol { Kind: SymbolKind.Observation } x } above => Words(x).Concat(new[] { "above" }).Concat(Value(above.Left)),
        Not { Operand: Comparison { Left: Symbol { Kind: SymbolKind.Observation } x } equal } => Words(x).Concat(new[] { "not" }).Concat(Value(equal.Right)),
        _ => condition.Operands().SelectMany(Words).Take(2).Concat(new[] { "piece" }),
    };

    private static IEnumerable<string> Value(Expression value) => value switch
    {
        Number { Value: { IsInteger: true, Sign: >= 0 } n } => new[] { n.ToString() },
        Symbol symbol => new[] { symbol.Name },
        _ => new[] { "limit" },
    };

    private static IEnumerable<string> Powered(IEnumerable<string> words, Rational n)
    {
        if (n == -1)
            return new[] { "reciprocal" }.Concat(words);
        if (n == new Rational(1, 2))
            return new[] { "root" }.Concat(words);
        if (n == 2)
            return words.Concat(new[] { "squared" });
        if (n == 3)
            return words.Concat(new[] { "cubed" });
        return n.Sign < 0 ? new[] { "reciprocal" }.Concat(Powered(words, -n))
            : words.Concat(new[] { "power" + n.ToString().Replace('/', '_') });
    }

    private static IEnumerable<string> Prefix(Function function) => function switch
    {
        Function.LogGamma => new[] { "log", "gamma" },
        Function.IntegerQuotient => new[] { "quotient" },
        _ => new[] { function.ToString().ToLowerInvariant() },
    };

    private static string Small(string name)
    {
        var letters = new string(name.Where(c => char.IsLetterOrDigit(c) || c == '_').ToArray()).TrimStart('_');
        return letters.Length == 0 ? "x" : char.ToLowerInvariant(letters[0]) + letters.Substring(1);
    }
}
