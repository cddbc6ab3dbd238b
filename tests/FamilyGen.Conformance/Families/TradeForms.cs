using static System.Math;
using static MathNet.Numerics.SpecialFunctions;

namespace FamilyGen.Conformance.Families;

[Family]
public partial class ArrivalCount
{
    [Support] static CountRange Range => CountRange.From(0);
    [LogKernel] static double Kernel(int x, double rate) => x * Log(rate) - FactorialLn(x);
}

[Family]
public partial class DefectiveParts
{
    [Support] static CountRange Range([Known] int parts) => CountRange.Between(0, parts);
    [LogKernel]
    static double Kernel(int x, double chance, [Known] int parts)
        => BinomialLn(parts, x) + x * Log(chance) + (parts - x) * Log(1 - chance);
}

[Family]
public partial class GammaDuration
{
    [Support] static Interval Range => Interval.Above(0);
    [LogKernel] static double Kernel(double x, double shape, double rate) => (shape - 1) * Log(x) - rate * x;
}

[Family]
public partial class RepairHours
{
    [Support] static Interval Range => Interval.Above(0);
    [LogKernel]
    static double Kernel(double x, double shape, double rate, double delay)
        => (shape - 1) * Log(x) - rate * x - delay / x;
}

[Family]
public partial class Reading
{
    [Support] static Interval Range => Interval.RealLine;
    [LogKernel]
    static double Kernel(double x, double centre, [Positive] double deviation)
        => -Pow((x - centre) / deviation, 2) / 2;
}

[Family]
public partial class LogReading
{
    [Support] static Interval Range => Interval.Above(0);
    [LogKernel]
    static double Kernel(double x, double logMean, [Positive] double logDeviation)
    {
        var z = (Log(x) - logMean) / logDeviation;
        return -z * z / 2 - Log(x);
    }
}

[Family]
public partial class Share
{
    [Support] static Interval Range => Interval.Between(0, 1);
    [LogKernel] static double Kernel(double x, double a, double b) => (a - 1) * Log(x) + (b - 1) * Log(1 - x);
}

[Family]
public partial class FirstPassage
{
    [Support] static Interval Range => Interval.Above(0);
    [LogKernel]
    static double Kernel(double x, double average, double shape)
        => -shape * Pow(x - average, 2) / (2 * average * average * x) - 1.5 * Log(x);
}

[Family]
public partial class Heading
{
    [Support] static Interval Range => Interval.Circle(2 * PI);
    [LogKernel]
    static double Kernel(double x, double direction, [Positive] double concentration) => concentration * Cos(x - direction);
}

/// <summary>Fewer trade parameters than statistics: a normal law whose deviation is its mean.</summary>
[Family]
public partial class ProportionalReading
{
    [Support] static Interval Range => Interval.RealLine;
    [LogKernel]
    static double Kernel(double x, [Positive] double level) => -(x - level) * (x - level) / (2 * level * level);
}

/// <summary>A waiting time that may be exactly zero.</summary>
[Family]
public partial class WaitingTime
{
    [Support] static Interval Range => Interval.Above(0).WithMassAt(0);
    [SufficientStatistic] static double NoWait(double x) => x == 0 ? 1 : 0;
    [SufficientStatistic] static double Hours(double x) => x;
}

/// <summary>The locks found faulty among those that were checked.</summary>
[Family]
public partial class FaultyTwistlocks
{
    [Support] static CountRange Range([Known] int checkedLocks) => CountRange.Between(0, checkedLocks);
    [SufficientStatistic] static double Faulty(int x) => x;
    [LogBaseMeasure] static double Ways(int x, [Known] int checkedLocks) => BinomialLn(checkedLocks, x);
}
