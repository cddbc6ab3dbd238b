using System;
using FamilyGen.Partition;

namespace FamilyGen.Tests.Partition;

/// <summary>Supports and exponents out of the ordinary: pieces, residue classes, points of probability, several modes,
/// extreme scales and heavy tails.</summary>
public class StructureTests
{
    [Fact]
    public void A_normal_law_far_from_zero_keeps_its_digits()
    {
        var normal = Of<Normal>(1e8, -0.5);
        var covariance = normal.StatisticCovariance();
        Near(1e8, normal.Mean, 1e-16);
        Near(1, normal.Variance, 1e-12);
        Near(2e8, covariance[0, 1], 1e-12);
        Near(4e16 + 2, covariance[1, 1], 1e-12);
        Near(-0.91893853320467274 - 4.5, normal.LogDensity(1e8 + 3), 1e-14);
        Near(0.0013498980316300945, normal.Survival(1e8 + 3), 1e-12);
        Near(1.4189385332046727, normal.Entropy, 1e-13);
        var moments = normal.Moments();
        Near(2, moments.Covariance[2, 2], 1e-12);
        Assert.Equal(0, moments.Covariance[0, 2], 1e-12);
    }

    [Fact]
    public void A_gamma_law_of_shape_1e8_keeps_its_digits()
    {
        var gamma = Of<Gamma>(1e8 - 1, -1);
        var covariance = gamma.StatisticCovariance();
        Near(1e8, gamma.Mean, 1e-15);
        Near(1e8, gamma.Variance, 1e-11);
        Near(1, covariance[0, 1], 1e-11);
        Near(Special.Trigamma.Value(1e8), covariance[0, 0], 1e-11);
        Near(Special.Digamma.Value(1e8), gamma.MeanStatistics()[0], 1e-15);
    }

    [Fact]
    public void A_count_with_mean_1e9_keeps_its_digits()
    {
        var theta = Math.Log(1e9);
        var mean = Math.Exp(theta);
        var poisson = Of<Poisson>(theta);
        Near(mean, poisson.Mean, 1e-14);
        Near(mean, poisson.Variance, 1e-11);
        Near(mean, poisson.LogNormalizer, 1e-14);
    }

    [Fact]
    public void Narrow_modes_far_apart_are_both_found()
    {
        // −a(x² − b²)², wells of width 1/√(8ab²) at ±b
        const double A = 0.125, B = 1e3;
        var wells = Of<Quartic>(0, 2 * A * B * B, 0, -A);
        Assert.True(wells.IsProven);
        Near(B * B, wells.Variance, 1e-9);
        Assert.Equal(0, wells.Mean, 6);
        Near(0.5, wells.Cdf(0), 1e-9);
        Near(0.25, wells.Cdf(-B), 1e-4);
        Near(-B, wells.Quantile(0.25), 1e-5);
        Near(B, wells.Quantile(0.75), 1e-5);
    }

    [Fact]
    public void Two_peaks_a_day_on_a_circle()
    {
        var arrivals = Of<ArrivalHour>(2, -30, 40, 25);
        var sum = 0.0;
        var mean = new double[4];
        const int Count = 4000;                     // the trapezoid rule on a circle
        for (var i = 0; i < Count; i++)
        {
            var density = Math.Exp(arrivals.LogDensity(24.0 * i / Count)) * 24 / Count;
            sum += density;
            mean[0] += density * Math.Cos(2 * Math.PI * i / Count);
            mean[3] += density * Math.Sin(4 * Math.PI * i / Count);
        }

        Near(1, sum, 1e-12);
        Near(mean[0], arrivals.MeanStatistics()[0], 1e-11);
        Near(mean[3], arrivals.MeanStatistics()[3], 1e-11);
    }

    [Fact]
    public void Residue_classes_are_summed_apart()
    {
        const double Rate = -0.001, Extra = 1.3;
        var days = Of<WholeDays>(Rate, Extra);
        double q = Math.Exp(Rate), whole = -1 / Special.Elementary.ExpM1(Rate), multiples = -1 / Special.Elementary.ExpM1(24 * Rate);
        var z = whole + (Math.Exp(Extra) - 1) * multiples;
        Near(Math.Log(z), days.LogNormalizer, 1e-14);
        Near(Math.Exp(Extra) * multiples / z, days.MeanStatistics()[1], 1e-13);
        Near(Math.Exp(Extra) / z, Math.Exp(days.LogDensity(0)), 1e-12);
        Near(Math.Exp(23 * Rate) / z, Math.Exp(days.LogDensity(23)), 1e-12);
        var below = (1 - Math.Pow(q, 1000)) * whole + (Math.Exp(Extra) - 1) * (1 - Math.Exp(24 * Rate * 42)) * multiples;
        Near(below / z, days.Cdf(999), 1e-12);
        Assert.Equal(999, days.Quantile(days.Cdf(999)));
        Assert.Equal(1000, days.Quantile(days.Cdf(999) * (1 + 1e-12)));
    }

    [Fact]
    public void A_base_measure_may_vanish_on_a_residue_class()
    {
        var even = Of<EvenGeometric>(-0.3);
        Near(-Math.Log(-Special.Elementary.ExpM1(-0.6)), even.LogNormalizer, 1e-14);
        Assert.Equal(double.NegativeInfinity, even.LogDensity(7));
        Assert.Equal(even.Cdf(4), even.Cdf(5));
        Assert.Equal(6, even.Quantile(even.Cdf(4) * (1 + 1e-10)));
    }

    [Fact]
    public void A_base_measure_may_vanish_on_a_piece()
    {
        var uniform = Of<UniformFrom3>(0);
        Near(Math.Log(7), uniform.LogNormalizer, 1e-14);
        Assert.Equal(double.NegativeInfinity, uniform.LogDensity(2));
        Near(6.5, uniform.Mean, 1e-14);
        Assert.Equal(0, uniform.Cdf(2));
        Near(3.7, uniform.Quantile(0.1), 1e-14);
    }

    [Fact]
    public void A_point_may_carry_probability_of_its_own()
    {
        const double Rate = 2, Extra = 0.7;
        var stops = Of<ExponentialWithZero>(-Rate, Extra);
        var z = 1 / Rate + Math.Exp(Extra);
        Near(Math.Log(z), stops.LogNormalizer, 1e-14);
        Near(Math.Exp(Extra) / z, Math.Exp(stops.LogDensity(0)), 1e-14);
        Near(Math.Exp(Extra) / z, stops.MeanStatistics()[1], 1e-14);
        Near(Math.Exp(Extra) / z, stops.Cdf(0), 1e-14);
        Near(1 / Rate / z, stops.Survival(0), 1e-14);
        Near(1 / (Rate * Rate) / z, stops.Mean, 1e-13);
        Assert.Equal(0, stops.Quantile(0.5));
        Near(Math.Exp(Extra) / z, stops.Hazard(0), 1e-12);
        Near(-Math.Log(0.05 * z * Rate) / Rate, stops.Quantile(0.95), 1e-12);
        Near(Rate, stops.Hazard(3), 1e-12);
    }

    [Fact]
    public void Pieces_are_integrated_apart()
    {
        double[] theta = [1.5, -0.05, -6.5, -2.2];
        var loss = Of<GammaWithPowerTail>(theta);
        var body = Of<Gamma>(1.5, -0.05);
        var inside = body.LogPartition(SubRange.UpTo(100));
        var beyond = theta[2] + (theta[3] + 1) * Math.Log(100) - Math.Log(-theta[3] - 1);
        Near(inside + Special.Elementary.Log1P(Math.Exp(beyond - inside)), loss.LogNormalizer, 1e-14);
        var tail = Math.Exp(beyond - loss.LogNormalizer);
        Near(tail, loss.MeanStatistics()[2], 1e-12);
        Near(tail, loss.Survival(100), 1e-12);
        Near(tail * Math.Pow(1e5, -1.2), loss.Survival(1e7), 1e-10);
        Near(tail * Math.Pow(1e98, -1.2), loss.Survival(1e100), 1e-9);
        Assert.Equal(double.PositiveInfinity, loss.Variance);
        Assert.True(double.IsFinite(loss.Mean));
        Assert.True(double.IsFinite(loss.StatisticCovariance()[3, 3]));
        Near(1e7, loss.SurvivalQuantile(loss.Survival(1e7)), 1e-9);
    }

    [Fact]
    public void A_body_may_rise_up_to_the_point_where_another_takes_over()
    {
        double[] theta = [3, 0.02, -2, -3];
        var loss = Of<GammaWithPowerTail>(theta);
        var sum = 0.0;
        const int Steps = 4000;                    // Simpson's rule on (0, 100)
        for (var i = 0; i <= Steps; i++)
        {
            var x = 100.0 * i / Steps;
            sum += (i is 0 or Steps ? 1 : i % 2 == 0 ? 2 : 4) * Math.Exp(3 * Math.Log(x) + 0.02 * x - 15.8);
        }

        var body = sum * 100 / Steps / 3;
        var tail = Math.Exp(-2 - 2 * Math.Log(100) - Math.Log(2) - 15.8);
        Near(15.8 + Math.Log(body + tail), loss.LogNormalizer, 1e-11);
        Near(theta[0] * Math.Log(50) + 1 - loss.LogNormalizer, loss.LogDensity(50), 1e-13);
        Near(theta[2] + theta[3] * Math.Log(100) - loss.LogNormalizer, loss.LogDensity(100), 1e-13);
        Near(tail / (body + tail), loss.Survival(100), 1e-9);
        Near(loss.Cdf(100), Math.Exp(loss.LogProbability(SubRange.UpTo(100))), 1e-12);
    }

    [Fact]
    public void Kinks_and_shifted_ends()
    {
        var laplace = Of<Laplace>(-3, 1);
        Near(Math.Log(0.5 + 0.25), laplace.LogNormalizer, 1e-14);
        Near((0.25 - 0.0625) / 0.75, laplace.Mean, 1e-13);
        Near(Math.Log(1 / 0.75), laplace.LogDensity(0), 1e-14);
        var shifted = Of<GammaFrom1000>(1, -1e6);
        Near(-1e9 - 2 * Math.Log(1e6), shifted.LogNormalizer, 1e-15);
        Near(2e-12, shifted.Variance, 1e-11);
        Near(Math.Exp(-5) * 6, shifted.Survival(1000 + 5e-6), 1e-7);
        Assert.True(shifted.IsProven);
    }

    [Theory]
    [InlineData(0.001, 5)]
    [InlineData(1, 1)]
    [InlineData(1e6, 0.01)]
    public void An_exponential_statistic(double shape, double rate)
    {
        var law = Of<LogGammaLaw>(shape, -rate);
        Assert.True(law.IsProven);
        Near(Special.LogGamma.Value(shape) - shape * Math.Log(rate), law.LogNormalizer, 1e-13);
        Near(Special.Digamma.Value(shape) - Math.Log(rate), law.Mean, 1e-12);
        Near(Special.Trigamma.Value(shape), law.Variance, 1e-11);
        Near(shape / rate, law.MeanStatistics()[1], 1e-11);
    }

    [Theory]
    [InlineData(-1)]
    [InlineData(-0.55)]
    public void Power_tails_on_both_sides(double theta)
    {
        var law = Of<PowerTails>(theta);
        var half = -theta - 0.5;
        Near(0.57236494292470009 + Special.LogGamma.Value(half) - Special.LogGamma.Value(half + 0.5), law.LogNormalizer, 1e-12);
        Near(Special.Digamma.Value(half + 0.5) - Special.Digamma.Value(half), law.MeanStatistics()[0], 1e-10);
        Assert.Throws<PartitionException>(() => Of<PowerTails>(-0.5005));
    }

    [Fact]
    public void Many_modes_are_summed_and_too_many_are_refused()
    {
        Near(Of<VonMises>(300, 0).LogNormalizer, Of<CoarseWave>(300).LogNormalizer, 1e-14);
        Assert.Throws<PartitionException>(() => Of<FineWave>(50));
    }

    [Fact]
    public void Faces_and_moments_that_are_infinite()
    {
        Near(Of<Geometric>(-0.5).LogNormalizer, Of<DispersedCount>(-0.5, 0).LogNormalizer, 1e-15);
        var gamma = Of<Duration>(1, -2, 0);
        Near(-2 * Math.Log(2), gamma.LogNormalizer, 1e-14);
        Near(2, gamma.MeanStatistics()[2], 1e-12);
        Assert.Equal(double.PositiveInfinity, gamma.StatisticCovariance()[2, 2]);
        Near(0.5, gamma.StatisticCovariance()[0, 1], 1e-12);
        Assert.Equal(double.PositiveInfinity, Of<Duration>(-0.5, -2, 0).MeanStatistics()[2]);
        var inverse = Of<Duration>(-1.5, 0, -1);
        Assert.Equal(double.PositiveInfinity, inverse.Mean);
        Assert.Equal(double.PositiveInfinity, inverse.MeanStatistics()[1]);
        Near(0.5, inverse.MeanStatistics()[2], 1e-12);
        Assert.True(double.IsFinite(inverse.Entropy));
    }

    [Fact]
    public void A_density_allocates_nothing()
    {
        var law = Of<Gamma>(2.5, -1);
        var sum = law.LogDensity(1);
        var before = GC.GetAllocatedBytesForCurrentThread();
        for (var i = 1; i < 1000; i++)
            sum += law.LogDensity(0.01 * i);
        Assert.Equal(before, GC.GetAllocatedBytesForCurrentThread());
        Assert.True(double.IsFinite(sum));
    }

    [Fact]
    public void A_half_line_may_lie_below_its_end()
    {
        var below = Of<ExponentialBelow>(0.25);
        Near(1.25 + Math.Log(4), below.LogNormalizer, 1e-14);
        Near(1, below.Mean, 1e-13);
        Near(16, below.Variance, 1e-12);
        Near(Math.Exp(-0.25 * 105), below.Cdf(-100), 1e-11);
        Near(5 + 4 * Math.Log(1e-20), below.Quantile(1e-20), 1e-12);
    }

    [Fact]
    public void All_integers()
    {
        // Jacobi's theta function at σ = 1000 is the integral, at σ = 0.2 two terms and a bit
        var wide = Of<DiscreteNormal>(0.3, -0.5e-6);
        Near(0.3 * 0.3 / 2e-6 + Math.Log(1000 * Math.Sqrt(2 * Math.PI)), wide.LogNormalizer, 1e-14);
        Near(3e5, wide.Mean, 1e-14);
        Near(1e6, wide.Variance, 1e-11);
        var narrow = Of<DiscreteNormal>(0, -12.5);
        Near(2 * Math.Exp(-12.5) / (1 + 2 * Math.Exp(-12.5)), narrow.Variance, 1e-13);
        Near(0, narrow.Mean, 1e-18);
        Near(Math.Exp(-12.5 * 100 - narrow.LogNormalizer), narrow.Cdf(-10), 1e-11);
    }

    [Theory]
    [InlineData(-3, 1.2020569031595942854, -0.19812624288563685333)]
    [InlineData(-1.5, 2.6123753486854883433, -3.9322397374311015)]
    public void Power_tails_of_counts(double theta, double zeta, double derivative)
    {
        var law = Of<Zeta>(theta);
        Near(Math.Log(zeta), law.LogNormalizer, 1e-13);
        Near(-derivative / zeta, law.MeanStatistics()[0], 1e-12);
        Assert.Equal(double.PositiveInfinity, law.Variance);
        Assert.Equal(theta < -2 ? 1.3684327776202058757 : double.PositiveInfinity, law.Mean, 12);
    }

    [Theory]
    [InlineData(-1.001)]
    [InlineData(-1.5)]
    [InlineData(-4)]
    public void Power_tails_of_measurements(double theta)
    {
        var excess = -theta - 1;
        var law = Of<Pareto>(theta);
        Near(-Math.Log(excess), law.LogNormalizer, 1e-12);
        Near(1 / excess, law.MeanStatistics()[0], 1e-10);
        Near(1 / (excess * excess), law.StatisticCovariance()[0, 0], 1e-10);
        Near(Math.Pow(1e200, -excess), law.Survival(1e200), 1e-9);
        Assert.Equal(theta < -2, double.IsFinite(law.Mean));
        Assert.Equal(theta < -3, double.IsFinite(law.Variance));
    }

    [Theory]
    [InlineData(1e-250)]
    [InlineData(1e-100)]
    [InlineData(1e-3)]
    [InlineData(1e100)]
    [InlineData(1e140)]
    public void Any_scale(double scale)
    {
        var exponential = Of<Exponential>(-1 / scale);
        Near(scale, exponential.Mean, 1e-12);
        Near(scale * scale, exponential.Variance, 1e-11);
        Near(Math.Log(scale), exponential.LogNormalizer, 1e-13);
        if (scale is < 1e-120 or > 1e120)
            return;
        var normal = Of<Normal>(3 / scale, -0.5 / (scale * scale));
        Assert.True(normal.IsProven);
        Near(3 * scale, normal.Mean, 1e-12);
        Near(scale * scale, normal.Variance, 1e-11);
    }

    [Fact]
    public void An_infinite_slope_at_an_end_is_no_mode_lost()
    {
        // ∫ x^(−sx) dx for s = 1 is the sophomore's dream: Σ n^(−n)
        Near(Math.Log(1.29128599706266354), Of<EntropyLike>(-1).LogNormalizer, 1e-13);
        Near(Math.Log(0.78343051071213440), Of<EntropyLike>(1).LogNormalizer, 1e-13);
    }

    [Fact]
    public void Functions_that_cannot_be_read_are_scanned()
    {
        var normal = Of<UnreadNormal>(300, -0.5);
        Assert.False(normal.IsProven);
        Near(45000 + 0.91893853320467274, normal.LogNormalizer, 1e-13);
        Near(1, normal.Variance, 1e-9);
        var count = Of<UnreadCount>(Math.Log(5000), 1);
        Near(5000, count.LogNormalizer, 1e-12);
        Near(5000, count.Mean, 1e-10);
        Near(5000, count.Variance, 1e-8);
    }

    [Fact]
    public void Parts_of_the_support_have_their_own_mode_and_moments()
    {
        var exponential = Of<Exponential>(-2);
        Near(-2e6 - Math.Log(2), exponential.LogPartition(SubRange.From(1e6)), 1e-14);
        var beyond = exponential.Moments(SubRange.Above(1e6))!;
        Near(1e6 + 0.5, beyond.StatisticMean(0), 1e-15);
        Near(0.25, beyond.StatisticCovariance(0, 0), 1e-9);
        var normal = Of<Normal>(0, -0.5);
        var far = normal.Moments(SubRange.From(1000))!;
        Near(1000.0009999980000, far.StatisticMean(0), 1e-14);
        Near(9.99994000051e-7, far.StatisticCovariance(0, 0), 1e-9);
        Assert.Null(normal.Moments(SubRange.Between(3, 2)));
        var poisson = Of<Poisson>(1);
        Near(Math.Log(Math.Exp(2) / 2 + Math.Exp(3) / 6), poisson.LogPartition(new SubRange(1, 4, false, false)), 1e-14);
        Assert.Equal(double.NegativeInfinity, poisson.LogPartition(new SubRange(1, 2, false, false)));
    }

    [Fact]
    public void Hazards_and_ends()
    {
        var geometric = Of<Geometric>(-0.5);
        Near(-Special.Elementary.ExpM1(-0.5), geometric.Hazard(0), 1e-13);
        Near(-Special.Elementary.ExpM1(-0.5), geometric.Hazard(5000), 1e-10);
        Assert.Equal(0, geometric.Hazard(2.5));
        Assert.Equal(0, geometric.Quantile(0));
        Assert.Equal(double.PositiveInfinity, geometric.Quantile(1));
        Assert.Equal(double.NegativeInfinity, geometric.LogDensity(double.PositiveInfinity));
        Assert.True(double.IsNaN(geometric.LogDensity(double.NaN)));
        var beta = Of<Beta>(1, 1);
        Assert.Equal(0, beta.Quantile(0));
        Assert.Equal(1, beta.Quantile(1));
        Assert.Equal(0, beta.Cdf(-3));
        Assert.Equal(1, beta.Cdf(3));
        Assert.Equal(0, beta.Survival(1));
        Assert.Throws<ArgumentOutOfRangeException>(() => beta.Quantile(1.5));
        Assert.Throws<ArgumentOutOfRangeException>(() => beta.Quantile(double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => Of<Gamma>(-1, -1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Of<Normal>(double.NaN, -1));
        Assert.Throws<ArgumentException>(() => Of<Normal>(1));
    }

    private static Distribution<AtomKernel<TFamily>> Of<TFamily>(params double[] theta)
        where TFamily : IAtomFamily => new(default, theta);

    private static void Near(double expected, double actual, double relative) =>
        Assert.True(
            actual == expected || Math.Abs(actual - expected) <= relative * Math.Max(Math.Abs(expected), relative < 1e-15 ? 1 : 0),
            FormattableString.Invariant($"{actual:R} instead of {expected:R}, {Math.Abs(actual - expected) / Math.Abs(expected):G3} of it"));
}
