using System;
using Xunit;

namespace FamilyGen.Generator.Tests.Verdicts;

/// <summary>Declarations and the ids, errors and warnings, that they must get: "" for a family.</summary>
internal static class DeclarationTable
{
    private const string Counts = "[Support] static CountRange Range => CountRange.From(0); ";
    private const string Integers = "[Support] static CountRange Range => CountRange.AllIntegers; ";
    private const string Line = "[Support] static Interval Range => Interval.RealLine; ";
    private const string Positive = "[Support] static Interval Range => Interval.Above(0); ";
    private const string Unit = "[Support] static Interval Range => Interval.Between(0, 1); ";
    private const string Bell = "[LogBaseMeasure] static double Bell(double x) => -x * x; ";
    private const string Hours = "[SufficientStatistic] static double Hours(double x) => x; ";
    private const string Total = "[SufficientStatistic] static double Total(int x) => x; ";
    private const string LogHours = "[SufficientStatistic] static double LogHours(double x) => Log(x); ";

    /// <summary>The declarations whose verdicts were agreed on from outside, by their number there, in one form or in both.</summary>
    public static TheoryData<string, string, string> Agreed => new()
    {
        { "V1", "FG0101", "[Support] static Interval Range(double t) => Interval.Between(0, t); " + Hours },
        { "V2", "FG0101", "[Support] static Interval Range(double t) => Interval.Above(t).IncludingLower(); [LogKernel] static double Kernel(double x, double rate, double t) => -rate * (x - t);" },
        { "V2", "FG0101", Line + "[LogKernel] static double Kernel(double x, double rate, double t) => x >= t ? -rate * (x - t) : double.NegativeInfinity;" },
        { "V3", "FG0501", Line + "[LogKernel] static double Kernel(double x, double nu) => -(nu + 1) / 2 * Log(1 + x * x / nu);" },
        { "V4", "FG0501", Line + "[LogKernel] static double Kernel(double x, double m) => -Log(1 + (x - m) * (x - m));" },
        { "V5", "FG0501", Line + "[LogKernel] static double Kernel(double x, double m) => -Abs(x - m);" },
        { "V6", "FG0204", "[Support] static CountRange Range => CountRange.Between(0, 1); " + Total + "[SufficientStatistic] static double Square(int x) => x * x;" },
        { "V6", "FG0204", "[Support] static CountRange Range => CountRange.Between(0, 1); [LogKernel] static double Kernel(int x, double a, double b) => a * x + b * x * x;" },
        { "V7", "FG0204", "[Support] static CountRange Range => CountRange.Between(0, 3); " + Indicators(0, 1, 2, 3) },
        { "V8", "FG0204", Positive + LogHours + "[SufficientStatistic] static double Twice(double x) => Log(2 * x); [LogBaseMeasure] static double Weight(double x) => -x;" },
        { "V9", "FG0204", Counts + Total + "[SufficientStatistic] static double Tripled(int x) => 3 * x + 1; [LogBaseMeasure] static double Weight(int x) => -FactorialLn(x);" },
        { "V10", "FG0204", "[Support] static CountRange Range => CountRange.Between(-1, 1); [Support] static bool Allowed(int x) => x != 0; [SufficientStatistic] static double Square(int x) => x * x;" },
        { "V11", "FG0203", Line + LogHours + Hours },
        { "V11", "FG0203", Line + "[LogKernel] static double Kernel(double x, double shape, double rate) => shape * Log(x) - rate * x;" },
        { "V12", "FG0203", "[Support] static Interval Range => Interval.Between(-1, 1).IncludingLower().IncludingUpper(); [SufficientStatistic] static double Inverse(double x) => 1 / x;" },
        { "V13", "FG0401", Positive + LogHours },
        { "V13", "FG0401", Positive + "[LogKernel] static double Kernel(double x, double a) => a * Log(x);" },
        { "V14", "FG0401", Integers + Total },
        { "V15", "FG0301", Unit + Hours + "[BaseMeasure] static double Weight(double x) => x - 0.5;" },
        { "V16", "FG0201", Positive + "[SufficientStatistic] static double Shifted(double x, double theta) => Log(1 + theta * x); [LogBaseMeasure] static double Weight(double x) => -x;" },
        { "V17", "", Positive + "[LogKernel] static double Kernel(double x, double s) => Log(x) - x * x / s;" },
        { "V17", "", Positive + "[SufficientStatistic] static double Square(double x) => -x * x; [LogBaseMeasure] static double Weight(double x) => Log(x);" },
        { "V18", "", "[Support] static CountRange Range => CountRange.Between(0, 2); " + Total + "[SufficientStatistic] static double Square(int x) => x * x;" },
        { "V19", "", "[Support] static Interval Range => Interval.Above(1).IncludingLower(); " + LogHours },
        { "V20", "", Integers + Total + "[SufficientStatistic] static double Square(int x) => (double)x * x;" },
        { "V20", "", Integers + "[LogKernel] static double Kernel(int x, double a, double b) => a * x - b * x * (double)x;" },
        { "V21", "", Line + Hours + "[LogBaseMeasure] static double Weight(double x) => -Abs(x);" },
        { "V22", "", Line + "[SufficientStatistic] static double Away(double x) => Abs(x - 3);" },
        { "V22", "", Line + "[LogKernel] static double Kernel(double x, double rate) => -rate * Abs(x - 3);" },
        { "V23", "", Unit + Hours + "[BaseMeasure] static double Weight(double x) => x > 0.5 ? 1 : 0;" },
        { "V24", "", Counts + Total + "[LogBaseMeasure] static double Weight(int x) => GammaLn(x + 2.5) - GammaLn(2.5) - FactorialLn(x);" },
        { "V25", "", Line + "[LogKernel] static double Kernel(double x, double a) => Log(a * Exp(-x) * Pow(1 + Exp(-x), -a - 1));" },
        { "V25", "", Line + "[SufficientStatistic] static double Bent(double x) => -Log(1 + Exp(-x)); [LogBaseMeasure] static double Weight(double x) => -x - Log(1 + Exp(-x));" },
        { "V26", "", Positive + LogHours + Hours + "[SufficientStatistic] static double Inverse(double x) => 1 / x;" },
    };

    /// <summary>Formulas that are finite, or are not, where observations can occur.</summary>
    public static TheoryData<string, string> Finiteness => new()
    {
        { "FG0203", "[Support] static Interval Range => Interval.Above(0).IncludingLower(); " + LogHours + Hours },
        { "", Positive + LogHours + Hours },
        { "FG0203", "[Support] static Interval Range => Interval.Above(0).WithMassAt(0); " + LogHours + Hours },
        { "", "[Support] static Interval Range => Interval.Above(0).WithMassAt(0); [SufficientStatistic] static double LogHours(double x) => x == 0 ? 0 : Log(x); [SufficientStatistic] static double Never(double x) => x == 0 ? 1 : 0; " + Hours },
        { "FG0203", Unit.Replace("(0, 1)", "(0, 1).IncludingUpper()") + LogHours + "[SufficientStatistic] static double Rest(double x) => Log(1 - x);" },
        { "", Unit + LogHours + "[SufficientStatistic] static double Rest(double x) => Log(1 - x);" },
        { "FG0203", "[Support] static CountRange Range([Known] int n) => CountRange.Between(0, n); [SufficientStatistic] static double LogCount(int x) => Log(x);" },
        { "FG0203", "[Support] static CountRange Range([Known] int n) => CountRange.Between(0, n); [SufficientStatistic] static double LogRest(int x, [Known] int n) => Log(n - x);" },
        { "", "[Support] static CountRange Range([Known] int n) => CountRange.Between(0, n); [SufficientStatistic] static double LogRest(int x, [Known] int n) => Log(n - x + 1);" },
        { "", "[Support] static CountRange Range([Known] int n) => CountRange.Between(1, n); [SufficientStatistic] static double LogCount(int x) => Log(x);" },
        { "", "[Support] static Interval Range([Known] double low) => Interval.Above(low); [LogKernel] static double Kernel(double x, double tail, [Known] double low) => tail * Log(low) - (tail + 1) * Log(x);" },
        { "", "[Support] static Interval Range([Known] double low) => Interval.Above(low); [LogKernel] static double Kernel(double x, double shape, double rate, [Known] double low) => (shape - 1) * Log(x - low) - rate * (x - low);" },
        { "FG0203", "[Support] static Interval Range => Interval.Between(0, 10); [SufficientStatistic] static double Slope(double x) => Tan(x);" },
        { "", "[Support] static Interval Range => Interval.Between(0, 1.5); [SufficientStatistic] static double Slope(double x) => Tan(x);" },
        { "FG0203", "[Support] static Interval Range => Interval.Between(0, 2); [SufficientStatistic] static double Pole(double x) => 1 / (x * x - 2);" },
        { "", Unit + "[SufficientStatistic] static double NoPole(double x) => 1 / (x * x - 2);" },
        { "", Line + "[SufficientStatistic] static double NoPole(double x) => 1 / (x * x + 1); " + Bell },
        { "FG0203", Line + "[SufficientStatistic] static double Root(double x) => Sqrt(x); " + Bell },
        { "", Line + "[SufficientStatistic] static double Root(double x) => Sqrt(Abs(x)); " + Bell },
        { "FG0203", Line + "[SufficientStatistic] static double LogSize(double x) => Log(Abs(x)); " + Bell },
        { "", Line + "[SufficientStatistic] static double LogSize(double x) => Log(Abs(x)); [BaseMeasure] static double Weight(double x) => x == 0 ? 0 : Exp(-x * x);" },
        { "FG0203", Counts + "[SufficientStatistic] static double Pole(int x) => GammaLn(x); " + Total },
        { "", Counts + "[SufficientStatistic] static double NoPole(int x) => GammaLn(x + 0.5); " + Total },
        { "FG0203", Counts + "[SufficientStatistic] static double Share(int x) => 12.0 / x; " + Total },
        { "", Counts + "[SufficientStatistic] static double Share(int x) => x == 0 ? 0 : 12.0 / x; " + Total },
        { "", Counts + "[SufficientStatistic] static double LogCount(int x) => Log(x); [BaseMeasure] static double Weight(int x) => x == 0 ? 0 : 1; " + Total },
        { "", Counts + "[Support] static bool Allowed(int x) => x % 2 == 1; [SufficientStatistic] static double LogCount(int x) => Log(x); " + Total },
        { "FG0203", Counts + "[Support] static bool Allowed(int x) => x % 2 == 1; [SufficientStatistic] static double LogCount(int x) => Log(x - 2); " + Total },
        { "FG0203", Positive + Hours + "[LogBaseMeasure] static double Weight(double x) => Log(x - 1);" },
        { "", Positive + Hours + "[BaseMeasure] static double Weight(double x) => Max(0, x - 1);" },
        { "", "[Support] static Interval Range => Interval.Above(0).IncludingLower(); [LogKernel] static double Kernel(double x, double rate) => Log(x) - rate * x;" },
    };

    /// <summary>Statistics that are, or are not, affinely dependent.</summary>
    public static TheoryData<string, string> Dependence => new()
    {
        { "FG0204", "[Support] static CountRange Range => CountRange.Between(0, 2); " + Indicators(0, 1, 2) },
        { "", "[Support] static CountRange Range => CountRange.Between(0, 3); " + Indicators(0, 1, 2) },
        { "FG0204", "[Support] static CountRange Range => CountRange.Between(0, 3); " + Indicators(0, 1, 2) + "[BaseMeasure] static double Weight(int x) => x == 3 ? 0 : 1;" },
        { "FG0204", "[Support] static Interval Range => Interval.Circle(6); [SufficientStatistic] static double A(double x) => Cos(x) * Cos(x); [SufficientStatistic] static double B(double x) => Sin(x) * Sin(x);" },
        { "FG0204", "[Support] static Interval Range => Interval.Circle(6); [SufficientStatistic] static double A(double x) => Cos(2 * x); [SufficientStatistic] static double B(double x) => Pow(Sin(x), 2);" },
        { "", "[Support] static Interval Range => Interval.Circle(6); [SufficientStatistic] static double A(double x) => Cos(2 * x); [SufficientStatistic] static double B(double x) => Sin(x) * Cos(x);" },
        { "FG0204", Line + "[SufficientStatistic] static double A(double x) => Min(x, 5); [SufficientStatistic] static double B(double x) => Max(x, 5); " + Hours + Bell },
        { "", Line + "[SufficientStatistic] static double A(double x) => Min(x, 5); [SufficientStatistic] static double B(double x) => Max(x, 6); " + Hours + Bell },
        { "FG0204", Line + "[SufficientStatistic] static double A(double x) => Max(x, 0); [SufficientStatistic] static double B(double x) => Max(-x, 0); [SufficientStatistic] static double C(double x) => Abs(x);" },
        { "", Line + "[SufficientStatistic] static double A(double x) => Max(x, 0); [SufficientStatistic] static double B(double x) => Max(-x, 0);" },
        { "FG0204", "[Support] static Interval Range => Interval.Above(1); [SufficientStatistic] static double A(double x) => Log(x * x - 1); [SufficientStatistic] static double B(double x) => Log(x - 1); [SufficientStatistic] static double C(double x) => Log(x + 1);" },
        { "FG0204", "[Support] static CountRange Range => CountRange.From(1); [SufficientStatistic] static double A(int x) => FactorialLn(x); [SufficientStatistic] static double B(int x) => GammaLn(x); [SufficientStatistic] static double C(int x) => Log(x); " + Total },
        { "", "[Support] static CountRange Range => CountRange.From(1); [SufficientStatistic] static double A(int x) => FactorialLn(x); [SufficientStatistic] static double C(int x) => Log(x); " + Total },
        { "FG0204", Counts + "[SufficientStatistic] static double Wave(int x) => Sin(PI * x); " + Total },
        { "", Counts + "[SufficientStatistic] static double Wave(int x) => Cos(PI * x); " + Total },
        { "FG0204", Counts + "[SufficientStatistic] static double Odd(int x) => x % 2; [SufficientStatistic] static double Even(int x) => x % 2 == 0 ? 1 : 0; " + Total },
        { "", Counts + "[SufficientStatistic] static double Third(int x) => x % 3 == 0 ? 1 : 0; [SufficientStatistic] static double Even(int x) => x % 2 == 0 ? 1 : 0; " + Total },
        { "FG0204", Counts + "[SufficientStatistic] static double Dozens(int x) => Floor(x / 12.0); [SufficientStatistic] static double Loose(int x) => x % 12; " + Total },
        { "FG0204", Counts + "[SufficientStatistic] static double Few(int x, [Known] int n) => x < n ? 1 : 0; [SufficientStatistic] static double Many(int x, [Known] int n) => x >= n ? 1 : 0; " + Total },
        { "", Counts + "[SufficientStatistic] static double Full(int x, [Known] int n) => x % n == 0 ? 1 : 0; " + Total },
        { "FG0204", Counts + "[SufficientStatistic] static double Scaled(int x, [Known] double unit) => unit * x; " + Total },
        { "FG0204", "[Support] static CountRange Range => CountRange.Between(1, 3); [SufficientStatistic] static double A(int x) => Log(x); [SufficientStatistic] static double B(int x) => x * x; " + Total },
        { "", "[Support] static CountRange Range => CountRange.Between(1, 4); [SufficientStatistic] static double A(int x) => Log(x); [SufficientStatistic] static double B(int x) => x * x; " + Total },
        { "FG0204", Positive + Hours + "[SufficientStatistic] static double Zero(double x) => x == 0 ? 1 : 0;" },
        { "", "[Support] static Interval Range => Interval.Above(0).WithMassAt(0); " + Hours + "[SufficientStatistic] static double Zero(double x) => x == 0 ? 1 : 0;" },
        { "", Counts + Total + "[SufficientStatistic] static double Far(int x) => x == 5000 ? 1 : 0;" },
        { "", "[Support] static Interval Range => Interval.Between(100000000, 100000001); " + Hours + "[SufficientStatistic] static double Square(double x) => x * x;" },
        { "", "[Support] static Interval Range => Interval.Between(100000000, 100000001); " + Hours + LogHours },
        { "FG0204", Line + Hours + "[SufficientStatistic] static double A(double x) => Log(1 + Exp(x)); [SufficientStatistic] static double B(double x) => Log(1 + Exp(-x)); " + Bell },
        { "FG0204", Unit + "[SufficientStatistic] static double A(double x) => x > 0.5 ? x : 0.5; [BaseMeasure] static double Weight(double x) => x < 0.5 ? 1 : 0;" },
    };

    /// <summary>Measures that are negative, or leave nothing, somewhere or nowhere.</summary>
    public static TheoryData<string, string> Measures => new()
    {
        { "FG0301", Line + Hours.Replace("=> x", "=> -x * x") + "[BaseMeasure] static double Weight(double x) => Sin(x);" },
        { "", "[Support] static Interval Range => Interval.Between(0, PI); " + Hours + "[BaseMeasure] static double Weight(double x) => Sin(x);" },
        { "FG0301", Counts + Total + "[BaseMeasure] static double Weight(int x) => x - 3;" },
        { "", "[Support] static CountRange Range => CountRange.From(3); " + Total + "[BaseMeasure] static double Weight(int x) => x - 3;" },
        { "FG0301", Unit + Hours + "[BaseMeasure] static double Weight(double x) => x > 5 ? 1 : 0;" },
        { "FG0301", Unit + Hours + "[BaseMeasure] static double Weight(double x) => x == 0.25 ? 1 : 0;" },
        { "FG0301", Counts + Total + "[BaseMeasure] static double Weight(int x) => 0;" },
        { "", Counts + Total + "[BaseMeasure] static double Weight(int x) => x == 2 || x == 5 ? 1 : 0;" },
        { "FG0301", "[Support] static Interval Range => Interval.Above(6); [LogKernel] static double Kernel(double x, double rate) => x > 5 ? double.NegativeInfinity : -rate * x;" },
        { "", Positive + "[LogKernel] static double Kernel(double x, double rate) => x < 5 ? double.NegativeInfinity : -rate * x;" },
        { "FG0301", Unit + Hours + "[BaseMeasure] static double Weight(double x) => -1;" },
    };

    /// <summary>Natural sets of all kinds.</summary>
    public static TheoryData<string, string> NaturalSets => new()
    {
        { "FG0401", Line + "[SufficientStatistic] static double Wave(double x) => Sin(x);" },
        { "", "[Support] static Interval Range => Interval.Circle(24); [SufficientStatistic] static double Wave(double x) => Sin(PI * x / 12);" },
        { "FG0401", Line + Hours + "[LogBaseMeasure] static double Weight(double x) => x * x;" },
        { "FG0401", Counts + Total + "[LogBaseMeasure] static double Weight(int x) => FactorialLn(x);" },
        { "", Counts + Total + "[LogBaseMeasure] static double Weight(int x) => FactorialLn(2 * x) - 2 * FactorialLn(x);" },
        { "FG0401", "[Support] static CountRange Range => CountRange.From(1); [SufficientStatistic] static double Inverse(int x) => 1.0 / x; [LogBaseMeasure] static double Weight(int x) => -Log(x);" },
        { "", "[Support] static CountRange Range => CountRange.From(1); [SufficientStatistic] static double Inverse(int x) => 1.0 / x; [LogBaseMeasure] static double Weight(int x) => -2 * Log(x);" },
        { "FG0401", Unit + Hours + "[LogBaseMeasure] static double Weight(double x) => -2 * Log(x);" },
        { "", Unit + LogHours + "[LogBaseMeasure] static double Weight(double x) => -2 * Log(x);" },
        { "FG0401", Positive + "[LogKernel] static double Kernel(double x, double a) => Exp(a) * x;" },
        { "", Positive + "[LogKernel] static double Kernel(double x, double a) => -Exp(a) * x;" },
        { "FG0401", "[Support] static CountRange Range => CountRange.From(2); [SufficientStatistic] static double Inverse(int x) => 1.0 / x; [LogBaseMeasure] static double Weight(int x) => -Log(x) - Log(Log(x));" },
        { "FG0406", Line + Hours + "[SufficientStatistic] static double Square(double x) => x * x; [SufficientStatistic] static double Cubic(double x) => x * x * x;" },
        { "FG0406", Line + "[LogKernel] static double Kernel(double x, double a, double b, double c) => a * x - b * x * x + c * x * x * x;" },
        { "", Positive + Hours + "[SufficientStatistic] static double Square(double x) => x * x; [SufficientStatistic] static double Cubic(double x) => x * x * x;" },
        { "", Line + Hours + "[SufficientStatistic] static double Square(double x) => x * x; [SufficientStatistic] static double Quartic(double x) => Pow(x, 4);" },
        { "FG0406", Line + "[SufficientStatistic] static double Inverse(double x) => x == 0 ? 0 : 1 / x; " + Bell },
        { "", Line + "[SufficientStatistic] static double Inverse(double x) => x == 0 ? 0 : 1 / (x * x); " + Bell },
        { "FG0406", Line + "[SufficientStatistic] static double Steep(double x) => Sinh(x); [SufficientStatistic] static double Square(double x) => x * x;" },
        { "", Line + "[SufficientStatistic] static double Steep(double x) => Cosh(x); [SufficientStatistic] static double Square(double x) => x * x;" },
        { "FG0406", Integers + Total + "[LogBaseMeasure] static double Weight(int x) => -2 * Log(1 + Abs(x));" },
        { "", Integers + Total + "[LogBaseMeasure] static double Weight(int x) => -2 * Abs(x);" },
        { "FG0403", Line + "[SufficientStatistic] static double Wild(double x) => x * Cos(x); " + Bell },
        { "", Line + "[SufficientStatistic] static double Tame(double x) => Cos(x); " + Bell },
        { "", Line + "[SufficientStatistic] static double Tame(double x) => Log(2 + Sin(x)); " + Bell },
        { "FG0403", Line + "[SufficientStatistic] static double Outside(double x) => MathNet.Numerics.Distributions.Normal.PDF(0, 1, x); " + Bell },
        { "FG0403", Counts + "[Support] static bool Square(int x) => Floor(Sqrt(x)) * Floor(Sqrt(x)) == x; " + Total },
        { "", Counts + "[Support] static bool Even(int x) => x % 2 == 0; " + Total },
        { "FG0403", Line + "[SufficientStatistic] static double Striped(double x) => Floor(x) % 2 == 0 ? 1 : 0; [SufficientStatistic] static double Square(double x) => -x * x;" },
        { "", Counts + "[SufficientStatistic] static double Striped(int x) => x % 2 == 0 ? 1 : 0; " + Total },
        { "", "[Support] static CountRange Range([Known] int n) => CountRange.Between(0, n); [LogKernel] static double Kernel(int x, double p, [Known] int n) => BinomialLn(n, x) + x * Log(p / (1 - p)) + n * Log(1 - p);" },
    };

    /// <summary>Integer arithmetic, harmless or not.</summary>
    public static TheoryData<string, string> Integer => new()
    {
        { "FG0205", Counts + "[SufficientStatistic] static double Half(int x) => x / 2;" },
        { "", Counts + "[SufficientStatistic] static double Half(int x) => x / 2.0;" },
        { "", Counts + "[SufficientStatistic] static double Half(int x) => Floor(x / 2.0);" },
        { "FG0205", Counts + "[SufficientStatistic] static double Half(int x) => 1 / 2 * x + x;" },
        { "", Counts + "[SufficientStatistic] static double Half(int x) => 4 / 2 * x;" },
        { "FG0205", Counts + "[SufficientStatistic] static double Square(int x) => -x * x;" },
        { "FG0205", Counts + "[SufficientStatistic] static double Cube(int x) => -x * x * x;" },
        { "", "[Support] static CountRange Range => CountRange.Between(0, 100); [SufficientStatistic] static double Square(int x) => x * x;" },
        { "", Counts + "[SufficientStatistic] static double Square(long x) => -x * x;" },
        { "", "[Support] static CountRange Range => CountRange.Between(0, 100); [SufficientStatistic] static double Pairs(int x) => x * (x - 1) / 2;" },
        { "", Counts + "[SufficientStatistic] static double Third(int x) => x / 12 == 3 ? 1 : 0; " + Total },
        { "", Counts + "[SufficientStatistic] static double Doubled(int x) => x * 2 + 1;" },
        { "FG0205", Counts + "[SufficientStatistic] static double Cut(int x) => (int)(x / 2.0);" },
        { "", Counts + "[SufficientStatistic] static double Whole(int x) => (int)Floor(x / 2.0);" },
        { "FG0205", Counts + "[SufficientStatistic] static double Half(int x) { var half = x; half /= 2; return half; }" },
        { "FG0205", Counts + "[LogKernel] static double Kernel(int x, double rate) => -rate * x + Log(1 + x / 3);" },
        { "FG0205", Counts + "[LogKernel] static double Kernel(int x, double rate, [Known] int n) => -rate * x + Log(1 + Part(x, n)); static int Part(int x, int n) => x / n;" },
        { "", "const int Dozen = 24 / 2; [Support] static CountRange Range => CountRange.Between(0, Dozen / 5); " + Total },
    };

    private static string Indicators(params int[] values) => string.Concat(
        Array.ConvertAll(values, v => $"[SufficientStatistic] static double Is{v}(int x) => x == {v} ? 1 : 0; "));
}
