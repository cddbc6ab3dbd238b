using System;

namespace FamilyGen.Partition;

public sealed partial class Distribution<TKernel>
{
    // Rounding that a distribution function at a lattice point may carry beside its own value, and what is lost when a
    // probability is taken from 1.
    private const double LatticeSlack = 64 * 2.2204460492503131e-16;
    private const double OneSlack = 1.2e-16;

    /// <summary>The point below which the probability p lies; on a lattice the smallest x with P(X ≤ x) ≥ p, where a
    /// difference of rounding counts as none.</summary>
    /// <exception cref="ArgumentOutOfRangeException">p is not in [0, 1].</exception>
    public double Quantile(double p)
    {
        if (!(p >= 0 && p <= 1))
            throw new ArgumentOutOfRangeException(nameof(p), p, "A probability lies between 0 and 1.");
        return p <= 0.5 ? Solve(p, isUpper: false, slack: 0) : Solve(1 - p, isUpper: true, OneSlack);
    }

    /// <summary>The point above which the probability q lies: the quantile of 1 − q, for q too small to be seen beside 1.
    /// On a lattice the smallest x with P(X &gt; x) ≤ q.</summary>
    /// <exception cref="ArgumentOutOfRangeException">q is not in [0, 1].</exception>
    public double SurvivalQuantile(double q)
    {
        if (!(q >= 0 && q <= 1))
            throw new ArgumentOutOfRangeException(nameof(q), q, "A probability lies between 0 and 1.");
        return q < 0.5 ? Solve(q, isUpper: true, slack: 0) : Solve(1 - q, isUpper: false, OneSlack);
    }

    private double Solve(double probability, bool isUpper, double slack)
    {
        if (probability == 0)
            return isUpper ? _domain.Upper : _domain.IsLattice ? FirstPoint() : _domain.Lower;
        if (_domain.IsLattice)
            return SolveLattice(probability, isUpper, slack);
        return probability >= ThinTail
            ? SolvePanel(probability, isUpper)
            : SolveTail(Math.Log(probability), isUpper);
    }

    private double FirstPoint()
    {
        var first = double.PositiveInfinity;
        foreach (var part in _whole.Parts)
            first = Math.Min(first, part.Basin.Lower);
        return first;
    }

    // Walks the basins from the end whose tail is given to the panel in which it is used up.
    private double SolvePanel(double probability, bool isUpper)
    {
        var tables = Tables;
        var left = probability;
        var last = double.NaN;
        for (var k = 0; k < tables.Order.Length; k++)
        {
            var index = tables.Order[isUpper ? tables.Order.Length - 1 - k : k];
            var table = tables.Tables[index];
            var unit = tables.Unit[index];
            var whole = unit * table.Below[^1];
            last = isUpper ? table.Part.Basin.Lower : table.Part.Basin.Upper;
            if (left > whole)
            {
                left -= whole;
                continue;
            }

            return table.Part.Basin.Piece.Step > 0 ? table.Part.Basin.Mode.X : PanelQuantile(table, left / unit, isUpper);
        }

        // what rounding left over lies at the last basin's end
        return last;
    }

    private static double PanelQuantile(PanelTable<TKernel> table, double weight, bool isUpper)
    {
        var panels = table.Panels;
        var index = isUpper ? panels.Length - 1 : 0;
        if (isUpper)
        {
            while (index > 0 && table.Above[index] < weight)
                index--;
            weight -= table.Above[index + 1];
        }
        else
        {
            while (index < panels.Length - 1 && table.Below[index + 1] < weight)
                index++;
            weight -= table.Below[index];
        }

        return Observation(table.Part, Invert(table, panels[index], weight, isUpper));
    }

    // The offset in a panel beyond which it holds the weight, by Newton's method inside a shrinking bracket.
    private static double Invert(PanelTable<TKernel> table, in Panel panel, double weight, bool isUpper)
    {
        var (low, high) = (panel.Start, panel.End);
        var share = Math.Clamp(weight / panel.Weight, 0, 1);
        var offset = isUpper ? high - share * (high - low) : low + share * (high - low);
        for (var step = 0; step < 100; step++)
        {
            var excess = (isUpper ? table.PartAbove(panel, offset) : table.PartBelow(panel, offset)) - weight;
            if (excess == 0)
                return offset;
            if (excess > 0 == isUpper)
                low = offset;
            else
                high = offset;
            var height = Math.Exp(table.Part.Expansion.LogIntegrand(offset));
            var next = offset + (isUpper ? excess : -excess) / height;
            if (!(next > low && next < high))
                next = low + (high - low) / 2;
            var moved = Math.Abs(next - offset);
            offset = next;
            if (moved <= 1e-16 * Math.Max(Math.Abs(offset), panel.Extent) || moved * height <= 1e-16 * weight)
                return offset;
        }

        return offset;
    }

    private static double Observation(BasinPart<TKernel> part, double offset) =>
        Math.Clamp(part.Expansion.Frame.At(offset).X, part.Basin.Lower, part.Basin.Upper);

    // In a thin tail the logarithm of the tail itself is solved for, in the logarithm of the distance where the tail ends at
    // a finite point.
    private double SolveTail(double logProbability, bool isUpper)
    {
        const double LeastLog = -744.5;
        var start = SolvePanel(2 * ThinTail, isUpper);
        var end = isUpper ? _domain.Upper : _domain.Lower;
        var other = isUpper ? _domain.Lower : _domain.Upper;
        var direction = isUpper ? 1.0 : -1.0;

        // x = origin + sign·exp(t) about a finite end, or the far one; x = t on the line
        var isLinear = double.IsInfinity(end) && double.IsInfinity(other);
        var origin = double.IsFinite(end) ? end : other;
        var sign = origin == _domain.Lower ? 1.0 : -1.0;
        double ObservationAt(double t) => isLinear ? t : origin + sign * Math.Exp(t);
        var inner = isLinear ? start : Math.Log(Math.Abs(start - origin));
        var outer = isLinear ? direction * double.MaxValue : double.IsFinite(end) ? LeastLog : 709.5;
        var outward = isLinear ? direction : double.IsFinite(end) ? -1.0 : 1.0;
        if (LogTail(start, isUpper) - logProbability <= 0 || !double.IsFinite(inner))
            return start;
        if (!isLinear && double.IsFinite(end) && LogTail(ObservationAt(outer), isUpper) > logProbability)
            return end;
        var t = inner;
        for (var step = 0; step < 300; step++)
        {
            var x = ObservationAt(t);
            var log = LogTail(x, isUpper);
            var excess = log - logProbability;
            if (Math.Abs(excess) <= 1e-13 * Math.Abs(logProbability))
                return x;
            if (excess > 0)
                inner = t;
            else
                outer = t;

            // d log tail/dt: tails are mostly log-concave, so that the step does not overshoot
            var slope = Math.Exp(LogDensity(x) + (isLinear ? 0 : t) - log);
            var next = t + outward * excess / slope;
            if (!double.IsFinite(next) || !((next - inner) * outward > 0 && (outer - next) * outward > 0))
                next = Between(isLinear, inner, outer);
            if (next == t || !((next - inner) * outward > 0 && (outer - next) * outward > 0))
                return x;
            t = next;
        }

        return ObservationAt(t);
    }

    private double LogTail(double x, bool isUpper) => isUpper ? LogSurvival(x) : LogCdf(x);

    private static double Between(bool isLinear, double a, double b)
    {
        if (isLinear && a != 0 && Math.Sign(a) == Math.Sign(b) && Math.Abs(Math.ILogB(a) - Math.ILogB(b)) > 2)
            return Math.Sign(a) * Math.Sqrt(Math.Abs(a)) * Math.Sqrt(Math.Abs(b));
        return a / 2 + b / 2;
    }

    // The smallest point whose lower tail reaches the probability, or whose upper tail no longer exceeds it.
    private double SolveLattice(double probability, bool isUpper, double slack)
    {
        var (low, high) = LatticeBracket(probability, isUpper, slack);
        while (high - low > 1)
        {
            var middle = low + Math.Floor((high - low) / 2);
            if (!(middle > low && middle < high))
                break;
            if (Reaches(middle, probability, isUpper, slack))
                high = middle;
            else
                low = middle;
        }

        return high;
    }

    private bool Reaches(double x, double probability, bool isUpper, double slack) => isUpper
        ? Survival(x) <= probability * (1 + LatticeSlack) + slack
        : Cdf(x) >= probability * (1 - LatticeSlack) - slack;

    // A point that does not reach the probability and one that does, found by strides from the panel that holds it.
    private (double Low, double High) LatticeBracket(double probability, bool isUpper, double slack)
    {
        var start = Math.Round(_whole.Main!.Basin.Mode.X);
        if (Tables.IsOrdered && probability >= ThinTail)
            start = Approach(PanelStart(probability, isUpper), probability, isUpper);
        var (low, high) = (start, start);
        var stride = 1.0;
        if (Reaches(start, probability, isUpper, slack))
        {
            do
            {
                high = low;
                low = Math.Max(high - stride, _domain.Lower - 1);
                stride *= 2;
            }
            while (low >= _domain.Lower && Reaches(low, probability, isUpper, slack));
        }
        else
        {
            do
            {
                low = high;
                high = Math.Min(low + stride, _domain.Upper);
                stride *= 2;
            }
            while (high < _domain.Upper && !Reaches(high, probability, isUpper, slack));
        }

        return (low, high);
    }

    // Newton's method from a point in the right panel, as if the lattice were a line.
    private double Approach(double x, double probability, bool isUpper)
    {
        for (var step = 0; step < 8; step++)
        {
            var excess = (isUpper ? Tables.Above(x) : Tables.UpTo(x)) - probability;
            var move = Math.Round(excess / Math.Exp(LogDensity(x)) * (isUpper ? 1 : -1));
            if (!(Math.Abs(move) >= 1 && Math.Abs(move) < 1e15))
                break;
            x = Math.Clamp(x + move, _domain.Lower, _domain.Upper);
        }

        return x;
    }

    private double PanelStart(double probability, bool isUpper)
    {
        var tables = Tables;
        var left = probability;
        for (var k = 0; k < tables.Order.Length; k++)
        {
            var index = tables.Order[isUpper ? tables.Order.Length - 1 - k : k];
            var table = tables.Tables[index];
            var unit = tables.Unit[index];
            if (left > unit * table.Below[^1])
            {
                left -= unit * table.Below[^1];
                continue;
            }

            var panels = table.Panels;
            for (var i = 0; i < panels.Length; i++)
            {
                var panel = panels[isUpper ? panels.Length - 1 - i : i];
                if (left > unit * panel.Weight)
                {
                    left -= unit * panel.Weight;
                    continue;
                }

                var share = left / (unit * panel.Weight);
                var offset = panel.Start + (panel.End - panel.Start) * (isUpper ? 1 - share : share);
                return Math.Round(table.Part.Basin.Mode.X + offset);
            }
        }

        return _whole.Main!.Basin.Mode.X;
    }
}
