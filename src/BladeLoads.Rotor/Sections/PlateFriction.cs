namespace BladeLoads.Rotor.Sections;

/// <summary>
/// Drag coefficient of a thin plate along the wind, both sides: friction alone. No section has less than the laminar one; one whose
/// boundary layers are turbulent all along has no less than the turbulent one.
/// </summary>
public static class PlateFriction
{
    /// <summary><c>2 x 1.328 / sqrt(Re)</c>; 0 where the Reynolds number is not known.</summary>
    /// <param name="reynolds">On the length of the plate, above 0, or NaN.</param>
    /// <remarks>Source: key blasius1908 in docs/sources.md.</remarks>
    public static double Laminar(double reynolds) => double.IsNaN(reynolds) ? 0 : 2 * 1.328 / Math.Sqrt(reynolds);

    /// <summary><c>2 x 0.455 / (log10 Re)^2.58</c>; 0 where the Reynolds number is not known.</summary>
    /// <param name="reynolds">On the length of the plate, above 1, or NaN; the law is meant for 1e5 to 1e9.</param>
    /// <remarks>Source: key prandtl-schlichting in docs/sources.md.</remarks>
    public static double Turbulent(double reynolds) => double.IsNaN(reynolds) ? 0 : 2 * 0.455 / Math.Pow(Math.Log10(reynolds), 2.58);
}
