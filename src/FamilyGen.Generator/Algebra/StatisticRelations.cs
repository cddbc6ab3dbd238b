using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>multiple·T_index = constant + Σ weightᵢ·Tᵢ over earlier statistics.</summary>
/// <param name="Index">The statistic that depends on the others.</param>
/// <param name="Multiple">What it is multiplied by so that the weights are whole numbers, where that can be.</param>
/// <param name="Constant">The constant, as text; empty where it is zero.</param>
/// <param name="Weights">The weights of the statistics before it, as text: "3", "−2", "n"; empty where one is zero.</param>
internal sealed record StatisticRelation(int Index, string Multiple, string Constant, IReadOnlyList<string> Weights)
{
    /// <summary>From weights that are fractions where they could be recognised, and text where not.</summary>
    public static StatisticRelation Of(int index, IReadOnlyList<(Rational? Number, string Text)> weights)
    {
        var scale = Rational.One;
        if (weights.All(w => w.Number is not null))
        {
            var common = weights.Aggregate(System.Numerics.BigInteger.One, (all, w) => Common(all, w.Number!.Value.Denominator));
            scale = common < 1000 ? new Rational(common, 1) : Rational.One;
        }

        var texts = weights.Select(w => w.Number is not { } number ? w.Text : number.IsZero ? "" : Rendering.Number(number * scale)).ToList();
        return new StatisticRelation(index, Rendering.Number(scale), texts[0], texts.Skip(1).ToList());
    }

    private static System.Numerics.BigInteger Common(System.Numerics.BigInteger a, System.Numerics.BigInteger b) =>
        a / System.Numerics.BigInteger.GreatestCommonDivisor(a, b) * b;
}

/// <summary>Whether statistics are affinely dependent where observations can occur: by the algebra of their atoms, and on
/// observations that stand for all.</summary>
internal static class StatisticRelations
{
    private const int LargestDenominator = 1000;
    private const double Negligible = 1e-9;

    public static StatisticRelation? Find(FamilyDeclaration declaration, NormalForm form)
    {
        var bodies = declaration.IsTrade
            ? form.Statistics.Select(s => s.Body.ToExpression()).ToList()
            : declaration.Statistics.Select(s => s.Body).ToList();
        return OfAtoms(declaration, bodies) ?? OfValues(declaration, form, bodies);
    }

    /// <summary>A relation between the functions themselves, whatever the known values are.</summary>
    private static StatisticRelation? OfAtoms(FamilyDeclaration declaration, List<Expression> bodies)
    {
        var expander = new Expander(new Scope(declaration));
        var linearisation = new Linearisation(expander);
        var relations = new AffineRelations(Dependence.Known);
        for (var j = 0; j < bodies.Count; j++)
        {
            var function = linearisation.Of(RecurrenceOfGamma.Apply(expander.Expand(bodies[j]), expander));
            if (relations.Find(function) is { } relation)
                return StatisticRelation.Of(j, relation.Weights.Take(j).Prepend(relation.Constant).Select(w => (w.AsRational(), Rendering.Text(w.ToSortedExpression()))).ToList());
            relations.Add(function);
        }

        return null;
    }

    /// <summary>A relation between the values, where nothing but the observation enters.</summary>
    private static StatisticRelation? OfValues(FamilyDeclaration declaration, NormalForm form, List<Expression> bodies)
    {
        if (bodies.Any(b => (Dependences.Of(b) & ~Dependence.Observation) != 0 || Dependences.Parts(b).Any(p => p is Opaque)))
            return null;
        var support = EffectiveSupport.Of(declaration, form, ignoresPoints: true);
        if (SamplePoints.Of(declaration, form, support) is not { } sample || (!sample.IsComplete && sample.Points.Count < (2 * bodies.Count) + 6))
            return null;
        var rows = sample.Points
            .Select(p => bodies.Select(b => support.Evaluator.Of(b, Enclosure.Of(p))).Prepend(Enclosure.One).ToArray())
            .ToList();
        if (rows.Any(r => r.Any(v => !v.IsFinite)))
            return null;
        var original = rows.Select(r => r.ToArray()).ToList();
        var pivots = new List<int>();
        for (var column = 0; column <= bodies.Count; column++)
        {
            if (Pivot(rows, pivots, column) is { } row)
                Clear(rows, pivots, row, column);
            else
                return Relation(rows, original, pivots, column, sample.IsComplete);
        }

        return null;
    }

    // The row, not yet used, whose entry in the column is farthest from zero; null where none is sure to differ from it.
    private static int? Pivot(List<Enclosure[]> rows, List<int> used, int column)
    {
        int? best = null;
        var size = 0.0;
        for (var i = 0; i < rows.Count; i++)
        {
            var entry = rows[i][column];
            if (used.Contains(i) || entry.HasZero || entry.IsNeverFinite)
                continue;
            var least = Math.Min(Math.Abs(entry.Lower), Math.Abs(entry.Upper));
            if (best is null || least > size)
                (best, size) = (i, least);
        }

        return best;
    }

    private static void Clear(List<Enclosure[]> rows, List<int> pivots, int pivot, int column)
    {
        pivots.Add(pivot);
        var inverse = EnclosedFunctions.Reciprocal(rows[pivot][column]);
        for (var j = 0; j < rows[pivot].Length; j++)
            rows[pivot][j] = j < column ? rows[pivot][j] : j == column ? Enclosure.One : rows[pivot][j] * inverse;
        for (var i = 0; i < rows.Count; i++)
        {
            var factor = rows[i][column];
            if (i == pivot || factor.IsZero)
                continue;
            for (var j = column; j < rows[i].Length; j++)
                rows[i][j] = j == column ? Enclosure.Zero : rows[i][j] + (-(rows[pivot][j] * factor));
        }
    }

    // The pivot rows, reduced, hold the weights of the earlier columns.
    private static StatisticRelation? Relation(List<Enclosure[]> rows, List<Enclosure[]> original, List<int> pivots, int column, bool isComplete)
    {
        var weights = pivots.Select(p => rows[p][column]).ToList();
        var isExact = rows.All(r => r[column].Exact is not null);

        // As many statistics as there are values always depend on each other.
        var isCertain = isExact || (isComplete && original.Count <= column);
        var numbers = weights.Select(w => Recognised(w)).ToList();
        if (!isCertain && !(numbers.Skip(1).All(n => n is not null) && Agrees(original, numbers, weights[0], column)))
            return null;
        return StatisticRelation.Of(column - 1, weights.Select((w, i) => (numbers[i], numbers[i] is null ? Named(w) : "")).ToList());
    }

    // Whether the relation with the recognised weights holds at every point, as closely as can be computed.
    private static bool Agrees(List<Enclosure[]> rows, List<Rational?> weights, Enclosure constant, int column)
    {
        foreach (var row in rows)
        {
            var rest = row[column] + (-constant);
            var scale = 1e-3 + Math.Abs(row[column].Upper);
            for (var i = 1; i < weights.Count; i++)
            {
                rest += -(row[i] * Enclosure.Of(weights[i]!.Value));
                scale = Math.Max(scale, Math.Abs(row[i].Upper));
            }

            if (!rest.HasZero || rest.Upper - rest.Lower > Negligible * scale)
                return false;
        }

        return true;
    }

    // The simplest fraction in a narrow range.
    private static Rational? Recognised(Enclosure value)
    {
        if (value.Exact is { } exact)
            return exact;
        if (!(value.Upper - value.Lower <= Negligible * (1 + Math.Abs(value.Upper))))
            return null;
        for (var denominator = 1; denominator <= LargestDenominator; denominator++)
        {
            var numerator = Math.Round(value.Lower / 2 * denominator + (value.Upper / 2 * denominator));
            if (Math.Abs(numerator) < 1e9 && numerator >= value.Lower * denominator && numerator <= value.Upper * denominator)
                return new Rational(new System.Numerics.BigInteger(numerator), denominator);
        }

        return null;
    }

    // A logarithm of a small number, a multiple of π, or so many digits.
    private static string Named(Enclosure value)
    {
        var middle = (value.Lower / 2) + (value.Upper / 2);
        for (var n = 2; n <= 100; n++)
        {
            if (Math.Abs(Math.Abs(middle) - Math.Log(n)) < 1e-12)
                return (middle < 0 ? "−" : "") + $"log({n})";
        }

        if (Recognised(EnclosedFunctions.Reciprocal(Enclosure.Of(Math.PI)) * value) is { Denominator.IsOne: true, IsZero: false } turns)
            return turns == Rational.One ? "π" : Rendering.Number(turns) + "π";
        return Rendering.Number(double.Parse(middle.ToString("G6", System.Globalization.CultureInfo.InvariantCulture), System.Globalization.CultureInfo.InvariantCulture));
    }
}
