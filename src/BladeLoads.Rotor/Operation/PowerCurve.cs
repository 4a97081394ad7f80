using System.Collections.Immutable;
using BladeLoads.Rotor.Loads;

namespace BladeLoads.Rotor.Operation;

/// <summary>A rotor case solved.</summary>
/// <param name="Points">One a wind speed, in the order of the case.</param>
/// <param name="RatedWindSpeed">
/// m/s: the lowest wind speed at which the rotor makes rated power before it pitches, and under a thrust limit the one from which it holds
/// rated power; null where the case has none, or never reaches it.
/// </param>
/// <param name="Best">The tip-speed ratio and fine pitch of a variable-speed machine; null for the others.</param>
/// <param name="DesignPoints">In the order of their wind speeds.</param>
/// <param name="Marks">
/// What was found of the curve as a whole: a jump of pitch at rated; rated power never reached, which the row with the most electrical power
/// carries too.
/// </param>
/// <param name="RotorSolves">Operating points solved in all, those of searches included.</param>
public sealed record PowerCurve(
    ImmutableArray<CurvePoint> Points, double? RatedWindSpeed, BestOperation? Best, ImmutableArray<DesignPoint> DesignPoints,
    PointMarks Marks, int RotorSolves);

/// <summary>One row of a power curve.</summary>
/// <param name="Loads">Null where an element is unbalanced: no number stands for such a point.</param>
/// <param name="ElectricalPower">W, 0 where the rotor takes power; NaN where <paramref name="Loads"/> is null.</param>
/// <param name="Margins">Null where <paramref name="Loads"/> is.</param>
/// <param name="Elements">Root to tip.</param>
public sealed record CurvePoint(
    OperatingPoint Operation, RotorLoads? Loads, double ElectricalPower, Region Region, PointMarks Marks, PointMargins? Margins,
    ImmutableArray<ElementState> Elements);

/// <summary>What a control engineer and a blade designer ask of an operating point besides its loads.</summary>
/// <param name="PowerPerPitch">Slope of rotor power by pitch, W/rad; NaN where a point beside it has none.</param>
/// <param name="ThrustPerPitch">Slope of thrust by pitch, N/rad; likewise.</param>
/// <param name="StallMargin">
/// rad: the least distance, over the outer half of the radius, from an element's angle of attack up to its table's largest lift, negative beyond it; NaN where no section lifts.
/// </param>
/// <param name="StallRadius">m: where that is.</param>
/// <param name="TipMach">Undisturbed speed of the air past the tip over the speed of sound.</param>
public sealed record PointMargins(double PowerPerPitch, double ThrustPerPitch, double StallMargin, double StallRadius, double TipMach);

/// <summary>An operating point worth a name: where a region begins, where rated power or the largest thrust is.</summary>
/// <param name="Name">In words, as it is written.</param>
public sealed record DesignPoint(string Name, CurvePoint Point)
{
    public const string RatedWindSpeed = "rated wind speed";

    /// <summary>The largest thrust in operation; of a flat top its lowest wind speed, in every table that names it.</summary>
    public const string LargestThrust = "largest thrust";

    /// <summary>Share of a largest value within which others count as the same: power or thrust that is held varies by a root finder's last digits.</summary>
    public const double FlatWithin = 1e-9;
}
