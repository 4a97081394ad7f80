using System.Text.Json;

namespace BladeLoads.Results.Receipts;

/// <summary>What reading a receipt came to.</summary>
public abstract record ReceiptReading
{
    private ReceiptReading() { }

    /// <summary>There is no result folder.</summary>
    public sealed record NoResult : ReceiptReading;

    /// <summary>There is a folder, but no receipt that can be trusted; the case is solved again, which is always right.</summary>
    /// <param name="Why">One phrase.</param>
    public sealed record Unreadable(string Why) : ReceiptReading;

    public sealed record Readable(Receipt Receipt) : ReceiptReading;
}

/// <summary>Reads and writes receipts and failure records. What cannot be read is a finding, never an exception.</summary>
public static class ReceiptFile
{
    // A receipt takes a few kB; more than this is not one, and is not worth the memory.
    private const long LargestReceipt = 16 << 20;

    /// <param name="resultFolder">The folder of a case's result.</param>
    public static ReceiptReading Read(string resultFolder)
    {
        if (!Directory.Exists(resultFolder))
            return new ReceiptReading.NoResult();
        try
        {
            if (ReadBytes(Path.Join(resultFolder, Receipt.FileName)) is not { } bytes)
                return new ReceiptReading.Unreadable("the receipt is not there");
            return Parse(bytes);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return new ReceiptReading.Unreadable("the receipt cannot be read");
        }
    }

    /// <summary>A receipt from its bytes; never <see cref="ReceiptReading.NoResult"/>.</summary>
    public static ReceiptReading Parse(ReadOnlySpan<byte> utf8)
    {
        try
        {
            return JsonSerializer.Deserialize(utf8, ReceiptJson.Default.Receipt) switch
            {
                null => new ReceiptReading.Unreadable("the receipt is damaged"),
                { Format: not Receipt.CurrentFormat } => new ReceiptReading.Unreadable("the receipt has another form"),
                var receipt => new ReceiptReading.Readable(receipt),
            };
        }
        catch (JsonException)
        {
            return new ReceiptReading.Unreadable("the receipt is damaged");
        }
    }

    /// <summary>The record of a failure, or null where there is none that can be read.</summary>
    public static FailureRecord? ReadFailure(string path)
    {
        try
        {
            return ReadBytes(path) is { } bytes ? JsonSerializer.Deserialize(bytes, ReceiptJson.Default.FailureRecord) : null;
        }
        catch (Exception e) when (e is JsonException or IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }

    public static byte[] Write(Receipt receipt) => [.. JsonSerializer.SerializeToUtf8Bytes(receipt, ReceiptJson.Default.Receipt), (byte)'\n'];

    public static byte[] Write(FailureRecord failure)
        => [.. JsonSerializer.SerializeToUtf8Bytes(failure, ReceiptJson.Default.FailureRecord), (byte)'\n'];

    private static byte[]? ReadBytes(string path)
    {
        var file = new FileInfo(path);
        if (!file.Exists)
            return null;
        return file.Length <= LargestReceipt ? File.ReadAllBytes(path) : throw new IOException("too large for a receipt");
    }
}
