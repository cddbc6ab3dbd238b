using System.Collections.Generic;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>FG0301: a base measure that is negative at an observation which can occur.</summary>
internal static class NegativeMeasureRule
{
    public static IEnumerable<Finding> Find(FamilyDeclaration declaration, NormalForm form)
    {
        if (declaration.BaseMeasure is not { IsLogarithm: false } measure)
            yield break;
        var support = EffectiveSupport.Declared(declaration);
        var found = new SupportSearch(support).Find(
            SpecialPoints.Of([measure.Body], declaration.ObservationName),
            x => support.Evaluator.Of(measure.Body, x) is var value && (value.Lower < 0 || value.May(Beyond.NegativeInfinity)),
            x => support.In(x) == Presence.In && support.Evaluator.Of(measure.Body, x).IsNegative);
        if (found is { } at)
        {
            yield return new Finding(DiagnosticIds.Measure, measure.Body.Origin, EquatableArray.Of(
                measure.Member.Name,
                $"is negative at {declaration.ObservationName} = {at.Text}",
                "a weight is at least 0: narrow the support, cut it off with Math.Max(0, …), or give its logarithm as [LogBaseMeasure]"));
        }
    }
}
