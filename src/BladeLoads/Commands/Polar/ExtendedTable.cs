using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Rotor.Sections;
using BladeLoads.Screen;
using BladeLoads.Studies;
using BladeLoads.Studies.Cases;
using BladeLoads.Studies.Tables;
using static BladeLoads.Commands.Polar.RecordText;

namespace BladeLoads.Commands.Polar;

/// <summary>How tables are carried on to +-180 degrees.</summary>
/// <param name="Origin">Of the aspect ratio: <c> of blade.csv</c>; empty where it was given.</param>
internal sealed record ExtensionAsked(double AspectRatio, string Origin, ExtensionJoin Join);

/// <summary>A polar table from -180 to 180 degrees. Rows that are kept keep all their digits.</summary>
internal static class ExtendedTable
{
    /// <summary>Refused where there is nothing to extend from.</summary>
    /// <param name="file">As findings name it.</param>
    public static TableChange Of(StoredPolars table, string file, ExtensionAsked asked)
    {
        var polars = table.Section.Polars;
        var wrong = Enumerable.Range(0, polars.Length).Where(i => !PolarExtension.CanExtend(polars[i]))
            .Select(i => new InputFinding(file, table.RowLines[i][0], 0,
                "the rows from here on have no angle between 0 and 90 deg to extend from; add rows up to stall")).ToImmutableArray();
        if (!wrong.IsEmpty)
            return new TableChange.Refused(wrong);
        var extended = polars.Select(polar => PolarExtension.Extend(polar, asked.AspectRatio, asked.Join)).ToList();
        if (extended.TrueForAll(IsComplete))
            return new TableChange.Copied("reaches from -180 to 180 deg already, copied");
        return new TableChange.Changed(
            [.. table.Polars.Zip(polars, extended).Select(t => CarriedOn(t.First, t.Second, t.Third))],
            "extended", How(table, extended[0].LargestDrag, asked),
            [.. table.Polars.Zip(extended, (rows, e) => At(rows) + Told(e))])
        {
            Doubts = [.. table.Augmented is var (line, _) ? [new InputFinding(file, line, 0, ExtensionDoubt.AugmentedBefore)] : (InputFinding[])[],
                .. extended.Select((e, i) => (Text: ExtensionDoubt.Of(e), Line: table.RowLines[i][0]))
                .Where(doubt => doubt.Text is not null).Select(doubt => new InputFinding(file, doubt.Line, 0, doubt.Text!))],
        };
    }

    private static bool IsComplete(ExtendedPolar extended)
        => extended is { Above.Kind: ExtensionKind.Complete, Below.Kind: ExtensionKind.Complete };

    private static PolarRows CarriedOn(PolarRows rows, Rotor.Sections.Polar polar, ExtendedPolar extended) => rows with
    {
        Rows = [.. extended.Polar.Angles.Select((angle, i) =>
            angle >= extended.Below.JoinAngle && angle <= extended.Above.JoinAngle
                ? rows.Rows[polar.Angles.BinarySearch(angle)] with { Moment = double.NaN }
                : new PolarRow(
                    TwelveDigits.Of(double.RadiansToDegrees(angle)), TwelveDigits.Of(extended.Polar.Lift[i]), TwelveDigits.Of(extended.Polar.Drag[i]),
                    double.NaN))],
    };

    private static ImmutableArray<string> How(StoredPolars table, double largestDrag, ExtensionAsked asked)
    {
        var method =
            $"{SectionMethod.Viterna}: aspect ratio {Short(asked.AspectRatio)}{asked.Origin}, drag {Short(largestDrag)} at 90 deg, "
            + $"joined at {(asked.Join == ExtensionJoin.Stall ? "stall" : "the end of the table")}";
        var hasMoments = table.Polars.Any(rows => rows.Rows.Any(row => !double.IsNaN(row.Moment)));
        return hasMoments ? [method, "moments left out: the method has none"] : [method];
    }

    private static string Told(ExtendedPolar extended)
        => $"above 0 {Told(extended.Above)}; below 0 {Told(extended.Below)}"
            + (extended.RaisedToFloor == 0
                ? ""
                : $"; drag of {Count.Of(extended.RaisedToFloor, "added row")} raised to that of a plate along the wind");

    private static string Told(ExtendedSide side)
    {
        var at = $"{Degrees(side.JoinAngle)} deg";
        return side.Kind switch
        {
            ExtensionKind.Complete => "complete as it was",
            ExtensionKind.CarriedOn => $"end value carried on from {at}",
            ExtensionKind.Mirrored => $"from {at} to the mirrored stall point{Breaks(side)}",
            ExtensionKind.FromStall => $"from stall at {at}, {Count.Of(side.RowsLeftOut, "row")} beyond left out{Breaks(side)}",
            _ => $"from the end at {at}{Breaks(side)}",
        };
    }

    private static string Breaks(ExtendedSide side) => double.IsNaN(side.LiftSlopeBreak)
        ? ""
        : $", slope of lift breaks by {PerDegree(side.LiftSlopeBreak)} a degree, of drag by {PerDegree(side.DragSlopeBreak)}";

    private static string PerDegree(double slope) => double.DegreesToRadians(slope).ToString("+0.####;-0.####;0", CultureInfo.InvariantCulture);
}
