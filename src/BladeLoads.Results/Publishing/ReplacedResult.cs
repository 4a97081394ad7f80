using System.Collections.Immutable;
using System.Globalization;
using System.Text.RegularExpressions;
using BladeLoads.Results.Receipts;

namespace BladeLoads.Results.Publishing;

/// <summary>
/// A result that a rerun replaced: <c>replaced/(case)/(time)~(beginning of the fingerprint)/</c>. Its name tells when it was solved and
/// from what, so that no receipt need be opened to look for one.
/// </summary>
/// <param name="SolvedAt">To the second, UTC.</param>
/// <param name="FingerprintStart">The first 12 digits of the fingerprint; <c>no-receipt</c> where nothing says from what it was made,
/// <c>damaged</c> for one that was not what had been written.</param>
public sealed partial record ReplacedResult(string Case, string Folder, DateTime SolvedAt, string FingerprintStart)
{
    private const string TimeForm = "yyyyMMdd-HHmmss";
    private const string NoReceipt = "no-receipt";
    private const string Damaged = "damaged";
    private const int FingerprintDigits = 12;
    private const int MostOfOneName = 10_000;

    /// <summary>Whether it was a whole result when it was replaced, as far as could be told.</summary>
    public bool IsResult => FingerprintStart is not (NoReceipt or Damaged);

    /// <summary>Whether it can be the result of that fingerprint; its receipt has the last word.</summary>
    public bool MayBeOf(string fingerprint) => FingerprintStart == StartOf(fingerprint);

    /// <summary>The replaced results of a case, the one solved last first; none where there is no such folder.</summary>
    public static ImmutableArray<ReplacedResult> Of(ResultsFolder results, string caseName) => Of(results.ReplacedOf(caseName), caseName);

    /// <summary>The replaced results of every case that has one, by case, the one solved last first.</summary>
    public static ImmutableArray<ReplacedResult> All(ResultsFolder results) => Directory.Exists(results.Replaced)
        ? [.. Directory.EnumerateDirectories(results.Replaced).Order(StringComparer.Ordinal).SelectMany(f => Of(f, Path.GetFileName(f)))]
        : [];

    /// <summary>Moves the folder of a result there, whole, in one step.</summary>
    /// <param name="isDamaged">It is not what was written, and must not be taken for a result again.</param>
    /// <exception cref="IOException">The system refused; the folder is where it was.</exception>
    /// <exception cref="UnauthorizedAccessException">As above.</exception>
    internal static void SetAside(string folder, string caseName, ResultsFolder results, IDisk disk, bool isDamaged = false)
    {
        disk.CreateFolder(results.ReplacedOf(caseName));
        var name = NameOf(folder, isDamaged);
        for (var n = 1; n <= MostOfOneName; n++)
        {
            var numbered = n == 1 ? name : string.Create(CultureInfo.InvariantCulture, $"{name}-{n}");
            if (disk.TryRename(folder, Path.Join(results.ReplacedOf(caseName), numbered)))
                return;
        }
        throw new IOException($"too many results named '{name}'");
    }

    private static string NameOf(string folder, bool isDamaged)
    {
        var (time, start) = ReceiptFile.Read(folder) is ReceiptReading.Readable { Receipt: var receipt }
            ? (receipt.SolvedAt.UtcDateTime, isDamaged ? Damaged : StartOf(receipt.Fingerprint))
            : (Directory.GetLastWriteTimeUtc(folder), NoReceipt);
        return string.Create(CultureInfo.InvariantCulture, $"{time.ToString(TimeForm, CultureInfo.InvariantCulture)}~{start}");
    }

    // A receipt says what it likes: its fingerprint becomes part of a name only where it can.
    private static string StartOf(string fingerprint)
    {
        var start = fingerprint[..Math.Min(fingerprint.Length, FingerprintDigits)];
        return start.Length > 0 && start.All(char.IsAsciiLetterOrDigit) ? start : NoReceipt;
    }

    private static ImmutableArray<ReplacedResult> Of(string folder, string caseName)
    {
        if (!Directory.Exists(folder))
            return [];
        return
        [
            .. Directory.EnumerateDirectories(folder)
                .Select(path => (Path: path, Name: ResultName().Match(Path.GetFileName(path))))
                .Where(found => found.Name.Success)
                .Select(found => (
                    found.Path, Start: found.Name.Groups["start"].Value, Number: found.Name.Groups["number"].Value,
                    Time: TimeOf(found.Name.Groups["time"].Value)))
                .Where(found => found.Time is not null)
                .OrderByDescending(found => found.Time)
                .ThenByDescending(found => found.Number.Length).ThenByDescending(found => found.Number, StringComparer.Ordinal)
                .Select(found => new ReplacedResult(caseName, found.Path, found.Time!.Value, found.Start)),
        ];
    }

    private static DateTime? TimeOf(string text) => DateTime.TryParseExact(
        text, TimeForm, CultureInfo.InvariantCulture, DateTimeStyles.AssumeUniversal | DateTimeStyles.AdjustToUniversal, out var time)
        ? time : null;

    [GeneratedRegex(@"^(?<time>\d{8}-\d{6})~(?<start>no-receipt|[0-9A-Za-z]{1,12})(-(?<number>\d+))?$")]
    private static partial Regex ResultName();
}
