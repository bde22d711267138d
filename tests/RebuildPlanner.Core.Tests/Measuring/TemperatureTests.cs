using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.Tests.Measuring;

public class TemperatureTests
{
    // ISO 4787: 7 °C off changes a volume by 0.007 % in borosilicate 3.3 and by 0.02 % in soda-lime glass.
    [Theory]
    [InlineData(Glass.Borosilicate, 7e-5, 5e-6)]
    [InlineData(Glass.SodaLime, 2e-4, 1.2e-5)]
    public void Glass_expands_as_ISO_4787_says(Glass glass, double relative, double lastDigit) =>
        Assert.Equal(relative, Burette.FactorTo20C(Burette.GlassExpansionPerC(glass), 27, 0, 27) - 1, lastDigit);

    // Materials tables: 100 mm of grey iron 10 °C off is 11.4 µm.
    [Fact]
    public void Iron_grows_11_micrometres_in_100_mm_and_10_degrees() =>
        Assert.Equal(-0.0114, Expansion.CorrectionMm(100, 0, 30, Expansion.PerC(Metal.CastIron), 30), 1e-9);

    [Fact]
    public void A_part_measured_with_a_gauge_of_its_own_metal_needs_no_correction() =>
        Assert.Equal(0, Expansion.CorrectionMm(84, Expansion.PerC(Metal.Steel), 31, Expansion.PerC(Metal.Steel), 31), 1e-15);

    // Tanaka 2001: water 998.2068 kg/m³ at 20 °C and 997.0470 at 25 °C. Poured at 20 °C into a part at 25 °C it has grown by their ratio.
    [Fact]
    public void Liquid_that_warms_in_the_part_is_counted_with_its_own_expansion()
    {
        double beta = ((998.2068 / 997.0470) - 1) / 5;

        double factor = Burette.FactorTo20C(0, 20, 0, 25, beta);

        Assert.Equal(998.2068 / 997.0470, factor, 1e-12);
    }

    [Fact]
    public void Two_temperatures_without_the_liquids_expansion_are_refused() =>
        Assert.Throws<ArgumentException>(() => Burette.FactorTo20C(9.9e-6, 20, 21.5e-6, 25));

    [Fact]
    public void A_warm_aluminium_chamber_is_smaller_cold() =>
        Assert.Equal(1 - (4 * ((3 * 21.5e-6) - 9.9e-6)), Burette.FactorTo20C(9.9e-6, 24, 21.5e-6, 24), 1e-7);
}
