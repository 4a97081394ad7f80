using System.Text.Json;
using System.Text.Json.Serialization;
using BladeLoads.Results.Receipts;

namespace BladeLoads.Results.Keeping;

/// <summary>A case in a set that was kept.</summary>
/// <param name="State">How its result stood then, in the plan's words; one without a result is named too.</param>
/// <param name="Fingerprint">Of its result; null where there is none.</param>
public sealed record KeptCase(string Case, string State, string? Fingerprint, int? SolverVersion, DateTimeOffset? SolvedAt);

/// <summary><c>kept.json</c>: what a kept set holds, and when it was set aside.</summary>
/// <param name="Format">The version of this file's own form.</param>
/// <param name="Files">What stands beside the results; null in sets kept before they were told.</param>
public sealed record KeptRecord(
    int Format, string Name, string Study, DateTimeOffset KeptAt, string ToolVersion, IReadOnlyList<KeptCase> Cases, string Caution,
    IReadOnlyList<ResultFile>? Files = null)
{
    public const string FileName = "kept.json";

    public const int CurrentFormat = 1;

    /// <summary>The record in the folder of a kept set; null where there is none that can be read.</summary>
    public static KeptRecord? Read(string folder)
    {
        try
        {
            return JsonSerializer.Deserialize(File.ReadAllBytes(Path.Join(folder, FileName)), KeptJson.Default.KeptRecord);
        }
        catch (Exception e) when (e is JsonException or IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }

    /// <summary>The file, UTF-8.</summary>
    public byte[] ToBytes() => [.. JsonSerializer.SerializeToUtf8Bytes(this, KeptJson.Default.KeptRecord), (byte)'\n'];
}

[JsonSourceGenerationOptions(
    WriteIndented = true, NewLine = "\n", PropertyNamingPolicy = JsonKnownNamingPolicy.SnakeCaseLower,
    RespectNullableAnnotations = true, RespectRequiredConstructorParameters = true)]
[JsonSerializable(typeof(KeptRecord))]
internal sealed partial class KeptJson : JsonSerializerContext;
