namespace FamilyGen.Generator.Diagnostics;

/// <summary>The ids, by what they are about.</summary>
internal static class DiagnosticIds
{
    public const string Shape = "FG0001";
    public const string NameCollision = "FG0002";
    public const string NearlyEqualKnown = "FG0003";
    public const string SupportOnParameter = "FG0101";
    public const string SupportChanges = "FG0102";
    public const string SupportEmpty = "FG0103";
    public const string StatisticOnParameter = "FG0201";
    public const string Impure = "FG0202";
    public const string NotFinite = "FG0203";
    public const string Dependent = "FG0204";
    public const string IntegerArithmetic = "FG0205";
    public const string Measure = "FG0301";
    public const string InfiniteNormalizer = "FG0401";
    public const string Unproved = "FG0403";
    public const string NotOpen = "FG0405";
    public const string NoInterior = "FG0406";
    public const string NotSeparable = "FG0501";
    public const string Curved = "FG0502";
    public const string NotIdentified = "FG0503";
}
