using static System.Math;

namespace FamilyGen.Conformance.Families;

[Family]
public partial class Normal
{
    [Support] static Interval Range => Interval.RealLine;
    [SufficientStatistic] static double Value(double x) => x;
    [SufficientStatistic] static double Square(double x) => x * x;
}

[Family]
public partial class Quartic
{
    [Support] static Interval Range => Interval.RealLine;
    [SufficientStatistic] static double Value(double x) => x;
    [SufficientStatistic] static double Square(double x) => x * x;
    [SufficientStatistic] static double Cube(double x) => Pow(x, 3);
    [SufficientStatistic] static double Fourth(double x) => Pow(x, 4);
}

[Family]
public partial class Beta
{
    [Support] static Interval Range => Interval.Between(0, 1);
    [SufficientStatistic] static double LogShare(double x) => Log(x);
    [SufficientStatistic] static double LogRest(double x) => Log(1 - x);
}

[Family]
public partial class TiltedBeta
{
    [Support] static Interval Range => Interval.Between(0, 1);
    [SufficientStatistic] static double LogShare(double x) => Log(x);
    [SufficientStatistic] static double LogRest(double x) => Log(1 - x);
    [SufficientStatistic] static double Share(double x) => x;
}

[Family]
public partial class VonMises
{
    [Support] static Interval Range => Interval.Circle(2 * PI);
    [SufficientStatistic] static double Cosine(double x) => Cos(x);
    [SufficientStatistic] static double Sine(double x) => Sin(x);
}

/// <summary>A half-line on which a large spread drives the fit to the edge of the parameter set.</summary>
[Family]
public partial class HalfLineNormal
{
    [Support] static Interval Range => Interval.Above(0);
    [SufficientStatistic] static double Value(double x) => x;
    [SufficientStatistic] static double Square(double x) => x * x;
}
