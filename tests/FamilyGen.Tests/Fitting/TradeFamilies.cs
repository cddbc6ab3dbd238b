using System;
using FamilyGen.Kernels;
using FamilyGen.Tests.Partition;

namespace FamilyGen.Tests.Fitting;

/// <summary>Ranges of trade parameters.</summary>
internal static class Range
{
    public static (double Lower, double Upper) Any => (double.NegativeInfinity, double.PositiveInfinity);

    public static (double Lower, double Upper) Positive => (0, double.PositiveInfinity);
}

/// <summary>Stoppages of a crane in one shift: total·x − crowding·log x!, named but with no other parameters.</summary>
internal readonly struct ShiftStoppages : ITradeFamily
{
    public static Atom[] Statistics => DispersedCount.Statistics;

    public static Domain Domain => DispersedCount.Domain;

    public static NaturalSet NaturalSet => Parts.Set(
        new EndGrowth(
            "x → ∞",
            true,
            true,
            [new(Parts.Named("xlog"), [0, -1], 0, "−crowding"), new(Parts.Named("x1"), [1, 1], 0, "total + crowding")],
            [Parts.Named("x1"), Parts.Named("xlog"), Parts.Named("1")]));

    public static string[] NaturalNames => ["total", "crowding"];

    public static string[] ParameterNames => ["total", "crowding"];

    public static (double Lower, double Upper)[] Ranges => [Range.Any, Range.Any];

    public static void Natural<TNumber>(ReadOnlySpan<TNumber> parameters, Span<TNumber> theta)
        where TNumber : struct, IArithmetic<TNumber> => (theta[0], theta[1]) = (parameters[0], parameters[1]);
}

/// <summary>Repair hours: (shape − 1) log x − rate·x − delay/x.</summary>
internal readonly struct RepairHours : ITradeFamily
{
    public static Atom[] Statistics => Duration.Statistics;

    public static Domain Domain => Duration.Domain;

    public static NaturalSet NaturalSet => Duration.NaturalSet;

    public static string[] NaturalNames => ["logHours", "hours", "perHour"];

    public static string[] ParameterNames => ["shape", "rate", "delay"];

    public static (double Lower, double Upper)[] Ranges => [Range.Any, Range.Any, Range.Any];

    public static void Natural<TNumber>(ReadOnlySpan<TNumber> parameters, Span<TNumber> theta)
        where TNumber : struct, IArithmetic<TNumber> =>
        (theta[0], theta[1], theta[2]) = (parameters[0] - 1, -parameters[1], -parameters[2]);

    public static bool TryParameters(ReadOnlySpan<double> theta, Span<double> parameters)
    {
        (parameters[0], parameters[1], parameters[2]) = (theta[0] + 1, -theta[1], -theta[2]);
        return true;
    }
}

/// <summary>A load that swings about its mean: −½((x − mean)/deviation)², without a closed inverse.</summary>
internal readonly struct SwingingLoad : ITradeFamily
{
    public static Atom[] Statistics => Normal.Statistics;

    public static Domain Domain => Normal.Domain;

    public static NaturalSet NaturalSet => Normal.NaturalSet;

    public static string[] NaturalNames => ["load", "squaredLoad"];

    public static string[] ParameterNames => ["mean", "deviation"];

    public static (double Lower, double Upper)[] Ranges => [Range.Any, Range.Positive];

    public static void Natural<TNumber>(ReadOnlySpan<TNumber> parameters, Span<TNumber> theta)
        where TNumber : struct, IArithmetic<TNumber>
    {
        var variance = parameters[1] * parameters[1];
        (theta[0], theta[1]) = (parameters[0] / variance, (TNumber)(-0.5) / variance);
    }
}

/// <summary>A load whose deviation is a tenth of its mean: one parameter for two statistics.</summary>
internal readonly struct ProportionalLoad : ITradeFamily
{
    public static Atom[] Statistics => Normal.Statistics;

    public static Domain Domain => Normal.Domain;

    public static NaturalSet NaturalSet => Normal.NaturalSet;

    public static string[] NaturalNames => ["load", "squaredLoad"];

    public static string[] ParameterNames => ["mean"];

    public static (double Lower, double Upper)[] Ranges => [Range.Positive];

    public static void Natural<TNumber>(ReadOnlySpan<TNumber> parameters, Span<TNumber> theta)
        where TNumber : struct, IArithmetic<TNumber> =>
        (theta[0], theta[1]) = ((TNumber)100 / parameters[0], (TNumber)(-50) / (parameters[0] * parameters[0]));
}

/// <summary>Hours to the failure of a bearing: one hazard up to 200 h, another after it.</summary>
internal readonly struct BearingHours : ITradeFamily
{
    private const double RunIn = 200;

    public static Atom[] Statistics =>
    [
        new Indicator(x => x.X < RunIn),
        new Ramp(x => Math.Min(x, RunIn), x => x < RunIn ? 1 : 0),
        new Ramp(x => Math.Max(0, x - RunIn), x => x < RunIn ? 0 : 1),
    ];

    public static Domain Domain => new() { IsLattice = false, Lower = 0, Upper = double.PositiveInfinity, Breakpoints = [RunIn] };

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(true, true, "1 1 x1 1", (Parts.Named("x1"), [0, 0, 1], 0)));

    public static string[] NaturalNames => ["early", "earlyHours", "lateHours"];

    public static string[] ParameterNames => ["early", "late"];

    public static (double Lower, double Upper)[] Ranges => [Range.Positive, Range.Positive];

    public static void Natural<TNumber>(ReadOnlySpan<TNumber> parameters, Span<TNumber> theta)
        where TNumber : struct, IArithmetic<TNumber> =>
        (theta[0], theta[1], theta[2]) = (TNumber.Log(parameters[0]) - TNumber.Log(parameters[1]), -parameters[0], -parameters[1]);

    /// <summary>A function with one slope below the end of the run-in and another above it.</summary>
    private sealed class Ramp(Func<double, double> value, Func<double, double> slope) : Atom
    {
        public override double Value(in Point x) => value(x.X);

        public override double Slope(in Point m) => slope(m.X);

        public override double Residual(in Point m, in Point x) =>
            slope(m.X) == slope(x.X) ? 0 : value(x.X) - value(m.X) - (slope(m.X) * x.Displacement);

        public override TNumber Derivative<TNumber>(TNumber x, in Point piece) => slope(piece.X);
    }
}

/// <summary>{x, x²} on a half-line.</summary>
internal readonly struct HalfLine : ITradeFamily
{
    public static Atom[] Statistics => [new Monomial(1), new Monomial(2)];

    public static Domain Domain => new() { IsLattice = false, Lower = 0, Upper = double.PositiveInfinity, LowerIncluded = true };

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(true, true, "x1 x2 1", (Parts.Named("x2"), [0, 1], 0), (Parts.Named("x1"), [1, 0], 0)));

    public static string[] NaturalNames => ["hours", "squaredHours"];

    public static string[] ParameterNames => ["hours", "squaredHours"];

    public static (double Lower, double Upper)[] Ranges => [Range.Any, Range.Any];

    public static void Natural<TNumber>(ReadOnlySpan<TNumber> parameters, Span<TNumber> theta)
        where TNumber : struct, IArithmetic<TNumber> => (theta[0], theta[1]) = (parameters[0], parameters[1]);
}

/// <summary>{log x, x} from 1 on: a power tail that an exponential one cuts off.</summary>
internal readonly struct TailFrom1 : ITradeFamily
{
    public static Atom[] Statistics => [new LogInside(), new Monomial(1)];

    public static Domain Domain => new() { IsLattice = false, Lower = 1, Upper = double.PositiveInfinity, LowerIncluded = true };

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(true, true, "log x1 1", (Parts.Named("x1"), [0, 1], 0), (Parts.Named("log"), [1, 0], 0)));

    public static string[] NaturalNames => ["logHours", "hours"];

    public static string[] ParameterNames => ["logHours", "hours"];

    public static (double Lower, double Upper)[] Ranges => [Range.Any, Range.Any];

    public static void Natural<TNumber>(ReadOnlySpan<TNumber> parameters, Span<TNumber> theta)
        where TNumber : struct, IArithmetic<TNumber> => (theta[0], theta[1]) = (parameters[0], parameters[1]);
}

/// <summary>Two statistics of which one is a multiple of the other but for a constant.</summary>
internal readonly struct TiedCounts : ITradeFamily
{
    public static Atom[] Statistics => [new Monomial(1), new SumOf(3, (2, new Monomial(1)))];

    public static Atom LogBase => new LogGammaOf(-1, 1);

    public static Domain Domain => Parts.Counts(0);

    public static NaturalSet NaturalSet => Parts.Set(
        Parts.End(true, true, "x1 x1 xlog", (Parts.Named("xlog"), [0, 0], -1), (Parts.Named("x1"), [1, 2], 1)));

    public static string[] NaturalNames => ["pallets", "halfPallets"];

    public static string[] ParameterNames => ["pallets", "halfPallets"];

    public static (double Lower, double Upper)[] Ranges => [Range.Any, Range.Any];

    public static void Natural<TNumber>(ReadOnlySpan<TNumber> parameters, Span<TNumber> theta)
        where TNumber : struct, IArithmetic<TNumber> => (theta[0], theta[1]) = (parameters[0], parameters[1]);
}
