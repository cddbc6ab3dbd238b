using System;
using FamilyGen.Kernels;

namespace FamilyGen.Partition;

/// <summary>Mean and covariance of the statistics over a range, in a basis that does not cancel: the displacement
/// d = x − m from a reference point m and, for each statistic, rⱼ(x) = Tⱼ(x) − Tⱼ(m) − slopeⱼ·d.</summary>
/// <remarks>Slopes are those of the statistics at m where the law is so narrow that they are all but linear, and 0 where
/// it is not; rⱼ is then the whole difference. With L = [slope | I] the covariance of the statistics is L C Lᵀ. A moment
/// that is infinite is +∞ (a mean of d or rⱼ that is infinite is +∞ whatever its sign); where the displacement has no finite
/// variance every slope is 0.</remarks>
public sealed class CentredMoments
{
    internal CentredMoments(Point mode, double[] slopes, double[] values, double[] mean, double[,] covariance, double logPartition)
    {
        Mode = mode;
        Slopes = slopes;
        ModeStatistics = values.AsSpan(0, slopes.Length).ToArray();
        Mean = mean;
        Covariance = covariance;
        LogPartition = logPartition;
    }

    /// <summary>The reference point m: the mode of the basin that holds the greatest weight.</summary>
    public Point Mode { get; }

    /// <summary>The slopes, one for each statistic.</summary>
    public double[] Slopes { get; }

    /// <summary>T₀(m), T₁(m), ….</summary>
    public double[] ModeStatistics { get; }

    /// <summary>The mean of (d, r₀, r₁, …).</summary>
    public double[] Mean { get; }

    /// <summary>The covariance of (d, r₀, r₁, …).</summary>
    public double[,] Covariance { get; }

    /// <summary>log ∫ exp(f) over the range.</summary>
    public double LogPartition { get; }

    /// <summary>E Tⱼ − Tⱼ(m).</summary>
    public double MeanDeviation(int statistic) =>
        Slopes[statistic] == 0 ? Mean[statistic + 1] : Slopes[statistic] * Mean[0] + Mean[statistic + 1];

    /// <summary>E Tⱼ.</summary>
    public double StatisticMean(int statistic) => ModeStatistics[statistic] + MeanDeviation(statistic);

    /// <summary>The covariance of two statistics.</summary>
    public double StatisticCovariance(int first, int second)
    {
        var (a, b) = (Slopes[first], Slopes[second]);
        var sum = Covariance[first + 1, second + 1];
        if (a != 0)
            sum += a * Covariance[0, second + 1];
        if (b != 0)
            sum += b * Covariance[first + 1, 0];
        if (a != 0 && b != 0)
            sum += a * b * Covariance[0, 0];
        return sum;
    }
}
