using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>The natural parameter set of a normal form, for the rules that judge it. Known values are put at several numbers
/// each: what is reported must hold for all of them.</summary>
internal sealed class NaturalSets
{
    private static readonly double[] s_samples = { 2, 5, 0.75, 9, 3.5, 1, 14, 0.2, 6, 2.25, 11, 4 };

    private readonly NaturalSetSentence _sentence;

    public NaturalSets(FamilyDeclaration declaration, NormalForm form)
    {
        var scope = new Scope(declaration);
        for (var i = 0; i < declaration.Parameters.Count; i++)
            scope.Narrow(declaration.Parameters[i].Name, form.ParameterLower[i], form.ParameterUpper[i]);
        var expander = new Expander(scope);
        var naturals = form.Statistics
            .Select(s => s.Natural is null ? Polynomial.Of(new Symbol(s.Parameter, SymbolKind.Natural, false)) : expander.Expand(s.Natural))
            .ToList();
        _sentence = new NaturalSetSentence(naturals, expander);
        var ends = form.Ends.Where(e => e.IsVerified).ToList();
        var samples = declaration.Known.Count == 0 && !ends.Any(HasOpaque) ? 1 : 6;
        Shapes = Enumerable.Range(0, samples)
            .Select(i => new NaturalSetShape(ends.Select(e => GrowthCone.Of(e, expander, s => Sample(declaration, s, i))).ToList(), form.Statistics.Count))
            .ToList();
        Image = naturals.SelectMany((n, j) => InRange(n, j, scope, naturals.Count)).ToList();
        IsVerified = form.Ends.All(e => e.IsVerified);
    }

    /// <summary>One shape for each choice of known values.</summary>
    public IReadOnlyList<NaturalSetShape> Shapes { get; }

    /// <summary>What the ranges of the trade parameters leave of the natural ones.</summary>
    public IReadOnlyList<LinearCondition> Image { get; }

    /// <summary>Whether the growth argument reaches all ends.</summary>
    public bool IsVerified { get; }

    /// <summary>What an end asks for, in words: "as hours → ∞ for rate &gt; 0".</summary>
    public string Asked(GrowthCone cone) => _sentence.Condition(cone.End) is { Length: > 0 } condition
        ? $"as {cone.End.Where} for {condition}"
        : AskedAtLeast(cone);

    /// <summary>What its strongest rank asks for at the least.</summary>
    public string AskedAtLeast(GrowthCone cone) => $"as {cone.End.Where} for {_sentence.Leading(cone.End)}";

    /// <summary>An end on whose boundary parameters belong to the set, those that trade parameters can reach; null where
    /// there is none for some choice of known values.</summary>
    public GrowthCone? Face()
    {
        GrowthCone? first = null;
        foreach (var shape in Shapes)
        {
            if (shape.Faces().FirstOrDefault(c => !_sentence.IsOpen(c.End)) is not { } face || !shape.IsDecided)
                return null;
            first ??= face;
        }

        return first;
    }

    /// <summary>Why the integral near an end diverges for every parameter.</summary>
    public static string Divergence(GrowthCone cone)
    {
        var end = cone.End;
        if (cone.Deciding is { IsFixed: true } level && level.Kind is not ("Log" or "LogLog"))
            return $"as {end.Where} the density grows without bound";
        var log = cone.Levels.First(l => l.Kind == "Log");
        var power = log.Excess + GrowthRank.Log.Bound(end.IsInfinite);
        if (!end.IsInfinite)
            return $"as {end.Where} the density grows as fast as one over the distance, or faster";
        return power.IsZero
            ? $"as {end.Where} the density does not fall off"
            : $"as {end.Where} the density falls off too slowly";
    }

    /// <summary>The fewest ends that have no parameter in common, by the question that is asked of them.</summary>
    public static IReadOnlyList<GrowthCone> Fewest(NaturalSetShape shape, Func<IReadOnlyList<GrowthCone>, bool> exclude)
    {
        foreach (var one in shape.Cones)
        {
            if (exclude(new[] { one }))
                return new[] { one };
        }

        for (var i = 0; i < shape.Cones.Count; i++)
        {
            for (var j = i + 1; j < shape.Cones.Count; j++)
            {
                var pair = new[] { shape.Cones[i], shape.Cones[j] };
                if (exclude(pair))
                    return pair;
            }
        }

        return shape.Cones;
    }

    private static bool HasOpaque(EndRow end) => end.Ranks
        .SelectMany(r => r.Weights.Concat(new[] { r.Constant, r.Order }))
        .SelectMany(Dependences.Parts)
        .Any(p => p is Opaque);

    private static double Sample(FamilyDeclaration declaration, Symbol symbol, int index)
    {
        var place = declaration.Known.ToList().FindIndex(k => k.Name == symbol.Name);
        var value = s_samples[((Math.Max(place, 0) * 5) + index) % s_samples.Length];
        if (symbol.IsInteger)
            value = Math.Ceiling(value);

        // The last choice is of the other sign: a known value may be an offset.
        return index == 5 && !symbol.IsInteger ? -value : value;
    }

    private static IEnumerable<LinearCondition> InRange(Polynomial natural, int index, Scope scope, int count)
    {
        if (natural.Dependence != Dependence.Parameter)
            yield break;
        var range = scope.RangeOf(natural.ToSortedExpression());
        var unit = Enumerable.Range(0, count).Select(j => j == index ? Rational.One : Rational.Zero).ToArray();
        if (!double.IsInfinity(range.Upper))
            yield return new LinearCondition(unit, -Doubles.ToRational(range.Upper), range.UpperOpen ? Sense.Negative : Sense.NotPositive);
        if (!double.IsInfinity(range.Lower))
            yield return new LinearCondition(unit.Select(w => -w).ToArray(), Doubles.ToRational(range.Lower), range.LowerOpen ? Sense.Negative : Sense.NotPositive);
    }
}
