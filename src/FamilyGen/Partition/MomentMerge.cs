using System;
using FamilyGen.Kernels;

namespace FamilyGen.Partition;

/// <summary>Brings the moments of basins, each about its own reference point, together about the reference point of the
/// whole.</summary>
internal static class MomentMerge
{
    /// <summary>Mean and covariance of the basis functions over the whole range.</summary>
    public static CentredMoments Of<TKernel>(RangePartition<TKernel> partition)
        where TKernel : struct, IKernel
    {
        var plan = partition.Plan;
        var size = plan.Size;
        var mean = new double[size];
        var covariance = new double[size, size];
        var main = partition.Main!;
        var means = new double[partition.Parts.Length][];
        for (var i = 0; i < means.Length; i++)
        {
            var part = partition.Parts[i];
            var share = partition.Shares[i];
            if (share == 0)
                continue;
            var own = means[i] = new double[size];
            AddWithin(part, plan, share, EffectiveTilt(part, main, plan), own, covariance);
            if (part != main)
                AddShift(part, main, plan, own);
            for (var j = 0; j < size; j++)
                mean[j] += share * own[j];
        }

        for (var i = 0; i < means.Length && means.Length > 1; i++)
        {
            if (means[i] is not null)
                AddBetween(means[i], mean, plan, partition.Shares[i], covariance);
        }

        for (var i = 0; i < size; i++)
        {
            for (var j = 0; j < i; j++)
                covariance[j, i] = covariance[i, j];
        }

        MarkInfinite(plan, mean, covariance);
        return new(main.Expansion.Reference, EffectiveSlopes(main, plan), main.Expansion.Values.ToArray(), mean, covariance, partition.LogValue.Value);
    }

    /// <summary>E f − f(m) over the whole range.</summary>
    public static double Exponent<TKernel>(RangePartition<TKernel> partition)
        where TKernel : struct, IKernel
    {
        var sum = 0.0;
        for (var i = 0; i < partition.Parts.Length; i++)
        {
            var part = partition.Parts[i];
            if (partition.Shares[i] != 0)
                sum += partition.Shares[i] * (part.Sums.Exponent / part.Scale + CompensatedSum.Difference(part.Expansion.Level, partition.Main!.Expansion.Level));
        }

        return sum;
    }

    private static double[] EffectiveSlopes<TKernel>(BasinPart<TKernel> part, MomentPlan plan)
        where TKernel : struct, IKernel
    {
        var slopes = new double[plan.Tangential.Length];
        for (var j = 0; j < slopes.Length; j++)
            slopes[j] = plan.Tangential[j] ? part.Expansion.Slopes[j] : 0;
        return slopes;
    }

    // How far the tangents of a basin differ from those of the main one.
    private static double[] EffectiveTilt<TKernel>(BasinPart<TKernel> part, BasinPart<TKernel> main, MomentPlan plan)
        where TKernel : struct, IKernel
    {
        var tilt = EffectiveSlopes(part, plan);
        for (var j = 0; j < tilt.Length; j++)
            tilt[j] -= plan.Tangential[j] ? main.Expansion.Slopes[j] : 0;
        return tilt;
    }

    // Mean and covariance inside a basin, turned to the tangents of the main one.
    private static void AddWithin<TKernel>(
        BasinPart<TKernel> part, MomentPlan plan, double share, ReadOnlySpan<double> tilt, double[] mean, double[,] covariance)
        where TKernel : struct, IKernel
    {
        var size = plan.Size;
        var own = new double[size, size];
        for (int i = 0, cell = 0; i < size; i++)
        {
            mean[i] = part.Sums.First[i] / part.Scale;
            for (var j = 0; j <= i; j++, cell++)
                own[i, j] = own[j, i] = part.Sums.Second[cell] / part.Scale - mean[i] * mean[j];
            if (double.IsNaN(own[i, i]))
                own[i, i] = double.PositiveInfinity;
        }

        for (var i = 1; i < size; i++)
        {
            if (tilt[i - 1] == 0)
                continue;
            mean[i] += tilt[i - 1] * mean[0];
            for (var j = 0; j < size; j++)
                own[i, j] += tilt[i - 1] * own[0, j];
            for (var j = 0; j < size; j++)
                own[j, i] += tilt[i - 1] * own[j, 0];
        }

        for (var i = 0; i < size; i++)
        {
            for (var j = 0; j < size; j++)
                covariance[i, j] += share * own[i, j];
        }
    }

    // The basis functions at the basin's reference point, as seen from the main one.
    private static void AddShift<TKernel>(BasinPart<TKernel> part, BasinPart<TKernel> main, MomentPlan plan, double[] mean)
        where TKernel : struct, IKernel
    {
        var count = TKernel.Count;
        Span<double> residual = stackalloc double[count + 1];
        Span<double> difference = stackalloc double[count + 1];
        var m = part.Expansion.Reference;
        var seen = main.Expansion.Frame.Observation(m.X) with { Integer = m.Integer };
        main.Expansion.Difference(seen, residual, difference);
        mean[0] += seen.Displacement;
        for (var j = 0; j < count; j++)
            mean[j + 1] += plan.Tangential[j] ? residual[j] : difference[j];
    }

    private static void AddBetween(double[] own, double[] mean, MomentPlan plan, double share, double[,] covariance)
    {
        for (var i = 0; i < own.Length; i++)
        {
            for (var j = 0; j < own.Length; j++)
                covariance[i, j] += share * (own[i] - mean[i]) * (own[j] - mean[j]);
        }
    }

    private static void MarkInfinite(MomentPlan plan, double[] mean, double[,] covariance)
    {
        for (var i = 0; i < plan.Size; i++)
        {
            if (plan.Order[i] == 0)
                mean[i] = double.PositiveInfinity;
            for (var j = 0; j < plan.Size && plan.Order[i] < 2; j++)
                covariance[i, j] = covariance[j, i] = double.PositiveInfinity;
        }
    }
}
