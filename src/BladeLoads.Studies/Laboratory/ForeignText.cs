using System.Collections.Immutable;
using System.Globalization;
using System.Security.Cryptography;
using System.Text;
using System.Text.Unicode;
using BladeLoads.Studies.Files;

namespace BladeLoads.Studies.Laboratory;

/// <summary>The lines of a text file in whatever encoding a laboratory saved it.</summary>
/// <param name="File">As findings name it.</param>
/// <param name="Lines">Without their ends.</param>
/// <param name="Encoding">In words.</param>
/// <param name="Sha256">Of all the bytes, 64 lower-case hexadecimal digits.</param>
/// <param name="EndsOpen">The last line has no end: the file may have been cut off.</param>
internal sealed record ForeignText(string File, ImmutableArray<string> Lines, string Encoding, string Sha256, bool EndsOpen)
{
    private const int LongestLine = 2_000;
    private const int MostLines = 50_000;
    /// <summary>MiB. Fifty thousand rows are smaller.</summary>
    public const int LargestFile = 4;

    private const char EndOfDosFile = '\u001A';

    /// <summary>Null, with the reason reported, where the bytes are no text.</summary>
    public static ForeignText? FromBytes(string file, byte[] bytes, Findings findings)
    {
        var (encoding, words, preamble) = EncodingOf(bytes);
        string text;
        try
        {
            text = encoding.GetString(bytes.AsSpan(preamble)).TrimEnd(EndOfDosFile);
        }
        catch (DecoderFallbackException)
        {
            findings.Error(
                new Place(file, LineOfBrokenCharacter(encoding, bytes.AsSpan(preamble)), 0),
                $"begins as {words} and is something else here; save it as text in UTF-8");
            return null;
        }
        if (text.AsSpan().Trim().IsEmpty)
        {
            findings.Error(new Place(file, 0, 0), "is empty");
            return null;
        }
        var lines = TextLines.Of(text);
        if (lines.Length > MostLines)
        {
            findings.Error(new Place(file, MostLines, 0), string.Create(
                CultureInfo.InvariantCulture, $"goes on for {lines.Length} lines, and no table of a section has more than {MostLines}"));
            return null;
        }
        for (var i = 0; i < lines.Length; i++)
            if (Objection(lines[i]) is var (column, why))
            {
                findings.Error(new Place(file, i + 1, column), why);
                return null;
            }
        return new ForeignText(
            file, [.. lines.Select(line => line.Replace('\f', ' '))], words, Convert.ToHexStringLower(SHA256.HashData(bytes)), lines[^1].Length > 0);
    }

    private static int LineOfBrokenCharacter(Encoding encoding, ReadOnlySpan<byte> bytes)
    {
        // By its number an encoding comes as one that puts a sign in the place of what is broken.
        var text = System.Text.Encoding.GetEncoding(encoding.CodePage).GetString(bytes);
        return 1 + text.AsSpan(0, text.IndexOf('\uFFFD', StringComparison.Ordinal)).Count('\n');
    }

    private static (int Column, string Why)? Objection(string line)
    {
        for (var i = 0; i < line.Length; i++)
            if (char.IsControl(line[i]) && line[i] is not ('\t' or '\f'))
                return (i + 1, string.Create(
                    CultureInfo.InvariantCulture,
                    $"holds a control character (U+{(int)line[i]:X4}), as no text does; give the table as a text file"));
        return line.Length > LongestLine
            ? (0, string.Create(CultureInfo.InvariantCulture, $"has {line.Length} characters, and no row of a table more than {LongestLine}"))
            : null;
    }

    private static (Encoding Encoding, string Words, int Preamble) EncodingOf(ReadOnlySpan<byte> bytes) => bytes switch
    {
        [0xFF, 0xFE, 0, 0, ..] => (new UTF32Encoding(false, false, true), "UTF-32", 4),
        [0, 0, 0xFE, 0xFF, ..] => (new UTF32Encoding(true, false, true), "UTF-32", 4),
        [0xFF, 0xFE, ..] => (new UnicodeEncoding(false, false, true), "UTF-16", 2),
        [0xFE, 0xFF, ..] => (new UnicodeEncoding(true, false, true), "UTF-16", 2),
        [0xEF, 0xBB, 0xBF, ..] => (new UTF8Encoding(false, true), "UTF-8", 3),
        [not 0, 0, 0, 0, ..] => (new UTF32Encoding(false, false, true), "UTF-32", 0),
        [0, 0, 0, not 0, ..] => (new UTF32Encoding(true, false, true), "UTF-32", 0),
        // Plain characters at the beginning tell how wide one is.
        [not 0, 0, not 0, 0, ..] => (new UnicodeEncoding(false, false, true), "UTF-16", 0),
        [0, not 0, 0, not 0, ..] => (new UnicodeEncoding(true, false, true), "UTF-16", 0),
        _ when Utf8.IsValid(bytes) => (System.Text.Encoding.UTF8, "UTF-8", 0),
        // Any bytes are text in it; numbers and signs stand where they do in every other encoding of one byte a character.
        _ => (CodePagesEncodingProvider.Instance.GetEncoding(1252)!, "Windows-1252 (Latin-1)", 0),
    };
}
