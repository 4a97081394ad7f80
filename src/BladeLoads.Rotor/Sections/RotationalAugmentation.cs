namespace BladeLoads.Rotor.Sections;

/// <summary>How the coefficients of sections near the axis are augmented for rotation, which delays their stall.</summary>
public enum Augmentation { None, Snel1993, DuSelig1998 }

/// <summary>What of the way to attached flow a section goes for rotation; each 0 to 1.</summary>
/// <param name="Lift">fL: <c>cl + fL (potential lift - cl)</c>.</param>
/// <param name="Drag">fD: <c>cd - fD (cd - drag at zero lift)</c>.</param>
public readonly record struct AugmentationFactors(double Lift, double Drag)
{
    public static AugmentationFactors None => default;

    /// <summary>As far as anything goes: lift all the potential lift, drag all that at zero lift.</summary>
    public static AugmentationFactors Full => new(1, 1);

    public bool IsNone => Lift == 0 && Drag == 0;
}

/// <summary>
/// On a rotating blade, flow that has separated near the axis is thrown outwards, and stall is delayed: two-dimensional tables give too
/// little lift there. Both methods take the lift a share of the way to the potential lift, and du-selig-1998 the drag a share of the way
/// back to that at zero lift.
/// </summary>
/// <remarks>
/// Sources: keys snel1993, du-selig1998 in docs/sources.md. That it is full to 30 degrees, fades to none at 50, and none beyond 0.8 of the
/// radius: common practice, no source. None below the zero-lift angle: ours, see docs/theory.md.
/// </remarks>
public static class RotationalAugmentation
{
    /// <summary>Radius over tip radius beyond which nothing is augmented.</summary>
    public const double LargestRadiusRatio = 0.8;

    private const double FullTo = 30 * Math.PI / 180;
    private const double NoneFrom = 50 * Math.PI / 180;

    /// <summary>
    /// Factors of an element at an operating point, clipped to 0 to 1. None at all beyond 0.8 of the radius, and none at rest.
    /// </summary>
    /// <param name="chordRatio">Chord over radius, c/r, above 0.</param>
    /// <param name="radiusRatio">Radius over tip radius, r/R, above 0 to 1.</param>
    /// <param name="tipSpeedShare">See <see cref="TipSpeedShare"/>; 0 (rest) to 1. snel-1993 asks only whether the rotor turns.</param>
    public static AugmentationFactors Factors(Augmentation method, double chordRatio, double radiusRatio, double tipSpeedShare)
    {
        if (method == Augmentation.None || radiusRatio > LargestRadiusRatio || !(tipSpeedShare > 0))
            return AugmentationFactors.None;
        if (method == Augmentation.Snel1993)
            return new AugmentationFactors(Math.Clamp(Snel(chordRatio), 0, 1), 0);
        var exponent = 1 / (tipSpeedShare * radiusRatio);
        return new AugmentationFactors(
            Math.Clamp(DuSelig(chordRatio, exponent), 0, 1), Math.Clamp(DuSelig(chordRatio, exponent / 2), 0, 1));
    }

    /// <summary>Lambda, the tip speed over the relative speed at the tip: <c>W R / sqrt(V^2 + (W R)^2)</c>, 0 to 1.</summary>
    /// <param name="windSpeed">m/s, above 0.</param>
    /// <param name="tipSpeed">m/s, 0 or more.</param>
    public static double TipSpeedShare(double windSpeed, double tipSpeed)
        => tipSpeed / Math.Sqrt((windSpeed * windSpeed) + (tipSpeed * tipSpeed));

    /// <summary>
    /// The polar with its rows augmented: lift, and drag, by their factor times <see cref="Share"/>. Rows stay where they are; where they end
    /// before 50 degrees it has more, so that the augmentation of the end value fades there too. A section that does not lift stays as it is.
    /// With <see cref="AugmentationFactors.Full"/> it is what the plain polar is blended with by the factors of an element.
    /// </summary>
    public static Polar Augment(Polar polar, AugmentationFactors factors)
        => factors.IsNone || PotentialLift.Of(polar) is not { } potential ? polar : AugmentAt(WithFadingEnd(polar), polar, factors, potential);

    /// <summary>
    /// How much of the augmentation an angle of attack gets: all from zero lift to 30 degrees, fading in a straight line to none at 50; none
    /// below zero lift.
    /// </summary>
    /// <param name="angle">rad, within +-pi.</param>
    /// <param name="zeroLiftAngle">rad</param>
    public static double Share(double angle, double zeroLiftAngle)
        => angle < zeroLiftAngle ? 0 : Math.Clamp((NoneFrom - angle) / (NoneFrom - FullTo), 0, 1);

    private static double[] WithFadingEnd(Polar polar)
    {
        const double Step = 2.5 * Math.PI / 180;
        const double Least = 0.5 * Math.PI / 180;
        var angles = polar.Angles.ToList();
        for (var i = 1; i <= 20; i++)
            if (i * Step > polar.Angles[^1] + Least)
                angles.Add(i * Step);
        return [.. angles];
    }

    /// <summary><c>3 (c/r)^2</c></summary>
    internal static double Snel(double chordRatio) => 3 * chordRatio * chordRatio;

    /// <summary>
    /// <c>(1.6 (c/r)/0.1267 x (a - x)/(b + x) - 1)/(2 pi)</c> with <c>x = (c/r)^exponent</c>, a = b = 1. The exponent of lift is
    /// <c>d R/(Lambda r)</c>, d = 1, that of drag half of it.
    /// </summary>
    internal static double DuSelig(double chordRatio, double exponent)
    {
        var x = Math.Pow(chordRatio, exponent);
        // A chord of several radii: the power may be infinite, and the ratio is then -1.
        var ratio = double.IsFinite(x) ? (1 - x) / (1 + x) : -1;
        return ((1.6 * chordRatio / 0.1267 * ratio) - 1) / (2 * Math.PI);
    }

    // Angles of the polar's rows, and perhaps some beyond its last, where its end value holds.
    private static Polar AugmentAt(double[] angles, Polar polar, AugmentationFactors factors, PotentialLift potential)
    {
        var zeroLiftDrag = PotentialLift.DragAt(polar, potential.ZeroLiftAngle);
        var (lift, drag) = (new double[angles.Length], new double[angles.Length]);
        for (var i = 0; i < angles.Length; i++)
        {
            var row = Math.Min(i, polar.Angles.Length - 1);
            var share = Share(angles[i], potential.ZeroLiftAngle);
            lift[i] = polar.Lift[row] + (share * factors.Lift * (potential.At(angles[i]) - polar.Lift[row]));
            drag[i] = Math.Max(0, polar.Drag[row] - (share * factors.Drag * (polar.Drag[row] - zeroLiftDrag)));
        }
        return Polar.FromRows(polar.Reynolds, angles, lift, drag);
    }
}
