using System;
using FamilyGen.Kernels;

namespace FamilyGen.Tests.Partition;

/// <summary>What a family put together from atoms states about itself.</summary>
internal interface IAtomFamily
{
    static abstract Atom[] Statistics { get; }

    static virtual Atom? LogBase => null;

    static abstract Domain Domain { get; }

    static abstract NaturalSet NaturalSet { get; }
}

/// <summary>The kernel of a family put together from atoms.</summary>
internal readonly struct AtomKernel<TFamily> : IKernel
    where TFamily : IAtomFamily
{
    private static readonly Atom[] s_statistics = TFamily.Statistics;
    private static readonly Atom? s_logBase = TFamily.LogBase;
    private static readonly Domain s_domain = TFamily.Domain;
    private static readonly NaturalSet s_naturalSet = TFamily.NaturalSet;
    private static readonly string[] s_names = Array.ConvertAll(s_statistics, atom => atom.GetType().Name);

    public static int Count => s_statistics.Length;

    public static ReadOnlySpan<string> NaturalNames => s_names;

    public Domain Domain => s_domain;

    public NaturalSet NaturalSet => s_naturalSet;

    public void Evaluate(in Point x, Span<double> value, Span<double> remainder)
    {
        for (var j = 0; j < s_statistics.Length; j++)
        {
            value[j] = s_statistics[j].Value(x);
            remainder[j] = s_statistics[j].Remainder(x);
        }

        value[Count] = s_logBase?.Value(x) ?? 0;
        remainder[Count] = 0;
    }

    public void Slopes(in Point m, Span<double> slope)
    {
        for (var j = 0; j < s_statistics.Length; j++)
            slope[j] = s_statistics[j].Slope(m);
        slope[Count] = s_logBase?.Slope(m) ?? 0;
    }

    public void Residuals(in Point m, in Point x, Span<double> residual)
    {
        for (var j = 0; j < s_statistics.Length; j++)
            residual[j] = s_statistics[j].Residual(m, x);
        residual[Count] = s_logBase?.Residual(m, x) ?? 0;
    }

    public TNumber Derivative<TNumber>(ReadOnlySpan<double> theta, TNumber x, in Point piece)
        where TNumber : struct, IArithmetic<TNumber>
    {
        TNumber sum = 0;
        for (var j = 0; j < s_statistics.Length; j++)
        {
            if (theta[j] != 0)
                sum += (TNumber)theta[j] * s_statistics[j].Derivative(x, piece);
        }

        return s_logBase is null ? sum : sum + s_logBase.Derivative(x, piece);
    }
}
