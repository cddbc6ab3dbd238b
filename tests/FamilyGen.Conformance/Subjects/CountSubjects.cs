using System;
using System.Collections.Generic;
using FamilyGen.Conformance.Families;

namespace FamilyGen.Conformance.Subjects;

/// <summary>The families of counts behind the delegates of <see cref="Subject"/>.</summary>
internal static class CountSubjects
{
    public static IEnumerable<Subject> All()
    {
        yield return new Subject("bernoulli", IsCount: true,
            t => Law(new Bernoulli(t[0])),
            t => Bernoulli.IsNatural(t),
            x => Terms(v => Bernoulli.Statistics((int)x, v), Bernoulli.LogBase((int)x), 1),
            [[double.NaN], [double.PositiveInfinity]]);
        yield return new Subject("binomial_n12", IsCount: true,
            t => Law(new BinomialOfTwelve(t[0])),
            t => BinomialOfTwelve.IsNatural(t),
            x => Terms(v => BinomialOfTwelve.Statistics((int)x, v), BinomialOfTwelve.LogBase((int)x), 1),
            [[double.NaN]]);
        yield return new Subject("poisson", IsCount: true,
            t => Law(new Poisson(t[0])),
            t => Poisson.IsNatural(t),
            x => Terms(v => Poisson.Statistics((int)x, v), Poisson.LogBase((int)x), 1),
            [[double.NaN], [double.NegativeInfinity]]);
        yield return new Subject("geometric", IsCount: true,
            t => Law(new Geometric(t[0])),
            t => Geometric.IsNatural(t),
            x => Terms(v => Geometric.Statistics((int)x, v), Geometric.LogBase((int)x), 1),
            [[0], [0.5]]);
        yield return new Subject("negative_binomial_r2p5", IsCount: true,
            t => Law(new NegativeBinomial(t[0])),
            t => NegativeBinomial.IsNatural(t),
            x => Terms(v => NegativeBinomial.Statistics((int)x, v), NegativeBinomial.LogBase((int)x), 1),
            [[0], [2]]);
        yield return new Subject("categorical_4", IsCount: true,
            t => Law(new FourCategories(t[0], t[1], t[2])),
            t => FourCategories.IsNatural(t),
            x => Terms(v => FourCategories.Statistics((int)x, v), FourCategories.LogBase((int)x), 3),
            [[0, double.NaN, 0]]);
        yield return new Subject("dispersed_count", IsCount: true,
            t => Law(new ShiftStoppages(t[0], t[1])),
            t => ShiftStoppages.IsNatural(t),
            x => Terms(v => ShiftStoppages.Statistics((int)x, v), ShiftStoppages.LogBase((int)x), 2),
            [[0, 0], [1, 0], [-1, -0.1]]);
        yield return new Subject("dispersed_count_from_1", IsCount: true,
            t => Law(new StoppagesOfStoppedShifts(t[0], t[1])),
            t => StoppagesOfStoppedShifts.IsNatural(t),
            x => Terms(v => StoppagesOfStoppedShifts.Statistics((int)x, v), StoppagesOfStoppedShifts.LogBase((int)x), 2),
            [[0, 0], [1, 0], [-1, -0.1]]);
        yield return new Subject("dispersed_count_extra_zero", IsCount: true,
            t => Law(new StoppagesWithQuietShifts(t[0], t[1], t[2])),
            t => StoppagesWithQuietShifts.IsNatural(t),
            x => Terms(v => StoppagesWithQuietShifts.Statistics((int)x, v), StoppagesWithQuietShifts.LogBase((int)x), 3),
            [[0, 0, 1], [1, 0, 1], [-1, -0.1, 1]]);
        yield return new Subject("poisson_extra_zero", IsCount: true,
            t => Law(new PoissonWithExtraZero(t[0], t[1])),
            t => PoissonWithExtraZero.IsNatural(t),
            x => Terms(v => PoissonWithExtraZero.Statistics((int)x, v), PoissonWithExtraZero.LogBase((int)x), 2),
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

    private static Law Law(Bernoulli law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity((int)x));

    private static Law Law(BinomialOfTwelve law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity((int)x));

    private static Law Law(Poisson law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity((int)x));

    private static Law Law(Geometric law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity((int)x));

    private static Law Law(NegativeBinomial law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity((int)x));

    private static Law Law(FourCategories law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity((int)x));

    private static Law Law(ShiftStoppages law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity((int)x));

    private static Law Law(StoppagesOfStoppedShifts law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity((int)x));

    private static Law Law(StoppagesWithQuietShifts law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity((int)x));

    private static Law Law(PoissonWithExtraZero law) =>
        new(law.LogNormalizer, [.. law.MeanStatistics], law.StatisticCovariance, x => law.LogDensity((int)x));
}
