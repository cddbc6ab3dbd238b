using System;
using FamilyGen.Special;

namespace FamilyGen.Kernels;

public static partial class Residual
{
    /// <summary>For log Γ(w + shift) − log Γ(w), whose two parts grow as w log w and cancel down to shift·log w.</summary>
    /// <remarks>From 10 on shift·log w and a rest of about shift(shift − 1)/(2w), so small that its plain difference is
    /// exact enough; below, both are moved up by log Γ(w) = log Γ(w + 1) − log w. Where the shift is large beside w nothing cancels
    /// and the two are taken apart. The slope is <see cref="Special.LogGammaRatio.Derivative"/>.</remarks>
    public static double LogGammaRatio(double w, double shift, double step)
    {
        var end = w + step;
        if (!(shift > -0.5 * Math.Min(w, end)) || shift > 0.5 * Math.Max(w, end))
            return LogGamma(w + shift, step) - LogGamma(w, step);
        var sum = 0.0;
        while (Math.Min(Math.Min(w, end), Math.Min(w, end) + shift) < StirlingFrom)
        {
            sum -= Log(w + shift, end + shift, step) - Log(w, end, step);
            w++;
            end++;
        }

        return sum + shift * Log(w, end, step)
            + (Special.LogGammaRatio.Bend(end, shift) - Special.LogGammaRatio.Bend(w, shift) - Special.LogGammaRatio.BendSlope(w, shift) * step);
    }
}
