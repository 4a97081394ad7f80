using System.Collections.Immutable;
using BladeLoads.Rotor.Loads;

namespace BladeLoads.Rotor.Operation;

/// <summary>A rotor case solved.</summary>
/// <param name="Points">One a wind speed, in the order of the case.</param>
/// <param name="RatedWindSpeed">
/// m/s: the lowest wind speed at which the rotor at fine pitch makes rated power; null where the case has none, or never reaches it.
/// </param>
/// <param name="Marks">What was found beside the points: a jump of pitch at rated, rated power never reached.</param>
/// <param name="RotorSolves">Operating points solved in all, those of searches included.</param>
public sealed record PowerCurve(ImmutableArray<CurvePoint> Points, double? RatedWindSpeed, PointMarks Marks, int RotorSolves);

/// <summary>One row of a power curve.</summary>
/// <param name="Loads">Null where an element is unbalanced: no number stands for such a point.</param>
/// <param name="ElectricalPower">W, 0 where the rotor takes power; NaN where <paramref name="Loads"/> is null.</param>
/// <param name="Elements">Root to tip.</param>
public sealed record CurvePoint(
    OperatingPoint Operation, RotorLoads? Loads, double ElectricalPower, Region Region, PointMarks Marks,
    ImmutableArray<ElementState> Elements);
