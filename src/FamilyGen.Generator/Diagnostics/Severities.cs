namespace FamilyGen.Generator.Diagnostics;

/// <summary>Which findings make a declaration invalid.</summary>
internal static class Severities
{
    public static bool IsError(string id) => id is not (
        DiagnosticIds.NearlyEqualKnown or DiagnosticIds.IntegerArithmetic or DiagnosticIds.Unproved or DiagnosticIds.NotOpen or DiagnosticIds.Curved);
}
