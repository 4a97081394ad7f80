using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies;
using BladeLoads.Studies.Tables;
using static BladeLoads.Studies.Tables.RecordText;

namespace BladeLoads.Commands.Polar;

/// <summary>A polar table with factors on it, on the old angles and with the old moments.</summary>
internal static class ScaledTable
{
    /// <summary>Refused where a factor has nothing to hold on to.</summary>
    /// <param name="file">As findings name it.</param>
    /// <param name="leastLiftIsAsked">The least lift is to be scaled by a factor of its own, so it must be in the table.</param>
    public static TableChange Of(StoredPolars table, string file, PolarFactors factors, bool leastLiftIsAsked)
    {
        var polars = ImmutableArray.CreateBuilder<PolarRows>();
        var record = ImmutableArray.CreateBuilder<string>();
        var (withoutLargest, withoutLeast) = (new List<PolarRows>(), new List<PolarRows>());
        foreach (var (rows, polar) in table.Polars.Zip(table.Section.Polars))
            switch (PolarScaling.Of(polar, factors))
            {
                case PolarScaling.Scaled { Range.HasLeastLift: false } when leastLiftIsAsked:
                    withoutLeast.Add(rows);
                    break;
                case PolarScaling.Scaled scaled:
                    polars.Add(Exchanged(rows, scaled.Polar));
                    record.Add(At(rows.Reynolds) + Told(rows, polars[^1], scaled));
                    break;
                case PolarScaling.WithoutLargestLift when PolarFigures.Of(polar).IsBluff:
                    polars.Add(rows);
                    record.Add($"{At(rows.Reynolds)}all rows as they were, a bluff section without a largest lift up to 30 deg");
                    break;
                case PolarScaling.WithoutLargestLift:
                    withoutLargest.Add(rows);
                    break;
                default:
                    polars.Add(rows);
                    record.Add($"{At(rows.Reynolds)}all rows as they were, no lift to scale");
                    break;
            }
        var errors = ImmutableArray.CreateBuilder<InputFinding>();
        if (withoutLargest.Count > 0)
            errors.Add(new InputFinding(file, 0, 0, $"lift rises up to the end of the table or to 30 deg{Where(withoutLargest, table)}, so "
                + "that there is no largest lift to scale; extend the table, choose others with --only, or give --largest-lift the factor of "
                + "--lift-slope"));
        if (withoutLeast.Count > 0)
            errors.Add(new InputFinding(file, 0, 0, $"lift falls down to the beginning of the table or to -30 deg{Where(withoutLeast, table)}, "
                + "so that there is no least lift to scale; extend the table, choose others with --only, or leave --least-lift out"));
        return errors.Count > 0
            ? new TableChange.Refused(errors.ToImmutable())
            : new TableChange.Changed(polars.ToImmutable(), "scaled", [Told(factors)], record.ToImmutable());
    }

    private static string Told(PolarFactors factors) => string.Create(
        CultureInfo.InvariantCulture,
        $"factors: lift slope {factors.LiftSlope}, largest lift {factors.LargestLift}, least lift {factors.LeastLift}, drag floor {factors.DragFloor}; "
        + $"common practice, no measurement; moments as they were");

    private static PolarRows Exchanged(PolarRows rows, Rotor.Sections.Polar polar)
        => rows with { Rows = [.. rows.Rows.Select((row, i) => row.With(polar.Lift[i], polar.Drag[i]))] };

    private static string Told(PolarRows old, PolarRows now, PolarScaling.Scaled scaled)
    {
        var (first, last, drag) = (scaled.Range.First, scaled.Range.Last, scaled.LeastDrag);
        var largest = scaled.Range.HasLargestLift
            ? $"largest lift {Brief(old.Rows[last].Lift)} -> {Brief(now.Rows[last].Lift)} at {Brief(old.Rows[last].AngleDeg)} deg"
            : "no largest lift found";
        var least = scaled.Range.HasLeastLift
            ? $"least lift {Brief(old.Rows[first].Lift)} -> {Brief(now.Rows[first].Lift)} at {Brief(old.Rows[first].AngleDeg)} deg"
            : "no least lift found, the slope alone below 0";
        return $"{largest}; {least}; least drag {Brief(old.Rows[drag].Drag)} -> {Brief(now.Rows[drag].Drag)} "
            + $"at {Brief(old.Rows[drag].AngleDeg)} deg; as it was up to {Degrees(scaled.UnchangedBelow)} and from {Degrees(scaled.UnchangedAbove)} deg on";
    }
}
