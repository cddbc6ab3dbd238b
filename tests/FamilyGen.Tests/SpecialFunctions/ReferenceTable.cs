using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;

namespace FamilyGen.Tests.SpecialFunctions;

/// <summary>A checked-in table of reference values, each the sum of two doubles.</summary>
internal static class ReferenceTable
{
    public sealed record Row(string Function, double[] Arguments, double High, double Low)
    {
        /// <summary>The error of a computed value in units in the last place of the true one.</summary>
        public double ErrorInUlp(double computed)
        {
            if (computed == High && Low == 0)
                return 0;
            var size = Math.Abs(High);
            return Math.Abs(computed - High - Low) / (Math.BitIncrement(size) - size);
        }

        public override string ToString() => string.Create(
            CultureInfo.InvariantCulture, $"{Function}({string.Join(", ", Arguments.Select(a => a.ToString("R", CultureInfo.InvariantCulture)))}) = {High:R}");
    }

    public static IReadOnlyList<Row> Read(string name)
    {
        using var stream = typeof(ReferenceTable).Assembly.GetManifestResourceStream(name)
            ?? throw new FileNotFoundException(name);
        using var reader = new StreamReader(stream);
        reader.ReadLine();                          // the heading
        var rows = new List<Row>();
        while (reader.ReadLine() is { } line)
        {
            var cells = line.Split('\t');
            var numbers = cells[1..].Select(cell => double.Parse(cell, CultureInfo.InvariantCulture)).ToArray();
            rows.Add(new(cells[0], numbers[..^2], numbers[^2], numbers[^1]));
        }

        return rows;
    }
}
