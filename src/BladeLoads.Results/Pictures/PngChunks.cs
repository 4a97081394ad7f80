using System.Buffers.Binary;
using System.IO.Hashing;
using System.Text;

namespace BladeLoads.Results.Pictures;

/// <summary>What a PNG says beside its pixels. Source: key png in docs/sources.md.</summary>
internal static class PngChunks
{
    /// <summary>Stands in the picture as text: it was made here.</summary>
    public const string Mark = "Software\0BladeLoads";

    private const int Signature = 8;
    private const int HeaderChunk = 25;     // length, name, 13 bytes, check sum
    private const double MetresPerInch = 0.0254;

    /// <summary>The picture with its size on paper and its maker.</summary>
    public static byte[] Added(ReadOnlySpan<byte> png, int pixelsPerInch)
    {
        var perMetre = (uint)Math.Round(pixelsPerInch / MetresPerInch);
        var density = new byte[9];
        BinaryPrimitives.WriteUInt32BigEndian(density, perMetre);
        BinaryPrimitives.WriteUInt32BigEndian(density.AsSpan(4), perMetre);
        density[8] = 1;      // a metre
        const int before = Signature + HeaderChunk;
        return [.. png[..before], .. Chunk("pHYs", density), .. Chunk("tEXt", Encoding.ASCII.GetBytes(Mark)), .. png[before..]];
    }

    internal static byte[] Chunk(string name, byte[] content)
    {
        var chunk = new byte[12 + content.Length];
        BinaryPrimitives.WriteInt32BigEndian(chunk, content.Length);
        Encoding.ASCII.GetBytes(name, chunk.AsSpan(4));
        content.CopyTo(chunk, 8);
        BinaryPrimitives.WriteUInt32BigEndian(chunk.AsSpan(8 + content.Length), Crc32.HashToUInt32(chunk.AsSpan(4, 4 + content.Length)));
        return chunk;
    }
}
