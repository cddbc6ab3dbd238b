using System;
using System.Globalization;
using System.Linq;
using CsCheck;
using FamilyGen.Fitting;

namespace FamilyGen.Tests.Fitting;

public class StatisticSumsTests
{
    [Fact]
    public void Shards_merged_in_any_order_have_the_bits_of_the_whole() => Gen.Select(Gen.Int[0, 1000].Array[1, 200], Gen.Int[1, 6], Gen.Int).Sample((counts, parts, seed) =>
    {
        var whole = new StatisticSums<TradeKernel<ShiftStoppages>>(default);
        whole.AddRange(counts);
        var random = new Random(seed);
        var shards = Enumerable.Range(0, parts).Select(_ => new StatisticSums<TradeKernel<ShiftStoppages>>(default)).ToArray();
        foreach (var x in counts.OrderBy(_ => random.Next()))
            shards[random.Next(parts)].Add(x);
        var merged = new StatisticSums<TradeKernel<ShiftStoppages>>(default);
        foreach (var shard in shards.OrderBy(_ => random.Next()))
            merged.Merge(shard);
        return State(whole) == State(merged);
    });

    [Fact]
    public void A_weight_is_a_repetition() => Gen.Select(Gen.Int[0, 50], Gen.Int[0, 4]).Array[1, 30].Sample(rows =>
    {
        var weighted = new StatisticSums<TradeKernel<ShiftStoppages>>(default);
        var repeated = new StatisticSums<TradeKernel<ShiftStoppages>>(default);
        foreach (var (x, times) in rows)
        {
            weighted.Add(x, times);
            for (var i = 0; i < times; i++)
                repeated.Add(x);
        }

        return State(weighted).Bits.SequenceEqual(State(repeated).Bits) && weighted.TotalWeight == repeated.TotalWeight && weighted.Count == rows.Length;
    });

    [Theory]
    [InlineData(double.NaN, "index 2 is NaN: an observation must be a number")]
    [InlineData(double.PositiveInfinity, "index 2 is ∞: an observation must be finite")]
    [InlineData(double.NegativeInfinity, "index 2 is −∞: an observation must be finite")]
    [InlineData(-1.0, "index 2 is -1: the support is the integers from 0 on")]
    [InlineData(1.5, "index 2 is 1.5: the support is the integers from 0 on, and this is no whole number")]
    public void An_invalid_observation_is_refused_by_index_and_nothing_is_added(double bad, string expected)
    {
        var sums = new StatisticSums<TradeKernel<ShiftStoppages>>(default);
        sums.Add(3);
        sums.Add(4);
        var before = State(sums);
        var single = Assert.Throws<ArgumentOutOfRangeException>(() => sums.Add(bad));
        Assert.Contains(expected, single.Message, StringComparison.Ordinal);
        var range = Assert.Throws<ArgumentOutOfRangeException>(() => sums.AddRange([1.0, 2.0, bad, 4.0]));
        Assert.Contains(expected, range.Message, StringComparison.Ordinal);
        Assert.Contains("No observation of the range has been added.", range.Message, StringComparison.Ordinal);
        Assert.Equal(before, State(sums));
    }

    [Theory]
    [InlineData(double.NaN, "is NaN: a weight must be a number")]
    [InlineData(-1.0, "is -1: a weight says how often the observation occurred and cannot be negative")]
    [InlineData(double.PositiveInfinity, "is ∞: a weight must be finite")]
    public void An_invalid_weight_is_refused(double weight, string expected)
    {
        var sums = new StatisticSums<TradeKernel<ShiftStoppages>>(default);
        sums.Add(3);
        var failure = Assert.Throws<ArgumentOutOfRangeException>(() => sums.Add(2, weight));
        Assert.Contains("observation at index 1 " + expected, failure.Message, StringComparison.Ordinal);
        Assert.Equal(1, sums.Count);
    }

    private static (string Bits, long Count, double Weight, double Minimum, double Maximum, string Distinct) State(StatisticSums<TradeKernel<ShiftStoppages>> sums) =>
        (string.Join(';', Enumerable.Range(0, 3).SelectMany(j => new[] { sums.Mean(j).High, sums.Mean(j).Low, sums.Smallest[j], sums.Largest[j] })
                .Append(sums.MeanObservation()).Append(sums.Deviation())
                .Select(x => BitConverter.DoubleToInt64Bits(x).ToString(CultureInfo.InvariantCulture))),
            sums.Count, sums.TotalWeight, sums.Minimum, sums.Maximum, string.Join(';', sums.Distinct.Values.ToArray()));
}
