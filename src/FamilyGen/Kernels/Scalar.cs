using System;
using FamilyGen.Special;

namespace FamilyGen.Kernels;

/// <summary>A plain number.</summary>
/// <param name="Value">The number.</param>
public readonly record struct Scalar(double Value) : IArithmetic<Scalar>
{
    /// <inheritdoc/>
    public static Scalar Unknown => double.NaN;

    /// <inheritdoc/>
    public static implicit operator Scalar(double value) => new(value);

    /// <inheritdoc/>
    public static Scalar operator +(Scalar a, Scalar b) => a.Value + b.Value;

    /// <inheritdoc/>
    public static Scalar operator -(Scalar a, Scalar b) => a.Value - b.Value;

    /// <inheritdoc/>
    public static Scalar operator *(Scalar a, Scalar b) => a.Value * b.Value;

    /// <inheritdoc/>
    public static Scalar operator /(Scalar a, Scalar b) => a.Value / b.Value;

    /// <inheritdoc/>
    public static Scalar operator -(Scalar a) => -a.Value;

    /// <inheritdoc/>
    public static Scalar Exp(Scalar a) => Math.Exp(a.Value);

    /// <inheritdoc/>
    public static Scalar Log(Scalar a) => Math.Log(a.Value);

    /// <inheritdoc/>
    public static Scalar Pow(Scalar a, double b) => Math.Pow(a.Value, b);

    /// <inheritdoc/>
    public static Scalar Pow(Scalar a, Scalar b) => Math.Pow(a.Value, b.Value);

    /// <inheritdoc/>
    public static Scalar Sin(Scalar a) => Math.Sin(a.Value);

    /// <inheritdoc/>
    public static Scalar Cos(Scalar a) => Math.Cos(a.Value);

    /// <inheritdoc/>
    public static Scalar Abs(Scalar a) => Math.Abs(a.Value);

    /// <inheritdoc/>
    public static Scalar LogGamma(Scalar a) => Special.LogGamma.Value(a.Value);

    /// <inheritdoc/>
    public static Scalar Digamma(Scalar a) => Special.Digamma.Value(a.Value);

    /// <inheritdoc/>
    public static Scalar DigammaDifference(Scalar a, double shift) => LogGammaRatio.Derivative(a.Value, shift);
}
