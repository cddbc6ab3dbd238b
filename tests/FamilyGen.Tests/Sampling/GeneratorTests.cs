using System;
using System.Linq;
using FamilyGen.Sampling;

namespace FamilyGen.Tests.Sampling;

public class GeneratorTests
{
    [Fact]
    public void Xoshiro_gives_the_published_sequence()
    {
        // state 1, 2, 3, 4: the sequence of Blackman and Vigna's own C program
        var bits = new Xoshiro256(1, 2, 3, 4);
        ulong[] expected = [41943041, 58720359, 3588806011781223, 3591011842654386, 9228616714210784205, 9973669472204895162];
        Assert.Equal(expected, expected.Select(_ => bits.NextBits()));
    }

    [Fact]
    public void Seeds_are_reproducible_and_differ()
    {
        Assert.Equal(Xoshiro256.SeededFrom(new Random(7)).NextBits(), Xoshiro256.SeededFrom(new Random(7)).NextBits());
        var first = Enumerable.Range(0, 1000).Select(seed => Xoshiro256.SeededFrom(new Random(seed)).NextBits());
        Assert.Equal(1000, first.Distinct().Count());
    }

    [Fact]
    public void Uniforms_stay_inside_the_open_interval()
    {
        Assert.Equal(Math.ScaleB(1, -54), Uniform.FromBits(0));
        Assert.Equal(Math.ScaleB(1, -53), Uniform.FromBits(1));
        Assert.Equal(1 - Math.ScaleB(1, -53), Uniform.FromBits((1UL << 53) - 1));
    }

    [Fact]
    public void Single_uniforms_use_more_bits_than_one_call_of_a_seeded_generator_gives()
    {
        var random = new Random(3);
        var draws = Enumerable.Range(0, 1000).Select(_ => Uniform.From(random)).ToList();
        Assert.Contains(draws, u => (u * Math.ScaleB(1, 53) % 2) == 1);
        Assert.InRange(draws.Average(), 0.46, 0.54);
    }
}
