using static System.Math;

namespace FamilyGen.Conformance.Families;

[Family]
public partial class Exponential
{
    [Support] static Interval Range => Interval.Above(0).IncludingLower();
    [SufficientStatistic] static double Hours(double x) => x;
}

[Family]
public partial class Gamma
{
    [Support] static Interval Range => Interval.Above(0);
    [SufficientStatistic] static double LogHours(double x) => Log(x);
    [SufficientStatistic] static double Hours(double x) => x;
}

[Family]
public partial class ChiSquared
{
    [Support] static Interval Range => Interval.Above(0);
    [SufficientStatistic] static double LogValue(double x) => Log(x);
    [LogBaseMeasure] static double HalfValue(double x) => -x / 2;
}

[Family]
public partial class LogNormal
{
    [Support] static Interval Range => Interval.Above(0);
    [SufficientStatistic] static double LogHours(double x) => Log(x);
    [SufficientStatistic] static double LogHoursSquared(double x) => Log(x) * Log(x);
    [LogBaseMeasure] static double PerHour(double x) => -Log(x);
}

[Family]
public partial class InverseGaussian
{
    [Support] static Interval Range => Interval.Above(0);
    [SufficientStatistic] static double Hours(double x) => x;
    [SufficientStatistic] static double Pace(double x) => 1 / x;
    [LogBaseMeasure] static double FirstPassage(double x) => -0.5 * Log(2 * PI) - 1.5 * Log(x);
}

/// <summary>A duration with a minimum delay in canonical form.</summary>
[Family]
public partial class DelayedDuration
{
    [Support] static Interval Range => Interval.Above(0);
    [SufficientStatistic] static double LogHours(double x) => Log(x);
    [SufficientStatistic] static double Hours(double x) => x;
    [SufficientStatistic] static double Pace(double x) => 1 / x;
}

/// <summary>Only durations between two and thirty hours are recorded at all.</summary>
[Family]
public partial class WindowedDuration
{
    [Support] static Interval Range => Interval.Between(2, 30).IncludingLower().IncludingUpper();
    [SufficientStatistic] static double LogHours(double x) => Log(x);
    [SufficientStatistic] static double Hours(double x) => x;
}
