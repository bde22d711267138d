namespace RebuildPlanner.Core.Measuring;

/// <summary>Volumes by burette and what temperature does to them.</summary>
public static class Burette
{
    /// <summary>The glass of a burette of which none is recorded: common practice.</summary>
    public const Glass UsualGlass = Glass.Borosilicate;

    /// <summary>Cubic expansion of a burette's glass, 1/°C.</summary>
    /// <remarks>Borosilicate 3.3: 9.9e-6; soda-lime: 27e-6. Source: iso4787. Valid for: 5 to 50 °C. Error: taken as exact.</remarks>
    public static double GlassExpansionPerC(Glass glass) => glass == Glass.Borosilicate ? 9.9e-6 : 27e-6;

    /// <summary>The factor from the volume read to the part's volume at 20 °C, 1.</summary>
    /// <param name="glassExpansionPerC">γ of the burette, 1/°C.</param>
    /// <param name="buretteC">Temperature of the burette, °C.</param>
    /// <param name="partExpansionPerC">Linear α of the part's metal, 1/°C.</param>
    /// <param name="partC">Temperature of the part, °C.</param>
    /// <param name="liquidExpansionPerC">β of the liquid, 1/°C; needed only where the two temperatures differ.</param>
    /// <remarks>
    /// [1 + γ(t_burette − 20)]·[1 + β(t_part − t_burette)]/[1 + 3α(t_part − 20)]. At one temperature the liquid cancels.
    /// Source: iso4787. Valid for: 5 to 50 °C. Error: below 1e-5.
    /// </remarks>
    /// <exception cref="ArgumentException">Two temperatures without the liquid's expansion.</exception>
    public static double FactorTo20C(
        double glassExpansionPerC, double buretteC, double partExpansionPerC, double partC, double? liquidExpansionPerC = null)
    {
        if (buretteC != partC && liquidExpansionPerC is null)
        {
            throw new ArgumentException("Burette and part at two temperatures need the expansion of the liquid.", nameof(liquidExpansionPerC));
        }

        double glass = 1.0 + (glassExpansionPerC * (buretteC - 20.0));
        double liquid = 1.0 + ((liquidExpansionPerC ?? 0.0) * (partC - buretteC));
        double part = 1.0 + (3.0 * partExpansionPerC * (partC - 20.0));
        return glass * liquid / part;
    }
}
