using System.Text;
using BladeLoads.Studies.Laboratory;

namespace BladeLoads.Studies.Tests.Laboratory;

public class HostileFileTests
{
    private const string Table = "alpha cl cd\n-5 -0.4 0.01\n0 0.1 0.009\n5 0.6 0.01\n";

    [Fact]
    public void A_file_by_its_path_is_read_and_its_findings_bear_the_path_as_given()
    {
        var files = new MemoryFiles().Write("/lab/t18.txt", Table).Write("/lab/odd.txt", Table.Replace("0.6", "x"));

        Assert.Equal("-5 -0.4 0.01 | 0 0.1 0.009 | 5 0.6 0.01", Foreign.Outcome(LaboratoryTable.Read("/lab/t18.txt", files, new ReadingRequest())));
        Told.Exactly(["/lab/odd.txt:4:3: cl is 'x'; give a number"], LaboratoryTable.Read("/lab/odd.txt", files, new ReadingRequest()).Errors);
    }

    [Fact]
    public void What_is_no_file_is_refused_in_words()
    {
        var files = new MemoryFiles().AddFolder("/lab/set").AddPipe("/lab/zero").Link("/lab/nowhere", "/gone").Link("/lab/round", "/lab/round")
            .Write("/lab/secret", Table).Link("/lab/other", "/lab/t18.txt").Write("/lab/t18.txt", Table);
        files.Forbidden.Add("/lab/secret");

        Assert.Equal(
            [
                "/lab/set: is a folder; put a file in its place",
                "/lab/zero: is not a regular file; put a file in its place",
                "/lab/nowhere: is not there, or a link that leads nowhere",
                "/lab/round: is not there, or a link that leads nowhere",
                "/lab/gone: is not there, or a link that leads nowhere",
                "/lab/secret: cannot be read: no permission",
            ],
            new[] { "/lab/set", "/lab/zero", "/lab/nowhere", "/lab/round", "/lab/gone", "/lab/secret" }.SelectMany(
                path => LaboratoryTable.Read(path, files, new ReadingRequest()).Errors.Select(FindingText.Format)));
        Assert.Empty(LaboratoryTable.Read("/lab/other", files, new ReadingRequest()).Errors);
    }

    [Fact]
    public void Of_a_huge_file_no_more_is_read_than_a_table_can_have()
    {
        var files = new MemoryFiles().Write("/lab/huge", new byte[5 << 20]);

        Told.Exactly(
            ["/lab/huge: is larger than 4 MiB, the most that is read; it seems to be another kind of file"],
            LaboratoryTable.Read("/lab/huge", files, new ReadingRequest()).Errors);
        Assert.True(files.LargestRead <= (4 << 20) + 1);
    }

    [Theory]
    [InlineData("", "lab.txt: is empty")]
    [InlineData(" \r\n\t\n", "lab.txt: is empty")]
    [InlineData("\x1A", "lab.txt: is empty")]
    [InlineData("alpha cl cd\n\0\0\0\n", "lab.txt:2:1: holds a control character (U+0000), as no text does; give the table as a text file")]
    [InlineData("PK\x03\x04\x14", "lab.txt:1:3: holds a control character (U+0003), as no text does; give the table as a text file")]
    [InlineData("alpha cl cd\n1 \u0085 2\n", "lab.txt:2:3: holds a control character (U+0085), as no text does; give the table as a text file")]
    public void What_is_no_text_is_refused(string text, string expected)
        => Told.Exactly([expected], Foreign.Read(Encoding.UTF8.GetBytes(text)).Errors);

    [Fact]
    public void Half_a_character_of_a_wide_encoding_is_refused()
        => Told.Exactly(
            ["lab.txt:5: begins as UTF-16 and is something else here; save it as text in UTF-8"],
            Foreign.Read([.. Encoding.Unicode.GetPreamble(), .. Encoding.Unicode.GetBytes(Table), 0x30]).Errors);

    [Fact]
    public void A_line_longer_than_any_row_is_refused()
        => Told.Exactly(
            ["lab.txt:2: has 2001 characters, and no row of a table more than 2000"],
            Foreign.Read("alpha cl cd\n" + new string('1', 2001) + "\n").Errors);

    [Fact]
    public void More_lines_than_any_table_has_are_refused()
        => Told.Exactly(
            ["lab.txt:50000: goes on for 60002 lines, and no table of a section has more than 50000"],
            Foreign.Read("alpha cl cd\n" + string.Concat(Enumerable.Repeat("1 1 1\n", 60_000))).Errors);

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    public void Bytes_by_chance_are_refused_and_nothing_is_thrown(int seed)
    {
        var random = new Random(seed);
        for (var i = 0; i < 200; i++)
        {
            var bytes = new byte[random.Next(1, 400)];
            random.NextBytes(bytes);

            Assert.NotEmpty(Foreign.Read(bytes).Errors);
        }
    }

    [Theory]
    [InlineData(4)]
    [InlineData(5)]
    public void Signs_of_tables_by_chance_are_read_or_refused_and_nothing_is_thrown(int seed)
    {
        const string signs = "0123456789 .,;\t|-+eE#%!\"'()[]/\n\nalphacd =Re^";
        var random = new Random(seed);
        for (var i = 0; i < 2000; i++)
        {
            var text = (i % 2 == 0 ? "alpha cl cd\n" : "") + string.Concat(Enumerable.Range(0, random.Next(1, 200)).Select(_ => signs[random.Next(signs.Length)]));

            var table = Foreign.Read(text, i % 3 == 0 ? "--columns alpha=1,cl=2,cd=3" : "");

            Assert.True(table.Errors.IsEmpty == !table.Polars.IsEmpty, text);
        }
    }

    [Theory]
    [InlineData(6)]
    [InlineData(7)]
    public void Options_by_chance_over_every_table_are_taken_or_refused_and_nothing_is_thrown(int seed)
    {
        var random = new Random(seed);
        ForeignCase[] tables = [.. TablesThatAreRead.All, .. TablesThatAreRefused.All];
        foreach (var one in tables)
            for (var i = 0; i < 20; i++)
            {
                var options = string.Join(' ', Options.Where(_ => random.Next(4) == 0).Select(values => values[random.Next(values.Length)]));

                var table = Foreign.Read(one.Text, options);

                Assert.True(table.Errors.IsEmpty == !table.Polars.IsEmpty, $"{one.Title}: {options}");
            }
    }

    // All that a user can say, an option a line.
    private static readonly string[][] Options =
    [
        [
            "--columns alpha=1,cl=2,cd=3", "--columns alpha=1,cl=2", "--columns cd=99", "--columns alpha=0,cl=2,cd=3", "--columns alpha=2,cl=1,cd=3,cm=4",
            "--columns cl=CL", "--columns cm=none,reynolds=none", "--columns normal=2,tangential=3", "--columns alpha=1,normal=2,axial=3",
            "--columns reynolds=1", "--columns section=1", "--columns alpha=99999999999,cl=1,cd=1",
        ],
        ["--angles degrees", "--angles radians"],
        ["--decimal point", "--decimal comma"],
        ["--separator tab", "--separator semicolon", "--separator comma", "--separator bar", "--separator blanks"],
        ["--reynolds 1e6", "--reynolds 2e6", "--reynolds millions", "--reynolds thousands"],
        ["--comment C", "--comment alpha", "--comment Re"],
        ["--lines 2-4", "--lines 1-1", "--lines 90-99", "--lines 3-2147483647"],
        ["--sweep rising", "--sweep falling", "--sweep mean", "--sweep all"],
        ["--section A", "--section C"],
        ["--leave-out incomplete", "--leave-out negative-drag", "--leave-out incomplete --leave-out negative-drag"],
        ["--wrap"],
    ];
}
