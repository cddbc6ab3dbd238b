using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>Trade parameters as functions of the natural ones, by elimination: an equation is solved for a parameter, which
/// is then replaced in the others; a pair a·cos b, a·sin b gives amplitude and angle. Of several pre-images the one with
/// positive roots and amplitudes is taken.</summary>
internal sealed class InverseMap
{
    private const int MostSteps = 200;

    private readonly Expander _expander;
    private int _steps;

    private InverseMap(Expander expander) => _expander = expander;

    private readonly record struct Equation(Polynomial Left, Polynomial Right);

    /// <summary>The inverse in declared order; empty where none is found or its check by numbers fails.</summary>
    public static IReadOnlyList<Expression> Of(IReadOnlyList<Statistic> statistics, IReadOnlyList<string> parameters, Expander expander)
    {
        if (statistics.Count != parameters.Count || parameters.Count == 0 || parameters.Count > 8)
            return Array.Empty<Expression>();
        var map = new InverseMap(expander);
        var equations = statistics
            .Select(s => new Equation(expander.Expand(s.Natural!), Polynomial.Of(new Symbol(s.Parameter, SymbolKind.Natural, false))))
            .ToList();
        if (map.Solve(map.WithPolarPairs(equations), parameters.ToList()) is not { } solution)
            return Array.Empty<Expression>();
        var inverse = parameters.Select(p => solution[p].ToSortedExpression().WithoutOrigins()).ToList();
        return IsInverse(inverse, statistics, parameters, expander.Scope) ? inverse : Array.Empty<Expression>();
    }

    private Dictionary<string, Polynomial>? Solve(List<Equation> equations, List<string> unknowns)
    {
        if (unknowns.Count == 0)
            return new Dictionary<string, Polynomial>(StringComparer.Ordinal);

        // The equation with the fewest unknowns first: a triangular system is then solved from its corner.
        foreach (var equation in equations.OrderBy(e => Unknowns(e, unknowns).Count))
        {
            foreach (var unknown in Unknowns(equation, unknowns))
            {
                if (++_steps > MostSteps)
                    return null;
                if (new Isolation(_expander, unknown).Solve(equation.Left, equation.Right) is not { } value)
                    continue;
                if (Finish(equations.Where(e => e != equation), unknowns, unknown, value) is { } solution)
                    return solution;
            }
        }

        return null;
    }

    private Dictionary<string, Polynomial>? Finish(IEnumerable<Equation> equations, List<string> unknowns, string unknown, Polynomial value)
    {
        var expression = value.ToExpression();
        var rest = equations.Select(e => Separate(Replace(e.Left - e.Right, unknown, expression), unknowns)).ToList();
        if (Solve(rest, unknowns.Where(u => u != unknown).ToList()) is not { } solution)
            return null;
        foreach (var other in solution.ToList())
            value = Replace(value, other.Key, other.Value.ToExpression());
        solution[unknown] = _expander.Expand(value.ToExpression());
        return solution;
    }

    // left − right = 0 with what is free of unknowns on the right.
    private static Equation Separate(Polynomial difference, List<string> unknowns)
    {
        var left = difference.Where(t => t.Factors.Any(f => Dependences.Symbols(f.ToExpression()).Any(s => s.Kind == SymbolKind.Parameter && unknowns.Contains(s.Name))));
        return new Equation(left, (difference - left) * -1);
    }

    private Polynomial Replace(Polynomial value, string unknown, Expression by) =>
        _expander.Expand(value.ToExpression().Substitute(SymbolKind.Parameter, unknown, by));

    private static List<string> Unknowns(Equation equation, List<string> unknowns) =>
        Dependences.Names((equation.Left - equation.Right).ToExpression(), SymbolKind.Parameter).Where(unknowns.Contains).ToList();

    // c·m·cos(a) = θ₁ and d·m·sin(a) = θ₂ become m = √(…) and a = atan2(…).
    private List<Equation> WithPolarPairs(List<Equation> equations)
    {
        var result = new List<Equation>(equations);
        for (var i = 0; i < result.Count; i++)
        {
            for (var j = 0; j < result.Count; j++)
            {
                if (i == j || Wave(result[i].Left, Function.Cos) is not var (cosRest, angle) || Wave(result[j].Left, Function.Sin) is not var (sinRest, other))
                    continue;
                if (!StructuralOrder.Same(angle, other) || Term.CompareFactors(cosRest, sinRest) != 0)
                    continue;
                var x = result[i].Right * (Rational.One / cosRest.Coefficient);
                var y = result[j].Right * (Rational.One / sinRest.Coefficient);
                var square = (x * x) + (y * y);
                var amplitude = new Power(square.ToSortedExpression(), Formula.Of(new Rational(1, 2)));
                var direction = Formula.Call(Function.Atan2, y.ToSortedExpression(), x.ToSortedExpression());
                result[i] = new Equation(Polynomial.Of(cosRest.WithCoefficient(1)), Polynomial.Of(Term.Of(amplitude, -1)));
                result[j] = new Equation(_expander.Expand(angle), Polynomial.Of(direction));
            }
        }

        return result;
    }

    private static (Term Amplitude, Expression Angle)? Wave(Polynomial left, Function function)
    {
        if (!left.IsSingleTerm)
            return null;
        var wave = left.Terms[0].Factors.FirstOrDefault(f => f.Base is Call call && call.Function == function && f.Exponent.IsOne);
        return wave is null ? null : (left.Terms[0].Keep(f => f != wave).WithCoefficient(left.Terms[0].Coefficient), ((Call)wave.Base).Arguments[0]);
    }

    // Forward and back again at a few points.
    private static bool IsInverse(IReadOnlyList<Expression> inverse, IReadOnlyList<Statistic> statistics, IReadOnlyList<string> parameters, Scope scope)
    {
        var agreed = 0;
        for (var attempt = 0; attempt < 8; attempt++)
        {
            var draw = new Draw(attempt, scope);
            var natural = statistics.ToDictionary(s => s.Parameter, s => Evaluator.Evaluate(s.Natural!, draw.Value), StringComparer.Ordinal);
            if (natural.Values.Any(v => double.IsNaN(v) || double.IsInfinity(v)))
                continue;
            for (var i = 0; i < parameters.Count; i++)
            {
                var back = Evaluator.Evaluate(inverse[i], s => s.Kind == SymbolKind.Natural ? natural[s.Name] : draw.Value(s));
                var expected = draw.Value(new Symbol(parameters[i], SymbolKind.Parameter, false));
                if (!(Math.Abs(back - expected) <= 1e-8 * (1 + Math.Abs(expected))))
                    return false;
            }

            agreed++;
        }

        return agreed > 0;
    }

    // Parameters inside their ranges, known values positive, all without design.
    private sealed class Draw(int attempt, Scope scope)
    {
        private readonly Dictionary<string, double> _values = new(StringComparer.Ordinal);

        public double Value(Symbol symbol)
        {
            if (_values.TryGetValue(symbol.Name, out var value))
                return value;
            var unit = (((_values.Count + 1) * 0.6180339887498949) + (attempt * 0.7548776662466927)) % 1;
            var range = scope.RangeOf(symbol);
            value = range.IsFinite ? range.Lower + (unit * (range.Upper - range.Lower))
                : !double.IsInfinity(range.Upper) ? range.Upper - 0.2 - unit
                : !double.IsInfinity(range.Lower) ? range.Lower + 0.2 + unit
                : 0.2 + unit;
            return _values[symbol.Name] = symbol.IsInteger ? Math.Ceiling(3 * value) : value;
        }
    }
}
