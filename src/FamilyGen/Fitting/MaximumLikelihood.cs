using System;
using System.Diagnostics.CodeAnalysis;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>Maximum-likelihood fits from exact sums: the entry points that generated families call.</summary>
public static class MaximumLikelihood
{
    /// <summary>Fits a family in its natural parameters, where the likelihood is concave and its maximum, when there is one, the
    /// only one.</summary>
    /// <param name="sums">The data.</param>
    /// <param name="create">The family from its kernel and natural parameters.</param>
    /// <exception cref="FitException">The likelihood has no maximum; the message says in which direction it rises, and why.</exception>
    public static FitResult<TFamily> Fit<TKernel, TFamily>(StatisticSums<TKernel> sums, Func<TKernel, double[], TFamily> create)
        where TKernel : struct, IKernel =>
        TryFit(sums, create, out var result, out var account) ? result : throw new FitException(account);

    /// <summary>As <see cref="Fit"/>, but answers false with the account that the exception would have given.</summary>
    public static bool TryFit<TKernel, TFamily>(
        StatisticSums<TKernel> sums,
        Func<TKernel, double[], TFamily> create,
        [NotNullWhen(true)] out FitResult<TFamily>? result,
        [NotNullWhen(false)] out string? account)
        where TKernel : struct, IKernel
    {
        ArgumentNullException.ThrowIfNull(sums);
        ArgumentNullException.ThrowIfNull(create);
        result = NaturalFit.Run(sums, typeof(TFamily).Name, out account) is { } numbers
            ? new(create(sums.Kernel, [.. numbers.Natural.Values]), numbers)
            : null;
        return result is not null && account is null;
    }

    /// <summary>Fits a family in its trade parameters: through the natural parameters where there are as many of them, so that
    /// the maximum is the only one; else by a local search from several starts.</summary>
    /// <param name="sums">The data.</param>
    /// <param name="create">The family from its kernel and trade parameters.</param>
    /// <exception cref="FitException">The likelihood has no maximum; the message says in which direction it rises, and why.</exception>
    public static FitResult<TFamily> FitTrade<TKernel, TFamily>(StatisticSums<TKernel> sums, Func<TKernel, double[], TFamily> create)
        where TKernel : struct, ITradeKernel =>
        TryFitTrade(sums, create, out var result, out var account) ? result : throw new FitException(account);

    /// <summary>As <see cref="FitTrade"/>, but answers false with the account that the exception would have given.</summary>
    public static bool TryFitTrade<TKernel, TFamily>(
        StatisticSums<TKernel> sums,
        Func<TKernel, double[], TFamily> create,
        [NotNullWhen(true)] out FitResult<TFamily>? result,
        [NotNullWhen(false)] out string? account)
        where TKernel : struct, ITradeKernel
    {
        ArgumentNullException.ThrowIfNull(sums);
        ArgumentNullException.ThrowIfNull(create);
        result = TradeFit.Run(sums, typeof(TFamily).Name, out account) is { } numbers
            ? new(create(sums.Kernel, [.. numbers.Parameters.Values]), numbers)
            : null;
        return result is not null && account is null;
    }
}
