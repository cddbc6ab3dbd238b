using System;

namespace FamilyGen.Conformance;

/// <summary>Cdf, survival and quantile are inverse of each other, over the body and both tails.</summary>
public class CdfAndQuantileTests
{
    private static readonly double[] s_probabilities = [1e-12, 1e-6, 0.001, 0.05, 0.3, 0.5, 0.77, 0.95, 0.999, 1 - 1e-6, 1 - 1e-9];

    [Theory]
    [MemberData(nameof(FaceCases.CountNames), MemberType = typeof(FaceCases))]
    public void The_quantile_of_a_count_is_the_smallest_whose_cdf_reaches_the_probability(string name)
    {
        var face = FaceCases.Get(name);
        foreach (var p in s_probabilities)
        {
            var x = face.Quantile(p);
            Assert.True(face.Cdf(x) >= p * (1 - 1e-9), $"Cdf({x}) = {face.Cdf(x):r} reaches {p:r}");
            Assert.True(face.Cdf(x - 1) <= p * (1 + 1e-9), $"Cdf({x - 1}) = {face.Cdf(x - 1):r} stays below {p:r}");
        }
    }

    [Theory]
    [MemberData(nameof(FaceCases.IntervalNames), MemberType = typeof(FaceCases))]
    public void The_cdf_of_a_quantile_is_the_probability(string name)
    {
        var face = FaceCases.Get(name);
        foreach (var p in s_probabilities)
        {
            // two roundings of x on either side, which is where a point with a probability of its own is passed too
            var x = face.Quantile(p);
            var (below, above) = (Down(Down(x)), Up(Up(x)));
            Assert.True(face.Cdf(below) <= p * (1 + 1e-9), $"Cdf({below:r}) = {face.Cdf(below):r} is at most {p:r}");
            Assert.True(face.Cdf(above) >= p * (1 - 1e-9), $"Cdf({above:r}) = {face.Cdf(above):r} is at least {p:r}");
            Assert.True(face.Survival(below) >= (1 - p) * (1 - 1e-6), $"Survival({below:r}) = {face.Survival(below):r}");
            Assert.True(face.Survival(above) <= (1 - p) * (1 + 1e-6), $"Survival({above:r}) = {face.Survival(above):r}");
        }
    }

    [Theory]
    [MemberData(nameof(FaceCases.Names), MemberType = typeof(FaceCases))]
    public void Cdf_and_survival_add_up_to_one_and_rise_together(string name)
    {
        var face = FaceCases.Get(name);
        var last = 0.0;
        foreach (var p in s_probabilities)
        {
            var x = face.Quantile(p);
            var cdf = face.Cdf(x);
            Assert.InRange(cdf + face.Survival(x), 1 - 1e-12, 1 + 1e-12);
            Assert.True(cdf >= last);
            last = cdf;
        }
    }

    [Theory]
    [MemberData(nameof(FaceCases.CountNames), MemberType = typeof(FaceCases))]
    public void A_step_of_the_cdf_is_the_probability_of_the_count(string name)
    {
        var face = FaceCases.Get(name);
        foreach (var p in s_probabilities.AsSpan(2, 6))
        {
            var x = face.Quantile(p);
            var density = face.Density(x);
            Assert.InRange(face.Cdf(x) - face.Cdf(x - 1), density - 1e-11 - 1e-9 * density, density + 1e-11 + 1e-9 * density);
            Assert.Equal(density / (density + face.Survival(x)), face.Hazard(x), 1e-8);
        }
    }

    [Theory]
    [MemberData(nameof(FaceCases.IntervalNames), MemberType = typeof(FaceCases))]
    public void The_hazard_is_density_over_survival(string name)
    {
        var face = FaceCases.Get(name);
        foreach (var p in (ReadOnlySpan<double>)[0.77, 0.95, 0.999])
        {
            var x = face.Quantile(p);
            var expected = face.Density(x) / face.Survival(x);
            Assert.InRange(face.Hazard(x), expected * (1 - 1e-8), expected * (1 + 1e-8));
        }
    }

    private static double Down(double x) => Math.BitDecrement(x);

    private static double Up(double x) => Math.BitIncrement(x);
}
