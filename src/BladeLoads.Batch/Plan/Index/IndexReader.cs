using System.Buffers.Binary;
using System.Collections.Immutable;
using System.Text;
using BladeLoads.Studies.Files;

namespace BladeLoads.Batch.Plan.Index;

/// <summary>Reads what <see cref="BinaryWriter"/> and <see cref="IndexFile"/> write. What runs past the end throws as a foreign file does.</summary>
internal sealed class IndexReader(ReadOnlyMemory<byte> bytes)
{
    private int _at;

    public byte Byte() => Next(1)[0];

    public bool Truth() => Byte() != 0;

    public int Whole() => BinaryPrimitives.ReadInt32LittleEndian(Next(4));

    public long Long() => BinaryPrimitives.ReadInt64LittleEndian(Next(8));

    public string Text()
    {
        var length = 0;
        for (var shift = 0; ; shift += 7)
        {
            var part = Byte();
            length |= (part & 0x7F) << shift;
            if (part < 0x80)
                return Encoding.UTF8.GetString(Next(length));
        }
    }

    public ImmutableArray<byte> Bytes(int count) => [.. Next(count)];

    public FileStamp Stamp()
        => new((EntryType)Byte(), (ulong)Long(), (ulong)Long(), Long(), Long(), Long());

    public ImmutableArray<T> Many<T>(Func<IndexReader, T> read)
    {
        var count = Whole();
        // No item takes less than a byte.
        ArgumentOutOfRangeException.ThrowIfGreaterThan((uint)count, (uint)(bytes.Length - _at));
        var items = ImmutableArray.CreateBuilder<T>(count);
        for (var i = 0; i < count; i++)
            items.Add(read(this));
        return items.DrainToImmutable();
    }

    private ReadOnlySpan<byte> Next(int count)
    {
        var next = bytes.Span.Slice(_at, count);
        _at += count;
        return next;
    }
}
