using System;
using System.Linq;
using FamilyGen.Fitting;

namespace FamilyGen.Tests.Fitting;

/// <summary>Data without a maximum of the likelihood: the account names the direction, the cause and a way out.</summary>
public class ExistenceTests
{
    [Fact]
    public void Only_zeros() => Refused<ShiftStoppages>(
        [0, 0, 0, 0],
        "ShiftStoppages has no maximum-likelihood fit to these data: the likelihood never stops rising as total → −∞. "
        + "Every one of the 4 observations is 0, the smallest value the support allows. "
        + "More varied data may determine it; else leave the statistic out, or make its parameter a known value.");

    [Fact]
    public void One_repeated_count() => Refused<ShiftStoppages>(
        [3, 3, 3],
        "the likelihood never stops rising as total → ∞ and crowding → ∞. Every one of the 3 observations is 3.");

    [Fact]
    public void A_single_observation() => Refused<ShiftStoppages>([3], "There is a single observation, 3.");

    [Fact]
    public void Two_neighbouring_counts() => Refused<ShiftStoppages>(
        [2, 3, 3, 2],
        "as total → ∞ and crowding → ∞. The 4 observations take only the values 2 and 3, which do not determine 2 parameters.");

    [Fact]
    public void Two_counts_with_one_between_them_do_determine_two_parameters()
    {
        Assert.Null(Try<ShiftStoppages>([2, 4, 4, 2], out var fit));
        Assert.Equal(FitStatus.InteriorMaximum, fit!.Status);
    }

    [Fact]
    public void A_statistic_at_its_largest_value_throughout() => Refused<ShiftStoppages>(
        [0, 1, 1, 0],
        "as crowding → ∞. The statistic of 'crowding' is 0 in every observation, and no value of the support has a larger one.");

    [Fact]
    public void One_repeated_duration_in_trade_parameters() => Refused<RepairHours>(
        [2.5, 2.5],
        "as shape → ∞, rate → ∞ and delay → ∞. Every one of the 2 observations is 2.5.");

    [Fact]
    public void A_deviation_that_vanishes() => Refused<SwingingLoad>([3, 3, 3], "as deviation → 0. Every one of the 3 observations is 3.");

    [Fact]
    public void A_hazard_of_which_no_failure_tells() => Refused<BearingHours>([300, 400, 1000], "as early → 0.");

    [Fact]
    public void A_hazard_that_no_bearing_reached() => Refused<BearingHours>(
        [30, 40, 100],
        "the likelihood does not change with 'late', about which the observations say nothing.");

    [Fact]
    public void Statistics_that_are_tied() => Refused<TiedCounts>(
        [1, 2, 3, 5],
        "TiedCounts cannot be fitted: the statistics are tied on the whole support, T(pallets) − 0.5·T(halfPallets) = −1.5, "
        + "so that their parameters cannot be told apart. Leave one of these statistics out.");

    [Fact]
    public void No_observations() => Refused<ShiftStoppages>([], "ShiftStoppages cannot be fitted: there are no observations.");

    [Fact]
    public void Weights_that_are_all_zero()
    {
        var sums = new StatisticSums<TradeKernel<ShiftStoppages>>(default);
        sums.Add(1, 0);
        sums.Add(2, 0);
        Assert.False(MaximumLikelihood.TryFitTrade(sums, (_, _) => default(ShiftStoppages), out _, out var account));
        Assert.Equal("ShiftStoppages cannot be fitted: the weights of all 2 observations are 0.", account);
    }

    private static void Refused<TFamily>(double[] data, string expected)
        where TFamily : struct, ITradeFamily
    {
        var account = Try<TFamily>(data, out _);
        Assert.NotNull(account);
        Assert.True(account.Contains(expected, StringComparison.Ordinal), account);
        var sums = new StatisticSums<TradeKernel<TFamily>>(default);
        sums.AddRange(data);
        var exception = Assert.Throws<FitException>(() => MaximumLikelihood.FitTrade(sums, (_, _) => default(TFamily)));
        Assert.Equal(account, exception.Message);
    }

    private static string? Try<TFamily>(double[] data, out FitResult<TFamily>? fit)
        where TFamily : struct, ITradeFamily
    {
        var sums = new StatisticSums<TradeKernel<TFamily>>(default);
        sums.AddRange(data);
        MaximumLikelihood.TryFitTrade(sums, (_, _) => default(TFamily), out fit, out var account);
        return account;
    }
}
