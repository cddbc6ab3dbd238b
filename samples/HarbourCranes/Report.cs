using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using FamilyGen;
using Spectre.Console;

namespace HarbourCranes;

/// <summary>The answers as tables on the console.</summary>
internal static class Report
{
    public static void Heading(HarbourLog log)
    {
        AnsiConsole.MarkupLine("[bold]Harbour cranes: stoppages, repairs, spare crews[/]");
        AnsiConsole.MarkupLine("[yellow]The data are invented (see data/README.md); no terminal was observed.[/]");
        AnsiConsole.MarkupLine(Text($"{log.Shifts.Count} shifts with {log.Repairs.Count} repairs.\n"));
    }

    public static void Fit<TFamily>(FitResult<TFamily> fit)
    {
        AnsiConsole.WriteLine(fit.ToString());
        AnsiConsole.WriteLine();
    }

    public static void LostHours(HarbourLog log, LostHours uncertain, LostHours atEstimates, IEnumerable<double> limits)
    {
        var observed = log.LostHours;
        var table = new Table().Title("Chance that one shift loses more than h hours").RoundedBorder()
            .AddColumns("h", "in the log", "fits taken as exact", "parameters uncertain", "simulation error", "90 % of possible laws");
        foreach (var h in limits)
        {
            var (exact, chance) = (atEstimates.ChanceOfMoreThan(h), uncertain.ChanceOfMoreThan(h));
            table.AddRow(
                Text($"{h:0}"), Percent(observed.Count(x => x > h) / (double)observed.Length), Percent(exact.Value),
                Percent(chance.Value), "± " + Percent(chance.SimulationError), $"{Percent(chance.Low)} … {Percent(chance.High)}");
        }
        AnsiConsole.Write(RightAligned(table));
    }

    public static void Crews(HarbourLog log, IReadOnlyList<Chance> uncovered)
    {
        var observed = log.LostHours;
        var table = new Table().Title(Text($"Shifts covered by spare crews of {SpareCrews.HoursPerCrew} repair hours each")).RoundedBorder()
            .AddColumns("crews", "in the log", "parameters uncertain", "simulation error", "90 % of possible laws");
        for (var crews = 0; crews < uncovered.Count; crews++)
        {
            var chance = uncovered[crews];
            table.AddRow(
                Text($"{crews}"), Percent(observed.Count(x => x <= crews * SpareCrews.HoursPerCrew) / (double)observed.Length),
                Percent(1 - chance.Value), "± " + Percent(chance.SimulationError), $"{Percent(1 - chance.High)} … {Percent(1 - chance.Low)}");
        }
        AnsiConsole.Write(RightAligned(table));
        var needed = uncovered.Count - 2;
        AnsiConsole.MarkupLine(Text($"[bold]Hold {needed} spare crews[/]: the fewest that cover at least {SpareCrews.Goal:0 %} of shifts.\n"));
    }

    public static void Cautions(HarbourLog log)
    {
        AnsiConsole.MarkupLine(Text($"The longest repair in the log is {log.Hours.Max():0.0} h, the worst shift lost {log.LostHours.Max():0.0} h: what is said beyond rests on the laws alone."));
        AnsiConsole.MarkupLine("Shifts and repairs are taken as independent of one another: a storm that stops every crane is not in these figures.");
    }

    private static Table RightAligned(Table table)
    {
        foreach (var column in table.Columns)
            column.RightAligned();
        return table;
    }

    private static string Percent(double share) => Text($"{100 * share:0.00} %");

    private static string Text(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
