using System;
using System.Collections.Generic;
using FamilyGen.Kernels;
using FamilyGen.Special;

namespace FamilyGen.Partition;

/// <summary>The partition over a range at one θ: log ∫ exp(f), basin by basin, about the mode of the basin that holds the
/// greatest weight.</summary>
internal sealed class RangePartition<TKernel>
    where TKernel : struct, IKernel
{
    // A statistic counts as all but linear where its residual stays below this part of its linear part.
    private const double NearlyLinear = 0.25;

    // and the linear part may exceed the whole deviation by this much at most, or digits are lost in their difference
    private const double MostCancellation = 64;

    // Distances to an end whose logarithm is larger overflow in slopes.
    private const double FarthestLog = 680;

    private RangePartition(BasinPart<TKernel>[] parts, MomentPlan plan, bool isProven)
    {
        (Parts, Plan, IsProven) = (parts, plan, isProven);
        Shares = new double[parts.Length];
        if (parts.Length == 0)
        {
            LogWeight = double.NegativeInfinity;
            return;
        }

        var main = 0;
        for (var i = 1; i < parts.Length; i++)
        {
            if (LogRatio(parts[i], parts[main]) > 0)
                main = i;
        }

        Main = parts[main];
        var others = 0.0;
        for (var i = 0; i < parts.Length; i++)
        {
            Shares[i] = i == main ? 1 : Math.Exp(LogRatio(parts[i], Main));
            if (i != main)
                others += Shares[i];
        }

        LogWeight = Main.LogWeight + Elementary.Log1P(others);
        foreach (ref var share in Shares.AsSpan())
            share /= 1 + others;
    }

    /// <summary>The basins in ascending order, residue class by residue class.</summary>
    public BasinPart<TKernel>[] Parts { get; }

    /// <summary>The part of the whole weight that lies in each basin.</summary>
    public double[] Shares { get; }

    /// <summary>The basin of the greatest weight, whose reference point is that of the whole; null when the range is
    /// empty.</summary>
    public BasinPart<TKernel>? Main { get; }

    public MomentPlan Plan { get; }

    /// <summary>Whether the modes are proved to be all there are.</summary>
    public bool IsProven { get; }

    /// <summary>log ∫ exp(f − f(m)), m the reference point.</summary>
    public double LogWeight { get; }

    /// <summary>log ∫ exp(f).</summary>
    public CompensatedSum LogValue
    {
        get
        {
            var value = Main?.Expansion.Level ?? default;
            value.Add(LogWeight);
            return value;
        }
    }

    /// <summary>Sweeps a range.</summary>
    public static RangePartition<TKernel> Over(
        TKernel kernel, double[] theta, SubRange range, MomentPlan plan, Func<int, IPanelSink>? sinks = null)
    {
        var domain = kernel.Domain;
        var chart = new Chart(domain);
        var basins = new List<Basin>();
        var isProven = !domain.IsOpaque;
        var search = new ModeSearch<TKernel>(kernel, theta, chart);
        foreach (var piece in Piece.Of(domain, range))
            isProven &= search.Find(piece, domain.IsOpaque, basins);
        foreach (var point in domain.Masses)
        {
            if (range.Contains(point))
                basins.Add(new(new Piece(point, point, 0, 1), chart.Reference(point), point, point, true));
        }

        var expansions = new Expansion<TKernel>[basins.Count];
        for (var i = 0; i < expansions.Length; i++)
            expansions[i] = About(kernel, theta, chart, basins[i]);
        ChooseBasis(expansions, basins, plan);
        var partition = Sweep(expansions, basins, domain.IsOpaque, plan, isProven, sinks);
        return sinks is null && plan.Size > 0 && partition.Main is not null && DropCancellingTangents(partition)
            ? Sweep(expansions, basins, domain.IsOpaque, plan, isProven, sinks)
            : partition;
    }

    private static RangePartition<TKernel> Sweep(
        Expansion<TKernel>[] expansions, List<Basin> basins, bool isOpaque, MomentPlan plan, bool isProven, Func<int, IPanelSink>? sinks)
    {
        var parts = new List<BasinPart<TKernel>>();
        for (var i = 0; i < expansions.Length; i++)
        {
            if (double.IsNegativeInfinity(expansions[i].Level.Value))
                continue;
            var sweep = new BasinSweep<TKernel>(expansions[i], basins[i], isOpaque, plan, sinks?.Invoke(parts.Count));
            parts.Add(new(basins[i], expansions[i], sweep.Total));
        }

        return new([.. parts], plan, isProven);
    }

    // The expansion about the basin's mode, or just inside where the exponent has no tangent at an edge.
    private static Expansion<TKernel> About(TKernel kernel, double[] theta, Chart chart, Basin basin)
    {
        Frame FrameAt(Point m) => new(chart, m, basin.Piece.InnerLower, basin.Piece.InnerUpper);
        var integer = basin.Piece.Step > 0 ? Frame.ToInteger(basin.Mode.X) : 0;
        var expansion = new Expansion<TKernel>(kernel, theta, FrameAt(basin.Mode), integer);
        if (expansion.IsUsable || basin.Piece.Step > 0 || !(basin.Lower < basin.Upper))
            return expansion;
        if (chart.Kind is Coordinate.AboveLower or Coordinate.Between && Math.Abs(basin.Mode.LogAboveLower) > FarthestLog)
            return new Expansion<TKernel>(kernel, theta, FrameAt(chart.ReferenceNear(Math.CopySign(FarthestLog, basin.Mode.LogAboveLower))), 0);
        if (chart.Kind is Coordinate.BelowUpper or Coordinate.Between && Math.Abs(basin.Mode.LogBelowUpper) > FarthestLog)
            return new Expansion<TKernel>(kernel, theta, FrameAt(chart.ReferenceNear(-Math.CopySign(FarthestLog, basin.Mode.LogBelowUpper))), 0);
        var width = double.IsFinite(basin.Upper - basin.Lower) ? basin.Upper - basin.Lower : 1;
        for (var part = 1e-9; part < 1; part *= 10)
        {
            var x = basin.Mode.X <= basin.Lower ? basin.Lower + part * width : basin.Upper - part * width;
            var inside = new Expansion<TKernel>(kernel, theta, FrameAt(chart.Reference(x)), 0);
            if (inside.IsUsable)
                return inside;
        }

        return expansion;
    }

    private static double LogRatio(BasinPart<TKernel> part, BasinPart<TKernel> main) =>
        CompensatedSum.Difference(part.Expansion.Level, main.Expansion.Level) + part.LogWeight - main.LogWeight;

    private static void ChooseBasis(Expansion<TKernel>[] expansions, List<Basin> basins, MomentPlan plan)
    {
        if (plan.Size == 0)
            return;
        Array.Fill(plan.Tangential, plan.Order[0] == 2);
        for (var i = 0; i < expansions.Length; i++)
        {
            var panel = new PanelSum<TKernel>(expansions[i], plan);
            var step = basins[i].Piece.Step;
            Probe(panel, expansions[i], -expansions[i].Frame.OffsetOf(basins[i].Lower), -1, step, plan);
            Probe(panel, expansions[i], expansions[i].Frame.OffsetOf(basins[i].Upper), 1, step, plan);
        }
    }

    private static void Probe(PanelSum<TKernel> panel, Expansion<TKernel> expansion, double end, double direction, double step, MomentPlan plan)
    {
        if (!(end > 0) || Array.TrueForAll(plan.Tangential, tangential => !tangential))
            return;
        var distance = Math.Max(step, BasinSweep<TKernel>.FoldDistance(panel, 0, Math.Min(1, end / 2), end, direction));
        panel.Log(direction * distance, out _);
        var displacement = expansion.Frame.At(direction * distance).Displacement;
        for (var j = 0; j < plan.Tangential.Length; j++)
        {
            var linear = Math.Abs(expansion.Slopes[j] * displacement);
            plan.Tangential[j] &= plan.Order[j + 1] == 2 && Math.Abs(panel.Residuals[j]) <= NearlyLinear * linear;
        }
    }

    // After the sweep: whether a tangent was a bad basis after all, and is now given up.
    private static bool DropCancellingTangents(RangePartition<TKernel> partition)
    {
        var plan = partition.Plan;
        var moments = MomentMerge.Of(partition);
        var dropped = false;
        for (var j = 0; j < plan.Tangential.Length; j++)
        {
            var slope = moments.Slopes[j];
            if (!plan.Tangential[j] || slope == 0)
                continue;
            var linear = slope * slope * moments.Covariance[0, 0];
            var whole = linear + 2 * slope * moments.Covariance[j + 1, 0] + moments.Covariance[j + 1, j + 1];
            if (linear <= MostCancellation * whole)
                continue;
            plan.Tangential[j] = false;
            dropped = true;
        }

        return dropped;
    }
}
