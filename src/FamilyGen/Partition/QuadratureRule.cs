using System;
using System.Threading;

namespace FamilyGen.Partition;

/// <summary>Gauss rules with twenty nodes, exact for polynomials of degree 39: for the uniform measure on an interval
/// (Legendre) and for the uniform measure on L consecutive integers (Gram, the discrete Chebyshev polynomials), both scaled
/// to [−1, 1] with weights that sum to one.</summary>
/// <remarks>The monic recurrence coefficients are n²/(4n²−1) and n²(L²−n²)/((4n²−1)(L−1)²) (Gautschi 2004, section 1.5).
/// Nodes are found between those of the rule with one node less and polished; weights are Christoffel numbers
/// 1/Σ p²ₖ, a sum of positive terms.</remarks>
internal sealed class QuadratureRule
{
    /// <summary>The number of nodes of every rule.</summary>
    public const int NodeCount = 20;

    /// <summary>The number of highest expansion coefficients by which a rule judges whether it resolves a function.</summary>
    public const int WitnessCount = 4;

    /// <summary>Runs of fewer integers than this are summed term by term.</summary>
    public const int ShortestRun = 32;

    private const int ShortestPower = 5;
    private const int LongestPower = 31;
    private static readonly QuadratureRule?[] s_lattice = new QuadratureRule?[LongestPower + 1];

    private QuadratureRule(Func<int, double> recurrence)
    {
        var root = new double[NodeCount + 1];
        for (var k = 1; k <= NodeCount; k++)
            root[k] = Math.Sqrt(recurrence(k));
        Recurrence = root;
        InverseRecurrence = Array.ConvertAll(root, r => 1 / r);
        Nodes = Roots(root);
        Weights = new double[NodeCount];
        const int Columns = WitnessCount + 2;
        Witness = new double[NodeCount * Columns];
        Span<double> polynomial = stackalloc double[NodeCount];
        Span<double> atEnd = stackalloc double[NodeCount];
        Orthonormal(root, 1, atEnd);
        for (var i = 0; i < NodeCount; i++)
        {
            Orthonormal(root, Nodes[i], polynomial);
            var sum = 0.0;
            foreach (var value in polynomial)
                sum += value * value;
            Weights[i] = 1 / sum;
            for (var q = 0; q < WitnessCount; q++)
                Witness[i * Columns + q] = polynomial[NodeCount - 1 - q] / sum;

            // polynomials of odd degree change sign between the ends
            double even = 0, odd = 0;
            for (var k = 0; k < NodeCount; k += 2)
            {
                even += polynomial[k] * atEnd[k];
                odd += polynomial[k + 1] * atEnd[k + 1];
            }

            Witness[i * Columns + WitnessCount] = (even - odd) / sum;
            Witness[i * Columns + WitnessCount + 1] = (even + odd) / sum;
        }
    }

    /// <summary>r₀ … r₂₀ of the orthonormal polynomials' recurrence xφₙ = rₙ₊₁φₙ₊₁ + rₙφₙ₋₁.</summary>
    public double[] Recurrence { get; }

    /// <summary>1/rₙ.</summary>
    public double[] InverseRecurrence { get; }

    /// <summary>The nodes in ascending order.</summary>
    public double[] Nodes { get; }

    /// <summary>The weights, with sum one.</summary>
    public double[] Weights { get; }

    /// <summary>Node by node, the weight times the orthonormal polynomials of degrees 19 to 16: their sums with a
    /// function's values are its highest expansion coefficients; and then the weights whose sums are the expansion at −1 and
    /// at 1.</summary>
    public double[] Witness { get; }

    /// <summary>The rule on an interval.</summary>
    public static QuadratureRule Interval { get; } = new(n => (double)n * n / (4.0 * n * n - 1));

    /// <summary>The rule on 2^power consecutive integers, and the half width to which it is to be scaled. From 2³¹ integers
    /// on, the interval that reaches half a step beyond them is the same to the last digit.</summary>
    public static QuadratureRule Lattice(int power, out double halfWidth)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(power, ShortestPower);
        var length = Math.ScaleB(1.0, power);
        if (power > LongestPower)
        {
            halfWidth = length / 2;
            return Interval;
        }

        halfWidth = (length - 1) / 2;
        return Volatile.Read(ref s_lattice[power]) ?? Build(power, length);
    }

    private static QuadratureRule Build(int power, double length)
    {
        var rule = new QuadratureRule(n =>
            (double)n * n / (4.0 * n * n - 1) * ((length - n) / (length - 1)) * ((length + n) / (length - 1)));
        Volatile.Write(ref s_lattice[power], rule);
        return rule;
    }

    /// <summary>φ₀(x), φ₁(x), …, orthonormal under the rule.</summary>
    public void Orthonormal(double x, Span<double> polynomial) => Orthonormal(Recurrence, x, polynomial);

    private static void Orthonormal(ReadOnlySpan<double> root, double x, Span<double> polynomial)
    {
        polynomial[0] = 1;
        polynomial[1] = x / root[1];
        for (var k = 1; k < polynomial.Length - 1; k++)
            polynomial[k + 1] = (x * polynomial[k] - root[k] * polynomial[k - 1]) / root[k + 1];
    }

    private static double[] Roots(ReadOnlySpan<double> root)
    {
        // The roots of each polynomial separate those of the next.
        var inner = Array.Empty<double>();
        for (var degree = 1; degree <= NodeCount; degree++)
        {
            var roots = new double[degree];
            for (var i = 0; i < (degree + 1) / 2; i++)
            {
                var low = i == 0 ? -1.0 : inner[i - 1];
                var high = i == degree - 1 ? 1.0 : inner[i];
                var middle = degree % 2 == 1 && i == degree / 2 ? 0 : Root(root, degree, low, high);
                roots[i] = middle;
                roots[degree - 1 - i] = -middle;
            }

            inner = roots;
        }

        return inner;
    }

    private static double Root(ReadOnlySpan<double> root, int degree, double low, double high)
    {
        var falling = Value(root, degree, low, out _) > 0;
        var x = (low + high) / 2;
        for (var step = 0; step < 100; step++)
        {
            var value = Value(root, degree, x, out var derivative);
            if (value > 0 == falling)
                low = x;
            else
                high = x;
            var next = x - value / derivative;
            if (!(next > low && next < high))
                next = (low + high) / 2;
            if (Math.Abs(next - x) <= 1e-16)
                return next;
            x = next;
        }

        return x;
    }

    private static double Value(ReadOnlySpan<double> root, int degree, double x, out double derivative)
    {
        double before = 0, current = 1, slopeBefore = 0, slope = 0;
        for (var k = 0; k < degree; k++)
        {
            var next = (x * current - root[k] * before) / root[k + 1];
            var slopeNext = (current + x * slope - root[k] * slopeBefore) / root[k + 1];
            (before, current, slopeBefore, slope) = (current, next, slope, slopeNext);
        }

        derivative = slope;
        return current;
    }
}
