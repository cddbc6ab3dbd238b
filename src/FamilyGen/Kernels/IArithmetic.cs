namespace FamilyGen.Kernels;

/// <summary>The arithmetic in which generated formulas are written once and evaluated as plain numbers
/// (Scalar), guaranteed ranges (Bounds) or numbers with first and second derivatives
/// (Jet).</summary>
public interface IArithmetic<TSelf>
    where TSelf : struct, IArithmetic<TSelf>
{
    /// <summary>A constant.</summary>
    static abstract implicit operator TSelf(double value);

    /// <summary>Sum.</summary>
    static abstract TSelf operator +(TSelf a, TSelf b);

    /// <summary>Difference.</summary>
    static abstract TSelf operator -(TSelf a, TSelf b);

    /// <summary>Product.</summary>
    static abstract TSelf operator *(TSelf a, TSelf b);

    /// <summary>Quotient.</summary>
    static abstract TSelf operator /(TSelf a, TSelf b);

    /// <summary>Negation.</summary>
    static abstract TSelf operator -(TSelf a);

    /// <summary>eᵃ.</summary>
    static abstract TSelf Exp(TSelf a);

    /// <summary>Natural logarithm.</summary>
    static abstract TSelf Log(TSelf a);

    /// <summary>aᵇ for a constant exponent; any a when b is an integer, else a ≥ 0.</summary>
    static abstract TSelf Pow(TSelf a, double b);

    /// <summary>aᵇ for a variable exponent, a &gt; 0.</summary>
    static abstract TSelf Pow(TSelf a, TSelf b);

    /// <summary>Sine.</summary>
    static abstract TSelf Sin(TSelf a);

    /// <summary>Cosine.</summary>
    static abstract TSelf Cos(TSelf a);

    /// <summary>Absolute value; its derivative at 0 is taken as 0.</summary>
    static abstract TSelf Abs(TSelf a);

    /// <summary>log Γ(a), a &gt; 0.</summary>
    static abstract TSelf LogGamma(TSelf a);

    /// <summary>ψ(a) = d/da log Γ(a), a &gt; 0.</summary>
    static abstract TSelf Digamma(TSelf a);

    /// <summary>ψ(a + shift) − ψ(a), the derivative of log Γ(a + shift) − log Γ(a); a and a + shift &gt; 0.</summary>
    static virtual TSelf DigammaDifference(TSelf a, double shift) => TSelf.Digamma(a + shift) - TSelf.Digamma(a);

    /// <summary>An unknown value: NaN, or the whole line.</summary>
    static abstract TSelf Unknown { get; }
}
