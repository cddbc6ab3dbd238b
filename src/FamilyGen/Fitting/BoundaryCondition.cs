namespace FamilyGen;

/// <summary>A condition of the parameter set that holds with equality at a maximum on its boundary.</summary>
/// <param name="Condition">The condition as a person would write it, with the end of the support that imposes it.</param>
/// <param name="Multiplier">By how much the log-likelihood would rise for each unit by which the condition were relaxed;
/// never negative. 0 means that the data just do not ask for more.</param>
public sealed record BoundaryCondition(string Condition, double Multiplier);
