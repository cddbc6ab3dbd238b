using System;

namespace FamilyGen.ClosedForms;

/// <summary>A normalizer that is a known function: A(c) = log ∫ exp(Σ cᵢaᵢ(y)) over a canonical range of y, in the entry's own
/// coefficients c. Families reach it through an affine map c(θ) and, on the line, an affine map or logarithm of x.</summary>
public interface IClosedForm
{
    /// <summary>The number of coefficients.</summary>
    static abstract int Count { get; }

    /// <summary>The largest error of a covariance beside √(Varᵢ Varⱼ).</summary>
    static virtual double RelativeError => 4e-15;

    /// <summary>A(c) with its first and second derivatives.</summary>
    /// <param name="settings">What is known about the entry beside its coefficients: ends, a known power.</param>
    /// <param name="coefficients">c.</param>
    /// <param name="logNormalizer">A(c), to a few units of ε·(1 + largest |cᵢaᵢ| at the mode), and relatively where it is
    /// nearly 0.</param>
    /// <param name="mean">∇A = E a, each to a few units of ε·|E aᵢ| or to 2e-13 standard deviations; empty when not asked.</param>
    /// <param name="covariance">∇²A = Cov a row by row, to the stated relative error; empty when <paramref name="mean"/> is.</param>
    /// <returns>False where the entry does not apply (its condition fails) or cannot keep this accuracy.</returns>
    static abstract bool TryEvaluate(
        ReadOnlySpan<double> settings, ReadOnlySpan<double> coefficients, out double logNormalizer, Span<double> mean, Span<double> covariance);
}
