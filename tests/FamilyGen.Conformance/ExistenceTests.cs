using System;
using System.Linq;
using FamilyGen.Conformance.Families;

namespace FamilyGen.Conformance;

/// <summary>Data whose likelihood has its maximum on the edge of the parameter set, or none at all.</summary>
public class ExistenceTests
{
    [Fact]
    public void All_counts_zero_is_an_exception_that_names_the_direction()
    {
        var error = Assert.Throws<FitException>(() => Poisson.Fit([0, 0, 0, 0]));
        Assert.Contains("logRate", error.Message, StringComparison.Ordinal);
        Assert.Contains("−∞", error.Message, StringComparison.Ordinal);
        Assert.False(Poisson.TryFit([0, 0, 0, 0], out _, out var account));
        Assert.Equal(error.Message, account);
    }

    [Fact]
    public void One_repeated_value_has_no_maximum()
    {
        Assert.Throws<FitException>(() => ShiftStoppages.Fit([3, 3, 3, 3, 3]));
        Assert.Throws<FitException>(() => Normal.Fit([2.5, 2.5, 2.5]));
    }

    [Fact]
    public void Only_two_neighbouring_counts_have_no_maximum() =>
        Assert.Throws<FitException>(() => ShiftStoppages.Fit([2, 3, 3, 2, 3]));

    [Fact]
    public void A_category_that_never_occurs_has_no_maximum()
    {
        var error = Assert.Throws<FitException>(() => FourCategories.Fit([0, 1, 3, 3, 1, 0, 0]));
        Assert.Contains("second", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void All_or_none_has_no_maximum()
    {
        Assert.Throws<FitException>(() => FaultyTwistlocks.Fit([8, 8, 8], checkedLocks: 8));
        Assert.Throws<FitException>(() => FaultyTwistlocks.Fit([0, 0, 0], checkedLocks: 8));
    }

    [Fact]
    public void Counts_spread_wider_than_any_crowding_end_on_the_geometric_face()
    {
        int[] counts = [0, 0, 0, 0, 0, 0, 0, 1, 0, 0, 30, 0, 0, 2, 0, 0, 45, 0, 0, 1];
        var fit = ShiftStoppages.Fit(counts);
        Assert.Equal(FitStatus.OnBoundary, fit.Status);
        Assert.Equal(0, fit.Natural[1]);

        // a geometric law with the mean of the counts
        var mean = counts.Average();
        Assert.Equal(Math.Log(mean / (1 + mean)), fit.Natural[0], 1e-9);
        Assert.Equal(mean, fit.Estimate.Mean, 1e-9);
        var logLikelihood = counts.Length * (mean * Math.Log(mean) - (1 + mean) * Math.Log(1 + mean));
        Assert.InRange(fit.LogLikelihood / logLikelihood, 1 - 1e-10, 1 + 1e-10);
        Assert.True(double.IsNaN(fit.StandardErrors[1]), "no standard error where the parameter is held");
    }

    [Fact]
    public void A_wide_sample_on_a_half_line_ends_where_the_square_has_no_weight()
    {
        double[] data = [0.01, 0.02, 0.05, 0.1, 0.1, 0.3, 14, 22];
        var fit = HalfLineNormal.Fit(data);
        Assert.Equal(FitStatus.OnBoundary, fit.Status);
        Assert.Equal(0, fit.Natural[1]);
        Assert.Equal(-1 / data.Average(), fit.Natural[0], 1e-9);
    }

    [Fact]
    public void A_narrow_sample_on_a_half_line_ends_inside()
    {
        var fit = HalfLineNormal.Fit([4, 5, 5.5, 6, 6.2, 7]);
        Assert.Equal(FitStatus.InteriorMaximum, fit.Status);
        Assert.True(fit.Natural[1] < 0);
    }

    [Fact]
    public void A_curved_family_says_that_its_maximum_is_local()
    {
        double[] data = [3.1, 5.2, 0.4, 7.7, 4.4, 2.5, 6.0];
        var fit = ProportionalReading.Fit(data);
        Assert.Equal(FitStatus.LocalMaximum, fit.Status);

        // the positive root of mean² + mean·average − average square = 0
        var (average, square) = (data.Average(), data.Average(x => x * x));
        Assert.Equal((Math.Sqrt(average * average + 4 * square) - average) / 2, fit.Estimate.Mean, 1e-8);
    }

    [Fact]
    public void A_point_of_its_own_is_fitted_by_its_share()
    {
        double[] waits = [0, 0, 1.5, 0, 3.5, 0.5, 0, 2.5];
        var fit = WaitingTime.Fit(waits);
        Assert.Equal(0.5, fit.Estimate.Density(0), 1e-10);
        Assert.Equal(-1 / 2.0, fit.Estimate.Natural[1], 1e-9);
    }
}
