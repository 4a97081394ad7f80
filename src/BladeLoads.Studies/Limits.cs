namespace BladeLoads.Studies;

/// <summary>
/// Values beyond which no rotor is, in the units of the files: there a decimal point or a unit is wrong, and nothing is solved.
/// Common practice, no source.
/// </summary>
internal static class Limits
{
    public const double Density = 100;           // kg/m3
    public const double DynamicViscosity = 1;    // Pa s
    public const double RatedPowerKiloWatt = 1e9;
    public const double Radius = 1000;           // m
    public const double RotorSpeedRpm = 100_000;
    public const double WindSpeed = 200;         // m/s
}
