using System.Collections.Generic;
using System.Linq;
using System.Threading;
using FamilyGen.Generator.Diagnostics;
using FamilyGen.Generator.Model;
using Microsoft.CodeAnalysis;

namespace FamilyGen.Generator.Reading;

/// <summary>What accumulates while one declaration is read: the places that were numbered, the faults, the dependencies
/// and the path of names from the declared member down to where the reader stands.</summary>
internal sealed class ReadingSession(Compilation compilation, INamedTypeSymbol family, CancellationToken cancellation)
{
    // A formula that needs more nodes than this is not something a person can have meant; the bound also ends the
    // doubling that a long row of if statements with returns would cause.
    private const int LargestDeclaration = 20_000;

    private readonly List<Location> _locations = [];
    private readonly List<Finding> _faults = [];
    private readonly List<Dependency> _dependencies = [];
    private readonly List<NamedPiece> _names = [];
    private readonly List<IntegerStep> _integerSteps = [];
    private readonly List<string> _path = [];
    private readonly List<ISymbol> _followed = [];

    public Compilation Compilation { get; } = compilation;

    public INamedTypeSymbol Family { get; } = family;

    public CancellationToken Cancellation { get; } = cancellation;

    public MemberRole Role { get; private set; }

    /// <summary>False once the compiler's own error has been met inside a declared member.</summary>
    public bool IsReadable { get; private set; } = true;

    /// <summary>True once the declaration has proved too large; nothing more is then read.</summary>
    public bool IsExhausted { get; private set; }

    /// <summary>The member whose body is being read.</summary>
    public ISymbol? Current => _followed.LastOrDefault();

    public IReadOnlyList<Location> Locations => _locations;

    public EquatableArray<Finding> Faults => _faults.Distinct().ToEquatableArray();

    public EquatableArray<Dependency> Dependencies => _dependencies.ToEquatableArray();

    public EquatableArray<NamedPiece> Names => _names.ToEquatableArray();

    public EquatableArray<IntegerStep> IntegerSteps => _integerSteps.Distinct().ToEquatableArray();

    public int DependencyCount => _dependencies.Count;

    /// <summary>Gives a place of the source its number.</summary>
    public int Mark(Location location)
    {
        _locations.Add(location);
        if (_locations.Count > LargestDeclaration && !IsExhausted)
        {
            IsExhausted = true;
            Refuse(_locations.Count - 1, ShapeFault.TooLarge());
        }

        return _locations.Count - 1;
    }

    public int Mark(SyntaxNode node) => Mark(node.GetLocation());

    public int Mark(ISymbol symbol) => Mark(symbol.Locations.FirstOrDefault(l => l.IsInSource) ?? Location.None);

    public void Refuse(int origin, string sentence) =>
        _faults.Add(new Finding(DiagnosticIds.Shape, origin, EquatableArray.Of(sentence)));

    /// <summary>The compiler reports an error here; ours would only repeat it.</summary>
    public void LeaveToCompiler() => IsReadable = false;

    public void Name(string name, NamedPieceKind kind, int origin, string detail = "") =>
        _names.Add(new NamedPiece(name, kind, origin, detail));

    public void Depend(DependencyKind kind, string name, string reason, int origin)
    {
        var path = _path.LastOrDefault() == name ? _path : _path.Append(name);
        _dependencies.Add(new Dependency(kind, Role, _path.FirstOrDefault() ?? name, name, reason, origin, path.ToEquatableArray()));
    }

    /// <summary>Takes down a step that is computed in integers, unless it only says which observations can occur.</summary>
    public void Note(IntegerStep step)
    {
        if (Role != MemberRole.Support)
            _integerSteps.Add(step);
    }

    /// <summary>Starts on a declared member.</summary>
    public void Enter(MemberRole role, ISymbol member)
    {
        Role = role;
        _path.Clear();
        _followed.Clear();
        Follow(member);
    }

    /// <summary>Steps into a member that a declared one uses; false where that would be a recursion.</summary>
    public bool Follow(ISymbol member)
    {
        if (_followed.Contains(member.OriginalDefinition, SymbolEqualityComparer.Default))
            return false;
        _followed.Add(member.OriginalDefinition);
        _path.Add(member.Name);
        return true;
    }

    public void Return()
    {
        _followed.RemoveAt(_followed.Count - 1);
        _path.RemoveAt(_path.Count - 1);
    }
}
