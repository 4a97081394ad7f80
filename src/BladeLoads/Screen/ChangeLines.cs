using System.Globalization;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Wording;

namespace BladeLoads.Screen;

/// <summary>How a comparison is shown.</summary>
/// <param name="Title">What is compared with what.</param>
/// <param name="MoreThan">Only what moved by more than so many percent; 0 for everything that moved.</param>
/// <param name="Tables">For how many cases, at most, every figure is shown: those that moved most.</param>
/// <param name="WholeNames">No name is shortened: nobody's screen is too narrow for it.</param>
/// <param name="Rest">Where what is not shown can be read; a phrase.</param>
/// <param name="Closing">The last line.</param>
internal sealed record ChangesShown(string Title, double MoreThan, int Tables, bool WholeNames, string Rest, string Closing);

/// <summary>What moved, on the screen: a row of percentages a case, then every figure of the cases that moved most.</summary>
internal static class ChangeLines
{
    private const int WidestName = 40;
    private const int RowsShown = 100;
    private const int NamesShown = 5;
    private const int WindSpeedsNamed = 6;

    private static readonly string[] Heads = ["best cp", "rated", "power", "thrust", "out-of-plane", "in-plane", "flapwise", "edgewise", "energy"];

    public static void Write(IReadOnlyCollection<CaseComparison> comparisons, ChangesShown shown, TextWriter output)
    {
        var compared = comparisons.OfType<CaseComparison.Compared>().ToList();
        var moved = compared.Where(c => HasMoved(c, shown.MoreThan)).ToList();
        output.WriteLine();
        output.WriteLine(Printable.Of(shown.Title));
        if (moved.Count > 1)   // one alone is told by its table
            WriteOverview(moved, shown, output);
        if (compared.Count > moved.Count)
            output.WriteLine(shown.MoreThan > 0
                ? $"{Count.Of(compared.Count - moved.Count, "case")} moved by no more than {Number(shown.MoreThan, "0.######")} %"
                : $"{Count.Of(compared.Count - moved.Count, "case")} compared: no figure, no mark and no wind speed differs");
        WriteNotCompared(comparisons.OfType<CaseComparison.NotCompared>().ToList(), output);
        WriteTables(moved, shown, output);
        output.WriteLine();
        output.WriteLine(Printable.Of(shown.Closing));
    }

    private static bool HasMoved(CaseComparison.Compared c, double moreThan) => c.Changes.Any(f => f.IsMoreThan(moreThan))
        || !c.Marks.IsEmpty || c.HasOtherWindSpeeds || !c.Doubts.IsEmpty;

    private static void WriteOverview(List<CaseComparison.Compared> moved, ChangesShown shown, TextWriter output)
    {
        var rows = moved.Count <= RowsShown ? moved : [.. moved.OrderByDescending(c => c.LargestPercent).Take(RowsShown)];
        var heads = Heads[..rows.Max(row => row.Figures.Length)];   // the last is of some cases only
        var table = new TextTable(["case", .. heads]);
        foreach (var row in rows)
            table.Add([Name(row, shown), .. row.Figures.Select(PercentCell), .. Enumerable.Repeat("-", heads.Length - row.Figures.Length)], Notes(row));
        table.Write(output);
        if (rows.Count < moved.Count)
            output.WriteLine($"the {rows.Count} cases that moved most of {moved.Count}; all: {shown.Rest}");
    }

    private static string Notes(CaseComparison.Compared row)
    {
        List<string> notes =
        [
            .. row.Marks.Where(m => m.OldPoints is null || !m.NewAt.IsEmpty).Select(m => $"+{m.Mark}"),
            .. row.Marks.Where(m => m.NewPoints is null || !m.LostAt.IsEmpty).Select(m => $"-{m.Mark}"),
            .. row.HasOtherWindSpeeds ? new[] { "other wind speeds" } : [],
            .. row.Doubts.IsEmpty ? [] : new[] { "in doubt" },
        ];
        return Printable.Of(string.Join(' ', notes));
    }

    private static void WriteNotCompared(List<CaseComparison.NotCompared> cases, TextWriter output)
    {
        foreach (var group in cases.GroupBy(c => c.Reason))
            if (group.Key is NoComparison.Failed or NoComparison.Unreadable)
                foreach (var one in group.Take(RowsShown))
                    output.WriteLine(Printable.Of($"{one.Case}: {one.Word}: {one.Note}"));
            else
                output.WriteLine(Printable.Of($"{Count.Of(group.Count(), "case")} {Phrase(group.Key)}: {Names(group.Select(c => c.Case).ToList())}"));
    }

    private static string Phrase(NoComparison reason) => reason switch
    {
        NoComparison.NoEarlierResult => "without an earlier result",
        NoComparison.NotRun => "not run",
        NoComparison.OnlyOld => "only in the old results",
        NoComparison.OnlyNew => "only in the new results",
        _ => throw new ArgumentOutOfRangeException(nameof(reason), reason, "has no phrase"),
    };

    private static string Names(List<string> names)
        => string.Join(", ", names.Take(NamesShown)) + (names.Count > NamesShown ? $" and {names.Count - NamesShown} more" : "");

    private static void WriteTables(List<CaseComparison.Compared> moved, ChangesShown shown, TextWriter output)
    {
        var most = moved.Count <= shown.Tables ? moved
            : [.. moved.OrderByDescending(c => c.LargestPercent).Take(shown.Tables)];
        foreach (var one in most)
            WriteTable(one, shown, output);
        if (most.Count == moved.Count)
            return;
        output.WriteLine();
        output.WriteLine($"old and new figures of the {Count.Of(moved.Count - most.Count, "other")}: {shown.Rest}");
    }

    private static void WriteTable(CaseComparison.Compared one, ChangesShown shown, TextWriter output)
    {
        output.WriteLine();
        var names = one.Case == one.OldCase ? one.Case : $"{one.OldCase} -> {one.Case}";
        output.WriteLine(Printable.Of(one.Why.Length == 0 ? names : $"{names} ({one.Why})"));
        var table = new TextTable("", "old", "at m/s", "new", "at m/s", "difference", "%");
        foreach (var change in one.Changes.Where(c => c.IsMoreThan(shown.MoreThan)))
            table.Add(Cells(change), change.HasTurned ? "the sign has turned" : "");
        if (one.Changes.Any(c => c.IsMoreThan(shown.MoreThan)))
            table.Write(output, indent: 2);
        var still = one.Changes.Count(c => !c.IsMoreThan(shown.MoreThan) && (c.Old is not null || c.Difference is not null));
        if (still > 0)
            output.WriteLine(shown.MoreThan > 0
                ? $"  {Count.Of(still, "figure")} moved by no more than {Number(shown.MoreThan, "0.######")} %"
                : $"  {Count.Of(still, "figure")} unchanged");
        foreach (var line in Remarks(one))
            output.WriteLine("  " + Printable.Of(line));
    }

    private static string[] Cells(FigureChange change)
    {
        var form = Form(Math.Max(Math.Abs(change.Old?.Value ?? 0), Math.Abs(change.New?.Value ?? 0)));
        return
        [
            change.Unit.Length == 0 ? change.Name : $"{change.Name}, {change.Unit}",
            Number(change.Old?.Value, form), Number(change.Old?.WindSpeed, "0.00"),
            Number(change.New?.Value, form), Number(change.New?.WindSpeed, "0.00"),
            Number(change.Difference, $"+{form};-{form};{form}"), PercentCell(change),
        ];
    }

    private static IEnumerable<string> Remarks(CaseComparison.Compared one)
    {
        foreach (var mark in one.Marks)
        {
            if (!mark.NewAt.IsEmpty)
                yield return $"new mark {mark.Mark} at {WindSpeedText.Of(mark.NewAt, WindSpeedsNamed)}";
            else if (mark.OldPoints is null)
                yield return $"new mark {mark.Mark}";
            if (!mark.LostAt.IsEmpty)
                yield return $"lost mark {mark.Mark} at {WindSpeedText.Of(mark.LostAt, WindSpeedsNamed)}";
            else if (mark.NewPoints is null)
                yield return $"lost mark {mark.Mark}";
        }
        if (one.HasOtherWindSpeeds)
            yield return $"{Count.Of(one.WindSpeeds.Common, "wind speed")} in both"
                + (one.WindSpeeds.OnlyOld.IsEmpty ? "" : $"; only old: {WindSpeedText.Of(one.WindSpeeds.OnlyOld, WindSpeedsNamed)}")
                + (one.WindSpeeds.OnlyNew.IsEmpty ? "" : $"; only new: {WindSpeedText.Of(one.WindSpeeds.OnlyNew, WindSpeedsNamed)}");
        foreach (var doubt in one.Doubts)
            yield return $"in doubt, {doubt}";
    }

    private static string Name(CaseComparison row, ChangesShown shown)
        => shown.WholeNames ? Printable.Of(row.Case) : ShortName.Of(Printable.Of(row.Case), WidestName);

    private static string PercentCell(FigureChange change) => change switch
    {
        { Percent: { } percent } => Number(percent, "+0.00;-0.00;0.00"),
        { Old: null, New: not null } => "new",
        { Old: not null, New: null } => "lost",
        { Difference: not null and not 0 } => "from 0",
        _ => "-",
    };

    private static string Form(double size) => size switch { >= 1000 => "0.0", >= 100 => "0.00", >= 10 => "0.000", _ => "0.0000" };

    private static string Number(double? value, string form) => value?.ToString(form, CultureInfo.InvariantCulture) ?? "-";
}
