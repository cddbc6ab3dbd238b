using System.Collections.Generic;

namespace FamilyGen.Conformance.Subjects;

/// <summary>Every reference point that misses the stated accuracy, with why. A point that is listed and meets it fails the
/// test too, so that the list cannot outlive its reasons.</summary>
internal static class Shortfalls
{
    /// <summary>Family, parameter point and quantity (A, gradient, Hessian, log-density), with the reason.</summary>
    public static IReadOnlyDictionary<(string Family, string Theta, string Quantity), string> Listed { get; } =
        new Dictionary<(string, string, string), string>();
}
