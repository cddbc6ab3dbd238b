using System;
using System.Collections.Generic;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>Where a search went, in terms that the modeller knows.</summary>
/// <param name="Names">The parameters' names.</param>
/// <param name="Points">Their values after every step.</param>
/// <param name="Lower">The lower end of each parameter's range.</param>
/// <param name="Upper">The upper end of each parameter's range.</param>
/// <param name="Reason">Why an evaluation failed, if one did.</param>
internal sealed record SearchPath(string[] Names, IReadOnlyList<double[]> Points, double[] Lower, double[] Upper, string? Reason)
{
    /// <summary>A path told in the natural parameters.</summary>
    public static SearchPath InNatural<TKernel>(IReadOnlyList<double[]> path, string? reason)
        where TKernel : struct, IKernel
    {
        var (lower, upper) = (new double[TKernel.Count], new double[TKernel.Count]);
        Array.Fill(lower, double.NegativeInfinity);
        Array.Fill(upper, double.PositiveInfinity);
        return new(TKernel.NaturalNames.ToArray(), path, lower, upper, reason);
    }

    /// <summary>A path told in the trade parameters, or in the natural ones where it leads out of their reach.</summary>
    public static SearchPath InTrade<TKernel>(TKernel kernel, IReadOnlyList<double[]> path, string? reason)
        where TKernel : struct, ITradeKernel
    {
        var trade = new List<double[]>();
        foreach (var theta in path)
        {
            var parameters = new double[TKernel.ParameterNames.Length];
            if (!TradeParameters.TryFromNatural(kernel, theta, parameters))
                return InNatural<TKernel>(path, reason);
            trade.Add(parameters);
        }

        return OfTrade(kernel, trade, reason);
    }

    /// <summary>A path of trade parameters.</summary>
    public static SearchPath OfTrade<TKernel>(TKernel kernel, IReadOnlyList<double[]> path, string? reason)
        where TKernel : struct, ITradeKernel
    {
        var chart = ParameterChart.Of(kernel);
        return new(TKernel.ParameterNames.ToArray(), path, chart.Lower.ToArray(), chart.Upper.ToArray(), reason);
    }

    /// <summary>The direction in which the search went without end, "total → −∞ and crowding → ∞"; null when it did not.</summary>
    public string? Direction()
    {
        const int Shortest = 6;
        var parts = new List<string>();
        for (var i = 0; i < Names.Length && Points.Count >= Shortest; i++)
        {
            var (middle, last) = (Points[Points.Count / 2][i], Points[^1][i]);
            if (double.IsFinite(Lower[i]) && last < middle && last - Lower[i] < 0.5 * (middle - Lower[i]))
                parts.Add($"{Names[i]} → {ObservationRule.Text(Lower[i])}");
            else if (double.IsFinite(Upper[i]) && last > middle && Upper[i] - last < 0.5 * (Upper[i] - middle))
                parts.Add($"{Names[i]} → {ObservationRule.Text(Upper[i])}");
            else if (Math.Abs(last - middle) > 0.2 * Math.Abs(last) && Math.Abs(last) > Math.Abs(middle))
                parts.Add($"{Names[i]} → {(last > middle ? "∞" : "−∞")}");
        }

        return Join(parts);
    }

    /// <summary>The directions among the given signs of parameters that the search took, or all of them where it took none;
    /// null when there are none.</summary>
    public string? Direction(ReadOnlySpan<int> signs)
    {
        var (all, taken) = (new List<string>(), new List<string>());
        for (var i = 0; i < signs.Length; i++)
        {
            if (signs[i] == 0)
                continue;
            var part = $"{Names[i]} → {(signs[i] > 0 ? "∞" : "−∞")}";
            all.Add(part);
            if (Points.Count > 1 && signs[i] * (Points[^1][i] - Points[Points.Count / 2][i]) > 0)
                taken.Add(part);
        }

        return Join(taken.Count > 0 ? taken : all);
    }

    private static string? Join(List<string> parts) => parts.Count switch
    {
        0 => null,
        1 => parts[0],
        _ => $"{string.Join(", ", parts.GetRange(0, parts.Count - 1))} and {parts[^1]}",
    };
}
