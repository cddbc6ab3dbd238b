using System;
using FamilyGen.Special;

namespace FamilyGen.Kernels;

public static partial class Residual
{
    private const double StirlingFrom = 10;

    /// <summary>For log Γ(w), w &gt; 0 and w + step ≥ 0.</summary>
    /// <remarks>From 10 on, Stirling's series term by term: with δ = step/w the residual is
    /// w((1 + δ)log(1 + δ) − δ) − ½(log(1 + δ) − δ) + that of Σ B₂ₖ/(2k(2k − 1)w²ᵏ⁻¹); below, both ends are moved up by
    /// log Γ(w) = log Γ(w + 1) − log w, whose residuals are positive too: nothing cancels.</remarks>
    public static double LogGamma(double w, double step)
    {
        var end = w + step;
        if (!(end > 0))
            return end == Math.Floor(end) ? double.PositiveInfinity : double.NaN;
        var sum = 0.0;
        while (Math.Min(w, end) < StirlingFrom)
        {
            sum -= Log(w, end, step);
            w++;
            end++;
        }

        return sum + XLogX(w, end, step) - (0.5 * Log(w, end, step)) + StirlingTail(w, end, step);
    }

    // Σ cₖ·(the residual of w¹⁻²ᵏ); that of w⁻ᵐ is w⁻ᵐ·Pₘ, see Power
    private static double StirlingTail(double w, double end, double step)
    {
        var q = w / end;
        var growth = step / w * (step / end);
        var (power, residual, m) = (1 / w, growth, 1);
        var sum = 0.0;
        foreach (var coefficient in Special.LogGamma.StirlingCoefficients)
        {
            sum += coefficient * power * residual;
            residual = (q * residual) + (++m * growth);
            residual = (q * residual) + (++m * growth);
            power /= w * w;
        }

        return sum;
    }
}
