using System.Collections.Immutable;
using System.Globalization;
using System.Text;
using BladeLoads.Studies.Laboratory;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.Tests.Laboratory;

/// <summary>Foreign tables of the tests, and what came of them as text.</summary>
internal static class Foreign
{
    /// <param name="text">With <c>&lt;TAB&gt;</c> and <c>&lt;U+200F&gt;</c> for what an editor does not show.</param>
    /// <param name="options">As a user gives them to the command; blanks within a name are written as <c>_</c>.</param>
    public static LaboratoryTable Read(string text, string options = "") => Read(Encoding.UTF8.GetBytes(Shown(text)), options);

    public static LaboratoryTable Read(byte[] bytes, string options = "") => LaboratoryTable.Of("lab.txt", bytes, Request(options));

    /// <summary>Rows as <c>angle lift drag [moment]</c>, a line a Reynolds number; or the errors, a line each.</summary>
    public static string Outcome(LaboratoryTable table) => string.Join('\n', table.Errors.IsEmpty
        ? table.Polars.Select(Rows)
        : table.Errors.Select(FindingText.Format));

    private static string Rows(PolarRows polar)
    {
        var rows = string.Join(" | ", polar.Rows.Select(row => string.Create(CultureInfo.InvariantCulture, $"{row.AngleDeg} {row.Lift} {row.Drag}")
            + (double.IsNaN(row.Moment) ? "" : string.Create(CultureInfo.InvariantCulture, $" {row.Moment}"))));
        return double.IsNaN(polar.Reynolds) ? rows : string.Create(CultureInfo.InvariantCulture, $"{polar.Reynolds}: {rows}");
    }

    private static string Shown(string text)
    {
        var parts = text.Replace("<TAB>", "\t", StringComparison.Ordinal).Split("<U+");
        return parts[0] + string.Concat(parts.Skip(1).Select(
            part => (char)int.Parse(part.AsSpan(0, 4), NumberStyles.HexNumber, CultureInfo.InvariantCulture) + part[5..]));
    }

    private static ReadingRequest Request(string options)
    {
        var request = new ReadingRequest();
        var words = new Queue<string>(options.Split(' ', StringSplitOptions.RemoveEmptyEntries));
        while (words.TryDequeue(out var word))
            request = word switch
            {
                "--columns" => request with { Columns = Columns(words.Dequeue()) },
                "--angles" => request with { Angles = Enum.Parse<AngleUnit>(words.Dequeue(), ignoreCase: true) },
                "--decimal" => request with { DecimalSign = Enum.Parse<DecimalSign>(words.Dequeue(), ignoreCase: true) },
                "--separator" => request with { Separator = Enum.Parse<CellSeparator>(words.Dequeue(), ignoreCase: true) },
                "--reynolds" when Enum.TryParse<ReynoldsUnit>(words.Peek(), ignoreCase: true, out var unit) && char.IsLetter(words.Dequeue()[0])
                    => request with { ReynoldsUnit = unit },
                "--reynolds" => request with { Reynolds = double.Parse(words.Dequeue(), CultureInfo.InvariantCulture) },
                "--comment" => request with { Comment = words.Dequeue() },
                "--lines" => request with { Lines = Lines(words.Dequeue()) },
                "--sweep" => request with { Sweep = Enum.Parse<SweepChoice>(words.Dequeue(), ignoreCase: true) },
                "--section" => request with { Section = words.Dequeue() },
                "--leave-out" => words.Dequeue() == "incomplete" ? request with { LeaveOutIncomplete = true } : request with { LeaveOutNegativeDrag = true },
                "--wrap" => request with { Wrap = true },
                _ => throw new ArgumentException(word),
            };
        return request;
    }

    private static ImmutableSortedDictionary<ColumnRole, string> Columns(string text) => text.Split(',').Select(part => part.Split('='))
        .ToImmutableSortedDictionary(part => ColumnRoleWords.Find(part[0])!.Value, part => part[1].Replace('_', ' '));

    private static LineRange Lines(string text)
        => text.Split('-') is [var first, var last] ? new LineRange(int.Parse(first, CultureInfo.InvariantCulture), int.Parse(last, CultureInfo.InvariantCulture)) : default;
}

/// <summary>A foreign table with what must come of it.</summary>
internal sealed record ForeignCase(string Title, string Options, string Text, string Expected)
{
    public static TheoryData<string> Titles(IEnumerable<ForeignCase> cases)
    {
        var titles = new TheoryData<string>();
        foreach (var one in cases)
            titles.Add(one.Title);
        return titles;
    }
}
