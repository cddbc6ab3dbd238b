using System.Collections.Generic;
using System.Linq;
using FamilyGen.Conformance.Families;

namespace FamilyGen.Conformance;

/// <summary>Laws of every shape: short and long ranges, both front doors, known values, pieces, points of their own.</summary>
internal static class FaceCases
{
    private static readonly Dictionary<string, Face> s_all = new[]
    {
        new Face("binomial", new BinomialOfTwelve(0.4)),
        new Face("Poisson", new Poisson(1.1)),
        new Face("Poisson of large mean", new Poisson(9)),
        new Face("geometric of large mean", new Geometric(-1e-4)),
        new Face("negative binomial", new NegativeBinomial(-0.2)),
        new Face("stoppages", new ShiftStoppages(2.5, 1.8)),
        new Face("stoppages, long tail", new ShiftStoppages(-0.05, 0.001)),
        new Face("stoppages with quiet shifts", new StoppagesWithQuietShifts(2.5, 1.8, 1.5)),
        new Face("twistlocks", new FaultyTwistlocks(-1.5, checkedLocks: 32)),
        new Face("orders", new OrderQuantity(-0.02, -0.4, 1.2, perPallet: 48)),
        new Face("exponential", new Exponential(-0.3)),
        new Face("gamma", new GammaDuration(4.5, 0.25)),
        new Face("gamma, sharp at 0", new GammaDuration(0.1, 1)),
        new Face("repair hours", new RepairHours(1.2, 0.9, 0.35)),
        new Face("reading far from 0", new Reading(1e6, 2)),
        new Face("double well", new Quartic(0.5, 8, 0, -0.5)),
        new Face("beta, sharp at both ends", new Share(0.3, 0.2)),
        new Face("log-normal", new LogReading(1.2, 0.7)),
        new Face("first passage", new FirstPassage(3, 2)),
        new Face("heading", new Heading(2, 4)),
        new Face("window", new WindowedDuration(2, -0.25)),
        new Face("waiting time", new WaitingTime(0.4, -0.5)),
        new Face("average claim", new AverageClaim(1.4, 0.01, claims: 3)),
        new Face("liability loss", new LiabilityLoss(1.5, 0.002, 1.8, 22, large: 5000)),
        new Face("bearing life", new BearingLife(0.002, 0.0004, 0.003)),
        new Face("arrival hour", new ArrivalHour(0.8, 9, 0.6, 3)),
    }.ToDictionary(f => f.Name);

    public static TheoryData<string> Names() => [.. s_all.Keys];

    public static TheoryData<string> CountNames() => [.. s_all.Values.Where(f => f.IsCount).Select(f => f.Name)];

    public static TheoryData<string> IntervalNames() => [.. s_all.Values.Where(f => !f.IsCount).Select(f => f.Name)];

    public static Face Get(string name) => s_all[name];
}
