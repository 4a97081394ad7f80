using BladeLoads.Studies.Tables;
using CsvHelper;

namespace BladeLoads.Results.Tables;

/// <summary>
/// Writes our CSV tables: comma, LF, UTF-8 without a mark, numbers in the invariant culture with 12 significant digits at
/// most, an empty cell where there is no number, and no text that a spreadsheet would run as a formula.
/// </summary>
internal sealed class TableWriter : IDisposable
{
    private static readonly CsvWriterOptions Options = CsvWriterOptions.Default with
    {
        Separator = ',',
        NewLine = "\n",
        Injection = CsvInjection.Escape,
        // The writer's own list lacks the line feed.
        InjectionCharacters = "=+-@\t\r\n",
    };

    private readonly MemoryStream _bytes = new();
    private readonly CsvWriter _csv;

    public TableWriter(ReadOnlySpan<string> columns)
    {
        _csv = CsvWriter.Create(_bytes, Options, leaveOpen: true);
        foreach (var column in columns)
            _csv.WriteField(column);
        _csv.EndRecord();
    }

    public void Text(string? text) => _csv.WriteField(text);

    public void Number(double? value)
    {
        if (value is { } number && double.IsFinite(number))
            _csv.WriteField(TwelveDigits.Of(number));   // -0 would read as a difference between two equal results
        else
            _csv.WriteField((string?)null);
    }

    public void EndRow() => _csv.EndRecord();

    /// <summary>The whole table; nothing can be added after.</summary>
    public byte[] ToBytes()
    {
        _csv.Dispose();
        return _bytes.ToArray();
    }

    public void Dispose()
    {
        _csv.Dispose();
        _bytes.Dispose();
    }
}
