namespace RebuildPlanner.Core.Quantities;

/// <summary>One spelling of a unit and its way to the working unit: mm, mm², mm³, deg, kPa, °C, kJ/kg.</summary>
/// <remarks>
/// Figures stay decimal until every sum of a limit is made, so that 1.05 mm + 0.05 mm is the double nearest to 1.10 and not its neighbour.
/// Nearly every factor of the trade is exact by definition, and rounding the library's double to fifteen digits gives it back exactly.
/// </remarks>
internal sealed class WrittenUnit
{
    private readonly Func<double, double>? _convert;
    private readonly Func<double, double>? _convertDifference;
    private readonly Lazy<decimal> _factor;

    private WrittenUnit(string word, QuantityKind kind, Func<double, double>? convert, Func<double, double>? convertDifference)
    {
        Word = word;
        Kind = kind;
        _convert = convert;
        _convertDifference = convertDifference;
        _factor = new Lazy<decimal>(() => convertDifference is null ? 1m : (decimal)convertDifference(1.0));
    }

    public string Word { get; }

    public QuantityKind Kind { get; }

    // Fetched when first needed: the library's first conversion costs milliseconds that a metric job never has to pay. A Lazy, since a
    // decimal is written in parts and a second thread once read half of one.
    public decimal Factor => _factor.Value;

    private bool HasOffset => _convert is not null;

    /// <summary>The working unit itself.</summary>
    public static WrittenUnit Working(string word, QuantityKind kind) => new(word, kind, null, null);

    /// <summary>A unit that is a multiple of the working unit.</summary>
    public static WrittenUnit Multiple(string word, QuantityKind kind, Func<double, double> convert) => new(word, kind, null, convert);

    /// <summary>A unit with another zero: a temperature.</summary>
    public static WrittenUnit WithOffset(
        string word, QuantityKind kind, Func<double, double> convert, Func<double, double> convertDifference) =>
        new(word, kind, convert, convertDifference);

    // A temperature goes through kelvin and comes back with noise in the fourteenth digit; no thermometer has nine decimals.
    public decimal ToWorking(decimal written) =>
        HasOffset ? decimal.Round((decimal)_convert!((double)written), 9) : written * Factor;

    public decimal DifferenceToWorking(decimal written) =>
        HasOffset ? (decimal)_convertDifference!((double)written) : written * Factor;

    public double FromWorking(double working) =>
        HasOffset ? (working - _convert!(0.0)) / _convertDifference!(1.0) : working / (double)Factor;

    public double DifferenceFromWorking(double working) =>
        HasOffset ? working / _convertDifference!(1.0) : working / (double)Factor;
}
