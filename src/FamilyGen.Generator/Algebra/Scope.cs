using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>What is known about the symbols of a declaration: the support, and which parameters are positive. It answers
/// where a formula has a sign.</summary>
internal sealed class Scope
{
    private readonly Dictionary<string, Range> _parameters = new(StringComparer.Ordinal);
    private readonly Range _observation;

    public Scope(FamilyDeclaration declaration)
    {
        Support = declaration.Support;
        Observation = new Symbol(declaration.ObservationName, SymbolKind.Observation, declaration.Observation != ObservationType.Double);
        foreach (var parameter in declaration.Parameters)
            _parameters[parameter.Name] = parameter.IsPositive ? Range.Positive : Range.Line;
        var lower = Support.Lower is null ? Range.Line : RangeOf(Support.Lower);
        var upper = Support.Upper is null ? Range.Line : RangeOf(Support.Upper);
        _observation = new Range(
            lower.Lower,
            lower.LowerOpen || !(Support.LowerIncluded || Support.IsLattice),
            upper.Upper,
            upper.UpperOpen || !(Support.UpperIncluded || Support.IsLattice));
        foreach (var mass in Support.Masses)
        {
            // A point that carries probability belongs to the support even where it is an open end.
            if (RangeOf(mass) is { IsFinite: true } at)
                _observation = _observation.Join(at);
        }
    }

    public SupportDeclaration Support { get; }

    public Symbol Observation { get; }

    /// <summary>The range of the values that a formula takes for x in the support (inside, where an end is closed but a
    /// logarithm may vanish there is no harm: sums of open ends stay open).</summary>
    public Range RangeOf(Expression expression)
    {
        var range = Plain(expression);
        if (!range.IsNonNegative && !range.IsNonPositive && AtEnds(expression) is { } better)
            return better;
        return range;
    }

    /// <summary>Takes on what the use of a parameter says about its range.</summary>
    public void Narrow(string parameter, double lower, double upper) => _parameters[parameter] = new Range(lower, true, upper, true);

    public bool IsPositive(Expression expression) => RangeOf(expression).IsPositive;

    public bool IsNegative(Expression expression) => RangeOf(expression).IsNegative;

    private Range Plain(Expression expression)
    {
        switch (expression)
        {
            case Number number:
                return Range.At(number.Value.ToDouble());
            case Constant constant:
                return Range.At(constant.Value);
            case Symbol { Kind: SymbolKind.Observation }:
                return _observation;
            case Symbol { Kind: SymbolKind.Parameter } parameter:
                return _parameters.TryGetValue(parameter.Name, out var range) ? range : Range.Line;
            case Symbol:
                return Range.Line;
            case Sum sum:
                return sum.Terms.Select(RangeOf).Aggregate(Range.At(0), (a, b) => a + b);
            case Product product:
                return OfProduct(product);
            case Power { Exponent: Number { Value.IsInteger: true } exponent } power when Rationals.Abs(exponent.Value) < 1000:
                return RangeOf(power.Base).Power((int)exponent.Value.Numerator);
            case Power power:
                return RangeOf(power.Base).IsPositive ? Range.Positive : Range.NonNegative;
            case Conditional conditional:
                return RangeOf(conditional.WhenTrue).Join(RangeOf(conditional.WhenFalse));
            case Call call:
                return OfCall(call);
            default:
                return Range.Line;
        }
    }

    private Range OfProduct(Product product)
    {
        var range = Range.At(1);
        foreach (var group in product.Factors.GroupBy(f => f, StructuralOrder.Instance))
        {
            // A repeated factor is a power: x·x is never negative.
            range *= RangeOf(group.Key).Power(group.Count());
        }

        return range;
    }

    private Range OfCall(Call call)
    {
        var first = RangeOf(call.Arguments[0]);
        switch (call.Function)
        {
            case Function.Exp:
                return first.Map(Math.Exp) with { LowerOpen = true };
            case Function.Log:
                return first.IsNonNegative ? first.Map(Math.Log) : Range.Line;
            case Function.Abs:
                return first.Abs();
            case Function.Sin or Function.Cos or Function.Sign:
                return new Range(-1, false, 1, false);
            case Function.Floor:
                return first.Map(Math.Floor) with { LowerOpen = double.IsInfinity(first.Lower) };
            case Function.Min:
                return Extreme(call, Math.Min);
            case Function.Max:
                return Extreme(call, Math.Max);
            case Function.Remainder when first.IsNonNegative:
                return Range.NonNegative;
            case Function.IntegerQuotient when first.IsNonNegative && RangeOf(call.Arguments[1]).IsPositive:
                return Range.NonNegative;
            default:
                return Range.Line;
        }
    }

    private Range Extreme(Call call, Func<double, double, double> choose)
    {
        var ranges = call.Arguments.Select(RangeOf).ToList();
        var lower = ranges.Select(r => r.Lower).Aggregate(choose);
        var upper = ranges.Select(r => r.Upper).Aggregate(choose);
        return new Range(
            lower, ranges.Where(r => r.Lower == lower).All(r => r.LowerOpen), upper, ranges.Where(r => r.Upper == upper).All(r => r.UpperOpen));
    }

    private bool IsMass(Expression? point) => point is not null && Support.Masses.Any(m => StructuralOrder.Same(m, point));

    // An affine function of x that vanishes at an end of the support, x − threshold above a known threshold, has one sign.
    private Range? AtEnds(Expression expression)
    {
        if (Affine.In(expression, Observation.Name) is not { } affine || !Dependences.Of(expression).HasObservation())
            return null;
        var slope = Plain(affine.Slope);
        if (!slope.IsPositive && !slope.IsNegative)
            return null;
        foreach (var (end, isUpper, included) in new[]
        {
            (Support.Lower, false, Support.LowerIncluded || Support.IsLattice || IsMass(Support.Lower)),
            (Support.Upper, true, Support.UpperIncluded || Support.IsLattice || IsMass(Support.Upper)),
        })
        {
            if (end is null || Affine.ValueAt(affine, end) is not { } value)
                continue;
            var positive = isUpper == slope.IsNegative;
            if (value.Sign == (positive ? 1 : -1))
                return positive ? Range.Positive : -Range.Positive;
            if (value.IsZero)
                return included ? (positive ? Range.NonNegative : -Range.NonNegative) : (positive ? Range.Positive : -Range.Positive);
        }

        return null;
    }
}
