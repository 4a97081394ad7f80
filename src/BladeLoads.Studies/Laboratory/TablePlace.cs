using System.Globalization;

namespace BladeLoads.Studies.Laboratory;

/// <summary>Where in a text the table stands: the line that names its columns, and its first row.</summary>
internal sealed partial class TablePlace(
    ForeignText text, ReadingRequest request, LineSigns signs, CellSeparator separator, DecimalSign sign, int first, int end)
{
    private const int FewestColumns = 2;

    /// <param name="firstRow">Index of the line.</param>
    /// <param name="count">Columns of the table.</param>
    /// <param name="problem">Where there is no table: the line (0 for the whole file) and what is wrong; null where nothing was found at all.</param>
    public bool Find(out Header header, out int firstRow, out int count, out (int Line, string Text)? problem)
    {
        problem = null;
        if (FindHeader(out header, out firstRow, out count))
            return true;
        var isNumbered = request.Needed.All(role => request.Columns.TryGetValue(role, out var column) && column.All(char.IsAsciiDigit));
        if (isNumbered && FindFirstRow(out firstRow, out count))
            return true;
        problem = Problem(isNumbered);
        return false;
    }

    // The first line that names columns and stands right above a row of as many; else the last comment that does.
    private bool FindHeader(out Header header, out int firstRow, out int count)
    {
        (header, firstRow, count) = (Header.None, 0, 0);
        for (var i = first; i < end && !(header.Line > 0 && i >= firstRow); i++)
        {
            var isComment = signs.IsComment(text.Lines[i], out var rest);
            if (!isComment && IsMeantAsRow(text.Lines[i]))
                continue;
            var line = isComment ? rest : text.Lines[i];
            if (HeaderAt(i, line, out var found, out var next) || HeaderAt(i, signs.WithoutEnd(line), out found, out next))
                (header, firstRow, count) = (found, next, found.Cells.Length);
            if (header.Line == i + 1 && !isComment)
                return true;
        }
        return header.Line > 0;
    }

    private bool HeaderAt(int index, string line, out Header header, out int firstRow)
    {
        (header, firstRow) = (Header.None, 0);
        if (Header.Of(line, index + 1, separator, 0, request) is null || NextRow(index + 1) is not { } next)
            return false;
        firstRow = next;
        // The first row may end in empty cells of columns that have a name, and in some of none.
        var row = Cells.Of(signs.WithoutRemark(text.Lines[next]), separator);
        for (var count = Cells.WithoutTrailing(row, FewestColumns).Length; count <= row.Length && header.Line == 0; count++)
            header = Header.Of(line, index + 1, separator, count, request) ?? Header.None;
        return header.Line > 0;
    }

    // The first line from here on that is meant as a row, if only such stand before it as may stand below a header.
    private int? NextRow(int from)
    {
        for (var i = from; i < end; i++)
        {
            var line = text.Lines[i];
            if (LineSigns.IsEmpty(line) || LineSigns.IsRuling(line) || signs.IsComment(line, out _))
                continue;
            if (IsMeantAsRow(line))
                return i;
            var cells = Cells.Of(line, separator);
            var isOfUnits = cells.Any(cell => UnitWords.Meaning(cell.Text) is UnitMeaning.Degrees or UnitMeaning.Radians)
                && !cells.Any(cell => cell.Text != "1" && ForeignNumber.LooksLikeOne(cell.Text));
            if (!isOfUnits && ReynoldsLine.In(line, i + 1, request.ReynoldsUnit) is null)
                return null;
        }
        return null;
    }

    private bool FindFirstRow(out int firstRow, out int count)
    {
        var places = request.Needed.Select(
            role => int.TryParse(request.Columns[role], NumberStyles.None, CultureInfo.InvariantCulture, out var n) ? n : 0).ToList();
        for (firstRow = first; firstRow < end; firstRow++)
        {
            if (signs.IsComment(text.Lines[firstRow], out _))
                continue;
            var cells = Cells.WithoutTrailing(Cells.Of(signs.WithoutRemark(text.Lines[firstRow]), separator), places.Max());
            count = cells.Length;
            if (places.TrueForAll(n => n >= 1 && n <= cells.Length && IsNumber(cells[n - 1])))
                return true;
        }
        count = 0;
        return false;
    }

    private bool IsNumber(Cell cell) => ForeignNumber.TryParse(ForeignNumber.WithoutDegreeSign(cell.Text), sign, out _);

    // The line that keeps a header from being one.
    private int Between(int from, int row)
    {
        for (var i = from; i < row; i++)
            if (NextRow(i) is null)
                return Enumerable.Range(i, row - i).Last(k => NextRow(k) is null);
        return -1;
    }

    private string Uncommented(int index) => signs.IsComment(text.Lines[index], out var rest) ? rest : text.Lines[index];

    private bool IsMeantAsRow(string line)
    {
        var cells = Cells.Of(signs.WithoutRemark(line), separator);
        var numbers = cells.Count(cell => ForeignNumber.LooksLikeOne(cell.Text));
        return cells.Length >= FewestColumns && numbers >= 2 && 2 * numbers >= cells.Count(cell => cell.Text.Length > 0);
    }
}
