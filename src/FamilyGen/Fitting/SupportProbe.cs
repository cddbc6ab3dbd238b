using System;
using System.Collections.Generic;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>Points all over a support, dense where the data are, for checking what a statistic can be.</summary>
internal static class SupportProbe
{
    private const int Near = 500;

    public static IEnumerable<double> Points(Domain domain, double minimum, double maximum) =>
        domain.IsLattice ? Lattice(domain, minimum, maximum) : Interval(domain, minimum, maximum);

    private static IEnumerable<double> Lattice(Domain domain, double minimum, double maximum)
    {
        var centre = double.IsFinite(domain.Lower) ? domain.Lower : double.IsFinite(domain.Upper) ? domain.Upper : 0;
        foreach (var origin in new[] { centre, minimum, maximum })
        {
            for (var i = -Near; i <= Near; i++)
            {
                if (Contains(domain, origin + i))
                    yield return origin + i;
            }
        }

        for (var distance = 1.0; distance < 1e15; distance = Math.Floor(distance * 1.37) + 1)
        {
            if (Contains(domain, centre + distance))
                yield return centre + distance;
            if (Contains(domain, centre - distance))
                yield return centre - distance;
        }
    }

    private static IEnumerable<double> Interval(Domain domain, double minimum, double maximum)
    {
        foreach (var mass in domain.Masses)
            yield return mass;
        var spread = Math.Max(maximum - minimum, Math.Max(Math.Abs(minimum), Math.Abs(maximum)));
        if (!(spread > 0))
            spread = 1;
        for (var i = -200; i <= 200; i++)
        {
            var t = i / 10.0;
            var x = (double.IsFinite(domain.Lower), double.IsFinite(domain.Upper)) switch
            {
                (true, true) => domain.Lower + ((domain.Upper - domain.Lower) / (1 + Math.Exp(-t))),
                (true, false) => domain.Lower + (spread * Math.Exp(t)),
                (false, true) => domain.Upper - (spread * Math.Exp(-t)),
                _ => minimum + (spread * Math.Sinh(t)),
            };
            if (Contains(domain, x))
                yield return x;
        }

        for (var i = 0; i <= 200; i++)
            yield return minimum + ((maximum - minimum) * i / 200);
    }

    private static bool Contains(Domain domain, double x) => ObservationRule.BrokenBy(x, domain) is null;
}
