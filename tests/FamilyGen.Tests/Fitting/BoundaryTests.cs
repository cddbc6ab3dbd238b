using System;
using System.Linq;
using FamilyGen.Fitting;
using FamilyGen.Kernels;
using FamilyGen.Tests.Partition;

namespace FamilyGen.Tests.Fitting;

/// <summary>Maxima on faces of parameter sets that are not open, and beside them.</summary>
public class BoundaryTests
{
    [Fact]
    public void Overdispersed_counts_end_on_the_geometric_face()
    {
        double[] counts = [0, 0, 0, 0, 1, 9, 20];
        var fit = Fit<ShiftStoppages>(counts);
        Assert.Equal(FitStatus.OnBoundary, fit.Status);
        var mean = counts.Average();
        Assert.Equal(Math.Log(mean / (1 + mean)), fit.Parameters[0], 13);
        Assert.Equal(0, fit.Parameters[1]);
        Assert.Equal(1 / Math.Sqrt(counts.Length * mean * (1 + mean)), fit.ParameterStandardErrors[0], 12);
        Assert.True(double.IsNaN(fit.ParameterStandardErrors[1]));
        Assert.True(double.IsNaN(fit.NaturalCovariance[0, 1]));

        // The multiplier is the score of crowding at the geometric law, by direct summation.
        var success = mean / (1 + mean);
        var expected = 0.0;
        for (var x = 0; x < 2000; x++)
            expected += Math.Pow(success, x) / (1 + mean) * Special.LogGamma.Value(x + 1);
        var condition = Assert.Single(fit.Multipliers);
        Assert.Equal("−crowding = 0 (x → ∞)", condition.Condition);
        Assert.Equal(counts.Sum(x => Special.LogGamma.Value(x + 1)) - (counts.Length * expected), condition.Multiplier, 8);
    }

    [Fact]
    public void A_wide_sample_on_a_half_line_ends_at_the_exponential_face()
    {
        double[] x = [0.01, 0.1, 0.05, 1, 8, 20];
        var fit = Fit<HalfLine>(x);
        Assert.Equal(FitStatus.OnBoundary, fit.Status);
        Assert.Equal(-1 / x.Average(), fit.Natural[0], 13);
        Assert.Equal(0, fit.Natural[1]);
        Assert.Equal(x.Length * ((-Math.Log(x.Average())) - 1), fit.LogLikelihood, 12);
        Assert.Equal(x.Sum(v => v * v) - (2 * x.Length * x.Average() * x.Average()), fit.Multipliers[0].Multiplier, 9);
        Assert.Contains("held", fit.ToString(), StringComparison.Ordinal);
        Assert.Contains("maximum on the boundary of the parameter set", fit.ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void A_narrow_sample_on_a_half_line_ends_inside()
    {
        var fit = Fit<HalfLine>([0.2, 0.5, 1, 1.2, 0.1]);
        Assert.Equal(FitStatus.InteriorMaximum, fit.Status);
        Assert.True(fit.Natural[1] < 0);
        Assert.Empty(fit.Multipliers);
    }

    [Fact]
    public void A_face_on_which_the_mean_is_infinite_is_not_the_answer()
    {
        // On the face hours = 0 the law is a Pareto's; a mean of the data that is finite pulls the maximum off it.
        var fit = Fit<TailFrom1>([1.1, 1.2, 1.5, 3, 40, 1.05]);
        Assert.Equal(FitStatus.InteriorMaximum, fit.Status);
        Assert.InRange(fit.Natural[1], -1e-4, -1e-7);
    }

    [Fact]
    public void Data_just_this_side_of_the_face_are_told_from_data_beyond_it()
    {
        // On the face the square has mean 2·mean²: the multiplier changes sign there.
        double[] shape = [0.05, 0.2, 0.4, 0.8, 1.2];
        double[] With(double last) => [.. shape, last];
        bool IsBeyond(double last)
        {
            var x = With(last);
            return x.Average(v => v * v) > 2 * x.Average() * x.Average();
        }

        for (var last = 2.0; last < 4; last += 0.1)
            Assert.Equal(IsBeyond(last) ? FitStatus.OnBoundary : FitStatus.InteriorMaximum, Fit<HalfLine>(With(last)).Status);
    }

    private static FitResult<TFamily> Fit<TFamily>(double[] data)
        where TFamily : struct, ITradeFamily
    {
        var sums = new StatisticSums<TradeKernel<TFamily>>(default);
        sums.AddRange(data);
        return MaximumLikelihood.FitTrade(sums, (_, _) => default(TFamily));
    }
}
