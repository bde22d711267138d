using System.Globalization;

namespace RebuildPlanner.Core.Jobs;

/// <summary>The compression ratio as a customer is told it: to 0.1, the interval rounded outwards so that it promises nothing.</summary>
/// <param name="Least">The lowest ratio of any cylinder, "10.1".</param>
/// <param name="Most">The highest.</param>
/// <param name="Low">The lowest any cylinder may be, with the coverage of the results.</param>
/// <param name="High">The highest any may be.</param>
/// <param name="Known">How many cylinders have a ratio.</param>
/// <param name="Unknown">The cylinders that have none.</param>
public sealed record RatioAnswer(string Least, string Most, string Low, string High, int Known, IReadOnlyList<string> Unknown)
{
    // A bound that is a tenth already, but for the rounding of a double, is not pushed on to the next.
    private const double Slip = 1e-9;

    /// <summary>The answer of results, or null where no cylinder has a ratio.</summary>
    public static RatioAnswer? Of(Results results)
    {
        ResultQuantity[] known = [.. results.Cylinders.Select(cylinder => cylinder.CompressionRatio).OfType<ResultQuantity>()];
        if (known.Length == 0)
        {
            return null;
        }

        return new RatioAnswer(
            Tenth(known.Min(ratio => ratio.Value), Math.Round), Tenth(known.Max(ratio => ratio.Value), Math.Round),
            Tenth(known.Min(ratio => ratio.Low!.Value), tenths => Math.Floor(tenths + Slip)),
            Tenth(known.Max(ratio => ratio.High!.Value), tenths => Math.Ceiling(tenths - Slip)),
            known.Length, [.. results.Cylinders.Where(cylinder => cylinder.CompressionRatio is null).Select(cylinder => cylinder.Cylinder)]);
    }

    private static string Tenth(double ratio, Func<double, double> round) =>
        (round(10.0 * ratio) / 10.0).ToString("F1", CultureInfo.InvariantCulture);
}
