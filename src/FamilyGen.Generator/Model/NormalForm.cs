using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Model;

/// <summary>coefficient · atom, where the coefficient is free of x (known values and constants only) and the atom is one
/// of the algebra's irreducible functions of x, or a product of them. The atom Number(1) carries the constant of a
/// statistic; a piece is Conditional(condition, function, 0); log h = −∞ on a set is Conditional(set, Constant(−∞), 0).</summary>
internal sealed record WeightedAtom(Expression Coefficient, Expression Atom);

/// <summary>A function of the observation as a sum of weighted atoms.</summary>
internal sealed record AtomSum(EquatableArray<WeightedAtom> Terms);

/// <summary>One statistic of the normal form, its natural parameter's name, and (trade form) that parameter as a function
/// of the trade parameters and known values.</summary>
internal sealed record Statistic(string Name, string Parameter, AtomSum Body, Expression? Natural);

/// <summary>How one rank of the exponent at an end depends on θ: Σ weightⱼ θⱼ + constant. Order, weights and constant are
/// free of x and of parameters; they may use known values, so two rows can turn out to be of one rank at run time.</summary>
internal sealed record RankRow(string Kind, Expression Order, EquatableArray<Expression> Weights, Expression Constant, string Text);

/// <summary>How fast |f| grows at an end: the name of a FamilyGen.Kernels.GrowthKind and the order within it.</summary>
internal sealed record GrowthRow(string Kind, Expression Order);

/// <summary>The growth of the exponent at one end of one piece, strongest rank first as far as that can be told at compile
/// time.</summary>
/// <param name="Where">The end as a person would name it: "hours → ∞".</param>
/// <param name="IsInfinite">Whether the end lies at ±∞.</param>
/// <param name="IsUpper">Whether it is the upper end of its piece.</param>
/// <param name="IsVerified">False where the growth argument does not reach: an opaque function, an unbounded oscillation.</param>
/// <param name="Ranks">The ranks of the exponent.</param>
/// <param name="Statistics">The growth of |T₀| … |T_{k−1}| and, last, of |log h|.</param>
internal sealed record EndRow(
    string Where,
    bool IsInfinite,
    bool IsUpper,
    bool IsVerified,
    EquatableArray<RankRow> Ranks,
    EquatableArray<GrowthRow> Statistics);

/// <summary>log p(x | θ) = Σ θⱼ Tⱼ(x) + log h(x) − A(θ), read off the declaration, and all that emission needs of it.</summary>
/// <param name="Statistics">The statistics with their natural parameters.</param>
/// <param name="LogBase">log h.</param>
/// <param name="Breakpoints">Points of the support where a function is not smooth; on a lattice b starts a new piece.</param>
/// <param name="Period">The modulus along whose residue classes a lattice exponent is smooth; 1 where there is none.</param>
/// <param name="IsOpaque">Whether a function could not be read.</param>
/// <param name="LowerSingular">Whether a function is unbounded at the finite lower end.</param>
/// <param name="UpperSingular">Whether a function is unbounded at the finite upper end.</param>
/// <param name="Ends">The growth of the exponent at each end of each piece.</param>
/// <param name="NaturalSetText">The natural parameter set as a sentence.</param>
/// <param name="Inverse">Trade parameters as functions of the natural ones (symbols of kind Natural), in declared order;
/// empty where no closed inverse is known or the family is curved.</param>
/// <param name="ParameterLower">Open lower limits of the trade parameters, −∞ where there is none.</param>
/// <param name="ParameterUpper">Open upper limits of the trade parameters, +∞ where there is none.</param>
internal sealed record NormalForm(
    EquatableArray<Statistic> Statistics,
    AtomSum LogBase,
    EquatableArray<Expression> Breakpoints,
    Expression Period,
    bool IsOpaque,
    bool LowerSingular,
    bool UpperSingular,
    EquatableArray<EndRow> Ends,
    string NaturalSetText,
    EquatableArray<Expression> Inverse,
    EquatableArray<double> ParameterLower,
    EquatableArray<double> ParameterUpper);

/// <summary>Either a normal form or the reasons why there is none. Findings that do not stand in the way (a curved family)
/// may accompany a form.</summary>
internal sealed record NormalFormResult(NormalForm? Form, EquatableArray<Finding> Findings);
