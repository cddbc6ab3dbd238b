using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Emission;

/// <summary>The static members: what can be said of an observation or of natural parameters without a model.</summary>
internal sealed class StaticFaceEmitter
{
    private const string ReadOnlySpan = "global::System.ReadOnlySpan";

    private readonly FamilyDeclaration _declaration;
    private readonly NormalForm _form;
    private readonly MemberWriter _members;
    private readonly Documentation _docs;
    private readonly Signature _signature;
    private readonly DoublePrinter _plain;
    private readonly string _type;
    private readonly string _x;

    public StaticFaceEmitter(FamilyDeclaration declaration, NormalForm form, MemberWriter members)
    {
        (_declaration, _form, _members) = (declaration, form, members);
        _docs = new Documentation(declaration, form);
        _signature = new Signature(declaration);
        _type = FamilyEmitter.TypeOf(declaration.Observation);
        _x = _signature.Observation;
        var isReal = declaration.Observation == ObservationType.Double;
        _plain = new DoublePrinter(isReal ? _x : "(double)" + _x, isReal ? null : _x, s => Names.Identifier(s.Name));
    }

    private string Kernel => $"new KernelForm({_signature.KnownArguments})";

    public void Write()
    {
        WriteStatistics();
        Method("double", "LogBase", $"{_type} {_x}", $"log h({_declaration.ObservationName}), the logarithm of the base measure; −∞ where the measure is 0.", LogBase());
        Method("bool", "InSupport", $"{_type} {_x}", "Whether the observation lies in the support, where the base measure is positive.", InSupport());
        Method("bool", "IsNatural", $"{ReadOnlySpan}<double> natural", $"Whether the normalizer is finite at these natural parameters: {_docs.NaturalSet}.", $"{Kernel}.NaturalSet.Contains(natural)");
        Method(Names.Identifier(_declaration.Name), "FromNatural", $"{ReadOnlySpan}<double> natural", "The member of the family at the given natural parameters.", _declaration.IsTrade
            ? $"new({Kernel}, global::FamilyGen.Fitting.TradeParameters.FromNatural({Kernel}, natural))"
            : $"new({Kernel}, natural.ToArray())");
    }

    private void WriteStatistics()
    {
        var statistics = Names.Unique("statistics", [_declaration.ObservationName]);
        var docs = new List<string>
        {
            $"<summary>The sufficient statistics of one observation: {_docs.Statistics}.</summary>",
            $"<param name=\"{_declaration.ObservationName}\">The observation.</param>",
        };
        docs.AddRange(_signature.KnownDocs);
        docs.Add($"<param name=\"{statistics}\">Where the {_form.Statistics.Count} values are written.</param>");
        var body = _form.Statistics.Select((s, j) => $"{statistics}[{j}] = {(_declaration.IsTrade ? Expanded(s.Body) : Declared(_declaration.Statistics[j].Member))};");
        _members.Block("Statistics", $"public static void Statistics({_signature.WithKnown($"{_type} {_x}")}, global::System.Span<double> {statistics})", body, docs.ToArray());
    }

    private string LogBase()
    {
        if (_declaration.BaseMeasure is not { } measure)
            return Expanded(_form.LogBase);
        return measure.IsLogarithm ? Declared(measure.Member) : $"global::System.Math.Log({Declared(measure.Member)})";
    }

    private string InSupport()
    {
        var test = $"{Declared(_declaration.Support.Range)}.Contains({_x})";
        if (_declaration.Support.PredicateMember is { } predicate)
            test += $" && {Declared(predicate)}";
        return _form.LogBase.Terms.Count == 0 ? test : $"{test} && LogBase({_signature.PassKnown(_x)}) > double.NegativeInfinity";
    }

    private string Declared(DeclaredMember member) => FamilyEmitter.Call(member, _declaration, _x, Names.Identifier);

    private string Expanded(AtomSum sum) => sum.Terms.Count == 0 ? "0" : _plain.Print(sum.ToExpression());

    private void Method(string type, string name, string parameters, string summary, string body) =>
        _members.Expression(name, $"public static {type} {name}({_signature.WithKnown(parameters)})", body, $"<summary>{summary}</summary>");
}
