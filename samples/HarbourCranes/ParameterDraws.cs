using System;
using System.Collections.Generic;
using FamilyGen;
using MathNet.Numerics.Distributions;
using MathNet.Numerics.LinearAlgebra;

namespace HarbourCranes;

/// <summary>Laws that the data leave possible: parameters drawn from the normal law around a fit that its covariance gives.</summary>
internal static class ParameterDraws
{
    /// <summary>Endless draws; one outside the parameter set is thrown away and drawn anew.</summary>
    /// <param name="fit">The fit.</param>
    /// <param name="isLaw">Whether natural parameters lie in the set.</param>
    /// <param name="law">The law at natural parameters.</param>
    /// <param name="random">The source of chance.</param>
    public static IEnumerable<TFamily> Around<TFamily>(
        FitResult<TFamily> fit, Func<double[], bool> isLaw, Func<double[], TFamily> law, Random random)
    {
        if (fit.Status != FitStatus.InteriorMaximum)
            throw new InvalidOperationException($"The fit of {typeof(TFamily).Name} is no interior maximum: its parameters have no normal law to draw from.");
        var root = Matrix<double>.Build.DenseOfArray(fit.NaturalCovariance).Cholesky().Factor;
        var centre = Vector<double>.Build.DenseOfArray([.. fit.Natural]);
        while (true)
        {
            var step = Vector<double>.Build.Dense(centre.Count, _ => Normal.Sample(random, 0, 1));
            var natural = (centre + root * step).ToArray();
            if (isLaw(natural))
                yield return law(natural);
        }
    }
}
