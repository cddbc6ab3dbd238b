using System;
using System.Threading;

namespace FamilyGen.Partition;

public sealed partial class Distribution<TKernel>
{
    // Below this probability a tail is integrated for itself, about its own mode.
    private const double ThinTail = 1e-5;

    // Above this one the other tail is taken from 1, so that both always agree.
    private const double ThickTail = 0.9;

    private WeightTables<TKernel>? _tables;

    /// <summary>The panels over the whole support with their weights.</summary>
    internal WeightTables<TKernel> Tables
    {
        get
        {
            if (Volatile.Read(ref _tables) is { } known)
                return known;
            var tables = new WeightTables<TKernel>(_kernel, _theta);
            return Interlocked.CompareExchange(ref _tables, tables, null) ?? tables;
        }
    }

    /// <summary>P(X ≤ x), to 1e−9 of itself however small it is.</summary>
    public double Cdf(double x) => Outside(x) switch
    {
        < 0 => 0,
        > 0 => 1,
        _ => double.IsNaN(x) ? double.NaN
            : Tables.UpTo(x) is var body && body < ThinTail ? Math.Exp(LogProbability(SubRange.UpTo(x)))
            : body > ThickTail ? 1 - Upper(x)
            : body,
    };

    /// <summary>P(X &gt; x), to 1e−9 of itself however small it is.</summary>
    public double Survival(double x) => Outside(x) switch
    {
        < 0 => 1,
        > 0 => 0,
        _ => double.IsNaN(x) ? double.NaN
            : Tables.Above(x) is var body && body < ThinTail ? Math.Exp(LogProbability(SubRange.Above(x)))
            : body > ThickTail ? 1 - Lower(x)
            : body,
    };

    /// <summary>log P(X ≤ x), finite where the probability itself is below the least double.</summary>
    public double LogCdf(double x) => Outside(x) switch
    {
        < 0 => double.NegativeInfinity,
        > 0 => 0,
        _ => double.IsNaN(x) ? double.NaN
            : Tables.UpTo(x) is var body && body >= ThinTail ? FromNearerSide(body, Tables.Above(x))
            : LogProbability(SubRange.UpTo(x)),
    };

    /// <summary>log P(X &gt; x), finite where the probability itself is below the least double.</summary>
    public double LogSurvival(double x) => Outside(x) switch
    {
        < 0 => 0,
        > 0 => double.NegativeInfinity,
        _ => double.IsNaN(x) ? double.NaN
            : Tables.Above(x) is var body && body >= ThinTail ? FromNearerSide(body, Tables.UpTo(x))
            : LogProbability(SubRange.Above(x)),
    };

    /// <summary>The hazard p(x)/P(X &gt; x) of a continuous law; on a lattice, and at a point that carries probability of
    /// its own, p(x)/P(X ≥ x). 0 outside the support, +∞ where nothing is left.</summary>
    public double Hazard(double x)
    {
        var density = LogDensity(x);
        if (double.IsNaN(density) || double.IsNegativeInfinity(density))
            return double.IsNaN(density) ? double.NaN : 0;
        double left;
        if (_domain.IsLattice)
            left = LogSurvival(x - 1);
        else if (_domain.Masses.Contains(x))
            left = LogProbability(SubRange.From(x));
        else
            left = LogSurvival(x);
        return Math.Exp(density - left);
    }

    /// <summary>log ∫ exp(Σ θⱼTⱼ + log h) over the part of the support that lies in the range; −∞ where there is none.</summary>
    public double LogPartition(SubRange range)
    {
        var partition = Evaluate(range, MomentPlan.None);
        return partition.Main is null ? double.NegativeInfinity : partition.LogValue.Value;
    }

    /// <summary>log P(X in range), about the range's own mode.</summary>
    public double LogProbability(SubRange range)
    {
        var partition = Evaluate(range, MomentPlan.None);
        return partition.Main is null
            ? double.NegativeInfinity
            : Math.Min(0, CompensatedSum.Difference(partition.LogValue, _whole.LogValue));
    }

    private double Upper(double x) =>
        Tables.Above(x) is var body && body < ThinTail ? Math.Exp(LogProbability(SubRange.Above(x))) : body;

    private double Lower(double x) =>
        Tables.UpTo(x) is var body && body < ThinTail ? Math.Exp(LogProbability(SubRange.UpTo(x))) : body;

    private static double FromNearerSide(double probability, double rest) =>
        rest < 0.5 ? Special.Elementary.Log1P(-rest) : Math.Log(probability);

    // −1 below the support, 1 where it is all passed, else 0
    private int Outside(double x) => x < _domain.Lower ? -1 : x >= _domain.Upper ? 1 : 0;
}
