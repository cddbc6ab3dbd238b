using System;
using FamilyGen.Special;

namespace FamilyGen.ClosedForms;

/// <summary>∫ exp(b·y + q·y²) dy over an interval or half-line (settings: its ends), q &lt; 0: the truncated normal law, and with
/// y = log x the truncated log-normal one.</summary>
/// <remarks>In t = (y − μ)/σ a half-line from the end nearer to the mode (see <see cref="NormalTail"/>), less the half-line
/// beyond the other end. α = −(b + 2q·end)σ is taken from the slope at the end, which does not cancel. Where the interval is
/// so narrow that the two half-lines nearly cancel there is no answer.</remarks>
public sealed class GaussianSegmentForm : IClosedForm
{
    /// <inheritdoc/>
    public static int Count => 2;

    /// <inheritdoc/>
    public static double RelativeError => 1e-12;

    /// <inheritdoc/>
    public static bool TryEvaluate(
        ReadOnlySpan<double> settings, ReadOnlySpan<double> coefficients, out double logNormalizer, Span<double> mean, Span<double> covariance)
    {
        var (lower, upper, slope, curvature) = (settings[0], settings[1], coefficients[0], -2 * coefficients[1]);
        logNormalizer = double.NaN;
        if (!(lower < upper && curvature > 0 && double.IsFinite(slope) && double.IsFinite(curvature)))
            return false;
        var sd = 1 / Math.Sqrt(curvature);
        var (alpha, beta) = (Standard(lower, slope, curvature, sd), Standard(upper, slope, curvature, sd));

        // seen from the end nearer to the mode, the law looks to the right
        var side = Math.Abs(alpha) <= Math.Abs(beta) || alpha > 0 ? 1 : -1;
        var near = lower;
        if (side < 0)
            (alpha, beta, near) = (-beta, -alpha, upper);
        Span<double> work = stackalloc double[MomentMixture.Room(2) + MomentPart.Room(2)];
        Span<double> moments = stackalloc double[6];
        var mixture = new MomentMixture(2, work[..MomentMixture.Room(2)]);
        var part = new MomentPart(2, work[MomentMixture.Room(2)..]);
        Tail(alpha, 0, 0, ref part);
        mixture.Add(1, part);
        if (double.IsFinite(beta))
        {
            var from = Math.Max(alpha, 0);
            Tail(beta, beta - from, -0.5 * (beta - from) * (beta + from), ref part);
            mixture.Add(-1, part);
        }

        if (!mixture.TryFinish(5e-14, 2e-13, 1e-12, out var log, moments[..2], moments[2..]))
            return false;

        // u counts from the mode, or from the end where that lies outside
        var (origin, level) = alpha > 0 ? (near, (slope - (0.5 * curvature * near)) * near) : (slope / curvature, 0.5 * slope * (slope / curvature));
        logNormalizer = level + Math.Log(sd) + log;
        if (mean.Length > 0)
            Place(origin, side * sd, moments, mean, covariance);
        return double.IsFinite(logNormalizer);
    }

    // (end − μ)/σ
    private static double Standard(double end, double slope, double curvature, double sd) =>
        double.IsInfinity(end) ? end : -Math.FusedMultiplyAdd(-curvature, end, slope) * sd;

    // The half-line from alpha on in u = shift + (t − max(alpha, 0)), weighed with e^offset.
    private static void Tail(double alpha, double shift, double offset, ref MomentPart part)
    {
        NormalTail.Evaluate(alpha, out var log, part.Mean, part.Covariance);
        var (first, v, w) = (part.Mean[0], part.Covariance[0], part.Covariance[1]);
        part.Log = offset + log;
        part.LogError = 2 * 2.3e-16 * (1 + Math.Abs(offset));
        part.Mean[0] = shift + first;
        part.Mean[1] += shift * (shift + (2 * first));
        part.Covariance[1] = part.Covariance[2] = w + (2 * shift * v);
        part.Covariance[3] += 4 * shift * (w + (shift * v));
        for (var i = 0; i < 2; i++)
            part.MeanError[i] = 1e-15 * Math.Abs(part.Mean[i]);
        for (var i = 0; i < 4; i++)
            part.CovarianceError[i] = 1e-15 * Math.Abs(part.Covariance[i]);
    }

    // y = origin + scale·u
    private static void Place(double origin, double scale, ReadOnlySpan<double> moments, Span<double> mean, Span<double> covariance)
    {
        var square = scale * scale;
        var (v, w, x) = (moments[2] * square, moments[3] * square * scale, moments[5] * square * square);
        mean[0] = origin + (scale * moments[0]);
        mean[1] = (origin * origin) + (2 * origin * scale * moments[0]) + (square * moments[1]);
        covariance[0] = v;
        covariance[1] = covariance[2] = (2 * origin * v) + w;
        covariance[3] = (4 * origin * ((origin * v) + w)) + x;
    }
}
