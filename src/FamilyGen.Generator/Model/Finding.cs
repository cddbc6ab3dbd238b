namespace FamilyGen.Generator.Model;

/// <summary>What a rule has found: the id of its diagnostic, the node of the declaration that is wrong (an origin, as in
/// <see cref="Algebra.Expression.Origin"/>; −1 is the class itself) and what the message names.</summary>
internal sealed record Finding(string Id, int Origin, EquatableArray<string> Arguments);
