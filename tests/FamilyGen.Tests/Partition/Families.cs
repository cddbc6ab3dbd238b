using System;
using System.Collections.Immutable;
using System.Linq;
using FamilyGen.Kernels;

namespace FamilyGen.Tests.Partition;

/// <summary>Supports and the growth of exponents at their ends.</summary>
internal static class Parts
{
    private const double Infinity = double.PositiveInfinity;

    public static Domain Line { get; } = new() { IsLattice = false, Lower = -Infinity, Upper = Infinity };

    public static Domain Positive { get; } = new() { IsLattice = false, Lower = 0, Upper = Infinity, LowerSingular = true };

    public static Domain Unit { get; } = new() { IsLattice = false, Lower = 0, Upper = 1, LowerSingular = true, UpperSingular = true };

    public static Domain Counts(double from, double to = Infinity) =>
        new() { IsLattice = true, Lower = from, Upper = to, LowerIncluded = true, UpperIncluded = double.IsFinite(to) };

    public static NaturalSet Everything { get; } = new([]);

    public static NaturalSet Set(params EndGrowth[] ends) => new([.. ends]);

    /// <summary>An end with its ranks: growth, weights, constant.</summary>
    public static EndGrowth End(bool isInfinite, bool isUpper, string statistics, params (Growth Growth, double[] Weights, double Constant)[] ranks) =>
        new(
            isInfinite ? (isUpper ? "x → ∞" : "x → −∞") : "x → its end",
            isInfinite,
            isUpper,
            [.. ranks.Select(rank => new Rank(rank.Growth, [.. rank.Weights], rank.Constant, "coefficient"))],
            [.. statistics.Split(' ').Select(Named)]);

    public static Growth Named(string name) => name switch
    {
        "1" => new(GrowthKind.Bounded),
        "log" => new(GrowthKind.Log),
        "exp" => new(GrowthKind.Exponential),
        "log2" => new(GrowthKind.LogPower, 2),
        "xlog" => new(GrowthKind.PowerTimesLog),
        _ => new(GrowthKind.Power, double.Parse(name[1..])),
    };
}

internal readonly struct Gamma : IAtomFamily
{
    public static Atom[] Statistics => [new LogAboveZero(), new Monomial(1)];

    public static Domain Domain => Parts.Positive;

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(true, true, "log x1 1", (Parts.Named("x1"), [0, 1], 0), (Parts.Named("log"), [1, 0], 0)),
        Parts.End(false, false, "log 1 1", (Parts.Named("log"), [-1, 0], 0)));
}

internal readonly struct ChiSquared : IAtomFamily
{
    public static Atom[] Statistics => [new LogAboveZero()];

    public static Atom LogBase => new SumOf(0, (-0.5, new Monomial(1)));

    public static Domain Domain => Parts.Positive;

    public static NaturalSet NaturalSet => Parts.Set(Parts.End(false, false, "log 1", (Parts.Named("log"), [-1], 0)));
}

internal readonly struct Exponential : IAtomFamily
{
    public static Atom[] Statistics => [new Monomial(1)];

    public static Domain Domain => Parts.Positive with { LowerSingular = false, LowerIncluded = true };

    public static NaturalSet NaturalSet => Parts.Set(Parts.End(true, true, "x1 1", (Parts.Named("x1"), [1], 0)));
}

internal readonly struct Duration : IAtomFamily
{
    public static Atom[] Statistics => [new LogAboveZero(), new Monomial(1), new InverseAboveZero()];

    public static Domain Domain => Parts.Positive;

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(true, true, "log x1 1 1", (Parts.Named("x1"), [0, 1, 0], 0), (Parts.Named("log"), [1, 0, 0], 0)),
        Parts.End(false, false, "log 1 x1 1", (Parts.Named("x1"), [0, 0, 1], 0), (Parts.Named("log"), [-1, 0, 0], 0)));
}

internal readonly struct InverseGaussian : IAtomFamily
{
    public static Atom[] Statistics => [new Monomial(1), new InverseAboveZero()];

    public static Atom LogBase => new SumOf(-0.5 * Math.Log(2 * Math.PI), (-1.5, new LogAboveZero()));

    public static Domain Domain => Parts.Positive;

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(true, true, "x1 1 log", (Parts.Named("x1"), [1, 0], 0), (Parts.Named("log"), [0, 0], -1.5)),
        Parts.End(false, false, "1 x1 log", (Parts.Named("x1"), [0, 1], 0), (Parts.Named("log"), [0, 0], 1.5)));
}

internal readonly struct Lognormal : IAtomFamily
{
    public static Atom[] Statistics => [new LogAboveZero(), new LogSquareAboveZero()];

    public static Atom LogBase => new SumOf(0, (-1, new LogAboveZero()));

    public static Domain Domain => Parts.Positive;

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(true, true, "log log2 log", (Parts.Named("log2"), [0, 1], 0), (Parts.Named("log"), [1, 0], -1)),
        Parts.End(false, false, "log log2 log", (Parts.Named("log2"), [0, 1], 0), (Parts.Named("log"), [-1, 0], 1)));
}

internal readonly struct Beta : IAtomFamily
{
    public static Atom[] Statistics => [new LogAboveZero(), new LogBelowOne()];

    public static Domain Domain => Parts.Unit;

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(false, false, "log 1 1", (Parts.Named("log"), [-1, 0], 0)),
        Parts.End(false, true, "1 log 1", (Parts.Named("log"), [0, -1], 0)));
}

internal readonly struct BoundedLogLogLin : IAtomFamily
{
    public static Atom[] Statistics => [new LogAboveZero(), new LogBelowOne(), new Monomial(1)];

    public static Domain Domain => Parts.Unit;

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(false, false, "log 1 1 1", (Parts.Named("log"), [-1, 0, 0], 0)),
        Parts.End(false, true, "1 log 1 1", (Parts.Named("log"), [0, -1, 0], 0)));
}

internal readonly struct Window : IAtomFamily
{
    public static Atom[] Statistics => [new LogInside(), new Monomial(1)];

    public static Domain Domain => new() { IsLattice = false, Lower = 2, Upper = 30, LowerIncluded = true, UpperIncluded = true };

    public static NaturalSet NaturalSet => Parts.Everything;
}

internal readonly struct Normal : IAtomFamily
{
    public static Atom[] Statistics => [new Monomial(1), new Monomial(2)];

    public static Domain Domain => Parts.Line;

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(true, true, "x1 x2 1", (Parts.Named("x2"), [0, 1], 0), (Parts.Named("x1"), [1, 0], 0)),
        Parts.End(true, false, "x1 x2 1", (Parts.Named("x2"), [0, 1], 0), (Parts.Named("x1"), [-1, 0], 0)));
}

internal readonly struct Quartic : IAtomFamily
{
    public static Atom[] Statistics => [new Monomial(1), new Monomial(2), new Monomial(3), new Monomial(4)];

    public static Domain Domain => Parts.Line;

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(true, true, "x1 x2 x3 x4 1", (Parts.Named("x4"), [0, 0, 0, 1], 0), (Parts.Named("x3"), [0, 0, 1, 0], 0), (Parts.Named("x2"), [0, 1, 0, 0], 0), (Parts.Named("x1"), [1, 0, 0, 0], 0)),
        Parts.End(true, false, "x1 x2 x3 x4 1", (Parts.Named("x4"), [0, 0, 0, 1], 0), (Parts.Named("x3"), [0, 0, -1, 0], 0), (Parts.Named("x2"), [0, 1, 0, 0], 0), (Parts.Named("x1"), [-1, 0, 0, 0], 0)));
}

internal readonly struct VonMises : IAtomFamily
{
    public static Atom[] Statistics => [new Wave(true, 1), new Wave(false, 1)];

    public static Domain Domain => new() { IsLattice = false, Lower = 0, Upper = 2 * Math.PI, LowerIncluded = true, IsCircle = true };

    public static NaturalSet NaturalSet => Parts.Everything;
}
