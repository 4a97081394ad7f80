namespace BladeLoads.Rotor.Air;

/// <summary>Density and viscosity of the air from what a weather station or a map says.</summary>
public static class Atmosphere
{
    /// <summary>Pa; at sea level in the standard atmosphere.</summary>
    public const double SeaLevelPressure = 101325; // iso2533

    /// <summary>K; at sea level in the standard atmosphere.</summary>
    public const double SeaLevelTemperature = 288.15; // iso2533

    private const double GasConstantOfDryAir = 287.05; // iec61400-12-1, J/(kg K)
    private const double GasConstantOfVapour = 461.5; // iec61400-12-1, J/(kg K)

    /// <summary>Pressure of the standard atmosphere, Pa: <c>p = p0 (T/T0)^(g/(L R))</c> with <c>T = T0 - L H</c>.</summary>
    /// <param name="altitude">Geopotential, m; from -1000 to 11000, the troposphere.</param>
    /// <exception cref="ArgumentOutOfRangeException">The altitude is outside that range.</exception>
    /// <remarks>Source: key iso2533 in docs/sources.md; constants from memory, verify against the standard.</remarks>
    public static double Pressure(double altitude)
    {
        const double Gravity = 9.80665, GasConstant = 287.05287;
        return SeaLevelPressure * Math.Pow(Temperature(altitude) / SeaLevelTemperature, Gravity / (LapseRate * GasConstant));
    }

    /// <summary>Temperature of the standard atmosphere, K: <c>T = T0 - L H</c>.</summary>
    /// <param name="altitude">Geopotential, m; from -1000 to 11000.</param>
    /// <exception cref="ArgumentOutOfRangeException">The altitude is outside that range.</exception>
    /// <remarks>Source: key iso2533 in docs/sources.md; constants from memory, verify against the standard.</remarks>
    public static double Temperature(double altitude)
    {
        if (!(altitude is >= -1000 and <= 11000))
            throw new ArgumentOutOfRangeException(nameof(altitude), altitude, "the troposphere, from -1000 to 11000 m");
        return SeaLevelTemperature - (LapseRate * altitude);
    }

    /// <summary>
    /// Density of humid air, kg/m3: <c>(1/T) (p/R0 - h pw (1/R0 - 1/Rw))</c> with the vapour pressure <c>pw = 0.0000205 exp(0.0631846 T)</c>.
    /// </summary>
    /// <param name="pressure">Pa, above 0.</param>
    /// <param name="temperature">K; the vapour pressure is meant for weather, some 250 to 320 K.</param>
    /// <param name="relativeHumidity">0 to 1.</param>
    /// <remarks>Source: key iec61400-12-1 in docs/sources.md, from memory, verify against the standard.</remarks>
    public static double Density(double pressure, double temperature, double relativeHumidity)
    {
        var vapourPressure = 0.0000205 * Math.Exp(0.0631846 * temperature);
        return ((pressure / GasConstantOfDryAir)
            - (relativeHumidity * vapourPressure * ((1 / GasConstantOfDryAir) - (1 / GasConstantOfVapour)))) / temperature;
    }

    /// <summary>Dynamic viscosity of air, Pa s, by Sutherland's law: <c>1.458e-6 T^1.5 / (T + 110.4)</c>.</summary>
    /// <param name="temperature">K, above 0.</param>
    /// <remarks>Source: key sutherland1893 in docs/sources.md; constants as in key us-standard-atmosphere-1976.</remarks>
    public static double Viscosity(double temperature) => 1.458e-6 * Math.Pow(temperature, 1.5) / (temperature + 110.4);

    /// <summary>Speed of sound in dry air, m/s: <c>sqrt(1.4 R T)</c>.</summary>
    /// <param name="temperature">K, above 0.</param>
    public static double SpeedOfSound(double temperature) => Math.Sqrt(1.4 * 287.05287 * temperature);

    private const double LapseRate = 0.0065; // iso2533, K/m
}
