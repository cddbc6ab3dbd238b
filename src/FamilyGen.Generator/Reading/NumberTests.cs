using System;
using FamilyGen.Generator.Algebra;
using Microsoft.CodeAnalysis;

namespace FamilyGen.Generator.Reading;

/// <summary>The yes/no functions of the number types that are read as conditions.</summary>
internal static class NumberTests
{
    public static Func<PlacedFormula, Expression, Condition>? TryRead(IMethodSymbol method, int arity) =>
        arity == 1 && method.ContainingType?.SpecialType is SpecialType.System_Double or SpecialType.System_Int32 or SpecialType.System_Int64
            ? Of(method.Name)
            : null;

    private static Func<PlacedFormula, Expression, Condition>? Of(string name) => name switch
    {
        "IsNaN" => (f, a) => f.Not(f.Equal(a, a)),
        "IsInfinity" => (f, a) => f.Equal(f.Call(Function.Abs, a), f.Constant(double.PositiveInfinity, "∞")),
        "IsFinite" => (f, a) => f.Less(f.Call(Function.Abs, a), f.Constant(double.PositiveInfinity, "∞")),
        "IsNegative" => (f, a) => f.Less(a, f.Number(0)),
        "IsPositive" => (f, a) => f.Compare(Relation.LessOrEqual, f.Number(0), a),
        "IsInteger" => (f, a) => f.Equal(a, f.Call(Function.Floor, a)),
        "IsEvenInteger" => (f, a) => f.Equal(f.Call(Function.Remainder, a, f.Number(2)), f.Number(0)),
        "IsOddInteger" => (f, a) => f.Equal(
            f.Call(Function.Remainder, f.Call(Function.Abs, a), f.Number(2)), f.Number(1)),
        _ => null,
    };
}
