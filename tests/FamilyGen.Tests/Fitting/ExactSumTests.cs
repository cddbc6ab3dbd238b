using System;
using System.Collections.Generic;
using System.Linq;
using System.Numerics;
using CsCheck;
using FamilyGen.Fitting;

namespace FamilyGen.Tests.Fitting;

public class ExactSumTests
{
    private static readonly Gen<double> AnyFinite = Gen.ULong
        .Select(bits => BitConverter.UInt64BitsToDouble(bits))
        .Where(double.IsFinite);

    private static readonly Gen<double> Moderate = Gen.Double[-1e6, 1e6];

    [Fact]
    public void One_number_comes_back_as_it_was() => AnyFinite.Sample(x =>
    {
        var sum = new ExactSum();
        sum.Add(x);
        return sum.Round() == x;
    });

    [Fact]
    public void The_sum_is_the_exact_one_rounded_once() => Gen.OneOf(AnyFinite, Moderate).Array[0, 40].Sample(terms =>
    {
        var sum = new ExactSum();
        foreach (var x in terms)
            sum.Add(x);
        return SameBits(sum.Round(), Nearest(terms.Select(Exact).Aggregate(BigInteger.Zero, (a, b) => a + b), Unit));
    });

    [Fact]
    public void Products_are_added_with_all_their_bits() => Gen.Select(Gen.OneOf(AnyFinite, Moderate), Gen.OneOf(AnyFinite, Moderate)).Array[1, 20].Sample(pairs =>
    {
        var sum = new ExactSum();
        var exact = BigInteger.Zero;
        foreach (var (a, b) in pairs)
        {
            sum.AddProduct(a, b);
            exact += Exact(a) * Exact(b);
        }

        return SameBits(sum.Round(), Nearest(exact, 2 * Unit));
    });

    [Fact]
    public void Any_order_and_any_split_give_the_same_bits() => Gen.Select(Gen.OneOf(AnyFinite, Moderate).Array[1, 60], Gen.Int[1, 5], Gen.Int).Sample((terms, parts, seed) =>
    {
        var whole = new ExactSum();
        foreach (var x in terms)
            whole.Add(x);

        var random = new Random(seed);
        var shards = Enumerable.Range(0, parts).Select(_ => new ExactSum()).ToArray();
        foreach (var x in terms.OrderBy(_ => random.Next()))
            shards[random.Next(parts)].Add(x);
        var merged = new ExactSum();
        foreach (var shard in shards.OrderBy(_ => random.Next()))
            merged.Add(shard);
        return SameBits(whole.RoundToPair().High, merged.RoundToPair().High) && SameBits(whole.RoundToPair().Low, merged.RoundToPair().Low);
    });

    [Fact]
    public void The_low_part_of_a_pair_is_what_rounding_took()
    {
        var sum = new ExactSum();
        sum.Add(1e16);
        sum.Add(1);
        sum.Add(1e-30);
        Assert.Equal((1e16 + 2, -1.0), sum.RoundToPair());
        sum.Add(-1e16);
        sum.Add(-1);
        Assert.Equal((1e-30, 0.0), sum.RoundToPair());
        sum.Add(-1e-30);
        Assert.Equal((0.0, 0.0), sum.RoundToPair());
    }

    [Fact]
    public void Millions_of_terms_do_not_overflow_a_limb()
    {
        var sum = new ExactSum();
        for (var i = 0; i < 3_000_000; i++)
            sum.Add(-0.1);
        Assert.Equal(Nearest(3_000_000 * Exact(-0.1), Unit), sum.Round());
        for (var i = 0; i < 3_000_000; i++)
            sum.Add(0.1);
        Assert.Equal(0, sum.Round());
    }

    [Fact]
    public void A_sum_beyond_the_largest_double_is_infinite_and_comes_back()
    {
        var sum = new ExactSum();
        sum.Add(double.MaxValue);
        sum.Add(double.MaxValue);
        Assert.Equal(double.PositiveInfinity, sum.Round());
        sum.Add(-double.MaxValue);
        Assert.Equal(double.MaxValue, sum.Round());
    }

    /// <summary>The exponent of the smallest double.</summary>
    private const int Unit = -1074;

    private static bool SameBits(double a, double b) => a.Equals(b) || (a == 0 && b == 0);

    /// <summary>The number in units of 2^-1074.</summary>
    private static BigInteger Exact(double x)
    {
        var bits = BitConverter.DoubleToInt64Bits(x);
        var exponent = (int)(bits >> 52) & 0x7FF;
        var significand = bits & 0xF_FFFF_FFFF_FFFF;
        var magnitude = exponent == 0 ? significand : (BigInteger)(significand | (1L << 52)) << (exponent - 1);
        return bits < 0 ? -magnitude : magnitude;
    }

    /// <summary>units · 2^unit rounded to the nearest double, ties to even, by halving interval ends of the doubles.</summary>
    private static double Nearest(BigInteger units, int unit)
    {
        var magnitude = BigInteger.Abs(units);
        var length = (int)magnitude.GetBitLength();
        var dropped = Math.Max(length - 53, Unit - unit);
        if (dropped > 0)
        {
            var half = BigInteger.One << (dropped - 1);
            var rest = magnitude & ((half << 1) - 1);
            magnitude >>= dropped;
            if (rest > half || (rest == half && !magnitude.IsEven))
                magnitude++;
            unit += dropped;
        }

        if ((int)magnitude.GetBitLength() + unit > 1024)
            return units.Sign * double.PositiveInfinity;
        return units.Sign * Math.ScaleB((double)magnitude, unit);
    }
}
