using System;
using System.Collections.Generic;
using System.Collections.Immutable;
using FamilyGen.Kernels;
using FamilyGen.Partition;

namespace FamilyGen.Fitting;

/// <summary>The fit of a family in its natural parameters.</summary>
internal static class NaturalFit
{
    /// <summary>The fit, or null with an account of why there is none.</summary>
    public static FitNumbers? Run<TKernel>(StatisticSums<TKernel> sums, string family, out string? account)
        where TKernel : struct, IKernel
    {
        account = NoMaximum.BeforeSearch(sums, family);
        if (account is not null)
            return null;
        var outcome = new ConcaveSearch<TKernel>(sums).Run();
        if (outcome.Maximum is not null)
            return Numbers(sums, outcome);
        account = outcome.Tie is { } tie
            ? NoMaximum.AccountOfTie(sums, family, tie)
            : NoMaximum.Account(sums, family, SearchPath.InNatural<TKernel>(outcome.Path, outcome.Reason));
        return null;
    }

    /// <summary>The numbers of a fit that found its maximum, with the natural parameters as its parameters.</summary>
    public static FitNumbers Numbers<TKernel>(StatisticSums<TKernel> sums, SearchOutcome<TKernel> outcome)
        where TKernel : struct, IKernel
    {
        var maximum = outcome.Maximum!;
        var weight = sums.TotalWeight;
        var notes = ImmutableArray<string>.Empty;
        var covariance = Covariance(maximum, outcome.Face, weight);
        if (covariance is null)
        {
            notes = ["a statistic has infinite variance under the fitted law: there are no standard errors"];
            covariance = Missing(TKernel.Count);
        }

        var natural = new ParameterEstimates([.. TKernel.NaturalNames], [.. maximum.Theta], covariance);
        return new()
        {
            Natural = natural,
            Parameters = natural,
            LogLikelihood = weight * maximum.Objective,
            Observations = sums.Count,
            TotalWeight = weight,
            Iterations = outcome.Iterations,
            Status = outcome.Face.Held.Count == 0 ? FitStatus.InteriorMaximum : FitStatus.OnBoundary,
            Boundary = Conditions(outcome, weight),
            Notes = notes,
            Landmarks = Landmarks(maximum.Law),
        };
    }

    /// <summary>Mean, standard deviation and 95 % quantile of a law; NaN where the engine cannot give them.</summary>
    public static Lazy<(double Mean, double Deviation, double Quantile)> Landmarks<TKernel>(Distribution<TKernel> law)
        where TKernel : struct, IKernel => new(() =>
        {
            try
            {
                return (law.Mean, Math.Sqrt(law.Variance), law.Quantile(0.95));
            }
            catch (PartitionException)
            {
                return (double.NaN, double.NaN, double.NaN);
            }
        });

    /// <summary>A covariance of which nothing is known.</summary>
    public static double[,] Missing(int count)
    {
        var covariance = new double[count, count];
        for (var i = 0; i < count; i++)
            Erase(covariance, i);
        return covariance;
    }

    /// <summary>Marks a parameter as one without standard error.</summary>
    public static void Erase(double[,] covariance, int parameter)
    {
        for (var j = 0; j < covariance.GetLength(0); j++)
            covariance[parameter, j] = covariance[j, parameter] = double.NaN;
    }

    private static double[,]? Covariance<TKernel>(ModelPoint<TKernel> maximum, Face face, double weight)
        where TKernel : struct, IKernel
    {
        if (NewtonSystem<TKernel>.TryAt(maximum, face)?.Covariance() is not { } covariance)
            return null;
        for (var i = 0; i < TKernel.Count; i++)
        {
            for (var j = 0; j < TKernel.Count; j++)
                covariance[i, j] /= weight;
        }

        for (var i = 0; i < TKernel.Count; i++)
        {
            if (face.IsFixed(i))
                Erase(covariance, i);
        }

        return covariance;
    }

    private static ImmutableArray<BoundaryCondition> Conditions<TKernel>(SearchOutcome<TKernel> outcome, double weight)
        where TKernel : struct, IKernel
    {
        var conditions = new List<BoundaryCondition>();
        for (var a = 0; a < outcome.Face.Held.Count; a++)
        {
            var wall = outcome.Face.Held[a];
            conditions.Add(new($"{wall.Text} = {ObservationRule.Text(wall.Bound)} ({wall.Where})", weight * outcome.Multipliers[a]));
        }

        return [.. conditions];
    }
}
