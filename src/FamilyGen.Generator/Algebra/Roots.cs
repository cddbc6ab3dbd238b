using System;
using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>Where a function of x alone changes sign on the support, found on a grid and refined by bisection.</summary>
internal static class Roots
{
    private const int Grid = 1000;
    private const int MostRoots = 64;

    /// <summary>The sign changes in ascending order; null where the function cannot be evaluated without known values or
    /// changes sign too often to be followed.</summary>
    public static IReadOnlyList<Expression>? Of(Expression function, Scope scope)
    {
        if (Dependences.Of(function) != Dependence.Observation || Dependences.Parts(function).Any(p => p is Opaque))
            return null;
        var range = scope.RangeOf(scope.Observation);
        var roots = new List<Expression>();
        double? before = null;
        var at = 0.0;
        for (var i = 0; i <= Grid; i++)
        {
            var x = Place((i + 0.5) / (Grid + 1), range);
            var value = Value(function, x);
            if (double.IsNaN(value))
            {
                before = null;
                continue;
            }

            if (before is { } old && (old < 0) != (value < 0) && value != 0)
                roots.Add(Exact(Bisect(function, at, x)));
            else if (value == 0)
                roots.Add(Exact(x));
            if (roots.Count > MostRoots)
                return null;
            if (value != 0)
                (before, at) = (value, x);
            else
                before = null;
        }

        return roots;
    }

    private static double Bisect(Expression function, double low, double high)
    {
        var isNegative = Value(function, low) < 0;
        for (var i = 0; i < 200; i++)
        {
            var middle = low + ((high - low) / 2);
            if (middle == low || middle == high)
                break;
            var value = Value(function, middle);
            if (value == 0)
            {
                high = middle;
                break;
            }

            if (value < 0 == isNegative)
                low = middle;
            else
                high = middle;
        }

        var rounded = Math.Round(high, 9);
        return Value(function, rounded) == 0 ? rounded : high;
    }

    // The support brought to (0, 1); an infinite end with a scale of one.
    private static double Place(double unit, Range range)
    {
        var (lower, upper) = (range.Lower, range.Upper);
        if (range.IsFinite)
            return lower + (unit * (upper - lower));
        if (!double.IsInfinity(lower))
            return lower + (unit / (1 - unit));
        if (!double.IsInfinity(upper))
            return upper - ((1 - unit) / unit);
        var z = (2 * unit) - 1;
        return 3 * z / (1 - (z * z));
    }

    private static double Value(Expression function, double x) => Evaluator.Evaluate(function, _ => x);

    private static Expression Exact(double value) =>
        value == Math.Floor(value) && Math.Abs(value) < 1e15
            ? Formula.Of((long)value)
            : new Constant(value, value.ToString("R", System.Globalization.CultureInfo.InvariantCulture));
}
