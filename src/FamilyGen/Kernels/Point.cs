namespace FamilyGen.Kernels;

/// <summary>Where a kernel is evaluated: the observation itself, its place relative to the finite ends of the support
/// (in logarithms, so that it stays exact where x − lower underflows or x overflows), and its displacement from a
/// reference point m.</summary>
public readonly record struct Point
{
    /// <summary>The observation x.</summary>
    public double X { get; init; }

    /// <summary>x − m, exact to rounding; 0 at the reference point itself.</summary>
    public double Displacement { get; init; }

    /// <summary>log(x − lower) where the support has a finite lower end, else NaN.</summary>
    public double LogAboveLower { get; init; }

    /// <summary>log(upper − x) where the support has a finite upper end, else NaN.</summary>
    public double LogBelowUpper { get; init; }

    /// <summary>log((x − lower)/(m − lower)), accurate for x near m; NaN without a finite lower end.</summary>
    public double RatioToLower { get; init; }

    /// <summary>log((upper − x)/(upper − m)), accurate for x near m; NaN without a finite upper end.</summary>
    public double RatioToUpper { get; init; }

    /// <summary>On a lattice, an integer of the same residue class and the same piece as <see cref="X"/>, which may then
    /// lie between the integers; equal to X at an observation.</summary>
    public long Integer { get; init; }
}
