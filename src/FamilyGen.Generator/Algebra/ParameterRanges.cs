using System;
using System.Collections.Generic;
using System.Linq;

namespace FamilyGen.Generator.Algebra;

/// <summary>The open range of each trade parameter, as far as its use states it: the argument of a logarithm or of log Γ,
/// the base of a real power, a scale that enters through its square alone.</summary>
internal sealed class ParameterRanges
{
    private readonly Dictionary<string, (double Lower, double Upper)> _ranges = new(StringComparer.Ordinal);

    private ParameterRanges(Scope scope, IEnumerable<string> parameters)
    {
        foreach (var name in parameters)
        {
            var positive = scope.IsPositive(new Symbol(name, SymbolKind.Parameter, false));
            _ranges[name] = (positive ? 0 : double.NegativeInfinity, double.PositiveInfinity);
        }
    }

    public static ParameterRanges Of(Polynomial kernel, Scope scope, IReadOnlyList<string> parameters)
    {
        var ranges = new ParameterRanges(scope, parameters);
        var expression = kernel.ToExpression();
        foreach (var part in Dependences.Parts(expression))
        {
            if (part is Call { Function: Function.Log or Function.LogGamma } call)
                ranges.IsPositive(call.Arguments[0]);
            else if (part is Power { Exponent: var exponent } power && !(exponent is Number { Value.IsInteger: true }))
                ranges.IsPositive(power.Base);
        }

        foreach (var name in parameters.Where(p => IsEven(expression, p)))
            ranges.Above(name, 0);
        return ranges;
    }

    public double Lower(string parameter) => _ranges[parameter].Lower;

    public double Upper(string parameter) => _ranges[parameter].Upper;

    // slope·parameter + intercept > 0 with numbers for both.
    private void IsPositive(Expression argument)
    {
        var dependence = Dependences.Of(argument);
        if (dependence != Dependence.Parameter || Dependences.Names(argument, SymbolKind.Parameter) is not { Count: 1 } names)
            return;
        var at = Evaluator.Evaluate(argument, _ => 0);
        var slope = Derivative.Of(argument, s => s.Name == names[0]);
        if (slope is null || Dependences.Of(slope) != Dependence.None && !IsConstant(slope))
            return;
        var rate = Evaluator.Evaluate(slope, _ => 1);
        if (double.IsNaN(at) || double.IsNaN(rate) || rate == 0)
            return;
        if (rate > 0)
            Above(names[0], -at / rate);
        else
            Below(names[0], -at / rate);
    }

    private static bool IsConstant(Expression slope) =>
        Evaluator.Evaluate(slope, _ => 1) == Evaluator.Evaluate(slope, _ => 2.5) && Evaluator.Evaluate(slope, _ => 1) == Evaluator.Evaluate(slope, _ => 0.3);

    // Whether a parameter occurs as an even power and in no other way.
    private static bool IsEven(Expression expression, string parameter)
    {
        var found = false;
        return Even(expression) && found;

        bool Even(Expression e)
        {
            if (e is Symbol symbol)
                return symbol.Kind != SymbolKind.Parameter || symbol.Name != parameter;
            if (e is Power { Base: Symbol { Kind: SymbolKind.Parameter } inner, Exponent: Number { Value: var n } } && inner.Name == parameter)
            {
                found = true;
                return (n * new Rational(1, 2)).IsInteger;
            }

            if (e is Call { Function: Function.Log, Arguments: var a } && a[0] is Symbol { Kind: SymbolKind.Parameter } logged && logged.Name == parameter)
                return true;
            return e.Children().All(Even);
        }
    }

    private void Above(string name, double limit) => _ranges[name] = (Math.Max(_ranges[name].Lower, limit + 0.0), _ranges[name].Upper);

    private void Below(string name, double limit) => _ranges[name] = (_ranges[name].Lower, Math.Min(_ranges[name].Upper, limit + 0.0));
}
