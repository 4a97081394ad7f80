using System.Globalization;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Receipts;
using BladeLoads.Results.Report;
using BladeLoads.Results.Tables;
using BladeLoads.Results.Wording;
using static BladeLoads.Results.Wording.FigureText;

namespace BladeLoads.Screen;

/// <summary>The summary on the screen: the most useful columns, a row a case.</summary>
internal static class SummaryLines
{
    public const string Caution = "steady, characteristic, unfactored, without weight; no design envelope (each receipt.json says more)";

    private const int NarrowestName = 40;
    private const int FiguresWidth = 72;
    private const int RowsShown = 100;
    private const string MoreTitle = "best found, year at the site";

    /// <param name="baseline">The row that others are compared with; null for a study without one.</param>
    /// <param name="folder">Where the results lie, told last.</param>
    /// <param name="screenWidth">Characters of a line; names are shortened to fit. Null where the output is redirected: names stay whole.</param>
    public static void Write(
        IReadOnlyCollection<SummaryRow> rows, SummaryRow? baseline, string folder, int? screenWidth, TextWriter output)
    {
        var shown = rows.Take(rows.Count == RowsShown + 1 ? rows.Count : RowsShown).ToList();
        var widest = screenWidth is { } all ? Math.Max(NarrowestName, all - FiguresWidth) : int.MaxValue;
        string Name(string name) => ShortName.Of(Printable.Of(name), widest);
        var width = Math.Max(HasMore(shown) ? MoreTitle.Length : "case".Length, shown.Select(r => Name(r.Case).Length).DefaultIfEmpty(0).Max());
        output.WriteLine();
        output.WriteLine(Row("case", width, ("best cp", 7), ("at TSR", 7), ("power kW", 9), ("rated m/s", 10), ("thrust kN", 10), ("at m/s", 7), ("flapwise kNm", 13)));
        foreach (var row in shown)
            output.WriteLine(Figures(row, Name(row.Case), width));
        if (rows.Count > shown.Count)
            output.WriteLine($"... and {rows.Count - shown.Count} more in {SummaryTable.FileName}");
        output.WriteLine("power: largest electrical; thrust, flapwise moment at the blade root: largest; marks with their points");
        WriteStrategyAndEnergy(shown, Name, width, output);
        if (baseline is not null && shown.Exists(r => r.Summary is not null && r.Case != baseline.Case))
            WriteDifferences(shown, baseline, Name, width, output);
        output.WriteLine();
        output.WriteLine(Caution);
        output.WriteLine(Printable.Of($"results: {folder}"));
        output.WriteLine(Printable.Of($"report:  {Path.Join(folder, StudyReport.FileName)}"));
    }

    // Rows that have a searched point or a year; none, none of it.
    private static void WriteStrategyAndEnergy(List<SummaryRow> rows, Func<string, string> name, int width, TextWriter output)
    {
        if (!HasMore(rows))
            return;
        var told = rows.Where(HasMore).ToList();
        output.WriteLine();
        output.WriteLine(Row(
            MoreTitle, width, ("TSR", 7), ("pitch deg", 11), ("net MWh", 10), ("capacity %", 12), ("turbulent MWh", 15)));
        foreach (var row in told)
        {
            var best = row.Summary!.Best is { Searched: true } searched ? searched : null;
            var energy = row.Summary.Energy;
            output.WriteLine(Row(
                name(row.Case), width, (Figure(best?.TipSpeedRatio), 7),
                (best is null ? "-" : double.RadiansToDegrees(best.FinePitch).ToString("0.000", CultureInfo.InvariantCulture), 11),
                (Figure(energy?.AnnualEnergy / 3.6e9), 10), (Figure(100 * energy?.CapacityFactor), 12),
                (Figure(energy?.TurbulentAnnualEnergy / 3.6e9), 15)));
        }
    }

    private static void WriteDifferences(
        List<SummaryRow> rows, SummaryRow baseline, Func<string, string> name, int width, TextWriter output)
    {
        output.WriteLine();
        if (baseline.Summary is null)
        {
            output.WriteLine(Printable.Of($"no comparison: the baseline '{baseline.Case}' has no current result"));
            return;
        }
        var hasEnergy = baseline.Summary.Energy?.AnnualEnergy is not null;
        output.WriteLine(Printable.Of($"difference to {baseline.Case}, %"));
        output.WriteLine(Row("case", width, ("best cp", 8), ("power", 9), ("rated", 9), ("thrust", 9), ("flapwise", 9)) + (hasEnergy ? "    energy" : ""));
        foreach (var row in rows)
            if (row.Summary is not null && row.Case != baseline.Case)
            {
                var difference = BaselineDifference.Between(row.Summary, baseline.Summary);
                output.WriteLine(Row(
                    name(row.Case), width, (Percent(difference.BestPowerCoefficient), 8), (Percent(difference.LargestElectricalPower), 9),
                    (Percent(difference.RatedWindSpeed), 9), (Percent(difference.LargestThrust), 9),
                    (Percent(difference.LargestFlapwiseMoment), 9))
                    + (hasEnergy ? "  " + Percent(difference.AnnualEnergy).PadLeft(8) : ""));
            }
    }

    private static bool HasMore(SummaryRow row) => row.Summary is { Energy: not null } or { Best.Searched: true };

    private static bool HasMore(List<SummaryRow> rows) => rows.Exists(HasMore);

    private static string Figures(SummaryRow row, string name, int width)
    {
        if (row.Summary is not { } summary)
            return $"{name.PadRight(width)}  {row.State}";
        var figures = Row(
            name, width,
            (Coefficient(summary.BestPowerCoefficient?.Value), 7),
            (Figure(summary.BestTipSpeedRatio), 7),
            (Figure(summary.LargestElectricalPower?.Value / 1000), 9),
            (Figure(summary.RatedWindSpeed), 10),
            (Figure(summary.LargestThrust?.Value / 1000), 10),
            (Figure(summary.LargestThrust?.WindSpeed), 7),
            (Figure(summary.LargestFlapwiseMoment?.Value / 1000), 13));
        return figures + Notes(row, summary);
    }

    private static string Notes(SummaryRow row, CaseSummary summary)
    {
        var state = row.State == "current" ? "" : $"  {row.State}";
        return summary.MarksText is { Length: > 0 } marks ? $"{state}  {marks}" : state;
    }

    private static string Row(string name, int width, params ReadOnlySpan<(string Text, int Width)> cells)
    {
        var row = name.PadRight(width);
        foreach (var (text, cellWidth) in cells)
            row += "  " + text.PadLeft(cellWidth - 1);
        return row;
    }
}
