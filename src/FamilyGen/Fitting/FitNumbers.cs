using System;
using System.Collections.Immutable;

namespace FamilyGen.Fitting;

/// <summary>What a fit computes, before it is dressed as the result for one family.</summary>
internal sealed record FitNumbers
{
    public required ParameterEstimates Natural { get; init; }

    /// <summary>The trade parameters; those of the canonical form where there are no others.</summary>
    public required ParameterEstimates Parameters { get; init; }

    public required double LogLikelihood { get; init; }

    public required long Observations { get; init; }

    public required double TotalWeight { get; init; }

    public required int Iterations { get; init; }

    public required FitStatus Status { get; init; }

    public ImmutableArray<BoundaryCondition> Boundary { get; init; } = [];

    /// <summary>What a reader of the table must know beyond the status, or nothing.</summary>
    public ImmutableArray<string> Notes { get; init; } = [];

    /// <summary>Mean, standard deviation and 95 % quantile of the fitted law, computed when asked.</summary>
    public required Lazy<(double Mean, double Deviation, double Quantile)> Landmarks { get; init; }
}

/// <summary>Parameters with their names and covariance; NaN marks what has no standard error.</summary>
internal sealed record ParameterEstimates(ImmutableArray<string> Names, ImmutableArray<double> Values, double[,] Covariance)
{
    public ImmutableArray<double> StandardErrors { get; } = Roots(Covariance);

    private static ImmutableArray<double> Roots(double[,] covariance)
    {
        var errors = ImmutableArray.CreateBuilder<double>(covariance.GetLength(0));
        for (var i = 0; i < covariance.GetLength(0); i++)
            errors.Add(Math.Sqrt(covariance[i, i]));
        return errors.ToImmutable();
    }
}
