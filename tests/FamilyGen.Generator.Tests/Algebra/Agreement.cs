using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;
using Xunit;

namespace FamilyGen.Generator.Tests.Algebra;

/// <summary>Compares a normal form with the kernel that it was read from, by numbers.</summary>
internal static class Agreement
{
    /// <summary>Σ θⱼ(φ)Tⱼ(x) + log h(x) must differ from the kernel by something that is free of x. Returns the number of
    /// points that were compared.</summary>
    public static int OfTrade(FamilyText family, IReadOnlyList<double> observations, int draws = 3)
    {
        var form = family.Form();
        var compared = 0;
        for (var draw = 0; draw < draws; draw++)
        {
            var values = new Dictionary<string, double>();
            double? difference = null;
            var drawn = draw;
            var kernels = observations.Select(x => Evaluator.Evaluate(family.Kernel, s => s.Kind == SymbolKind.Observation ? x : Parameter(s, drawn, values))).ToList();
            if (kernels.Any(double.IsNaN) || kernels.All(double.IsInfinity))
                continue;
            foreach (var x in observations)
            {
                double Value(Symbol s) => s.Kind == SymbolKind.Observation ? x : Parameter(s, draw, values);
                var kernel = Evaluator.Evaluate(family.Kernel, Value);
                var logBase = Evaluate(form.LogBase, Value);
                if (form.Statistics.Any(t => !double.IsFinite(Evaluate(t.Body, Value))))
                    continue;
                if (double.IsNegativeInfinity(logBase))
                {
                    Assert.True(double.IsNegativeInfinity(kernel), $"support differs at {x}");
                    continue;
                }

                var normal = logBase + form.Statistics.Sum(t => Evaluator.Evaluate(t.Natural!, Value) * Evaluate(t.Body, Value));
                if (double.IsInfinity(kernel))
                {
                    Assert.False(double.IsFinite(normal), $"only the kernel is infinite at {x}");
                    continue;
                }

                var scale = 1 + Math.Abs(kernel) + form.Statistics.Max(t => Math.Abs(Evaluator.Evaluate(t.Natural!, Value) * Evaluate(t.Body, Value)));
                if (scale > 1e8)
                    continue;
                difference ??= kernel - normal;
                Assert.True(Math.Abs(kernel - normal - difference.Value) <= 1e-10 * scale, $"kernel {kernel}, normal form {normal} at x = {x}, draw {draw}");
                compared++;
            }
        }

        return compared;
    }

    public static double Evaluate(AtomSum sum, Func<Symbol, double> value)
    {
        var total = 0.0;
        foreach (var term in sum.Terms)
            total += Evaluator.Evaluate(term.Coefficient, value) * Evaluator.Evaluate(term.Atom, value);
        return total;
    }

    /// <summary>Positive values without design; integers for integer symbols.</summary>
    public static double Parameter(Symbol symbol, int draw, Dictionary<string, double> values)
    {
        if (values.TryGetValue(symbol.Name, out var value))
            return value;
        var unit = (((values.Count + 1) * 0.6180339887498949) + (draw * 0.7548776662466927) + 0.1) % 1;
        return values[symbol.Name] = symbol.IsInteger ? Math.Ceiling(1 + (6 * unit)) : 0.15 + (0.8 * unit);
    }
}
