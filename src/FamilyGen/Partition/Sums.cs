using System;

namespace FamilyGen.Partition;

/// <summary>Σ w, Σ w b and Σ w b bᵀ of basis functions b over weighted nodes, with Σ w |b|^order by which convergence is
/// judged, and Σ w (f − f(m)).</summary>
internal sealed class Sums
{
    private readonly MomentPlan _plan;

    public Sums(MomentPlan plan)
    {
        _plan = plan;
        First = new double[plan.Size];
        Second = new double[plan.Size * (plan.Size + 1) / 2];
        Scale = new double[plan.Size];
    }

    /// <summary>Σ w.</summary>
    public double Weight { get; private set; }

    /// <summary>Σ w b.</summary>
    public double[] First { get; }

    /// <summary>Σ w bᵢbⱼ, j ≤ i, row by row.</summary>
    public double[] Second { get; }

    /// <summary>Σ w |b|^order.</summary>
    public double[] Scale { get; }

    /// <summary>Σ w (f − f(m)).</summary>
    public double Exponent { get; private set; }

    /// <summary>Sets all sums to zero.</summary>
    public void Clear()
    {
        Weight = Exponent = 0;
        Array.Clear(First);
        Array.Clear(Second);
        Array.Clear(Scale);
    }

    /// <summary>Adds a node.</summary>
    public void Add(double weight, ReadOnlySpan<double> basis, double exponent)
    {
        Weight += weight;
        if (_plan.Exponent)
            Exponent += weight * exponent;
        var order = _plan.Order;
        for (int i = 0, cell = 0; i < order.Length; i++)
        {
            if (order[i] == 0)
            {
                cell += i + 1;
                continue;
            }

            var b = basis[i];
            var first = weight * b;
            First[i] += first;
            if (order[i] == 1)
            {
                Scale[i] += Math.Abs(first);
                cell += i + 1;
                continue;
            }

            Scale[i] += first * b;
            for (var j = 0; j < i; j++)
                Second[cell++] += order[j] == 2 ? first * basis[j] : 0;
            Second[cell++] += first * b;
        }
    }

    /// <summary>Adds to the sum of bᵢbⱼ, j ≤ i, alone.</summary>
    public void AddProduct(int i, int j, double value)
    {
        Second[(i * (i + 1) / 2) + j] += value;
        if (i == j)
            Scale[i] += value;
    }

    /// <summary>Adds other sums times a measure.</summary>
    public void Add(Sums other, double measure)
    {
        Weight += other.Weight * measure;
        Exponent += other.Exponent * measure;
        Add(First, other.First, measure);
        Add(Second, other.Second, measure);
        Add(Scale, other.Scale, measure);
    }

    private static void Add(double[] to, double[] from, double measure)
    {
        for (var i = 0; i < to.Length; i++)
            to[i] += from[i] * measure;
    }
}
