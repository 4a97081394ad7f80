using BladeLoads.Rotor.Sections;
using static BladeLoads.Studies.Tables.RecordText;

namespace BladeLoads.Studies.Tables;

/// <summary>What is doubtful about an extension, wherever it is made. Limits: common practice, no source.</summary>
public static class ExtensionDoubts
{
    /// <summary>The table says that it is augmented.</summary>
    public const string AugmentedBefore = "the table is augmented for rotation already; extend it as it was before, and augment then";

    // Beyond, the lift of a plate across the wind may be more than that of any stall.
    private const double FarthestStall = 25 * Math.PI / 180;

    private const double Jump = 0.2;

    /// <param name="polar">As it was before.</param>
    public static IEnumerable<string> Of(Polar polar, ExtendedPolar extended)
        => new[] { Guess(polar, extended.Above), Dip(polar, extended.Above, 1), Dip(polar, extended.Below, -1), Step(extended, 1), Step(extended, -1) }
            .OfType<string>();

    private static string? Guess(Polar polar, ExtendedSide above) => above is not { Kind: ExtensionKind.FromEnd, ShowsStall: false } ? null
        : polar.Lift[^1] <= 0
            ? $"lift is {Brief(polar.Lift[^1])} at the last angle, {Degrees(above.JoinAngle)} deg; extended from there, the section hardly lifts at all: "
                + "is the sign of lift or angle turned?"
            : $"shows no stall up to the last angle, {Degrees(above.JoinAngle)} deg; extended from there, the section stalls at that angle";

    private static string? Dip(Polar polar, ExtendedSide side, int sign)
    {
        if (side.Kind != ExtensionKind.FromStall)
            return null;
        var join = polar.Angles.IndexOf(side.JoinAngle);
        var beyond = Enumerable.Range(0, polar.Angles.Length)
            .Where(i => sign * (polar.Angles[i] - side.JoinAngle) > 0 && Math.Abs(polar.Angles[i]) <= FarthestStall).ToList();
        if (beyond.Count == 0)
            return null;
        var highest = beyond.MaxBy(i => sign * polar.Lift[i]);
        return sign * polar.Lift[highest] <= sign * polar.Lift[join] ? null : $"joined at stall, {Degrees(side.JoinAngle)} deg with lift {Brief(polar.Lift[join])}, but of the rows that are left out one lifts more: "
            + $"{Brief(polar.Lift[highest])} at {Degrees(polar.Angles[highest])} deg; if what is between is a dip and no stall, join at the end, or mend the rows";
    }

    private static string? Step(ExtendedPolar extended, int sign)
    {
        var side = sign > 0 ? extended.Above : extended.Below;
        if (side.Kind is ExtensionKind.Complete or ExtensionKind.CarriedOn)
            return null;
        var polar = extended.Polar;
        var join = polar.Angles.IndexOf(side.JoinAngle);
        var (lift, drag) = (polar.Lift[join + sign] - polar.Lift[join], polar.Drag[join + sign] - polar.Drag[join]);
        return Math.Abs(lift) <= Jump && Math.Abs(drag) <= Jump ? null
            : $"from the last row that is kept, {Degrees(side.JoinAngle)} deg, to the next, {Degrees(polar.Angles[join + sign])} deg, lift goes by {Brief(lift)} "
                + $"and drag by {Brief(drag)}: the table and the relation do not meet";
    }
}
