namespace BladeLoads.Rotor.Air;

/// <summary>The air a rotor works in. Every value is above 0 and finite; the type cannot hold others.</summary>
public sealed record AirProperties
{
    /// <param name="density">Density, kg/m3.</param>
    /// <param name="dynamicViscosity">Dynamic viscosity, Pa s.</param>
    /// <param name="speedOfSound">m/s; only the tip Mach number depends on it.</param>
    /// <exception cref="ArgumentOutOfRangeException">A value is not a positive finite number.</exception>
    public AirProperties(double density, double dynamicViscosity, double speedOfSound)
    {
        Density = PositiveAndFinite(density, nameof(density));
        DynamicViscosity = PositiveAndFinite(dynamicViscosity, nameof(dynamicViscosity));
        SpeedOfSound = PositiveAndFinite(speedOfSound, nameof(speedOfSound));
    }

    /// <summary>kg/m3.</summary>
    public double Density { get; }

    /// <summary>Pa s.</summary>
    public double DynamicViscosity { get; }

    /// <summary>m/s.</summary>
    public double SpeedOfSound { get; }

    private static double PositiveAndFinite(double value, string name)
        => value > 0 && double.IsFinite(value) ? value : throw new ArgumentOutOfRangeException(name, value, "must be positive and finite");
}
