using System;
using System.Collections.Generic;

namespace FamilyGen.Generator.Algebra;

/// <summary>coefficient · e^(rate·t) · t^order · (log t)^logOrder · (log log t)^logLogOrder as t → ∞. Coefficient, rate and
/// order may use known values. A wavering term is a bounded function without a limit times the rest.</summary>
internal sealed record AsymptoticTerm(
    Polynomial Coefficient, Polynomial Rate, Polynomial Order, Rational LogOrder, Rational LogLogOrder, bool IsWavering)
{
    public static AsymptoticTerm Constant(Polynomial value) =>
        new(value, Polynomial.Zero, Polynomial.Zero, Rational.Zero, Rational.Zero, false);

    /// <summary>coefficient·t^order.</summary>
    public static AsymptoticTerm Power(Polynomial coefficient, Polynomial order) => Constant(coefficient) with { Order = order };

    public static AsymptoticTerm Log { get; } = Constant(Polynomial.One) with { LogOrder = 1 };

    public static AsymptoticTerm LogLog { get; } = Constant(Polynomial.One) with { LogLogOrder = 1 };

    public static AsymptoticTerm Wave { get; } = Constant(Polynomial.One) with { IsWavering = true };

    /// <summary>Rate and order as numbers: known values are put at a number of their own, positive and not special.</summary>
    public double RateEstimate => Estimate(Rate);

    public double OrderEstimate => Estimate(Order);

    /// <summary>Whether the place in the scale depends on known values.</summary>
    public bool IsSymbolic => Rate.Dependence != Dependence.None || Order.Dependence != Dependence.None;

    public bool IsConstant => Rate.IsZero && Order.IsZero && LogOrder.IsZero && LogLogOrder.IsZero;

    /// <summary>Whether the term, without its coefficient, tends to infinity (to zero where it shrinks).</summary>
    public bool Grows => StrengthAgainst(Constant(Polynomial.One)) > 0;

    public bool Shrinks => StrengthAgainst(Constant(Polynomial.One)) < 0;

    public static AsymptoticTerm operator *(AsymptoticTerm a, AsymptoticTerm b) => new(
        a.Coefficient * b.Coefficient,
        a.Rate + b.Rate,
        a.Order + b.Order,
        a.LogOrder + b.LogOrder,
        a.LogLogOrder + b.LogLogOrder,
        a.IsWavering || b.IsWavering);

    public bool IsSameRank(AsymptoticTerm other) =>
        LogOrder == other.LogOrder && LogLogOrder == other.LogLogOrder && IsWavering == other.IsWavering
        && Polynomial.Same(Rate, other.Rate) && Polynomial.Same(Order, other.Order);

    /// <summary>Positive when this term outgrows the other, 0 at the same rank.</summary>
    public int StrengthAgainst(AsymptoticTerm other)
    {
        var rate = Sign(RateEstimate - other.RateEstimate);
        if (rate != 0)
            return rate;
        var order = Sign(OrderEstimate - other.OrderEstimate);
        if (order != 0)
            return order;
        var log = LogOrder.CompareTo(other.LogOrder);
        return log != 0 ? log : LogLogOrder.CompareTo(other.LogLogOrder);
    }

    public static double Estimate(Polynomial value)
    {
        if (value.AsRational() is { } number)
            return number.ToDouble();
        return Evaluator.Evaluate(value.ToSortedExpression(), Known);
    }

    private static int Sign(double difference) => Math.Abs(difference) < 1e-12 || double.IsNaN(difference) ? 0 : Math.Sign(difference);

    private static double Known(Symbol symbol)
    {
        var sum = 0;
        foreach (var letter in symbol.Name)
            sum = ((sum * 7) + letter) % 1009;
        return symbol.IsInteger ? 3 + (sum % 5) : 1.25 + (sum / 2018.0);
    }
}
