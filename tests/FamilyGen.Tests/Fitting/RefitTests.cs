using System;
using System.Linq;
using CsCheck;
using FamilyGen.Fitting;
using FamilyGen.Partition;
using FamilyGen.Tests.Partition;

namespace FamilyGen.Tests.Fitting;

public class RefitTests
{
    [Fact]
    public void Simulated_counts_give_their_parameters_back() => Gen.Select(Gen.Double[-1, 3], Gen.Double[0.3, 2], Gen.Int[0, int.MaxValue]).Sample((total, crowding, seed) =>
        IsNearTruth<DispersedCount>([total, crowding], seed), iter: 20, seed: "0000000000001");

    [Fact]
    public void Simulated_durations_give_their_parameters_back() => Gen.Select(Gen.Double[-0.9, 20], Gen.Double[-5, -0.01], Gen.Int[0, int.MaxValue]).Sample((shape, rate, seed) =>
        IsNearTruth<Gamma>([shape, rate], seed), iter: 20, seed: "0000000000001");

    [Fact]
    public void The_fitted_mean_statistics_are_those_of_the_data() => Gen.Double[0.01, 100].Array[5, 40].Sample(data =>
    {
        var sums = new StatisticSums<AtomKernel<Gamma>>(default);
        sums.AddRange(data);
        var fit = MaximumLikelihood.Fit(sums, (_, _) => default(Gamma));
        var law = new Distribution<AtomKernel<Gamma>>(default, fit.Natural.AsSpan());
        var means = law.MeanStatistics();
        return Math.Abs(means[0] - data.Average(Math.Log)) < 1e-11 * (1 + Math.Abs(means[0])) && Math.Abs((means[1] / data.Average()) - 1) < 1e-11;
    }, iter: 50);

    [Fact]
    public void Shards_fit_to_the_same_bits() => Gen.Select(Gen.Int[0, 12].Array[20, 60], Gen.Int[2, 5], Gen.Int).Sample((counts, parts, seed) =>
    {
        var whole = new StatisticSums<AtomKernel<DispersedCount>>(default);
        whole.AddRange(counts);
        var random = new Random(seed);
        var shards = Enumerable.Range(0, parts).Select(_ => new StatisticSums<AtomKernel<DispersedCount>>(default)).ToArray();
        foreach (var x in counts)
            shards[random.Next(parts)].Add(x);
        var merged = new StatisticSums<AtomKernel<DispersedCount>>(default);
        foreach (var shard in shards.Reverse())
            merged.Merge(shard);
        var (a, b) = (MaximumLikelihood.Fit(whole, (_, _) => 0), MaximumLikelihood.Fit(merged, (_, _) => 0));
        return a.Natural.SequenceEqual(b.Natural) && a.LogLikelihood.Equals(b.LogLikelihood) && a.StandardErrors.SequenceEqual(b.StandardErrors);
    }, iter: 20);

    private static bool IsNearTruth<TFamily>(double[] theta, int seed)
        where TFamily : struct, IAtomFamily
    {
        var draws = new double[4000];
        new Distribution<AtomKernel<TFamily>>(default, theta).Sample(new Random(seed), draws);
        var sums = new StatisticSums<AtomKernel<TFamily>>(default);
        sums.AddRange(draws);
        var fit = MaximumLikelihood.Fit(sums, (_, _) => default(TFamily));
        return theta.Select((value, j) => Math.Abs(fit.Natural[j] - value) / fit.StandardErrors[j]).All(deviations => deviations < 4.5);
    }
}
