using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;
using static FamilyGen.Generator.Catalogue.LawParameters;

namespace FamilyGen.Generator.Catalogue;

/// <summary>The names of laws on counts.</summary>
internal static class CountLaws
{
    public static Law Find(LawParameters parameters, EntryMatch entry)
    {
        var c = parameters.Of(entry.Coefficients[0]);
        var start = entry.Start.ToSortedExpression();
        return entry.Entry switch
        {
            "PoissonForm" => Shifted("Poisson law", ("mean", Formula.Exp(c))),
            "BinomialForm" => entry.Settings[0] is Number { Value: var trials } && trials == 1
                ? Shifted("Bernoulli law", ("log-odds", c))
                : Shifted("binomial law", ("trials", entry.Settings[0]), ("log-odds", c)),
            "NegativeBinomialForm" when entry.Settings[0].IsOne() => Shifted("geometric law", ("continuation probability", Formula.Exp(c))),
            "NegativeBinomialForm" => Shifted(
                "negative binomial law", ("size", entry.Settings[0]), ("mean", Over(entry.Settings[0], Sum(Formula.Exp(Minus(c)), Formula.Of(-1))))),
            "GeometricSegmentForm" => entry.Coefficients[0].IsZero
                ? parameters.Law("uniform law")
                : Shifted(entry.Settings[0].IsOne() ? "Bernoulli law" : "truncated geometric law", (entry.Settings[0].IsOne() ? "log-odds" : "log-ratio", c)),
            "LogSeriesForm" => parameters.Law("logarithmic series law", ("p", Formula.Exp(c))),
            _ => entry.Settings[0].IsOne()
                ? parameters.Law("zeta law", ("exponent", Minus(c)))
                : parameters.Law("Hurwitz zeta law", ("exponent", Minus(c)), ("first base", entry.Settings[0])),
        };

        Law Shifted(string name, params (string Name, Expression Value)[] values) =>
            entry.IsReflected ? parameters.Law("mirrored " + name, [.. values, ("from", start)])
            : start.IsZero() ? parameters.Law(name, values)
            : parameters.Law("shifted " + name, [.. values, ("from", start)]);
    }
}
