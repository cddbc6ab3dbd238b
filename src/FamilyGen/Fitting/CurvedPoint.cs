using System;
using FamilyGen.Kernels;

namespace FamilyGen.Fitting;

/// <summary>The likelihood of a family at trade parameters, with first and second derivatives in them.</summary>
internal sealed class CurvedPoint<TKernel>
    where TKernel : struct, ITradeKernel
{
    private CurvedPoint(ModelPoint<TKernel> law, NaturalMap map, double[] parameters)
    {
        (Law, Map, Parameters) = (law, map, parameters);
        var p = parameters.Length;
        Gradient = new double[p];
        Hessian = new double[p, p];
        Information = new double[p, p];
        var columns = new double[p][];
        for (var a = 0; a < p; a++)
        {
            columns[a] = law.Basis.FromNatural(map.Column(a));
            Gradient[a] = Dot(columns[a], law.Gradient);
        }

        for (var a = 0; a < p; a++)
        {
            for (var b = 0; b <= a; b++)
            {
                double expected = 0;
                for (var i = 0; i < columns[a].Length; i++)
                {
                    for (var j = 0; j < columns[b].Length; j++)
                        expected += columns[a][i] * columns[b][j] * law.Covariance[i, j];
                }

                Information[a, b] = Information[b, a] = expected;
                Hessian[a, b] = Hessian[b, a] = Dot(law.Basis.FromNatural(map.Column(a, b)), law.Gradient) - expected;
            }
        }
    }

    /// <summary>The law at η(φ), with the likelihood for a unit of weight.</summary>
    public ModelPoint<TKernel> Law { get; }

    /// <summary>η and its derivatives.</summary>
    public NaturalMap Map { get; }

    /// <summary>The trade parameters φ.</summary>
    public double[] Parameters { get; }

    /// <summary>The gradient of the log-likelihood in φ.</summary>
    public double[] Gradient { get; }

    /// <summary>Its second derivatives.</summary>
    public double[,] Hessian { get; }

    /// <summary>The expected information of a unit of weight about φ.</summary>
    public double[,] Information { get; }

    /// <summary>Evaluates; null where the law cannot be evaluated (the reason is then given).</summary>
    public static CurvedPoint<TKernel>? TryAt(StatisticSums<TKernel> sums, double[] parameters, out string? reason)
    {
        var map = NaturalMap.At(sums.Kernel, parameters);
        if (ModelPoint<TKernel>.TryAt(sums, map.Theta, out reason) is not { } law)
            return null;
        var point = new CurvedPoint<TKernel>(law, map, parameters);
        foreach (var value in point.Hessian)
        {
            if (!double.IsFinite(value))
            {
                reason = "the information about the parameters is not finite there";
                return null;
            }
        }

        return point;
    }

    /// <summary>The inverse of the observed information of a unit of weight about φ; null when it is not positive definite.</summary>
    public double[,]? ObservedCovariance()
    {
        var p = Gradient.Length;
        var observed = new double[p, p];
        for (var a = 0; a < p; a++)
        {
            for (var b = 0; b < p; b++)
                observed[a, b] = -Hessian[a, b];
        }

        return Cholesky.TryFactor(observed)?.Inverse();
    }

    /// <summary>A parameter along which the likelihood neither rises nor bends though the law would change: in units in which
    /// the expected information is 1, slope and observed information are 0 to within rounding. Null when there is none.</summary>
    public int? FlatParameter()
    {
        const double Rounding = 1e-8;
        for (var a = 0; a < Gradient.Length; a++)
        {
            if (Math.Abs(Hessian[a, a]) <= Rounding * Information[a, a] && Math.Abs(Gradient[a]) <= Rounding * Math.Sqrt(Information[a, a]))
                return a;
        }

        return null;
    }

    private static double Dot(double[] a, double[] b)
    {
        double sum = 0;
        for (var i = 0; i < a.Length; i++)
        {
            if (a[i] != 0)
                sum += a[i] * b[i];
        }

        return sum;
    }
}
