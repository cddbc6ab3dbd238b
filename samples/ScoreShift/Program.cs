using System;
using System.Globalization;
using ScoreShift;

// the stoppages of the last forty shifts (invented)
int[] history = [3, 4, 4, 2, 5, 3, 1, 4, 3, 6, 2, 3, 5, 4, 3, 2, 4, 7, 3, 4, 0, 3, 5, 2, 4, 3, 3, 6, 4, 2, 1, 5, 3, 4, 2, 3, 5, 4, 3, 4];

var fit = ShiftStoppages.Fit(history);
Console.WriteLine(fit);

// how unusual is tonight?
var tonight = args.Length > 0 ? int.Parse(args[0], CultureInfo.InvariantCulture) : 9;
var law = fit.Estimate;
var asManyOrMore = law.Survival(tonight - 1);
Console.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{tonight} stoppages: probability {law.Density(tonight):0.00000}, as many or more {asManyOrMore:0.00000}"));
Console.WriteLine(asManyOrMore < 0.01 ? "Unusual: fewer than one shift in a hundred is as bad." : "Nothing unusual.");
return 0;
