using System;

namespace FamilyGen.Kernels;

/// <summary>The ranks of the asymptotic scale in which an exponent is expanded at an end of the support, from the
/// strongest down. At an infinite end they are functions of |x| → ∞, at a finite end functions of 1/distance → ∞:
/// there log x at 0 with coefficient θ is the rank <see cref="Log"/> with coefficient −θ.</summary>
public enum GrowthKind
{
    /// <summary>exp(order·|x|), order &gt; 0.</summary>
    Exponential = 6,

    /// <summary>|x|^order, order &gt; 0.</summary>
    Power = 5,

    /// <summary>|x|^order · log |x|, order &gt; 0 (between |x|^order and higher powers).</summary>
    PowerTimesLog = 4,

    /// <summary>(log |x|)^order, order &gt; 1.</summary>
    LogPower = 3,

    /// <summary>log |x|.</summary>
    Log = 2,

    /// <summary>log log |x|.</summary>
    LogLog = 1,

    /// <summary>Bounded.</summary>
    Bounded = 0,
}

/// <summary>How fast a function grows at an end.</summary>
/// <param name="Kind">The rank of the scale.</param>
/// <param name="Order">The exponent within the rank.</param>
public readonly record struct Growth(GrowthKind Kind, double Order = 1)
{
    /// <summary>|x|, or 1/distance.</summary>
    internal static Growth Linear { get; } = new(GrowthKind.Power);

    internal static Growth Log { get; } = new(GrowthKind.Log);

    internal static Growth LogLog { get; } = new(GrowthKind.LogLog);

    /// <summary>The same growth under the name it has in the scale: |x|⁰·log |x| and (log |x|)¹ are log |x|, and an order
    /// of 0 or less is bounded. Orders that come from known values need it.</summary>
    internal Growth Canonical() => Kind switch
    {
        GrowthKind.Log or GrowthKind.LogLog or GrowthKind.Bounded => new(Kind),
        GrowthKind.PowerTimesLog when Order == 0 => Log,
        GrowthKind.LogPower when Order == 1 => Log,
        _ => Order > 0 ? this : default,
    };

    /// <summary>Positive when <paramref name="a"/> outgrows <paramref name="b"/>, both canonical; 0 when they are one rank.</summary>
    internal static int CompareStrength(Growth a, Growth b)
    {
        var byClass = Class(a.Kind).CompareTo(Class(b.Kind));
        if (byClass != 0)
            return byClass;
        var byOrder = a.Order.CompareTo(b.Order);
        return byOrder != 0 ? byOrder : TimesLog(a.Kind).CompareTo(TimesLog(b.Kind));
    }

    /// <summary>What |f|^power, for f of this growth, adds to the coefficient of <paramref name="rank"/> as a factor of
    /// the density: |x|^p = exp(p log |x|), (log |x|)^j = exp(j log log |x|), exp(k|x|)^power = exp(power·k|x|).</summary>
    internal double AsFactor(double power, Growth rank) => (Kind, rank.Kind) switch
    {
        (GrowthKind.Exponential, GrowthKind.Power) when rank.Order == 1 => power * Order,
        (GrowthKind.Power or GrowthKind.PowerTimesLog, GrowthKind.Log) => power * Order,
        (GrowthKind.LogPower, GrowthKind.LogLog) => power * Order,
        (GrowthKind.PowerTimesLog or GrowthKind.Log, GrowthKind.LogLog) => power,
        _ => 0,
    };

    // powers with and without a logarithm interleave by their order
    private static GrowthKind Class(GrowthKind kind) => kind == GrowthKind.PowerTimesLog ? GrowthKind.Power : kind;

    private static int TimesLog(GrowthKind kind) => kind == GrowthKind.PowerTimesLog ? 1 : 0;
}
