using System;
using FamilyGen.Kernels;

namespace FamilyGen.Tests.Partition;

/// <summary>{log x} above 1: a pure power tail.</summary>
internal readonly struct Pareto : IAtomFamily
{
    public static Atom[] Statistics => [new LogInside()];

    public static Domain Domain => new() { IsLattice = false, Lower = 1, Upper = double.PositiveInfinity };

    public static NaturalSet NaturalSet => Parts.Set(Parts.End(true, true, "log 1", (Parts.Named("log"), [1], 0)));
}

/// <summary>{log x} on 1, 2, ….</summary>
internal readonly struct Zeta : IAtomFamily
{
    public static Atom[] Statistics => [new LogInside()];

    public static Domain Domain => Parts.Counts(1);

    public static NaturalSet NaturalSet => Parts.Set(Parts.End(true, true, "log 1", (Parts.Named("log"), [1], 0)));
}

/// <summary>{x, x²} on all integers.</summary>
internal readonly struct DiscreteNormal : IAtomFamily
{
    public static Atom[] Statistics => Normal.Statistics;

    public static Domain Domain => Parts.Counts(double.NegativeInfinity);

    public static NaturalSet NaturalSet => Normal.NaturalSet;
}

/// <summary>{x, [x mod 24 = 0]} on 0, 1, ….</summary>
internal readonly struct WholeDays : IAtomFamily
{
    public static Atom[] Statistics => [new Monomial(1), new Indicator(x => x.Integer % 24 == 0)];

    public static Domain Domain => Parts.Counts(0) with { Period = 24 };

    public static NaturalSet NaturalSet => Parts.Set(Parts.End(true, true, "x1 1 1", (Parts.Named("x1"), [1, 0], 0)));
}

/// <summary>{x} on 0, 2, 4, …: a base measure that vanishes on the odd numbers.</summary>
internal readonly struct EvenGeometric : IAtomFamily
{
    public static Atom[] Statistics => [new Monomial(1)];

    public static Atom LogBase => new Choice(x => x.Integer % 2 == 0, null, new Constant(double.NegativeInfinity));

    public static Domain Domain => Parts.Counts(0) with { Period = 2 };

    public static NaturalSet NaturalSet => Geometric.NaturalSet;
}

/// <summary>{x, [x = 0]} on [0, ∞) with a point of probability at 0.</summary>
internal readonly struct ExponentialWithZero : IAtomFamily
{
    public static Atom[] Statistics => [new Monomial(1), new Indicator(x => x.X == 0)];

    public static Domain Domain => Exponential.Domain with { Masses = [0] };

    public static NaturalSet NaturalSet => Parts.Set(Parts.End(true, true, "x1 1 1", (Parts.Named("x1"), [1, 0], 0)));
}

/// <summary>{log x below 100, x below 100, 1 above, log x above}: a gamma body and a power tail.</summary>
internal readonly struct GammaWithPowerTail : IAtomFamily
{
    private const double Large = 100;

    public static Atom[] Statistics =>
    [
        new Choice(x => x.X < Large, new LogAboveZero(), null),
        new Choice(x => x.X < Large, new Monomial(1), null),
        new Choice(x => x.X < Large, null, new Constant(1)),
        new Choice(x => x.X < Large, null, new LogAboveZero()),
    ];

    public static Domain Domain => Parts.Positive with { Breakpoints = [Large] };

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(true, true, "1 1 1 log 1", (Parts.Named("log"), [0, 0, 0, 1], 0)),
        Parts.End(false, false, "log 1 1 1 1", (Parts.Named("log"), [-1, 0, 0, 0], 0)));
}

/// <summary>{x} on (−∞, 5).</summary>
internal readonly struct ExponentialBelow : IAtomFamily
{
    public static Atom[] Statistics => [new Monomial(1)];

    public static Domain Domain => new() { IsLattice = false, Lower = double.NegativeInfinity, Upper = 5 };

    public static NaturalSet NaturalSet => Parts.Set(Parts.End(true, false, "x1 1", (Parts.Named("x1"), [-1], 0)));
}

/// <summary>{x, x²} on the line through functions that cannot be read.</summary>
internal readonly struct UnreadNormal : IAtomFamily
{
    public static Atom[] Statistics => [new Opaque(x => x), new Opaque(x => x * x)];

    public static Domain Domain => Parts.Line with { IsOpaque = true };

    public static NaturalSet NaturalSet => Normal.NaturalSet;
}

/// <summary>{x, −log x!} on 0, 1, … through functions that cannot be read.</summary>
internal readonly struct UnreadCount : IAtomFamily
{
    public static Atom[] Statistics => [new Opaque(x => x), new Opaque(x => -Special.LogGamma.Value(x + 1))];

    public static Domain Domain => Parts.Counts(0) with { IsOpaque = true };

    public static NaturalSet NaturalSet => DispersedCount.NaturalSet;
}

/// <summary>Two peaks a day on the circle of 24 hours.</summary>
internal readonly struct ArrivalHour : IAtomFamily
{
    private const double Hour = 2 * Math.PI / 24;

    public static Atom[] Statistics => [new Wave(true, Hour), new Wave(false, Hour), new Wave(true, 2 * Hour), new Wave(false, 2 * Hour)];

    public static Domain Domain => new() { IsLattice = false, Lower = 0, Upper = 24, LowerIncluded = true, IsCircle = true };

    public static NaturalSet NaturalSet => Parts.Everything;
}

/// <summary>{x} between 0 and 10, where the base measure vanishes up to 3.</summary>
internal readonly struct UniformFrom3 : IAtomFamily
{
    public static Atom[] Statistics => [new Monomial(1)];

    public static Atom LogBase => new Choice(x => x.X < 3, new Constant(double.NegativeInfinity), null);

    public static Domain Domain => new() { IsLattice = false, Lower = 0, Upper = 10, Breakpoints = [3] };

    public static NaturalSet NaturalSet => Parts.Everything;
}

/// <summary>{x log x} between 0 and 1, with a slope that is infinite at 0.</summary>
internal readonly struct EntropyLike : IAtomFamily
{
    public static Atom[] Statistics => [new XLogX()];

    public static Domain Domain => new() { IsLattice = false, Lower = 0, Upper = 1 };

    public static NaturalSet NaturalSet => Parts.Everything;
}

/// <summary>{x, eˣ} on the line: the logarithm of a gamma variable.</summary>
internal readonly struct LogGammaLaw : IAtomFamily
{
    public static Atom[] Statistics => [new Monomial(1), new ExponentialOf()];

    public static Domain Domain => Parts.Line;

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(true, true, "x1 exp 1", (Parts.Named("exp"), [0, 1], 0), (Parts.Named("x1"), [1, 0], 0)),
        Parts.End(true, false, "x1 1 1", (Parts.Named("x1"), [-1, 0], 0)));
}

/// <summary>{log(1 + x²)} on the line: power tails on both sides.</summary>
internal readonly struct PowerTails : IAtomFamily
{
    public static Atom[] Statistics => [new LogOnePlusSquare()];

    public static Domain Domain => Parts.Line;

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(true, true, "log 1", (Parts.Named("log"), [2], 0)),
        Parts.End(true, false, "log 1", (Parts.Named("log"), [2], 0)));
}

/// <summary>{|x|, x} on the line.</summary>
internal readonly struct Laplace : IAtomFamily
{
    public static Atom[] Statistics => [new Absolute(), new Monomial(1)];

    public static Domain Domain => Parts.Line with { Breakpoints = [0] };

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(true, true, "x1 x1 1", (Parts.Named("x1"), [1, 1], 0)),
        Parts.End(true, false, "x1 x1 1", (Parts.Named("x1"), [1, -1], 0)));
}

/// <summary>{log(x − 1000), x} above 1000.</summary>
internal readonly struct GammaFrom1000 : IAtomFamily
{
    public static Atom[] Statistics => [new LogAbove(1000), new Monomial(1)];

    public static Domain Domain => Parts.Positive with { Lower = 1000 };

    public static NaturalSet NaturalSet => Gamma.NaturalSet;
}

/// <summary>{cos 5000x} on the circle: ten thousand modes.</summary>
internal readonly struct FineWave : IAtomFamily
{
    public static Atom[] Statistics => [new Wave(true, 5000)];

    public static Domain Domain => VonMises.Domain;

    public static NaturalSet NaturalSet => Parts.Everything;
}

/// <summary>{cos 40x} on the circle: forty modes.</summary>
internal readonly struct CoarseWave : IAtomFamily
{
    public static Atom[] Statistics => [new Wave(true, 40)];

    public static Domain Domain => VonMises.Domain;

    public static NaturalSet NaturalSet => Parts.Everything;
}

/// <summary>x log x above a lower end at 0.</summary>
internal sealed class XLogX : Atom
{
    public override double Value(in Point x) => x.X == 0 ? 0 : x.X * Math.Log(x.X);

    public override double Slope(in Point m) => Math.Log(m.X) + 1;

    public override double Residual(in Point m, in Point x) => FamilyGen.Kernels.Residual.XLogXAtEnd(m.X, x.RatioToLower);

    public override TNumber Derivative<TNumber>(TNumber x, in Point piece) => TNumber.Log(x) + 1;
}

/// <summary>A constant.</summary>
internal sealed class Constant(double value) : Atom
{
    public override double Value(in Point x) => value;
}

/// <summary>One function where a condition holds and another where it does not; null is 0.</summary>
internal sealed class Choice(Func<Point, bool> condition, Atom? yes, Atom? no) : Atom
{
    public override double Value(in Point x) => At(x)?.Value(x) ?? 0;

    public override double Slope(in Point m) => At(m)?.Slope(m) ?? 0;

    public override double Residual(in Point m, in Point x) =>
        condition(m) == condition(x) ? At(m)?.Residual(m, x) ?? 0 : Value(x) - Value(m) - Slope(m) * x.Displacement;

    public override TNumber Derivative<TNumber>(TNumber x, in Point piece) => At(piece) is { } atom ? atom.Derivative(x, piece) : 0;

    private Atom? At(in Point x) => condition(x) ? yes : no;
}

/// <summary>eˣ.</summary>
internal sealed class ExponentialOf : Atom
{
    public override double Value(in Point x) => Math.Exp(x.X);

    public override double Slope(in Point m) => Math.Exp(m.X);

    public override double Residual(in Point m, in Point x) => FamilyGen.Kernels.Residual.Exp(m.X, x.Displacement);

    public override TNumber Derivative<TNumber>(TNumber x, in Point piece) => TNumber.Exp(x);
}

/// <summary>log(1 + x²).</summary>
internal sealed class LogOnePlusSquare : Atom
{
    public override double Value(in Point x) =>
        Math.Abs(x.X) > 1e100 ? 2 * Math.Log(Math.Abs(x.X)) : Special.Elementary.Log1P(x.X * x.X);

    public override TNumber Derivative<TNumber>(TNumber x, in Point piece) => (TNumber)2 / (x + (TNumber)1 / x);
}

/// <summary>|x|.</summary>
internal sealed class Absolute : Atom
{
    public override double Value(in Point x) => Math.Abs(x.X);

    public override double Slope(in Point m) => Math.Sign(m.X);

    public override double Residual(in Point m, in Point x) => FamilyGen.Kernels.Residual.Abs(m.X, x.Displacement);

    public override TNumber Derivative<TNumber>(TNumber x, in Point piece) => Math.Sign(piece.X);
}

/// <summary>log(x − lower) above a lower end.</summary>
internal sealed class LogAbove(double lower) : Atom
{
    public override double Value(in Point x) => x.LogAboveLower;

    public override double Slope(in Point m) => Math.Exp(-m.LogAboveLower);

    public override double Residual(in Point m, in Point x) => FamilyGen.Kernels.Residual.LogAtEnd(x.RatioToLower);

    public override TNumber Derivative<TNumber>(TNumber x, in Point piece) => (TNumber)1 / (x - lower);
}
