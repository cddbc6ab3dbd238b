using System;
using System.Numerics;

namespace FamilyGen.Sampling;

/// <summary>The 64-bit generator xoshiro256++ (Blackman and Vigna 2021): period 2²⁵⁶ − 1.</summary>
/// <remarks>A seeded <see cref="Random"/> gives values of 31 bits, too coarse for a tail; a batch of draws therefore
/// takes only its seed from there.</remarks>
internal struct Xoshiro256(ulong a, ulong b, ulong c, ulong d)
{
    /// <summary>A generator whose four words are 64 bits each from the caller's generator, stirred by SplitMix64
    /// (Steele, Lea, Flood 2014).</summary>
    public static Xoshiro256 SeededFrom(Random random) =>
        new(Stirred(random), Stirred(random), Stirred(random), Stirred(random));

    /// <summary>64 random bits.</summary>
    public ulong NextBits()
    {
        var result = BitOperations.RotateLeft(a + d, 23) + a;
        var shifted = b << 17;
        c ^= a;
        d ^= b;
        b ^= c;
        a ^= d;
        c ^= shifted;
        d = BitOperations.RotateLeft(d, 45);
        return result;
    }

    /// <summary>A uniform number in the open interval (0, 1).</summary>
    public double NextUniform() => Uniform.FromBits(NextBits() >> 11);

    // the top bits of three draws, since the low bits of a seeded Random are weaker
    private static ulong Stirred(Random random)
    {
        var bits = ((ulong)random.Next(1 << 22) << 42) | ((ulong)random.Next(1 << 21) << 21) | (uint)random.Next(1 << 21);
        bits += 0x9E3779B97F4A7C15;
        bits = (bits ^ (bits >> 30)) * 0xBF58476D1CE4E5B9;
        bits = (bits ^ (bits >> 27)) * 0x94D049BB133111EB;
        return bits ^ (bits >> 31);
    }
}
