using System.Collections.Immutable;
using System.Text.Json;
using System.Text.Json.Serialization;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;

namespace BladeLoads.Batch.Work;

/// <summary>Which result of a case, in two values of its receipt.</summary>
public sealed record ResultIdentity(string Fingerprint, DateTimeOffset SolvedAt)
{
    public static ResultIdentity? Of(string resultFolder)
        => ReceiptFile.Read(resultFolder) is ReceiptReading.Readable { Receipt: var receipt } ? Of(receipt) : null;

    public static ResultIdentity Of(Receipt receipt) => new(receipt.Fingerprint, receipt.SolvedAt);
}

/// <summary>
/// The results that the cases of a run had before it, kept in a file while the run is not finished: a run that was killed at three is
/// carried on by the next, which then tells what moved over both. Its loss costs the comparison of the first part, nothing else.
/// </summary>
public static class UnfinishedRun
{
    private const string FileName = ".unfinished-run.json";
    private const long LargestFile = 64 << 20;

    /// <summary>By case; null for a case without an earlier result. Empty where no run is unfinished, or its file is damaged.</summary>
    public static ImmutableSortedDictionary<string, ResultIdentity?> Read(ResultsFolder results)
    {
        var none = ImmutableSortedDictionary.Create<string, ResultIdentity?>(StringComparer.Ordinal);
        try
        {
            var file = new FileInfo(PathIn(results));
            if (!file.Exists || file.Length > LargestFile)
                return none;
            var read = JsonSerializer.Deserialize(File.ReadAllBytes(file.FullName), UnfinishedRunJson.Default.DictionaryStringResultIdentity);
            return read is null ? none : none.AddRange(read.Where(r => ResultsFolder.Objection(r.Key) is null));
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException or JsonException)
        {
            return none;
        }
    }

    /// <summary>Written where there is anything to compare with later; a disk that refuses costs no run.</summary>
    public static void Write(ResultsFolder results, ImmutableSortedDictionary<string, ResultIdentity?> before, Publisher publisher)
    {
        if (before.Values.All(b => b is null))
            return;
        try
        {
            publisher.PublishFile(
                PathIn(results), JsonSerializer.SerializeToUtf8Bytes(before.ToDictionary(StringComparer.Ordinal), UnfinishedRunJson.Default.DictionaryStringResultIdentity));
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            // The run itself will meet the same disk, and says so.
        }
    }

    public static void Remove(ResultsFolder results, Publisher publisher) => publisher.Remove(PathIn(results));

    private static string PathIn(ResultsFolder results) => Path.Join(results.Replaced, FileName);
}

[JsonSourceGenerationOptions(
    PropertyNamingPolicy = JsonKnownNamingPolicy.SnakeCaseLower, RespectNullableAnnotations = true, RespectRequiredConstructorParameters = true)]
[JsonSerializable(typeof(Dictionary<string, ResultIdentity?>))]
internal sealed partial class UnfinishedRunJson : JsonSerializerContext;
