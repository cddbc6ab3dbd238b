using System;
using System.Collections.Immutable;
using System.Linq;
using FamilyGen.Kernels;

namespace FamilyGen.Tests.Kernels;

/// <summary>Convergence at the ends, on families whose conditions are in every textbook.</summary>
public class NaturalSetTests
{
    private static Growth Power(double order) => new(GrowthKind.Power, order);

    private static readonly Growth s_log = new(GrowthKind.Log);
    private static readonly Growth s_bounded = new(GrowthKind.Bounded);

    private static Rank Rank(Growth growth, string text, double constant, params double[] weights) =>
        new(growth, [.. weights], constant, text);

    private static EndGrowth Infinity(ImmutableArray<Growth> statistics, params Rank[] ranks) =>
        new("x → ∞", true, true, [.. ranks], statistics);

    private static EndGrowth Zero(ImmutableArray<Growth> statistics, params Rank[] ranks) =>
        new("x → 0", false, false, [.. ranks], statistics);

    /// <summary>θ₁ log x + θ₂ x on (0, ∞).</summary>
    private static readonly NaturalSet s_gamma = new(
    [
        Zero([s_log, s_bounded, s_bounded], Rank(s_log, "−shape", 0, -1, 0)),
        Infinity([s_log, Power(1), s_bounded], Rank(s_log, "shape", 0, 1, 0), Rank(Power(1), "rate", 0, 0, 1)),
    ]);

    /// <summary>θ₁ x + θ₂·(−log x!) on 0, 1, ….</summary>
    private static readonly NaturalSet s_crowded = new(
    [
        Infinity(
            [Power(1), new(GrowthKind.PowerTimesLog), s_bounded],
            Rank(Power(1), "total + crowding", 0, 1, 1),
            Rank(new(GrowthKind.PowerTimesLog), "−crowding", 0, 0, -1),
            Rank(s_log, "−½ crowding", 0, 0, -0.5)),
    ]);

    /// <summary>θ₁ x + θ₂ x² on (0, ∞).</summary>
    private static readonly NaturalSet s_halfNormal = new(
    [
        Zero([s_bounded, s_bounded, s_bounded]),
        Infinity([Power(1), Power(2), s_bounded], Rank(Power(1), "level", 0, 1, 0), Rank(Power(2), "square", 0, 0, 1)),
    ]);

    /// <summary>θ log x on 1, 2, …; with −1.5 log log x in the base measure.</summary>
    private static readonly NaturalSet s_zeta = new(
    [
        Infinity([s_log, new(GrowthKind.LogLog)], Rank(s_log, "size", 0, 1), Rank(new(GrowthKind.LogLog), "−3/2", -1.5, 0)),
    ]);

    [Theory]
    [InlineData(-0.5, -1, true, true)]
    [InlineData(-1, -1, false, false)]
    [InlineData(3, 0, false, false)]
    [InlineData(-5, 0, false, false)]
    [InlineData(3, 1e-300, false, false)]
    [InlineData(3, -1e-300, true, true)]
    [InlineData(double.NaN, -1, false, false)]
    [InlineData(0, double.NegativeInfinity, false, false)]
    public void Gamma(double shape, double rate, bool contained, bool interior) => Check(s_gamma, [shape, rate], contained, interior);

    [Theory]
    [InlineData(2, 1, true, true)]
    [InlineData(2, -1, false, false)]
    [InlineData(-0.1, 0, true, false)]
    [InlineData(0, 0, false, false)]
    [InlineData(0.1, 0, false, false)]
    public void Counts_with_a_free_spread(double total, double crowding, bool contained, bool interior) =>
        Check(s_crowded, [total, crowding], contained, interior);

    [Theory]
    [InlineData(5, -1, true, true)]
    [InlineData(-1, 0, true, false)]
    [InlineData(1, 0, false, false)]
    [InlineData(-1, 0.01, false, false)]
    public void Square_on_a_half_line(double level, double square, bool contained, bool interior) =>
        Check(s_halfNormal, [level, square], contained, interior);

    [Theory]
    [InlineData(-1.01, true, true)]
    [InlineData(-1, true, false)]
    [InlineData(-0.99, false, false)]
    public void A_power_refined_by_a_double_logarithm(double size, bool contained, bool interior) => Check(s_zeta, [size], contained, interior);

    private static void Check(NaturalSet set, double[] theta, bool contained, bool interior)
    {
        Assert.Equal(contained, set.Contains(theta));
        Assert.Equal(interior, set.IsInterior(theta));
        Assert.Equal(contained, set.Violation(theta) is null);
    }

    [Fact]
    public void Bounded_exponents_diverge_at_infinity_and_converge_at_a_finite_end()
    {
        Assert.False(new NaturalSet([Infinity([s_bounded])]).Contains([]));
        Assert.True(new NaturalSet([Zero([s_bounded])]).Contains([]));
        Assert.True(new NaturalSet([]).Contains([1]));
    }

    [Fact]
    public void Zero_means_zero_after_an_exact_sum()
    {
        // 0.1 + 0.2 − 0.3 is not zero in doubles, and 1e16 + 1 − 1e16 loses its one in a plain sum
        var set = new NaturalSet([Infinity([s_bounded, s_bounded, s_bounded, s_bounded], Rank(Power(2), "sum", 0, 1, 1, 1), Rank(Power(1), "slope", -1, 0, 0, 0))]);
        Assert.True(set.Contains([0.25, 0.5, -0.75]));
        Assert.False(set.Contains([0.1, 0.2, -0.3]));
        Assert.False(set.Contains([1e16, 1, -1e16]));
        Assert.True(set.Contains([1e16, -1, -1e16]));
    }

    [Fact]
    public void Ranks_of_one_growth_are_added_and_orders_may_turn_out_to_vanish()
    {
        // x^k with a known k that happens to be 1, beside x; and x^k log x with k = 0
        var statistics = ImmutableArray.Create(Power(1), Power(1), s_bounded);
        var set = new NaturalSet([Infinity(statistics, Rank(Power(1), "a", 0, 1, 0), Rank(Power(1), "b", 0, 0, 1), Rank(new(GrowthKind.PowerTimesLog, 0), "c", -2, 0, 0))]);
        Assert.False(set.Contains([1, -0.5]));
        Assert.True(set.Contains([0.5, -1]));
        Assert.True(set.Contains([1, -1]));
        Assert.False(new NaturalSet([Infinity(statistics, Rank(Power(-1), "a", -1, 0, 0))]).Contains([0, 0]));
    }

    [Fact]
    public void Strength_interleaves_powers_with_and_without_logarithm()
    {
        Growth[] ordered =
        [
            new(GrowthKind.LogLog), new(GrowthKind.Log), new(GrowthKind.LogPower, 2), new(GrowthKind.LogPower, 3), Power(0.5),
            new(GrowthKind.PowerTimesLog, 0.5), Power(1), new(GrowthKind.PowerTimesLog), Power(1.5), Power(2), new(GrowthKind.Exponential, 0.1),
            new(GrowthKind.Exponential, 2),
        ];
        for (var i = 0; i < ordered.Length; i++)
            for (var j = 0; j < ordered.Length; j++)
                Assert.Equal(i.CompareTo(j), Math.Sign(Growth.CompareStrength(ordered[i], ordered[j])));
    }

    [Fact]
    public void Moments_of_a_power_tail()
    {
        // exponent θ log(1 + x) on (0, ∞): E xᵏ is finite for θ + k < −1
        var set = new NaturalSet([Zero([s_bounded, s_bounded]), Infinity([s_log, s_bounded], Rank(s_log, "θ", 0, 1))]);
        Assert.True(set.IsObservationMomentFinite([-2.5], 1));
        Assert.False(set.IsObservationMomentFinite([-2], 1));
        Assert.False(set.IsObservationMomentFinite([-2.5], 2));
        Assert.True(set.IsMomentFinite([-1.001], 0, 8));
        Assert.False(set.IsMomentFinite([-1], 0, 1));
        Assert.True(set.IsFinite([-2.5], default, Power(1)));
        Assert.False(set.IsFinite([-2.5], default, Power(1.5)));
    }

    [Fact]
    public void Moments_at_a_finite_end_and_on_a_face()
    {
        // 1/x under the gamma law needs shape > 0
        Assert.True(s_gamma.IsFinite([0.1, -1], Power(1), default));
        Assert.False(s_gamma.IsFinite([0, -1], Power(1), default));
        Assert.True(s_gamma.IsMomentFinite([-0.999, -1], 0, 2));
        Assert.True(s_gamma.IsProductFinite([-0.999, -1], 0, 1));
        Assert.True(s_crowded.IsMomentFinite([-0.1, 0], 1, 2));
    }

    [Fact]
    public void Logarithmic_factors_matter_at_equality()
    {
        // density 1/(x (log x)^3): E log x is finite, E (log x)² is not
        var set = new NaturalSet([Infinity([s_log, s_log], Rank(s_log, "c", 0, 1), Rank(new(GrowthKind.LogLog), "d", -3, 0))]);
        Assert.True(set.IsMomentFinite([-1], 0, 1));
        Assert.False(set.IsMomentFinite([-1], 0, 2));
        Assert.False(set.IsProductFinite([-1], 0, 0));
    }

    [Fact]
    public void An_exponential_factor_shifts_the_linear_rank()
    {
        Assert.True(s_gamma.IsFinite([0, -2], default, new(GrowthKind.Exponential, 1.5)));
        Assert.False(s_gamma.IsFinite([0, -1], default, new(GrowthKind.Exponential, 1.5)));
        Assert.True(s_halfNormal.IsFinite([0, -1e-9], default, new(GrowthKind.Exponential, 1.5)));
    }

    [Fact]
    public void Violations_say_what_would_have_to_hold_and_what_is()
    {
        Assert.Equal("the normalizer is finite at x → 0 only if −shape < 1; here −shape = 1", s_gamma.Violation([-1, -1]));
        Assert.Equal(
            "the normalizer is finite at x → ∞ only if −crowding < 0, or −crowding = 0 and total + crowding < 0; here −crowding = 0 and total + crowding = 0.5",
            s_crowded.Violation([0.5, 0]));
        Assert.Equal("natural parameter 2 is NaN", s_gamma.Violation([1, double.NaN]));
        Assert.Equal("the normalizer is infinite at x → ∞ for every parameter", new NaturalSet([Infinity([s_bounded])]).Violation([]));
    }

    [Fact]
    public void Walls_tell_which_of_them_belong_to_the_set()
    {
        var gamma = s_gamma.Walls();
        Assert.Equal(["−shape < 1", "rate < 0, or rate = 0 and shape < -1"], gamma.Select(wall => wall.Condition));
        Assert.Equal(-1.5, gamma[0].Value([0.5, -1]));

        var crowded = Assert.Single(s_crowded.Walls());
        Assert.Equal(WallMembership.Conditional, crowded.Membership);
        Assert.Equal("total + crowding", crowded.Refinement!.Text);
        Assert.Equal(WallMembership.Excluded, crowded.Refinement.Membership);
        Assert.Equal(0, crowded.Value([-3, 0]));

        // −x² in the base measure holds everywhere behind the wall of a cubic term
        var cubic = new NaturalSet([Infinity([Power(3), Power(2)], Rank(Power(3), "skew", 0, 1), Rank(Power(2), "−1", -1, 0))]);
        Assert.Equal(WallMembership.Included, Assert.Single(cubic.Walls()).Membership);
        Assert.Equal("skew ≤ 0", cubic.Walls()[0].Condition);
        Assert.Empty(new NaturalSet([Zero([s_bounded, s_bounded])]).Walls());
    }
}
