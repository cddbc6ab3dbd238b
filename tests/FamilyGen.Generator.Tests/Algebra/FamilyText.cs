using System;
using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Tests.Algebra;

/// <summary>Declarations written as text, for tests of the algebra.</summary>
internal sealed class FamilyText
{
    private readonly Dictionary<string, Symbol> _symbols = [];
    private readonly List<TradeParameter> _parameters = [];
    private readonly List<KnownValue> _known = [];
    private readonly List<StatisticDeclaration> _statistics = [];
    private BaseMeasureDeclaration? _measure;
    private SupportDeclaration _support = null!;
    private Expression? _kernel;
    private string _observation = "x";
    private bool _isCount;

    /// <summary>The text behind each origin of the kernel.</summary>
    public Dictionary<int, string> Sources { get; private set; } = [];

    public Expression Kernel => _kernel!;

    public static FamilyText Counts(string? lower, string? upper = null, string observation = "x", string known = "") =>
        new FamilyText { _observation = observation, _isCount = true }.Over(lower, upper, true, true, known);

    public static FamilyText Interval(string? lower, string? upper = null, string observation = "x", string known = "", bool closed = false) =>
        new FamilyText { _observation = observation }.Over(lower, upper, closed, closed, known);

    public static FamilyText Circle(string period, string observation = "x")
    {
        var family = Interval("0", period, observation);
        family._support = family._support with { IsCircle = true, LowerIncluded = true };
        return family;
    }

    public FamilyText Statistic(string name, string body)
    {
        _statistics.Add(new StatisticDeclaration(name, char.ToLowerInvariant(name[0]) + name[1..], Read(body), new DeclaredMember(name, true, default)));
        return this;
    }

    public FamilyText LogBase(string body)
    {
        _measure = new BaseMeasureDeclaration(true, Read(body), new DeclaredMember("LogBase", true, default));
        return this;
    }

    public FamilyText Base(string body)
    {
        _measure = new BaseMeasureDeclaration(false, Read(body), new DeclaredMember("Base", true, default));
        return this;
    }

    /// <summary>Parameters separated by blanks; a + before a name says that it is positive.</summary>
    public FamilyText LogKernel(string parameters, string body)
    {
        foreach (var name in parameters.Split(' ', StringSplitOptions.RemoveEmptyEntries))
        {
            _parameters.Add(new TradeParameter(name.TrimStart('+'), name[0] == '+'));
            _symbols[name.TrimStart('+')] = new Symbol(name.TrimStart('+'), SymbolKind.Parameter, false);
        }

        var reader = new FormulaReader(body, _symbols);
        _kernel = reader.Read();
        Sources = reader.Sources;
        return this;
    }

    public FamilyText Mass(string point)
    {
        _support = _support with { Masses = _support.Masses.Append(Read(point)).ToEquatableArray() };
        return this;
    }

    public FamilyText Where(string predicate)
    {
        _support = _support with { Predicate = new FormulaReader(predicate, _symbols).ReadCondition() };
        return this;
    }

    public FamilyDeclaration Declaration() => new(
        "Harbour",
        EquatableArray<TypeShell>.Empty,
        "public",
        "Family",
        _isCount ? ObservationType.Int : ObservationType.Double,
        _observation,
        _support,
        _known.ToEquatableArray(),
        _statistics.ToEquatableArray(),
        _measure,
        _kernel,
        _kernel is null ? null : new DeclaredMember("Kernel", true, default),
        _parameters.ToEquatableArray());

    public NormalFormResult Normalize() => Normalizer.Normalize(Declaration());

    /// <summary>The normal form of a declaration that has one.</summary>
    public NormalForm Form()
    {
        var result = Normalize();
        Assert.True(result.Form is not null, string.Join("; ", result.Findings.Select(f => f.Id + " " + string.Join(" | ", f.Arguments))));
        return result.Form!;
    }

    /// <summary>The one finding of a declaration that is refused.</summary>
    public Finding Refusal()
    {
        var result = Normalize();
        Assert.Null(result.Form);
        return Assert.Single(result.Findings);
    }

    private FamilyText Over(string? lower, string? upper, bool lowerClosed, bool upperClosed, string known)
    {
        _symbols[_observation] = new Symbol(_observation, SymbolKind.Observation, _isCount);
        foreach (var name in known.Split(' ', StringSplitOptions.RemoveEmptyEntries))
        {
            var isInteger = name[0] == '#';
            _known.Add(new KnownValue(name.TrimStart('#'), isInteger ? "int" : "double"));
            _symbols[name.TrimStart('#')] = new Symbol(name.TrimStart('#'), SymbolKind.Known, isInteger);
        }

        _support = new SupportDeclaration(
            _isCount,
            lower is null ? null : Read(lower),
            upper is null ? null : Read(upper),
            lowerClosed,
            upperClosed,
            false,
            EquatableArray<Expression>.Empty,
            null,
            new DeclaredMember("Range", false, default),
            null);
        return this;
    }

    private Expression Read(string body) => new FormulaReader(body, _symbols).Read();
}
