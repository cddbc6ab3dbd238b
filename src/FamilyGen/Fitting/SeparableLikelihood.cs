using System;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>The certificate that a local maximum is the only one, for a likelihood of the form Σᵢ (Pᵢ log φᵢ + Qᵢφᵢ) with
/// positive φᵢ: a piecewise-constant hazard, whose estimates are events over exposure, is of this form.</summary>
/// <remarks>The form is checked, not read: the derivatives of the likelihood are analytic functions, so that an identity that
/// holds at arbitrary points holds everywhere, except by a coincidence of probability 0. Such a likelihood is strictly
/// concave when every Pᵢ &gt; 0.</remarks>
internal static class SeparableLikelihood
{
    private const int Points = 4;
    private const double Tolerance = 1e-8;

    /// <summary>Whether the likelihood has this form and this maximum is therefore the only one.</summary>
    public static bool HasOneMaximum<TKernel>(StatisticSums<TKernel> sums, CurvedPoint<TKernel> maximum)
        where TKernel : struct, ITradeKernel
    {
        var centre = maximum.Parameters;
        var p = centre.Length;
        var chart = ParameterChart.Of(sums.Kernel);
        for (var i = 0; i < p; i++)
        {
            if (chart.Lower[i] < 0 || !(centre[i] > 0))
                return false;
        }

        if (Form(sums, centre) is not { } reference)
            return false;
        for (var n = 1; n <= Points; n++)
        {
            var point = new double[p];
            var shift = chart.Spread(n, 0.7);
            for (var i = 0; i < p; i++)
                point[i] = centre[i] * Math.Exp(shift[i]);
            if (Form(sums, point) is not { } form)
                return false;
            for (var i = 0; i < p; i++)
            {
                var size = Math.Abs(reference.Logarithmic[i]) + Math.Abs(reference.Linear[i] * centre[i]);
                if (Math.Abs(form.Logarithmic[i] - reference.Logarithmic[i]) > Tolerance * size
                    || Math.Abs(form.Linear[i] - reference.Linear[i]) * centre[i] > Tolerance * size)
                {
                    return false;
                }
            }
        }

        return Array.TrueForAll(reference.Logarithmic, coefficient => coefficient > 0);
    }

    /// <summary>The Pᵢ and Qᵢ that first and second derivatives at one point imply; null when mixed derivatives do not vanish.</summary>
    private static (double[] Logarithmic, double[] Linear)? Form<TKernel>(StatisticSums<TKernel> sums, double[] parameters)
        where TKernel : struct, ITradeKernel
    {
        if (CurvedPoint<TKernel>.TryAt(sums, parameters, out _) is not { } point)
            return null;
        var p = parameters.Length;
        var (logarithmic, linear) = (new double[p], new double[p]);
        for (var a = 0; a < p; a++)
        {
            for (var b = 0; b < a; b++)
            {
                if (Math.Abs(point.Hessian[a, b]) > Tolerance * Math.Sqrt(Math.Abs(point.Hessian[a, a] * point.Hessian[b, b])))
                    return null;
            }

            logarithmic[a] = -point.Hessian[a, a] * parameters[a] * parameters[a];
            linear[a] = point.Gradient[a] - (logarithmic[a] / parameters[a]);
        }

        return (logarithmic, linear);
    }
}
