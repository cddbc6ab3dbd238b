using static System.Math;

namespace FamilyGen.Conformance.Families;

/// <summary>A row is the mean of several claims; a weight would be wrong.</summary>
[Family]
public partial class AverageClaim
{
    [Support] static Interval Range => Interval.Above(0);
    [LogKernel] static double Kernel(double x, double shape, double rate, [Known] int claims)
        => (claims * shape - 1) * Log(x) - claims * rate * x;
}

/// <summary>A gamma body with a power tail from a known threshold.</summary>
[Family]
public partial class LiabilityLoss
{
    [Support] static Interval Range => Interval.Above(0);
    [LogKernel] static double Kernel(double x, double shape, double rate, double tail, double jump, [Known] double large)
        => x < large ? (shape - 1) * Log(x) - rate * x : jump - (tail + 1) * Log(x);
}

/// <summary>A piecewise hazard; its maximum is events over exposure, and global.</summary>
[Family]
public partial class BearingLife
{
    const double RunIn = 200, Wear = 4000;        // hours
    [Support] static Interval Range => Interval.Above(0);
    [LogKernel] static double Kernel(double hours, double early, double steady, double late)
        => (hours < RunIn ? Log(early) : hours < Wear ? Log(steady) : Log(late))
         - early * Min(hours, RunIn) - steady * Max(0, Min(hours, Wear) - RunIn) - late * Max(0, hours - Wear);
}

/// <summary>Orders heap at full pallets.</summary>
[Family]
public partial class OrderQuantity
{
    [Support] static CountRange Range => CountRange.From(1);
    [SufficientStatistic] static double Units(int x) => x;
    [SufficientStatistic] static double LogUnits(int x) => Log(x);
    [SufficientStatistic] static double FullPallet(int x, [Known] int perPallet) => x % perPallet == 0 ? 1 : 0;
}

/// <summary>Two peaks a day.</summary>
[Family]
public partial class ArrivalHour
{
    [Support] static Interval Range => Interval.Circle(24);
    [LogKernel] static double Kernel(double hour, double day, double dayPeak, double half, double halfPeak)
        => day * Cos(2 * PI * (hour - dayPeak) / 24) + half * Cos(4 * PI * (hour - halfPeak) / 24);
}
