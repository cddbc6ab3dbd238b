using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Special;

namespace FamilyGen.Tests.SpecialFunctions;

/// <summary>Every special function against its table of 60-digit values (reference.py), in units in the last place.</summary>
public class SpecialFunctionTests
{
    private static readonly Dictionary<string, Func<double, double>> s_functions = new()
    {
        ["Log1P"] = Elementary.Log1P,
        ["ExpM1"] = Elementary.ExpM1,
        ["ExpM1Minus"] = Elementary.ExpM1Minus,
        ["Log1PMinus"] = Elementary.Log1PMinus,
        ["XLog1PMinus"] = Elementary.XLog1PMinus,
        ["MinusSin"] = Elementary.MinusSin,
        ["LogOnePlusExp"] = Elementary.LogOnePlusExp,
        ["Logistic"] = Elementary.Logistic,
        ["LogGamma"] = LogGamma.Value,
        ["Digamma"] = Digamma.Value,
        ["Trigamma"] = Trigamma.Value,
        ["Tetragamma"] = Tetragamma.Value,
    };

    [Theory]
    [InlineData("Log1P", 1.5)]
    [InlineData("ExpM1", 1.5)]
    [InlineData("ExpM1Minus", 2.5)]
    [InlineData("Log1PMinus", 2.5)]
    [InlineData("XLog1PMinus", 4.0)]
    [InlineData("MinusSin", 3.0)]
    [InlineData("LogOnePlusExp", 2.0)]
    [InlineData("Logistic", 2.0)]
    [InlineData("LogGamma", 2.5)]
    [InlineData("Digamma", 2.5)]
    [InlineData("Trigamma", 2.5)]
    [InlineData("Tetragamma", 4.0)]
    public void Stays_within_its_stated_error(string function, double units)
    {
        var rows = ReferenceTable.Read("special.tsv").Where(row => row.Function == function).ToList();
        Assert.True(rows.Count > 60);
        var worst = rows.MaxBy(row => row.ErrorInUlp(s_functions[function](row.Arguments[0])))!;
        var computed = s_functions[function](worst.Arguments[0]);
        Assert.True(worst.ErrorInUlp(computed) <= units, $"{worst} but computed {computed:R}: {worst.ErrorInUlp(computed)} units");
    }

    [Fact]
    public void Poles_and_infinities_are_what_they_should_be()
    {
        const double Infinity = double.PositiveInfinity;
        Assert.Equal(-Infinity, Elementary.Log1P(-1));
        Assert.Equal(Infinity, Elementary.Log1P(Infinity));
        Assert.Equal(Infinity, Elementary.ExpM1(800));
        Assert.Equal(-1, Elementary.ExpM1(-Infinity));
        Assert.Equal(Infinity, Elementary.ExpM1Minus(Infinity));
        Assert.Equal(Infinity, Elementary.ExpM1Minus(-Infinity));
        Assert.Equal(-Infinity, Elementary.Log1PMinus(-1));
        Assert.Equal(-Infinity, Elementary.Log1PMinus(Infinity));
        Assert.Equal(1, Elementary.XLog1PMinus(-1));
        Assert.Equal(1, Elementary.Logistic(Infinity));
        Assert.Equal(0, Elementary.Logistic(-Infinity));
        Assert.Equal(Infinity, LogGamma.Value(0));
        Assert.Equal(Infinity, LogGamma.Value(-3));
        Assert.Equal(Infinity, LogGamma.Value(Infinity));
        Assert.Equal(0, LogGamma.Value(1));
        Assert.Equal(0, LogGamma.Value(2));
        Assert.Equal(-Infinity, Digamma.Value(0));
        Assert.Equal(Infinity, Digamma.Value(Infinity));
        Assert.Equal(Infinity, Trigamma.Value(0));
        Assert.Equal(0, Trigamma.Value(Infinity));
        Assert.Equal(-Infinity, Tetragamma.Value(0));
    }

    [Fact]
    public void What_is_undefined_is_not_a_number()
    {
        foreach (var function in s_functions.Values)
            Assert.True(double.IsNaN(function(double.NaN)));
        foreach (var name in new[] { "Log1P", "Log1PMinus", "XLog1PMinus", "LogGamma", "Digamma", "Trigamma", "Tetragamma" })
            Assert.True(double.IsNaN(s_functions[name](-1.5)), name);
    }
}
