namespace BladeLoads.Rotor.Sections;

/// <summary>
/// Lift and drag of a stalled section from an angle where both are known to 90 degrees:
/// <c>cl = A1 sin 2a + A2 cos2 a / sin a</c>, <c>cd = B1 sin2 a + B2 cos a</c>. At the known angle it gives the known values, at 90 degrees no
/// lift and the drag <c>B1</c> of a plate of the blade's aspect ratio.
/// </summary>
/// <param name="A1"><c>B1 / 2</c></param>
/// <param name="A2"><c>(cls - B1 sin as cos as) sin as / cos2 as</c></param>
/// <param name="B1">Drag coefficient at 90 degrees.</param>
/// <param name="B2"><c>(cds - B1 sin2 as) / cos as</c></param>
/// <remarks>Source: key viterna-corrigan1982 in docs/sources.md.</remarks>
public readonly record struct DeepStall(double A1, double A2, double B1, double B2)
{
    private const double MostAspectRatio = 50;

    /// <summary>Drag coefficient at 90 degrees of a blade: <c>1.11 + 0.018 AR</c>, with AR at most 50.</summary>
    /// <param name="aspectRatio">Length over mean chord, above 0; may be infinite.</param>
    /// <exception cref="ArgumentOutOfRangeException">It is not above 0.</exception>
    public static double LargestDrag(double aspectRatio)
    {
        if (!(aspectRatio > 0))
            throw new ArgumentOutOfRangeException(nameof(aspectRatio), aspectRatio, "an aspect ratio is above 0");
        return 1.11 + (0.018 * Math.Min(aspectRatio, MostAspectRatio));
    }

    /// <summary>The curves through one known point.</summary>
    /// <param name="angle">rad, between 0 and pi/2, neither included.</param>
    /// <param name="largestDrag">See <see cref="LargestDrag"/>.</param>
    /// <exception cref="ArgumentOutOfRangeException">The angle is outside its range.</exception>
    public static DeepStall Through(double angle, double lift, double drag, double largestDrag)
    {
        if (!(angle > 0 && angle < Math.PI / 2))
            throw new ArgumentOutOfRangeException(nameof(angle), angle, "deep stall is joined between 0 and 90 degrees");
        var (sin, cos) = Math.SinCos(angle);
        return new DeepStall(
            largestDrag / 2, (lift - (largestDrag * sin * cos)) * sin / (cos * cos), largestDrag, (drag - (largestDrag * sin * sin)) / cos);
    }

    /// <param name="angle">rad, from the known angle to pi/2.</param>
    public Coefficients At(double angle)
    {
        var (sin, cos) = Math.SinCos(angle);
        return new Coefficients((2 * A1 * sin * cos) + (A2 * cos * cos / sin), (B1 * sin * sin) + (B2 * cos));
    }
}
