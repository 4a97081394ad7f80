using System.Buffers.Binary;
using System.Collections.Immutable;
using System.Globalization;
using System.Numerics;
using System.Security.Cryptography;
using System.Text;
using BladeLoads.Studies;
using BladeLoads.Studies.Files;

namespace BladeLoads.Batch.Plan.Index;

/// <summary>The file of the index: everything in it, and then its length and bytes summed up, so that a cut or changed file is known for one.</summary>
internal static class IndexFile
{
    private const string Form = "bladeloads plan index 2";
    private const long Largest = 1 << 30;
    private const int ChecksumBytes = 4;

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
            writer.Write(index.Doubts.Length);
            foreach (var doubt in index.Doubts)
            {
                writer.Write(doubt.File);
                writer.Write(doubt.Line);
                writer.Write(doubt.Column);
                writer.Write(doubt.Text);
                writer.Write(doubt.Times);
            }
            WriteResults(writer, index.Results);
        }
        stream.Write(ChecksumOf(stream.GetBuffer().AsSpan(0, (int)stream.Length)));
        return stream.ToArray();
    }

    /// <summary>Null for anything that is not a whole index of this form.</summary>
    internal static PlanIndex? FromBytes(byte[] bytes)
    {
        var length = bytes.Length - ChecksumBytes;
        if (length <= 0 || !ChecksumOf(bytes.AsSpan(0, length)).AsSpan().SequenceEqual(bytes.AsSpan(length)))
            return null;
        try
        {
            var reader = new IndexReader(bytes.AsMemory(0, length));
            return reader.Text() != Form ? null : new PlanIndex(
                reader.Text(), reader.Whole(), ReadSight(reader), reader.Many(r => new IndexedCase(r.Text(), r.Text(), r.Text())),
                reader.Many(r => new InputFinding(r.Text(), r.Whole(), r.Whole(), r.Text()) { Times = r.Whole() }), ReadResults(reader));
        }
        catch (Exception e) when (e is ArgumentException or IndexOutOfRangeException)
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

    private static StudySight? ReadSight(IndexReader reader)
        => !reader.Truth() ? null : new StudySight(
            reader.Text(), reader.Text(), reader.Many(r => new SeenEntry(r.Text(), r.Stamp(), r.Truth(), r.Bytes(r.Byte()))));

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

    private static Dictionary<string, ResultFacts> ReadResults(IndexReader reader)
    {
        var names = reader.Many(r => r.Text());
        var all = reader.Many(r => KeyValuePair.Create(r.Text(), ReadFacts(r, names)));
        var results = new Dictionary<string, ResultFacts>(all.Length, StringComparer.Ordinal);
        foreach (var (folder, facts) in all)
            results.Add(folder, facts);
        return results;
    }

    private static ResultFacts ReadFacts(IndexReader reader, ImmutableArray<string> names)
    {
        var (title, fingerprint, solverVersion) = (reader.Text(), reader.Text(), reader.Whole());
        var (stamp, isSettled) = (reader.Stamp(), reader.Truth());
        return new ResultFacts(title, fingerprint, solverVersion, reader.Many(r => (names[r.Whole()], r.Long())), stamp, isSettled);
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

    // Against cuts and accidents, not against intent: whoever may write here may also write results. Part of the framework, and without
    // the start of a library for cryptography, which would take longer than all else.
    internal static byte[] ChecksumOf(ReadOnlySpan<byte> bytes)
    {
        var sum = (uint)bytes.Length;
        for (; bytes.Length >= 8; bytes = bytes[8..])
            sum = BitOperations.Crc32C(sum, BinaryPrimitives.ReadUInt64LittleEndian(bytes));
        foreach (var b in bytes)
            sum = BitOperations.Crc32C(sum, b);
        return BitConverter.GetBytes(sum);
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
