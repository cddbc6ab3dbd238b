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
        if (Points.Count < Shortest)
            return null;
        var (middle, last) = (Points[Points.Count / 2], Points[^1]);
        var parts = new List<string>();
        for (var i = 0; i < Names.Length; i++)
        {
            var drift = last[i] - middle[i];
            if (double.IsFinite(Lower[i]) && drift < 0 && last[i] - Lower[i] < 0.5 * (middle[i] - Lower[i]))
                parts.Add($"{Names[i]} → {ObservationRule.Text(Lower[i])}");
            else if (double.IsFinite(Upper[i]) && drift > 0 && Upper[i] - last[i] < 0.5 * (Upper[i] - middle[i]))
                parts.Add($"{Names[i]} → {ObservationRule.Text(Upper[i])}");
            else if (Math.Abs(drift) > 0.2 * Math.Abs(last[i]) && Math.Abs(last[i]) > Math.Abs(middle[i]))
                parts.Add($"{Names[i]} → {(drift > 0 ? "∞" : "−∞")}");
        }

        return parts.Count switch
        {
            0 => null,
            1 => parts[0],
            _ => $"{string.Join(", ", parts.GetRange(0, parts.Count - 1))} and {parts[^1]}",
        };
    }
}
