using System;
using FamilyGen.Kernels;

namespace FamilyGen.Partition;

/// <summary>Which moments a sweep gathers. The basis is the displacement d = x − m and, for each statistic, either its
/// residual about the tangent at m or its whole difference Tⱼ(x) − Tⱼ(m): residuals keep the digits of a law that is narrow
/// beside its own size, where statistics are all but linear; differences keep those of a heavy tail.</summary>
internal sealed class MomentPlan
{
    /// <summary>No moments: the partition alone.</summary>
    public static MomentPlan None { get; } = new(0, []) { Exponent = false };

    public MomentPlan(int displacementOrder, int[] statisticOrders)
    {
        Order = new int[statisticOrders.Length == 0 ? 0 : statisticOrders.Length + 1];
        if (Order.Length == 0)
            return;
        Order[0] = displacementOrder;
        statisticOrders.CopyTo(Order, 1);
        Tangential = new bool[statisticOrders.Length];
    }

    /// <summary>How high the finite moments of d, T₀ … are: 0, 1 or 2. Those that are infinite are left out.</summary>
    public int[] Order { get; }

    /// <summary>For each statistic, whether its basis function is the residual about the tangent.</summary>
    public bool[] Tangential { get; } = [];

    /// <summary>Whether the mean of the exponent is wanted.</summary>
    public bool Exponent { get; init; } = true;

    /// <summary>The number of basis functions.</summary>
    public int Size => Order.Length;

    /// <summary>The plan for all moments that are finite at the parameters.</summary>
    public static MomentPlan Full<TKernel>(TKernel kernel, ReadOnlySpan<double> theta)
        where TKernel : struct, IKernel
    {
        var orders = new int[TKernel.Count];
        for (var j = 0; j < orders.Length; j++)
            orders[j] = kernel.NaturalSet.IsMomentFinite(theta, j, 2) ? 2 : kernel.NaturalSet.IsMomentFinite(theta, j, 1) ? 1 : 0;
        var displacement = kernel.NaturalSet.IsObservationMomentFinite(theta, 2) ? 2
            : kernel.NaturalSet.IsObservationMomentFinite(theta, 1) ? 1 : 0;
        var exponent = kernel.NaturalSet.IsMomentFinite(theta, orders.Length, 1);
        for (var j = 0; j < orders.Length; j++)
            exponent &= theta[j] == 0 || orders[j] > 0;
        return new(displacement, orders) { Exponent = exponent };
    }
}
