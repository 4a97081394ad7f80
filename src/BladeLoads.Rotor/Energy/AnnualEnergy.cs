namespace BladeLoads.Rotor.Energy;

/// <summary>The energy that a power curve makes in a year of a wind climate.</summary>
public static class AnnualEnergy
{
    /// <summary>Hours of a year, h; the standard's.</summary>
    public const double Hours = 8760; // iec61400-12-1

    /// <summary>Width of a bin of wind speed, m/s.</summary>
    public const double BinWidth = 0.5; // iec61400-12-1

    /// <summary>s of a year.</summary>
    public const double SecondsOfAYear = Hours * SecondsPerHour;

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
        return SecondsOfAYear * mean;
    }
}
