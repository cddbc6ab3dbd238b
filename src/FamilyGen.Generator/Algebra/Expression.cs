using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Algebra;

/// <summary>A real-valued formula, exactly as it was written: nothing is simplified on construction. The origin of a node
/// (its number within the declaration, in reading order; −1 where the algebra made it) leads back to the source.</summary>
internal abstract record Expression
{
    public int Origin { get; init; } = -1;
}

/// <summary>A constant. Literals that are exact in decimal are rationals; a constant of the language (π, a double that
/// came out of a computation) is held as the double itself.</summary>
internal sealed record Number(Rational Value) : Expression;

/// <summary>A constant with no exact rational form: π, e, or a computed double.</summary>
internal sealed record Constant(double Value, string Text) : Expression;

internal enum SymbolKind
{
    Observation,
    Known,
    Parameter,

    /// <summary>A natural parameter, in inverse maps.</summary>
    Natural,
}

/// <summary>The observation, a known value or a parameter. <paramref name="IsInteger"/> tells the type it has in the source.</summary>
internal sealed record Symbol(string Name, SymbolKind Kind, bool IsInteger) : Expression;

internal sealed record Sum(EquatableArray<Expression> Terms) : Expression;

internal sealed record Product(EquatableArray<Expression> Factors) : Expression;

/// <summary>Base^Exponent; a quotient a/b is Product(a, Power(b, −1)).</summary>
internal sealed record Power(Expression Base, Expression Exponent) : Expression;

internal enum Function
{
    Exp,
    Log,
    Sin,
    Cos,
    Abs,

    /// <summary>atan2(y, x), the angle of the point (x, y); only in inverse maps.</summary>
    Atan2,
    Min,
    Max,
    LogGamma,
    Digamma,

    /// <summary>log Γ(a + shift) − log Γ(a) for the arguments (a, shift); only where formulas are printed.</summary>
    LogGammaRatio,

    /// <summary>ψ(a + shift) − ψ(a) for the arguments (a, shift); only where formulas are printed.</summary>
    DigammaDifference,
    Floor,
    Sign,

    /// <summary>a mod b with the sign of a, as % has in C#.</summary>
    Remainder,

    /// <summary>Integer division, rounding toward zero, as / has in C# on integers.</summary>
    IntegerQuotient,
}

/// <summary>A known function. Sqrt is Power(·, ½); Tan and the like are written with these; FactorialLn(x) is
/// LogGamma(x + 1); BinomialLn(n, k) is three of them.</summary>
internal sealed record Call(Function Function, EquatableArray<Expression> Arguments) : Expression;

/// <summary>A pure function that the reader knows nothing about. <paramref name="Text"/> is the C# expression of type double
/// that evaluates it, fully qualified, with {0}, {1} … in place of its arguments (formulas of type double):
/// "(double)global::Harbour.Tides.Level((int)({0}))".</summary>
internal sealed record Opaque(string Text, EquatableArray<Expression> Arguments) : Expression;

internal sealed record Conditional(Condition Condition, Expression WhenTrue, Expression WhenFalse) : Expression;

/// <summary>A yes/no question about the observation (or, where it is an error, a parameter).</summary>
internal abstract record Condition
{
    public int Origin { get; init; } = -1;
}

internal enum Relation
{
    Less,
    LessOrEqual,
    Equal,
}

internal sealed record Comparison(Relation Relation, Expression Left, Expression Right) : Condition;

internal sealed record Not(Condition Operand) : Condition;

internal sealed record And(Condition Left, Condition Right) : Condition;

internal sealed record Or(Condition Left, Condition Right) : Condition;

internal sealed record Always(bool Value) : Condition;
