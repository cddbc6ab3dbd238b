using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Emission;

/// <summary>How the observation and the known values appear in the signatures of generated members.</summary>
internal sealed class Signature(FamilyDeclaration declaration)
{
    /// <summary>The observation under the modeller's own name.</summary>
    public string Observation => Names.Identifier(declaration.ObservationName);

    /// <summary>"int checkedLocks", one for each known value.</summary>
    public IEnumerable<string> KnownParameters => declaration.Known.Select(k => $"{k.Type} {Names.Identifier(k.Name)}");

    /// <summary>"checkedLocks, …".</summary>
    public string KnownArguments => string.Join(", ", declaration.Known.Select(k => Names.Identifier(k.Name)));

    public IEnumerable<string> KnownDocs => declaration.Known.Select(k => $"<param name=\"{k.Name}\">The known value {k.Name}.</param>");

    public bool IsKnown(string name) => declaration.Known.Any(k => k.Name == name);

    /// <summary>The given parameters followed by the known values.</summary>
    public string WithKnown(string parameters) => string.Join(", ", new[] { parameters }.Where(p => p.Length > 0).Concat(KnownParameters));

    /// <summary>The given arguments followed by the known values.</summary>
    public string PassKnown(string arguments) =>
        string.Join(", ", new[] { arguments }.Where(a => a.Length > 0).Concat(declaration.Known.Select(k => Names.Identifier(k.Name))));
}
