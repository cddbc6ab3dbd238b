using System;
using System.Threading;
using FamilyGen.Sampling;

namespace FamilyGen.Partition;

public sealed partial class Distribution<TKernel>
{
    private SweepInverse<TKernel>? _inverse;

    /// <summary>One draw, by inversion of the cumulative distribution; the probability that belongs to it is exact to
    /// 1e-10. The same state of <paramref name="random"/> gives the same draw.</summary>
    public double Sample(Random random)
    {
        ArgumentNullException.ThrowIfNull(random);
        return Inverse.At(Uniform.From(random));
    }

    /// <summary>Independent draws. The caller's generator only seeds one of our own, so that the same state of
    /// <paramref name="random"/> gives the same batch, but not the draws of as many single calls.</summary>
    public void Sample(Random random, Span<double> draws)
    {
        ArgumentNullException.ThrowIfNull(random);
        var (inverse, bits) = (Inverse, Xoshiro256.SeededFrom(random));
        foreach (ref var draw in draws)
            draw = inverse.At(bits.NextUniform());
    }

    /// <inheritdoc cref="Sample(Random, Span{double})"/>
    /// <exception cref="OverflowException">A count is drawn that an int cannot hold.</exception>
    public void Sample(Random random, Span<int> draws)
    {
        ArgumentNullException.ThrowIfNull(random);
        var (inverse, bits) = (Inverse, Xoshiro256.SeededFrom(random));
        foreach (ref var draw in draws)
            draw = checked((int)inverse.At(bits.NextUniform()));
    }

    /// <inheritdoc cref="Sample(Random, Span{double})"/>
    /// <exception cref="OverflowException">A count is drawn that a long cannot hold.</exception>
    public void Sample(Random random, Span<long> draws)
    {
        ArgumentNullException.ThrowIfNull(random);
        var (inverse, bits) = (Inverse, Xoshiro256.SeededFrom(random));
        foreach (ref var draw in draws)
            draw = checked((long)inverse.At(bits.NextUniform()));
    }

    private SweepInverse<TKernel> Inverse => LazyInitializer.EnsureInitialized(ref _inverse, () => new(Tables, _domain));
}
