using System;
using FamilyGen.Conformance.Families;

namespace FamilyGen.Conformance;

/// <summary>What a fit or a constructor says to input that it cannot use.</summary>
public class BadInputTests
{
    private static readonly double[] s_hours = [0.4, 1.2, 0.7, 2.9, 1.1];

    [Theory]
    [InlineData(double.NaN, "NaN")]
    [InlineData(double.PositiveInfinity, "∞")]
    [InlineData(double.NegativeInfinity, "−∞")]
    [InlineData(-0.25, "-0.25")]
    [InlineData(0.0, "0")]
    public void A_bad_observation_is_named_with_its_index(double bad, string text)
    {
        double[] data = [.. s_hours];
        data[3] = bad;
        var error = Assert.Throws<ArgumentOutOfRangeException>(() => RepairHours.Fit(data));
        Assert.Contains("index 3", error.Message, StringComparison.Ordinal);
        Assert.Contains(text, error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_count_below_the_support_is_named_with_its_index()
    {
        var error = Assert.Throws<ArgumentOutOfRangeException>(() => ShiftStoppages.Fit([2, 0, 1, -1]));
        Assert.Contains("index 3", error.Message, StringComparison.Ordinal);
        Assert.Contains("-1", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_count_above_a_known_total_is_named_with_its_index()
    {
        var error = Assert.Throws<ArgumentOutOfRangeException>(() => FaultyTwistlocks.Fit([2, 0, 9, 1], checkedLocks: 8));
        Assert.Contains("index 2", error.Message, StringComparison.Ordinal);
        Assert.Contains("0 to 8", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void TryFit_does_not_hide_a_bad_observation() =>
        Assert.Throws<ArgumentOutOfRangeException>(() => RepairHours.TryFit([1, double.NaN], out _, out _));

    [Fact]
    public void A_bad_row_leaves_the_accumulator_as_it_was()
    {
        var (touched, clean) = (new RepairHours.Accumulator(), new RepairHours.Accumulator());
        touched.AddRange(s_hours);
        clean.AddRange(s_hours);
        Assert.Throws<ArgumentOutOfRangeException>(() => touched.Add(double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => touched.AddRange([5, 6, -7]));
        Assert.Throws<ArgumentOutOfRangeException>(() => touched.Add(1, -1));
        Assert.Equal(clean.Count, touched.Count);
        Assert.Equal([.. clean.Fit().Natural], touched.Fit().Natural.AsSpan().ToArray());
    }

    [Fact]
    public void No_data_are_refused()
    {
        var error = Assert.Throws<FitException>(() => RepairHours.Fit([]));
        Assert.Contains("no observation", error.Message, StringComparison.OrdinalIgnoreCase);
    }

    [Fact]
    public void One_observation_has_no_maximum()
    {
        var error = Assert.Throws<FitException>(() => RepairHours.Fit([1.5]));
        Assert.Contains("1.5", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void One_observation_is_enough_for_one_parameter() =>
        Assert.Equal(-1 / 1.5, Exponential.Fit([1.5]).Natural[0], 1e-12);

    [Fact]
    public void Fewer_observations_than_the_statistics_need_have_no_maximum()
    {
        Assert.False(Quartic.TryFit([1.5, 2.5], out var result, out var account));
        Assert.Null(result);
        Assert.False(string.IsNullOrWhiteSpace(account));
        var error = Assert.Throws<FitException>(() => Quartic.Fit([1.5, 2.5]));
        Assert.Equal(account, error.Message);
    }

    /// <summary>Two points inside an open half-line are inside the hull of (log x, x, 1/x): by Karlin and Studden (1966) their
    /// index 2 reaches the (3 + 1)/2 that an inner point of the moment space needs.</summary>
    [Fact]
    public void Two_observations_are_enough_for_three_statistics_on_a_half_line() =>
        Assert.Equal(FitStatus.InteriorMaximum, RepairHours.Fit([1.5, 2.5]).Status);

    [Theory]
    [InlineData(-1.0, "negative")]
    [InlineData(double.NaN, "number")]
    [InlineData(double.PositiveInfinity, "finite")]
    public void A_bad_weight_is_refused(double weight, string text)
    {
        var accumulator = new Poisson.Accumulator();
        accumulator.Add(2);
        var error = Assert.Throws<ArgumentOutOfRangeException>(() => accumulator.Add(3, weight));
        Assert.Contains(text, error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Weights_that_are_all_zero_leave_nothing_to_fit()
    {
        var accumulator = new Poisson.Accumulator();
        accumulator.Add(2, 0);
        accumulator.Add(3, 0);
        var error = Assert.Throws<FitException>(() => accumulator.Fit());
        Assert.Contains("weight", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_parameter_outside_the_natural_set_is_refused_with_the_condition()
    {
        var error = Assert.Throws<ArgumentOutOfRangeException>(() => new ShiftStoppages(0.5, -0.1));
        Assert.Contains("crowding", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_trade_parameter_outside_its_set_is_refused_with_the_condition()
    {
        var error = Assert.Throws<ArgumentOutOfRangeException>(() => new RepairHours(1.2, -0.5, 0.1));
        Assert.Contains("rate", error.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(double.NegativeInfinity)]
    public void A_parameter_that_is_no_number_is_refused(double bad)
    {
        Assert.ThrowsAny<ArgumentException>(() => new Poisson(bad));
        Assert.ThrowsAny<ArgumentException>(() => new Reading(bad, 1));
        Assert.ThrowsAny<ArgumentException>(() => Normal.FromNatural([bad, -1]));
    }

    [Fact]
    public void Too_few_natural_parameters_are_refused() =>
        Assert.ThrowsAny<ArgumentException>(() => Normal.FromNatural([1]));

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(-0.1)]
    [InlineData(1.1)]
    public void A_probability_outside_the_unit_interval_is_refused(double p) =>
        Assert.ThrowsAny<ArgumentException>(() => new Reading(0, 1).Quantile(p));

    [Fact]
    public void A_result_span_that_is_too_short_is_refused() =>
        Assert.ThrowsAny<ArgumentException>(() => new Reading(0, 1).LogDensity([1, 2, 3], new double[2]));

    [Fact]
    public void An_observation_outside_the_support_has_density_zero()
    {
        var law = new RepairHours(1.2, 0.9, 0.35);
        Assert.Equal(double.NegativeInfinity, law.LogDensity(-1));
        Assert.Equal(0, law.Density(0));
        Assert.Equal(0, law.Cdf(-1));
        Assert.Equal(1, law.Survival(-1));
        Assert.False(RepairHours.InSupport(0));
    }
}
