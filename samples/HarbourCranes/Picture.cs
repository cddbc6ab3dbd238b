using System;
using System.IO;
using System.Linq;
using ScottPlot;
using SkiaSharp;

namespace HarbourCranes;

/// <summary>Data against fit, the stoppages beside the hours, in one SVG.</summary>
internal static class Picture
{
    private const int Width = 1200, Height = 480;

    private static readonly Color s_data = Color.FromHex("#9cb7d2");
    private static readonly Color s_fit = Color.FromHex("#b5402c");

    public static void Save(string path, HarbourLog log, ShiftStoppages stoppages, RepairHours hours)
    {
        Directory.CreateDirectory(Path.GetDirectoryName(path)!);
        var both = Draw(log, stoppages, hours);
        using var file = File.Create(path);
        using var canvas = SKSvgCanvas.Create(new SKRect(0, 0, Width, Height), file);
        canvas.Clear(SKColors.White);
        both.Render(canvas, new PixelRect(0, Width, Height, 0));
    }

    private static Multiplot Draw(HarbourLog log, ShiftStoppages stoppages, RepairHours hours)
    {
        var both = new Multiplot { Layout = new ScottPlot.MultiplotLayouts.Columns() };
        both.AddPlots(2);
        DrawStoppages(both.GetPlot(0), log.Stoppages, stoppages);
        DrawHours(both.GetPlot(1), log.Hours, hours);
        return both;
    }

    private static void DrawStoppages(Plot plot, int[] data, ShiftStoppages fit)
    {
        var counts = Enumerable.Range(0, Math.Max(data.Max(), fit.Quantile(0.999)) + 1).ToArray();
        double[] places = [.. counts.Select(c => (double)c)];
        double[] shares = [.. counts.Select(c => data.Count(x => x == c) / (double)data.Length)];
        AddBars(plot, places, shares, 0.8, $"{data.Length} shifts (invented)");
        var points = plot.Add.Scatter(places, [.. counts.Select(c => fit.Density(c))]);
        points.Color = s_fit;
        points.MarkerSize = 8;
        points.LineWidth = 1;
        points.LegendText = "fit";
        Finish(plot, "Stoppages per shift", "stoppages", "share of shifts", left: -0.6, counts[^1] + 0.6, Math.Max(shares.Max(), counts.Max(c => fit.Density(c))));
    }

    private static void DrawHours(Plot plot, double[] data, RepairHours fit)
    {
        const double Step = 0.25;
        var last = Math.Ceiling(data.Max());
        var cells = Enumerable.Range(0, (int)(last / Step)).ToArray();
        double[] heights = [.. cells.Select(c => data.Count(x => x > c * Step && x <= (c + 1) * Step) / (data.Length * Step))];
        AddBars(plot, [.. cells.Select(c => (c + 0.5) * Step)], heights, Step, $"{data.Length} repairs (invented)");
        double[] hours = [.. Enumerable.Range(1, 400).Select(i => i * last / 400)];
        var line = plot.Add.ScatterLine(hours, [.. hours.Select(fit.Density)]);
        line.Color = s_fit;
        line.LineWidth = 2;
        line.LegendText = "fit";
        Finish(plot, "Repair hours", "hours from stoppage to restart", "density per hour", left: 0, last, Math.Max(heights.Max(), hours.Max(fit.Density)));
    }

    private static void AddBars(Plot plot, double[] places, double[] heights, double size, string legend)
    {
        var bars = plot.Add.Bars(places, heights);
        bars.LegendText = legend;
        bars.Color = s_data;
        foreach (var bar in bars.Bars)
            (bar.Size, bar.LineColor) = (size, Colors.White);
    }

    private static void Finish(Plot plot, string title, string across, string up, double left, double right, double top)
    {
        plot.Title(title);
        plot.XLabel(across);
        plot.YLabel(up);
        plot.Axes.SetLimits(left, right, 0, 1.12 * top);
        plot.ShowLegend(Alignment.UpperRight);
    }
}
