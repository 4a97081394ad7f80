namespace BladeLoads.Rotor.Energy;

/// <summary>A power curve at one air density told at another, by the two ways of the standard.</summary>
/// <remarks>Source: key iec61400-12-1 in docs/sources.md, from memory, verify against the standard.</remarks>
public static class DensityNormalisation
{
    /// <summary>Stall-regulated machines: power scales with density, W: <c>P rho0/rho</c>.</summary>
    public static double Power(double power, double density, double referenceDensity) => power * referenceDensity / density;

    /// <summary>Actively controlled machines: the wind speed that carries the same power, m/s: <c>V (rho/rho0)^(1/3)</c>.</summary>
    public static double WindSpeed(double windSpeed, double density, double referenceDensity)
        => windSpeed * Math.Cbrt(density / referenceDensity);
}
