using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;
using static FamilyGen.Generator.Catalogue.LawParameters;

namespace FamilyGen.Generator.Catalogue;

/// <summary>The names of laws on the line, by entry, coordinate and what is constant in them.</summary>
internal sealed partial class LineLaws(LawParameters parameters, EntryMatch entry, LineReading reading, bool isFolded)
{
    public Law Find() => entry.Entry switch
    {
        "ExponentialForm" => Exponential(),
        "GaussianForm" => Gaussian("", "variance"),
        "GaussianSegmentForm" => Gaussian("truncated ", "variance before truncation"),
        "GammaForm" => reading.IsLog ? Gamma() : LogGamma(),
        "BetaForm" => reading.IsLog ? Beta() : Logistic(),
        "BesselKForm" => parameters.Law(
            Rate.AsRational() == 1 ? "generalised inverse Gaussian law" : $"generalised inverse Gaussian law of the power {PowerText}",
            ("order", Over(Row(0), RateText)), ("ψ", Times(-2, Row(1))), ("χ", Times(-2, Row(2)))),
        "InverseGaussianForm" => InverseGaussian(),
        _ => VonMises(),
    };

    private Polynomial Rate => reading.Piece.Value(entry.Settings[0]);

    private Expression RateText => entry.Settings[0];

    private string PowerText => Rendering.Text(entry.Settings[0]);

    private Expression Row(int coefficient) => parameters.Of(entry.Coefficients[coefficient]);

    private bool IsConstant(int coefficient, Rational value) => entry.Coefficients[coefficient].Is(value);

    private Expression Origin => reading.Origin.ToSortedExpression();

    private Law Exponential()
    {
        var row = Row(0);
        if (isFolded)
            return parameters.Law("Laplace law", ("location", Origin), ("scale", Over(Formula.Of(-1), row)));
        if (!reading.IsLog)
        {
            if (reading.Lower is not null && reading.Upper is not null)
                return entry.Coefficients[0].IsZero ? parameters.Law("uniform law") : parameters.Law("truncated exponential law", ("rate", Minus(row)));
            var start = reading.Lower ?? reading.Upper!;
            var (name, rate) = reading.Lower is not null ? ("exponential law", Minus(row)) : ("mirrored exponential law", row);
            return start.IsZero() ? parameters.Law(name, ("rate", rate)) : parameters.Law("shifted " + name, ("rate", rate), ("threshold", start));
        }

        if (reading.Shapes.Of(ShapeKind.Exponential).Count > 0)
            return parameters.Law("truncated Weibull law of known shape", ("rate of the power", Minus(row)));
        if (reading.Lower is null)
            return parameters.Law("power-function law", ("shape", row));
        if (reading.Upper is not null)
            return parameters.Law("truncated Pareto law", ("shape", Minus(row)));
        return reading.Origin.IsZero
            ? parameters.Law("Pareto law", ("shape", Minus(row)), ("scale", reading.Piece.Lower!))
            : parameters.Law("Lomax law", ("shape", Minus(row)), ("scale", reading.Piece.Lower!));
    }

    private Law Gaussian(string kind, string variance)
    {
        var (linear, square) = (Row(0), Row(1));
        var mean = reading.IsLog
            ? Sum(Over(Times(new Rational(-1, 2), linear), square), Formula.Log(reading.Scale.ToSortedExpression()))
            : Sum(Over(Times(new Rational(-1, 2), linear), square), Origin);
        var name = kind + (reading.IsLog ? "log-normal law" : "normal law");
        if (isFolded)
            name = "folded " + name;
        var of = reading.IsLog ? " of the logarithm" : "";
        var before = kind.Length > 0 ? " before truncation" : "";
        return parameters.Law(name, ("mean" + of + before, mean), (variance.Replace(" before truncation", "") + of + before, Over(Formula.Of(new Rational(-1, 2)), square)));
    }

    private Law InverseGaussian()
    {
        var (power, inverse) = (Row(0), Row(1));
        var isReciprocal = Rate.AsRational() is { Sign: < 0 };
        var name = isReciprocal ? "reciprocal inverse Gaussian law" : "inverse Gaussian law";
        if (Rationals.Abs(Rate.AsRational() ?? Rational.Zero) != Rational.One)
            name += $" of the power {PowerText}";
        return parameters.Law(name, ("mean" + (isReciprocal ? " of the reciprocal" : ""), Root(Over(inverse, power))), ("shape", Times(-2, inverse)));
    }

    private Law VonMises()
    {
        var (cosine, sine) = (Row(0), Row(1));
        if (entry.Coefficients[1].IsZero)
            return parameters.Law("von Mises law", ("concentration", cosine));
        if (entry.Coefficients[0].IsZero)
            return parameters.Law("von Mises law", ("concentration", sine));
        return parameters.Law(
            "von Mises law",
            ("concentration", Root(Sum(Formula.Power(cosine, 2), Formula.Power(sine, 2)))),
            ("mean direction", Formula.Call(Function.Atan2, sine, cosine)));
    }
}
