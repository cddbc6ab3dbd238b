using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Emission;

/// <summary>Writes documented members. For a declaration that is refused it writes the same signatures with bodies that
/// throw, so that code which uses the family shows no errors of its own beside ours, and leaves out what the user's class
/// has already.</summary>
internal sealed class MemberWriter(SourceWriter writer, string? refusal, IEnumerable<string> taken)
{
    // Every class inherits these.
    private static readonly string[] s_ofObject = ["Equals", "GetHashCode", "GetType", "MemberwiseClone", "ReferenceEquals", "ToString"];

    private readonly HashSet<string> _taken = new(taken.Concat(s_ofObject));

    public bool IsStub => refusal is not null;

    private string Throw => $"throw new global::System.InvalidOperationException(\"{refusal}\")";

    /// <summary>Whether a stub has to leave this name to the user's class, or to a property that has it already.</summary>
    public bool IsTaken(string name) => IsStub && _taken.Contains(name);

    /// <summary>A member with an expression for a body.</summary>
    public void Expression(string name, string head, string body, params string[] documentation)
    {
        if (!Begin(name, documentation))
            return;
        if (IsStub && name.Length > 0 && !head.Contains("("))
            _taken.Add(name);
        writer.Line($"{head} => {(IsStub ? Throw : body)};");
        writer.Line();
    }

    /// <summary>A member with a block for a body.</summary>
    public void Block(string name, string head, IEnumerable<string> body, params string[] documentation)
    {
        if (IsStub)
        {
            Expression(name, head.Split('\n')[0], "", documentation);
            return;
        }

        Begin(name, documentation);
        writer.Open(head);
        foreach (var line in body)
            writer.Line(line);
        writer.Close();
        writer.Line();
    }

    /// <summary>A field, which a stub does not need.</summary>
    public void Field(string declaration)
    {
        writer.Line(FamilyEmitter.Generated);
        writer.Line(declaration);
        writer.Line();
    }

    /// <summary>A property that the constructor sets; a name that the face takes already is refused, and only a stub meets it.</summary>
    public void AutoProperty(string name, string type, string documentation)
    {
        if (GeneratedNames.IsReserved(name) || !Begin(name, [documentation]))
            return;
        _taken.Add(name);
        writer.Line($"public {type} {name} {(IsStub ? $"=> {Throw};" : "{ get; }")}");
        writer.Line();
    }

    private bool Begin(string name, string[] documentation)
    {
        if (IsTaken(name))
            return false;
        foreach (var line in documentation.Where(d => d.Length > 0))
            writer.Line("/// " + line);
        writer.Line(FamilyEmitter.Generated);
        return true;
    }
}
