using System;

namespace FamilyGen.Sampling;

/// <summary>Uniform numbers in the open interval (0, 1) with 53 random bits.</summary>
internal static class Uniform
{
    private const double Unit = 1.0 / (1L << 53);

    /// <summary>One number from the caller's generator, whose single draws may have 31 bits only.</summary>
    public static double From(Random random) =>
        FromBits(((ulong)random.Next(1 << 27) << 26) | (uint)random.Next(1 << 26));

    /// <summary>k·2⁻⁵³ for k &lt; 2⁵³, and 2⁻⁵⁴ in the place of 0.</summary>
    public static double FromBits(ulong k) => Math.Max(k * Unit, Unit / 2);
}
