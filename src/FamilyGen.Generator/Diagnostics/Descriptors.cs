using System.Collections.Generic;
using System.Collections.Immutable;
using System.Linq;
using Microsoft.CodeAnalysis;

namespace FamilyGen.Generator.Diagnostics;

/// <summary>All diagnostics: what they say, and how severe they are. Each has a help page by its id.</summary>
internal static class Descriptors
{
    private const string HelpPages = "src/FamilyGen.Generator/Diagnostics/help/";

    public static readonly DiagnosticDescriptor Shape = Error(
        DiagnosticIds.Shape,
        "The declaration has the wrong shape",
        "{0}");

    public static readonly DiagnosticDescriptor NameCollision = Error(
        DiagnosticIds.NameCollision,
        "A name collides with a generated one or hides a function",
        "The name '{0}' cannot be used here: {1}; choose another name");

    public static readonly DiagnosticDescriptor NearlyEqualKnown = Warning(
        DiagnosticIds.NearlyEqualKnown,
        "Two known values nearly agree",
        "The known values '{0}' and '{1}' nearly agree and are probably one; give them one name and one type");

    public static readonly DiagnosticDescriptor SupportOnParameter = Error(
        DiagnosticIds.SupportOnParameter,
        "The support depends on a parameter",
        "The support depends on the parameter '{0}' ({1}), so an observation that is possible for one value of '{0}' is impossible for another, and this is no exponential family; bound the support by constants or by [Known] values");

    public static readonly DiagnosticDescriptor SupportChanges = Error(
        DiagnosticIds.SupportChanges,
        "The support depends on something that can change",
        "The support depends on '{0}' ({1}), which is {2}, so an observation that is possible now may be impossible later; use a constant, a static readonly field or a [Known] value");

    public static readonly DiagnosticDescriptor SupportEmpty = Error(
        DiagnosticIds.SupportEmpty,
        "The support leaves nothing to observe",
        "The support {0}; {1}");

    public static readonly DiagnosticDescriptor StatisticOnParameter = Error(
        DiagnosticIds.StatisticOnParameter,
        "A statistic or base measure depends on a parameter",
        "'{0}' depends on the parameter '{1}' ({2}), but it must be a function of the observation alone; mark '{1}' as [Known] if it is never estimated, or write the family as a [LogKernel] with '{1}' among its parameters");

    public static readonly DiagnosticDescriptor Impure = Error(
        DiagnosticIds.Impure,
        "A statistic, base measure or kernel is not a pure function",
        "'{0}' depends on '{1}' ({2}), which is {3}, so the same observation need not give the same value twice; use constants, static readonly fields or [Known] values");

    public static readonly DiagnosticDescriptor NotFinite = Error(
        DiagnosticIds.NotFinite,
        "A statistic or base measure is not finite somewhere on the support",
        "'{0}' is not finite at {1}, which can occur: {2}; {3}");

    public static readonly DiagnosticDescriptor Dependent = Error(
        DiagnosticIds.Dependent,
        "The statistics are affinely dependent",
        "{0} on the whole support, so the parameters of these statistics cannot be told apart; {1}");

    public static readonly DiagnosticDescriptor IntegerArithmetic = Warning(
        DiagnosticIds.IntegerArithmetic,
        "Integer arithmetic truncates or can overflow",
        "'{0}' is computed in {1} and {2}; {3}");

    public static readonly DiagnosticDescriptor Measure = Error(
        DiagnosticIds.Measure,
        "The base measure is negative, or zero everywhere",
        "'{0}' {1}; {2}");

    public static readonly DiagnosticDescriptor InfiniteNormalizer = Error(
        DiagnosticIds.InfiniteNormalizer,
        "The normalizer is infinite for every parameter",
        "The normalizer is infinite for every parameter: {0}; {1}");

    public static readonly DiagnosticDescriptor Unproved = Warning(
        DiagnosticIds.Unproved,
        "Finiteness or smoothness cannot be proved",
        "{0}, so it cannot be proved {1}; {2}");

    public static readonly DiagnosticDescriptor NotOpen = Describe(
        DiagnosticIds.NotOpen,
        "The parameter set is not open",
        "The set of parameters with a finite normalizer is not open: it asks {0}; the maximum of a likelihood may lie on that boundary",
        DiagnosticSeverity.Info);

    public static readonly DiagnosticDescriptor NoInterior = Error(
        DiagnosticIds.NoInterior,
        "The parameter set has no interior",
        "The normalizer is finite only where {0}, which leaves nothing to estimate: {1}; {2}");

    public static readonly DiagnosticDescriptor NotSeparable = Error(
        DiagnosticIds.NotSeparable,
        "The kernel does not separate",
        "'{0}' ties {1} and {2} together, so the kernel does not separate into statistics of the observation and functions of the parameters, and this is no exponential family; {3}");

    public static readonly DiagnosticDescriptor Curved = Describe(
        DiagnosticIds.Curved,
        "A curved family",
        "{0} parameters drive {1} statistics ({2}), so this is a curved family; it is fitted by a local method, which may find one of several maxima",
        DiagnosticSeverity.Info);

    public static readonly DiagnosticDescriptor NotIdentified = Error(
        DiagnosticIds.NotIdentified,
        "The trade parameters cannot be told apart",
        "The parameters {0} cannot be told apart: other values of them give the very same law ({1}), so no data decide between them; leave one out, or mark it as [Known]");

    /// <summary>All of them, in the order of their ids.</summary>
    public static ImmutableArray<DiagnosticDescriptor> All { get; } =
    [
        Shape, NameCollision, NearlyEqualKnown, SupportOnParameter, SupportChanges, SupportEmpty, StatisticOnParameter, Impure,
        NotFinite, Dependent, IntegerArithmetic, Measure, InfiniteNormalizer, Unproved, NotOpen, NoInterior, NotSeparable, Curved, NotIdentified,
    ];

    /// <summary>By id.</summary>
    public static IReadOnlyDictionary<string, DiagnosticDescriptor> ById { get; } = All.ToDictionary(d => d.Id);

    private static DiagnosticDescriptor Error(string id, string title, string message) => Describe(id, title, message, DiagnosticSeverity.Error);

    private static DiagnosticDescriptor Warning(string id, string title, string message) => Describe(id, title, message, DiagnosticSeverity.Warning);

    private static DiagnosticDescriptor Describe(string id, string title, string message, DiagnosticSeverity severity) => new(
        id, title, message, "FamilyGen", severity, isEnabledByDefault: true, helpLinkUri: HelpPages + id + ".md");
}
