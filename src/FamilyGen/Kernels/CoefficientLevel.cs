using System;
using System.Collections.Immutable;
using System.Linq;

namespace FamilyGen.Kernels;

/// <summary>One rank of an exponent at an end and the bound that its coefficient must stay below.</summary>
internal sealed class CoefficientLevel
{
    public CoefficientLevel(Growth growth, Rank[] ranks, double bound)
    {
        Growth = growth;
        Bound = bound;
        Constant = ranks.Sum(rank => rank.Constant);
        var weights = new double[ranks.Max(rank => rank.Weights.Length)];
        foreach (var rank in ranks)
            for (var j = 0; j < rank.Weights.Length; j++)
                weights[j] += rank.Weights[j];
        Weights = [.. weights];
        IsFixed = weights.All(weight => weight == 0);
        Text = string.Join(" + ", ranks.Select(rank => rank.Text).Where(text => text != "0"));
    }

    public Growth Growth { get; }

    public ImmutableArray<double> Weights { get; }

    public double Constant { get; }

    public double Bound { get; }

    /// <summary>The coefficient as a person would write it.</summary>
    public string Text { get; }

    /// <summary>Whether no parameter enters the coefficient.</summary>
    public bool IsFixed { get; }

    /// <summary>The coefficient with an extra contribution, less its bound.</summary>
    public double Excess(ReadOnlySpan<double> theta, double extra) => Excess(Weights, theta, Constant, extra - Bound);

    /// <summary>Σ weightⱼθⱼ + constant + offset, summed in twice the working precision: zero exactly when the parameters
    /// make it so.</summary>
    public static double Excess(ImmutableArray<double> weights, ReadOnlySpan<double> theta, double constant, double offset)
    {
        var sum = (TwoSum)constant + offset;
        for (var j = 0; j < weights.Length; j++)
            sum += (TwoSum)weights[j] * theta[j];
        return sum.High + sum.Low;
    }
}
