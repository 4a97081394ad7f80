using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Results.Pictures;
using BladeLoads.Results.Publishing;
using BladeLoads.Studies.PolarCheck;

namespace BladeLoads.Results.PolarCheck;

/// <summary>The page of a checked table: its rows in doubt ringed, the angles at which blades work shaded, and what is doubted in words.</summary>
public static class CheckedPicture
{
    private const int DoubtsTold = 4;
    private const string Ending = ".svg";

    /// <summary>The SVG files of all tables: <c>SET~SECTION.svg</c>, or <c>SECTION.svg</c> where all are of one set.</summary>
    /// <param name="use">By the file of the table.</param>
    public static ImmutableArray<ResultContent> Files(CheckedTables tables, IReadOnlyDictionary<string, TableUse> use, TableNames names)
        => [.. tables.Tables.Select(table => new ResultContent(
            FileNameOf(table.File, names),
            PictureFile.Svg(Of(table, use.GetValueOrDefault(table.File), names.SetOf(table.File)))))];

    /// <param name="file">Of the table.</param>
    public static string FileNameOf(string file, TableNames names) => PictureName.Of(names.FileNameOf(file)) + Ending;

    /// <param name="use">Null for a table that nothing uses.</param>
    /// <param name="set">The name of the set of the table.</param>
    public static PolarPicture Of(CheckedTable table, TableUse? use, string set)
    {
        var polars = table.Table.Section.Polars;
        var picture = PolarPicture.Of(table.Table.Section, set, table.File);
        return picture with
        {
            Notes = [.. picture.Notes, .. Told(table, use)],
            Ringed = [.. table.Doubts.Where(doubt => doubt.Polar >= 0)
                .SelectMany(doubt => doubt.Rows.Select(row => new RingedRow(polars[doubt.Polar], row, CoefficientOf(doubt)))).Distinct()],
            Shaded = use is { Blades: > 0 }
                ? (double.DegreesToRadians(use.AngleDegBelow(0.05)), double.DegreesToRadians(use.AngleDegBelow(0.95)))
                : null,
        };
    }

    private static RingedCoefficient CoefficientOf(PolarDoubt doubt) => doubt.Column switch
    {
        "cl" => RingedCoefficient.Lift,
        "cd" => RingedCoefficient.Drag,
        _ => RingedCoefficient.Both,
    };

    private static IEnumerable<string> Told(CheckedTable table, TableUse? use)
    {
        var all = KindOfDoubt.Of(table, use)
            .OrderByDescending(kind => use is null ? 0 : FirstToLookAt.ShareOf(kind.First, use)).Select(Line).ToList();
        return all.Count <= DoubtsTold + 1 ? all
            : all.Take(DoubtsTold).Append(string.Create(CultureInfo.InvariantCulture, $"and {all.Count - DoubtsTold} more kinds of doubt"));
    }

    private static string Line(KindOfDoubt kind)
    {
        var others = kind.OtherLines.IsEmpty ? "" : string.Create(CultureInfo.InvariantCulture, $"; likewise {kind.OtherLines.Length} more");
        return string.Create(
            CultureInfo.InvariantCulture, $"line {kind.First.Finding.Line}, {kind.First.Kind}: {kind.First.Found}{others}");
    }
}
