using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Catalogue;

/// <summary>An affine function of the natural parameters, Σ weightⱼθⱼ + constant, whose weights and constant are free of
/// the observation and of parameters.</summary>
internal sealed class AffineRow
{
    private AffineRow(IReadOnlyList<Polynomial> weights, Polynomial constant) => (Weights, Constant) = (weights, constant);

    public IReadOnlyList<Polynomial> Weights { get; }

    public Polynomial Constant { get; }

    public bool IsZero => IsConstant && Constant.IsZero;

    /// <summary>Whether no parameter enters.</summary>
    public bool IsConstant => Weights.All(w => w.IsZero);

    public static AffineRow Zero(int parameters) => Of(parameters, Polynomial.Zero);

    public static AffineRow Of(int parameters, Polynomial constant) => new(Enumerable.Repeat(Polynomial.Zero, parameters).ToList(), constant);

    /// <summary>weight·θ_index; the index behind the last parameter is the constant.</summary>
    public static AffineRow Single(int parameters, int index, Polynomial weight) => new(
        Enumerable.Range(0, parameters).Select(j => j == index ? weight : Polynomial.Zero).ToList(), index == parameters ? weight : Polynomial.Zero);

    public static AffineRow operator +(AffineRow a, AffineRow b) => new(a.Weights.Zip(b.Weights, (v, w) => v + w).ToList(), a.Constant + b.Constant);

    public static AffineRow operator -(AffineRow a, AffineRow b) => a + (b * (Rational)(-1));

    public static AffineRow operator +(AffineRow a, Polynomial b) => new(a.Weights, a.Constant + b);

    public static AffineRow operator *(AffineRow a, Rational b) => new(a.Weights.Select(w => w * b).ToList(), a.Constant * b);

    public static AffineRow operator *(AffineRow a, Polynomial b) => new(a.Weights.Select(w => w * b).ToList(), a.Constant * b);

    /// <summary>Whether the row is the same constant for every parameter.</summary>
    public bool Is(Polynomial constant) => IsConstant && Polynomial.Same(Constant, constant);

    public bool Is(Rational constant) => IsConstant && Constant.AsRational() == constant;

    public bool Same(AffineRow other) => (this - other).IsZero;

    /// <summary>Weights and constant, one after another.</summary>
    public IEnumerable<Expression> Entries() => Weights.Append(Constant).Select(p => p.ToSortedExpression().WithoutOrigins());

    /// <summary>The row as a formula in the natural parameters.</summary>
    public Expression In(IReadOnlyList<Expression> parameters)
    {
        var terms = new List<Expression>();
        for (var j = 0; j < Weights.Count; j++)
        {
            if (!Weights[j].IsZero)
                terms.Add(Weights[j].IsOne ? parameters[j] : Formula.Product(Weights[j].ToSortedExpression(), parameters[j]));
        }

        if (!Constant.IsZero || terms.Count == 0)
            terms.Add(Constant.ToSortedExpression());
        return terms.Count == 1 ? terms[0] : Formula.Sum(terms.ToArray());
    }
}
