using System.Security.Cryptography;
using System.Text;

namespace BladeLoads.Studies.Files;

/// <summary>A text file read once: what is hashed is what is parsed.</summary>
/// <param name="File">Relative to the study folder.</param>
/// <param name="Utf8">Valid UTF-8 without byte order mark, not empty.</param>
/// <param name="Sha256">Of all the bytes of the file, byte order mark included.</param>
internal sealed record InputText(string File, ReadOnlyMemory<byte> Utf8, string Sha256)
{
    /// <summary>Line ends are all LF.</summary>
    public string Text => TextLines.WithLineFeeds(Encoding.UTF8.GetString(Utf8.Span));

    /// <summary>The text in the bytes, or the finding that says why there is none.</summary>
    public static InputText? FromBytes(string file, byte[] bytes, Action<InputFinding> report)
    {
        if (bytes.Length == 0)
            return Refuse(0, 0, "is empty");
        if (WideEncoding(bytes) is { } encoding)
            return Refuse(0, 0, $"is {encoding}; save it as UTF-8");
        ReadOnlyMemory<byte> text = bytes.AsSpan().StartsWith(Encoding.UTF8.Preamble) ? bytes.AsMemory(3) : bytes;
        if (text.Span.Trim(" \t\r\n"u8).IsEmpty)
            return Refuse(0, 0, "is empty");
        if (text.Span.IndexOf((byte)0) is >= 0 and var nul)
            return Refuse(LineOf(text.Span[..nul]), 0, "holds a NUL character; give a text file in UTF-8");
        if (!Utf8IsValid(text.Span, out var validLength))
            return Refuse(LineOf(text.Span[..validLength]), 0, "is not UTF-8 here; save the file as UTF-8");
        return new InputText(file, text, Convert.ToHexStringLower(SHA256.HashData(bytes)));

        InputText? Refuse(int line, int column, string why)
        {
            report(new InputFinding(file, line, column, why));
            return null;
        }
    }

    // The first characters of every input are plain ones, so that NULs at once tell how wide a character is.
    private static string? WideEncoding(ReadOnlySpan<byte> bytes) => bytes switch
    {
        [0xFF, 0xFE, 0, 0, ..] or [0, 0, 0xFE, 0xFF, ..] or [not 0, 0, 0, 0, ..] or [0, 0, 0, not 0, ..] => "UTF-32",
        [0xFF, 0xFE, ..] or [0xFE, 0xFF, ..] or [not 0, 0, not 0, 0, ..] or [0, not 0, 0, not 0, ..] => "UTF-16",
        _ => null,
    };

    private static bool Utf8IsValid(ReadOnlySpan<byte> text, out int validLength)
    {
        validLength = text.Length;
        if (System.Text.Unicode.Utf8.IsValid(text))
            return true;
        validLength = 0;
        while (Rune.DecodeFromUtf8(text[validLength..], out _, out var consumed) == System.Buffers.OperationStatus.Done)
            validLength += consumed;
        return false;
    }

    private static int LineOf(ReadOnlySpan<byte> before)
    {
        var line = 1;
        for (var i = 0; i < before.Length; i++)
            if (before[i] == '\n' || before[i] == '\r' && !(i + 1 < before.Length && before[i + 1] == '\n'))
                line++;
        return line;
    }
}
