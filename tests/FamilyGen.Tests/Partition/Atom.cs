using System;
using FamilyGen.Kernels;
using FamilyGen.Special;

namespace FamilyGen.Tests.Partition;

/// <summary>A function of the observation as a kernel writes it down, for families put together in tests.</summary>
internal abstract class Atom
{
    /// <summary>The function.</summary>
    public abstract double Value(in Point x);

    /// <summary>What rounding took from the value.</summary>
    public virtual double Remainder(in Point x) => 0;

    /// <summary>The slope at m.</summary>
    public virtual double Slope(in Point m) => 0;

    /// <summary>f(x) − f(m) − slope·(x − m).</summary>
    public virtual double Residual(in Point m, in Point x) => Value(x) - Value(m);

    /// <summary>The derivative.</summary>
    public virtual TNumber Derivative<TNumber>(TNumber x, in Point piece)
        where TNumber : struct, IArithmetic<TNumber> => 0;
}

/// <summary>xⁿ on the line.</summary>
internal sealed class Monomial(int n) : Atom
{
    public override double Value(in Point x) => n switch
    {
        1 => x.X,
        2 => x.X * x.X,
        3 => x.X * x.X * x.X,
        _ => Math.Pow(x.X, n),
    };

    public override double Remainder(in Point x) => n == 2 ? Math.FusedMultiplyAdd(x.X, x.X, -(x.X * x.X)) : 0;

    public override double Slope(in Point m) => n * Math.Pow(m.X, n - 1);

    public override double Residual(in Point m, in Point x) => n == 1 ? 0 : FamilyGen.Kernels.Residual.Power(m.X, x.Displacement, n);

    public override TNumber Derivative<TNumber>(TNumber x, in Point piece) => n == 1 ? 1 : (TNumber)n * TNumber.Pow(x, n - 1);
}

/// <summary>log x above a lower end at 0.</summary>
internal sealed class LogAboveZero : Atom
{
    public override double Value(in Point x) => x.LogAboveLower;

    public override double Slope(in Point m) => Math.Exp(-m.LogAboveLower);

    public override double Residual(in Point m, in Point x) => FamilyGen.Kernels.Residual.LogAtEnd(x.RatioToLower);

    public override TNumber Derivative<TNumber>(TNumber x, in Point piece) => (TNumber)1 / x;
}

/// <summary>log² x above a lower end at 0.</summary>
internal sealed class LogSquareAboveZero : Atom
{
    public override double Value(in Point x) => x.LogAboveLower * x.LogAboveLower;

    public override double Slope(in Point m) => 2 * m.LogAboveLower * Math.Exp(-m.LogAboveLower);

    public override double Residual(in Point m, in Point x) => FamilyGen.Kernels.Residual.LogPowerAtEnd(m.LogAboveLower, x.RatioToLower, 2);

    public override TNumber Derivative<TNumber>(TNumber x, in Point piece) => (TNumber)2 * TNumber.Log(x) / x;
}

/// <summary>1/x above a lower end at 0.</summary>
internal sealed class InverseAboveZero : Atom
{
    public override double Value(in Point x) => 1 / x.X;

    public override double Slope(in Point m) => -1 / (m.X * m.X);

    public override double Residual(in Point m, in Point x) => FamilyGen.Kernels.Residual.PowerAtEnd(m.X, x.RatioToLower, -1);

    public override TNumber Derivative<TNumber>(TNumber x, in Point piece) => (TNumber)(-1) / (x * x);
}

/// <summary>log(1 − x) below an upper end at 1.</summary>
internal sealed class LogBelowOne : Atom
{
    public override double Value(in Point x) => x.LogBelowUpper;

    public override double Slope(in Point m) => -Math.Exp(-m.LogBelowUpper);

    public override double Residual(in Point m, in Point x) => FamilyGen.Kernels.Residual.LogAtEnd(x.RatioToUpper);

    public override TNumber Derivative<TNumber>(TNumber x, in Point piece) => (TNumber)(-1) / ((TNumber)1 - x);
}

/// <summary>log x away from its singularity.</summary>
internal sealed class LogInside : Atom
{
    public override double Value(in Point x) => Math.Log(x.X);

    public override double Slope(in Point m) => 1 / m.X;

    public override double Residual(in Point m, in Point x) => FamilyGen.Kernels.Residual.Log(m.X, x.Displacement);

    public override TNumber Derivative<TNumber>(TNumber x, in Point piece) => (TNumber)1 / x;
}

/// <summary>cos kx or sin kx.</summary>
internal sealed class Wave(bool isCosine, double k) : Atom
{
    public override double Value(in Point x) => isCosine ? Math.Cos(k * x.X) : Math.Sin(k * x.X);

    public override double Slope(in Point m) => isCosine ? -k * Math.Sin(k * m.X) : k * Math.Cos(k * m.X);

    public override double Residual(in Point m, in Point x) => isCosine
        ? FamilyGen.Kernels.Residual.Cos(k * m.X, k * x.Displacement)
        : FamilyGen.Kernels.Residual.Sin(k * m.X, k * x.Displacement);

    public override TNumber Derivative<TNumber>(TNumber x, in Point piece) => isCosine
        ? (TNumber)(-k) * TNumber.Sin((TNumber)k * x)
        : (TNumber)k * TNumber.Cos((TNumber)k * x);
}

/// <summary>factor · log Γ(x + shift).</summary>
internal sealed class LogGammaOf(double factor, double shift) : Atom
{
    public override double Value(in Point x) => factor * LogGamma.Value(x.X + shift);

    public override double Slope(in Point m) => factor * Digamma.Value(m.X + shift);

    public override double Residual(in Point m, in Point x) => factor * FamilyGen.Kernels.Residual.LogGamma(m.X + shift, x.Displacement);

    public override TNumber Derivative<TNumber>(TNumber x, in Point piece) => (TNumber)factor * TNumber.Digamma(x + shift);
}

/// <summary>log Γ(x + first + shift) − log Γ(x + first).</summary>
internal sealed class LogGammaRatioOf(double first, double shift) : Atom
{
    public override double Value(in Point x) => LogGammaRatio.Value(x.X + first, shift);

    public override double Slope(in Point m) => LogGammaRatio.Derivative(m.X + first, shift);

    public override double Residual(in Point m, in Point x) => FamilyGen.Kernels.Residual.LogGammaRatio(m.X + first, shift, x.Displacement);

    public override TNumber Derivative<TNumber>(TNumber x, in Point piece) =>
        TNumber.DigammaDifference(x + first, shift);
}

/// <summary>A condition on the observation: 1 where it holds.</summary>
internal sealed class Indicator(Func<Point, bool> holds) : Atom
{
    public override double Value(in Point x) => holds(x) ? 1 : 0;
}

/// <summary>log of a binomial coefficient.</summary>
internal sealed class LogBinomial(double n) : Atom
{
    public override double Value(in Point x) => LogGamma.Value(n + 1) - LogGamma.Value(x.X + 1) - LogGamma.Value(n - x.X + 1);

    public override double Slope(in Point m) => Digamma.Value(n - m.X + 1) - Digamma.Value(m.X + 1);

    public override double Residual(in Point m, in Point x) =>
        -FamilyGen.Kernels.Residual.LogGamma(m.X + 1, x.Displacement) - FamilyGen.Kernels.Residual.LogGamma(n - m.X + 1, -x.Displacement);

    public override TNumber Derivative<TNumber>(TNumber x, in Point piece) =>
        TNumber.Digamma((TNumber)(n + 1) - x) - TNumber.Digamma(x + 1);
}

/// <summary>Several functions as one.</summary>
internal sealed class SumOf(double constant, params (double Factor, Atom Atom)[] terms) : Atom
{
    public override double Value(in Point x)
    {
        var sum = constant;
        foreach (var (factor, atom) in terms)
            sum += factor * atom.Value(x);
        return sum;
    }

    public override double Slope(in Point m)
    {
        var sum = 0.0;
        foreach (var (factor, atom) in terms)
            sum += factor * atom.Slope(m);
        return sum;
    }

    public override double Residual(in Point m, in Point x)
    {
        var sum = 0.0;
        foreach (var (factor, atom) in terms)
            sum += factor * atom.Residual(m, x);
        return sum;
    }

    public override TNumber Derivative<TNumber>(TNumber x, in Point piece)
    {
        TNumber sum = 0;
        foreach (var (factor, atom) in terms)
            sum += (TNumber)factor * atom.Derivative(x, piece);
        return sum;
    }
}

/// <summary>A function that cannot be read: plain values, no slope, no derivative.</summary>
internal sealed class Opaque(Func<double, double> function) : Atom
{
    public override double Value(in Point x) => function(x.X);

    public override TNumber Derivative<TNumber>(TNumber x, in Point piece) => TNumber.Unknown;
}
