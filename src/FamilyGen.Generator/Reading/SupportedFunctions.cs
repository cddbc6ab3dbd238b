using System;
using System.Collections.Generic;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Reading;

/// <summary>The functions that are read as formulas, by the full name of their type, their own name and the number of
/// arguments. Any other pure function is opaque.</summary>
internal static class SupportedFunctions
{
    private static readonly string[] s_math = ["System.Math", "System.Double", "System.Int32", "System.Int64"];

    private static readonly Dictionary<string, Func<PlacedFormula, Expression[], Expression>> s_table = Build();

    /// <summary>The formula of a known function, or null.</summary>
    public static Expression? TryApply(string type, string name, Expression[] arguments, int origin) =>
        s_table.TryGetValue(Key(type, name, arguments.Length), out var build) ? build(new PlacedFormula(origin), arguments) : null;

    /// <summary>Whether some known function has this plain name, with any number of arguments.</summary>
    public static bool HasName(string name)
    {
        foreach (var key in s_table.Keys)
        {
            var dot = key.LastIndexOf('.');
            if (key.Substring(dot + 1, key.IndexOf('/') - dot - 1) == name)
                return true;
        }

        return false;
    }

    private static string Key(string type, string name, int arity) => type + "." + name + "/" + arity;

    private static Dictionary<string, Func<PlacedFormula, Expression[], Expression>> Build()
    {
        var table = new Dictionary<string, Func<PlacedFormula, Expression[], Expression>>(StringComparer.Ordinal);
        AddMath(table);
        AddSpecial(table);
        return table;
    }

    private static void AddMath(Dictionary<string, Func<PlacedFormula, Expression[], Expression>> table)
    {
        void Math(string name, int arity, Func<PlacedFormula, Expression[], Expression> build)
        {
            foreach (var type in s_math)
                table[Key(type, name, arity)] = build;
        }

        Math("Log", 1, (f, a) => f.Log(a[0]));
        Math("Log", 2, (f, a) => f.Divide(f.Log(a[0]), f.Log(a[1])));
        Math("Log10", 1, (f, a) => f.Divide(f.Log(a[0]), f.Log(f.Number(10))));
        Math("Log2", 1, (f, a) => f.Divide(f.Log(a[0]), f.Log(f.Number(2))));
        Math("LogP1", 1, (f, a) => f.Log(f.Add(f.Number(1), a[0])));
        Math("Exp", 1, (f, a) => f.Exp(a[0]));
        Math("Exp2", 1, (f, a) => f.Power(f.Number(2), a[0]));
        Math("Exp10", 1, (f, a) => f.Power(f.Number(10), a[0]));
        Math("ExpM1", 1, (f, a) => f.Subtract(f.Exp(a[0]), f.Number(1)));
        Math("Pow", 2, (f, a) => f.Power(a[0], a[1]));
        Math("Sqrt", 1, (f, a) => f.Root(a[0]));
        Math("Cbrt", 1, (f, a) => f.Multiply(
            f.Call(Function.Sign, a[0]), f.Power(f.Call(Function.Abs, a[0]), f.Number(new Rational(1, 3)))));
        Math("Hypot", 2, (f, a) => Hypotenuse(f, a[0], a[1]));
        Math("Abs", 1, (f, a) => f.Call(Function.Abs, a[0]));
        Math("Sign", 1, (f, a) => f.Call(Function.Sign, a[0]));
        Math("Min", 2, (f, a) => f.Call(Function.Min, a[0], a[1]));
        Math("Max", 2, (f, a) => f.Call(Function.Max, a[0], a[1]));
        Math("Clamp", 3, (f, a) => f.Call(Function.Min, f.Call(Function.Max, a[0], a[1]), a[2]));
        Math("Floor", 1, (f, a) => f.Call(Function.Floor, a[0]));
        Math("Ceiling", 1, (f, a) => f.Negate(f.Call(Function.Floor, f.Negate(a[0]))));
        Math("Truncate", 1, (f, a) => f.Truncate(a[0]));
        Math("FusedMultiplyAdd", 3, (f, a) => f.Add(f.Multiply(a[0], a[1]), a[2]));
        Math("BigMul", 2, (f, a) => f.Multiply(a[0], a[1]));
        Math("Cos", 1, (f, a) => f.Call(Function.Cos, a[0]));
        Math("Sin", 1, (f, a) => f.Call(Function.Sin, a[0]));
        Math("Tan", 1, (f, a) => f.Divide(f.Call(Function.Sin, a[0]), f.Call(Function.Cos, a[0])));
        Math("Sinh", 1, (f, a) => Half(f, f.Subtract(f.Exp(a[0]), f.Exp(f.Negate(a[0])))));
        Math("Cosh", 1, (f, a) => Half(f, f.Add(f.Exp(a[0]), f.Exp(f.Negate(a[0])))));

        // One exponential, so that neither tail is ∞/∞.
        Math("Tanh", 1, (f, a) => f.Subtract(
            f.Number(1), f.Divide(f.Number(2), f.Add(f.Number(1), f.Exp(f.Multiply(f.Number(2), a[0]))))));
        Math("Atanh", 1, (f, a) => Half(f, f.Subtract(
            f.Log(f.Add(f.Number(1), a[0])), f.Log(f.Subtract(f.Number(1), a[0])))));
    }

    private static void AddSpecial(Dictionary<string, Func<PlacedFormula, Expression[], Expression>> table)
    {
        void Special(string name, int arity, Func<PlacedFormula, Expression[], Expression> build) =>
            table[Key("MathNet.Numerics.SpecialFunctions", name, arity)] = build;

        Special("GammaLn", 1, (f, a) => f.LogGamma(a[0]));
        Special("Gamma", 1, (f, a) => f.Exp(f.LogGamma(a[0])));
        Special("FactorialLn", 1, (f, a) => f.LogFactorial(a[0]));
        Special("Factorial", 1, (f, a) => f.Exp(f.LogFactorial(a[0])));
        Special("BinomialLn", 2, (f, a) => LogBinomial(f, a[0], a[1]));
        Special("Binomial", 2, (f, a) => f.Exp(LogBinomial(f, a[0], a[1])));
        Special("BetaLn", 2, (f, a) => LogBeta(f, a[0], a[1]));
        Special("Beta", 2, (f, a) => f.Exp(LogBeta(f, a[0], a[1])));
        Special("DiGamma", 1, (f, a) => f.Call(Function.Digamma, a[0]));
        Special("Harmonic", 1, (f, a) => f.Subtract(
            f.Call(Function.Digamma, f.Add(a[0], f.Number(1))), f.Call(Function.Digamma, f.Number(1))));
        Special("Logistic", 1, (f, a) => f.Divide(f.Number(1), f.Add(f.Number(1), f.Exp(f.Negate(a[0])))));
        Special("Logit", 1, (f, a) => f.Subtract(f.Log(a[0]), f.Log(f.Subtract(f.Number(1), a[0]))));
        Special("ExponentialMinusOne", 1, (f, a) => f.Subtract(f.Exp(a[0]), f.Number(1)));
        Special("Hypotenuse", 2, (f, a) => Hypotenuse(f, a[0], a[1]));
    }

    private static Expression Half(PlacedFormula f, Expression a) => f.Multiply(f.Number(new Rational(1, 2)), a);

    private static Expression Hypotenuse(PlacedFormula f, Expression a, Expression b) =>
        f.Root(f.Add(f.Power(a, f.Number(2)), f.Power(b, f.Number(2))));

    private static Expression LogBinomial(PlacedFormula f, Expression n, Expression k) => f.Add(
        f.LogFactorial(n), f.Negate(f.LogFactorial(k)), f.Negate(f.LogFactorial(f.Subtract(n, k))));

    private static Expression LogBeta(PlacedFormula f, Expression a, Expression b) => f.Add(
        f.LogGamma(a), f.LogGamma(b), f.Negate(f.LogGamma(f.Add(a, b))));
}
