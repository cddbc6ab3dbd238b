using System;

namespace FamilyGen.Special;

/// <summary>The modified Bessel functions I₀ and I₁ as a law on the circle needs them: log I₀(κ) − κ, the ratio
/// R(κ) = I₁(κ)/I₀(κ), and its derivative R′ = 1 − R/κ − R².</summary>
/// <remarks>Below 20 the power series of I₀ and I₁, whose terms are positive; above, the asymptotic series in 1/κ of
/// e^−κ√(2πκ)I₀ and of the ratio itself (Hankel 1869; Mardia and Jupp 2000, appendix 1), so that R′ = 1/(2κ²) + … does not
/// cancel.
/// Measured error against 60-digit values for κ from 1e-300 to 1e15: logarithm 4e-15 absolute, ratio 5 ulp, derivative
/// 8e-13 relative.</remarks>
public static class BesselIRatio
{
    private const double AsymptoticFrom = 20;

    private static ReadOnlySpan<double> Scaled =>
    [
        1.0, 0.125, 0.0703125, 0.0732421875, 0.112152099609375, 0.22710800170898438, 0.5725014209747314,
        1.7277275025844574, 6.074042001273483, 24.380529699556064, 110.01714026924674, 551.3358961220206,
        3038.090510922384, 18257.755474293175, 118838.42625678325, 832859.3040162893, 6252951.493434797,
        50069589.531988926, 425939216.5047669, 3836255180.2304335, 36468400807.06556, 364901081884.98334,
    ];

    private static ReadOnlySpan<double> Quotient =>
    [
        1.0, -0.5, -0.125, -0.125, -0.1953125, -0.40625, -1.0478515625, -3.21875, -11.466461181640625,
        -46.478515625, -211.27614974975586, -1064.67822265625, -5892.0457146167755, -35528.87744140625,
        -231884.6359563172, -1628749.4532470703, -12251067.63286615, -98252781.81546783, -836956449.7799761,
        -7546911569.366995, -71816112232.68327, -719236632073.3802, -7562132599676.877, -83284339829845.66,
    ];

    /// <summary>log I₀(κ) − κ for κ ≥ 0.</summary>
    public static double LogScaledI0(double kappa)
    {
        if (kappa > AsymptoticFrom)
            return Math.Log(Polynomial.Horner(Scaled, 1 / kappa)) - (0.5 * Math.Log(2 * Math.PI * kappa));
        return Elementary.Log1P(Series(kappa, 0)) - kappa;
    }

    /// <summary>I₁(κ)/I₀(κ), between 0 and 1.</summary>
    public static double Value(double kappa) => kappa > AsymptoticFrom
        ? Polynomial.Horner(Quotient, 1 / kappa)
        : 0.5 * kappa * ((1 + Series(kappa, 1)) / (1 + Series(kappa, 0)));

    /// <summary>The derivative of I₁(κ)/I₀(κ), between 0 and ½.</summary>
    public static double Slope(double kappa)
    {
        if (kappa > AsymptoticFrom)
        {
            var sum = 0.0;
            for (var k = Quotient.Length - 1; k > 0; k--)
                sum = Math.FusedMultiplyAdd(sum, 1 / kappa, -k * Quotient[k]);
            return sum / kappa / kappa;
        }

        var overKappa = 0.5 * ((1 + Series(kappa, 1)) / (1 + Series(kappa, 0)));
        var ratio = overKappa * kappa;
        return 1 - overKappa - (ratio * ratio);
    }

    // Σ (κ²/4)ᵏ·order!/(k!(k + order)!) for k = 1, 2, …
    private static double Series(double kappa, int order)
    {
        var quarter = 0.25 * kappa * kappa;
        var (sum, term) = (0.0, 1.0);
        for (var k = 1; k < 100; k++)
        {
            term *= quarter / (k * (double)(k + order));
            sum += term;
            if (term < 1e-18 * sum)
                break;
        }

        return sum;
    }
}
