using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Emission;

/// <summary>What the generated documentation says of the family, in the modeller's names.</summary>
internal sealed class Documentation(FamilyDeclaration declaration, NormalForm form)
{
    /// <summary>The exponent without its normalizer, in the parameters that the modeller named: (shape − 1)·log(hours) − ….</summary>
    public string Exponent
    {
        get
        {
            var terms = form.Statistics
                .Select(s => Formula.Product(s.Natural ?? new Symbol(s.Parameter, SymbolKind.Natural, false), s.Body.ToExpression()))
                .Concat(form.LogBase.Terms.Count > 0 ? [form.LogBase.ToExpression()] : []);
            return Encoded(Rendering.Text(Formula.Sum(terms.ToArray())));
        }
    }

    public string Statistics => Encoded(string.Join(", ", form.Statistics.Select(s => Text(s.Body))));

    public string NaturalSet => Encoded(form.NaturalSetText.Length == 0 ? "all real parameters" : form.NaturalSetText);

    public string Parameter(string name)
    {
        var statistic = form.Statistics.FirstOrDefault(s => s.Parameter == name);
        return !declaration.IsTrade && statistic is not null
            ? $"The natural parameter of the statistic {Encoded(Text(statistic.Body))}."
            : $"The trade parameter {name}.";
    }

    public void WriteRemarks(SourceWriter writer)
    {
        writer.Line("/// <remarks>");
        writer.Line($"/// <para>log p({declaration.ObservationName}) = {Exponent} − A.</para>");
        if (declaration.IsTrade)
        {
            var natural = form.Statistics.Select(s => $"{s.Parameter} = {Encoded(Rendering.Text(s.Natural!))}");
            writer.Line($"/// <para>{string.Join(", ", natural)}.</para>");
        }

        writer.Line($"/// <para>The normalizer is finite where {NaturalSet}.</para>");
        writer.Line("/// </remarks>");
    }

    private static string Text(AtomSum sum) => Rendering.Text(sum);

    private static string Encoded(string text) => text.Replace("&", "&amp;").Replace("<", "&lt;").Replace(">", "&gt;");
}
