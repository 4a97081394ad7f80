using System.Buffers.Text;
using System.Collections.Immutable;
using BladeLoads.Results.Tables;
using CsvHelper;

namespace BladeLoads.Results.Comparison;

/// <summary>A row of a written power curve, in the units of its file.</summary>
/// <param name="marks">The words of the status cell.</param>
/// <param name="columns">The place of each column in <paramref name="numbers"/>.</param>
/// <param name="numbers">Null where a cell is blank or holds words.</param>
public sealed class StoredPoint(double windSpeed, ImmutableArray<string> marks, Dictionary<string, int> columns, double?[] numbers)
{
    /// <summary>m/s.</summary>
    public double WindSpeed { get; } = windSpeed;

    public ImmutableArray<string> Marks { get; } = marks;

    /// <summary>Null where there is no such column, or no number in it.</summary>
    public double? this[string column] => columns.TryGetValue(column, out var place) ? numbers[place] : null;
}

/// <summary>A <c>power-curve.csv</c> read back, in the units of the file, by rising wind speed.</summary>
public sealed record StoredCurve(ImmutableArray<StoredPoint> Points)
{
    // A curve has some hundred kB at most; more than this is not one, and is not worth the memory.
    private const long LargestCurve = 64 << 20;

    private const string WindSpeed = "wind_speed_m_s";
    private const string Status = "status";
    private const string Region = "region";
    private const string PointName = "point";

    private static readonly CsvReaderOptions Options = new()
    {
        Separator = ',',
        HasHeader = false,
        TrackLineNumbers = true,
        AllowLineBreaksInQuotes = false,
    };

    /// <summary>Reads the curve in the folder of a result.</summary>
    /// <exception cref="UnreadableCurveException">There is none, or it is not one; the message says why in one phrase.</exception>
    public static StoredCurve Read(string resultFolder)
    {
        var path = Path.Join(resultFolder, CurveTable.FileName);
        try
        {
            var file = new FileInfo(path);
            if (!file.Exists)
                throw new UnreadableCurveException($"{CurveTable.FileName} is not there");
            return file.Length <= LargestCurve
                ? Parse(File.ReadAllBytes(path)) : throw new UnreadableCurveException($"{CurveTable.FileName} is too large for a power curve");
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new UnreadableCurveException($"{CurveTable.FileName} cannot be read: {Publishing.DiskTrouble.ReadingReason(e)}");
        }
    }

    /// <summary>The design points of a result; none where there is no table of them, or none that can be read.</summary>
    public static StoredCurve ReadDesignPoints(string resultFolder)
    {
        var path = Path.Join(resultFolder, DesignPointsTable.FileName);
        try
        {
            return File.Exists(path) && new FileInfo(path).Length <= LargestCurve ? Parse(File.ReadAllBytes(path)) : new StoredCurve([]);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException or UnreadableCurveException)
        {
            return new StoredCurve([]);
        }
    }

    /// <exception cref="UnreadableCurveException">As for <see cref="Read"/>.</exception>
    public static StoredCurve Parse(byte[] utf8)
    {
        try
        {
            using var rows = CsvReader.Create(utf8, Options);
            if (!rows.Read())
                throw new UnreadableCurveException($"{CurveTable.FileName} is empty");
            var columns = new Dictionary<string, int>(StringComparer.Ordinal);
            for (var i = 0; i < rows.FieldCount; i++)
                columns[rows.GetString(i)] = i;
            if (!columns.ContainsKey(WindSpeed) || columns.Count != rows.FieldCount)
                throw new UnreadableCurveException($"{CurveTable.FileName} is no power curve: its columns are not those of one");
            var points = ImmutableArray.CreateBuilder<StoredPoint>();
            while (rows.Read())
                points.Add(Point(rows, columns));
            return new StoredCurve([.. points.OrderBy(p => p.WindSpeed)]);
        }
        catch (Exception e) when (e is CsvFormatException or CsvValidationException or FormatException)
        {
            throw new UnreadableCurveException($"{CurveTable.FileName} is damaged");
        }
    }

    private static StoredPoint Point(CsvReader row, Dictionary<string, int> columns)
    {
        if (row.FieldCount != columns.Count)
            throw Damaged(row, FormattableString.Invariant($"has {row.FieldCount} values where the header names {columns.Count} columns"));
        var numbers = new double?[columns.Count];
        ImmutableArray<string> marks = [];
        foreach (var (column, place) in columns)
            if (column == Status)
                marks = [.. row.GetString(place).Split(' ', StringSplitOptions.RemoveEmptyEntries)];
            else if (column is not (Region or PointName))
                numbers[place] = Number(row, place);
        return numbers[columns[WindSpeed]] is { } windSpeed
            ? new StoredPoint(windSpeed, marks, columns, numbers) : throw Damaged(row, "has no wind speed");
    }

    private static double? Number(CsvReader row, int column)
    {
        var cell = row.GetSpan(column);
        if (cell.IsEmpty)
            return null;
        return Utf8Parser.TryParse(cell, out double number, out var read) && read == cell.Length && double.IsFinite(number)
            ? number : throw Damaged(row, "holds what is no number");
    }

    private static UnreadableCurveException Damaged(CsvReader row, string what)
        => new(FormattableString.Invariant($"{CurveTable.FileName} is damaged: line {row.LineNumber} {what}"));
}

/// <summary>A power curve cannot be read back. The message says why in one phrase.</summary>
public sealed class UnreadableCurveException(string message) : Exception(message);
