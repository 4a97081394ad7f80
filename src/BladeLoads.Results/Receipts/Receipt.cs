using System.Security.Cryptography;
using System.Text.Json.Serialization;
using BladeLoads.Studies;

namespace BladeLoads.Results.Receipts;

/// <summary>A file of a result, as it was written.</summary>
/// <param name="Size">Bytes.</param>
/// <param name="Sha256">64 lower-case hexadecimal digits.</param>
public sealed record ResultFile(string Name, long Size, string Sha256)
{
    public static ResultFile Of(string name, ReadOnlySpan<byte> bytes)
        => new(name, bytes.Length, Convert.ToHexStringLower(SHA256.HashData(bytes)));
}

/// <summary>
/// What a result was made from, when, and by which version: <c>receipt.json</c>, the last word on whether a result is current.
/// </summary>
/// <param name="Format">The version of this file's own form.</param>
/// <param name="Values">Every value that determines the result, by key; SHA-256 stands for tables.</param>
/// <param name="Seconds">How long the case took to solve and write, s.</param>
/// <param name="Files">Every file of the result but this one.</param>
/// <param name="Summary">The figures of the summary, in SI units, so that none is lost on the way to a table.</param>
/// <param name="ReusedFrom">
/// The folder, in the study's results, of the result of another name or title that this one is a copy of; null where it was solved.
/// </param>
public sealed record Receipt(
    int Format,
    string Study,
    string Case,
    string Title,
    string Fingerprint,
    int SolverVersion,
    string ToolVersion,
    DateTimeOffset SolvedAt,
    double Seconds,
    IReadOnlyDictionary<string, string> Values,
    IReadOnlyList<InputFile> Inputs,
    IReadOnlyList<ResultFile> Files,
    CaseSummary Summary,
    string Caution,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? ReusedFrom = null)
{
    public const string FileName = "receipt.json";

    public const int CurrentFormat = 1;
}

/// <summary>A case that could not be solved: <c>failures/(case).json</c>, removed when it succeeds.</summary>
/// <param name="Reason">One sentence, in the user's words.</param>
/// <param name="Log">What its log said, line by line.</param>
public sealed record FailureRecord(
    string Case, string Title, string Fingerprint, int SolverVersion, DateTimeOffset FailedAt, string Reason, IReadOnlyList<string> Log);

/// <summary>The form of the JSON files beside the results: names in snake case, plain ASCII, missing members refused.</summary>
[JsonSourceGenerationOptions(
    WriteIndented = true, NewLine = "\n", PropertyNamingPolicy = JsonKnownNamingPolicy.SnakeCaseLower,
    RespectNullableAnnotations = true, RespectRequiredConstructorParameters = true)]
[JsonSerializable(typeof(Receipt))]
[JsonSerializable(typeof(FailureRecord))]
internal sealed partial class ReceiptJson : JsonSerializerContext;
