using System;
using System.Linq;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;

namespace FamilyGen.Generator.Reading;

/// <summary>The parts of the platform whose answers differ from one call to the next.</summary>
internal static class ChangingSources
{
    private static readonly (string Prefix, string Reason)[] s_types =
    [
        ("System.DateTime", "the clock"),
        ("System.DateTimeOffset", "the clock"),
        ("System.TimeProvider", "the clock"),
        ("System.TimeZoneInfo", "the machine's settings"),
        ("System.Diagnostics.Stopwatch", "the clock"),
        ("System.Environment", "the machine's settings"),
        ("System.AppContext", "the machine's settings"),
        ("System.Globalization.CultureInfo", "the machine's settings"),
        ("System.Random", "a source of random numbers"),
        ("System.Guid", "a source of random numbers"),
        ("System.Security.Cryptography.", "a source of random numbers"),
        ("MathNet.Numerics.Random.", "a source of random numbers"),
        ("System.Console", "input or output"),
        ("System.IO.", "input or output"),
        ("System.Net.", "input or output"),
        ("System.Data.", "input or output"),
        ("System.Diagnostics.", "the running process"),
        ("System.Threading.", "the running process"),
        ("System.GC", "the running process"),
    ];

    // Of these types only the members that ask the machine change; the rest is arithmetic.
    private static readonly string[] s_clockMembers = ["Now", "UtcNow", "Today"];

    /// <summary>What a use of the symbol depends on, or null when it is no changing source.</summary>
    public static string? Reason(ISymbol symbol)
    {
        var type = (symbol as INamedTypeSymbol ?? symbol.ContainingType)?.OriginalDefinition.ToDisplayString();
        if (type is null)
            return null;
        if (type.StartsWith("MathNet.Numerics.Distributions.", StringComparison.Ordinal))
            return symbol.Name.StartsWith("Sample", StringComparison.Ordinal) ? "a source of random numbers" : null;
        if (type is "System.DateTime" or "System.DateTimeOffset")
            return s_clockMembers.Contains(symbol.Name) ? "the clock" : null;
        if (type is "System.Guid" && symbol.Name is not "NewGuid")
            return null;
        foreach (var (prefix, reason) in s_types)
        {
            if (type == prefix || (prefix.EndsWith(".", StringComparison.Ordinal) && type.StartsWith(prefix, StringComparison.Ordinal)))
                return reason;
        }

        return null;
    }

    /// <summary>The first changing source that an operation uses, with what it is.</summary>
    public static (IOperation Operation, ISymbol Symbol, string Reason)? FindIn(IOperation operation)
    {
        foreach (var part in operation.DescendantsAndSelf())
        {
            ISymbol? symbol = part switch
            {
                IInvocationOperation call => call.TargetMethod,
                IPropertyReferenceOperation property => property.Property,
                IFieldReferenceOperation field => field.Field,
                IObjectCreationOperation creation => creation.Constructor,
                _ => null,
            };
            if (symbol is not null && Reason(symbol) is { } reason)
                return (part, symbol, reason);
        }

        return null;
    }
}
