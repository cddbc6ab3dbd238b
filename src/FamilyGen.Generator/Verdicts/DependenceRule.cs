using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Verdicts;

/// <summary>FG0204: statistics between which an affine relation holds wherever observations can occur.</summary>
internal static class DependenceRule
{
    public static IEnumerable<Finding> Find(FamilyDeclaration declaration, NormalForm form)
    {
        if (StatisticRelations.Find(declaration, form) is not { } relation)
            yield break;
        var statistic = form.Statistics[relation.Index];
        var name = Name(declaration, statistic);
        var place = declaration.IsTrade
            ? KernelPlace.Of(declaration, statistic.Body)
            : declaration.Statistics[relation.Index].Body.Origin;
        var isConstant = relation.Weights.All(w => w.Length == 0);
        yield return new Finding(DiagnosticIds.Dependent, place, EquatableArray.Of(
            Equation(relation, form.Statistics.Select(s => Name(declaration, s)).ToList()),
            isConstant
                ? $"'{name}' does not vary, so leave it out"
                : $"leave out '{name}', or replace it by a function that the others do not determine"));
    }

    private static string Name(FamilyDeclaration declaration, Statistic statistic) =>
        declaration.IsTrade ? Rendering.Text(statistic.Body) : statistic.Name;

    /// <summary>Calm + Breeze + Gale = 1: what is subtracted on one side is added on the other.</summary>
    private static string Equation(StatisticRelation relation, List<string> names)
    {
        var left = new List<string> { Times(relation.Multiple, names[relation.Index]) };
        var right = new List<string>();
        for (var i = 0; i < relation.Weights.Count; i++)
        {
            var weight = relation.Weights[i];
            if (weight.Length == 0)
                continue;
            var isNegative = weight.StartsWith("−", StringComparison.Ordinal) && !weight.Contains(' ');
            (isNegative ? left : right).Add(Times(isNegative ? weight.Substring(1) : weight, names[i]));
        }

        // The statistics in the order in which they were declared.
        if (left.Count > 1)
            left = [.. left.Skip(1), left[0]];
        var sum = string.Join(" + ", right);
        if (relation.Constant.StartsWith("−", StringComparison.Ordinal) && sum.Length > 0)
            sum += " − " + relation.Constant.Substring(1);
        else if (relation.Constant.Length > 0)
            sum += (sum.Length > 0 ? " + " : "") + relation.Constant;
        return string.Join(" + ", left) + " = " + (sum.Length > 0 ? sum : "0");
    }

    private static string Times(string weight, string name) => weight switch
    {
        "1" => name,
        _ when weight.Contains(' ') || weight.Contains('/') => $"({weight})·{name}",
        _ => $"{weight}·{name}",
    };
}
