using FamilyGen;
using static MathNet.Numerics.SpecialFunctions;

namespace ScoreShift;

/// <summary>Stoppages in one shift, with a spread that is free of the mean.</summary>
[Family]
public partial class ShiftStoppages
{
    [Support] static CountRange Range => CountRange.From(0);
    [SufficientStatistic] static double Total(int stoppages) => stoppages;
    [SufficientStatistic] static double Crowding(int stoppages) => -FactorialLn(stoppages);
}
