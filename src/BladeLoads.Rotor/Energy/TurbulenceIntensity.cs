using System.Collections.Immutable;

namespace BladeLoads.Rotor.Energy;

/// <summary>Standard deviation of wind speed over its mean, of ten minutes, by wind speed: linear between rows, the nearest row beyond them.</summary>
/// <param name="Rows">Wind speed, m/s, rising; intensity, 0 to 1. One or more; one row alone holds at every wind speed.</param>
public sealed record TurbulenceIntensity(ImmutableArray<(double WindSpeed, double Intensity)> Rows)
{
    public static TurbulenceIntensity Constant(double intensity) => new([(0, intensity)]);

    /// <param name="windSpeed">Mean, m/s.</param>
    public double At(double windSpeed)
    {
        if (windSpeed <= Rows[0].WindSpeed)
            return Rows[0].Intensity;
        if (windSpeed >= Rows[^1].WindSpeed)
            return Rows[^1].Intensity;
        var j = 0;
        while (Rows[j + 1].WindSpeed <= windSpeed)
            j++;
        var (a, b) = (Rows[j], Rows[j + 1]);
        return a.Intensity + ((b.Intensity - a.Intensity) * (windSpeed - a.WindSpeed) / (b.WindSpeed - a.WindSpeed));
    }
}
