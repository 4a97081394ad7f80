using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Commands.Polar;

/// <summary>A polar table with factors on it.</summary>
/// <param name="Polars">The new rows, on the old angles and with the old moments.</param>
/// <param name="Record">What was done at each Reynolds number, a line each.</param>
internal sealed record ScaledTable(ImmutableArray<PolarRows> Polars, ImmutableArray<string> Record)
{
    /// <summary>Null, with what is wrong, where a factor has nothing to hold on to.</summary>
    /// <param name="file">As findings name it.</param>
    /// <param name="leastLiftIsAsked">The least lift is to be scaled by a factor of its own, so it must be in the table.</param>
    public static ScaledTable? Of(StoredPolars table, string file, PolarFactors factors, bool leastLiftIsAsked, List<InputFinding> errors)
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
                    record.Add(At(rows) + Told(rows, polars[^1], scaled));
                    break;
                case PolarScaling.WithoutLargestLift:
                    withoutLargest.Add(rows);
                    break;
                default:
                    polars.Add(rows);
                    record.Add($"{At(rows)}all rows as they were, no lift to scale");
                    break;
            }
        if (withoutLargest.Count > 0)
            errors.Add(new InputFinding(file, 0, 0, $"lift rises up to the end of the table or to 30 deg{Where(withoutLargest, table)}, so that there "
                + "is no largest lift to scale; extend the table, choose others with --only, or give --largest-lift the factor of --lift-slope"));
        if (withoutLeast.Count > 0)
            errors.Add(new InputFinding(file, 0, 0, $"lift falls down to the beginning of the table or to -30 deg{Where(withoutLeast, table)}, so that "
                + "there is no least lift to scale; extend the table, choose others with --only, or leave --least-lift out"));
        return withoutLargest.Count + withoutLeast.Count > 0 ? null : new ScaledTable(polars.ToImmutable(), record.ToImmutable());
    }

    // A value that did not move keeps all its digits.
    private static PolarRows Exchanged(PolarRows rows, Rotor.Sections.Polar polar) => rows with
    {
        Rows = [.. rows.Rows.Select((row, i) => row with
        {
            Lift = row.Lift == polar.Lift[i] ? row.Lift : TwelveDigits.Of(polar.Lift[i]),
            Drag = row.Drag == polar.Drag[i] ? row.Drag : TwelveDigits.Of(polar.Drag[i]),
        })],
    };

    private static string Told(PolarRows old, PolarRows now, PolarScaling.Scaled scaled)
    {
        var (first, last, drag) = (scaled.Range.First, scaled.Range.Last, scaled.LeastDrag);
        var largest = scaled.Range.HasLargestLift
            ? $"largest lift {Short(old.Rows[last].Lift)} -> {Short(now.Rows[last].Lift)} at {Short(old.Rows[last].AngleDeg)} deg"
            : "no largest lift found";
        var least = scaled.Range.HasLeastLift
            ? $"least lift {Short(old.Rows[first].Lift)} -> {Short(now.Rows[first].Lift)} at {Short(old.Rows[first].AngleDeg)} deg"
            : "no least lift found, the slope alone below 0";
        return $"{largest}; {least}; least drag {Short(old.Rows[drag].Drag)} -> {Short(now.Rows[drag].Drag)} "
            + $"at {Short(old.Rows[drag].AngleDeg)} deg; as it was up to {Degrees(scaled.UnchangedBelow)} and from {Degrees(scaled.UnchangedAbove)} deg on";
    }

    private static string At(PolarRows rows) => double.IsNaN(rows.Reynolds) ? "" : $"at Reynolds number {Reynolds(rows)}: ";

    private static string Where(List<PolarRows> some, StoredPolars table) => some.Count == table.Polars.Length
        ? ""
        : $" at Reynolds number{(some.Count == 1 ? "" : "s")} {string.Join(", ", some.Select(Reynolds))}";

    private static string Reynolds(PolarRows rows) => rows.Reynolds.ToString("0.######e0", CultureInfo.InvariantCulture);

    private static string Degrees(double angle) => Short(double.RadiansToDegrees(angle));

    private static string Short(double value) => value.ToString("G6", CultureInfo.InvariantCulture);
}
