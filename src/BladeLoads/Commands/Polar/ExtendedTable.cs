using System.Collections.Immutable;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies;
using BladeLoads.Studies.Tables;
using static BladeLoads.Studies.Tables.RecordText;

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
            return new TableChange.Copied($"{ExtensionText.CompleteAlready}, copied");
        return new TableChange.Changed(
            [.. table.Polars.Zip(polars, extended).Select(t => CarriedOn(t.First, t.Second, t.Third))],
            "extended", How(table, asked),
            [.. table.Polars.Zip(extended, (rows, e) => At(rows.Reynolds) + ExtensionText.Of(e))])
        {
            Doubts = [.. table.Augmented is var (line, _) ? [new InputFinding(file, line, 0, ExtensionDoubts.AugmentedBefore)] : (InputFinding[])[],
                .. extended.SelectMany((e, i) => ExtensionDoubts.Of(polars[i], e).Select(text => new InputFinding(file, table.RowLines[i][0], 0, text)))],
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

    private static ImmutableArray<string> How(StoredPolars table, ExtensionAsked asked)
    {
        var method = ExtensionText.Method(asked.AspectRatio, asked.Origin, asked.Join);
        var hasMoments = table.Polars.Any(rows => rows.Rows.Any(row => !double.IsNaN(row.Moment)));
        return hasMoments ? [method, "moments left out: the method has none"] : [method];
    }
}
