using System;
using System.IO;
using HarbourCranes;

// what happened
var log = HarbourLog.Read(Path.Combine(AppContext.BaseDirectory, "data"));
Report.Heading(log);

// the two laws
var stoppages = ShiftStoppages.Fit(log.Stoppages);
var hours = RepairHours.Fit(log.Hours);
Report.Fit(stoppages);
Report.Fit(hours);

// the question of the trade
var uncertain = LostHours.WithParameterUncertainty(stoppages, hours, seed: 1);
var atEstimates = LostHours.AtEstimates(stoppages, hours, seed: 2);
Report.LostHours(log, uncertain, atEstimates, limits: [4, 8, 12, 16, 24]);
Report.Crews(log, SpareCrews.Uncovered(uncertain));
Report.Cautions(log);

// the picture
var picture = Path.GetFullPath(args.Length > 0 ? args[0] : Path.Combine("artifacts", "harbour-cranes.svg"));
Picture.Save(picture, log, stoppages.Estimate, hours.Estimate);
Console.WriteLine($"Data against fit: {picture}");
