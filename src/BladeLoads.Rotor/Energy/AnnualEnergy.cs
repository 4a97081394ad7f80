namespace BladeLoads.Rotor.Energy;

/// <summary>The energy that a power curve makes in a year of a wind climate.</summary>
public static class AnnualEnergy
{
    /// <summary>Hours of a year, h; the standard's.</summary>
    public const double Hours = 8760; // iec61400-12-1

    /// <summary>Width of a bin of wind speed, m/s.</summary>
    public const double BinWidth = 0.5; // iec61400-12-1

    private const double SecondsPerHour = 3600;

    /// <summary>
    /// Energy of a year without losses, J: <c>8760 h sum [F(V_i) - F(V_(i-1))] (P_(i-1) + P_i)/2</c>, from V_1 - 0.5 m/s with zero power.
    /// </summary>
    /// <param name="windSpeeds">m/s, rising: the bins as they are.</param>
    /// <param name="powers">W, one a wind speed; none may be NaN.</param>
    /// <remarks>Source: key iec61400-12-1 in docs/sources.md, from memory, verify against the standard.</remarks>
    public static double OfBins(ReadOnlySpan<double> windSpeeds, ReadOnlySpan<double> powers, WindClimate climate)
    {
        var (below, belowPower) = (climate.Cumulative(windSpeeds[0] - BinWidth), 0.0);
        var mean = 0.0;
        for (var i = 0; i < windSpeeds.Length; i++)
        {
            var cumulative = climate.Cumulative(windSpeeds[i]);
            mean += (cumulative - below) * (belowPower + powers[i]) / 2;
            (below, belowPower) = (cumulative, powers[i]);
        }
        return Hours * SecondsPerHour * mean;
    }

    /// <summary>
    /// A curve brought to bins of 0.5 m/s, centred on multiples of it, linear between its points: from the first multiple at or above its
    /// first wind speed to the last at or below its last.
    /// </summary>
    /// <param name="windSpeeds">m/s, rising.</param>
    /// <param name="powers">W, one a wind speed.</param>
    public static (double[] WindSpeeds, double[] Powers) Resample(ReadOnlySpan<double> windSpeeds, ReadOnlySpan<double> powers)
    {
        // A wind speed meant as a multiple may miss it by its last digits.
        var first = (int)Math.Ceiling((windSpeeds[0] / BinWidth) - 1e-9);
        var last = (int)Math.Floor((windSpeeds[^1] / BinWidth) + 1e-9);
        var (speeds, values) = (new double[Math.Max(0, last - first + 1)], new double[Math.Max(0, last - first + 1)]);
        var j = 0;
        for (var i = 0; i < speeds.Length; i++)
        {
            speeds[i] = (first + i) * BinWidth;
            while (j < windSpeeds.Length - 2 && windSpeeds[j + 1] < speeds[i])
                j++;
            values[i] = windSpeeds.Length == 1 ? powers[0]
                : powers[j] + ((powers[j + 1] - powers[j]) * Math.Clamp((speeds[i] - windSpeeds[j]) / (windSpeeds[j + 1] - windSpeeds[j]), 0, 1));
        }
        return (speeds, values);
    }
}
