using System.Text;

namespace BladeLoads.Studies.Tests.Files;

public class EncodingTests
{
    public static TheoryData<string, string> TextFiles => new()
    {
        { "cases/clean.toml", FellStudy.Case }, { "blades/fell.csv", FellStudy.Blade }, { "polars/clean/root.csv", FellStudy.RootPolar },
        { "polars/clean/tip.csv", FellStudy.TipPolar },
    };

    [Theory, MemberData(nameof(TextFiles))]
    public void A_byte_order_mark_and_other_line_ends_change_nothing(string file, string text)
    {
        var plain = new FellStudy().OnlyCase().Fingerprint;

        Assert.Equal(plain, With(file, [.. Encoding.UTF8.Preamble, .. Encoding.UTF8.GetBytes(text)]).OnlyCase().Fingerprint);
        Assert.Equal(plain, With(file, Encoding.UTF8.GetBytes(text.ReplaceLineEndings("\r\n"))).OnlyCase().Fingerprint);
        Assert.Equal(plain, With(file, Encoding.UTF8.GetBytes(text.ReplaceLineEndings("\r"))).OnlyCase().Fingerprint);
        Assert.Equal(plain, With(file, Encoding.UTF8.GetBytes(text.TrimEnd('\n'))).OnlyCase().Fingerprint);
    }

    [Theory, MemberData(nameof(TextFiles))]
    public void A_sign_that_some_programs_end_lines_with_ends_none_within_a_comment(string file, string text)
    {
        var plain = new FellStudy().OnlyCase().Fingerprint;

        Assert.Equal(plain, With(file, Encoding.UTF8.GetBytes("# page 1\u2028page 2\u0085\n" + text)).OnlyCase().Fingerprint);
    }

    [Fact]
    public void A_form_feed_in_a_case_file_is_refused_as_TOML_has_none() => Told.Exactly(
        ["cases/clean.toml:1:9: not TOML here: Invalid control character U+000C in comment; the line reads '# page 1\\u000Cpage 2'"],
        With("cases/clean.toml", Encoding.UTF8.GetBytes("# page 1\fpage 2\n" + FellStudy.Case)).Read().Errors);

    [Theory, MemberData(nameof(TextFiles))]
    public void Other_encodings_are_refused(string file, string text)
    {
        const string utf16 = "is UTF-16; save it as UTF-8", utf32 = "is UTF-32; save it as UTF-8";

        Told.Exactly([$"{file}: {utf16}"], With(file, FellStudy.Utf16(text)).Read().Errors);
        Told.Exactly([$"{file}: {utf16}"], With(file, Encoding.Unicode.GetBytes(text)).Read().Errors);
        Told.Exactly([$"{file}: {utf16}"], With(file, [.. Encoding.BigEndianUnicode.Preamble, .. Encoding.BigEndianUnicode.GetBytes(text)]).Read().Errors);
        Told.Exactly([$"{file}: {utf16}"], With(file, Encoding.BigEndianUnicode.GetBytes(text)).Read().Errors);
        Told.Exactly([$"{file}: {utf32}"], With(file, [.. Encoding.UTF32.Preamble, .. Encoding.UTF32.GetBytes(text)]).Read().Errors);
        Told.Exactly([$"{file}: {utf32}"], With(file, Encoding.UTF32.GetBytes(text)).Read().Errors);
    }

    [Theory, MemberData(nameof(TextFiles))]
    public void Bytes_that_are_no_text_are_told_by_their_line(string file, string text)
    {
        var bytes = Encoding.UTF8.GetBytes(text);

        Told.Exactly([$"{file}:2: is not UTF-8 here; save the file as UTF-8"], With(file, Replace(bytes, 0xFC)).Read().Errors);
        Told.Exactly([$"{file}:2: holds a NUL character; give a text file in UTF-8"], With(file, Replace(bytes, 0)).Read().Errors);
    }

    [Theory, MemberData(nameof(TextFiles))]
    public void An_empty_file_is_told(string file, string text)
    {
        Assert.NotEmpty(text);
        Told.Exactly([$"{file}: is empty"], With(file, []).Read().Errors);
        Told.Exactly([$"{file}: is empty"], With(file, [.. Encoding.UTF8.Preamble]).Read().Errors);
        Told.Exactly([$"{file}: is empty"], With(file, " \r\n\n"u8.ToArray()).Read().Errors);
    }

    [Theory, MemberData(nameof(TextFiles))]
    public void A_file_of_a_hundred_megabytes_is_refused_and_not_read_whole(string file, string text)
    {
        Assert.NotEmpty(text);
        var study = With(file, new byte[100_000_000]);

        var most = file.EndsWith(".toml", StringComparison.Ordinal) ? 1 : 32;
        Told.Exactly([$"{file}: is larger than {most} MiB, the most that is read; it seems to be another kind of file"], study.Read().Errors);
        Assert.InRange(study.Files.LargestRead, 1, 32 * 1024 * 1024 + 1);
    }

    [Fact]
    public void Rubbish_is_told_in_few_lines()
    {
        var rubbish = Encoding.UTF8.GetBytes(string.Concat(Enumerable.Repeat("x7f%;q\n", 4_000_000)));

        Told.Exactly(
            ["blades/fell.csv:1:1: columns are separated by ';'; separate them by ','"], With("blades/fell.csv", rubbish).Read().Errors);
        Assert.InRange(With("cases/clean.toml", rubbish[..300_000]).Read().Errors.Length, 1, 20);
        Told.Exactly(
            [
                .. Enumerable.Range(2, 3).Select(line => $"polars/clean/tip.csv:{line}:1: 1 value where the header names 3 columns; "
                    + "give one value a column, and write decimals with a point"),
                "polars/clean/tip.csv:5:1: and at least 9997 more like it",
            ],
            With("polars/clean/tip.csv", [.. "alpha_deg,cl,cd\n"u8, .. rubbish]).Read().Errors);
    }

    [Fact]
    public void Text_beyond_ascii_keeps_the_columns_of_what_follows()
        => Told.Exactly(
            ["blades/fell.csv:2:6: chord_m is 'x'; give a number, such as 0.8"],
            new FellStudy().With("blades/fell.csv", "section,chord_m,radius_m,twist_deg\nrööt,x,1,1\ntip,1,2,1\n")
                .With("polars/clean/rööt.csv", FellStudy.TipPolar).Read().Errors);

    private static FellStudy With(string file, byte[] bytes) => new FellStudy().With(file, bytes);

    // The third character of the second line.
    private static byte[] Replace(byte[] bytes, byte by)
    {
        var changed = bytes.ToArray();
        changed[Array.IndexOf(changed, (byte)'\n') + 3] = by;
        return changed;
    }
}
