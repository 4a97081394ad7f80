using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.Laboratory;

/// <summary>A foreign table read with one separator and one decimal sign. It is sound where every line makes sense so.</summary>
internal sealed partial class TableScan
{
    private readonly ForeignText _text;
    private readonly ReadingRequest _request;
    private readonly LineSigns _signs;
    private readonly Findings _findings = new();
    private readonly TableErrors _errors;
    private readonly List<int> _wordsSinceLastRow = [];

    // Those that rows name, asked for or not, each with its first place.
    private readonly Dictionary<string, Place> _sections = new(StringComparer.Ordinal);
    private bool _showsItsDecimals;

    // Of rows, in their order.
    private readonly List<bool> _haveDegreeSigns = [];

    private TableScan(ForeignText text, ReadingRequest request, CellSeparator separator, DecimalSign sign)
    {
        (_text, _request, Separator, Sign) = (text, request, separator, sign);
        _signs = new LineSigns(request.Comment);
        _errors = new TableErrors(_findings);
        Scan();
        _errors.TellTheRest();
    }

    public CellSeparator Separator { get; }

    public DecimalSign Sign { get; }

    public Header Header { get; private set; } = Header.None;

    /// <summary>Null where an error kept them from being told.</summary>
    public ColumnChoice? Columns { get; private set; }

    public List<ForeignRow> Rows { get; } = [];

    public List<ReynoldsLine> ReynoldsLines { get; } = [];

    /// <summary>What was passed over on purpose: lines, each with the reason.</summary>
    public List<(int Line, string Why)> LeftOut { get; } = [];

    /// <summary>Of the angles, as header or units row name it; null where they do not.</summary>
    public AngleUnit? Unit { get; private set; }

    /// <summary>The line that names <see cref="Unit"/>.</summary>
    public int UnitLine { get; private set; }

    /// <summary>There is no table so, as commas seem to separate columns and to be decimal signs too.</summary>
    public bool HasCommasTwice { get; private set; }

    /// <summary>A minus sign of typesetters was read in a row.</summary>
    public bool HasForeignMinus { get; private set; }

    /// <summary>The angles of the rows bear degree signs.</summary>
    public bool HasDegreeSigns => _haveDegreeSigns.Contains(true);

    /// <summary>Those not told one by one too.</summary>
    public int ErrorCount => _errors.Total;

    public ImmutableArray<InputFinding> Errors => _findings.Errors;

    public bool IsSound => Rows.Count > 0 && !_errors.Any;

    public static TableScan Of(ForeignText text, ReadingRequest request, CellSeparator separator, DecimalSign sign)
        => new(text, request, separator, sign);

    private int First => Math.Max(0, (_request.Lines?.First ?? 1) - 1);

    private int End => Math.Min(_text.Lines.Length, _request.Lines?.Last ?? _text.Lines.Length);

    private void Scan()
    {
        var place = new TablePlace(_text, _request, _signs, Separator, Sign, First, End);
        if (!place.Find(out var header, out var firstRow, out var count, out var problem))
        {
            HasCommasTwice = place.HasCommasTwice;
            if (problem is var (line, text))
                _errors.Add("", new Place(_text.File, line, line == 0 ? 0 : 1), text);
            return;
        }
        Header = header;
        var columns = new ColumnChoice(header, count, _request);
        foreach (var wrong in columns.Problems)
            _errors.Add("", new Place(_text.File, header.Line == 0 ? firstRow + 1 : header.Line, 1), wrong);
        if (columns.Problems.Count > 0)
            return;
        Columns = columns;
        (Unit, UnitLine) = (columns.NameOf(ColumnRole.Angle)?.Unit, header.Line);
        var reader = new RowReader(columns, _request, Sign, _text.File);
        LookAbove(firstRow, count, reader);
        for (var i = firstRow; i < End && !_errors.AreTooMany; i++)
            ReadLine(i, count, reader);
        foreach (var line in _wordsSinceLastRow)
            LeftOut.Add((line, "a remark below the rows"));
        CheckWhole();
    }

    // From the first line, and from the header, to the first row.
    private void LookAbove(int firstRow, int count, RowReader reader)
    {
        for (var i = First; i < firstRow; i++)
        {
            var line = _text.Lines[i];
            var isComment = _signs.IsComment(line, out var rest);
            if (i + 1 == Header.Line)
                continue;
            if (i + 1 > Header.Line && Header.Line > 0 && !isComment && IsUnitsRow(line, i + 1, count))
                continue;
            if (ReynoldsLine.In(isComment ? rest : line, i + 1, _request.ReynoldsUnit) is { } named)
                ReynoldsLines.Add(named);
            else if (isComment || LineSigns.IsEmpty(line) || LineSigns.IsRuling(line))
                continue;
            else if (i + 1 > Header.Line && Header.Line > 0)
                _errors.Add("", new Place(_text.File, i + 1, 1), NotUnderstood(line));
            else if (Cells.WithoutTrailing(Cells.Of(line, Separator), count) is var cells && cells.Length == count
                && reader.Read(cells, i + 1, null).Kind == RowKind.Row)
                _errors.Add("", new Place(_text.File, i + 1, 1),
                    "holds a row above the line that names the columns; --lines says which lines hold the table");
        }
    }

    /// <summary>Of a line between the names of the columns and the first row.</summary>
    public static string NotUnderstood(string line)
        => $"{VisibleText.Quote(line.Trim())} stands between the names of the columns and the first row and is "
        + "not understood; put a comment mark before it, or say with --comment how it begins";

    private void ReadLine(int i, int count, RowReader reader)
    {
        var (line, number) = (_text.Lines[i], i + 1);
        if (LineSigns.IsEmpty(line))
            return;
        if (_signs.IsComment(line, out var rest))
        {
            if (ReynoldsLine.In(rest, number, _request.ReynoldsUnit) is { } commented)
                ReynoldsLines.Add(commented);
            else if (Cells.WithoutTrailing(Cells.Of(rest, Separator), count) is var row && row.Length == count
                && reader.Read(row, number, null).Kind == RowKind.Row)
                LeftOut.Add((number, "a row behind a comment mark"));
            return;
        }
        var cells = Cells.WithoutTrailing(Cells.Of(_signs.WithoutRemark(line), Separator), count);
        var numbers = cells.Count(cell => ForeignNumber.LooksLikeOne(cell.Text));
        var isMeantAsRow = numbers >= 2 || numbers > 0 && ForeignNumber.LooksLikeOne(cells[0].Text) || !IsWords(line);
        if (isMeantAsRow && !ForeignNumber.LooksLikeOne(cells[0].Text) && ReynoldsLine.In(line, number, _request.ReynoldsUnit) is { } named
            && (cells.Length != count || reader.Read(cells, number, null).Kind == RowKind.Broken))
            ReynoldsLines.Add(named);
        else if (cells.Length == count && isMeantAsRow)
            TakeRow(cells, number, reader);
        else if (!isMeantAsRow && IsKnown(line, number, count))
            return;
        else if (isMeantAsRow)
            _errors.Add("", new Place(_text.File, number, 1), string.Create(CultureInfo.InvariantCulture,
                $"{cells.Length} values where {(Header.Line > 0 ? $"line {Header.Line} names" : "the first row has")} {count}; "
                    + $"give one a column, or leave the line out by --lines or a comment mark"));
        else
            _wordsSinceLastRow.Add(number);
    }

    // More digits than letters: a row that something happened to.
    private static bool IsWords(string line) => LineSigns.IsRuling(line)
        || line.Count(char.IsLetter) is >= 2 and var letters && letters >= line.Count(char.IsDigit)
        || !line.Any(char.IsDigit);

    // A line of no numbers that has its sense; another is a remark.
    private bool IsKnown(string line, int number, int count)
    {
        if (LineSigns.IsRuling(line) || Header.IsRepeatedBy(line, Separator) || Header.IsRepeatedBy(_signs.WithoutEnd(line), Separator)
            || IsUnitsRow(line, number, count))
            return true;
        if (Header.Of(line, number, Separator, 0, _request) is not null)
            _errors.Add("", new Place(_text.File, number, 1), Header.Line > 0
                ? string.Create(CultureInfo.InvariantCulture, $"names other columns than line {Header.Line}; --lines says which lines hold the table")
                : "names columns below the first row; --lines says which lines hold the table");
        else if (ReynoldsLine.In(line, number, _request.ReynoldsUnit) is { } named)
            ReynoldsLines.Add(named);
        else
            return false;
        return true;
    }

    private void TakeRow(ImmutableArray<Cell> cells, int number, RowReader reader)
    {
        var read = reader.Read(cells, number, _errors.Add);
        if (read.Section is var (section, at))
            _sections.TryAdd(section, at);
        HasForeignMinus |= read.HasForeignMinus;
        _showsItsDecimals |= read.ShowsItsDecimals;
        switch (read.Kind)
        {
            case RowKind.Row:
                foreach (var words in _wordsSinceLastRow)
                    _errors.Add("", new Place(_text.File, words, 1),
                        $"{VisibleText.Quote(_text.Lines[words - 1].Trim())} stands between rows, and what it says of "
                        + "those below is not known; put a comment mark before it, say with --comment how it begins, or choose rows with --lines");
                _wordsSinceLastRow.Clear();
                Rows.Add(read.Row);
                _haveDegreeSigns.Add(read.HasDegreeSign);
                foreach (var cell in cells)
                    if (ReynoldsLine.IsNamedIn(cell.Text))
                        _errors.Add("", new Place(_text.File, number, cell.Column),
                            $"{VisibleText.Quote(cell.Text)} names a Reynolds number within a row; put it into a column of its own, "
                            + "or into a line above the rows");
                break;
            case RowKind.Incomplete:
                LeftOut.Add((number, "a value is missing"));
                break;
        }
    }

    private bool IsUnitsRow(string line, int number, int count)
    {
        var cells = Cells.WithoutTrailing(Cells.Of(line, Separator), count);
        if (cells.Length != count || Columns?[ColumnRole.Angle] is not { } angle)
            return false;
        var meaning = UnitWords.Meaning(cells[angle].Text);
        if (meaning is not (UnitMeaning.Degrees or UnitMeaning.Radians))
            return false;
        var unit = meaning == UnitMeaning.Degrees ? AngleUnit.Degrees : AngleUnit.Radians;
        if (Unit is null)
            (Unit, UnitLine) = (unit, number);
        else if (Unit != unit)
            _errors.Add("", new Place(_text.File, number, cells[angle].Column), string.Create(CultureInfo.InvariantCulture,
                $"names another unit of the angle of attack than line {UnitLine}; leave one of them out with --lines"));
        foreach (var role in _request.Needed.Skip(1).Append(ColumnRole.Moment))
            if (Columns[role] is { } place && UnitWords.Meaning(cells[place].Text) != UnitMeaning.None)
                _errors.Add("", new Place(_text.File, number, cells[place].Column),
                    $"names {VisibleText.Quote(cells[place].Text)} as the unit of {ColumnRoleWords.Of(role)}; "
                    + "only ratios are read, so give the table as such");
        return true;
    }
}
