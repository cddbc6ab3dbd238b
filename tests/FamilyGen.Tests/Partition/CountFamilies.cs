using FamilyGen.Kernels;

namespace FamilyGen.Tests.Partition;

internal readonly struct Bernoulli : IAtomFamily
{
    public static Atom[] Statistics => [new Monomial(1)];

    public static Domain Domain => Parts.Counts(0, 1);

    public static NaturalSet NaturalSet => Parts.Everything;
}

internal readonly struct Binomial12 : IAtomFamily
{
    public static Atom[] Statistics => [new Monomial(1)];

    public static Atom LogBase => new LogBinomial(12);

    public static Domain Domain => Parts.Counts(0, 12);

    public static NaturalSet NaturalSet => Parts.Everything;
}

internal readonly struct Geometric : IAtomFamily
{
    public static Atom[] Statistics => [new Monomial(1)];

    public static Domain Domain => Parts.Counts(0);

    public static NaturalSet NaturalSet => Parts.Set(Parts.End(true, true, "x1 1", (Parts.Named("x1"), [1], 0)));
}

internal readonly struct Poisson : IAtomFamily
{
    public static Atom[] Statistics => [new Monomial(1)];

    public static Atom LogBase => new LogGammaOf(-1, 1);

    public static Domain Domain => Parts.Counts(0);

    public static NaturalSet NaturalSet => Parts.Set(Parts.End(true, true, "x1 xlog", (Parts.Named("xlog"), [0], -1), (Parts.Named("x1"), [1], 1)));
}

internal readonly struct NegativeBinomial : IAtomFamily
{
    public static Atom[] Statistics => [new Monomial(1)];

    public static Atom LogBase => new SumOf(-Special.LogGamma.Value(2.5), (1, new LogGammaRatioOf(1, 1.5)));

    public static Domain Domain => Parts.Counts(0);

    public static NaturalSet NaturalSet => Parts.Set(Parts.End(true, true, "x1 log", (Parts.Named("x1"), [1], 0), (Parts.Named("log"), [0], 1.5)));
}

internal readonly struct DispersedCount : IAtomFamily
{
    public static Atom[] Statistics => [new Monomial(1), new LogGammaOf(-1, 1)];

    public static Domain Domain => Parts.Counts(0);

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(true, true, "x1 xlog 1", (Parts.Named("xlog"), [0, -1], 0), (Parts.Named("x1"), [1, 1], 0)));
}

internal readonly struct DispersedCountFrom1 : IAtomFamily
{
    public static Atom[] Statistics => DispersedCount.Statistics;

    public static Domain Domain => Parts.Counts(1);

    public static NaturalSet NaturalSet => DispersedCount.NaturalSet;
}

internal readonly struct DispersedCountExtraZero : IAtomFamily
{
    public static Atom[] Statistics => [.. DispersedCount.Statistics, new Indicator(x => x.X == 0)];

    public static Domain Domain => Parts.Counts(0) with { Breakpoints = [1] };

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(true, true, "x1 xlog 1 1", (Parts.Named("xlog"), [0, -1, 0], 0), (Parts.Named("x1"), [1, 1, 0], 0)));
}

internal readonly struct PoissonExtraZero : IAtomFamily
{
    public static Atom[] Statistics => [new Monomial(1), new Indicator(x => x.X == 0)];

    public static Atom LogBase => new LogGammaOf(-1, 1);

    public static Domain Domain => Parts.Counts(0) with { Breakpoints = [1] };

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(true, true, "x1 1 xlog", (Parts.Named("xlog"), [0, 0], -1), (Parts.Named("x1"), [1, 0], 1)));
}

internal readonly struct Categorical4 : IAtomFamily
{
    public static Atom[] Statistics => [new Indicator(x => x.X == 1), new Indicator(x => x.X == 2), new Indicator(x => x.X == 3)];

    public static Domain Domain => Parts.Counts(0, 3) with { Breakpoints = [1, 2, 3] };

    public static NaturalSet NaturalSet => Parts.Everything;
}
