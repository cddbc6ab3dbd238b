using System;

namespace FamilyGen.Partition;

/// <summary>The rest of second moments that are nearly infinite, E x⁻² of a gamma law of shape 2.0001 say: they still count
/// where the weight itself leaves the range of doubles.</summary>
/// <remarks>On a logarithmic coordinate the weight and every power of the distance to the end are exponentials there, up to
/// terms below 1e−80, so that what is left of a moment is its integrand divided by the rate at which that falls. Moments
/// that are not of this form do not count any more at such distances.</remarks>
internal sealed class MomentTail<TKernel>(PanelSum<TKernel> panel, MomentPlan plan, Coordinate kind)
    where TKernel : struct, FamilyGen.Kernels.IKernel
{
    private const double LeastLog = -600;
    private const double FarthestLog = -650;
    private const double Negligible = 1e-18;

    // How far apart the rates found over two stretches may be, beside the rate.
    private const double Constancy = 1e-6;

    /// <summary>Whether the weight at the start of a panel is near the end of the range of doubles. The panel is shortened so
    /// that it does not reach beyond that range itself.</summary>
    public bool IsReached(double origin, double start, ref double size, double direction)
    {
        if (plan.Size == 0 || kind == Coordinate.Identity || start == 0)
            return false;
        if (panel.Log(origin + direction * start, out _) < LeastLog)
            return true;
        for (var i = 0; i < 60 && panel.Log(origin + direction * (start + size), out _) < FarthestLog; i++)
            size /= 2;
        return false;
    }

    /// <summary>Adds what second moments have beyond an offset.</summary>
    public void Complete(double origin, double start, double direction, Sums total)
    {
        var stretch = start / 4;
        var (near, log) = At(origin + direction * start);
        var (middle, logMiddle) = At(origin + direction * (start - stretch));
        var (far, logFar) = At(origin + direction * (start - 2 * stretch));
        for (var i = 0; i < plan.Size; i++)
        {
            for (var j = 0; j <= i && plan.Order[i] == 2; j++)
            {
                if (plan.Order[j] != 2)
                    continue;
                var top = Log(near, i, j, log);
                var (rate, before) = ((Log(middle, i, j, logMiddle) - top) / stretch, (Log(far, i, j, logFar) - top) / (2 * stretch));
                var value = Math.Sign(near[i]) * Math.Sign(near[j]) * Math.Exp(top);
                var known = Math.Max(total.Scale[i], total.Scale[j]);
                if (value == 0 || (rate > 0 && Math.Abs(value) <= Negligible * rate * known))
                    continue;
                if (!(Math.Abs(rate - before) <= Constancy * rate))
                    throw new PartitionException("A moment is too near to infinity: it still counts where doubles end.");
                total.AddProduct(i, j, value / rate);
            }
        }
    }

    private (double[] Basis, double Log) At(double offset)
    {
        var log = panel.Log(offset, out _);
        return (panel.Basis.ToArray(), log);
    }

    // The logarithm of the integrand of bᵢbⱼ.
    private static double Log(double[] basis, int i, int j, double log) =>
        log + Math.Log(Math.Abs(basis[i])) + Math.Log(Math.Abs(basis[j]));
}
