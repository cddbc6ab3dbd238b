using System;
using CsCheck;
using FamilyGen.Kernels;

namespace FamilyGen.Tests.Kernels;

/// <summary>Ranges hold the values at points drawn from them.</summary>
public class BoundsTests
{
    private static readonly Gen<(Bounds Range, double Point)> s_any =
        Gen.Select(Gen.Double[-20, 20], Gen.Double[0, 5], Gen.Double[0, 1]).Select(Drawn);

    private static readonly Gen<(Bounds Range, double Point)> s_positive =
        Gen.Select(Gen.Double[1e-3, 20], Gen.Double[0, 5], Gen.Double[0, 1]).Select(Drawn);

    private static (Bounds, double) Drawn(double lower, double width, double at)
    {
        var range = new Bounds(lower, lower + width);
        return (range, Math.Clamp(lower + (width * at), range.Lower, range.Upper));
    }

    [Fact]
    public void Hold_every_value_of_one_argument() => s_any.Sample(drawn =>
    {
        var (range, x) = drawn;
        Holds(Bounds.Exp(range), Math.Exp(x));
        Holds(Bounds.Sin(range), Math.Sin(x));
        Holds(Bounds.Cos(range), Math.Cos(x));
        Holds(Bounds.Abs(range), Math.Abs(x));
        Holds(-range, -x);
        foreach (var n in new[] { 0.0, 1, 2, 3, 4, -1, -2, -3 })
            Holds(Bounds.Pow(range, n), Math.Pow(x, n));
    });

    [Fact]
    public void Hold_every_value_of_a_positive_argument() => s_positive.Sample(drawn =>
    {
        var (range, x) = drawn;
        Holds(Bounds.Log(range), Math.Log(x));
        Holds(Bounds.LogGamma(range), FamilyGen.Special.LogGamma.Value(x));
        Holds(Bounds.Digamma(range), FamilyGen.Special.Digamma.Value(x));
        foreach (var p in new[] { 0.5, -0.5, 1.5, -2.5 })
            Holds(Bounds.Pow(range, p), Math.Pow(x, p));
        Holds(Bounds.Pow(range, new Bounds(-1, 2)), Math.Pow(x, 1.3));
    });

    [Fact]
    public void Hold_every_value_of_two_arguments() => Gen.Select(s_any, s_any).Sample((a, b) =>
    {
        Holds(a.Range + b.Range, a.Point + b.Point);
        Holds(a.Range - b.Range, a.Point - b.Point);
        Holds(a.Range * b.Range, a.Point * b.Point);
        if (b.Point != 0)
            Holds(a.Range / b.Range, a.Point / b.Point);
    });

    [Fact]
    public void Are_narrow_where_nothing_is_lost()
    {
        var sine = Bounds.Sin(new(0.1, 0.2));
        Assert.Equal(Math.Sin(0.1), sine.Lower, 15);
        Assert.Equal(Math.Sin(0.2), sine.Upper, 15);
        Assert.Equal(1, Bounds.Sin(new(1.5, 1.6)).Upper);
        Assert.Equal(-1, Bounds.Cos(new(3, 3.2)).Lower);
        Assert.True(((Bounds)3 - 2).Lower > 0.999);
    }

    [Fact]
    public void Open_up_at_poles_and_outside_the_domain()
    {
        Assert.Equal(Bounds.Unknown, (Bounds)1 / new Bounds(-1, 1));
        Assert.Equal(double.PositiveInfinity, ((Bounds)1 / new Bounds(0, 2)).Upper);
        Assert.True(((Bounds)1 / new Bounds(0, 2)).Lower > 0.49);
        Assert.Equal(double.NegativeInfinity, ((Bounds)1 / new Bounds(-2, 0)).Lower);
        Assert.Equal(double.NegativeInfinity, Bounds.Log(new(0, 1)).Lower);
        Assert.Equal(double.NegativeInfinity, Bounds.Log(new(-3, 1)).Lower);
        Assert.Equal(Bounds.Unknown, Bounds.Log(new(-3, -1)));
        Assert.Equal(double.PositiveInfinity, Bounds.LogGamma(new(0, 1)).Upper);
        Assert.True(Bounds.LogGamma(new(1, 2)).Contains(-0.1214862905));
        Assert.Equal(Bounds.Unknown, new Bounds(double.NaN, 1));
        Assert.Equal(new Bounds(-1, 1), Bounds.Cos(new(1e9, double.PositiveInfinity)));
        Assert.Equal(Bounds.Unknown, Bounds.Unknown + Bounds.Unknown);
        Assert.True((new Bounds(0, double.PositiveInfinity) * new Bounds(0, 1)).Lower > -1e-300);
    }

    private static void Holds(Bounds range, double value) =>
        Assert.True(range.Contains(value) || double.IsInfinity(value), $"[{range.Lower:R}, {range.Upper:R}] misses {value:R}");
}
