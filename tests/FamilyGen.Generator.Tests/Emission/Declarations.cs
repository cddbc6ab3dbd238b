using System.Collections.Generic;

namespace FamilyGen.Generator.Tests.Emission;

/// <summary>Valid declarations in all the shapes that users write, by the name of the class; invented families of a
/// harbour's cranes.</summary>
internal static class Declarations
{
    public static IReadOnlyDictionary<string, string> All { get; } = new Dictionary<string, string>
    {
        ["ShiftStoppages"] = """
            [Family] public partial class ShiftStoppages
            {
                [Support] static CountRange Range => CountRange.From(0);
                [SufficientStatistic] static double Total(int x) => x;
                [SufficientStatistic] static double Crowding(int x) => -FactorialLn(x);
            }
            """,
        ["RepairHours"] = """
            [Family] public partial class RepairHours
            {
                [Support] static Interval Range => Interval.Above(0);
                [LogKernel] static double Kernel(double x, double shape, double rate, double delay)
                    => (shape - 1) * Log(x) - rate * x - delay / x;
            }
            """,
        ["FaultyTwistlocks"] = """
            [Family] public partial class FaultyTwistlocks
            {
                [Support] static CountRange Range([Known] int checkedLocks) => CountRange.Between(0, checkedLocks);
                [SufficientStatistic] static double Faulty(int x) => x;
                [LogBaseMeasure] static double Ways(int x, [Known] int checkedLocks) => BinomialLn(checkedLocks, x);
            }
            """,
        ["AverageLoad"] = """
            [Family] public partial class AverageLoad
            {
                [Support] static Interval Range => Interval.Above(0);
                [LogKernel] static double Kernel(double x, double shape, double rate, [Known] int lifts)
                    => (lifts * shape - 1) * Log(x) - lifts * rate * x;
            }
            """,
        ["CableLife"] = """
            [Family] public partial class CableLife
            {
                const double RunIn = 200, Wear = 4000;
                [Support] static Interval Range => Interval.Above(0);
                [LogKernel] static double Kernel(double hours, double early, double steady, double late)
                    => (hours < RunIn ? Log(early) : hours < Wear ? Log(steady) : Log(late))
                     - early * Min(hours, RunIn) - steady * Max(0, Min(hours, Wear) - RunIn) - late * Max(0, hours - Wear);
            }
            """,
        ["BerthingHour"] = """
            [Family] public partial class BerthingHour
            {
                [Support] static Interval Range => Interval.Circle(24);
                [LogKernel] static double Kernel(double hour, double day, double dayPeak, double half, double halfPeak)
                    => day * Cos(2 * PI * (hour - dayPeak) / 24) + half * Cos(4 * PI * (hour - halfPeak) / 24);
            }
            """,
        ["LiftsPerCall"] = """
            [Family] public partial class LiftsPerCall
            {
                [Support] static CountRange Range => CountRange.From(1);
                [SufficientStatistic] static double Units(int x) => x;
                [SufficientStatistic] static double LogUnits(int x) => Log(x);
                [SufficientStatistic] static double FullTrain(int x, [Known] int perTrain) => x % perTrain == 0 ? 1 : 0;
            }
            """,
        ["WaitAtGate"] = """
            [Family] public partial class WaitAtGate
            {
                [Support] static Interval Range => Interval.Above(0).WithMassAt(0);
                [SufficientStatistic] static double NoWait(double minutes) => minutes == 0 ? 1 : 0;
                [SufficientStatistic] static double Minutes(double minutes) => minutes;
                [SufficientStatistic] static double LogMinutes(double minutes) => minutes == 0 ? 0 : Log(minutes);
            }
            """,
        ["EvenLifts"] = """
            [Family] partial class EvenLifts
            {
                [Support] static CountRange Range => CountRange.From(0);
                [Support] static bool Allowed(long x) => x % 2 == 0;
                [SufficientStatistic(Parameter = "logRate")] static double Pairs(long x) => x / 2;
                [BaseMeasure] static double Weight(long x) => Exp(-GammaLn(x + 1));
            }
            """,
        ["DamagedBoxes"] = """
            [Family] public partial class DamagedBoxes
            {
                [Support] static CountRange Range => CountRange.From(0);
                [SufficientStatistic] static double Damaged(int boxes) => boxes;
                [LogBaseMeasure] static double Ways(int boxes, [Known] double size) => GammaLn(boxes + size) - GammaLn(size) - FactorialLn(boxes);
            }
            """,
        ["Outer+SwayAngle"] = """
            public static partial class Outer
            {
                [Family] internal partial class SwayAngle
                {
                    [Support] private static readonly Interval s_range = Interval.Between(-1, 1);
                    [SufficientStatistic] private static double Square(double @event)
                    {
                        var square = @event * @event;
                        return square;
                    }
                }
            }
            """,
        ["Harbour.Hidden+Tilt"] = """
            namespace Harbour
            {
                public partial class Hidden
                {
                    [Family] private partial class Tilt
                    {
                        [Support] static Interval Range => Interval.RealLine;
                        [LogKernel] static double Kernel(double weight, double centre, [Positive] double spread, [Known] double @class)
                            => -Pow((weight - centre) / spread, 2) / 2 - Abs(weight - @class);
                    }
                }
            }
            """,
        ["Peak"] = """
            [Family] public partial class Peak
            {
                [Support] static Interval Range => Interval.Between(0, 1);
                [LogKernel] static double Kernel(double share, double a, double b)
                {
                    var one = 1 - share;
                    if (share < 0.5)
                        return (a - 1) * Log(share) + (b - 1) * Log(one) + 1;
                    return (a - 1) * Log(share) + (b - 1) * Log(one);
                }
            }
            """,
    };

    public static TheoryData<string> Names => new(All.Keys);
}
