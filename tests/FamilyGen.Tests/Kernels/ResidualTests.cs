using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Kernels;
using FamilyGen.Special;
using FamilyGen.Tests.SpecialFunctions;

namespace FamilyGen.Tests.Kernels;

/// <summary>Residuals against a table of values in 400 digits (residuals.py).</summary>
public class ResidualTests
{
    private static readonly Dictionary<string, Func<double, double, double, double>> s_functions = new()
    {
        ["Log"] = (w, step, _) => Residual.Log(w, step),
        ["LogAtEnd"] = (_, ratio, _) => Residual.LogAtEnd(ratio),
        ["LogGamma"] = (w, step, _) => Residual.LogGamma(w, step),
        ["XLogX"] = (w, step, _) => Residual.XLogX(w, step),
        ["XLogXAtEnd"] = (w, ratio, _) => Residual.XLogXAtEnd(w, ratio),
        ["Power"] = Residual.Power,
        ["PowerAtEnd"] = Residual.PowerAtEnd,
        ["IntegerPower"] = (w, step, n) => Residual.Power(w, step, (int)n),
        ["LogPower"] = (w, step, n) => Residual.LogPower(w, step, (int)n),
        ["LogPowerAtEnd"] = (w, ratio, n) => Residual.LogPowerAtEnd(Math.Log(w), ratio, (int)n),
        ["Exp"] = (w, step, _) => Residual.Exp(w, step),
        ["Cos"] = (w, step, _) => Residual.Cos(w, step),
        ["Sin"] = (w, step, _) => Residual.Sin(w, step),
        ["Softplus"] = (w, step, _) => Residual.Softplus(w, step),
    };

    // Where the residual changes its sign no method is accurate relative to it: there the unit is taken from the bound
    // ½·step²·max|f″| instead.
    private static readonly Dictionary<string, Func<double, double, double, double>> s_sizes = new()
    {
        ["Cos"] = (_, step, _) => Math.Min(step * step / 2, 2 + Math.Abs(step)),
        ["Sin"] = (_, step, _) => Math.Min(step * step / 2, 2 + Math.Abs(step)),
        ["IntegerPower"] = (w, step, n) => n < 0 ? 0
            : n * (n - 1) / 2 * step * step * Math.Pow(Math.Max(Math.Abs(w), Math.Abs(w + step)), n - 2),
        ["LogPower"] = (w, step, n) => LogPowerSize(Math.Log(w), Math.Log((w + step) / w), n),
        ["LogPowerAtEnd"] = (w, ratio, n) => LogPowerSize(Math.Log(w), ratio, n),
    };

    [Theory]
    [InlineData("Log", 4)]
    [InlineData("LogAtEnd", 3)]
    [InlineData("LogGamma", 7)]
    [InlineData("XLogX", 6)]
    [InlineData("XLogXAtEnd", 5)]
    [InlineData("Power", 100)]
    [InlineData("PowerAtEnd", 300)]
    [InlineData("IntegerPower", 15)]
    [InlineData("LogPower", 30)]
    [InlineData("LogPowerAtEnd", 30)]
    [InlineData("Exp", 3)]
    [InlineData("Cos", 5)]
    [InlineData("Sin", 5)]
    [InlineData("Softplus", 30)]
    public void Stays_within_its_stated_error(string function, double units)
    {
        var rows = ReferenceTable.Read("residuals.tsv").Where(row => row.Function == function).ToList();
        Assert.True(rows.Count > 20);
        double Computed(ReferenceTable.Row row) => s_functions[function](row.Arguments[0], row.Arguments[1], row.Arguments[2]);
        double Error(ReferenceTable.Row row)
        {
            var size = s_sizes.TryGetValue(function, out var of) ? of(row.Arguments[0], row.Arguments[1], row.Arguments[2]) : 0;
            return row.ErrorInUlp(Computed(row)) * Math.Min(1, Math.Abs(row.High) / size);
        }

        var worst = rows.MaxBy(Error)!;
        Assert.True(Error(worst) <= units, $"{worst} but computed {Computed(worst):R}: {Error(worst)} units");
    }

    [Fact]
    public void Is_exact_where_the_end_of_the_support_is_reached()
    {
        Assert.Equal(double.NegativeInfinity, Residual.Log(2, -2));
        Assert.Equal(2, Residual.XLogX(2, -2));
        Assert.Equal(double.PositiveInfinity, Residual.LogGamma(2, -2));
        Assert.Equal(-40000 + 1, Residual.LogAtEnd(-40000));
        Assert.Equal(3, Residual.XLogXAtEnd(3, -40000));
        Assert.Equal(3, Residual.XLogXAtEnd(3, double.NegativeInfinity));
        Assert.Equal(double.NegativeInfinity, Residual.LogAtEnd(double.NegativeInfinity));
        Assert.Equal(4, Residual.PowerAtEnd(2, -40000, 2));
        Assert.Equal(4, Residual.PowerAtEnd(2, double.NegativeInfinity, 2));
        Assert.Equal(double.PositiveInfinity, Residual.PowerAtEnd(2, -40000, -1));
    }

    [Fact]
    public void Survives_steps_that_would_overflow_on_the_way()
    {
        var expected = 1e298 * (Math.Log(1e298) - 1 - Digamma.Value(10));
        Assert.Equal(expected, Residual.LogGamma(10, 1e298), expected * 1e-14);
        Assert.Equal(1e200, Residual.Power(1, 1e200, -1), 1e186);
        Assert.Equal(1e200, Residual.Power(1, 1e200, -2) / 2, 1e186);
        Assert.Equal(1e15 - (1.5 * Math.Log(1e15)) - 1.4189, Residual.LogGamma(1e15, 2 - 1e15), 0.25);
        Assert.Equal(1e200, -Residual.Log(1, 1e200), 1e186);
    }

    [Fact]
    public void Vanishes_for_a_step_of_nothing()
    {
        foreach (var (name, residual) in s_functions)
            Assert.True(residual(2.5, 0, 3) == 0, name);
    }

    [Fact]
    public void Absolute_value_bends_only_across_zero()
    {
        Assert.Equal(0, Residual.Abs(3, -2));
        Assert.Equal(4, Residual.Abs(3, -5));
        Assert.Equal(4, Residual.Abs(-3, 5));
        Assert.Equal(5, Residual.Abs(0, -5));
    }

    private static double LogPowerSize(double log, double ratio, double n) =>
        n * (n - 1) / 2 * ratio * ratio * Math.Pow(Math.Max(Math.Abs(log), Math.Abs(log + ratio)), n - 2)
        + n * Math.Pow(Math.Abs(log), n - 1) * Math.Abs(Residual.LogAtEnd(ratio));
}
