using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Results.Comparison;
using CsvHelper;

namespace BladeLoads.Results.Report;

/// <summary>Reads <c>changes.csv</c> back, as far as the report shows it.</summary>
public static class StoredChanges
{
    private const double LeastPercent = 0.005;    // less is shown as 0.00

    private static readonly CsvReaderOptions Options = new() { Separator = ',', HasHeader = false, AllowLineBreaksInQuotes = true };

    /// <summary>The cases of which something moved, was lost, is new or could not be compared; none where the table is not one of ours.</summary>
    public static ImmutableArray<MovedCase> Parse(byte[] utf8)
    {
        try
        {
            using var rows = CsvReader.Create(utf8, Options);
            if (!rows.Read() || !Cells(rows).SequenceEqual(ChangesTable.Columns))
                return [];
            var lines = new List<string[]>();
            while (rows.Read())
                lines.Add(Cells(rows));
            return [.. lines.Where(cells => cells.Length == ChangesTable.Columns.Length).GroupBy(cells => Cell(cells, "case"), StringComparer.Ordinal)
                .Select(group => CaseOf(group.Key, [.. group])).Where(moved => !moved.Figures.IsEmpty || moved.Note.Length > 0)];
        }
        catch (Exception e) when (e is CsvFormatException or CsvValidationException or ArgumentException)
        {
            return [];
        }
    }

    private static MovedCase CaseOf(string name, string[][] rows)
    {
        var isCompared = rows.Any(cells => Cell(cells, "figure").Length > 0);
        return new MovedCase(
            name, Cell(rows[0], "why"), isCompared || Cell(rows[0], "note").Length == 0 ? "" : $"{Cell(rows[0], "comparison")}: {Cell(rows[0], "note")}",
            [.. rows.Where(cells => Cell(cells, "figure").Length > 0).Select(FigureOf).Where(IsTold)]);
    }

    private static MovedFigure FigureOf(string[] cells) => new(
        Cell(cells, "figure"), Cell(cells, "unit"), Number(cells, "old"), Number(cells, "old_wind_speed_m_s"), Number(cells, "new"),
        Number(cells, "new_wind_speed_m_s"), Number(cells, "difference_percent"), Cell(cells, "note"));

    private static bool IsTold(MovedFigure figure)
        => figure.Percent is { } percent ? Math.Abs(percent) >= LeastPercent || figure.Note.Length > 0 : figure.Note.Length > 0 || figure.Old != figure.New;

    private static string[] Cells(CsvReader rows) => [.. Enumerable.Range(0, rows.FieldCount).Select(i => rows.GetString(i))];

    private static string Cell(string[] cells, string column) => cells[ChangesTable.Columns.IndexOf(column)];

    private static double? Number(string[] cells, string column)
        => double.TryParse(Cell(cells, column), NumberStyles.Float, CultureInfo.InvariantCulture, out var number) && double.IsFinite(number) ? number : null;
}
