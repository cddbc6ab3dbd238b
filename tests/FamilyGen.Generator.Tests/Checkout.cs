using System;
using System.IO;

namespace FamilyGen.Generator.Tests;

/// <summary>Where the sources stand. Paths in the compiled tests cannot tell: a deterministic build maps them away.</summary>
internal static class Checkout
{
    public static string Root { get; } = Find(new DirectoryInfo(AppContext.BaseDirectory));

    private static string Find(DirectoryInfo? folder)
    {
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "FamilyGen.sln")))
            folder = folder.Parent;
        return folder?.FullName ?? throw new DirectoryNotFoundException("FamilyGen.sln stands in no folder above the tests.");
    }
}
