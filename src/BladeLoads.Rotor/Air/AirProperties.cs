namespace BladeLoads.Rotor.Air;

/// <summary>The air a rotor works in. Both values are above 0; the type cannot hold others.</summary>
public sealed record AirProperties
{
    /// <param name="density">Density, kg/m3; above 0.</param>
    /// <param name="dynamicViscosity">Dynamic viscosity, Pa s; above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">A value is not a positive finite number.</exception>
    public AirProperties(double density, double dynamicViscosity)
    {
        if (!(density > 0) || !double.IsFinite(density))
            throw new ArgumentOutOfRangeException(nameof(density), density, "must be positive and finite");
        if (!(dynamicViscosity > 0) || !double.IsFinite(dynamicViscosity))
            throw new ArgumentOutOfRangeException(nameof(dynamicViscosity), dynamicViscosity, "must be positive and finite");
        (Density, DynamicViscosity) = (density, dynamicViscosity);
    }

    /// <summary>kg/m3.</summary>
    public double Density { get; }

    /// <summary>Pa s.</summary>
    public double DynamicViscosity { get; }
}
