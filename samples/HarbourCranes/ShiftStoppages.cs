using FamilyGen;
using static MathNet.Numerics.SpecialFunctions;

namespace HarbourCranes;

/// <summary>Stoppages in one shift. The second statistic frees the spread from the mean: with crowding 1 this is the Poisson
/// law, above 1 the counts are steadier than that, below 1 they come in crowds.</summary>
[Family]
public partial class ShiftStoppages
{
    [Support] static CountRange Range => CountRange.From(0);
    [SufficientStatistic] static double Total(int stoppages) => stoppages;
    [SufficientStatistic] static double Crowding(int stoppages) => -FactorialLn(stoppages);
}
