using System.Linq;
using FamilyGen.Generator.Algebra;
using FamilyGen.Generator.Model;

namespace FamilyGen.Generator.Emission;

/// <summary>The growth of the exponent at each end, as data from which the library decides which parameters are natural
/// and which moments are finite.</summary>
internal sealed class NaturalSetEmitter(NormalForm form, SourceWriter writer)
{
    private const string Kernels = "global::FamilyGen.Kernels.";

    private readonly DoublePrinter _printer = new("x", null, KernelText.KernelSymbol);

    public void Write(bool hasKnown)
    {
        writer.Line("/// <inheritdoc/>");
        writer.Line(hasKnown
            ? $"public {Kernels}NaturalSet NaturalSet => new({(form.Ends.Count == 0 ? "[]);" : "")}"
            : $"public {Kernels}NaturalSet NaturalSet => s_naturalSet;");
        if (!hasKnown)
        {
            writer.Line();
            writer.Line($"private static readonly {Kernels}NaturalSet s_naturalSet = new({(form.Ends.Count == 0 ? "[]);" : "")}");
        }

        if (form.Ends.Count > 0)
        {
            writer.Line("[");
            foreach (var end in form.Ends)
                WriteEnd(end);
            writer.Line("]);");
        }

        writer.Line();
    }

    private void WriteEnd(EndRow end)
    {
        writer.Indented($"new(\"{Escape(end.Where)}\", {Bool(end.IsInfinite)}, {Bool(end.IsUpper)},");
        writer.Indented("    [");
        foreach (var rank in end.Ranks)
        {
            var weights = string.Join(", ", rank.Weights.Select(_printer.Print));
            writer.Indented($"        new({GrowthText(rank.Kind, rank.Order)}, [{weights}], {_printer.Print(rank.Constant)}, \"{Escape(rank.Text)}\"),");
        }

        writer.Indented("    ],");
        var statistics = end.Statistics.Select(s => GrowthText(s.Kind, s.Order));
        writer.Indented($"    [{string.Join(", ", statistics)}]),");
    }

    private string GrowthText(string kind, Expression order) =>
        order is Number { Value: var one } && one == Rational.One
            ? $"new({Kernels}GrowthKind.{kind})"
            : $"new({Kernels}GrowthKind.{kind}, {_printer.Print(order)})";

    private static string Bool(bool value) => value ? "true" : "false";

    private static string Escape(string text) => text.Replace("\\", "\\\\").Replace("\"", "\\\"");
}
