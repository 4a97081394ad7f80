using System.Collections.Immutable;
using BladeLoads.Rotor.Air;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Cases;

/// <summary>Reads [air]: a density, or what it can be worked out from.</summary>
internal static class AirReader
{
    public const string Density = "air.density_kg_m3", Viscosity = "air.dynamic_viscosity_Pa_s";
    public const string Altitude = "air.altitude_m", Temperature = "air.temperature_C";

    /// <summary>No key: it follows in any case.</summary>
    public const string SpeedOfSound = "air.speed_of_sound_m_s";

    public const double CelsiusZero = 273.15; // K

    private const string Pressure = "air.pressure_Pa", Humidity = "air.relative_humidity";

    /// <summary>What a density is worked out from, where any of them is stated.</summary>
    public static ImmutableArray<string> Sources { get; } = [Altitude, Temperature, Pressure, Humidity];

    /// <summary>Null where an error keeps it from being known.</summary>
    public static AirProperties? Read(CaseValues values)
    {
        var bothPressures = values.Has(Pressure) && values.Has(Altitude);
        if (values.Has(Density))
            values.RefuseTogether(
                Sources, Density, "gives the density already", bothPressures ? "; of altitude_m and pressure_Pa one does, as either gives the pressure" : "");
        else
            values.RefuseTogether([Pressure], Altitude, "gives the pressure already");

        var altitude = Given(values, Altitude, Ranges.Altitude);
        var temperature = Given(values, Temperature, Ranges.Temperature) + CelsiusZero
            ?? (altitude is { } height && !double.IsNaN(height) ? Atmosphere.Temperature(height) : null);
        var pressure = Given(values, Pressure, Ranges.Pressure)
            ?? (altitude is { } place && !double.IsNaN(place) ? Atmosphere.Pressure(place) : Atmosphere.SeaLevelPressure);
        var humidity = Given(values, Humidity, Ranges.Humidity) ?? 0;

        var density = values.Has(Density) || !Sources.Any(values.Has)
            ? values.Number(Density, CaseDefaults.Density, Ranges.Density)
            : Atmosphere.Density(pressure, temperature ?? Atmosphere.SeaLevelTemperature, humidity);
        var viscosity = values.Number(
            Viscosity, temperature is { } known ? Atmosphere.Viscosity(known) : CaseDefaults.DynamicViscosity,
            Ranges.Viscosity);
        UsualRanges.Check(values, Density, density);
        UsualRanges.Check(values, Viscosity, viscosity);
        var speedOfSound = Atmosphere.SpeedOfSound(temperature ?? Atmosphere.SeaLevelTemperature);
        values.Note(Density, CanonicalText.Of(density));
        values.Note(SpeedOfSound, CanonicalText.Of(speedOfSound));
        return values.IsSound ? new AirProperties(density, viscosity, speedOfSound) : null;
    }

    // Noted only where it is given: what it comes to is noted in any case.
    private static double? Given(CaseValues values, string path, Bounds bounds)
    {
        if (!values.Has(path))
            return null;
        var value = values.Check(path, bounds);
        values.Note(path, CanonicalText.Of(value));
        return value;
    }
}
