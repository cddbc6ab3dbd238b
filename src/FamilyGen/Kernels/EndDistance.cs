using System;
using FamilyGen.Special;

namespace FamilyGen.Kernels;

/// <summary>Logarithms of the distances to the ends of an interval. Near one end of a finite interval the distance to the
/// other is the width less little, and is not rounded before its logarithm is taken: log(1 − 1e−20) is −1e−20.</summary>
internal static class EndDistance
{
    /// <summary>log(x − lower); NaN where there is no lower end.</summary>
    public static double LogAbove(double x, double lower, double upper)
    {
        if (double.IsInfinity(lower))
            return double.NaN;
        var below = upper - x;
        return below < x - lower && below >= 0
            ? Math.Log(upper - lower) + Elementary.Log1P(-below / (upper - lower))
            : Math.Log(x - lower);
    }

    /// <summary>log(upper − x); NaN where there is no upper end.</summary>
    public static double LogBelow(double x, double lower, double upper)
    {
        if (double.IsInfinity(upper))
            return double.NaN;
        var above = x - lower;
        return above < upper - x && above >= 0
            ? Math.Log(upper - lower) + Elementary.Log1P(-above / (upper - lower))
            : Math.Log(upper - x);
    }
}
