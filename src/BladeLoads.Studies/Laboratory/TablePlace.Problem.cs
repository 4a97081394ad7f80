using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Studies.Files;

namespace BladeLoads.Studies.Laboratory;

/// <remarks>Here: why no table was found.</remarks>
internal sealed partial class TablePlace
{
    private const string ByNumber = "say which are which by number: --columns alpha=1,cl=2,cd=3";

    /// <summary>No table was found, as commas seem to separate columns and to be decimal signs too.</summary>
    public bool HasCommasTwice { get; private set; }

    private (int Line, string Text)? Problem(bool isNumbered)
    {
        for (var i = first; i < end; i++)
            if (!signs.IsComment(text.Lines[i], out _) && IsMeantAsRow(text.Lines[i]))
            {
                var row = Cells.WithoutTrailing(Cells.Of(signs.WithoutRemark(text.Lines[i]), separator), FewestColumns);
                return OnHeader(i, row) ?? (i + 1, isNumbered ? OnNumbers(row) : OnNames());
            }
        return null;
    }

    // Of the lines above the first row, the nearest first.
    private (int Line, string Text)? OnHeader(int row, ImmutableArray<Cell> cells)
    {
        for (var above = row - 1; above >= first; above--)
        {
            var line = Uncommented(above);
            if (Header.Of(line, above + 1, separator, cells.Length, request) is not null && Between(above + 1, row) is >= 0 and var between)
                return (between + 1, TableScan.NotUnderstood(text.Lines[between]));
            if (above > first && HasOpenQuotes(text.Lines[above]) && HasOpenQuotes(text.Lines[above - 1]))
                return (above, "has a cell in quotes that goes on in the next line; put the names of the columns into one line");
            if (Header.Of(line, above + 1, separator, 0, request) is { } header)
                return (above + 1, OnOtherCount(header, row, cells));
            foreach (var other in Enum.GetValues<CellSeparator>().Where(other => other != separator))
                if (Header.Of(line, above + 1, other, 0, request) is { } foreign)
                    return (above + 1, AreCommasTwice(foreign, cells)
                        ? OnOtherCount(foreign, row, cells)
                        : string.Create(CultureInfo.InvariantCulture,
                            $"names columns with {Cells.InWords(other)} between them where line {row + 1} has {Cells.InWords(separator)}; "
                                + $"put {Cells.InWords(separator)} here too, or {ByNumber}"));
        }
        return null;
    }

    private static bool HasOpenQuotes(string line) => line.Count(c => c == '"') % 2 == 1;

    private bool AreCommasTwice(Header header, ImmutableArray<Cell> cells)
        => separator == CellSeparator.Comma && header.Cells.Length < cells.Length && !cells.Any(cell => cell.Text.Contains('.'));

    private string OnOtherCount(Header header, int row, ImmutableArray<Cell> cells)
    {
        HasCommasTwice = AreCommasTwice(header, cells);
        return string.Create(
            CultureInfo.InvariantCulture, $"names {header.Cells.Length} columns where line {row + 1} has {cells.Length} values; ")
            + (HasCommasTwice ? "commas seem to separate columns and to be decimal signs too, so save the table with semicolons" : ByNumber);
    }

    // The columns that the user names by number, in a row that has not all of them.
    private string OnNumbers(ImmutableArray<Cell> row)
    {
        foreach (var role in request.Needed)
        {
            var said = $"--columns {ColumnRoleWords.Of(role)}={request.Columns[role]}";
            if (!int.TryParse(request.Columns[role], NumberStyles.None, CultureInfo.InvariantCulture, out var number)
                || number < 1 || number > row.Length)
                return string.Create(CultureInfo.InvariantCulture, $"{said}: the table has columns 1 to {row.Length}");
            if (!IsNumber(row[number - 1]))
                return $"{said}: that column holds {VisibleText.Quote(row[number - 1].Text)} here, no number";
        }
        return "has no number in a column that --columns names";
    }

    private string OnNames()
    {
        var names = request.Columns.Values.Where(column => column != ReadingRequest.NoColumn && !column.All(char.IsAsciiDigit)).ToList();
        if (names.Count > 0)
            return $"no line above names {string.Join(", ", names.Select(VisibleText.Quote))}, or columns known here; {ByNumber}";
        var missing = request.Needed.Where(role => !request.Columns.ContainsKey(role)).Select(ColumnRoleWords.Of).ToList();
        return missing.Count == request.Needed.Length
            ? $"no line above names the columns; {ByNumber}"
            : $"no line above names the columns, and --columns does not say which is {string.Join(" and which ", missing)}; "
                + $"add {string.Join(" and ", missing.Select(word => $"{word}=<number>"))}";
    }
}
