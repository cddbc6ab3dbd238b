using System;
using FamilyGen.Conformance.Families;

namespace FamilyGen.Conformance;

/// <summary>Parameters beside those at which a moment becomes infinite, where the moment is large and still exact.</summary>
public class NearFaceTests
{
    /// <summary>With no delay the law is a gamma law of shape s, and Var 1/X = rate²/((s − 1)²(s − 2)) is finite for s &gt; 2.</summary>
    [Theory]
    [InlineData(2.2)]
    [InlineData(2.05)]
    [InlineData(2.001)]
    [InlineData(2.0001)]
    public void The_variance_of_the_pace_of_a_gamma_law_is_exact_up_to_where_it_is_infinite(double shape)
    {
        const double Rate = 0.1;
        var law = new DelayedDuration(shape - 1, -Rate, 0);
        var expected = Rate * Rate / ((shape - 1) * (shape - 1) * (shape - 2));

        // one rounding of the shape moves the variance by 1e-16/(shape − 2) of itself
        var tolerance = (1e-11 + 4e-16 / (shape - 2)) * expected;
        Assert.InRange(law.StatisticCovariance[2, 2] - expected, -tolerance, tolerance);
        Assert.Equal(Rate / (shape - 1), law.MeanStatistics[2], 1e-12);
    }

    /// <summary>With no rate the law is an inverse gamma law of shape a, and Var X is finite for a &gt; 2.</summary>
    [Theory]
    [InlineData(2.1)]
    [InlineData(2.001)]
    public void The_variance_of_an_inverse_gamma_law_is_exact_up_to_where_it_is_infinite(double shape)
    {
        const double Scale = 2;
        var law = new DelayedDuration(-shape - 1, 0, -Scale);
        var expected = Scale * Scale / ((shape - 1) * (shape - 1) * (shape - 2));
        Assert.InRange(law.Variance / expected, 1 - 1e-10, 1 + 1e-10);
    }

    [Fact]
    public void A_moment_that_is_infinite_is_infinite()
    {
        Assert.Equal(double.PositiveInfinity, new DelayedDuration(-3, 0, -2).Variance);
        Assert.True(double.IsFinite(new DelayedDuration(-3, 0, -2).Mean));
        Assert.Equal(double.PositiveInfinity, new DelayedDuration(-2, 0, -2).Mean);
        Assert.Equal(double.PositiveInfinity, new DelayedDuration(0, -0.1, 0).MeanStatistics[2]);
    }
}
