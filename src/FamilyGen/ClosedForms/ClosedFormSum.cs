using System;

namespace FamilyGen.ClosedForms;

/// <summary>The normalizer of a family as one catalogue entry, or as a sum of entries over pieces of the support and of single
/// points, some of them taken away: pieces, masses, truncation at points, indicators.</summary>
/// <remarks>An answer is given only where rounding leaves the stated accuracy: A to 1e-13 + 8ε·max|θⱼE Tⱼ|, means to 1e-12
/// standard deviations + 8ε of their size, covariances to 1e-11·√(Varᵢ Varⱼ). Elsewhere the numeric partition takes over.</remarks>
public ref struct ClosedFormSum
{
    private const double Unit = 2.220446049250313e-16;
    private const double LogError = 5e-14;
    private const double MeanError = 5e-13;
    private const double CovarianceError = 5e-12;

    private readonly ReadOnlySpan<double> _theta;
    private MomentMixture _mixture;
    private MomentPart _part;
    private bool _failed;

    /// <summary>An empty sum.</summary>
    /// <param name="theta">The natural parameters.</param>
    /// <param name="work">Room for <see cref="Room"/> numbers.</param>
    public ClosedFormSum(ReadOnlySpan<double> theta, Span<double> work)
    {
        var room = MomentMixture.Room(theta.Length);
        _theta = theta;
        _mixture = new(theta.Length, work[..room]);
        _part = new(theta.Length, work[room..]);
    }

    /// <summary>How many numbers a sum needs to work.</summary>
    public static int Room(int parameters) => MomentMixture.Room(parameters) + MomentPart.Room(parameters);

    /// <summary>Adds an entry.</summary>
    /// <param name="settings">The entry's settings.</param>
    /// <param name="rows">The rows of the affine map from natural parameters to the added constant c₀ and to the entry's
    /// coefficients, one after another: a weight for each natural parameter, then a constant.</param>
    public void Add<TForm>(ReadOnlySpan<double> settings, ReadOnlySpan<double> rows)
        where TForm : IClosedForm
    {
        if (_failed)
            return;
        if (ChainRule.TryMoments<TForm>(_theta, settings, rows, ref _part))
            _mixture.Add(1, _part);
        else
            _failed = true;
    }

    /// <summary>Adds a single point.</summary>
    /// <param name="row">Its statistics, then log h there.</param>
    public void AddPoint(ReadOnlySpan<double> row) => Point(1, row);

    /// <summary>Takes away what an entry has at a single point; after all that is added.</summary>
    /// <param name="row">The entry's part of the statistics at the point, then its part of log h.</param>
    public void RemovePoint(ReadOnlySpan<double> row) => Point(-1, row);

    /// <summary>The normalizer's logarithm A, ∇A and ∇²A; the spans may be empty when only A is asked.</summary>
    public readonly bool TryResult(out double logNormalizer, Span<double> mean, Span<double> covariance)
    {
        logNormalizer = double.NaN;
        return !_failed && _mixture.TryFinish(LogError, MeanError, CovarianceError, out logNormalizer, mean, covariance);
    }

    /// <summary>A single entry: its logarithm A and, unless the spans are empty, ∇A and ∇²A.</summary>
    public static bool TryEvaluate<TForm>(
        ReadOnlySpan<double> theta, ReadOnlySpan<double> settings, ReadOnlySpan<double> rows, out double logNormalizer, Span<double> mean, Span<double> covariance)
        where TForm : IClosedForm
    {
        var count = theta.Length;
        if (mean.Length == 0 && ChainRule.IsPlain(rows, count))
            return ChainRule.TryLog<TForm>(theta, settings, rows, out logNormalizer);
        logNormalizer = double.NaN;
        var part = new MomentPart(count, stackalloc double[MomentPart.Room(count)]);
        if (!ChainRule.TryMoments<TForm>(theta, settings, rows, ref part) || !IsAccurate(theta, rows, part))
            return false;
        logNormalizer = part.Log;
        if (mean.Length > 0)
        {
            part.Mean.CopyTo(mean);
            part.Covariance.CopyTo(covariance);
        }

        return true;
    }

    private void Point(double sign, ReadOnlySpan<double> row)
    {
        ChainRule.Point(_theta, row, ref _part);
        _mixture.Add(sign, _part);
    }

    private static bool IsAccurate(ReadOnlySpan<double> theta, ReadOnlySpan<double> rows, in MomentPart part)
    {
        var count = theta.Length;
        var (shift, largest) = (0.0, Math.Abs(part.Log));
        for (var j = 0; j < count; j++)
        {
            shift += Math.Abs(rows[j] * theta[j]);
            largest = Math.Max(largest, Math.Abs(theta[j] * part.Mean[j]));
        }

        if (!double.IsFinite(part.Log) || !(Unit * shift <= LogError + (4 * Unit * largest)))
            return false;
        for (var i = 0; i < count; i++)
        {
            var deviation = Math.Sqrt(part.Covariance[i * (count + 1)]);
            if (!double.IsFinite(part.Mean[i]) || !(part.MeanError[i] <= (MeanError * deviation) + (6 * Unit * Math.Abs(part.Mean[i]))))
                return false;
            for (var j = 0; j <= i; j++)
            {
                var size = deviation * Math.Sqrt(part.Covariance[j * (count + 1)]);
                var at = (i * count) + j;
                if (!double.IsFinite(part.Covariance[at]) || !(part.CovarianceError[at] <= CovarianceError * size))
                    return false;
            }
        }

        return true;
    }
}
