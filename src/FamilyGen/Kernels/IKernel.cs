using System;

namespace FamilyGen.Kernels;

/// <summary>What a generated family tells the library about itself. The exponent at parameters θ is
/// Σⱼ θⱼTⱼ(x) + log h(x), j = 0 … Count − 1; in every span of length Count + 1 the last entry belongs to log h, whose
/// coefficient is 1. Known values are fields of the implementing struct.</summary>
/// <remarks>Every function is evaluated about a reference point m as
/// f(x) = level + slope·(x − m) + residual, where the residual is written so that it does not cancel:
/// this is what keeps a normal law with mean 1e8 exact. A function without a smooth closed expression may have slope 0
/// and leave its whole difference f(x) − f(m) in the residual.</remarks>
public interface IKernel
{
    /// <summary>The number of sufficient statistics.</summary>
    static abstract int Count { get; }

    /// <summary>The names of the natural parameters, in declared order.</summary>
    static abstract ReadOnlySpan<string> NaturalNames { get; }

    /// <summary>The support, its pieces and its periodicity.</summary>
    Domain Domain { get; }

    /// <summary>The set of natural parameters, and which moments are finite.</summary>
    NaturalSet NaturalSet { get; }

    /// <summary>The values T₀(x) … T_{Count−1}(x), log h(x), each as an unevaluated sum value + remainder: the remainder
    /// holds what rounding took from an exact product such as x², and is 0 elsewhere.</summary>
    void Evaluate(in Point x, Span<double> value, Span<double> remainder);

    /// <summary>The slope that each function's expansion about m uses.</summary>
    void Slopes(in Point m, Span<double> slope);

    /// <summary>f(x) − f(m) − slope·(x − m) for each function.</summary>
    void Residuals(in Point m, in Point x, Span<double> residual);

    /// <summary>d/dx of the exponent Σ θⱼTⱼ(x) + log h(x), for numbers or for whole ranges of x inside one piece.
    /// <paramref name="piece"/> is a point of the same piece, by which conditions are decided. NaN (or an unbounded range)
    /// where an opaque function leaves it unknown.</summary>
    TNumber Derivative<TNumber>(ReadOnlySpan<double> theta, TNumber x, in Point piece)
        where TNumber : struct, IArithmetic<TNumber>;
}

/// <summary>A kernel whose natural parameters are functions η(φ) of trade parameters φ.</summary>
public interface ITradeKernel : IKernel
{
    /// <summary>The names of the trade parameters, in declared order.</summary>
    static abstract ReadOnlySpan<string> ParameterNames { get; }

    /// <summary>η(φ): natural from trade parameters, with derivatives when <typeparamref name="TNumber"/> carries them.</summary>
    void Natural<TNumber>(ReadOnlySpan<TNumber> parameters, Span<TNumber> theta)
        where TNumber : struct, IArithmetic<TNumber>;

    /// <summary>Trade parameters from natural ones where a closed inverse is known.</summary>
    /// <returns>False where there is none, or where θ lies outside the image of the trade parameters.</returns>
    bool TryParameters(ReadOnlySpan<double> theta, Span<double> parameters);

    /// <summary>The open range of each trade parameter (±∞ where unbounded), as far as its use in logarithms, powers and
    /// quotients states it.</summary>
    void ParameterRange(Span<double> lower, Span<double> upper);
}
