using System;
using System.Collections.Immutable;
using FamilyGen.Kernels;

namespace FamilyGen.Tests.Fitting;

/// <summary>Stoppages of a crane in one shift, as a canonical family: {x, −log x!} on 0, 1, ….</summary>
internal readonly record struct StoppagesKernel : IKernel
{
    private static readonly Domain Counts = new() { IsLattice = true, Lower = 0, Upper = double.PositiveInfinity, LowerIncluded = true };

    public static int Count => 2;

    public static ReadOnlySpan<string> NaturalNames => new[] { "total", "crowding" };

    public Domain Domain => Counts;

    public NaturalSet NaturalSet => throw new InvalidOperationException();

    public void Evaluate(in Point x, Span<double> value, Span<double> remainder)
    {
        value[0] = x.X;
        value[1] = -FamilyGen.Special.LogGamma.Value(x.X + 1);
        value[2] = 0;
        remainder.Clear();
    }

    public void Slopes(in Point m, Span<double> slope)
    {
        slope[0] = 1;
        slope[1] = -FamilyGen.Special.Digamma.Value(m.X + 1);
        slope[2] = 0;
    }

    public void Residuals(in Point m, in Point x, Span<double> residual) => throw new InvalidOperationException();

    public TNumber Derivative<TNumber>(ReadOnlySpan<double> theta, TNumber x, in Point piece)
        where TNumber : struct, IArithmetic<TNumber> => theta[0] - (TNumber)theta[1] * TNumber.Digamma(x + 1);
}
