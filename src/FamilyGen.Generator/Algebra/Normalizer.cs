using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>From a declaration as it was read to the normal form log p(x | θ) = Σ θⱼTⱼ(x) + log h(x) − A(θ), or to the reasons
/// why there is none. Never throws, and its work is bounded.</summary>
/// <remarks>Arguments of the findings: FG0101 (parameter names, condition and what happens there); FG0501 (the factor that
/// ties, its part in x, parameter names, what would mend it); FG0502 (number of parameters, number of statistics, their
/// names); FG0503 (names of the parameters that cannot be told apart, what alone matters).</remarks>
internal static class Normalizer
{
    private const int MostNodes = 5000;
    private const int DeepestNesting = 250;

    public static NormalFormResult Normalize(FamilyDeclaration declaration)
    {
        var bodies = declaration.Statistics.Select(s => s.Body).ToList();
        if (declaration.Kernel is not null)
            bodies.Add(declaration.Kernel);
        if (declaration.BaseMeasure is not null)
            bodies.Add(declaration.BaseMeasure.Body);
        foreach (var body in bodies)
        {
            if (!IsManageable(body))
            {
                return Refused(new Finding("FG0501", body.Origin, EquatableArray.Of(
                    "the formula", declaration.ObservationName, string.Join(", ", declaration.Parameters.Select(p => p.Name)), "write a shorter formula")));
            }
        }

        var expander = new Expander(new Scope(declaration));
        return declaration.IsTrade ? Trade(declaration, expander) : Canonical(declaration, expander);
    }

    private static NormalFormResult Canonical(FamilyDeclaration declaration, Expander expander)
    {
        var observation = expander.Scope.Observation;
        var statistics = declaration.Statistics
            .Select(s => new Statistic(s.Name, s.Parameter, AtomSums.Of(Expanded(s.Body, expander), observation, withConstant: true), null))
            .ToList();
        var logBase = AtomSums.Of(LogBase(declaration, expander), observation, withConstant: true);
        return Form(declaration, expander, statistics, logBase, EquatableArray<Expression>.Empty, null, new List<Finding>());
    }

    private static Polynomial LogBase(FamilyDeclaration declaration, Expander expander) => declaration.BaseMeasure switch
    {
        null => Polynomial.Zero,
        { IsLogarithm: true, Body: var body } => Expanded(body, expander),
        { Body: var body } => Expanded(Formula.Log(body), expander),
    };

    private static Polynomial Expanded(Expression body, Expander expander) => RecurrenceOfGamma.Apply(expander.Expand(body), expander);

    private static NormalFormResult Trade(FamilyDeclaration declaration, Expander expander)
    {
        var kernel = Separation.Separated(Expanded(declaration.Kernel!, expander));
        var findings = expander.Findings.Concat(Separation.Findings(kernel, declaration.ObservationName, expander.IsExhausted)).ToList();
        if (findings.Count > 0)
            return Refused(findings.ToArray());

        var parameters = declaration.Parameters.Select(p => p.Name).ToList();
        var ranges = ParameterRanges.Of(kernel, expander.Scope, parameters);
        foreach (var name in parameters)
            expander.Scope.Narrow(name, ranges.Lower(name), ranges.Upper(name));

        var form = TradeForm.Of(IndicatorRelations.Apply(kernel, expander.Scope));
        var bracketed = IndicatorRelations.Apply(
            Separation.Separated(Expanded(declaration.Kernel!, new Expander(expander.Scope, keepsCoefficients: true))), expander.Scope);
        var names = new StatisticNames(declaration.Parameters.Select(p => p.Name).Concat(declaration.Known.Select(k => k.Name)));
        var statistics = new List<Statistic>();
        foreach (var part in form.Parts)
        {
            var body = AtomSums.Of(part.Statistic, expander.Scope.Observation, withConstant: false);
            var name = names.Next(body);
            statistics.Add(new Statistic(StatisticNames.Capital(name), name, body, TradeForm.Written(part, bracketed, expander).WithoutOrigins()));
        }

        var rank = ParameterMap.Rank(statistics.Select(s => s.Natural!).ToList(), parameters, expander.Scope);
        if (rank is { } found && found.Rank < parameters.Count)
            return Refused(new Finding("FG0503", declaration.Kernel!.Origin, EquatableArray.Of(string.Join(", ", found.Free), WhatMatters(found.Free, statistics))));
        if (parameters.Count < statistics.Count)
        {
            findings.Add(new Finding("FG0502", declaration.Kernel!.Origin, EquatableArray.Of(
                Count(parameters.Count), Count(statistics.Count), string.Join(", ", statistics.Select(s => Rendering.Text(s.Body))))));
        }

        var logBase = AtomSums.Of(form.LogBase, expander.Scope.Observation, withConstant: false);
        var inverse = InverseMap.Of(statistics, parameters, expander).ToEquatableArray();
        return Form(declaration, expander, statistics, logBase, inverse, ranges, findings);
    }

    // The coefficients in which the parameters occur: these alone are decided by data.
    private static string WhatMatters(IReadOnlyList<string> names, List<Statistic> statistics)
    {
        var coefficients = statistics
            .Where(s => Dependences.Names(s.Natural!, SymbolKind.Parameter).Intersect(names).Any())
            .Select(s => Rendering.Text(s.Natural!))
            .ToList();
        return coefficients.Count == 0 ? "no statistic is multiplied by anything with them"
            : coefficients.Count == 1 ? $"only {coefficients[0]} matters"
            : $"only {string.Join(", ", coefficients.Take(coefficients.Count - 1))} and {coefficients[coefficients.Count - 1]} matter";
    }

    private static NormalFormResult Form(
        FamilyDeclaration declaration,
        Expander expander,
        List<Statistic> statistics,
        AtomSum logBase,
        EquatableArray<Expression> inverse,
        ParameterRanges? ranges,
        List<Finding> findings)
    {
        var shape = new SupportShape(declaration, expander, statistics, logBase);
        var form = new NormalForm(
            statistics.ToEquatableArray(),
            logBase,
            shape.Breakpoints.Points.ToEquatableArray(),
            shape.Breakpoints.Period,
            shape.Breakpoints.IsOpaque,
            shape.LowerSingular,
            shape.UpperSingular,
            shape.Ends,
            shape.NaturalSetText,
            inverse,
            declaration.Parameters.Select(p => ranges!.Lower(p.Name)).ToEquatableArray(),
            declaration.Parameters.Select(p => ranges!.Upper(p.Name)).ToEquatableArray());
        return new NormalFormResult(form, findings.ToEquatableArray());
    }

    // The lowest id explains the cause; what follows from it is left out.
    private static NormalFormResult Refused(params Finding[] findings)
    {
        var lowest = findings.Min(f => f.Id);
        return new(null, findings.Where(f => f.Id == lowest).ToEquatableArray());
    }

    private static string Count(int value) => value.ToString(System.Globalization.CultureInfo.InvariantCulture);

    // Counted without recursion, so that a formula of absurd depth cannot exhaust the stack.
    private static bool IsManageable(Expression body)
    {
        var stack = new Stack<(Expression Node, int Depth)>();
        stack.Push((body, 0));
        for (var nodes = 0; stack.Count > 0; nodes++)
        {
            var (node, depth) = stack.Pop();
            if (nodes > MostNodes || depth > DeepestNesting)
                return false;
            foreach (var child in node.Children())
                stack.Push((child, depth + 1));
        }

        return true;
    }
}
