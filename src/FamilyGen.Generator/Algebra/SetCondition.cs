using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>A conjunction of conditions of the kind "quantity &lt; bound, or quantity = bound and …".</summary>
internal sealed class SetCondition
{
    private readonly List<Part> _parts;

    private SetCondition(IEnumerable<Part> parts, bool isNever = false)
    {
        _parts = parts.ToList();
        IsNever = isNever;
    }

    public static SetCondition Always { get; } = new(Enumerable.Empty<Part>());

    public static SetCondition Never { get; } = new(Enumerable.Empty<Part>(), true);

    public bool IsNever { get; }

    /// <summary>Whether no part holds at its bound.</summary>
    public bool IsOpen => _parts.TrueForAll(p => p.AtBound.IsNever);

    private bool IsAlways => !IsNever && _parts.Count == 0;

    /// <summary>The condition as text, empty where it always holds.</summary>
    public string Text => string.Join(" and ", Written().Select(t => t.IsCompound && _parts.Count > 1 ? $"({t.Text})" : t.Text));

    /// <summary>coefficient &lt; bound, or coefficient = bound and <paramref name="atEquality"/>. It is turned so that it reads
    /// well: rate &gt; 0 rather than −rate &lt; 0.</summary>
    public static SetCondition Below(Polynomial coefficient, Rational bound, SetCondition atEquality)
    {
        var moving = coefficient.Where(t => !t.IsNumber);
        bound -= (coefficient - moving).AsRational() ?? Rational.Zero;
        var scale = moving.IsSingleTerm ? moving.Terms[0].Coefficient : (Rational)moving.Sorted()[0].Coefficient.Sign;
        moving *= Rational.One / scale;
        return new SetCondition(new[] { new Part(Rendering.Text(moving.ToSortedExpression()), scale.Sign < 0, bound / scale, atEquality) });
    }

    /// <summary>Both conditions, with repetitions and contradictions on one quantity taken out.</summary>
    public static SetCondition Both(SetCondition a, SetCondition b)
    {
        if (a.IsNever || b.IsNever)
            return Never;
        var parts = new List<Part>(a._parts);
        foreach (var part in b._parts)
        {
            var at = parts.FindIndex(p => p.Quantity == part.Quantity && p.IsAbove == part.IsAbove);
            if (at < 0)
                parts.Add(part);
            else
                parts[at] = Stronger(parts[at], part);
        }

        foreach (var above in parts.Where(p => p.IsAbove))
        {
            foreach (var below in parts.Where(p => !p.IsAbove && p.Quantity == above.Quantity))
            {
                if (above.Bound > below.Bound || (above.Bound == below.Bound && (above.AtBound.IsNever || below.AtBound.IsNever)))
                    return Never;
            }
        }

        return new SetCondition(parts);
    }

    private static Part Stronger(Part a, Part b)
    {
        if (a.Bound == b.Bound)
            return a with { AtBound = Both(a.AtBound, b.AtBound) };
        return (a.Bound > b.Bound) == a.IsAbove ? a : b;
    }

    private IEnumerable<(string Text, bool IsCompound)> Written()
    {
        var equal = new HashSet<Part>();
        foreach (var part in _parts)
        {
            if (equal.Contains(part))
                continue;
            var opposite = _parts.FirstOrDefault(p => p != part && p.Quantity == part.Quantity && p.Bound == part.Bound);
            if (opposite is null)
            {
                yield return part.Write();
                continue;
            }

            // a ≥ 0 and a ≤ 0
            equal.Add(opposite);
            var rest = Both(part.AtBound, opposite.AtBound).Text;
            yield return ($"{part.Quantity} = {Rendering.Number(part.Bound)}{(rest.Length > 0 ? " and " + rest : "")}", false);
        }
    }

    private sealed record Part(string Quantity, bool IsAbove, Rational Bound, SetCondition AtBound)
    {
        public (string Text, bool IsCompound) Write()
        {
            var bound = Rendering.Number(Bound);
            if (AtBound.IsAlways)
                return ($"{Quantity} {(IsAbove ? "≥" : "≤")} {bound}", false);
            var strict = $"{Quantity} {(IsAbove ? ">" : "<")} {bound}";
            if (AtBound.IsNever)
                return (strict, false);
            var written = AtBound.Written().ToList();
            var inner = written.Count == 1 && !written[0].IsCompound ? written[0].Text : $"({AtBound.Text})";
            return ($"{strict}, or {Quantity} = {bound} and {inner}", true);
        }
    }
}
