using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;
using static FamilyGen.Generator.Catalogue.LawParameters;

namespace FamilyGen.Generator.Catalogue;

/// <summary>Laws of the gamma and beta entries.</summary>
internal sealed partial class LineLaws
{
    // exp(p log u + q uᵏ) du/u
    private Law Gamma()
    {
        var (p, q) = (Row(0), Row(1));
        var k = Rate.AsRational();
        if (isFolded)
        {
            return k == 2 && IsConstant(0, 1)
                ? parameters.Law("normal law", ("mean", Origin), ("variance", Over(Formula.Of(new Rational(-1, 2)), q)))
                : parameters.Law("symmetric generalised gamma law", ("location", Origin), ("shape", Over(p, RateText)), ("power", RateText));
        }

        if (k == 1)
        {
            if (IsConstant(0, 1))
                return parameters.Law("exponential law", ("rate", Minus(q)));
            return entry.Coefficients[1].Is(new Rational(-1, 2))
                ? parameters.Law("chi-squared law", ("degrees of freedom", Times(2, p)))
                : parameters.Law("gamma law", ("shape", p), ("rate", Minus(q)));
        }

        if (k == -1)
            return parameters.Law("inverse gamma law", ("shape", Minus(p)), ("scale", Minus(q)));
        if (k == 2 && !entry.Coefficients[1].IsConstant)
        {
            var scale = ("scale", Over(Formula.One, Root(Times(-2, q))));
            if (IsConstant(0, 1))
                return parameters.Law("half-normal law", scale);
            if (IsConstant(0, 2))
                return parameters.Law("Rayleigh law", scale);
            if (IsConstant(0, 3))
                return parameters.Law("Maxwell law", scale);
        }

        if (entry.Coefficients[0].Is(Rate))
        {
            var isFrechet = k is { Sign: < 0 };
            return parameters.Law(
                isFrechet ? "Fréchet law of known shape" : "Weibull law of known shape",
                ("shape", isFrechet ? Minus(RateText) : RateText),
                ("scale", new Power(Minus(q), Over(Formula.Of(-1), RateText))));
        }

        return parameters.Law(
            "generalised gamma law", ("shape", Over(p, RateText)), ("power", RateText), ("rate of the power", Minus(q)));
    }

    // exp(p y + q e^(ky)): the logarithm of a gamma law's value
    private Law LogGamma()
    {
        var (p, q) = (Row(0), Row(1));
        if (entry.Coefficients[0].Is(Rate))
        {
            return parameters.Law(
                Rate.AsRational() is { Sign: > 0 } ? "Gumbel law of minima" : "Gumbel law",
                ("location", Over(Formula.Log(Minus(q)), Minus(RateText))),
                ("scale", Formula.Power(Formula.Call(Function.Abs, RateText), -1)));
        }

        return parameters.Law("log-gamma law", ("shape", Over(p, RateText)), ("rate", Minus(q)));
    }

    private Law Beta()
    {
        var (alpha, beta) = (Row(0), Row(1));
        var isOnInterval = reading.Shapes.Of(ShapeKind.LogOneMinus).Count > 0;
        var power = reading.Shapes.Of(isOnInterval ? ShapeKind.LogOneMinus : ShapeKind.Softplus)[0].Rate;
        var isPlain = power.AsRational() == 1;
        if (isOnInterval)
        {
            if (isFolded)
                return parameters.Law("symmetric beta law", ("α = β", beta));
            if (isPlain)
                return parameters.Law("beta law", ("α", alpha), ("β", beta));
            return IsConstant(0, 1)
                ? parameters.Law("Kumaraswamy law of known power", ("power", power.ToSortedExpression()), ("β", beta))
                : parameters.Law("generalised beta law", ("power", power.ToSortedExpression()), ("α", alpha), ("β", beta));
        }

        if (isFolded)
        {
            return power.AsRational() == 2 && IsConstant(0, new Rational(1, 2))
                ? parameters.Law("Pearson type VII law (Student's t with known scale)", ("degrees of freedom", Times(2, beta)), ("location", Origin))
                : parameters.Law("symmetric generalised beta-prime law", ("α", alpha), ("β", beta), ("location", Origin));
        }

        var scale = ("scale", reading.Scale.ToSortedExpression());
        if (IsConstant(0, 1))
        {
            return isPlain
                ? parameters.Law("Lomax law", ("shape", beta), scale)
                : parameters.Law("Burr law of known power", ("power", power.ToSortedExpression()), ("shape", beta), scale);
        }

        return isPlain
            ? parameters.Law("beta-prime law", ("α", alpha), ("β", beta), scale)
            : parameters.Law("generalised beta-prime law", ("power", power.ToSortedExpression()), ("α", alpha), ("β", beta), scale);
    }

    private Law Logistic() => parameters.Law("generalised logistic law (logit of a beta law)", ("α", Row(0)), ("β", Row(1)));
}
