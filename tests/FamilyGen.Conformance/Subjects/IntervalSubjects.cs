using System;
using System.Collections.Generic;
using FamilyGen.Conformance.Families;

namespace FamilyGen.Conformance.Subjects;

/// <summary>The families on intervals behind the delegates of <see cref="Subject"/>.</summary>
internal static class IntervalSubjects
{
    public static IEnumerable<Subject> All()
    {
        yield return new Subject("exponential", IsCount: false,
            t => Law(new Exponential(t[0])),
            t => Exponential.IsNatural(t),
            x => Terms(v => Exponential.Statistics(x, v), Exponential.LogBase(x), 1),
            [[0], [1]]);
        yield return new Subject("gamma", IsCount: false,
            t => Law(new Gamma(t[0], t[1])),
            t => Gamma.IsNatural(t),
            x => Terms(v => Gamma.Statistics(x, v), Gamma.LogBase(x), 2),
            [[-1, -1], [0, 0], [0, 1]]);
        yield return new Subject("chi_squared", IsCount: false,
            t => Law(new ChiSquared(t[0])),
            t => ChiSquared.IsNatural(t),
            x => Terms(v => ChiSquared.Statistics(x, v), ChiSquared.LogBase(x), 1),
            [[-1], [-2]]);
        yield return new Subject("lognormal", IsCount: false,
            t => Law(new LogNormal(t[0], t[1])),
            t => LogNormal.IsNatural(t),
            x => Terms(v => LogNormal.Statistics(x, v), LogNormal.LogBase(x), 2),
            [[0, 0], [1, 1]]);
        yield return new Subject("inverse_gaussian", IsCount: false,
            t => Law(new InverseGaussian(t[0], t[1])),
            t => InverseGaussian.IsNatural(t),
            x => Terms(v => InverseGaussian.Statistics(x, v), InverseGaussian.LogBase(x), 2),
            [[-1, 0], [0, 0], [0.1, -1]]);
        yield return new Subject("duration_log_lin_inv", IsCount: false,
            t => Law(new DelayedDuration(t[0], t[1], t[2])),
            t => DelayedDuration.IsNatural(t),
            x => Terms(v => DelayedDuration.Statistics(x, v), DelayedDuration.LogBase(x), 3),
            [[0, 0, -1], [0, 0.1, -1], [-1, -1, 0], [-2, 0, 0]]);
        yield return new Subject("duration_window_2_30", IsCount: false,
            t => Law(new WindowedDuration(t[0], t[1])),
            t => WindowedDuration.IsNatural(t),
            x => Terms(v => WindowedDuration.Statistics(x, v), WindowedDuration.LogBase(x), 2),
            [[double.NaN, 0]]);
        yield return new Subject("normal", IsCount: false,
            t => Law(new Normal(t[0], t[1])),
            t => Normal.IsNatural(t),
            x => Terms(v => Normal.Statistics(x, v), Normal.LogBase(x), 2),
            [[0, 0], [1, 0.5]]);
        yield return new Subject("quartic", IsCount: false,
            t => Law(new Quartic(t[0], t[1], t[2], t[3])),
            t => Quartic.IsNatural(t),
            x => Terms(v => Quartic.Statistics(x, v), Quartic.LogBase(x), 4),
            [[0, 0, 0, 1], [0, -1, 0.5, 0], [1, 0, 0, 0]]);
        yield return new Subject("beta", IsCount: false,
            t => Law(new Beta(t[0], t[1])),
            t => Beta.IsNatural(t),
            x => Terms(v => Beta.Statistics(x, v), Beta.LogBase(x), 2),
            [[-1, 0], [0, -1]]);
        yield return new Subject("bounded_log_log_lin", IsCount: false,
            t => Law(new TiltedBeta(t[0], t[1], t[2])),
            t => TiltedBeta.IsNatural(t),
            x => Terms(v => TiltedBeta.Statistics(x, v), TiltedBeta.LogBase(x), 3),
            [[-1, 0, 0], [0, -2, 0]]);
        yield return new Subject("von_mises", IsCount: false,
            t => Law(new VonMises(t[0], t[1])),
            t => VonMises.IsNatural(t),
            x => Terms(v => VonMises.Statistics(x, v), VonMises.LogBase(x), 2),
            [[double.NaN, 0]]);

        static double[] Terms(Action<double[]> statistics, double logBase, int count)
        {
            var terms = new double[count + 1];
            terms[count] = logBase;
            var values = new double[count];
            statistics(values);
            values.CopyTo(terms, 0);
            return terms;
        }
    }

    private static Law Law(Exponential law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity(x));

    private static Law Law(Gamma law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity(x));

    private static Law Law(ChiSquared law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity(x));

    private static Law Law(LogNormal law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity(x));

    private static Law Law(InverseGaussian law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity(x));

    private static Law Law(DelayedDuration law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity(x));

    private static Law Law(WindowedDuration law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity(x));

    private static Law Law(Normal law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity(x));

    private static Law Law(Quartic law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity(x));

    private static Law Law(Beta law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity(x));

    private static Law Law(TiltedBeta law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity(x));

    private static Law Law(VonMises law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity(x));
}
