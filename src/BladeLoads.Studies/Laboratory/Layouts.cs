using System.Globalization;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Laboratory;

/// <summary>
/// The ways in which a table can be taken apart: what separates its columns, which sign is decimal. One that makes sense of every line is
/// taken if all that do give the same numbers.
/// </summary>
internal static class Layouts
{
    /// <summary>Null, with the reason reported, where no way makes sense, or more than one.</summary>
    public static TableScan? Choose(ForeignText text, ReadingRequest request, Findings findings)
    {
        if (request is { Separator: CellSeparator.Comma, DecimalSign: DecimalSign.Comma } && !HasQuotes(text))
        {
            findings.Error(new Place(text.File, 0, 0),
                "a comma cannot both separate columns and be the decimal sign where no cell stands in quotes; give --separator or --decimal another");
            return null;
        }
        var scans = Ways(text, request).Select(way => TableScan.Of(text, request, way.Separator, way.Sign)).ToList();
        var sound = scans.FindAll(scan => scan.IsSound);
        if (sound.Count == 0)
        {
            TellOf(Nearest(scans), text, findings);
            return null;
        }
        foreach (var other in sound.Skip(1))
            if (FirstDifference(sound[0], other) is { } row)
            {
                findings.Error(new Place(text.File, row.One.Line, 1),
                    $"can be read in two ways: with {InWords(sound[0])}, {InWords(row.One)}; or with "
                    + $"{InWords(other)}, {InWords(row.Other)}; say which with --separator and --decimal");
                return null;
            }
        return sound[0];
    }

    private static IEnumerable<(CellSeparator Separator, DecimalSign Sign)> Ways(ForeignText text, ReadingRequest request)
    {
        var signs = request.DecimalSign is { } sign ? [sign] : Enum.GetValues<DecimalSign>();
        foreach (var separator in request.Separator is { } known ? [known] : Enum.GetValues<CellSeparator>().Where(s => Occurs(s, text)))
            foreach (var decimalSign in signs)
                // Between commas a decimal comma stands in quotes or nowhere.
                if (!(separator == CellSeparator.Comma && decimalSign == DecimalSign.Comma) || HasQuotes(text))
                    yield return (separator, decimalSign);
    }

    private static bool HasQuotes(ForeignText text) => text.Lines.Any(line => line.Contains('"'));

    private static bool Occurs(CellSeparator separator, ForeignText text)
        => Cells.SignOf(separator) is not { } sign || text.Lines.Any(line => line.Contains(sign));

    // The way that goes farthest: what is wrong in it is most likely what is wrong. Blanks go far where every cell ends in a comma.
    private static TableScan Nearest(List<TableScan> scans) => scans
        .OrderByDescending(scan => scan.HasCommasTwice && !scans.Exists(other => other.Rows.Count > 0))
        .ThenByDescending(scan => scan.Rows.Count)
        .ThenByDescending(scan => scan.Columns is not null)
        .ThenByDescending(scan => scan.Header.Cells.Length)
        .ThenByDescending(scan => scan.ErrorCount > 0)
        .ThenBy(scan => scan.ErrorCount)
        .First();

    private static void TellOf(TableScan scan, ForeignText text, Findings findings)
    {
        foreach (var error in scan.Errors)
            findings.Error(error);
        if (scan.Errors.IsEmpty)
            findings.Error(new Place(text.File, 0, 0), "holds no table: no line has two numbers or more in columns of their own");
    }

    private static (ForeignRow One, ForeignRow Other)? FirstDifference(TableScan one, TableScan other)
    {
        for (var i = 0; i < Math.Min(one.Rows.Count, other.Rows.Count); i++)
            if (one.Rows[i].Line != other.Rows[i].Line || !one.Rows[i].HasValuesOf(other.Rows[i]))
                return (one.Rows[i], other.Rows[i]);
        return one.Rows.Count == other.Rows.Count ? null : (one.Rows[^1], other.Rows[^1]);
    }

    public static string InWords(TableScan scan)
        => $"{Cells.InWords(scan.Separator)} between columns and a decimal {(scan.Sign == DecimalSign.Point ? "point" : "comma")}";

    private static string InWords(in ForeignRow row) => string.Create(
        CultureInfo.InvariantCulture, $"{CanonicalText.Of(row.Angle)} {CanonicalText.Of(row.Lift)} {CanonicalText.Of(row.Drag)} in line {row.Line}");
}
