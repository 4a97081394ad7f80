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
/// Moments are the largest by magnitude, with their sign. Largest figures are taken over the rows and the design points in operation:
/// a rotor that stands still outside its wind speeds of operation counts for none.
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
    /// <summary>Null for a machine that is not of variable speed.</summary>
    public BestPoint? Best { get; init; }

    /// <summary>Null for a case without a site.</summary>
    public EnergySummary? Energy { get; init; }

    /// <summary>
    /// Where several points share the largest value, to <see cref="DesignPoint.FlatWithin"/> of it, the first of them is taken. The largest
    /// thrust is that of the design point.
    /// </summary>
    public static CaseSummary Of(PowerCurve curve)
    {
        CurvePoint[] points = [.. curve.Points.Concat(curve.DesignPoints.Select(d => d.Point)).Where(InOperation)
            .OrderBy(p => p.Operation.WindSpeed)];
        var best = Largest(points, (loads, _) => loads.PowerCoefficient, value => value);
        return new CaseSummary(
            best,
            best is null ? null : points.First(p => p.Operation.WindSpeed == best.WindSpeed).Loads?.TipSpeedRatio,
            Largest(points, (_, electricalPower) => electricalPower, value => value),
            ThrustOfDesignPoint(curve) ?? Largest(points, (loads, _) => loads.Thrust, value => value),
            curve.RatedWindSpeed,
            Largest(points, (loads, _) => loads.RootOutOfPlaneMoment, Math.Abs),
            Largest(points, (loads, _) => loads.RootInPlaneMoment, Math.Abs),
            Largest(points, (loads, _) => loads.RootFlapwiseMoment, Math.Abs),
            Largest(points, (loads, _) => loads.RootEdgewiseMoment, Math.Abs),
            curve.Points.Length,
            curve.Points.Count(p => p.Loads is null),
            CountMarks(curve))
        {
            Best = curve.Best is { } found
                ? new BestPoint(
                    found.TipSpeedRatio, found.Pitch, double.IsFinite(found.PowerCoefficient) ? found.PowerCoefficient : null, found.IsSearched)
                : null,
        };
    }

    /// <summary>The marks as words in the order of a status cell, with the number of points each: <c>several-balances:3</c>.</summary>
    [JsonIgnore]
    public string MarksText => string.Join(' ', StatusWords.PointWords
        .Where(m => Marks.ContainsKey(m.Word))
        .Select(m => Marks[m.Word] == 0 ? m.Word : FormattableString.Invariant($"{m.Word}:{Marks[m.Word]}")));

    private static bool InOperation(CurvePoint point) => (point.Marks & (PointMarks.BelowCutIn | PointMarks.AboveCutOut)) == 0;

    // Taken over, not sought again: design-points.csv and summary.csv name one place.
    private static Extreme? ThrustOfDesignPoint(PowerCurve curve)
        => curve.DesignPoints.FirstOrDefault(d => d.Name == DesignPoint.LargestThrust)?.Point is { Loads: { } loads, Operation: var there }
            ? new Extreme(loads.Thrust, there.WindSpeed) : null;

    private static Extreme? Largest(CurvePoint[] points, Func<RotorLoads, double, double> figure, Func<double, double> size)
    {
        var found = points
            .Where(point => point.Loads is not null)
            .Select(point => new Extreme(figure(point.Loads!, point.ElectricalPower), point.Operation.WindSpeed))
            .Where(extreme => double.IsFinite(extreme.Value))
            .ToList();
        if (found.Count == 0)
            return null;
        var largest = found.Max(extreme => size(extreme.Value));
        return found.First(extreme => size(extreme.Value) >= largest - (DesignPoint.FlatWithin * Math.Abs(largest)));
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
