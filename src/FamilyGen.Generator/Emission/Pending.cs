using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Emission;

internal static class Derivative
{
    public static Expression Of(AtomSum sum) => new Number(Rational.Zero);
}

internal static class FormulaText
{
    public static string Of(AtomSum sum) => "f";

    public static string Of(Expression e) => "f";
}
