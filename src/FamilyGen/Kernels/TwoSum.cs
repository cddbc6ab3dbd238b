using System;

namespace FamilyGen.Kernels;

/// <summary>A number of about 106 bits as the unevaluated sum High + Low of two doubles, |Low| ≤ ½ ulp(High).</summary>
/// <remarks>Dekker 1971; products and remainders by fused multiply-add.</remarks>
internal readonly record struct TwoSum(double High, double Low)
{
    public static implicit operator TwoSum(double value) => new(value, 0);

    public static TwoSum operator +(TwoSum a, TwoSum b)
    {
        var high = Sum(a.High, b.High);
        var low = Sum(a.Low, b.Low);
        var first = Quick(high.High, high.Low + low.High);
        return Quick(first.High, first.Low + low.Low);
    }

    public static TwoSum operator -(TwoSum a) => new(-a.High, -a.Low);

    public static TwoSum operator -(TwoSum a, TwoSum b) => a + (-b);

    public static TwoSum operator *(TwoSum a, TwoSum b)
    {
        var high = a.High * b.High;
        var low = Math.FusedMultiplyAdd(a.High, b.High, -high);
        return Quick(high, low + ((a.High * b.Low) + (a.Low * b.High)));
    }

    public static TwoSum operator /(TwoSum a, TwoSum b)
    {
        var first = a.High / b.High;
        if (!double.IsFinite(first) || first == 0)
            return first;
        var rest = a - (first * b);
        var second = rest.High / b.High;
        rest -= second * b;
        return Quick(first, second) + (rest.High / b.High);
    }

    private static TwoSum Sum(double a, double b)
    {
        var sum = a + b;
        var part = sum - a;
        return new(sum, (a - (sum - part)) + (b - part));
    }

    private static TwoSum Quick(double large, double small)
    {
        var sum = large + small;
        return new(sum, small - (sum - large));
    }
}
