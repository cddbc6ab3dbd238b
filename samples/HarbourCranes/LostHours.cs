using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen;

namespace HarbourCranes;

/// <summary>A chance with what simulation and data leave open about it.</summary>
/// <param name="Value">The chance for the next shift, averaged over the laws that the data leave possible.</param>
/// <param name="SimulationError">The standard error that more simulation would shrink.</param>
/// <param name="Low">5 % of the possible laws give less than this.</param>
/// <param name="High">5 % of the possible laws give more than this.</param>
internal sealed record Chance(double Value, double SimulationError, double Low, double High);

/// <summary>The hours that one shift loses: as many repairs as it has stoppages, added up. Simulated under many pairs of
/// laws, one block of shifts for each pair.</summary>
internal sealed class LostHours
{
    private const int Laws = 300;
    private const int ShiftsPerLaw = 1000;

    private readonly double[][] _blocks;

    private LostHours(double[][] blocks) => _blocks = blocks;

    /// <summary>Parameters as uncertain as the data leave them.</summary>
    public static LostHours WithParameterUncertainty(FitResult<ShiftStoppages> stoppages, FitResult<RepairHours> hours, int seed)
    {
        var random = new Random(seed);
        var laws = ParameterDraws.Around(stoppages, t => ShiftStoppages.IsNatural(t), t => ShiftStoppages.FromNatural(t), random)
            .Zip(ParameterDraws.Around(hours, t => RepairHours.IsNatural(t), t => RepairHours.FromNatural(t), random));
        return Simulate(laws, random);
    }

    /// <summary>Parameters taken as if the estimates were exact.</summary>
    public static LostHours AtEstimates(FitResult<ShiftStoppages> stoppages, FitResult<RepairHours> hours, int seed) =>
        Simulate(Enumerable.Repeat((stoppages.Estimate, hours.Estimate), Laws), new Random(seed));

    /// <summary>The chance that a shift loses more than the given hours.</summary>
    public Chance ChanceOfMoreThan(double hours)
    {
        var shares = _blocks.Select(block => block.Count(total => total > hours) / (double)block.Length).Order().ToArray();
        var mean = shares.Average();
        var variance = shares.Sum(s => (s - mean) * (s - mean)) / (shares.Length - 1);
        return new Chance(mean, Math.Sqrt(variance / shares.Length), shares[shares.Length / 20], shares[^(shares.Length / 20)]);
    }

    private static LostHours Simulate(IEnumerable<(ShiftStoppages Stoppages, RepairHours Hours)> laws, Random random) =>
        new([.. laws.Take(Laws).Select(pair => Block(pair.Stoppages, pair.Hours, random))]);

    private static double[] Block(ShiftStoppages stoppages, RepairHours hours, Random random)
    {
        var counts = new int[ShiftsPerLaw];
        stoppages.Sample(random, counts);
        var repairs = new double[counts.Sum()];
        hours.Sample(random, repairs);

        var totals = new double[ShiftsPerLaw];
        var next = 0;
        for (var shift = 0; shift < totals.Length; shift++)
            for (var k = 0; k < counts[shift]; k++)
                totals[shift] += repairs[next++];
        return totals;
    }
}
