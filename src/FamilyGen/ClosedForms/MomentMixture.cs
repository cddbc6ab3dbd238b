using System;
using FamilyGen.Special;

namespace FamilyGen.ClosedForms;

/// <summary>A sum of measures, some of them taken away, gathered as log weight, mean and covariance, together with bounds on
/// what rounding has done to each: where one measure nearly cancels another, the bounds say so.</summary>
/// <remarks>Means and scatter are merged pairwise about the running mean (Chan, Golub and LeVeque 1983), which holds for
/// negative weights as long as the running total is positive: what is taken away comes last.</remarks>
internal ref struct MomentMixture
{
    private const double Unit = 2.220446049250313e-16;

    private readonly Span<double> _mean;
    private readonly Span<double> _meanError;
    private readonly Span<double> _scatter;
    private readonly Span<double> _scatterError;
    private double _scale;
    private double _weight;
    private double _weightError;
    private bool _failed;

    /// <summary>An empty mixture of laws of <paramref name="count"/> statistics.</summary>
    public MomentMixture(int count, Span<double> work)
    {
        _mean = work[..count];
        _meanError = work.Slice(count, count);
        _scatter = work.Slice(2 * count, count * count);
        _scatterError = work.Slice((2 * count) + (count * count), count * count);
        work[..Room(count)].Clear();
        _scale = double.NegativeInfinity;
    }

    /// <summary>The numbers that a mixture needs to work.</summary>
    public static int Room(int count) => 2 * count * (count + 1);

    /// <summary>Adds a measure or, with sign −1, takes it away.</summary>
    /// <param name="sign">1 or −1.</param>
    /// <param name="part">Its logarithm, mean and covariance with their errors.</param>
    public void Add(double sign, in MomentPart part)
    {
        if (double.IsNegativeInfinity(part.Log))
            return;
        if (!double.IsFinite(part.Log))
        {
            _failed = true;
            return;
        }

        if (part.Log > _scale)
            Rescale(part.Log);
        var w = Math.Exp(part.Log - _scale);
        var error = w * (part.LogError + (2 * Unit));
        var total = _weight + (sign * w);
        if (!(total > 0))
        {
            _failed = true;
            return;
        }

        Merge(sign, w, error, total, part);
        _weight = total;
        _weightError += error + (Unit * total);
    }

    /// <summary>The mixture's log weight, mean and covariance.</summary>
    /// <param name="logError">The largest error of the log weight that is allowed.</param>
    /// <param name="deviation">The largest error of a mean in standard deviations, unless it is a few units of its own size.</param>
    /// <param name="relative">The largest error of a covariance beside √(Varᵢ Varⱼ).</param>
    /// <param name="log">The log weight.</param>
    /// <param name="mean">The mean; empty when the log weight alone is asked.</param>
    /// <param name="covariance">The covariance.</param>
    /// <returns>False where rounding may exceed what is allowed.</returns>
    public readonly bool TryFinish(double logError, double deviation, double relative, out double log, Span<double> mean, Span<double> covariance)
    {
        log = _weight == 1 ? _scale : _scale + Math.Log(_weight);
        if (_failed || !double.IsFinite(log) || !(_weightError <= logError * _weight))
            return false;
        if (mean.Length == 0)
            return true;
        var count = _mean.Length;
        var lost = _weightError / _weight;
        for (var i = 0; i < count; i++)
        {
            var sd = Math.Sqrt(_scatter[(count + 1) * i] / _weight);
            mean[i] = _mean[i];
            if (!double.IsFinite(mean[i]) || !(_meanError[i] <= (deviation * sd) + (4 * Unit * Math.Abs(mean[i]))))
                return false;
        }

        for (var i = 0; i < count; i++)
        {
            for (var j = 0; j < count; j++)
            {
                var at = (count * i) + j;
                var value = covariance[at] = _scatter[at] / _weight;
                var size = Math.Sqrt(_scatter[(count + 1) * i] / _weight) * Math.Sqrt(_scatter[(count + 1) * j] / _weight);
                if (!double.IsFinite(value) || !((_scatterError[at] / _weight) + (Math.Abs(value) * lost) <= relative * size))
                    return false;
            }
        }

        return true;
    }

    private void Rescale(double log)
    {
        var factor = Math.Exp(_scale - log);
        _weight *= factor;
        _weightError = (_weightError + (2 * Unit * _weight)) * factor;
        foreach (ref var value in _scatter)
            value *= factor;
        foreach (ref var value in _scatterError)
            value *= factor;
        _scale = log;
    }

    private readonly void Merge(double sign, double w, double error, double total, in MomentPart part)
    {
        var count = _mean.Length;
        var (joint, both) = (_weight / total * w, total * total);
        var ofJoint = ((_weight * _weight * error) + (w * w * _weightError)) / both;
        for (var i = 0; i < count; i++)
        {
            var di = part.Mean[i] - _mean[i];
            var ei = part.MeanError[i] + _meanError[i];
            for (var j = 0; j < count; j++)
            {
                var at = (count * i) + j;
                var dj = part.Mean[j] - _mean[j];
                var (own, between) = (w * part.Covariance[at], joint * di * dj);
                var spread = joint * ((Math.Abs(di) * (part.MeanError[j] + _meanError[j])) + (Math.Abs(dj) * ei));
                _scatterError[at] += (w * part.CovarianceError[at]) + (error * Math.Abs(part.Covariance[at])) + (ofJoint * Math.Abs(di * dj))
                    + spread + (2 * Unit * (Math.Abs(_scatter[at]) + Math.Abs(own) + Math.Abs(between)));
                _scatter[at] += sign * (own + between);
            }
        }

        for (var i = 0; i < count; i++)
        {
            var d = part.Mean[i] - _mean[i];
            _meanError[i] = (((_weight * _meanError[i]) + (w * part.MeanError[i])) / total)
                + (Math.Abs(d) * ((_weight * error) + (w * _weightError)) / both) + (Unit * Math.Abs(w / total * d));
            _mean[i] += sign * w / total * d;
        }
    }
}

/// <summary>One measure of a mixture: its logarithm, mean and covariance, with bounds on their errors.</summary>
internal ref struct MomentPart(int count, Span<double> work)
{
    public double Log;
    public double LogError;
    public readonly Span<double> Mean = work[..count];
    public readonly Span<double> MeanError = work.Slice(count, count);
    public readonly Span<double> Covariance = work.Slice(2 * count, count * count);
    public readonly Span<double> CovarianceError = work.Slice((2 * count) + (count * count), count * count);

    /// <summary>The numbers that a part needs to work.</summary>
    public static int Room(int count) => 2 * count * (count + 1);
}
