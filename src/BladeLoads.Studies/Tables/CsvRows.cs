using System.Collections.Immutable;
using System.Globalization;
using System.Text;
using BladeLoads.Studies.Files;
using CsvHelper;

namespace BladeLoads.Studies.Tables;

/// <summary>A column that a table may have.</summary>
internal readonly record struct Column(string Name, bool IsRequired);

/// <summary>The rows of a CSV table, read forward once. Columns in any order; lines that begin with # are comments.</summary>
internal sealed class CsvRows : IDisposable
{
    private readonly InputText _input;
    private readonly TableErrors _errors;
    private readonly CsvReader _reader;
    private ImmutableArray<string> _header = [];
    private ImmutableArray<Place> _headerPlaces = [];
    private Dictionary<string, int> _places = [];
    private bool _headerIsSound;

    /// <param name="findings">Receives what is wrong, at its cell.</param>
    public CsvRows(InputText input, Findings findings)
    {
        _input = input;
        _errors = new TableErrors(findings);
        _reader = CsvReader.Create(input.Utf8, new CsvReaderOptions
        {
            Separator = ',',
            CommentPrefix = '#',
            HasHeader = false,
            TrimWhitespace = true,
            TrackLineNumbers = true,
            AllowLineBreaksInQuotes = false,
        });
    }

    public bool HasErrors => _errors.Any;

    /// <summary>Number of the current line in the file.</summary>
    public int Line => (int)_reader.LineNumber;

    public bool Has(string column) => _places.ContainsKey(column);

    /// <summary>Reads the row of column names; false, with the reasons reported, when it does not name the columns.</summary>
    public bool ReadHeader(ImmutableArray<Column> columns)
    {
        if (!ReadRow())
        {
            Error(new Place(_input.File, 0, 0),
                $"has no row of column names; begin with {Names(columns.Where(c => c.IsRequired))}");
            return false;
        }
        _header = [.. Enumerable.Range(0, _reader.FieldCount).Select(_reader.GetString)];
        _headerPlaces = [.. Enumerable.Range(0, _reader.FieldCount).Select(Field)];
        if (_header is [var spaced] && SeparatedBySpaces(spaced, columns))
        {
            Error(Field(0), "columns are separated by spaces; separate them by ','");
            return false;
        }
        if (_header is [var only] && only.AsSpan().IndexOfAny(';', '\t') is >= 0 and var at)
        {
            Error(Field(0), $"columns are separated by {(only[at] == ';' ? "';'" : "tabs")}; separate them by ','");
            return false;
        }
        for (var i = 0; i < _header.Length; i++)
        {
            var name = _header[i];
            if (!columns.Any(c => c.Name == name))
                Error(Field(i), UnknownColumn(name, columns));
            else if (!_places.TryAdd(name, i))
                Error(Field(i), $"column '{name}' is there twice; keep one");
        }
        if (!HasErrors)
            foreach (var missing in columns.Where(c => c.IsRequired && !_places.ContainsKey(c.Name)))
                Error(new Place(_input.File, Line, 1), $"no column '{missing.Name}'; the table has {string.Join(", ", _header)}");
        _headerIsSound = !HasErrors;
        return _headerIsSound;
    }

    /// <summary>
    /// Goes to the next row with one value a column; rows with more or fewer are passed over, and reported where the header is
    /// sound.
    /// </summary>
    public bool Read()
    {
        while (!_errors.AreTooMany && ReadRow())
        {
            if (_reader.FieldCount == _header.Length)
                return true;
            if (_headerIsSound)
                Error(new Place(_input.File, Line, 1),
                    $"{Count(_reader.FieldCount, "value")} where the header names {Count(_header.Length, "column")}; "
                    + "give one value a column, and write decimals with a point");
        }
        return false;
    }

    public string Text(string column) => _reader.GetString(_places[column]);

    /// <summary>The number in a cell; NaN, with the reason reported, when there is none.</summary>
    public double Number(string column)
    {
        if (NumberText.TryParse(_reader.GetSpan(_places[column]), out var value))
            return value;
        Error(column, NumberText.Problem(column, Text(column)));
        return double.NaN;
    }

    /// <summary>The place of a cell of the current row, by the column of its first character.</summary>
    public Place Cell(string column) => Field(_places[column]);

    /// <summary>The place of a column's name in the header, once that is read.</summary>
    public Place Header(string column) => _headerPlaces[_places[column]];

    public void Error(string column, string text) => _errors.Add(column, Cell(column), text);

    public void Error(Place at, string text) => _errors.Add("", at, text);

    /// <summary>What to ask of a column if many of its values are wrong in one way.</summary>
    public void Ask(string column, string question) => _errors.Ask(column, question);

    /// <summary>Ends the reading: errors that were held back as more of a kind are told by their number.</summary>
    public void Dispose()
    {
        _errors.TellTheRest();
        _reader.Dispose();
    }

    private bool ReadRow()
    {
        while (_reader.Read())
        {
            // Spaces before a # and lines of spaces only: no one means a row by them.
            var first = _reader.GetSpan(0);
            if (!(first.StartsWith("#"u8) || first.IsEmpty && _reader.FieldCount == 1))
                return true;
        }
        return false;
    }

    private static bool SeparatedBySpaces(string header, ImmutableArray<Column> columns)
        => header.Split(' ', StringSplitOptions.RemoveEmptyEntries) is { Length: > 1 } names
            && names.All(name => columns.Any(column => column.Name == name));

    private Place Field(int field)
    {
        var column = 1;
        for (var i = 0; i < field; i++)
            column += Encoding.UTF8.GetCharCount(_reader.GetRawSpan(i)) + 1;
        var raw = _reader.GetRawSpan(field);
        return new Place(_input.File, Line, column + (raw.Length - raw.TrimStart(" \t"u8).Length));
    }

    private static string UnknownColumn(string name, ImmutableArray<Column> columns)
    {
        if (name.Length == 0)
            return $"a column has no name; the columns are {Names(columns)}";
        return Nearest.Of(name, columns.Select(c => c.Name)) is { } near
            ? $"unknown column {VisibleText.Quote(name)}; did you mean '{near}'?"
            : $"unknown column {VisibleText.Quote(name)}; the columns are {Names(columns)}";
    }

    private static string Names(IEnumerable<Column> columns) => string.Join(", ", columns.Select(c => c.Name));

    private static string Count(int count, string noun)
        => string.Create(CultureInfo.InvariantCulture, $"{count} {noun}{(count == 1 ? "" : "s")}");
}
