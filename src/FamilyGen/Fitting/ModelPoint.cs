using System;
using FamilyGen.Kernels;
using FamilyGen.Partition;

namespace FamilyGen.Fitting;

/// <summary>The likelihood at one natural parameter: its value for a unit of weight, its gradient and its curvature, all taken
/// about the law's mode in a basis in which they do not cancel.</summary>
internal sealed class ModelPoint<TKernel>
    where TKernel : struct, IKernel
{
    private ModelPoint(Distribution<TKernel> law, double[] theta, CentredBasis basis, double objective, double[] gradient, double[,] covariance)
    {
        (Law, Theta, Basis) = (law, theta, basis);
        (Objective, Gradient, Covariance) = (objective, gradient, covariance);
    }

    public Distribution<TKernel> Law { get; }

    /// <summary>The natural parameters θ.</summary>
    public double[] Theta { get; }

    /// <summary>The basis of <see cref="Gradient"/> and <see cref="Covariance"/>.</summary>
    public CentredBasis Basis { get; }

    /// <summary>The log-likelihood for a unit of weight.</summary>
    public double Objective { get; }

    /// <summary>Mean of the data less mean of the law, of the basis statistics: the gradient in ψ. Entries can be −∞ or ∞ on a
    /// face of the parameter set.</summary>
    public double[] Gradient { get; }

    /// <summary>The covariance of the basis statistics: the information of a unit of weight about ψ. Entries can be infinite on
    /// a face.</summary>
    public double[,] Covariance { get; }

    /// <summary>Evaluates; null where θ is not natural or the law cannot be evaluated (the reason is then given).</summary>
    public static ModelPoint<TKernel>? TryAt(StatisticSums<TKernel> sums, double[] theta, out string? reason)
    {
        reason = sums.Kernel.NaturalSet.Violation(theta);
        if (reason is not null)
            return null;
        try
        {
            var point = At(sums, theta);
            if (double.IsFinite(point.Objective))
                return point;
            reason = "the likelihood there is not a number";
        }
        catch (PartitionException failure)
        {
            reason = failure.Message;
        }

        return null;
    }

    /// <summary>The rate of change of the log-likelihood, for a unit of weight, along a change of θ.</summary>
    public double SlopeAlong(ReadOnlySpan<double> change)
    {
        var along = Basis.FromNatural(change);
        double sum = 0;
        for (var j = 0; j < along.Length; j++)
        {
            if (along[j] != 0)
                sum += along[j] * Gradient[j];
        }

        return sum;
    }

    /// <summary>Minus the second derivative along a change of θ.</summary>
    public double CurvatureAlong(ReadOnlySpan<double> change)
    {
        var along = Basis.FromNatural(change);
        double sum = 0;
        for (var i = 0; i < along.Length; i++)
        {
            for (var j = 0; j < along.Length; j++)
            {
                if (along[i] != 0 && along[j] != 0)
                    sum += along[i] * along[j] * Covariance[i, j];
            }
        }

        return sum;
    }

    /// <summary>The gradient in θ itself.</summary>
    public double[] NaturalGradient()
    {
        var gradient = (double[])Gradient.Clone();
        for (var j = 0; j < gradient.Length; j++)
        {
            if (j != Basis.Pivot && Basis.Pivot >= 0)
                gradient[j] -= Basis.Weight(j, Basis.Pivot) * Gradient[Basis.Pivot];
        }

        return gradient;
    }

    private static ModelPoint<TKernel> At(StatisticSums<TKernel> sums, double[] theta)
    {
        var k = TKernel.Count;
        var law = new Distribution<TKernel>(sums.Kernel, theta);
        var moments = law.Moments();
        var differences = new TwoSum[k];
        var value = new double[k + 1];
        var remainder = new double[k + 1];
        sums.Kernel.Evaluate(moments.Mode, value, remainder);
        for (var j = 0; j < k; j++)
            differences[j] = sums.Mean(j) - value[j] - remainder[j];

        var basis = new CentredBasis(moments.Slopes, ChoosePivot(moments, k));
        var data = basis.Transform(differences);
        var (gradient, covariance) = FromCentred(moments, basis, data);

        // θ·(T̄ − T(m)) = ψ·ū: the large parts of θ·T̄ and of A never appear.
        var psi = basis.FromNatural(theta);
        var objective = sums.Mean(k) - value[k] - remainder[k];
        for (var j = 0; j < k; j++)
            objective += (TwoSum)psi[j] * data[j];
        return new(law, theta, basis, (objective - law.LogWeight).High, gradient, covariance);
    }

    private static (double[] Gradient, double[,] Covariance) FromCentred(CentredMoments moments, CentredBasis basis, double[] data)
    {
        var k = data.Length;
        var loadings = Loadings(basis, k);
        var (gradient, covariance) = (new double[k], new double[k, k]);
        for (var i = 0; i < k; i++)
        {
            gradient[i] = data[i] - Combine(loadings, i, moments.Mean);
            for (var j = 0; j <= i; j++)
                covariance[i, j] = covariance[j, i] = Combine(loadings, i, j, moments.Covariance);
        }

        return (gradient, covariance);
    }

    /// <summary>The statistic that is nearest to a multiple of x itself.</summary>
    private static int ChoosePivot(CentredMoments moments, int k)
    {
        var (pivot, best) = (-1, 0.0);
        var deviation = Math.Sqrt(moments.Covariance[0, 0]);
        for (var j = 0; j < k; j++)
        {
            var linear = Math.Abs(moments.Slopes[j]) * deviation;
            var residual = Math.Sqrt(moments.Covariance[j + 1, j + 1]);
            var share = linear / (linear + residual);
            if (double.IsFinite(share) && share > best)
                (pivot, best) = (j, share);
        }

        return pivot;
    }

    /// <summary>u_i = Σ loading[i, l]·(d, r₀, r₁, …)_l.</summary>
    private static double[,] Loadings(CentredBasis basis, int k)
    {
        var loadings = new double[k, k + 1];
        for (var i = 0; i < k; i++)
        {
            loadings[i, 0] = basis.Slope(i);
            for (var l = 0; l < k; l++)
                loadings[i, l + 1] = basis.Weight(i, l);
        }

        return loadings;
    }

    private static double Combine(double[,] loadings, int i, ReadOnlySpan<double> mean)
    {
        double sum = 0;
        for (var l = 0; l < mean.Length; l++)
        {
            if (loadings[i, l] != 0)
                sum += loadings[i, l] * mean[l];
        }

        return sum;
    }

    private static double Combine(double[,] loadings, int i, int j, double[,] covariance)
    {
        double sum = 0;
        for (var a = 0; a < covariance.GetLength(0); a++)
        {
            for (var b = 0; b < covariance.GetLength(1); b++)
            {
                if (loadings[i, a] != 0 && loadings[j, b] != 0)
                    sum += loadings[i, a] * loadings[j, b] * covariance[a, b];
            }
        }

        return sum;
    }
}
