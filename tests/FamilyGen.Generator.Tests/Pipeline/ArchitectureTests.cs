using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;

namespace FamilyGen.Generator.Tests.Pipeline;

/// <summary>The walls between the folders of the generator: the way of the data is Reading → Algebra → Verdicts → Emission.</summary>
public class ArchitectureTests
{
    private const string Compiler = "Microsoft.CodeAnalysis";
    private const string Root = "FamilyGen.Generator.";

    [Theory]
    [InlineData("Algebra", Compiler, Root + "Reading", Root + "Verdicts", Root + "Emission", Root + "Diagnostics")]
    [InlineData("Catalogue", Compiler, Root + "Reading", Root + "Verdicts", Root + "Emission", Root + "Diagnostics")]
    [InlineData("Model", Compiler, Root + "Reading", Root + "Verdicts", Root + "Emission", Root + "Diagnostics")]
    [InlineData("Verdicts", Compiler, Root + "Reading", Root + "Emission")]
    [InlineData("Emission", Root + "Reading", Root + "Verdicts", Root + "Diagnostics")]
    [InlineData("Reading", Root + "Verdicts", Root + "Emission")]
    public void FolderDoesNotUse(string folder, params string[] forbidden)
    {
        var path = Path.Combine(Source(), folder);
        if (!Directory.Exists(path))
            return;
        var offenders =
            from file in Directory.EnumerateFiles(path, "*.cs", SearchOption.AllDirectories)
            from line in File.ReadLines(file)
            where forbidden.Any(f => Uses(line, f))
            select Path.GetFileName(file) + ": " + line.Trim();
        Assert.Empty(offenders);
    }

    /// <summary>Reading turns C# into formulas; which of them is a statistic of what is not its business.</summary>
    [Fact]
    public void ReadingKnowsNoStatistics()
    {
        string[] words = ["NormalForm", "AtomSum", "Normalize(", "Polynomial", "EndRow"];
        var offenders =
            from file in Directory.EnumerateFiles(Path.Combine(Source(), "Reading"), "*.cs")
            let text = File.ReadAllText(file)
            from word in words
            where text.Contains(word, StringComparison.Ordinal)
            select Path.GetFileName(file) + ": " + word;
        Assert.Empty(offenders);
    }

    [Fact]
    public void EveryFolderHasItsNamespace()
    {
        var offenders =
            from file in Directory.EnumerateFiles(Source(), "*.cs", SearchOption.AllDirectories)
            let folder = Path.GetFileName(Path.GetDirectoryName(file)!)
            where !file.Contains(Path.DirectorySeparatorChar + "obj" + Path.DirectorySeparatorChar, StringComparison.Ordinal)
            let expected = folder == "FamilyGen.Generator" ? "namespace FamilyGen.Generator;" : $"namespace {Root}{folder};"
            where !File.ReadLines(file).Contains(expected)
            select file;
        Assert.Empty(offenders);
    }

    private static bool Uses(string line, string name)
    {
        var at = line.IndexOf(name, StringComparison.Ordinal);
        return at >= 0 && !line.TrimStart().StartsWith("//", StringComparison.Ordinal) && !line.TrimStart().StartsWith("namespace", StringComparison.Ordinal);
    }

    private static string Source() => Path.Combine(Checkout.Root, "src", "FamilyGen.Generator");
}
