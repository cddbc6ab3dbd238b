using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>Where functions of x are not smooth: changes of conditions, kinks, singularities inside the support, and on a
/// lattice the modulus along whose residue classes they are smooth.</summary>
internal sealed class Breakpoints
{
    private readonly Scope _scope;
    private readonly List<Expression> _points = new();
    private readonly List<Expression> _singular = new();
    private readonly List<Expression> _moduli = new();

    private Breakpoints(Scope scope) => _scope = scope;

    public IReadOnlyList<Expression> Points => _points;

    /// <summary>Points inside the support where a logarithm or a negative power may be unbounded.</summary>
    public IReadOnlyList<Expression> Singular => _singular;

    /// <summary>Whether something could not be read, or a place where smoothness ends could not be found.</summary>
    public bool IsOpaque { get; private set; }

    public static Breakpoints Of(IEnumerable<Expression> functions, Condition? predicate, Scope scope)
    {
        var result = new Breakpoints(scope);
        foreach (var function in functions)
        {
            foreach (var part in Dependences.Parts(function).Where(p => Dependences.Of(p).HasObservation()))
                result.Add(part);
        }

        if (predicate is not null)
        {
            result.Add(predicate);
            foreach (var part in predicate.Operands().SelectMany(Dependences.Parts).Where(p => Dependences.Of(p).HasObservation()))
                result.Add(part);
        }

        return result;
    }

    /// <summary>The common multiple of the moduli: exact for numbers, the product where known values are among them.</summary>
    public Expression Period
    {
        get
        {
            var number = Rational.One;
            var others = new List<Expression>();
            foreach (var modulus in _moduli)
            {
                if (modulus is Number { Value: var value })
                    number = number * Rationals.Abs(value) / Rationals.CommonDivisor(number, value);
                else
                    others.Add(modulus);
            }

            if (others.Count == 0)
                return Formula.Of(number);
            if (number != Rational.One)
                others.Insert(0, Formula.Of(number));
            return others.Count == 1 ? others[0] : Formula.Product(others.ToArray());
        }
    }

    private void Add(Expression part)
    {
        switch (part)
        {
            case Opaque:
                IsOpaque = true;
                break;
            case Conditional conditional:
                Add(conditional.Condition);
                break;
            case Call { Function: Function.Abs or Function.Sign } call:
                AddRoots(call.Arguments[0], call.Function == Function.Abs ? Relation.Less : Relation.Equal);
                break;
            case Call { Function: Function.Min or Function.Max } call:
                for (var i = 1; i < call.Arguments.Count; i++)
                    AddRoots(Formula.Difference(call.Arguments[i], call.Arguments[0]), Relation.Less);
                break;
            case Call { Function: Function.Remainder or Function.IntegerQuotient } call:
                AddModulus(call.Arguments[0], call.Arguments[1]);
                break;
            case Call { Function: Function.Floor } call:
                AddFloor(call.Arguments[0]);
                break;
            case Call { Function: Function.Log } call:
                AddSingular(call.Arguments[0]);
                break;
            case Power { Exponent: Number { Value: { IsInteger: true, Sign: > 0 } } }:
                break;
            case Power power:
                AddSingular(power.Base);
                break;
        }
    }

    private void Add(Condition condition)
    {
        foreach (var comparison in Conditions.Comparisons(condition))
        {
            var difference = Formula.Difference(comparison.Left, comparison.Right);
            if (!Dependences.Of(difference).HasObservation())
                continue;
            if (!IsResidue(difference))
                AddRoots(difference, comparison.Relation);
        }
    }

    // A comparison of remainders changes with the residue class alone.
    private static bool IsResidue(Expression expression) => expression switch
    {
        Symbol { Kind: SymbolKind.Observation } => false,
        Call { Function: Function.Remainder } => true,
        _ => expression.Children().All(IsResidue),
    };

    private void AddRoots(Expression function, Relation relation)
    {
        if (Affine.In(function, _scope.Observation.Name) is { } affine)
        {
            // c < x changes after c, as x ≤ c does.
            var slope = _scope.RangeOf(affine.Slope);
            var seen = slope.IsPositive ? relation
                : slope.IsNegative && relation != Relation.Equal ? (relation == Relation.Less ? Relation.LessOrEqual : Relation.Less)
                : Relation.Equal;
            if (!affine.Slope.IsZero())
                AddPoint(affine.Root(), seen);
            return;
        }

        if (Roots.Of(function, _scope) is { } roots)
        {
            foreach (var root in roots)
                AddPoint(root, Relation.Equal);
        }
        else
        {
            IsOpaque = true;
        }
    }

    // On a lattice a point b is a change between the integers below it and those from it on.
    private void AddPoint(Expression point, Relation relation)
    {
        if (!_scope.Support.IsLattice || relation != Relation.LessOrEqual)
            AddInside(point, _points);
        if (!_scope.Support.IsLattice || relation == Relation.Less)
            return;
        AddInside(
            point is Number { Value: { IsInteger: true } n } ? Formula.Of(n + 1)
            : point is Symbol { IsInteger: true } ? Formula.Sum(point, Formula.One)
            : Formula.Sum(Formula.Call(Function.Floor, point), Formula.One),
            _points);
    }

    private void AddSingular(Expression argument)
    {
        if (_scope.Support.IsLattice || _scope.IsPositive(argument) || _scope.IsNegative(argument))
            return;
        while (argument is Call { Function: Function.Abs } abs)
            argument = abs.Arguments[0];
        if (argument is Call { Function: Function.Min or Function.Max } extreme)
        {
            foreach (var one in extreme.Arguments)
                AddSingular(one);
            return;
        }

        var roots = Affine.In(argument, _scope.Observation.Name) is { } affine && !affine.Slope.IsZero() ? new[] { affine.Root() } : Roots.Of(argument, _scope);
        foreach (var root in roots ?? Array.Empty<Expression>())
        {
            AddInside(root, _points);
            if (IsSurelyInside(root))
                AddInside(root, _singular);
        }
    }

    private void AddInside(Expression point, List<Expression> points)
    {
        point = point.WithoutOrigins();
        var range = _scope.RangeOf(_scope.Observation);
        if (Dependences.Of(point) == Dependence.None)
        {
            var value = Evaluator.Evaluate(point, _ => double.NaN);
            if (double.IsNaN(value) || value <= range.Lower || value >= range.Upper)
                return;
        }

        if (!IsEnd(point) && !points.Any(p => StructuralOrder.Same(p, point)))
            points.Add(point);
    }

    // Above a known limit log x is taken to be meant, and the limit to be positive: 0 is then no point of the support.
    private bool IsSurelyInside(Expression root) => Dependences.Of(root) != Dependence.None
        || ((_scope.Support.Lower is null || Dependences.Of(_scope.Support.Lower) == Dependence.None)
            && (_scope.Support.Upper is null || Dependences.Of(_scope.Support.Upper) == Dependence.None));

    private bool IsEnd(Expression point) =>
        (_scope.Support.Lower is { } lower && StructuralOrder.Same(lower, point)) || (_scope.Support.Upper is { } upper && StructuralOrder.Same(upper, point));

    private void AddModulus(Expression argument, Expression modulus)
    {
        if (!_scope.Support.IsLattice || Dependences.Of(modulus).HasObservation() || !IsInteger(argument))
        {
            IsOpaque = true;
            return;
        }

        AddRoots(argument, Relation.Less);
        if (!_moduli.Any(m => StructuralOrder.Same(m, modulus)))
            _moduli.Add(modulus.WithoutOrigins());
    }

    private void AddFloor(Expression argument)
    {
        // Nothing is left to cut off.
        if (argument is Call { Function: Function.Floor or Function.IntegerQuotient })
            return;
        if (_scope.Support.IsLattice && Affine.In(argument, _scope.Observation.Name) is { Slope: Number { Value: var slope } })
            AddModulus(_scope.Observation, Formula.Of(new Rational(slope.Denominator, 1)));
        else
            IsOpaque = true;
    }

    private static bool IsInteger(Expression expression) => expression switch
    {
        Number number => number.Value.IsInteger,
        Symbol symbol => symbol.IsInteger,
        Sum sum => sum.Terms.All(IsInteger),
        Product product => product.Factors.All(IsInteger),
        Power { Exponent: Number { Value: { IsInteger: true, Sign: >= 0 } } } power => IsInteger(power.Base),
        _ => false,
    };
}
