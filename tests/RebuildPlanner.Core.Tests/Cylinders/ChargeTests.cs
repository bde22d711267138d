using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Tests.Cylinders;

public class ChargeTests
{
    // ISO 2533, standard atmosphere: pressure over sea-level pressure.
    [Theory]
    [InlineData(0, 1.0, 1e-12)]
    [InlineData(500, 0.942, 5e-4)]
    [InlineData(1000, 0.887, 5e-4)]
    [InlineData(2000, 0.7846, 5e-5)]
    public void Ambient_pressure_agrees_with_ISO_2533(double altitudeM, double ratio, double lastDigit) =>
        Assert.Equal(ratio, Charge.AmbientPressure(new Real(altitudeM)).Value / 101.325, lastDigit);

    // Computed independently of this program: sea level, trapped ratio 8, kPa gauge.
    [Theory]
    [InlineData(1.20, 1127)]
    [InlineData(1.25, 1262)]
    [InlineData(1.30, 1411)]
    public void Cranking_pressure_agrees_with_the_closed_form(double exponent, double gaugeKPa) =>
        Assert.Equal(gaugeKPa, Charge.CrankingPressure(new Real(8), Charge.AmbientPressure(default(Real)), new Real(exponent)).Value, 0.5);

    [Fact]
    public void A_charge_that_is_not_compressed_shows_nothing_on_the_gauge() =>
        Assert.Equal(0.0, Charge.CrankingPressure(new Real(1), new Real(95), new Real(1.25)).Value, 1e-12);
}
