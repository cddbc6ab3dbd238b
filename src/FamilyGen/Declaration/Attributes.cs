using System;

namespace FamilyGen;

/// <summary>Marks a partial class as the declaration of an exponential family
/// log p(x | θ) = Σ θⱼTⱼ(x) + log h(x) − A(θ) on a support that no parameter moves.</summary>
[AttributeUsage(AttributeTargets.Class, Inherited = false)]
public sealed class FamilyAttribute : Attribute;

/// <summary>Marks the static member that gives the support: a <see cref="CountRange"/>, an <see cref="Interval"/>,
/// or a <see cref="bool"/> predicate that narrows a <see cref="CountRange"/>.</summary>
[AttributeUsage(AttributeTargets.Property | AttributeTargets.Method | AttributeTargets.Field)]
public sealed class SupportAttribute : Attribute;

/// <summary>Marks a static method T(x) as one sufficient statistic of a family in canonical form.</summary>
[AttributeUsage(AttributeTargets.Method)]
public sealed class SufficientStatisticAttribute : Attribute
{
    /// <summary>The name of the natural parameter that multiplies this statistic; the statistic's own name when not given.</summary>
    public string? Parameter { get; set; }
}

/// <summary>Marks a static method h(x) ≥ 0 as the base measure of a family in canonical form.</summary>
[AttributeUsage(AttributeTargets.Method)]
public sealed class BaseMeasureAttribute : Attribute;

/// <summary>Marks a static method log h(x) as the logarithm of the base measure of a family in canonical form.</summary>
[AttributeUsage(AttributeTargets.Method)]
public sealed class LogBaseMeasureAttribute : Attribute;

/// <summary>Marks a static method log k(x; parameters) as the logarithm of a kernel, written with the parameters
/// that the trade uses; terms free of x may be left out.</summary>
[AttributeUsage(AttributeTargets.Method)]
public sealed class LogKernelAttribute : Attribute;

/// <summary>Marks an argument as a known value: it is never estimated, and support, base measure, statistics and
/// kernel may all depend on it. Arguments of one name are one value over the whole declaration.</summary>
[AttributeUsage(AttributeTargets.Parameter)]
public sealed class KnownAttribute : Attribute;

/// <summary>States that a trade parameter is positive, so that of several equivalent values the positive one is meant.</summary>
[AttributeUsage(AttributeTargets.Parameter)]
public sealed class PositiveAttribute : Attribute;
