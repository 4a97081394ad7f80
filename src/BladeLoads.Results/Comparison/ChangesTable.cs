using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Results.Tables;

namespace BladeLoads.Results.Comparison;

/// <summary>
/// <c>changes.csv</c>: what moved between two results, a row a figure, so that figures of later versions are further rows and the
/// table can be sorted by percent. The columns are a promise (docs/formats.md).
/// </summary>
public static class ChangesTable
{
    public const string FileName = "changes.csv";

    private const int WindSpeedsNamed = 12;

    public static ImmutableArray<string> Columns { get; } =
    [
        "case", "old_case", "comparison", "figure", "unit", "old", "old_wind_speed_m_s", "new", "new_wind_speed_m_s",
        "difference", "difference_percent", "note", "why",
    ];

    /// <summary>The table as UTF-8.</summary>
    public static byte[] Write(IEnumerable<CaseComparison> comparisons)
    {
        using var table = new TableWriter(Columns.AsSpan());
        foreach (var comparison in comparisons)
            foreach (var row in RowsOf(comparison))
            {
                table.Text(comparison.Case);
                table.Text(comparison.OldCase);
                table.Text(comparison.Word);
                table.Text(row.Figure);
                table.Text(row.Unit);
                table.Number(row.Old);
                table.Number(row.OldWindSpeed);
                table.Number(row.New);
                table.Number(row.NewWindSpeed);
                table.Number(row.Difference);
                table.Number(row.Percent);
                table.Text(row.Note);
                table.Text((comparison as CaseComparison.Compared)?.Why);
                table.EndRow();
            }
        return table.ToBytes();
    }

    private static IEnumerable<Row> RowsOf(CaseComparison comparison)
    {
        if (comparison is CaseComparison.NotCompared { Note: var note })
            return [new Row("", "", Note: note)];
        var compared = (CaseComparison.Compared)comparison;
        return
        [
            .. compared.Doubts.Select(doubt => new Row("doubt", "", Note: doubt)),
            .. compared.Changes.Select(Of),
            .. compared.Marks.Select(Of),
            .. compared.HasOtherWindSpeeds ? [Of(compared.WindSpeeds)] : ImmutableArray<Row>.Empty,
        ];
    }

    private static Row Of(FigureChange change) => new(
        change.Name, change.Unit, change.Old?.Value, change.Old?.WindSpeed, change.New?.Value, change.New?.WindSpeed, change.Difference,
        change.Percent, change.HasTurned ? "the sign has turned" : "");

    private static Row Of(MarkChange mark) => new(
        $"mark {mark.Mark}", "points", mark.OldPoints, null, mark.NewPoints, null, (mark.NewPoints ?? 0) - (mark.OldPoints ?? 0),
        Note: Phrases(("new at", mark.NewAt), ("lost at", mark.LostAt)));

    private static Row Of(CommonWindSpeeds speeds) => new(
        "wind speeds", "points", speeds.Common + speeds.OnlyOld.Length, null, speeds.Common + speeds.OnlyNew.Length, null,
        speeds.OnlyNew.Length - speeds.OnlyOld.Length,
        Note: FormattableString.Invariant($"{speeds.Common} in both; ") + Phrases(("only old", speeds.OnlyOld), ("only new", speeds.OnlyNew)));

    private static string Phrases(params ReadOnlySpan<(string Word, ImmutableArray<double> WindSpeeds)> phrases)
    {
        var parts = new List<string>();
        foreach (var (word, windSpeeds) in phrases)
            if (!windSpeeds.IsEmpty)
                parts.Add($"{word} {WindSpeedText.Of(windSpeeds, WindSpeedsNamed)}");
        return string.Join("; ", parts);
    }

    private sealed record Row(
        string Figure, string Unit, double? Old = null, double? OldWindSpeed = null, double? New = null, double? NewWindSpeed = null,
        double? Difference = null, double? Percent = null, string Note = "");
}

/// <summary>Wind speeds in a sentence.</summary>
public static class WindSpeedText
{
    /// <summary><c>3, 3.5, 4 and 12 more m/s</c>.</summary>
    /// <param name="named">How many are named at most.</param>
    public static string Of(ImmutableArray<double> windSpeeds, int named)
        => string.Join(", ", windSpeeds.Take(named).Select(v => v.ToString("0.######", CultureInfo.InvariantCulture)))
            + (windSpeeds.Length > named ? FormattableString.Invariant($" and {windSpeeds.Length - named} more") : "") + " m/s";
}
