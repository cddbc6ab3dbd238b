using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using CsvHelper;

namespace HarbourCranes;

/// <summary>One shift of the terminal.</summary>
internal sealed record ShiftRow(int Shift, DateTime Date, string Turn, int Stoppages);

/// <summary>One repair, in hours from stoppage to restart.</summary>
internal sealed record RepairRow(int Shift, int Crane, double Hours);

/// <summary>The terminal's log: a row a shift, and a row a repair.</summary>
internal sealed record HarbourLog(IReadOnlyList<ShiftRow> Shifts, IReadOnlyList<RepairRow> Repairs)
{
    public int[] Stoppages => [.. Shifts.Select(s => s.Stoppages)];

    public double[] Hours => [.. Repairs.Select(r => r.Hours)];

    /// <summary>The hours that each shift lost, summed from its repairs.</summary>
    public double[] LostHours
    {
        get
        {
            var lost = Repairs.GroupBy(r => r.Shift).ToDictionary(g => g.Key, g => g.Sum(r => r.Hours));
            return [.. Shifts.Select(s => lost.GetValueOrDefault(s.Shift))];
        }
    }

    public static HarbourLog Read(string folder)
    {
        var log = new HarbourLog(Rows<ShiftRow>(folder, "shifts.csv"), Rows<RepairRow>(folder, "repairs.csv"));
        log.Reconcile();
        return log;
    }

    /// <summary>Every stoppage must have its repair, or the two fits would speak of different weeks.</summary>
    private void Reconcile()
    {
        var repairs = Repairs.ToLookup(r => r.Shift);
        if (Shifts.FirstOrDefault(s => repairs[s.Shift].Count() != s.Stoppages) is { } shift)
            throw new InvalidDataException($"Shift {shift.Shift} counts {shift.Stoppages} stoppages but has {repairs[shift.Shift].Count()} repairs.");
    }

    private static List<T> Rows<T>(string folder, string file)
    {
        using var reader = new StreamReader(Path.Combine(folder, file));
        var lowerCase = new CsvHelper.Configuration.CsvConfiguration(CultureInfo.InvariantCulture)
        {
            PrepareHeaderForMatch = header => header.Header.ToLowerInvariant(),
        };
        using var csv = new CsvReader(reader, lowerCase);
        return [.. csv.GetRecords<T>()];
    }
}
