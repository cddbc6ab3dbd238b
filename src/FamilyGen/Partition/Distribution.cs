using System;
using FamilyGen.Kernels;

namespace FamilyGen.Partition;

/// <summary>A member of a family at fixed natural parameters: p(x) = exp(Σ θⱼTⱼ(x) + log h(x) − A). Immutable; all members
/// may be called from several threads.</summary>
/// <typeparam name="TKernel">The kernel that describes the family.</typeparam>
public sealed partial class Distribution<TKernel>
    where TKernel : struct, IKernel
{
    private readonly TKernel _kernel;
    private readonly Domain _domain;
    private readonly double[] _theta;
    private readonly RangePartition<TKernel> _whole;
    private readonly double[] _logWeightFromMode;
    private CentredMoments? _moments;

    /// <summary>The member at θ. Its normalizer is evaluated here, with all finite moments of the statistics.</summary>
    /// <exception cref="ArgumentOutOfRangeException">θ is outside the natural parameter set; the message names the
    /// condition that fails.</exception>
    /// <exception cref="PartitionException">The normalizer cannot be evaluated to the stated accuracy.</exception>
    public Distribution(TKernel kernel, ReadOnlySpan<double> theta)
    {
        if (theta.Length != TKernel.Count)
            throw new ArgumentException($"The family has {TKernel.Count} natural parameters, not {theta.Length}.", nameof(theta));
        if (kernel.NaturalSet.Violation(theta) is { } violation)
            throw new ArgumentOutOfRangeException(nameof(theta), violation);
        _kernel = kernel;
        _domain = kernel.Domain;
        _theta = theta.ToArray();
        _whole = Evaluate(SubRange.Whole, MomentPlan.Full(kernel, theta));
        if (_whole.Main is null)
            throw new PartitionException("The base measure vanishes on all of the support.");
        LogNormalizer = _whole.LogValue.Value;
        if (!double.IsFinite(LogNormalizer))
            throw new PartitionException($"The normalizer came out as {LogNormalizer} at a parameter where it should be finite.");
        _logWeightFromMode = new double[_whole.Parts.Length];
        for (var i = 0; i < _logWeightFromMode.Length; i++)
            _logWeightFromMode[i] = _whole.LogWeight - CompensatedSum.Difference(_whole.Parts[i].Expansion.Level, _whole.Main.Expansion.Level);
    }

    /// <summary>The kernel.</summary>
    public TKernel Kernel => _kernel;

    /// <summary>The natural parameters.</summary>
    public ReadOnlySpan<double> Theta => _theta;

    /// <summary>A(θ) = log ∫ exp(Σ θⱼTⱼ + log h).</summary>
    public double LogNormalizer { get; }

    /// <summary>log ∫ exp(f − f(m)), with m the mode about which <see cref="Moments()"/> are taken.</summary>
    internal double LogWeight => _whole.LogWeight;

    /// <summary>Whether the modes of the exponent are proved to be all there are. It is not so where a function could not
    /// be read.</summary>
    public bool IsProven => _whole.IsProven;

    /// <summary>log p(x): the log-density, or the logarithm of the probability on a lattice and at a point that carries
    /// probability of its own. −∞ outside the support.</summary>
    public double LogDensity(double x)
    {
        Span<double> residual = stackalloc double[TKernel.Count + 1];
        Span<double> difference = stackalloc double[TKernel.Count + 1];
        return LogDensity(x, residual, difference);
    }

    /// <summary>log p at every observation.</summary>
    public void LogDensity(ReadOnlySpan<double> x, Span<double> result)
    {
        CheckLength(x.Length, result.Length);
        Span<double> residual = stackalloc double[TKernel.Count + 1];
        Span<double> difference = stackalloc double[TKernel.Count + 1];
        for (var i = 0; i < x.Length; i++)
            result[i] = LogDensity(x[i], residual, difference);
    }

    /// <inheritdoc cref="LogDensity(ReadOnlySpan{double}, Span{double})"/>
    public void LogDensity(ReadOnlySpan<int> x, Span<double> result)
    {
        CheckLength(x.Length, result.Length);
        Span<double> residual = stackalloc double[TKernel.Count + 1];
        Span<double> difference = stackalloc double[TKernel.Count + 1];
        for (var i = 0; i < x.Length; i++)
            result[i] = LogDensity(x[i], residual, difference);
    }

    /// <inheritdoc cref="LogDensity(ReadOnlySpan{double}, Span{double})"/>
    public void LogDensity(ReadOnlySpan<long> x, Span<double> result)
    {
        CheckLength(x.Length, result.Length);
        Span<double> residual = stackalloc double[TKernel.Count + 1];
        Span<double> difference = stackalloc double[TKernel.Count + 1];
        for (var i = 0; i < x.Length; i++)
            result[i] = LogDensity(x[i], residual, difference);
    }

    private double LogDensity(double x, Span<double> residual, Span<double> difference)
    {
        var index = PartAt(x);
        if (index < 0)
            return double.IsNaN(x) ? double.NaN : double.NegativeInfinity;
        var expansion = _whole.Parts[index].Expansion;
        return expansion.Difference(expansion.Frame.Observation(x), residual, difference) - _logWeightFromMode[index];
    }

    // The one place where a partition is evaluated, by the sweep that serves every family. Where a closed form is known it
    // would be taken here; it has to give what the sweep gives: the reference point, the weight about it and the moments.
    private RangePartition<TKernel> Evaluate(SubRange range, MomentPlan plan) =>
        RangePartition<TKernel>.Over(_kernel, _theta, range, plan);

    // The basin that holds an observation, or −1 outside the support.
    private int PartAt(double x)
    {
        if (!(Math.Abs(x) < double.PositiveInfinity))
            return -1;
        var parts = _whole.Parts;
        if (_domain.IsLattice)
            return LatticePartAt(x);
        if (!_domain.Masses.IsEmpty && _domain.Masses.Contains(x))
            return MassAt(x);
        if (x <= _domain.Lower ? !_domain.LowerIncluded || x < _domain.Lower : x >= _domain.Upper && (!_domain.UpperIncluded || x > _domain.Upper))
            return -1;

        for (var i = 0; i < parts.Length; i++)
        {
            ref readonly var basin = ref parts[i].BasinReference;
            if (basin.Piece.Step == 0 && x >= basin.Lower && x <= basin.Upper)
                return i;
        }

        return -1;
    }

    private int MassAt(double x) =>
        Array.FindIndex(_whole.Parts, part => part.BasinReference.Piece.Step > 0 && part.BasinReference.Lower == x);

    private int LatticePartAt(double x)
    {
        if (x != Math.Floor(x))
            return -1;
        var parts = _whole.Parts;
        for (var i = 0; i < parts.Length; i++)
        {
            ref readonly var basin = ref parts[i].BasinReference;
            if (x >= basin.Lower && x <= basin.Upper
                && (basin.Piece.Step == 1 || Math.IEEERemainder(x - basin.Mode.X, basin.Piece.Step) == 0))
                return i;
        }

        return -1;
    }

    private static void CheckLength(int observations, int results)
    {
        if (results < observations)
            throw new ArgumentException($"There is room for {results} results and there are {observations} observations.");
    }
}
