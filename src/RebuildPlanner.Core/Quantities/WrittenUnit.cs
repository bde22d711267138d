namespace RebuildPlanner.Core.Quantities;

/// <summary>One spelling of a unit and its way to the working unit: mm, mm², mm³, deg, kPa, °C, kJ/kg.</summary>
/// <remarks>
/// Figures stay decimal until every sum of a limit is made, so that 1.05 mm + 0.05 mm is the double nearest to 1.10 and not its neighbour.
/// </remarks>
/// <param name="Word">The spelling.</param>
/// <param name="Kind">Of what it is a unit.</param>
/// <param name="Factor">Working units in one of it.</param>
/// <param name="Zero">Where the working unit's zero stands on its scale; other than 0 for temperatures only.</param>
internal sealed record WrittenUnit(string Word, QuantityKind Kind, decimal Factor = 1m, decimal Zero = 0m)
{
    // A ninth of a degree does not end; no thermometer has nine decimals.
    private const int TemperatureDecimals = 9;

    public decimal ToWorking(decimal written) =>
        Zero == 0m ? written * Factor : decimal.Round((written - Zero) * Factor, TemperatureDecimals);

    public decimal DifferenceToWorking(decimal written) => written * Factor;

    public double FromWorking(double working) => DifferenceFromWorking(working) + (double)Zero;

    public double DifferenceFromWorking(double working) => working / (double)Factor;
}
