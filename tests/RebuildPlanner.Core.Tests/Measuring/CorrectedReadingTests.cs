using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Tests.Measuring;

/// <summary>The slopes to temperature and expansion, sign and all, against differences of the correction itself.</summary>
public class CorrectedReadingTests
{
    private const double Step = 1e-9, WarmC = 26;

    [Fact]
    public void A_volumes_slope_to_the_parts_expansion_has_the_right_sign()
    {
        double With(double alpha) => 42_000 * Burette.FactorTo20C(9.9e-6, WarmC, alpha, WarmC);
        (CorrectedReading corrected, SourceBook book) = Correct(What.Chamber, "42 cc", Metal.Aluminium);

        Assert.Equal((With(21.5e-6 + Step) - With(21.5e-6 - Step)) / (2 * Step), Slope(corrected, book, 2.15e-6), 2000.0); // second order in 3α·Δt: 1e-3 of 7.6e5
    }

    [Fact]
    public void A_lengths_slopes_to_part_and_gauge_have_opposite_signs()
    {
        (CorrectedReading corrected, SourceBook book) = Correct(What.Bore, "84 mm", Metal.CastIron);

        Assert.Equal(-84 * 6.0, Slope(corrected, book, 1.14e-6), 1e-9);
        Assert.Equal(84 * 6.0, Slope(corrected, book, 1.17e-6), 1e-9);
    }

    [Fact]
    public void A_steel_part_under_a_steel_gauge_depends_on_neither()
    {
        (CorrectedReading corrected, SourceBook _) = Correct(What.Skirt, "84 mm", Metal.Steel);

        Assert.Equal(0.0, corrected.TemperatureTerms.GroupBy(term => term.Source).Max(same => Math.Abs(same.Sum(term => term.Coefficient))), 1e-12);
    }

    private static double Slope(CorrectedReading corrected, SourceBook book, double halfWidth) =>
        corrected.TemperatureTerms.Single(term => Math.Abs(book.Sources[term.Source].WorstHigh - halfWidth) < 1e-12).Coefficient;

    private static (CorrectedReading Corrected, SourceBook Book) Correct(What what, string value, Metal metal)
    {
        SourceBook book = new();
        Quantity read = QuantityText.Read(value, WhatTable.Line(what).Rule, out _)!, warm = QuantityText.Read("26 C", EngineRules.Temperature, out _)!;
        Reading reading = new(what, new Place("1"), read, [], Temperature: warm);
        return (CorrectedReading.Of(reading, metal, null, book), book);
    }
}
