using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Emission;

/// <summary>What the generated documentation says of the family, in the modeller's names.</summary>
internal sealed class Documentation(FamilyDeclaration declaration, NormalForm form)
{
    /// <summary>The exponent without its normalizer: "logHours·log(hours) + …".</summary>
    public string Exponent
    {
        get
        {
            var terms = form.Statistics.Select(s => $"{s.Parameter}·{Grouped(Text(s.Body))}").ToList();
            if (form.LogBase.Terms.Count > 0)
                terms.Add(Text(form.LogBase));
            return Encoded(string.Join(" + ", terms)).Replace("+ -", "− ").Replace("+ −", "− ");
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

    private static string Grouped(string text) => text.Contains(" ") || text.StartsWith("−") || text.StartsWith("-") ? $"({text})" : text;

    private static string Encoded(string text) => text.Replace("&", "&amp;").Replace("<", "&lt;").Replace(">", "&gt;");
}
