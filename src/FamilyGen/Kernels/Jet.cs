using System;

namespace FamilyGen.Kernels;

/// <summary>A number with its first and second derivatives in p variables: forward differentiation to second order.
/// A constant carries no arrays.</summary>
public readonly struct Jet : IArithmetic<Jet>
{
    private readonly double[]? _gradient;
    private readonly double[]? _hessian;            // rows of the lower triangle, one after another

    private Jet(double value, double[]? gradient, double[]? hessian) =>
        (Value, _gradient, _hessian) = (value, gradient, hessian);

    /// <summary>The number itself.</summary>
    public double Value { get; }

    /// <summary>The variable with this index among <paramref name="count"/>.</summary>
    public static Jet Variable(double value, int index, int count)
    {
        var gradient = new double[count];
        gradient[index] = 1;
        return new(value, gradient, new double[count * (count + 1) / 2]);
    }

    /// <summary>One variable for each value.</summary>
    public static Jet[] Variables(ReadOnlySpan<double> values)
    {
        var result = new Jet[values.Length];
        for (var i = 0; i < result.Length; i++)
            result[i] = Variable(values[i], i, result.Length);
        return result;
    }

    /// <summary>The first derivative in variable i; 0 for a constant.</summary>
    public double Gradient(int i) => _gradient is null ? 0 : _gradient[i];

    /// <summary>The second derivative in variables i and j; 0 for a constant.</summary>
    public double Hessian(int i, int j) =>
        _hessian is null ? 0 : i >= j ? _hessian[(i * (i + 1) / 2) + j] : _hessian[(j * (j + 1) / 2) + i];

    /// <inheritdoc/>
    public static Jet Unknown => double.NaN;

    /// <inheritdoc/>
    public static implicit operator Jet(double value) => new(value, null, null);

    /// <inheritdoc/>
    public static Jet operator +(Jet a, Jet b) => Linear(a.Value + b.Value, 1, a, 1, b);

    /// <inheritdoc/>
    public static Jet operator -(Jet a, Jet b) => Linear(a.Value - b.Value, 1, a, -1, b);

    /// <inheritdoc/>
    public static Jet operator -(Jet a) => Compose(a, -a.Value, -1, 0);

    /// <inheritdoc/>
    public static Jet operator *(Jet a, Jet b)
    {
        var result = Linear(a.Value * b.Value, b.Value, a, a.Value, b);
        if (a._gradient is not null && b._gradient is not null)
        {
            var (count, at) = (a._gradient.Length, 0);
            for (var i = 0; i < count; i++)
                for (var j = 0; j <= i; j++)
                    result._hessian![at++] += (a._gradient[i] * b._gradient[j]) + (a._gradient[j] * b._gradient[i]);
        }

        return result;
    }

    /// <inheritdoc/>
    public static Jet operator /(Jet a, Jet b)
    {
        if (b._gradient is null)
            return Compose(a, a.Value / b.Value, 1 / b.Value, 0);
        var inverse = 1 / b.Value;
        var product = a * Compose(b, inverse, -inverse * inverse, 2 * inverse * inverse * inverse);
        return new(a.Value / b.Value, product._gradient, product._hessian);
    }

    /// <inheritdoc/>
    public static Jet Exp(Jet a)
    {
        var value = Math.Exp(a.Value);
        return Compose(a, value, value, value);
    }

    /// <inheritdoc/>
    public static Jet Log(Jet a)
    {
        var inverse = 1 / a.Value;
        return Compose(a, Math.Log(a.Value), inverse, -inverse * inverse);
    }

    /// <inheritdoc/>
    public static Jet Pow(Jet a, double b) => Compose(
        a,
        Math.Pow(a.Value, b),
        b == 0 ? 0 : b * Math.Pow(a.Value, b - 1),
        b is 0 or 1 ? 0 : b * (b - 1) * Math.Pow(a.Value, b - 2));

    /// <inheritdoc/>
    public static Jet Pow(Jet a, Jet b)
    {
        if (b._gradient is null)
            return Pow(a, b.Value);
        var power = Exp(b * Log(a));
        return new(Math.Pow(a.Value, b.Value), power._gradient, power._hessian);
    }

    /// <inheritdoc/>
    public static Jet Sin(Jet a)
    {
        var (sin, cos) = Math.SinCos(a.Value);
        return Compose(a, sin, cos, -sin);
    }

    /// <inheritdoc/>
    public static Jet Cos(Jet a)
    {
        var (sin, cos) = Math.SinCos(a.Value);
        return Compose(a, cos, -sin, -cos);
    }

    /// <inheritdoc/>
    public static Jet Abs(Jet a) =>
        Compose(a, Math.Abs(a.Value), double.IsNaN(a.Value) ? double.NaN : Math.Sign(a.Value), 0);

    /// <inheritdoc/>
    public static Jet LogGamma(Jet a) => Compose(
        a, Special.LogGamma.Value(a.Value), Special.Digamma.Value(a.Value), Special.Trigamma.Value(a.Value));

    /// <inheritdoc/>
    public static Jet Digamma(Jet a) => Compose(
        a, Special.Digamma.Value(a.Value), Special.Trigamma.Value(a.Value), Special.Tetragamma.Value(a.Value));

    // αa + βb, but for the value
    private static Jet Linear(double value, double alpha, Jet a, double beta, Jet b) =>
        new(value, Linear(alpha, a._gradient, beta, b._gradient), Linear(alpha, a._hessian, beta, b._hessian));

    private static double[]? Linear(double alpha, double[]? a, double beta, double[]? b)
    {
        if (a is null && b is null)
            return null;
        var result = new double[(a ?? b)!.Length];
        for (var i = 0; i < result.Length; i++)
            result[i] = (a is null ? 0 : alpha * a[i]) + (b is null ? 0 : beta * b[i]);
        return result;
    }

    // f(a) by the chain rule
    private static Jet Compose(Jet a, double value, double first, double second)
    {
        if (a._gradient is null)
            return value;
        var gradient = new double[a._gradient.Length];
        var hessian = new double[a._hessian!.Length];
        var at = 0;
        for (var i = 0; i < gradient.Length; i++)
        {
            gradient[i] = first * a._gradient[i];
            for (var j = 0; j <= i; j++, at++)
                hessian[at] = (first * a._hessian[at]) + (second * a._gradient[i] * a._gradient[j]);
        }

        return new(value, gradient, hessian);
    }
}
