using System;
using FamilyGen.Kernels;
using FamilyGen.Special;

namespace FamilyGen.Partition;

/// <summary>The coordinates u(x) in which a partition is integrated.</summary>
internal enum Coordinate
{
    /// <summary>u = x: lattices, the line, the circle, intervals on which the exponent is bounded.</summary>
    Identity,

    /// <summary>u = log(x − lower).</summary>
    AboveLower,

    /// <summary>u = −log(upper − x).</summary>
    BelowUpper,

    /// <summary>u = log((x − lower)/(upper − x)).</summary>
    Between,
}

/// <summary>The increasing map between observations x and the integration coordinate u, in which ends with logarithms or
/// negative powers lie at infinity.</summary>
internal readonly struct Chart
{
    public Chart(Domain domain)
    {
        (Lower, Upper) = (domain.Lower, domain.Upper);
        var (below, above) = (double.IsFinite(Lower), double.IsFinite(Upper));
        Kind = domain.IsLattice || domain.IsCircle || (!below && !above) ? Coordinate.Identity
            : !above ? Coordinate.AboveLower
            : !below ? Coordinate.BelowUpper
            : domain.LowerSingular && domain.UpperSingular ? Coordinate.Between
            : domain.LowerSingular ? Coordinate.AboveLower
            : domain.UpperSingular ? Coordinate.BelowUpper
            : Coordinate.Identity;
        IsLattice = domain.IsLattice;
    }

    public Coordinate Kind { get; }

    public bool IsLattice { get; }

    public double Lower { get; }

    public double Upper { get; }

    /// <summary>The least and greatest coordinate that a search for modes looks at: on logarithmic scales, those between
    /// which distances to an end are doubles.</summary>
    public (double Lower, double Upper) SearchRange => Kind switch
    {
        Coordinate.Identity => (Math.Max(Lower, -double.MaxValue), Math.Min(Upper, double.MaxValue)),
        Coordinate.AboveLower => (-743, double.IsFinite(Upper) ? Math.Log(Upper - Lower) : 709.5),
        Coordinate.BelowUpper => (double.IsFinite(Lower) ? -Math.Log(Upper - Lower) : -709.5, 743),
        _ => (-743, 743),
    };

    /// <summary>u(x).</summary>
    public double CoordinateOf(double x) => Kind switch
    {
        Coordinate.Identity => x,
        Coordinate.AboveLower => Math.Log(x - Lower),
        Coordinate.BelowUpper => -Math.Log(Upper - x),
        _ => Math.Log(x - Lower) - Math.Log(Upper - x),
    };

    /// <summary>The reference point nearest to the coordinate u.</summary>
    public Point ReferenceNear(double u)
    {
        double x;
        switch (Kind)
        {
            case Coordinate.Identity:
                return Reference(u);
            case Coordinate.AboveLower:
                x = Lower + Math.Exp(u);
                return IsFineGrained(x, Lower)
                    ? Reference(x)
                    : Reference(x) with { LogAboveLower = u };
            case Coordinate.BelowUpper:
                x = Upper - Math.Exp(-u);
                return IsFineGrained(x, Upper)
                    ? Reference(x)
                    : Reference(x) with { LogBelowUpper = -u };
            default:
                var width = Upper - Lower;
                x = u < 0 ? Lower + width * Elementary.Logistic(u) : Upper - width * Elementary.Logistic(-u);
                return IsFineGrained(x, Lower) && IsFineGrained(x, Upper)
                    ? Reference(x)
                    : Reference(x) with
                    {
                        LogAboveLower = Math.Log(width) - Elementary.LogOnePlusExp(-u),
                        LogBelowUpper = Math.Log(width) - Elementary.LogOnePlusExp(u),
                    };
        }
    }

    /// <summary>The reference point at x itself.</summary>
    public Point Reference(double x) => new()
    {
        X = x,
        LogAboveLower = IsLattice ? double.NaN : EndDistance.LogAbove(x, Lower, Upper),
        LogBelowUpper = IsLattice ? double.NaN : EndDistance.LogBelow(x, Lower, Upper),
        RatioToLower = IsLattice || double.IsInfinity(Lower) ? double.NaN : 0,
        RatioToUpper = IsLattice || double.IsInfinity(Upper) ? double.NaN : 0,
    };

    /// <summary>Whether doubles near x resolve the distance from x to the end, so that x itself may be the reference
    /// point.</summary>
    public static bool IsFineGrained(double x, double end) =>
        double.IsFinite(x) && Math.Abs(x - end) > 1e-300 && Math.Abs(x - end) >= 1e-3 * Math.Abs(end);
}
