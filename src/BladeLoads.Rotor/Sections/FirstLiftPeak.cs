namespace BladeLoads.Rotor.Sections;

/// <summary>
/// Where lift peaks for the first time, coming from below: the angle that a stall margin is counted from. A rise and fall of less than
/// 0.02, the noise in the straight part of a measured table, is no peak.
/// </summary>
/// <remarks>Common practice, no source; the rule is ours. A table may be joined to its extension elsewhere: <see cref="StallPoint"/>.</remarks>
public static class FirstLiftPeak
{
    private const double Noise = 0.02;

    /// <param name="polar">Looked at from -90 to 90 degrees.</param>
    /// <returns>
    /// Peak: rad, positive infinity where nothing lifts. Lifting: rad, the last row below the peak that does not lift; negative infinity
    /// where the first row does already, positive where nothing lifts.
    /// </returns>
    public static (double Lifting, double Peak) Of(Polar polar)
    {
        var (lifting, at, largest) = (double.NegativeInfinity, double.PositiveInfinity, 0.0);
        for (var i = 0; i < polar.Angles.Length && polar.Angles[i] <= Math.PI / 2; i++)
        {
            if (polar.Angles[i] < -Math.PI / 2)
                continue;
            if (polar.Lift[i] <= 0 && largest < Noise)
                (lifting, at, largest) = (polar.Angles[i], double.PositiveInfinity, 0);
            else if (polar.Lift[i] > largest)
                (at, largest) = (polar.Angles[i], polar.Lift[i]);
            else if (polar.Lift[i] < largest - Noise)
                return (lifting, at);
        }
        return largest >= Noise ? (lifting, at) : (double.PositiveInfinity, double.PositiveInfinity);
    }
}
