using System.Collections.Generic;
using System.Linq;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Emission;

/// <summary>The public members that evaluate a model: thin calls into the library.</summary>
internal sealed class FaceEmitter
{
    private const string Span = "global::System.Span";
    private const string ReadOnlySpan = "global::System.ReadOnlySpan";
    private const string Distribution = "global::FamilyGen.Partition.Distribution<KernelForm>";

    private readonly FamilyDeclaration _declaration;
    private readonly NormalForm _form;
    private readonly MemberWriter _members;
    private readonly Documentation _docs;
    private readonly Signature _signature;
    private readonly string _name;
    private readonly string _type;
    private readonly string _x;

    public FaceEmitter(FamilyDeclaration declaration, NormalForm form, MemberWriter members)
    {
        (_declaration, _form, _members) = (declaration, form, members);
        _docs = new Documentation(declaration, form);
        _signature = new Signature(declaration);
        _name = Names.Identifier(declaration.Name);
        _type = FamilyEmitter.TypeOf(declaration.Observation);
        _x = _signature.Observation;
    }

    private bool IsLattice => _declaration.Support.IsLattice;

    public void Write()
    {
        WriteConstruction();
        WriteParameters();
        WriteDensity();
        WriteProbabilities();
        WriteMoments();
        WriteSampling();
        new StaticFaceEmitter(_declaration, _form, _members).Write();
    }

    private void WriteConstruction()
    {
        var arguments = _declaration.IsTrade
            ? _declaration.Parameters.Select(p => p.Name).ToList()
            : _form.Statistics.Select(s => s.Parameter).ToList();
        var list = string.Join(", ", arguments.Select(a => "double " + Names.Identifier(a)).Concat(_signature.KnownParameters));
        var passed = string.Join(", ", arguments.Select(Names.Identifier));
        var docs = new List<string> { $"<summary>The member of the family at the given {(_declaration.IsTrade ? "trade" : "natural")} parameters.</summary>" };
        docs.AddRange(arguments.Select(a => $"<param name=\"{a}\">{_docs.Parameter(a)}</param>"));
        docs.AddRange(_signature.KnownDocs);
        docs.Add($"<exception cref=\"global::System.ArgumentOutOfRangeException\">The normalizer is not finite there; it is where {_docs.NaturalSet}.</exception>");
        if (!_members.IsStub)
            _members.Field($"private readonly {Distribution} _distribution;");
        _members.Block(".ctor", $"public {_name}({list})\n    : this(new KernelForm({_signature.KnownArguments}), [{passed}])", [], docs.ToArray());
        if (_members.IsStub)
            return;
        var body = new List<string>
        {
            _declaration.IsTrade
                ? "_distribution = global::FamilyGen.Fitting.TradeParameters.Distribution(kernel, parameters);"
                : $"_distribution = new {Distribution}(kernel, parameters);",
        };
        body.AddRange(_declaration.Parameters.Select((p, i) => $"{Names.Pascal(p.Name)} = parameters[{i}];"));
        _members.Block(".ctor", $"private {_name}(KernelForm kernel, double[] parameters)", body);
    }

    private void WriteParameters()
    {
        foreach (var parameter in _declaration.Parameters)
            _members.AutoProperty(Names.Pascal(parameter.Name), "double", $"<summary>The trade parameter {parameter.Name}.</summary>");
        foreach (var known in _declaration.Known)
            Property(known.Type, Names.Pascal(known.Name), $"The known value {known.Name}.", $"_distribution.Kernel.{Names.Pascal(known.Name)}");
        Property($"{ReadOnlySpan}<double>", "Natural", $"The natural parameters θ = ({string.Join(", ", _form.Statistics.Select(s => s.Parameter))}).", "_distribution.Theta");
    }

    private void WriteDensity()
    {
        var x = _declaration.ObservationName;
        Property("double", "LogNormalizer", "The log-normalizer A(θ), by which the total probability is 1.", "_distribution.LogNormalizer");
        Method("double", "LogDensity", $"{_type} {_x}", $"log p({x}) = {_docs.Exponent} − A; −∞ outside the support.", $"_distribution.LogDensity({_x})");
        Method("double", "Density", $"{_type} {_x}", IsLattice ? $"The probability of {x}." : $"The density at {x}; at a point mass, its probability.", $"global::System.Math.Exp(_distribution.LogDensity({_x}))");
        var result = Names.Unique("result", [x]);
        Method("void", "LogDensity", $"{ReadOnlySpan}<{_type}> {_x}, {Span}<double> {result}", $"The log-density of each observation, written to <paramref name=\"{result}\"/>, which must be as long.", $"_distribution.LogDensity({_x}, {result})");
        if (_declaration.KernelMember is { } kernel)
        {
            var arguments = kernel.Arguments.Select(a => _signature.IsKnown(a) || _declaration.Parameters.Any(p => p.Name == a) ? Names.Pascal(a) : _x);
            Method("double", "LogKernel", $"{_type} {_x}", "The log-kernel as it is declared: the log-density up to a term free of the observation.", $"{Names.Identifier(kernel.Name)}({string.Join(", ", arguments)})");
        }
    }

    private void WriteProbabilities()
    {
        Method("double", "Cdf", $"{_type} {_x}", "P(X ≤ x).", $"_distribution.Cdf({_x})");
        Method("double", "Survival", $"{_type} {_x}", "P(X &gt; x), accurate far in the tail.", $"_distribution.Survival({_x})");
        Method("double", "Hazard", $"{_type} {_x}", IsLattice ? "The hazard p(x)/P(X ≥ x)." : "The hazard rate p(x)/P(X &gt; x).", $"_distribution.Hazard({_x})");
        Method(_type, "Quantile", "double probability", IsLattice ? "The smallest count whose cdf reaches the probability." : "The point at which the cdf reaches the probability.", Cast("_distribution.Quantile(probability)"));
    }

    private void WriteMoments()
    {
        var x = _declaration.ObservationName;
        Property("double", "Mean", $"The mean of {x}; ∞ where it is infinite.", "_distribution.Mean");
        Property("double", "Variance", $"The variance of {x}; ∞ where it is infinite.", "_distribution.Variance");
        Property("double", "Entropy", "The entropy −E log p, in natural units.", "_distribution.Entropy");
        Property($"{ReadOnlySpan}<double>", "MeanStatistics", "The means of the statistics, ∇A(θ); ∞ where infinite.", "_distribution.MeanStatistics()");
        Property("double[,]", "StatisticCovariance", "The covariance matrix of the statistics, ∇²A(θ); ∞ where infinite.", "_distribution.StatisticCovariance()");
    }

    private void WriteSampling()
    {
        Method(_type, "Sample", "global::System.Random random", "One draw; reproducible for a seeded <paramref name=\"random\"/>.", Cast("_distribution.Sample(random)"));
        Method("void", "Sample", $"global::System.Random random, {Span}<{_type}> draws", "Fills <paramref name=\"draws\"/>; reproducible for a seeded <paramref name=\"random\"/>.", "_distribution.Sample(random, draws)");
    }

    private string Cast(string value) => _type == "double" ? value : $"checked(({_type}){value})";

    private void Property(string type, string name, string summary, string value) =>
        _members.Expression(name, $"public {type} {name}", value, $"<summary>{summary}</summary>");

    private void Method(string type, string name, string parameters, string summary, string body) =>
        _members.Expression(name, $"public {type} {name}({parameters})", body, $"<summary>{summary}</summary>");
}
