using System;

namespace FamilyGen.Special;

internal static class Polynomial
{
    /// <summary>Σ coefficients[k]·xᵏ.</summary>
    public static double Horner(ReadOnlySpan<double> coefficients, double x)
    {
        var sum = 0.0;
        for (var k = coefficients.Length - 1; k >= 0; k--)
            sum = Math.FusedMultiplyAdd(sum, x, coefficients[k]);
        return sum;
    }
}
