using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Emission;

/// <summary>The members that fit the family to data.</summary>
internal sealed class FitEmitter
{
    private const string Fitting = "global::FamilyGen.Fitting.";

    private readonly FamilyDeclaration _declaration;
    private readonly SourceWriter _writer;
    private readonly MemberWriter _members;
    private readonly Signature _signature;
    private readonly string _name;
    private readonly string _type;
    private readonly string _x;
    private readonly string _result;

    public FitEmitter(FamilyDeclaration declaration, SourceWriter writer, MemberWriter members)
    {
        (_declaration, _writer, _members) = (declaration, writer, members);
        _signature = new Signature(declaration);
        _name = Names.Identifier(declaration.Name);
        _type = FamilyEmitter.TypeOf(declaration.Observation);
        _x = _signature.Observation;
        _result = $"global::FamilyGen.FitResult<{_name}>";
    }

    private string Outcome => $"[global::System.Diagnostics.CodeAnalysis.NotNullWhen(true)] out {_result}? result, [global::System.Diagnostics.CodeAnalysis.NotNullWhen(false)] out string? account";

    public void Write()
    {
        var data = $"global::System.ReadOnlySpan<{_type}> {_x}";
        string[] gathering = [$"var accumulator = new Accumulator({_signature.KnownArguments});", $"accumulator.AddRange({_x});"];
        string[] parameters = [$"<param name=\"{_declaration.ObservationName}\">Independent observations.</param>", .. _signature.KnownDocs];
        const string badData = "<exception cref=\"global::System.ArgumentException\">An observation is not finite or lies outside the support.</exception>";
        _members.Block("Fit", $"public static {_result} Fit({_signature.WithKnown(data)})", [.. gathering, "return accumulator.Fit();"],
            ["<summary>The maximum-likelihood fit.</summary>", .. parameters, badData, "<exception cref=\"global::FamilyGen.FitException\">The likelihood has no maximum on these data.</exception>"]);
        _members.Block("TryFit", $"public static bool TryFit({_signature.WithKnown(data)}, {Outcome})", [.. gathering, "return accumulator.TryFit(out result, out account);"],
            ["<summary>The maximum-likelihood fit, or false with an account of why the likelihood has no maximum.</summary>", .. parameters,
            "<param name=\"result\">The fit.</param>", "<param name=\"account\">Why there is none.</param>", badData]);
        if (!_members.IsTaken("Accumulator"))
            WriteAccumulator();
    }

    private void WriteAccumulator()
    {
        var weight = Names.Unique("weight", [_declaration.ObservationName]);
        var trade = _declaration.IsTrade ? "Trade" : "";
        var create = $"static (kernel, parameters) => new {_name}(kernel, parameters)";
        _writer.Line("/// <summary>Gathers observations for a fit: exact sums of the statistics, the same bits in whatever order the data come.");
        _writer.Line("/// One thread at a time may use an accumulator; those of several threads or machines are merged.</summary>");
        _writer.Line(FamilyEmitter.Generated);
        _writer.Open("public sealed class Accumulator");
        if (!_members.IsStub)
            _members.Field($"private readonly {Fitting}StatisticSums<KernelForm> _sums;");
        _members.Expression("", $"public Accumulator({string.Join(", ", _signature.KnownParameters)})", $"_sums = new(new KernelForm({_signature.KnownArguments}))", ["<summary>An accumulator without observations.</summary>", .. _signature.KnownDocs]);
        _members.Expression("", "public long Count", "_sums.Count", "<summary>The number of observations.</summary>");
        Method("void", "Add", $"{_type} {_x}", "Adds one observation.", $"_sums.Add({_x})");
        Method("void", "Add", $"{_type} {_x}, double {weight}", "Adds one observation that counts as often as its weight says.", $"_sums.Add({_x}, {weight})");
        Method("void", "AddRange", $"global::System.ReadOnlySpan<{_type}> {_x}", "Adds all observations, or none where one is bad.", $"_sums.AddRange({_x})");
        Method("void", "Merge", "Accumulator other", "Adds what another accumulator has gathered.", "_sums.Merge(other._sums)");
        Method(_result, "Fit", "", "The maximum-likelihood fit to what has been gathered.", $"{Fitting}MaximumLikelihood.Fit{trade}(_sums, {create})");
        Method("bool", "TryFit", Outcome, "The maximum-likelihood fit, or false with an account of why the likelihood has no maximum.", $"{Fitting}MaximumLikelihood.TryFit{trade}(_sums, {create}, out result, out account)");
        _writer.Close();
        _writer.Line();
    }

    /// <summary>The extension that gives the model for one set of known values; it stands beside the declared class, so
    /// there is none where an enclosing class hides that.</summary>
    public void WriteAt(NormalForm form)
    {
        if (_declaration.Known.Count == 0 || _declaration.Accessibility == "private")
            return;
        var path = string.Join(".", _declaration.Outer.Select(o => Names.Identifier(o.Name)).Concat([_name]));
        var host = string.Concat(_declaration.Outer.Select(o => o.Name)) + _declaration.Name + "Fits";
        var source = _declaration.IsTrade ? "Parameters" : "Natural";
        var count = _declaration.IsTrade ? _declaration.Parameters.Count : form.Statistics.Count;
        var values = string.Join(", ", Enumerable.Range(0, count).Select(i => $"fit.{source}[{i}]"));
        _writer.Line();
        _writer.Line($"/// <summary>Models from fits of {_declaration.Name}.</summary>");
        _writer.Line(FamilyEmitter.Generated);
        _writer.Open($"{_declaration.Accessibility} static class {host}");
        var docs = new List<string> { "<summary>The fitted model at the given known values.</summary>", "<param name=\"fit\">The fit.</param>" };
        docs.AddRange(_signature.KnownDocs);
        _members.Expression("", $"public static {path} At(this global::FamilyGen.FitResult<{path}> fit, {string.Join(", ", _signature.KnownParameters)})", $"new({values}, {_signature.KnownArguments})", docs.ToArray());
        _writer.Close();
    }

    private void Method(string type, string name, string parameters, string summary, string body) =>
        _members.Expression("", $"public {type} {name}({parameters})", body, $"<summary>{summary}</summary>");
}
