using System;
using System.Collections.Generic;
using FamilyGen.Kernels;

namespace FamilyGen.Partition;

/// <summary>A range of coordinates on which the integrand rises (sign 1) or falls (sign −1).</summary>
internal readonly record struct SignedRange(double From, double To, int Sign);

/// <summary>Where the logarithm of an integrand rises and where it falls: interval bisection on guaranteed ranges of its
/// slope (Moore 1966). What is left between a rise and a fall are ranges so short that G varies by less than ½ on them,
/// whatever it does there, so that no mode of consequence is missed.</summary>
internal static class SlopeSigns
{
    private const int Budget = 1500;
    private const double FlatVariation = 0.5;
    private const int SamplesWhereUndecided = 32;

    /// <summary>The rises and falls between two coordinates in ascending order, neighbours of one sign joined.</summary>
    /// <param name="field">The slope.</param>
    /// <param name="coordinate">The kind of coordinate.</param>
    /// <param name="from">The lower end.</param>
    /// <param name="to">The upper end.</param>
    /// <param name="shortest">Ranges this short are not divided further.</param>
    /// <param name="isProven">Whether the signs are guaranteed; otherwise some were sampled.</param>
    public static List<SignedRange> Isolate<TKernel>(
        in SlopeField<TKernel> field, Coordinate coordinate, double from, double to, double shortest, out bool isProven)
        where TKernel : struct, IKernel
    {
        var signs = new List<SignedRange>();
        var open = new Stack<(double From, double To)>();
        isProven = true;
        var spent = 0;
        if (coordinate == Coordinate.Between && from < 0 && to > 0)
        {
            open.Push((0, to));
            open.Push((from, 0));
        }
        else
        {
            open.Push((from, to));
        }

        while (open.TryPop(out var range))
        {
            var (left, right) = range;
            if (spent++ > Budget)
            {
                isProven = false;
                Sample(field, left, right, signs);
                continue;
            }

            var slope = field.Slope(left, right);
            if (slope.Lower >= 0 && slope.Upper > 0)
            {
                Join(signs, left, right, 1);
                continue;
            }

            if (slope.Upper <= 0 && slope.Lower < 0)
            {
                Join(signs, left, right, -1);
                continue;
            }

            var middle = Middle(coordinate, left, right);
            var size = Math.Max(-slope.Lower, slope.Upper);
            if (IsBeyondArithmetic(coordinate, left, right, slope) || size * (right - left) <= FlatVariation || right - left <= shortest || !(middle > left && middle < right))
                continue;
            open.Push((middle, right));
            open.Push((left, middle));
        }

        return signs;
    }

    // Far out powers overflow and leave ∞ − ∞. How the exponent behaves there the set of natural parameters has decided.
    private static bool IsBeyondArithmetic(Coordinate coordinate, double from, double to, Bounds slope)
    {
        var nearest = from > 0 ? from : to < 0 ? -to : 0;
        return double.IsInfinity(slope.Lower) && double.IsInfinity(slope.Upper)
            && nearest >= (coordinate == Coordinate.Identity ? 1e60 : 140);
    }

    private static void Sample<TKernel>(in SlopeField<TKernel> field, double from, double to, List<SignedRange> signs)
        where TKernel : struct, IKernel
    {
        var last = from;
        var before = field.Slope(from);
        for (var i = 1; i <= SamplesWhereUndecided; i++)
        {
            var next = i == SamplesWhereUndecided ? to : from + (to - from) * i / SamplesWhereUndecided;
            var slope = field.Slope(next);
            if (before * slope > 0)
                Join(signs, last, next, slope > 0 ? 1 : -1);
            (last, before) = (next, slope);
        }
    }

    private static void Join(List<SignedRange> signs, double from, double to, int sign)
    {
        if (signs.Count > 0 && signs[^1].Sign == sign)
            signs[^1] = signs[^1] with { To = to };
        else
            signs.Add(new(from, to, sign));
    }

    // On a scale that may reach from 1e−300 to 1e300 the middle halves the exponent first and the digits last.
    private static double Middle(Coordinate coordinate, double from, double to)
    {
        if (coordinate != Coordinate.Identity)
            return from + (to - from) / 2;
        if (from < 0 && to > 0)
            return 0;
        if (to <= 0)
            return -Middle(coordinate, -to, -from);
        if (from == 0)
            return to > 1 ? 1 : to < 1e-300 ? to / 2 : Math.ScaleB(1, (Math.ILogB(to) - 1074) / 2);
        return to / from > 4 ? Math.Sqrt(from) * Math.Sqrt(to) : from + (to - from) / 2;
    }
}
