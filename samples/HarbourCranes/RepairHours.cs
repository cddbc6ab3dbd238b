using FamilyGen;
using static System.Math;

namespace HarbourCranes;

/// <summary>Hours from stoppage to restart. The delay keeps short repairs away: somebody must first walk to the crane.</summary>
[Family]
public partial class RepairHours
{
    [Support] static Interval Range => Interval.Above(0);
    [LogKernel]
    static double Kernel(double hours, double shape, double rate, double delay)
        => (shape - 1) * Log(hours) - rate * hours - delay / hours;
}
