using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Results.Comparison;
using CsvHelper;

namespace BladeLoads.Results.Report;

/// <summary>Reads <c>changes.csv</c> back, as far as the report shows it.</summary>
public static class StoredChanges
{
    private static readonly CsvReaderOptions Options = new() { Separator = ',', HasHeader = false, AllowLineBreaksInQuotes = true };

    /// <summary>What moved by a percentage that is told, the largest first; none where the table is not one of ours.</summary>
    public static ImmutableArray<ReportedChange> Parse(byte[] utf8)
    {
        const double Least = 0.005;    // percent: less is shown as 0.00
        try
        {
            using var rows = CsvReader.Create(utf8, Options);
            if (!rows.Read() || !Enumerable.Range(0, rows.FieldCount).Select(i => rows.GetString(i)).SequenceEqual(ChangesTable.Columns))
                return [];
            var (caseName, figure, unit, old, now, percent) = (
                Column("case"), Column("figure"), Column("unit"), Column("old"), Column("new"), Column("difference_percent"));
            var changes = new List<ReportedChange>();
            while (rows.Read())
                if (Number(rows.GetString(percent)) is { } moved && Math.Abs(moved) >= Least)
                    changes.Add(new ReportedChange(
                        rows.GetString(caseName), rows.GetString(figure), rows.GetString(unit), Number(rows.GetString(old)),
                        Number(rows.GetString(now)), moved));
            return [.. changes.OrderByDescending(c => Math.Abs(c.Percent))];
        }
        catch (Exception e) when (e is CsvFormatException or CsvValidationException or ArgumentException)
        {
            return [];
        }
    }

    private static int Column(string name) => ChangesTable.Columns.IndexOf(name);

    private static double? Number(string cell)
        => double.TryParse(cell, NumberStyles.Float, CultureInfo.InvariantCulture, out var number) && double.IsFinite(number) ? number : null;
}
