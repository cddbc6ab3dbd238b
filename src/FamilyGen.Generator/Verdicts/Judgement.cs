using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>A reading with everything that was found about it, and its normal form where nothing stands in the way.</summary>
internal sealed record Judgement(FamilyReading Reading, NormalForm? Form, EquatableArray<Finding> Findings)
{
    private static readonly Func<FamilyReading, IEnumerable<Finding>>[] s_rules =
    [
        ShapeRule.Find,
        NameRule.Find,
        KnownValueRule.Find,
        MovingSupportRule.Find,
        ChangingSupportRule.Find,
        EmptySupportRule.Find,
        ParameterRule.Find,
        PurityRule.Find,
        IntegerArithmeticRule.Find,
        ZeroMeasureRule.Find,
    ];

    // In the order of their causes: what is wrong by one rule may be only a consequence of what an earlier one finds.
    private static readonly Func<FamilyDeclaration, NormalForm, IEnumerable<Finding>>[] s_formRules =
    [
        FiniteStatisticRule.Find,
        DependenceRule.Find,
        NegativeMeasureRule.Find,
        InfiniteNormalizerRule.Find,
        InteriorRule.Find,
        UnprovedRule.Find,
        OpenSetRule.Find,
    ];

    /// <summary>Applies all rules.</summary>
    public static Judgement Of(FamilyReading reading)
    {
        var findings = s_rules.SelectMany(rule => rule(reading)).ToList();
        if (!reading.IsReadable || findings.Any(f => Severities.IsError(f.Id)))
            return new Judgement(reading, null, Causes(findings));
        var result = Normalizer.Normalize(reading.Declaration);
        findings.AddRange(result.Findings.Select(f => AtItsParameter(f, reading)));
        if (result.Form is { } form)
            findings.AddRange(OfForm(reading.Declaration, form));
        return new Judgement(reading, findings.Any(f => Severities.IsError(f.Id)) ? null : result.Form, Causes(findings));
    }

    private static List<Finding> OfForm(FamilyDeclaration declaration, NormalForm form)
    {
        var findings = new List<Finding>();
        foreach (var rule in s_formRules)
        {
            findings.AddRange(rule(declaration, form));
            if (findings.Any(f => Severities.IsError(f.Id)))
                break;
        }

        return findings;
    }

    /// <summary>Of errors only those of the first stage in which there are any: shape before support before statistics
    /// before measure before normalizer. What is wrong or doubtful later may only follow from them.</summary>
    private static EquatableArray<Finding> Causes(List<Finding> findings)
    {
        var stage = findings.Where(f => Severities.IsError(f.Id)).Select(Stage).OrderBy(s => s, StringComparer.Ordinal).FirstOrDefault();
        return findings
            .Where(f => Severities.IsError(f.Id) ? Stage(f) == stage : stage is null || IsBefore(f, stage))
            .Distinct()
            .OrderBy(f => f.Id, StringComparer.Ordinal).ThenBy(f => f.Origin).ToEquatableArray();
    }

    // A finding about parameters themselves is placed at the first of them that it names.
    private static Finding AtItsParameter(Finding finding, FamilyReading reading)
    {
        if (finding.Id != DiagnosticIds.NotIdentified)
            return finding;
        var named = finding.Arguments[0].Split([", "], StringSplitOptions.None);
        var place = reading.Names.FirstOrDefault(n => n.Kind == NamedPieceKind.TradeParameter && named.Contains(n.Name));
        return place is null ? finding : finding with { Origin = place.Origin };
    }

    private static bool IsBefore(Finding finding, string stage) =>
        string.CompareOrdinal(Stage(finding), stage) <= 0 && finding.Id != DiagnosticIds.IntegerArithmetic;

    private static string Stage(Finding finding) => finding.Id.Substring(0, 4);
}
