using System;
using System.Linq;
using FamilyGen.Kernels;

namespace FamilyGen.Partition;

/// <summary>The exponent beyond the range of doubles, on a half-line with a tail so heavy that it still counts there: by the
/// ranks of its growth, which at such distances is all there is to it.</summary>
/// <remarks>With L the logarithm of the distance to the finite end, f(L) − f(L₀) = Σ cᵢ(gᵢ(L) − gᵢ(L₀)) for the ranks g of the
/// logarithm, its powers and its own logarithm; what is left out is smaller than 1e−290. A stronger rank with a coefficient
/// other than 0 leaves nothing of the integrand.</remarks>
internal sealed class FarTail<TKernel>
    where TKernel : struct, IKernel
{
    private const double FarthestLog = 690;

    private readonly Frame _frame;
    private readonly Rank[] _ranks;
    private readonly double[] _coefficients;
    private readonly double[] _difference;
    private readonly double _exponent;
    private readonly bool _isVanishing;

    public FarTail(NaturalSet set, ReadOnlySpan<double> theta, Expansion<TKernel> expansion)
    {
        _frame = expansion.Frame;
        _difference = new double[theta.Length + 1];
        Span<double> residual = stackalloc double[theta.Length + 1];
        var reference = LogReference(_frame);
        var offset = _frame.Chart.Kind == Coordinate.AboveLower ? FarthestLog - reference : reference - FarthestLog;
        _exponent = expansion.Difference(_frame.At(offset, expansion.Reference.Integer), residual, _difference);
        var isUpper = _frame.Chart.Kind == Coordinate.AboveLower;
        var ends = set.Ends.Where(end => end.IsInfinite && end.IsUpper == isUpper).ToArray();
        _ranks = ends.Length == 1 ? [.. ends[0].Ranks] : [];
        _coefficients = new double[_ranks.Length];
        for (var i = 0; i < _ranks.Length; i++)
        {
            CompensatedSum sum = default;
            sum.Add(_ranks[i].Constant);
            for (var j = 0; j < theta.Length; j++)
                sum.AddProduct(_ranks[i].Weights[j], theta[j]);
            _coefficients[i] = sum.Value;
            _isVanishing |= _coefficients[i] != 0 && _ranks[i].Growth.Kind > GrowthKind.LogPower;
        }

        // without the ranks nothing can be said, unless nothing is left anyway
        _isVanishing |= !(_exponent > -700 - FarthestLog);
        if (!_isVanishing && ends.Length != 1)
            throw new PartitionException("The tail is too heavy: it still counts where doubles end.");
    }

    /// <summary>Whether an offset lies beyond the range of doubles.</summary>
    public static bool Reaches(in Frame frame, double offset) => frame.Chart.Kind switch
    {
        Coordinate.AboveLower => frame.Reference.LogAboveLower + offset > FarthestLog,
        Coordinate.BelowUpper => frame.Reference.LogBelowUpper - offset > FarthestLog,
        _ => false,
    };

    /// <summary>f − f(m) at an offset, the differences of the statistics, and the logarithm of the integrand.</summary>
    public double At(double offset, Span<double> difference, out double log)
    {
        _difference.CopyTo(difference);
        if (_isVanishing)
            return log = double.NegativeInfinity;
        var reference = LogReference(_frame);
        var distance = _frame.Chart.Kind == Coordinate.AboveLower ? reference + offset : reference - offset;
        var exponent = _exponent;
        for (var i = 0; i < _ranks.Length; i++)
        {
            var growth = Value(_ranks[i].Growth, distance) - Value(_ranks[i].Growth, FarthestLog);
            exponent += _coefficients[i] * growth;
            for (var j = 0; j < _difference.Length - 1; j++)
                difference[j] += _ranks[i].Weights[j] * growth;
        }

        log = exponent + (distance - reference);
        return exponent;
    }

    private static double LogReference(in Frame frame) =>
        frame.Chart.Kind == Coordinate.AboveLower ? frame.Reference.LogAboveLower : frame.Reference.LogBelowUpper;

    // The value of a rank of the scale where the logarithm of the distance is L; stronger ranks have no part in it.
    private static double Value(Growth growth, double log) => growth.Kind switch
    {
        GrowthKind.Log => log,
        GrowthKind.LogPower => Math.Pow(log, growth.Order),
        GrowthKind.LogLog => Math.Log(log),
        _ => 0,
    };
}
