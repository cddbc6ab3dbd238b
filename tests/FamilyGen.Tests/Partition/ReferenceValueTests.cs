using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using FamilyGen.Kernels;
using FamilyGen.Partition;

namespace FamilyGen.Tests.Partition;

/// <summary>Log-normalizer, gradient, Hessian and log-density of 22 families against values with 25 digits, to the stated
/// accuracy: A to 1e−13 + 8ε·max |θⱼTⱼ(m)|, and A − f(m) to 1e−11 relative where one lattice point dominates; the gradient to
/// 1e−12·σⱼ + 8ε|gⱼ|; the Hessian to 1e−11·√(HᵢᵢHⱼⱼ); the log-density to 1e−12 + 8ε·its largest term.</summary>
public class ReferenceValueTests
{
    private const double Epsilon = 2.2204460492503131e-16;

    private static readonly ILookup<string, string[]> s_rows = Rows("partition-values.tsv").ToLookup(row => row[0]);
    private static readonly ILookup<string, string[]> s_extremes = Rows("partition-extremes.tsv").ToLookup(row => row[0]);

    [Theory]
    [InlineData("bernoulli", typeof(Bernoulli))]
    [InlineData("binomial_n12", typeof(Binomial12))]
    [InlineData("poisson", typeof(Poisson))]
    [InlineData("geometric", typeof(Geometric))]
    [InlineData("negative_binomial_r2p5", typeof(NegativeBinomial))]
    [InlineData("exponential", typeof(Exponential))]
    [InlineData("gamma", typeof(Gamma))]
    [InlineData("beta", typeof(Beta))]
    [InlineData("normal", typeof(Normal))]
    [InlineData("lognormal", typeof(Lognormal))]
    [InlineData("chi_squared", typeof(ChiSquared))]
    [InlineData("inverse_gaussian", typeof(InverseGaussian))]
    [InlineData("von_mises", typeof(VonMises))]
    [InlineData("dispersed_count", typeof(DispersedCount))]
    [InlineData("dispersed_count_from_1", typeof(DispersedCountFrom1))]
    [InlineData("dispersed_count_extra_zero", typeof(DispersedCountExtraZero))]
    [InlineData("poisson_extra_zero", typeof(PoissonExtraZero))]
    [InlineData("duration_log_lin_inv", typeof(Duration))]
    [InlineData("duration_window_2_30", typeof(Window))]
    [InlineData("bounded_log_log_lin", typeof(BoundedLogLogLin))]
    [InlineData("quartic", typeof(Quartic))]
    [InlineData("categorical_4", typeof(Categorical4))]
    public void Meets_the_stated_accuracy(string family, Type declaration) => Run(s_rows, family, declaration);

    [Theory]
    [InlineData("gamma", typeof(Gamma))]
    [InlineData("beta", typeof(Beta))]
    [InlineData("normal", typeof(Normal))]
    [InlineData("duration_log_lin_inv", typeof(Duration))]
    [InlineData("von_mises", typeof(VonMises))]
    [InlineData("poisson", typeof(Poisson))]
    [InlineData("negative_binomial_r2p5", typeof(NegativeBinomial))]
    [InlineData("geometric", typeof(Geometric))]
    public void Meets_it_at_extreme_parameters(string family, Type declaration) => Run(s_extremes, family, declaration);

    private static void Run(ILookup<string, string[]> rows, string family, Type declaration)
    {
        var failures = new List<string>();
        var method = typeof(ReferenceValueTests).GetMethod(nameof(Check), System.Reflection.BindingFlags.Static | System.Reflection.BindingFlags.NonPublic)!;
        method.MakeGenericMethod(declaration).Invoke(null, [rows, family, failures]);
        Assert.True(failures.Count == 0, string.Join('\n', failures));
    }

    private static void Check<TFamily>(ILookup<string, string[]> rows, string family, List<string> failures)
        where TFamily : IAtomFamily
    {
        foreach (var point in rows[family].GroupBy(row => row[1]))
        {
            var theta = point.Key.Split(' ').Select(Number).ToArray();
            try
            {
                CheckPoint(new Distribution<AtomKernel<TFamily>>(default, theta), [.. point], theta, failures);
            }
            catch (PartitionException exception)
            {
                failures.Add($"{family} at {point.Key}: {exception.Message}");
            }
        }
    }

    private static void CheckPoint<TFamily>(Distribution<AtomKernel<TFamily>> distribution, string[][] rows, double[] theta, List<string> failures)
        where TFamily : IAtomFamily
    {
        var expected = rows.ToDictionary(row => row[2], row => Number(row[3]));
        var mean = distribution.MeanStatistics();
        var covariance = distribution.StatisticCovariance();
        var moments = distribution.Moments();
        var kernel = distribution.Kernel;
        Span<double> value = stackalloc double[theta.Length + 1];
        Span<double> remainder = stackalloc double[theta.Length + 1];
        foreach (var row in rows)
        {
            var key = row[2].Split(' ');
            double actual, tolerance;
            switch (key[0])
            {
                case "A":
                    actual = distribution.LogNormalizer;
                    tolerance = 1e-13 + 8 * Epsilon * LargestTerm(theta, moments.ModeStatistics, 0) + LastBit(theta, expected);
                    var level = Level(theta, kernel, moments.Mode);
                    if (kernel.Domain.IsLattice && level == 0)
                        tolerance = Math.Min(tolerance, 1e-11 * Math.Abs(expected["A"]));
                    break;
                case "gradient":
                    var i = int.Parse(key[1]);
                    actual = mean[i];
                    tolerance = 1e-12 * Math.Sqrt(expected[$"hessian {i} {i}"]) + 8 * Epsilon * Math.Abs(expected[row[2]]);
                    if (expected.Count == 1 + theta.Length + theta.Length * theta.Length)
                        tolerance += 0.5 * Epsilon * Enumerable.Range(0, theta.Length).Max(j => Math.Abs(theta[j] * expected[$"hessian {i} {j}"]));
                    break;
                case "hessian":
                    var (a, b) = (int.Parse(key[1]), int.Parse(key[2]));
                    actual = covariance[a, b];
                    tolerance = 1e-11 * Math.Sqrt(expected[$"hessian {a} {a}"]) * Math.Sqrt(expected[$"hessian {b} {b}"]);
                    break;
                default:
                    var x = Number(key[1]);
                    actual = distribution.LogDensity(x);
                    var outside = double.IsNegativeInfinity(expected[row[2]]);
                    if (!outside)
                        kernel.Evaluate(kernel.Domain.At(x), value, remainder);
                    tolerance = outside ? 0 : 1e-12 + 8 * Epsilon * Math.Max(LargestTerm(theta, value, value[^1]), Math.Abs(expected["A"]));
                    break;
            }

            var wanted = expected[row[2]];
            if (!(actual == wanted || Math.Abs(actual - wanted) <= tolerance))
                failures.Add(string.Create(CultureInfo.InvariantCulture, $"{row[0]} at {row[1]}, {row[2]}: {actual:R} instead of {wanted:R}, off by {Math.Abs(actual - wanted) / tolerance:G3} times the tolerance {tolerance:G3}"));
        }
    }

    // At the drawn parameters, which may lie very close to a face: what half a unit in the last place of a parameter does.
    private static double LastBit(double[] theta, Dictionary<string, double> expected) =>
        expected.Count > 1 + theta.Length + theta.Length * theta.Length
            ? 0
            : 0.5 * Epsilon * Enumerable.Range(0, theta.Length).Max(j => Math.Abs(theta[j] * expected[$"gradient {j}"]));

    private static double Level<TFamily>(double[] theta, AtomKernel<TFamily> kernel, Point mode)
        where TFamily : IAtomFamily
    {
        Span<double> value = stackalloc double[theta.Length + 1];
        Span<double> remainder = stackalloc double[theta.Length + 1];
        kernel.Evaluate(mode, value, remainder);
        var sum = value[^1];
        for (var j = 0; j < theta.Length; j++)
            sum += theta[j] * value[j];
        return sum;
    }

    private static double LargestTerm(double[] theta, ReadOnlySpan<double> statistics, double logBase)
    {
        var largest = Math.Abs(logBase);
        for (var j = 0; j < theta.Length; j++)
            largest = Math.Max(largest, Math.Abs(theta[j] * statistics[j]));
        return largest;
    }

    private static double Number(string text) => text switch
    {
        "-inf" => double.NegativeInfinity,
        _ => double.Parse(text, CultureInfo.InvariantCulture),
    };

    private static IEnumerable<string[]> Rows(string table)
    {
        using var stream = typeof(ReferenceValueTests).Assembly.GetManifestResourceStream(table)!;
        using var reader = new StreamReader(stream);
        while (reader.ReadLine() is { } line)
            yield return line.Split('\t');
    }
}
