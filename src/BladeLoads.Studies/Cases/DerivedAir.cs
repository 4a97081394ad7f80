using System.Globalization;
using BladeLoads.Rotor.Air;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Cases;

/// <summary>Which values of the air a case worked out from others that it states, so that nobody is told of them as if he had written them.</summary>
public static class DerivedAir
{
    public const string Density = AirReader.Density, Viscosity = AirReader.Viscosity, SpeedOfSound = AirReader.SpeedOfSound;

    /// <param name="key">Any key of the values.</param>
    /// <param name="values">All that determine a result, as its receipt has them; one that is no number makes nothing derived.</param>
    /// <remarks>
    /// A viscosity counts as derived where it is the one that follows from the temperature: whether a case states the same besides, its values
    /// do not say, and it makes no difference.
    /// </remarks>
    public static bool IsDerived(string key, IReadOnlyDictionary<string, string> values) => key switch
    {
        SpeedOfSound => true,
        Density => AirReader.Sources.Any(values.ContainsKey),
        Viscosity => values.GetValueOrDefault(Viscosity) == CanonicalText.Of(
            TemperatureOf(values) is { } temperature ? Atmosphere.Viscosity(temperature) : CaseDefaults.DynamicViscosity),
        _ => false,
    };

    // K; null where neither a temperature nor an altitude is stated.
    private static double? TemperatureOf(IReadOnlyDictionary<string, string> values)
    {
        if (Number(values, AirReader.Temperature) is { } celsius)
            return celsius + AirReader.CelsiusZero;
        return Number(values, AirReader.Altitude) is { } altitude && Ranges.Altitude.Contain(altitude) ? Atmosphere.Temperature(altitude) : null;
    }

    private static double? Number(IReadOnlyDictionary<string, string> values, string key)
        => double.TryParse(values.GetValueOrDefault(key), NumberStyles.Float, CultureInfo.InvariantCulture, out var number) ? number : null;
}
