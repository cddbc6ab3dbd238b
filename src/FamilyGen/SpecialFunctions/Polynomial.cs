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
    /// <summary>(P(x) − P(y))/(x − y) for P = Σ coefficients[k]·tᵏ, without the difference: Horner's scheme at x, carried
    /// on at y.</summary>
    public static double DividedDifference(ReadOnlySpan<double> coefficients, double x, double y)
    {
        var (value, quotient) = (0.0, 0.0);
        for (var k = coefficients.Length - 1; k >= 0; k--)
        {
            quotient = Math.FusedMultiplyAdd(quotient, y, value);
            value = Math.FusedMultiplyAdd(value, x, coefficients[k]);
        }

        return quotient;
    }
}
