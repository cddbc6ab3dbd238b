using System;
using System.Collections.Immutable;
using FamilyGen.Fitting;

namespace FamilyGen;

/// <summary>A family fitted to data by maximum likelihood, with its standard errors.</summary>
/// <typeparam name="TFamily">The declared family.</typeparam>
public sealed class FitResult<TFamily>
{
    private readonly FitNumbers _numbers;

    internal FitResult(TFamily estimate, FitNumbers numbers)
    {
        Estimate = estimate;
        _numbers = numbers;
    }

    /// <summary>The family at the estimated parameters.</summary>
    public TFamily Estimate { get; }

    /// <summary>The names of the natural parameters, in declared order.</summary>
    public ImmutableArray<string> NaturalNames => _numbers.Natural.Names;

    /// <summary>The estimated natural parameters θ.</summary>
    public ImmutableArray<double> Natural => _numbers.Natural.Values;

    /// <summary>The covariance of the natural parameters: the inverse of the observed information, which for a family in
    /// natural parameters is total weight × ∇²A(θ). NaN in the rows of parameters held on a boundary. A new array each time.</summary>
    public double[,] NaturalCovariance => (double[,])_numbers.Natural.Covariance.Clone();

    /// <summary>The standard errors of the natural parameters; NaN for one held on a boundary.</summary>
    public ImmutableArray<double> StandardErrors => _numbers.Natural.StandardErrors;

    /// <summary>The names of the trade parameters, or of the natural ones for a family in canonical form.</summary>
    public ImmutableArray<string> ParameterNames => _numbers.Parameters.Names;

    /// <summary>The estimated trade parameters, or the natural ones for a family in canonical form.</summary>
    public ImmutableArray<double> Parameters => _numbers.Parameters.Values;

    /// <summary>The standard errors of <see cref="Parameters"/>: by the delta method where there are as many of them as
    /// natural parameters, from the observed information where there are fewer.</summary>
    public ImmutableArray<double> ParameterStandardErrors => _numbers.Parameters.StandardErrors;

    /// <summary>The covariance of <see cref="Parameters"/>. A new array each time.</summary>
    public double[,] ParameterCovariance => (double[,])_numbers.Parameters.Covariance.Clone();

    /// <summary>The maximal log-likelihood Σ w·(θ·T(x) + log h(x) − A(θ)); weights count as frequencies.</summary>
    public double LogLikelihood => _numbers.LogLikelihood;

    /// <summary>Akaike's criterion: 2 × parameters − 2 × log-likelihood (Akaike 1974).</summary>
    public double Aic => (2.0 * _numbers.Parameters.Values.Length) - (2 * LogLikelihood);

    /// <summary>Schwarz's criterion: parameters × log(total weight) − 2 × log-likelihood (Schwarz 1978).</summary>
    public double Bic => (_numbers.Parameters.Values.Length * Math.Log(TotalWeight)) - (2 * LogLikelihood);

    /// <summary>The number of observations.</summary>
    public long Observations => _numbers.Observations;

    /// <summary>The sum of the observations' weights.</summary>
    public double TotalWeight => _numbers.TotalWeight;

    /// <summary>How many steps the search took.</summary>
    public int Iterations => _numbers.Iterations;

    /// <summary>What kind of maximum this is.</summary>
    public FitStatus Status => _numbers.Status;

    /// <summary>The conditions of the parameter set that hold with equality, when the maximum is on its boundary.</summary>
    public ImmutableArray<BoundaryCondition> Multipliers => _numbers.Boundary;

    /// <summary>A table: the parameters with their standard errors, mean and 95 % quantile of the fitted law,
    /// log-likelihood, AIC, BIC and status, in invariant writing.</summary>
    public override string ToString() => FitTable.Write(typeof(TFamily).Name, _numbers, Aic, Bic);
}
