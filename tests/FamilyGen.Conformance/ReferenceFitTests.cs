using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using FamilyGen.Conformance.Families;
using FamilyGen.Conformance.Subjects;

namespace FamilyGen.Conformance;

/// <summary>Fits of published data against estimates in multiple precision: natural parameters to 1e-8 relative,
/// log-likelihood to 1e-10 relative, standard errors to 1e-6 relative.</summary>
public class ReferenceFitTests
{
    private sealed record Outcome(double[] Theta, double LogLikelihood, double[] StandardErrors, long Observations, FitStatus Status);

    private static readonly Dictionary<string, Func<Outcome>> s_fits = new()
    {
        ["aircondit_exponential"] = () => Of(Exponential.Fit(AirConditioning())),
        ["aircondit_gamma"] = () => Of(Gamma.Fit(AirConditioning())),
        ["aircondit_inverse_gaussian"] = () => Of(InverseGaussian.Fit(AirConditioning())),
        ["aircondit_log_lin_inv"] = () => Of(DelayedDuration.Fit(AirConditioning())),
        ["aircondit_lognormal"] = () => Of(LogNormal.Fit(AirConditioning())),
        ["discoveries_dispersed"] = () => Of(ShiftStoppages.Fit(Discoveries())),
        ["discoveries_poisson"] = () => Of(Poisson.Fit(Discoveries())),
        ["discoveries_negbin_r4"] = () => Of(SizedNegativeBinomial.Fit(Discoveries(), size: 4)),
        ["eye_categorical"] = () => Of(FourCategories.Fit(Margin("eye", "Brown", "Blue", "Hazel", "Green"))),
        ["hair_categorical"] = () => Of(FourCategories.Fit(Margin("hair", "Black", "Brown", "Red", "Blond"))),
        ["gehan_control_exponential"] = () => Of(Exponential.Fit(Remissions())),
        ["gehan_control_gamma"] = () => Of(Gamma.Fit(Remissions())),
        ["gehan_control_lognormal"] = () => Of(LogNormal.Fit(Remissions())),
        ["geissler_binomial12"] = () => Of(BinomialOfTwelve.Fit(Boys())),
        ["geissler_interaction"] = () => Of(MixedTwelve.Fit(Boys())),
        ["horsekicks_dispersed"] = () => Of(ShiftStoppages.Fit(HorseKicks())),
        ["horsekicks_poisson"] = () => Of(Poisson.Fit(HorseKicks())),
        ["horsekicks_poisson_extra_zero"] = () => Of(PoissonWithExtraZero.Fit(HorseKicks())),
        ["horsekicks_negbin_r5"] = () => Of(SizedNegativeBinomial.Fit(HorseKicks(), size: 5)),
        ["leuk_gamma"] = () => Of(Gamma.Fit(ReferenceFiles.Column("leuk", "time"))),
        ["leuk_log_lin_inv"] = () => Of(DelayedDuration.Fit(ReferenceFiles.Column("leuk", "time"))),
        ["rutherford_geiger_dispersed"] = () => Of(ShiftStoppages.Fit(AlphaParticles())),
        ["rutherford_geiger_poisson"] = () => Of(Poisson.Fit(AlphaParticles())),
        ["turtles_von_mises"] = () => Of(VonMises.Fit(Turtles())),
    };

    public static TheoryData<string> Names() => [.. ReferenceFiles.Names("fits")];

    [Fact]
    public void Every_reference_fit_is_run_here() => Assert.Equal(ReferenceFiles.Names("fits"), s_fits.Keys.Order());

    [Theory]
    [MemberData(nameof(Names))]
    public void The_fit_agrees_with_the_reference(string name)
    {
        var expected = ReferenceFiles.Fit(name);
        var fit = s_fits[name]();
        Assert.Equal(expected.Observations, fit.Observations);
        Assert.Equal(FitStatus.InteriorMaximum, fit.Status);
        for (var j = 0; j < expected.Theta.Length; j++)
        {
            Assert.InRange(expected.Theta[j].DistanceTo(fit.Theta[j]), 0, 1e-8 * Math.Abs(expected.Theta[j].Nearest));
            Assert.InRange(expected.StandardErrors[j].DistanceTo(fit.StandardErrors[j]), 0, 1e-6 * expected.StandardErrors[j].Nearest);
        }
        Assert.InRange(expected.LogLikelihood.DistanceTo(fit.LogLikelihood), 0, 1e-10 * Math.Abs(expected.LogLikelihood.Nearest));
    }

    private static Outcome Of<TFamily>(FitResult<TFamily> fit) =>
        new([.. fit.Natural], fit.LogLikelihood, [.. fit.StandardErrors], fit.Observations, fit.Status);

    private static double[] AirConditioning() => ReferenceFiles.Column("aircondit", "hours");

    private static int[] Discoveries() => [.. ReferenceFiles.Column("discoveries", "discoveries").Select(x => (int)x)];

    private static int[] Boys() => ReferenceFiles.Repeated("geissler_saxony", "boys", "frequency");

    private static int[] HorseKicks() => ReferenceFiles.Repeated("horsekicks", "deaths", "frequency");

    private static int[] AlphaParticles() => ReferenceFiles.Repeated("rutherford_geiger", "count", "frequency");

    private static double[] Turtles() => [.. ReferenceFiles.Column("turtles", "degrees").Select(d => d * Math.PI / 180)];

    private static double[] Remissions() =>
        [.. ReferenceFiles.Rows("gehan").Where(r => r["treat"] == "control").Select(r => double.Parse(r["time"], CultureInfo.InvariantCulture))];

    private static int[] Margin(string column, params string[] levels) =>
        [.. ReferenceFiles.Rows("haireyecolor").SelectMany(r => Enumerable.Repeat(
            Array.IndexOf(levels, r[column]), int.Parse(r["frequency"], CultureInfo.InvariantCulture)))];
}
