using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Measuring;

/// <summary>A reading brought to 20 °C, with the doubts its temperature brings.</summary>
/// <param name="Reading">The reading.</param>
/// <param name="Value">Its signed value at 20 °C, coherent unit.</param>
/// <param name="Factor">What a change of the value read is multiplied by on the way to 20 °C, 1.</param>
/// <param name="TemperatureTerms">The doubts of temperature and expansion.</param>
public sealed record CorrectedReading(Reading Reading, double Value, double Factor, IReadOnlyList<Term> TemperatureTerms)
{
    /// <summary>How many fills the reading took; 1 for one that is not a burette's.</summary>
    public int Fills => Math.Max(1, Reading.Fills.Count);

    /// <summary>Corrects one reading.</summary>
    /// <param name="reading">The reading.</param>
    /// <param name="partMetal">The metal of the part read.</param>
    /// <param name="gauge">The gauge, or null where none was named.</param>
    /// <param name="book">Where the doubts are kept: one for each reading's temperature, one for each metal's expansion.</param>
    public static CorrectedReading Of(Reading reading, Metal partMetal, Gauge? gauge, SourceBook book)
    {
        double read = reading.Value?.Midpoint ?? reading.Fills.Sum(fill => fill.To.Midpoint - fill.From.Midpoint);
        bool isVolume = reading.Value is null || reading.Value.Kind == QuantityKind.Volume;
        bool isLength = reading.Value?.Kind == QuantityKind.Length;
        if (reading.Temperature is not { } temperature || !(isVolume || isLength))
        {
            return new CorrectedReading(reading, read, 1.0, []);
        }

        double celsius = temperature.Midpoint, warmer = celsius - 20.0;
        double part = Expansion.PerC(partMetal), steel = Expansion.PerC(Expansion.GaugeMetal);
        List<Term> terms = [];
        double value, factor, perC;
        if (isVolume)
        {
            double glass = Burette.GlassExpansionPerC(gauge?.Glass ?? Burette.UsualGlass);
            factor = Burette.FactorTo20C(glass, celsius, part, celsius);
            value = read * factor;
            perC = read * (glass - (3.0 * part));
            terms.Add(new Term(Alpha(partMetal), -3.0 * read * warmer, reading.What));
        }
        else
        {
            factor = 1.0;
            value = read + Expansion.CorrectionMm(read, steel, celsius, part, celsius);
            perC = read * (steel - part);
            terms.Add(new Term(Alpha(Expansion.GaugeMetal), read * warmer, reading.What));
            terms.Add(new Term(Alpha(partMetal), -read * warmer, reading.What));
        }

        double halfWidthC = temperature.HalfWidth ?? Expansion.TemperatureLimitC;
        if (halfWidthC > 0.0)
        {
            terms.Add(new Term(book.Add(Source.Rectangular(halfWidthC)), perC, reading.What));
        }

        return new CorrectedReading(reading, value, factor, terms);

        // One input a metal: iron by either of its names is one.
        int Alpha(Metal metal) => book.Shared(("expansion", Expansion.PerC(metal)), Source.Rectangular(Expansion.RelativeLimit * Expansion.PerC(metal)));
    }
}
