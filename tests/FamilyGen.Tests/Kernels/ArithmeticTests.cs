using System;
using System.Collections.Generic;
using FamilyGen.Kernels;

namespace FamilyGen.Tests.Kernels;

/// <summary>Formulas written once and evaluated in all three arithmetics, in the way generated code writes them.</summary>
public class ArithmeticTests
{
    private static TNumber Slope<TNumber>(ReadOnlySpan<double> theta, TNumber x)
        where TNumber : struct, IArithmetic<TNumber>
        => theta[0] / x + theta[1] - theta[2] / (x * x) + 2 * x - 1;

    private static TNumber Everything<TNumber>(TNumber x, TNumber y)
        where TNumber : struct, IArithmetic<TNumber>
        => TNumber.Exp(x / 3) * TNumber.Log(y) + TNumber.Pow(x, 2.5) - TNumber.Pow(y, x) + TNumber.Sin(x * y)
            - TNumber.Cos(x - y) / (1 + y) + TNumber.Abs(x - 4) * TNumber.LogGamma(y) - TNumber.Digamma(x) + -TNumber.Pow(x - 3, -2);

    [Fact]
    public void Doubles_and_integers_mix_with_every_arithmetic()
    {
        double[] theta = [1.5, -0.25, 3];
        var expected = (1.5 / 2) - 0.25 - (3.0 / 4) + 4 - 1;
        Assert.Equal(expected, Slope<Scalar>(theta, 2).Value, 14);
        Assert.True(Slope<Bounds>(theta, 2).Contains(expected));
        Assert.Equal(expected, Slope(theta, Jet.Variable(2, 0, 1)).Value, 14);
    }

    [Fact]
    public void Jets_agree_with_differences()
    {
        double[] at = [1.7, 0.9];
        var variables = Jet.Variables(at);
        var jet = Everything(variables[0], variables[1]);
        Assert.Equal(Everything<Scalar>(at[0], at[1]).Value, jet.Value, 13);
        const double H = 1e-5;
        for (var i = 0; i < 2; i++)
        {
            var (up, down) = (Shifted(at, i, H), Shifted(at, i, -H));
            Assert.Equal((up.Value - down.Value) / (2 * H), jet.Gradient(i), 7);
            for (var j = 0; j < 2; j++)
            {
                Assert.Equal((up.Gradient(j) - down.Gradient(j)) / (2 * H), jet.Hessian(i, j), 6);
                Assert.Equal(jet.Hessian(i, j), jet.Hessian(j, i));
            }
        }
    }

    private static Jet Shifted(double[] at, int index, double h)
    {
        var moved = (double[])at.Clone();
        moved[index] += h;
        var variables = Jet.Variables(moved);
        return Everything(variables[0], variables[1]);
    }
}
