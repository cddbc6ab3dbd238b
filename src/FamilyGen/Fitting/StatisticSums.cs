using System;
using System.Collections.Generic;
using System.Numerics;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>All that a fit needs of the data: the weighted sums Σ w·Tⱼ(x) and Σ w·log h(x), kept without rounding, so that the
/// same observations give the same bits in any order and from any number of merged parts.</summary>
/// <typeparam name="TKernel">The family's kernel; its fields are the known values, which all observations share.</typeparam>
/// <remarks>Not safe for use by several threads at once: give each its own and merge. Sums of at least 2^53 observations
/// of one weight, or beyond the largest double, are out of its range.</remarks>
public sealed class StatisticSums<TKernel>
    where TKernel : struct, IKernel
{
    private readonly TKernel _kernel;
    private readonly Domain _domain;
    private readonly ExactSum[] _sums;
    private readonly ExactSum _weights = new();
    private readonly ExactSum _observations = new();
    private readonly ExactSum _squares = new();
    private readonly double[] _value;
    private readonly double[] _remainder;
    private long _unweighted;

    /// <summary>Sums of no observations.</summary>
    public StatisticSums(TKernel kernel)
    {
        _kernel = kernel;
        _domain = kernel.Domain;
        var functions = TKernel.Count + 1;
        _sums = new ExactSum[functions];
        for (var j = 0; j < functions; j++)
            _sums[j] = new ExactSum();
        _value = new double[functions];
        _remainder = new double[functions];
        Smallest = new double[functions];
        Largest = new double[functions];
        Array.Fill(Smallest, double.PositiveInfinity);
        Array.Fill(Largest, double.NegativeInfinity);
        Distinct = new DistinctValues(TKernel.Count + 2);
    }

    /// <summary>The kernel with the known values under which the statistics are taken.</summary>
    public TKernel Kernel => _kernel;

    /// <summary>How many observations were added, whatever their weights.</summary>
    public long Count { get; private set; }

    /// <summary>The sum of the weights; the number of observations when none has a weight.</summary>
    public double TotalWeight => WeightPair().High;

    /// <summary>The smallest observation of positive weight; ∞ when there is none.</summary>
    public double Minimum { get; private set; } = double.PositiveInfinity;

    /// <summary>The largest observation of positive weight; −∞ when there is none.</summary>
    public double Maximum { get; private set; } = double.NegativeInfinity;

    /// <summary>The smallest value of each statistic and of log h over the observations.</summary>
    internal double[] Smallest { get; }

    /// <summary>The largest value of each statistic and of log h over the observations.</summary>
    internal double[] Largest { get; }

    /// <summary>The observations' different values, if they are few.</summary>
    internal DistinctValues Distinct { get; }

    /// <summary>Adds one observation.</summary>
    /// <exception cref="ArgumentOutOfRangeException">It is NaN, infinite or outside the support, or a statistic is not finite
    /// there; nothing has then been added.</exception>
    public void Add(double x) => Add(x, 1);

    /// <summary>Adds one observation that occurred <paramref name="weight"/> times. A weight is a frequency, possibly a
    /// fraction; weight 0 counts as an observation and moves nothing else.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The observation or the weight is not valid; nothing has then been added.</exception>
    public void Add(double x, double weight)
    {
        if (ObservationRule.BrokenByWeight(weight) is { } weightRule)
            throw new ArgumentOutOfRangeException(nameof(weight), weight, $"The weight of the observation at index {Count} is {ObservationRule.Text(weight)}: {weightRule}.");
        AddChecked(x, weight, Count, nameof(x), "");
    }

    /// <summary>Adds observations, all of them or (when one is not valid) none.</summary>
    /// <exception cref="ArgumentOutOfRangeException">One is NaN, infinite or outside the support, or a statistic is not
    /// finite there; the message names its index in <paramref name="observations"/>.</exception>
    public void AddRange(ReadOnlySpan<double> observations) => AddAll(observations);

    /// <inheritdoc cref="AddRange(ReadOnlySpan{double})"/>
    public void AddRange(ReadOnlySpan<int> observations) => AddAll(observations);

    /// <inheritdoc cref="AddRange(ReadOnlySpan{double})"/>
    public void AddRange(ReadOnlySpan<long> observations) => AddAll(observations);

    /// <summary>Adds all that another instance holds; the result has the same bits as if its observations had been added
    /// here. <paramref name="other"/> is only read.</summary>
    /// <exception cref="ArgumentException">The known values of the two differ: their statistics are not the same functions.</exception>
    public void Merge(StatisticSums<TKernel> other)
    {
        ArgumentNullException.ThrowIfNull(other);
        if (!EqualityComparer<TKernel>.Default.Equals(_kernel, other._kernel))
        {
            throw new ArgumentException(
                $"The sums to merge were taken with the known values {other._kernel}, and these with {_kernel}: their statistics are "
                + "different functions. Keep one accumulator for each set of known values.",
                nameof(other));
        }

        for (var j = 0; j < _sums.Length; j++)
        {
            _sums[j].Add(other._sums[j]);
            Smallest[j] = Math.Min(Smallest[j], other.Smallest[j]);
            Largest[j] = Math.Max(Largest[j], other.Largest[j]);
        }

        _weights.Add(other._weights);
        _observations.Add(other._observations);
        _squares.Add(other._squares);
        _unweighted += other._unweighted;
        Count += other.Count;
        Minimum = Math.Min(Minimum, other.Minimum);
        Maximum = Math.Max(Maximum, other.Maximum);
        Distinct.Add(other.Distinct);
    }

    /// <summary>The mean of statistic j (of log h for j = the number of statistics) as an unevaluated pair.</summary>
    internal TwoSum Mean(int j) => Mean(_sums[j]);

    /// <summary>The mean of the observations themselves.</summary>
    internal double MeanObservation() => Mean(_observations).High;

    /// <summary>The standard deviation of the observations themselves, with divisor n.</summary>
    internal double Deviation()
    {
        var mean = Mean(_observations);
        return Math.Sqrt(Math.Max(0, (Mean(_squares) - (mean * mean)).High));
    }

    private TwoSum Mean(ExactSum sum)
    {
        var (high, low) = sum.RoundToPair();
        return new TwoSum(high, low) / WeightPair();
    }

    private TwoSum WeightPair()
    {
        var (high, low) = _weights.RoundToPair();
        return new TwoSum(high, low) + _unweighted;
    }

    private void AddAll<T>(ReadOnlySpan<T> observations)
        where T : INumber<T>
    {
        var added = new StatisticSums<TKernel>(_kernel);
        for (var i = 0; i < observations.Length; i++)
            added.AddChecked(double.CreateChecked(observations[i]), 1, i, nameof(observations), " No observation of the range has been added.");
        Merge(added);
    }

    private void AddChecked(double x, double weight, long index, string argument, string consequence)
    {
        var rule = ObservationRule.BrokenBy(x, _domain);
        if (rule is null)
        {
            _kernel.Evaluate(_domain.At(x), _value, _remainder);
            rule = ObservationRule.BrokenBy(_value, TKernel.NaturalNames);
        }

        if (rule is not null)
            throw new ArgumentOutOfRangeException(argument, x, $"The observation at index {index} is {ObservationRule.Text(x)}: {rule}.{consequence}");
        Count++;
        if (weight > 0)
            AddEvaluated(x, weight);
    }

    private void AddEvaluated(double x, double weight)
    {
        for (var j = 0; j < _sums.Length; j++)
        {
            Smallest[j] = Math.Min(Smallest[j], _value[j]);
            Largest[j] = Math.Max(Largest[j], _value[j]);
            AddProduct(_sums[j], weight, _value[j]);
            if (_remainder[j] != 0)
                AddProduct(_sums[j], weight, _remainder[j]);
        }

        // The square only scales the start of a search, so that of an immense observation may be cut short.
        var square = Math.Min(x * x, double.MaxValue);
        AddProduct(_observations, weight, x);
        AddProduct(_squares, weight, square);
        if (square < double.MaxValue)
            AddProduct(_squares, weight, Math.FusedMultiplyAdd(x, x, -square));
        if (weight == 1)
            _unweighted++;
        else
            _weights.Add(weight);

        Minimum = Math.Min(Minimum, x);
        Maximum = Math.Max(Maximum, x);
        Distinct.Add(x);
    }

    private static void AddProduct(ExactSum sum, double weight, double value)
    {
        if (weight == 1)
            sum.Add(value);
        else
            sum.AddProduct(weight, value);
    }
}
