using System.Collections.Immutable;
using System.Security.Cryptography;
using System.Text;

namespace BladeLoads.Studies.Files;

/// <summary>Something in a study's folder that was looked at while the study was read.</summary>
/// <param name="Path">Relative to the study folder; empty for that folder itself.</param>
/// <param name="Stamp">Taken before anything was read; of a folder that was only passed through, its type alone counts.</param>
/// <param name="IsSettled">The stamp can be trusted: while it stays, so does what was read.</param>
/// <param name="Contents">SHA-256 of the bytes of a file, or of the names in a folder; empty where neither was read.</param>
public sealed record SeenEntry(string Path, FileStamp Stamp, bool IsSettled, ImmutableArray<byte> Contents);

/// <summary>
/// All that the reading of a study depended on. Files and folders count by what is in them: their stamps only spare reading them again.
/// </summary>
/// <param name="Root">Absolute path of the study folder.</param>
/// <param name="RealRoot">The same with every link in it followed.</param>
public sealed record StudySight(string Root, string RealRoot, ImmutableArray<SeenEntry> Entries)
{
    /// <summary>
    /// Looks again: null where anything may read differently now; otherwise the same sight, with the stamps of what had to be read anew.
    /// </summary>
    public StudySight? LookAgain(IStudyFiles files, TimeProvider time)
    {
        try
        {
            using var stamps = FolderStamps.Open(Root);
            if (stamps is null || files.RealPath(Root) != RealRoot)
                return null;
            var taken = FileStamp.Now(time);
            ImmutableArray<SeenEntry>.Builder? renewed = null;
            for (var i = 0; i < Entries.Length; i++)
            {
                var entry = Entries[i];
                var stamp = stamps.Of(entry.Path);
                if (stamp.Type != entry.Stamp.Type)
                    return null;
                if (entry.Contents.IsEmpty || entry.IsSettled && stamp == entry.Stamp)
                    continue;
                if (!ContentsOf(files, Path.Join(Root, entry.Path), stamp).AsSpan().SequenceEqual(entry.Contents.AsSpan()))
                    return null;
                renewed ??= Entries.ToBuilder();
                renewed[i] = entry with { Stamp = stamp, IsSettled = stamp.IsSettled(taken) };
            }
            return renewed is null ? this : this with { Entries = renewed.ToImmutable() };
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }

    private static ImmutableArray<byte> ContentsOf(IStudyFiles files, string path, FileStamp stamp) => stamp.Type switch
    {
        EntryType.Folder => HashOfNames(files.Names(path)),
        EntryType.File => [.. SHA256.HashData(files.Read(path, (int)Math.Min(stamp.Size + 1, Array.MaxLength)))],
        _ => [],
    };

    internal static ImmutableArray<byte> HashOfNames(IEnumerable<string> names)
        => [.. SHA256.HashData(Encoding.UTF8.GetBytes(string.Concat(names.Order(StringComparer.Ordinal).Select(name => name + '\0'))))];
}
