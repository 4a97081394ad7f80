using System.Collections.Immutable;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using BladeLoads.Batch.Plan;
using BladeLoads.Commands;
using BladeLoads.Rotor.Operation;

namespace BladeLoads.Screen;

/// <summary>A plan for scripts. The keys are a promise (docs/formats.md); further ones may follow.</summary>
internal static class PlanJson
{
    private const int Format = 1;

    /// <param name="study">The name of the study.</param>
    /// <param name="folder">Where its results lie.</param>
    public static void Write(ImmutableArray<CaseStanding> cases, string study, string folder, TextWriter output)
    {
        using var stream = new MemoryStream();
        using (var json = new Utf8JsonWriter(stream, new JsonWriterOptions { Indented = true, NewLine = "\n", Encoder = JavaScriptEncoder.Default }))
        {
            json.WriteStartObject();
            json.WriteNumber("format", Format);
            json.WriteString("study", study);
            json.WriteString("results", folder);
            json.WriteString("tool_version", CommandLine.ToolVersion);
            json.WriteNumber("solver_version", SolverVersion.Number);
            json.WriteNumber("to_solve", cases.Count(c => c.NeedsSolving));
            json.WriteNumber("to_reuse", cases.Count(c => c.IsThereAlready));
            json.WriteStartArray("cases");
            foreach (var standing in cases)
                WriteCase(json, standing);
            json.WriteEndArray();
            json.WriteEndObject();
        }
        output.WriteLine(Encoding.UTF8.GetString(stream.GetBuffer().AsSpan(0, (int)stream.Length)));
    }

    private static void WriteCase(Utf8JsonWriter json, CaseStanding standing)
    {
        json.WriteStartObject();
        json.WriteString("name", standing.Name);
        if (standing.State is not CaseState.Blocked)
        {
            json.WriteString("title", standing.Title);
            json.WriteString("fingerprint", standing.Fingerprint);
        }
        json.WriteString("state", standing.State.Word);
        json.WriteStartArray("reasons");
        switch (standing.State)
        {
            case CaseState.OutOfDate { Reasons: var reasons }:
                WriteReasons(json, reasons);
                break;
            case CaseState.Damaged { Reasons: var reasons }:
                WriteReasons(json, reasons);
                break;
            case CaseState.Current:
                break;
            default:
                WriteState(json, standing.State);
                break;
        }
        json.WriteEndArray();
        json.WriteEndObject();
    }

    private static void WriteReasons(Utf8JsonWriter json, ImmutableArray<StaleReason> reasons)
    {
        foreach (var reason in reasons)
        {
            json.WriteStartObject();
            WriteFields(json, reason);
            json.WriteString("sentence", reason.Sentence);
            json.WriteEndObject();
        }
    }

    private static void WriteState(Utf8JsonWriter json, CaseState state)
    {
        json.WriteStartObject();
        switch (state)
        {
            case CaseState.Missing:
                json.WriteString("kind", "no-result");
                break;
            case CaseState.Retitled retitled:
                json.WriteString("kind", "title-changed");
                json.WriteString("from", retitled.From);
                json.WriteString("to", retitled.To);
                break;
            case CaseState.CurrentAgain { Found: var found }:
                WriteFound(json, "in-replaced", found);
                break;
            case CaseState.Reusable { Found: var found }:
                WriteFound(json, "result-of-other-case", found);
                break;
            case CaseState.Failed { Failure: var failure }:
                json.WriteString("kind", "failed-before");
                json.WriteString("failed_at", failure.FailedAt);
                json.WriteString("reason", failure.Reason);
                break;
            case CaseState.Blocked { Finding: var finding }:
                json.WriteString("kind", "input-error");
                if (finding is not null)
                {
                    json.WriteString("file", finding.File);
                    json.WriteNumber("line", finding.Line);
                    json.WriteNumber("column", finding.Column);
                    json.WriteString("text", finding.Text);
                }
                break;
        }
        json.WriteString("sentence", state.Reason);
        json.WriteEndObject();
    }

    private static void WriteFound(Utf8JsonWriter json, string kind, FoundResult found)
    {
        json.WriteString("kind", kind);
        json.WriteString("case", found.Case);
        json.WriteString("folder", found.Folder);
        json.WriteString("solved_at", found.SolvedAt);
    }

    private static void WriteFields(Utf8JsonWriter json, StaleReason reason)
    {
        switch (reason)
        {
            case StaleReason.ValueChanged r:
                Write(json, "value-changed", ("key", r.Key), ("from", r.From), ("to", r.To));
                break;
            case StaleReason.ValueAdded r:
                Write(json, "value-added", ("key", r.Key), ("to", r.To));
                break;
            case StaleReason.ValueRemoved r:
                Write(json, "value-removed", ("key", r.Key), ("from", r.From));
                break;
            case StaleReason.AirFollowed r:
                Write(json, "air-followed");
                WriteValues(json, r.Values);
                break;
            case StaleReason.TableRowsChanged r:
                Write(json, "table-rows-changed", ("table", r.Table), ("unit", r.Unit));
                WriteRows(json, r);
                break;
            case StaleReason.TableChanged r:
                Write(json, "table-changed", ("table", r.Table));
                break;
            case StaleReason.TableAdded r:
                Write(json, "table-added", ("table", r.Table));
                break;
            case StaleReason.TableRemoved r:
                Write(json, "table-removed", ("table", r.Table));
                break;
            case StaleReason.SolverChanged r:
                Write(json, "solver-changed");
                json.WriteNumber("from", r.From);
                json.WriteNumber("to", r.To);
                break;
            case StaleReason.FingerprintChanged:
                Write(json, "fingerprint-form-changed");
                break;
            case StaleReason.ReceiptUnreadable r:
                Write(json, "receipt-unreadable", ("text", r.Why));
                break;
            case StaleReason.FileMissing r:
                Write(json, "file-missing", ("file", r.Name));
                break;
            case StaleReason.FileSizeChanged r:
                Write(json, "file-size-changed", ("file", r.Name));
                json.WriteNumber("from", r.From);
                json.WriteNumber("to", r.To);
                break;
            default:
                throw new InvalidOperationException($"a reason without keys: {reason.GetType().Name}");
        }
    }

    private static void WriteValues(Utf8JsonWriter json, ImmutableArray<StaleReason.ValueChanged> values)
    {
        json.WriteStartArray("values");
        foreach (var value in values)
        {
            json.WriteStartObject();
            json.WriteString("key", value.Key);
            json.WriteString("from", value.From);
            json.WriteString("to", value.To);
            json.WriteEndObject();
        }
        json.WriteEndArray();
    }

    private static void WriteRows(Utf8JsonWriter json, StaleReason.TableRowsChanged reason)
    {
        json.WriteStartArray("rows");
        foreach (var change in reason.Rows)
        {
            json.WriteStartObject();
            json.WriteString("what", change.What);
            json.WriteNumber("count", change.Rows);
            json.WriteNumber("from", change.From);
            json.WriteNumber("to", change.To);
            WriteNumbers(json, change.Reynolds);
            json.WriteEndObject();
        }
        json.WriteEndArray();
        json.WriteStartArray("whole_reynolds");
        foreach (var change in reason.Reynolds)
        {
            json.WriteStartObject();
            json.WriteString("what", change.What);
            json.WriteNumber("count", change.Rows);
            WriteNumbers(json, change.Reynolds);
            json.WriteEndObject();
        }
        json.WriteEndArray();
    }

    private static void WriteNumbers(Utf8JsonWriter json, ImmutableArray<double> reynolds)
    {
        json.WriteStartArray("reynolds");
        foreach (var number in reynolds)
            json.WriteNumberValue(number);
        json.WriteEndArray();
    }

    private static void Write(Utf8JsonWriter json, string kind, params ReadOnlySpan<(string Name, string Value)> fields)
    {
        json.WriteString("kind", kind);
        foreach (var (name, value) in fields)
            json.WriteString(name, value);
    }
}
