using FamilyGen.Kernels;
using FamilyGen.Tests.Partition;

namespace FamilyGen.Tests.Sampling;

/// <summary>A duration that is exactly zero with probability of its own: θ₁·1{x = 0} + θ₂x.</summary>
internal readonly struct DurationWithZeros : IAtomFamily
{
    public static Atom[] Statistics => [new Indicator(x => x.X == 0), new Monomial(1)];

    public static Domain Domain => Parts.Positive with { LowerSingular = false, Masses = [0] };

    public static NaturalSet NaturalSet => Parts.Set(Parts.End(true, true, "1 x1 1", (Parts.Named("x1"), [0, 1], 0)));
}

/// <summary>Counts that heap at multiples of three: θ₁x + θ₂·1{x mod 3 = 0}.</summary>
internal readonly struct HeapedCount : IAtomFamily
{
    public static Atom[] Statistics => [new Monomial(1), new Indicator(x => x.Integer % 3 == 0)];

    public static Domain Domain => Parts.Counts(0) with { Period = 3 };

    public static NaturalSet NaturalSet => Parts.Set(Parts.End(true, true, "x1 1 1", (Parts.Named("x1"), [1, 0], 0)));
}

/// <summary>A function that could not be read, on the integers: every term is looked at.</summary>
internal readonly struct OpaqueCount : IAtomFamily
{
    public static Atom[] Statistics => [new Indicator(x => x.X % 7 == 2), new Monomial(1)];

    public static Domain Domain => Parts.Counts(0) with { IsOpaque = true };

    public static NaturalSet NaturalSet => Parts.Set(Parts.End(true, true, "1 x1 1", (Parts.Named("x1"), [0, 1], 0)));
}

/// <summary>Two levels on an interval with a jump at 1: θ·1{x &lt; 1} on (0, 3).</summary>
internal readonly struct Steps : IAtomFamily
{
    public static Atom[] Statistics => [new Indicator(x => x.X < 1)];

    public static Domain Domain => new() { IsLattice = false, Lower = 0, Upper = 3, Breakpoints = [1] };

    public static NaturalSet NaturalSet => Parts.Everything;
}
