using BladeLoads.Rotor.Air;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Cases;

/// <summary>Reads [air]: a density, or what it can be worked out from.</summary>
internal static class AirReader
{
    private const string Density = "air.density_kg_m3", Viscosity = "air.dynamic_viscosity_Pa_s";
    private const string Altitude = "air.altitude_m", Temperature = "air.temperature_C", Pressure = "air.pressure_Pa";
    private const string Humidity = "air.relative_humidity";

    private const double CelsiusZero = 273.15; // K

    /// <summary>Null where an error keeps it from being known.</summary>
    public static AirProperties? Read(CaseValues values)
    {
        string[] sources = [Altitude, Temperature, Pressure, Humidity];
        foreach (var source in sources.Where(values.Has))
            values.RefuseTogether(source, Density, "gives the density already");
        values.RefuseTogether(Pressure, Altitude, "gives the pressure already");

        var altitude = Given(values, Altitude, Bounds.FromTo(-500, 11_000));
        var temperature = Given(values, Temperature, Bounds.FromTo(-100, 100)) + CelsiusZero
            ?? (altitude is { } height && !double.IsNaN(height) ? Atmosphere.Temperature(height) : null);
        var pressure = Given(values, Pressure, Bounds.FromTo(10_000, 120_000))
            ?? (altitude is { } place && !double.IsNaN(place) ? Atmosphere.Pressure(place) : Atmosphere.SeaLevelPressure);
        var humidity = Given(values, Humidity, Bounds.Share) ?? 0;

        var density = values.Has(Density) || !sources.Any(values.Has)
            ? values.Number(Density, CaseDefaults.Density, Bounds.AboveZeroTo(Limits.Density))
            : Atmosphere.Density(pressure, temperature ?? Atmosphere.SeaLevelTemperature, humidity);
        var viscosity = values.Number(
            Viscosity, temperature is { } known ? Atmosphere.Viscosity(known) : CaseDefaults.DynamicViscosity,
            Bounds.AboveZeroTo(Limits.DynamicViscosity));
        UsualRanges.Check(values, Density, density);
        UsualRanges.Check(values, Viscosity, viscosity);
        var speedOfSound = Atmosphere.SpeedOfSound(temperature ?? Atmosphere.SeaLevelTemperature);
        values.Note(Density, CanonicalText.Of(density));
        values.Note("air.speed_of_sound_m_s", CanonicalText.Of(speedOfSound));
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
