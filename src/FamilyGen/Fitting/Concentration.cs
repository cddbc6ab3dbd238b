using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>Proof that one repeated observation has no maximum of the likelihood: parameters along which the law draws together
/// on that observation, because a combination of the statistics has its top over the support just there.</summary>
internal static class Concentration
{
    private const int Steps = 12;

    /// <summary>The parameters of laws ever closer to the repeated observation; null when the data are not one value or the
    /// combination's top there is not confirmed all over the support.</summary>
    public static IReadOnlyList<double[]>? Path<TKernel>(StatisticSums<TKernel> sums)
        where TKernel : struct, IKernel
    {
        if (TKernel.Count < 2 || sums.Distinct.Values.Length != 1)
            return null;
        var x = sums.Distinct.Values[0];
        var deviation = Math.Max(Math.Abs(x), 1) / 4;
        var path = new List<double[]>();
        for (var step = 0; step < Steps; step++, deviation /= 4)
        {
            if (StartingPoints<TKernel>.LikeNormal(sums.Kernel, x, deviation) is not { } theta || !sums.Kernel.NaturalSet.IsInterior(theta))
                return null;
            path.Add(theta);
        }

        return IsTop(sums, path[^1], x) ? path : null;
    }

    private static bool IsTop<TKernel>(StatisticSums<TKernel> sums, double[] theta, double top)
        where TKernel : struct, IKernel
    {
        var size = theta.Max(Math.Abs);
        if (!(size > 0) || !double.IsFinite(size))
            return false;
        var value = new double[theta.Length + 1];
        var remainder = new double[theta.Length + 1];
        var (best, scale) = Combine(sums.Kernel, theta, size, top, value, remainder);
        foreach (var x in SupportProbe.Points(sums.Kernel.Domain, top, top))
        {
            if (x == top)
                continue;
            var (height, heightScale) = Combine(sums.Kernel, theta, size, x, value, remainder);
            if (double.IsFinite(value[^1]) && !((height - best).High < 1e-14 * (scale + heightScale)))
                return false;
        }

        return true;
    }

    private static (TwoSum Sum, double Scale) Combine<TKernel>(TKernel kernel, double[] theta, double size, double x, double[] value, double[] remainder)
        where TKernel : struct, IKernel
    {
        kernel.Evaluate(kernel.Domain.At(x), value, remainder);
        var (sum, scale) = ((TwoSum)0, 0.0);
        for (var j = 0; j < theta.Length; j++)
        {
            sum += (TwoSum)(theta[j] / size) * ((TwoSum)value[j] + remainder[j]);
            scale += Math.Abs(theta[j] / size * value[j]);
        }

        return (sum, scale);
    }
}
