using FamilyGen.Generator.Algebra;

namespace FamilyGen.Generator.Model;

/// <summary>One entry of the catalogue with what brings a family to it.</summary>
/// <param name="Entry">The name of a type in FamilyGen.ClosedForms.</param>
/// <param name="Settings">The entry's settings, free of parameters.</param>
/// <param name="Rows">The rows of the affine map from natural parameters to the added constant and to the entry's
/// coefficients: weights of the natural parameters, then a constant, row after row; free of parameters.</param>
internal sealed record ClosedFormPart(string Entry, EquatableArray<Expression> Settings, EquatableArray<Expression> Rows);

/// <summary>A parameter that a law is known by, as a formula in the family's own.</summary>
internal sealed record LawParameter(string Name, Expression Value);

/// <summary>A law by the name that the trade knows it by ("gamma law"), with its parameters.</summary>
internal sealed record Law(string Name, EquatableArray<LawParameter> Parameters);

/// <summary>The closed form of a family's normalizer: entries over pieces of the support, points added to them and points
/// taken away. Of a point the row holds the statistics there and log h.</summary>
/// <param name="Parts">The entries.</param>
/// <param name="Added">Points that are summed one by one.</param>
/// <param name="Removed">Points that an entry has and the support has not, or with other weight.</param>
/// <param name="Law">What it is.</param>
internal sealed record ClosedFormMatch(
    EquatableArray<ClosedFormPart> Parts,
    EquatableArray<EquatableArray<Expression>> Added,
    EquatableArray<EquatableArray<Expression>> Removed,
    Law Law);
