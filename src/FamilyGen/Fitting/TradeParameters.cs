using System;
using FamilyGen.Kernels;
using FamilyGen.Partition;

namespace FamilyGen.Fitting;

/// <summary>Between trade parameters φ and natural parameters θ = η(φ).</summary>
public static class TradeParameters
{
    /// <summary>Whether every parameter is finite and inside its open range.</summary>
    public static bool AreInRange<TKernel>(TKernel kernel, ReadOnlySpan<double> parameters)
        where TKernel : struct, ITradeKernel => OutOfRange(kernel, parameters) < 0;

    /// <summary>The law at trade parameters.</summary>
    /// <exception cref="ArgumentOutOfRangeException">A parameter is not finite or outside its range, or the normalizer is not
    /// finite there.</exception>
    public static Distribution<TKernel> Distribution<TKernel>(TKernel kernel, ReadOnlySpan<double> parameters)
        where TKernel : struct, ITradeKernel
    {
        var i = OutOfRange(kernel, parameters);
        if (i >= 0)
        {
            var chart = ParameterChart.Of(kernel);
            var name = TKernel.ParameterNames[i];
            throw new ArgumentOutOfRangeException(
                name,
                parameters[i],
                $"The parameter '{name}' is {ObservationRule.Text(parameters[i])}; it must be a number in ({ObservationRule.Text(chart.Lower[i])}, {ObservationRule.Text(chart.Upper[i])}).");
        }

        var numbers = new Scalar[parameters.Length];
        for (var p = 0; p < numbers.Length; p++)
            numbers[p] = parameters[p];
        var natural = new Scalar[TKernel.Count];
        kernel.Natural<Scalar>(numbers, natural);
        var theta = new double[natural.Length];
        for (var j = 0; j < theta.Length; j++)
            theta[j] = natural[j].Value;
        return new Distribution<TKernel>(kernel, theta);
    }

    /// <summary>The trade parameters of natural ones: by the closed inverse where there is one, else by Newton's method from
    /// several starts. Of isolated solutions one is returned.</summary>
    /// <exception cref="ArgumentOutOfRangeException">No trade parameters within their ranges give these natural parameters.</exception>
    public static double[] FromNatural<TKernel>(TKernel kernel, ReadOnlySpan<double> theta)
        where TKernel : struct, ITradeKernel
    {
        var parameters = new double[TKernel.ParameterNames.Length];
        FromNatural(kernel, theta, parameters);
        return parameters;
    }

    /// <inheritdoc cref="FromNatural{TKernel}(TKernel, ReadOnlySpan{double})"/>
    public static void FromNatural<TKernel>(TKernel kernel, ReadOnlySpan<double> theta, Span<double> parameters)
        where TKernel : struct, ITradeKernel
    {
        if (theta.Length != TKernel.Count)
            throw new ArgumentException($"There are {TKernel.Count} natural parameters, and {theta.Length} values.", nameof(theta));
        if (TryFromNatural(kernel, theta, parameters))
            return;
        var text = "";
        for (var j = 0; j < theta.Length; j++)
            text += $"{(j == 0 ? "" : ", ")}{TKernel.NaturalNames[j]} = {ObservationRule.Text(theta[j])}";
        throw new ArgumentOutOfRangeException(
            nameof(theta),
            $"No values of {string.Join(", ", TKernel.ParameterNames.ToArray())} within their ranges give the natural parameters {text}.");
    }

    internal static bool TryFromNatural<TKernel>(TKernel kernel, ReadOnlySpan<double> theta, Span<double> parameters)
        where TKernel : struct, ITradeKernel =>
        (kernel.TryParameters(theta, parameters) && AreInRange(kernel, parameters)) || InverseSearch.TrySolve(kernel, theta, parameters);

    private static int OutOfRange<TKernel>(TKernel kernel, ReadOnlySpan<double> parameters)
        where TKernel : struct, ITradeKernel
    {
        var chart = ParameterChart.Of(kernel);
        for (var i = 0; i < parameters.Length; i++)
        {
            if (!double.IsFinite(parameters[i]) || !(parameters[i] > chart.Lower[i] && parameters[i] < chart.Upper[i]))
                return i;
        }

        return -1;
    }
}
