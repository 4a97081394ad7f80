using System.Collections.Immutable;
using System.Text.Json.Serialization;
using BladeLoads.Results.Wording;
using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Operation;

namespace BladeLoads.Results.Receipts;

/// <summary>A figure of a curve and the wind speed (m/s) at which it was found.</summary>
public sealed record Extreme(double Value, [property: JsonPropertyName("wind_speed_m_s")] double WindSpeed);

/// <summary>
/// The figures of a power curve that are compared between cases; SI units. A figure is null where no point of the curve has one.
/// Moments are the largest by magnitude, with their sign.
/// </summary>
/// <param name="BestTipSpeedRatio">The tip-speed ratio at the best power coefficient.</param>
/// <param name="Marks">How many points carry each mark, by its word; 0 for a mark of the curve alone.</param>
public sealed record CaseSummary(
    Extreme? BestPowerCoefficient,
    double? BestTipSpeedRatio,
    [property: JsonPropertyName("largest_electrical_power_W")] Extreme? LargestElectricalPower,
    [property: JsonPropertyName("largest_thrust_N")] Extreme? LargestThrust,
    [property: JsonPropertyName("rated_wind_speed_m_s")] double? RatedWindSpeed,
    [property: JsonPropertyName("largest_aero_root_out_of_plane_moment_Nm")] Extreme? LargestOutOfPlaneMoment,
    [property: JsonPropertyName("largest_aero_root_in_plane_moment_Nm")] Extreme? LargestInPlaneMoment,
    [property: JsonPropertyName("largest_aero_root_flapwise_moment_Nm")] Extreme? LargestFlapwiseMoment,
    [property: JsonPropertyName("largest_aero_root_edgewise_moment_Nm")] Extreme? LargestEdgewiseMoment,
    int Points,
    int UnbalancedPoints,
    IReadOnlyDictionary<string, int> Marks)
{
    // Power held at rated is the same at many wind speeds but for the last digits of a root finder.
    private const double SameWithin = 1e-9;

    /// <summary>Where several points share the largest value, to 1e-9 of it, the first of them is taken.</summary>
    public static CaseSummary Of(PowerCurve curve)
    {
        var best = Largest(curve, (loads, _) => loads.PowerCoefficient, value => value);
        return new CaseSummary(
            best,
            best is null ? null : curve.Points.First(p => p.Operation.WindSpeed == best.WindSpeed).Loads?.TipSpeedRatio,
            Largest(curve, (_, electricalPower) => electricalPower, value => value),
            Largest(curve, (loads, _) => loads.Thrust, value => value),
            curve.RatedWindSpeed,
            Largest(curve, (loads, _) => loads.RootOutOfPlaneMoment, Math.Abs),
            Largest(curve, (loads, _) => loads.RootInPlaneMoment, Math.Abs),
            Largest(curve, (loads, _) => loads.RootFlapwiseMoment, Math.Abs),
            Largest(curve, (loads, _) => loads.RootEdgewiseMoment, Math.Abs),
            curve.Points.Length,
            curve.Points.Count(p => p.Loads is null),
            CountMarks(curve));
    }

    /// <summary>The marks as words in the order of a status cell, with the number of points each: <c>several-balances:3</c>.</summary>
    [JsonIgnore]
    public string MarksText => string.Join(' ', StatusWords.PointWords
        .Where(m => Marks.ContainsKey(m.Word))
        .Select(m => Marks[m.Word] == 0 ? m.Word : FormattableString.Invariant($"{m.Word}:{Marks[m.Word]}")));

    private static Extreme? Largest(PowerCurve curve, Func<RotorLoads, double, double> figure, Func<double, double> size)
    {
        var found = curve.Points
            .Where(point => point.Loads is not null)
            .Select(point => new Extreme(figure(point.Loads!, point.ElectricalPower), point.Operation.WindSpeed))
            .Where(extreme => double.IsFinite(extreme.Value))
            .ToList();
        if (found.Count == 0)
            return null;
        var largest = found.Max(extreme => size(extreme.Value));
        return found.First(extreme => size(extreme.Value) >= largest - SameWithin * Math.Abs(largest));
    }

    private static ImmutableSortedDictionary<string, int> CountMarks(PowerCurve curve)
    {
        var counts = ImmutableSortedDictionary.CreateBuilder<string, int>(StringComparer.Ordinal);
        foreach (var (mark, word) in StatusWords.PointWords)
        {
            var points = curve.Points.Count(p => p.Marks.HasFlag(mark));
            if (points > 0 || curve.Marks.HasFlag(mark))
                counts[word] = points;
        }
        return counts.ToImmutable();
    }
}
