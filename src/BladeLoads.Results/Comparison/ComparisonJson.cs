using System.Text;
using System.Text.Json;

namespace BladeLoads.Results.Comparison;

/// <summary>A comparison as JSON, for scripts. The keys are a promise (docs/formats.md).</summary>
public static class ComparisonJson
{
    public const int Format = 1;

    /// <param name="old">Where the older results lie.</param>
    /// <param name="now">Where the newer ones lie.</param>
    public static string Write(string old, string now, IEnumerable<CaseComparison> comparisons)
    {
        using var bytes = new MemoryStream();
        using (var json = new Utf8JsonWriter(bytes, new JsonWriterOptions { Indented = true, NewLine = "\n" }))
        {
            json.WriteStartObject();
            json.WriteNumber("format", Format);
            json.WriteString("old", old);
            json.WriteString("new", now);
            json.WriteStartArray("cases");
            foreach (var comparison in comparisons)
                Case(json, comparison);
            json.WriteEndArray();
            json.WriteString("caution", Wording.Caution.Text);
            json.WriteEndObject();
        }
        return Encoding.UTF8.GetString(bytes.ToArray());
    }

    private static void Case(Utf8JsonWriter json, CaseComparison comparison)
    {
        json.WriteStartObject();
        json.WriteString("case", comparison.Case);
        json.WriteString("old_case", comparison.OldCase);
        json.WriteString("comparison", comparison.Word);
        if (comparison is CaseComparison.NotCompared { Note: var note })
            json.WriteString("note", note);
        else if (comparison is CaseComparison.Compared compared)
            Compared(json, compared);
        json.WriteEndObject();
    }

    private static void Compared(Utf8JsonWriter json, CaseComparison.Compared compared)
    {
        json.WriteString("why", compared.Why);
        json.WriteStartArray("figures");
        foreach (var change in compared.Changes)
            Figure(json, change);
        json.WriteEndArray();
        json.WriteStartArray("marks");
        foreach (var mark in compared.Marks)
        {
            json.WriteStartObject();
            json.WriteString("mark", mark.Mark);
            Number(json, "old_points", mark.OldPoints);
            Number(json, "new_points", mark.NewPoints);
            Numbers(json, "new_at_m_s", mark.NewAt);
            Numbers(json, "lost_at_m_s", mark.LostAt);
            json.WriteEndObject();
        }
        json.WriteEndArray();
        json.WriteStartObject("wind_speeds");
        json.WriteNumber("in_both", compared.WindSpeeds.Common);
        Numbers(json, "only_old_m_s", compared.WindSpeeds.OnlyOld);
        Numbers(json, "only_new_m_s", compared.WindSpeeds.OnlyNew);
        json.WriteEndObject();
        json.WriteStartArray("doubts");
        foreach (var doubt in compared.Doubts)
            json.WriteStringValue(doubt);
        json.WriteEndArray();
    }

    private static void Figure(Utf8JsonWriter json, FigureChange change)
    {
        json.WriteStartObject();
        json.WriteString("figure", change.Name);
        json.WriteString("unit", change.Unit);
        Number(json, "old", change.Old?.Value);
        Number(json, "old_wind_speed_m_s", change.Old?.WindSpeed);
        Number(json, "new", change.New?.Value);
        Number(json, "new_wind_speed_m_s", change.New?.WindSpeed);
        Number(json, "difference", change.Difference);
        Number(json, "difference_percent", change.Percent);
        json.WriteBoolean("sign_turned", change.HasTurned);
        json.WriteEndObject();
    }

    private static void Number(Utf8JsonWriter json, string key, double? value)
    {
        if (value is { } number)
            json.WriteNumber(key, number);
        else
            json.WriteNull(key);
    }

    private static void Numbers(Utf8JsonWriter json, string key, IEnumerable<double> values)
    {
        json.WriteStartArray(key);
        foreach (var value in values)
            json.WriteNumberValue(value);
        json.WriteEndArray();
    }
}
