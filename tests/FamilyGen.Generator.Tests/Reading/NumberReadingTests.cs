namespace FamilyGen.Generator.Tests.Reading;

/// <summary>Arithmetic, literals, conversions and functions.</summary>
public class NumberReadingTests
{
    [Theory]
    [InlineData("2 * x", "(2 * x)")]
    [InlineData("-x", "(-1 * x)")]
    [InlineData("+x", "x")]
    [InlineData("x - 0.1", "(x + (-1 * 1/10))")]
    [InlineData("x * 1e-3", "(x * 1/1000)")]
    [InlineData("x * 1_000.25", "(x * 4001/4)")]
    [InlineData("x * 2d", "(x * 2)")]
    [InlineData("x * 0.5f", "(x * 1/2)")]
    [InlineData("x * 0x1F", "(x * 31)")]
    [InlineData("x * (1.0 / 3)", "(x * (1 * 3^-1))")]
    [InlineData("x * (1 / 3)", "(x * 0)")]
    [InlineData("x * (7 % 4)", "(x * 3)")]
    [InlineData("x % 24", "Remainder(x, 24)")]
    [InlineData("x * PI", "(x * π)")]
    [InlineData("x * Math.E", "(x * e)")]
    [InlineData("x * double.Pi", "(x * π)")]
    [InlineData("x * (double)2.5m", "(x * 5/2)")]
    [InlineData("x * -double.PositiveInfinity", "(x * −∞)")]
    [InlineData("x * int.MaxValue", "(x * 2147483647)")]
    [InlineData("x * 'a'", "(x * 97)")]
    [InlineData("(double)x", "x")]
    [InlineData("(int)x", "if((x < 0), (-1 * Floor((-1 * x))), Floor(x))")]
    [InlineData("(float)x", "«(double)(float)(x)»")]
    public void Arithmetic(string body, string formula) => Assert.Equal(formula, DeclaredSource.Formula(body));

    [Theory]
    [InlineData("x / 2", "IntegerQuotient(x, 2)")]
    [InlineData("x / 2.0", "(x * 2^-1)")]
    [InlineData("x % 7", "Remainder(x, 7)")]
    [InlineData("(double)x / 2", "(x * 2^-1)")]
    [InlineData("(double)(x / 2)", "IntegerQuotient(x, 2)")]
    [InlineData("x * x", "(x * x)")]
    [InlineData("(long)x * x", "(x * x)")]
    [InlineData("Log(x)", "Log(x)")]
    [InlineData("Abs(x)", "Abs(x)")]
    [InlineData("Max(x, 3)", "Max(x, 3)")]
    [InlineData("int.IsEvenInteger(x) ? 1 : 0", "if((Remainder(x, 2) = 0), 1, 0)")]
    public void Integers(string body, string formula)
    {
        Assert.Equal(formula, DeclaredSource.Formula(body, "int"));
        Assert.Equal(formula, DeclaredSource.Formula(body.Replace("int.", "long."), "long"));
    }

    [Theory]
    [InlineData("Log(x)", "Log(x)")]
    [InlineData("Math.Log(x)", "Log(x)")]
    [InlineData("double.Log(x)", "Log(x)")]
    [InlineData("Log(x, 10)", "(Log(x) * Log(10)^-1)")]
    [InlineData("Log10(x)", "(Log(x) * Log(10)^-1)")]
    [InlineData("Log2(x)", "(Log(x) * Log(2)^-1)")]
    [InlineData("double.LogP1(x)", "Log((1 + x))")]
    [InlineData("Exp(x)", "Exp(x)")]
    [InlineData("Pow(x, 2)", "x^2")]
    [InlineData("Sqrt(x)", "x^1/2")]
    [InlineData("Cbrt(x)", "(Sign(x) * Abs(x)^1/3)")]
    [InlineData("Cos(x) + Sin(x)", "(Cos(x) + Sin(x))")]
    [InlineData("Tan(x)", "(Sin(x) * Cos(x)^-1)")]
    [InlineData("Sinh(x)", "(1/2 * (Exp(x) + (-1 * Exp((-1 * x)))))")]
    [InlineData("Cosh(x)", "(1/2 * (Exp(x) + Exp((-1 * x))))")]
    [InlineData("Tanh(x)", "(1 + (-1 * (2 * (1 + Exp((2 * x)))^-1)))")]
    [InlineData("Min(x, Max(x, 2))", "Min(x, Max(x, 2))")]
    [InlineData("Clamp(x, 1, 2)", "Min(Max(x, 1), 2)")]
    [InlineData("Floor(x)", "Floor(x)")]
    [InlineData("Ceiling(x)", "(-1 * Floor((-1 * x)))")]
    [InlineData("Truncate(x)", "if((x < 0), (-1 * Floor((-1 * x))), Floor(x))")]
    [InlineData("Sign(x)", "Sign(x)")]
    [InlineData("GammaLn(x)", "LogGamma(x)")]
    [InlineData("Gamma(x)", "Exp(LogGamma(x))")]
    [InlineData("DiGamma(x)", "Digamma(x)")]
    [InlineData("BetaLn(x, 2)", "(LogGamma(x) + LogGamma(2) + (-1 * LogGamma((x + 2))))")]
    [InlineData("Logistic(x)", "(1 * (1 + Exp((-1 * x)))^-1)")]
    [InlineData("Logit(x)", "(Log(x) + (-1 * Log((1 + (-1 * x)))))")]
    [InlineData("FusedMultiplyAdd(x, 2, 3)", "((x * 2) + 3)")]
    public void Functions(string body, string formula) => Assert.Equal(formula, DeclaredSource.Formula(body));

    [Theory]
    [InlineData("FactorialLn(x)", "LogGamma((x + 1))")]
    [InlineData("Factorial(x)", "Exp(LogGamma((x + 1)))")]
    [InlineData("BinomialLn(x, 2)", "(LogGamma((x + 1)) + (-1 * LogGamma((2 + 1))) + (-1 * LogGamma(((x + (-1 * 2)) + 1))))")]
    public void FunctionsOfCounts(string body, string formula) => Assert.Equal(formula, DeclaredSource.Formula(body, "int"));

    [Theory]
    [InlineData("Atan(x)", "«global::System.Math.@Atan(x)»")]
    [InlineData("Round(x)", "«global::System.Math.@Round(x)»")]
    [InlineData("Erf(2 * x)", "«global::MathNet.Numerics.SpecialFunctions.@Erf((2 * x))»")]
    [InlineData("Round(x, 2)", "«global::System.Math.@Round(x, (int)(2))»")]
    [InlineData("MathF.Log((float)x)", "«(double)global::System.MathF.@Log((float)(«(double)(float)(x)»))»")]
    [InlineData("double.IsSubnormal(x) ? 1 : 0", "if((«(double.@IsSubnormal(x) ? 1.0 : 0.0)» = 1), 1, 0)")]
    public void OpaqueFunctions(string body, string formula) => Assert.Equal(formula, DeclaredSource.Formula(body));

    [Fact]
    public void NamedAndReorderedArguments() => Assert.Equal("x^2", DeclaredSource.Formula("Pow(y: 2, x: x)"));
}
