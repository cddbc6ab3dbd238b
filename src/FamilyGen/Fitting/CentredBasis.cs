using System;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>A change of basis of the statistics that takes their common slope at the reference point out of all but one:
/// u_p = T_p and u_j = T_j − ρ_j T_p with ρ_j = slope_j/slope_p. In it the statistics x and x² of a normal law at 1e8 are as
/// easy to tell apart as at 0.</summary>
/// <remarks>θ·T = ψ·u with ψ_j = θ_j and ψ_p = θ_p + Σ ρ_j θ_j.</remarks>
internal sealed class CentredBasis
{
    private readonly double[] _slopes;
    private readonly double[] _ratios;

    /// <summary>A basis around the pivot, or the statistics themselves for pivot −1.</summary>
    public CentredBasis(ReadOnlySpan<double> slopes, int pivot)
    {
        _slopes = slopes.ToArray();
        Pivot = pivot;
        _ratios = new double[slopes.Length];
        if (pivot < 0)
            return;
        for (var j = 0; j < slopes.Length; j++)
            _ratios[j] = j == pivot ? 0 : slopes[j] / slopes[pivot];
    }

    /// <summary>The statistic whose slope is taken out of the others, or −1.</summary>
    public int Pivot { get; }

    /// <summary>The coefficient of x − m in u_j: for j ≠ pivot only what rounding of ρ_j left.</summary>
    public double Slope(int j) => Pivot < 0 || j == Pivot
        ? _slopes[j]
        : Math.FusedMultiplyAdd(-_ratios[j], _slopes[Pivot], _slopes[j]);

    /// <summary>u from T, for statistics or walls' weights.</summary>
    public double[] Transform(ReadOnlySpan<TwoSum> statistics)
    {
        var result = new double[_ratios.Length];
        for (var j = 0; j < result.Length; j++)
            result[j] = _ratios[j] == 0 ? statistics[j].High : (statistics[j] - (_ratios[j] * statistics[Pivot])).High;
        return result;
    }

    /// <summary>The coefficient of residual l in u_j.</summary>
    public double Weight(int j, int l) => j == l ? 1 : l == Pivot ? -_ratios[j] : 0;

    /// <summary>ψ from θ, for parameters or their changes.</summary>
    public double[] FromNatural(ReadOnlySpan<double> theta)
    {
        var result = theta.ToArray();
        if (Pivot < 0)
            return result;
        TwoSum sum = theta[Pivot];
        for (var j = 0; j < result.Length; j++)
        {
            if (_ratios[j] != 0)
                sum += (TwoSum)_ratios[j] * theta[j];
        }

        result[Pivot] = sum.High;
        return result;
    }

    /// <summary>θ + the change Δψ; the pivot's parameter makes up for the rounding of the others.</summary>
    public double[] Step(ReadOnlySpan<double> theta, ReadOnlySpan<double> change)
    {
        var result = new double[_ratios.Length];
        for (var j = 0; j < result.Length; j++)
            result[j] = theta[j] + change[j];
        if (Pivot < 0)
            return result;
        TwoSum sum = (TwoSum)theta[Pivot] + change[Pivot];
        for (var j = 0; j < result.Length; j++)
        {
            if (_ratios[j] != 0)
                sum -= (TwoSum)_ratios[j] * (result[j] - theta[j]);
        }

        result[Pivot] = sum.High;
        return result;
    }

    /// <summary>Bᵀ M B: a covariance of ψ as one of θ.</summary>
    public double[,] ToNatural(double[,] covariance)
    {
        var k = _ratios.Length;
        var result = new double[k, k];
        for (var i = 0; i < k; i++)
        {
            for (var j = 0; j < k; j++)
            {
                if (i != Pivot && j != Pivot)
                {
                    result[i, j] = covariance[i, j];
                    continue;
                }

                double sum = 0;
                for (var a = 0; a < k; a++)
                {
                    for (var b = 0; b < k; b++)
                    {
                        var weight = Weight(a, i) * Weight(b, j);
                        if (weight != 0)
                            sum += weight * covariance[a, b];
                    }
                }

                result[i, j] = sum;
            }
        }

        return result;
    }
}
