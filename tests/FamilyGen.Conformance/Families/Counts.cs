using static System.Math;
using static MathNet.Numerics.SpecialFunctions;

namespace FamilyGen.Conformance.Families;

[Family]
public partial class Bernoulli
{
    [Support] static CountRange Range => CountRange.Between(0, 1);
    [SufficientStatistic] static double Success(int x) => x;
}

[Family]
public partial class BinomialOfTwelve
{
    const int Trials = 12;
    [Support] static CountRange Range => CountRange.Between(0, Trials);
    [SufficientStatistic] static double Successes(int x) => x;
    [LogBaseMeasure] static double Ways(int x) => BinomialLn(Trials, x);
}

[Family]
public partial class Poisson
{
    [Support] static CountRange Range => CountRange.From(0);
    [SufficientStatistic(Parameter = "logRate")] static double Total(int x) => x;
    [LogBaseMeasure] static double Orders(int x) => -FactorialLn(x);
}

[Family]
public partial class Geometric
{
    [Support] static CountRange Range => CountRange.From(0);
    [SufficientStatistic] static double Failures(int x) => x;
}

[Family]
public partial class NegativeBinomial
{
    const double Size = 2.5;
    [Support] static CountRange Range => CountRange.From(0);
    [SufficientStatistic] static double Failures(int x) => x;
    [LogBaseMeasure] static double Ways(int x) => GammaLn(x + Size) - GammaLn(Size) - FactorialLn(x);
}

/// <summary>The size is known, so that one declaration serves every data set.</summary>
[Family]
public partial class SizedNegativeBinomial
{
    [Support] static CountRange Range => CountRange.From(0);
    [SufficientStatistic] static double Failures(int x) => x;
    [LogBaseMeasure] static double Ways(int x, [Known] double size) => GammaLn(x + size) - GammaLn(size) - FactorialLn(x);
}

[Family]
public partial class FourCategories
{
    [Support] static CountRange Range => CountRange.Between(0, 3);
    [SufficientStatistic] static double First(int x) => x == 1 ? 1 : 0;
    [SufficientStatistic] static double Second(int x) => x == 2 ? 1 : 0;
    [SufficientStatistic] static double Third(int x) => x == 3 ? 1 : 0;
}

/// <summary>Stoppages per shift: the spread is free of the mean.</summary>
[Family]
public partial class ShiftStoppages
{
    [Support] static CountRange Range => CountRange.From(0);
    [SufficientStatistic] static double Total(int x) => x;
    [SufficientStatistic] static double Crowding(int x) => -FactorialLn(x);
}

[Family]
public partial class StoppagesOfStoppedShifts
{
    [Support] static CountRange Range => CountRange.From(1);
    [SufficientStatistic] static double Total(int x) => x;
    [SufficientStatistic] static double Crowding(int x) => -FactorialLn(x);
}

[Family]
public partial class StoppagesWithQuietShifts
{
    [Support] static CountRange Range => CountRange.From(0);
    [SufficientStatistic] static double Total(int x) => x;
    [SufficientStatistic] static double Crowding(int x) => -FactorialLn(x);
    [SufficientStatistic] static double Quiet(int x) => x == 0 ? 1 : 0;
}

[Family]
public partial class PoissonWithExtraZero
{
    [Support] static CountRange Range => CountRange.From(0);
    [SufficientStatistic] static double Total(int x) => x;
    [SufficientStatistic] static double Zero(int x) => x == 0 ? 1 : 0;
    [BaseMeasure] static double Orders(int x) => Exp(-FactorialLn(x));
}

/// <summary>Boys among twelve children: the second statistic lets the families differ.</summary>
[Family]
public partial class MixedTwelve
{
    const int Children = 12;
    [Support] static CountRange Range => CountRange.Between(0, Children);
    [SufficientStatistic] static double Boys(int x) => x;
    [SufficientStatistic] static double Mixture(int x) => (double)x * (Children - x);
    [LogBaseMeasure] static double Ways(int x) => BinomialLn(Children, x);
}
