using System;
using FamilyGen.Kernels;
using FamilyGen.Tests.Partition;

namespace FamilyGen.Tests.Fitting;

/// <summary>A family put together from atoms, with names and trade parameters.</summary>
internal interface ITradeFamily : IAtomFamily
{
    static abstract string[] NaturalNames { get; }

    static abstract string[] ParameterNames { get; }

    static abstract (double Lower, double Upper)[] Ranges { get; }

    static abstract void Natural<TNumber>(ReadOnlySpan<TNumber> parameters, Span<TNumber> theta)
        where TNumber : struct, IArithmetic<TNumber>;

    static virtual bool TryParameters(ReadOnlySpan<double> theta, Span<double> parameters) => false;
}

/// <summary>The kernel of such a family.</summary>
internal readonly struct TradeKernel<TFamily> : ITradeKernel
    where TFamily : ITradeFamily
{
    public static int Count => AtomKernel<TFamily>.Count;

    public static ReadOnlySpan<string> NaturalNames => TFamily.NaturalNames;

    public static ReadOnlySpan<string> ParameterNames => TFamily.ParameterNames;

    public Domain Domain => default(AtomKernel<TFamily>).Domain;

    public NaturalSet NaturalSet => default(AtomKernel<TFamily>).NaturalSet;

    public void Evaluate(in Point x, Span<double> value, Span<double> remainder) => default(AtomKernel<TFamily>).Evaluate(x, value, remainder);

    public void Slopes(in Point m, Span<double> slope) => default(AtomKernel<TFamily>).Slopes(m, slope);

    public void Residuals(in Point m, in Point x, Span<double> residual) => default(AtomKernel<TFamily>).Residuals(m, x, residual);

    public TNumber Derivative<TNumber>(ReadOnlySpan<double> theta, TNumber x, in Point piece)
        where TNumber : struct, IArithmetic<TNumber> => default(AtomKernel<TFamily>).Derivative(theta, x, piece);

    public void Natural<TNumber>(ReadOnlySpan<TNumber> parameters, Span<TNumber> theta)
        where TNumber : struct, IArithmetic<TNumber> => TFamily.Natural(parameters, theta);

    public bool TryParameters(ReadOnlySpan<double> theta, Span<double> parameters) => TFamily.TryParameters(theta, parameters);

    public void ParameterRange(Span<double> lower, Span<double> upper)
    {
        for (var i = 0; i < TFamily.Ranges.Length; i++)
            (lower[i], upper[i]) = TFamily.Ranges[i];
    }
}
