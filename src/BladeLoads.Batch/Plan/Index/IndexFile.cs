using System.Collections.Immutable;
using System.Globalization;
using System.Security.Cryptography;
using System.Text;
using BladeLoads.Studies.Files;

namespace BladeLoads.Batch.Plan.Index;

/// <summary>The file of the index: everything in it, and then the SHA-256 of that, so that a cut or changed file is known for one.</summary>
internal static class IndexFile
{
    private const string Form = "bladeloads plan index 1";
    private const long Largest = 1 << 30;

    /// <summary>Null where there is none, or none that is whole.</summary>
    public static PlanIndex? Read(string path)
    {
        try
        {
            var file = new FileInfo(path);
            if (!file.Exists || file.Length > Largest)
                return null;
            return FromBytes(File.ReadAllBytes(path));
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }

    /// <summary>Writes it whole or not at all; where it cannot be written, none of it matters.</summary>
    public static void Write(string path, PlanIndex index)
    {
        var folder = Path.GetDirectoryName(path)!;
        if (!Directory.Exists(folder))
            return;
        // Of the form that a run clears away when its writer was killed.
        var hidden = string.Create(CultureInfo.InvariantCulture, $"{path}.{Convert.ToHexStringLower(RandomNumberGenerator.GetBytes(6))}-1.new");
        try
        {
            File.WriteAllBytes(hidden, ToBytes(index));
            File.Move(hidden, path, overwrite: true);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            DeleteIfPossible(hidden);
        }
    }

    internal static byte[] ToBytes(PlanIndex index)
    {
        using var stream = new MemoryStream();
        using (var writer = new BinaryWriter(stream, Encoding.UTF8, leaveOpen: true))
        {
            writer.Write(Form);
            writer.Write(index.ToolVersion);
            writer.Write(index.SolverVersion);
            WriteSight(writer, index.Sight);
            writer.Write(index.Cases.Length);
            foreach (var indexed in index.Cases)
            {
                writer.Write(indexed.Name);
                writer.Write(indexed.Title);
                writer.Write(indexed.Fingerprint);
            }
            WriteResults(writer, index.Results);
        }
        stream.Write(SHA256.HashData(stream.GetBuffer().AsSpan(0, (int)stream.Length)));
        return stream.ToArray();
    }

    /// <summary>Null for anything that is not a whole index of this form.</summary>
    internal static PlanIndex? FromBytes(byte[] bytes)
    {
        var length = bytes.Length - SHA256.HashSizeInBytes;
        if (length <= 0 || !SHA256.HashData(bytes.AsSpan(0, length)).AsSpan().SequenceEqual(bytes.AsSpan(length)))
            return null;
        try
        {
            using var reader = new BinaryReader(new MemoryStream(bytes, 0, length, writable: false), Encoding.UTF8);
            return reader.ReadString() != Form ? null : new PlanIndex(
                reader.ReadString(), reader.ReadInt32(), ReadSight(reader),
                ReadMany(reader, r => new IndexedCase(r.ReadString(), r.ReadString(), r.ReadString())), ReadResults(reader));
        }
        catch (Exception e) when (e is IOException or FormatException or ArgumentException or OverflowException)
        {
            return null;   // whole, and yet no index: someone else's
        }
    }

    private static void WriteSight(BinaryWriter writer, StudySight? sight)
    {
        writer.Write(sight is not null);
        if (sight is null)
            return;
        writer.Write(sight.Root);
        writer.Write(sight.RealRoot);
        writer.Write(sight.Entries.Length);
        foreach (var entry in sight.Entries)
        {
            writer.Write(entry.Path);
            WriteStamp(writer, entry.Stamp);
            writer.Write(entry.IsSettled);
            writer.Write((byte)entry.Contents.Length);
            writer.Write(entry.Contents.AsSpan());
        }
    }

    private static StudySight? ReadSight(BinaryReader reader)
        => !reader.ReadBoolean() ? null : new StudySight(
            reader.ReadString(), reader.ReadString(),
            ReadMany(reader, r => new SeenEntry(r.ReadString(), ReadStamp(r), r.ReadBoolean(), [.. r.ReadBytes(r.ReadByte())])));

    private static void WriteResults(BinaryWriter writer, IReadOnlyDictionary<string, ResultFacts> results)
    {
        // The same few names in every result: told once.
        var names = results.Values.SelectMany(facts => facts.Files).Select(f => f.Name).Distinct(StringComparer.Ordinal).ToList();
        writer.Write(names.Count);
        foreach (var name in names)
            writer.Write(name);
        var numbers = names.Index().ToDictionary(n => n.Item, n => n.Index, StringComparer.Ordinal);
        writer.Write(results.Count);
        foreach (var (folder, facts) in results)
        {
            writer.Write(folder);
            writer.Write(facts.Title);
            writer.Write(facts.Fingerprint);
            writer.Write(facts.SolverVersion);
            WriteStamp(writer, facts.Stamp);
            writer.Write(facts.IsSettled);
            writer.Write(facts.Files.Length);
            foreach (var (name, size) in facts.Files)
            {
                writer.Write(numbers[name]);
                writer.Write(size);
            }
        }
    }

    private static Dictionary<string, ResultFacts> ReadResults(BinaryReader reader)
    {
        var names = ReadMany(reader, r => r.ReadString());
        var count = reader.ReadInt32();
        var results = new Dictionary<string, ResultFacts>(Math.Min(count, 1 << 20), StringComparer.Ordinal);
        for (var i = 0; i < count; i++)
        {
            var folder = reader.ReadString();
            var (title, fingerprint, solverVersion) = (reader.ReadString(), reader.ReadString(), reader.ReadInt32());
            var (stamp, isSettled) = (ReadStamp(reader), reader.ReadBoolean());
            results.Add(folder, new ResultFacts(
                title, fingerprint, solverVersion, ReadMany(reader, r => (names[r.ReadInt32()], r.ReadInt64())), stamp, isSettled));
        }
        return results;
    }

    private static void WriteStamp(BinaryWriter writer, in FileStamp stamp)
    {
        writer.Write((byte)stamp.Type);
        writer.Write(stamp.Inode);
        writer.Write(stamp.Device);
        writer.Write(stamp.Size);
        writer.Write(stamp.Modified);
        writer.Write(stamp.Changed);
    }

    private static FileStamp ReadStamp(BinaryReader reader) => new(
        (EntryType)reader.ReadByte(), reader.ReadUInt64(), reader.ReadUInt64(), reader.ReadInt64(), reader.ReadInt64(), reader.ReadInt64());

    private static ImmutableArray<T> ReadMany<T>(BinaryReader reader, Func<BinaryReader, T> read)
    {
        var count = reader.ReadInt32();
        var items = ImmutableArray.CreateBuilder<T>(Math.Clamp(count, 0, 1 << 20));
        for (var i = 0; i < count; i++)
            items.Add(read(reader));
        return items.DrainToImmutable();
    }

    private static void DeleteIfPossible(string path)
    {
        try
        {
            File.Delete(path);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            // The next run clears it away.
        }
    }
}
