using System.Collections.Immutable;
using System.Globalization;
using System.Text.Json;
using BladeLoads.Results.Tables;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Results.PolarCheck;

/// <summary>A table that is written as a file and as JSON: the same columns and keys, the same values.</summary>
/// <param name="Name">Of the file, without its ending, and of the key.</param>
/// <param name="Rows">A value a column: text, a number, or null for a blank.</param>
public sealed record ReportTable(string Name, ImmutableArray<string> Columns, ImmutableArray<ImmutableArray<object?>> Rows)
{
    internal const string Ending = ".csv";

    public string FileName => Name + Ending;

    public byte[] ToCsv()
    {
        using var table = new TableWriter(Columns.AsSpan());
        foreach (var row in Rows)
        {
            foreach (var value in row)
                if (value is string text)
                    table.Text(text);
                else
                    table.Number(Number(value));
            table.EndRow();
        }
        return table.ToBytes();
    }

    /// <summary>As a property of the object that is being written: a list of objects, a row each.</summary>
    public void WriteTo(Utf8JsonWriter json)
    {
        json.WriteStartArray(Name.Replace('-', '_'));
        foreach (var row in Rows)
        {
            json.WriteStartObject();
            for (var i = 0; i < Columns.Length; i++)
                if (row[i] is string text)
                    json.WriteString(Columns[i], text);
                else if (Number(row[i]) is { } number)
                    json.WriteNumber(Columns[i], TwelveDigits.Of(number));
                else
                    json.WriteNull(Columns[i]);
            json.WriteEndObject();
        }
        json.WriteEndArray();
    }

    private static double? Number(object? value)
        => value is null ? null : Convert.ToDouble(value, CultureInfo.InvariantCulture) is var number && double.IsFinite(number) ? number : null;
}
