using System;
using System.Collections.Generic;
using System.Collections.Immutable;
using System.Globalization;
using FamilyGen.Kernels;
using MathNet.Numerics.LinearAlgebra;

namespace FamilyGen.Fitting;

/// <summary>The fit of a family in its trade parameters.</summary>
internal static class TradeFit
{
    /// <summary>The fit, or null with an account of why there is none.</summary>
    public static FitNumbers? Run<TKernel>(StatisticSums<TKernel> sums, string family, out string? account)
        where TKernel : struct, ITradeKernel
    {
        account = NoMaximum.BeforeSearch(sums, family);
        if (account is not null)
            return null;
        var outcome = new ConcaveSearch<TKernel>(sums).Run();
        if (outcome.Tie is { } tie)
        {
            account = NoMaximum.AccountOfTie(sums, family, tie);
            return null;
        }

        if (TKernel.ParameterNames.Length < TKernel.Count)
            return Curved(sums, family, outcome, isWhole: false, out account);

        if (outcome.Maximum is null)
        {
            account = NoMaximum.Account(
                sums,
                family,
                SearchPath.InTrade(sums.Kernel, outcome.Path, outcome.Reason),
                SearchPath.InNatural<TKernel>(outcome.Path, outcome.Reason));
            return null;
        }

        var parameters = new double[TKernel.ParameterNames.Length];
        if (TradeParameters.TryFromNatural(sums.Kernel, outcome.Maximum.Theta, parameters))
            return OneToOne(sums, outcome, parameters);
        return Curved(sums, family, outcome, isWhole: true, out account);
    }

    private static FitNumbers OneToOne<TKernel>(StatisticSums<TKernel> sums, SearchOutcome<TKernel> outcome, double[] parameters)
        where TKernel : struct, ITradeKernel
    {
        var numbers = NaturalFit.Numbers(sums, outcome);
        var map = NaturalMap.At(sums.Kernel, parameters);
        var covariance = outcome.Face.Held.Count == 0
            ? InverseInformation(outcome.Maximum!, map, sums.TotalWeight)
            : Propagated(numbers.Natural.Covariance, map, outcome.Face);
        return numbers with
        {
            Parameters = new([.. TKernel.ParameterNames], [.. parameters], covariance ?? NaturalFit.Missing(parameters.Length)),
        };
    }

    /// <summary>(Jᵀ I J)⁻¹, formed in the basis in which I does not cancel.</summary>
    private static double[,]? InverseInformation<TKernel>(ModelPoint<TKernel> maximum, NaturalMap map, double weight)
        where TKernel : struct, ITradeKernel
    {
        var p = map.Parameters;
        var information = new double[p, p];
        var columns = new double[p][];
        for (var a = 0; a < p; a++)
            columns[a] = maximum.Basis.FromNatural(map.Column(a));
        for (var a = 0; a < p; a++)
        {
            for (var b = 0; b < p; b++)
            {
                for (var i = 0; i < columns[a].Length; i++)
                {
                    for (var j = 0; j < columns[b].Length; j++)
                        information[a, b] += weight * columns[a][i] * columns[b][j] * maximum.Covariance[i, j];
                }
            }
        }

        return Cholesky.TryFactor(information)?.Inverse();
    }

    /// <summary>J⁻¹ C J⁻ᵀ, where C leaves out the parameters held on the boundary.</summary>
    private static double[,]? Propagated(double[,] natural, NaturalMap map, Face face)
    {
        var p = map.Parameters;
        var inverse = Matrix<double>.Build.DenseOfArray(map.Jacobian()).Inverse();
        var covariance = new double[p, p];
        for (var a = 0; a < p; a++)
        {
            for (var b = 0; b < p; b++)
            {
                for (var i = 0; i < p; i++)
                {
                    for (var j = 0; j < p; j++)
                    {
                        if (!face.IsFixed(i) && !face.IsFixed(j) && inverse[a, i] != 0 && inverse[b, j] != 0)
                            covariance[a, b] += inverse[a, i] * natural[i, j] * inverse[b, j];
                    }
                }
            }
        }

        for (var a = 0; a < p; a++)
        {
            if (!(covariance[a, a] > 0))
                NaturalFit.Erase(covariance, a);
        }

        return covariance;
    }

    /// <summary>The fit by local search; isWhole where there are as many trade as natural parameters, but the maximum in the
    /// natural ones is out of the trade parameters' reach.</summary>
    private static FitNumbers? Curved<TKernel>(
        StatisticSums<TKernel> sums, string family, SearchOutcome<TKernel> outcome, bool isWhole, out string? account)
        where TKernel : struct, ITradeKernel
    {
        account = null;
        var guides = new List<ModelPoint<TKernel>>();
        if (outcome.Maximum is not null)
            guides.Add(outcome.Maximum);
        else if (outcome.Path.Count > 0 && ModelPoint<TKernel>.TryAt(sums, outcome.Path[0], out _) is { } start)
            guides.Add(start);
        var climbs = new CurvedSearch<TKernel>(sums).Run(guides, out var reason);
        if (climbs.Find(climb => climb.IsMaximum) is { } best)
            return Numbers(sums, best, climbs);

        var unreached = isWhole
            ? $" The maximum over all laws with these statistics, {Natural<TKernel>(outcome.Maximum!.Theta)}, is out of the reach of the parameters as they are declared."
            : "";
        if (climbs.Find(climb => climb.Flat is not null) is { Flat: { } flat })
        {
            account = $"{family} has no maximum-likelihood fit to these data: the likelihood does not change with '{TKernel.ParameterNames[flat]}', "
                + "about which the observations say nothing. Data that reach where it acts may determine it; else make it a known value.";
            return null;
        }

        IReadOnlyList<double[]> path = climbs.Count == 0 ? [] : climbs[0].Path;
        account = NoMaximum.Account(
            sums,
            family,
            SearchPath.OfTrade(sums.Kernel, path, reason),
            SearchPath.InNatural<TKernel>(outcome.Path, outcome.Reason));
        account += unreached;
        return null;
    }

    private static FitNumbers Numbers<TKernel>(StatisticSums<TKernel> sums, CurvedClimb<TKernel> best, List<CurvedClimb<TKernel>> climbs)
        where TKernel : struct, ITradeKernel
    {
        var (p, weight) = (best.End.Parameters.Length, sums.TotalWeight);
        var covariance = best.End.ObservedCovariance() ?? NaturalFit.Missing(p);
        for (var a = 0; a < p; a++)
        {
            for (var b = 0; b < p; b++)
                covariance[a, b] /= weight;
        }

        var natural = new double[TKernel.Count, TKernel.Count];
        for (var i = 0; i < TKernel.Count; i++)
        {
            for (var j = 0; j < TKernel.Count; j++)
            {
                for (var a = 0; a < p; a++)
                {
                    for (var b = 0; b < p; b++)
                        natural[i, j] += best.End.Map.First(i, a) * covariance[a, b] * best.End.Map.First(j, b);
                }
            }
        }

        var isHighest = best.End.Law.Objective >= climbs[0].End.Law.Objective - (1e-9 * (1 + Math.Abs(climbs[0].End.Law.Objective)));
        return new()
        {
            Natural = new([.. TKernel.NaturalNames], [.. best.End.Law.Theta], natural),
            Parameters = new([.. TKernel.ParameterNames], [.. best.End.Parameters], covariance),
            LogLikelihood = weight * best.End.Law.Objective,
            Observations = sums.Count,
            TotalWeight = weight,
            Iterations = best.Iterations,
            Status = best.IsOnly ? FitStatus.InteriorMaximum : FitStatus.LocalMaximum,
            Notes = isHighest ? [] : ["the likelihood is higher elsewhere, but has no maximum there"],
            Landmarks = NaturalFit.Landmarks(best.End.Law.Law),
        };
    }

    private static string Natural<TKernel>(double[] theta)
        where TKernel : struct, ITradeKernel
    {
        var parts = new string[theta.Length];
        for (var j = 0; j < parts.Length; j++)
            parts[j] = $"{TKernel.NaturalNames[j]} = {theta[j].ToString("G6", CultureInfo.InvariantCulture)}";
        return string.Join(", ", parts);
    }
}
