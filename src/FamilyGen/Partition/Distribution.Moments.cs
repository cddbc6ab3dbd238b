using System;
using System.Threading;

namespace FamilyGen.Partition;

public sealed partial class Distribution<TKernel>
{
    /// <summary>Mean and covariance of the statistics about the mode, for whoever needs all their digits.</summary>
    public CentredMoments Moments()
    {
        if (Volatile.Read(ref _moments) is { } known)
            return known;
        var moments = MomentMerge.Of(_whole);
        Volatile.Write(ref _moments, moments);
        return moments;
    }

    /// <summary>Mean and covariance of the statistics over a part of the support, about that part's own mode, with its log
    /// partition; null where the range holds no point of the support.</summary>
    public CentredMoments? Moments(SubRange range)
    {
        var partition = Evaluate(range, MomentPlan.Full(_kernel, _theta));
        return partition.Main is null ? null : MomentMerge.Of(partition);
    }

    /// <summary>∇A = E T, each +∞ or −∞ where it is infinite.</summary>
    public double[] MeanStatistics()
    {
        var moments = Moments();
        var mean = new double[TKernel.Count];
        for (var j = 0; j < mean.Length; j++)
            mean[j] = moments.StatisticMean(j);
        return mean;
    }

    /// <summary>∇²A = Cov T; +∞ where it is infinite.</summary>
    public double[,] StatisticCovariance()
    {
        var moments = Moments();
        var covariance = new double[TKernel.Count, TKernel.Count];
        for (var i = 0; i < TKernel.Count; i++)
        {
            for (var j = 0; j <= i; j++)
                covariance[i, j] = covariance[j, i] = moments.StatisticCovariance(i, j);
        }

        return covariance;
    }

    /// <summary>E X, +∞ where it is infinite.</summary>
    public double Mean
    {
        get
        {
            var moments = Moments();
            return moments.Mode.X + moments.Mean[0];
        }
    }

    /// <summary>E (X − E X)², +∞ where it is infinite.</summary>
    public double Variance => Moments().Covariance[0, 0];

    /// <summary>−E log p(X), in the measure of the support; +∞ where it is infinite.</summary>
    public double Entropy => _whole.Plan.Exponent
        ? _whole.LogWeight - MomentMerge.Exponent(_whole)
        : double.PositiveInfinity;
}
