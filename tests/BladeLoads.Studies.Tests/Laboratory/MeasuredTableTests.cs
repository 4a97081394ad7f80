using System.Globalization;
using BladeLoads.Studies.Laboratory;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.Tests.Laboratory;

/// <summary>
/// Tables of tunnels, as their reports print them (Laboratory/data/measured, sources in their heads), and the same as other laboratories
/// would send them: no digit is lost.
/// </summary>
public class MeasuredTableTests
{
    public static TheoryData<string> Names
        => [.. Directory.EnumerateFiles(Folder("measured")).Select(path => Path.GetFileNameWithoutExtension(path)).Order(StringComparer.Ordinal)];

    [Theory]
    [MemberData(nameof(Names))]
    public void A_measured_table_is_read_with_every_digit_in_every_layout(string name)
    {
        var printed = Printed(name);
        foreach (var separator in Enum.GetValues<CellSeparator>())
            foreach (var sign in Enum.GetValues<DecimalSign>())
                foreach (var unit in Enum.GetValues<AngleUnit>())
                    for (var reynolds = 0; reynolds < 4; reynolds++)
                    {
                        var layout = new SentLayout
                        {
                            Separator = separator,
                            Sign = sign,
                            Unit = unit,
                            ReynoldsAt = reynolds,
                            UnitAt = reynolds % 2,
                            HasFallingAngles = reynolds == 3,
                            HasRemarks = reynolds < 2,
                            LineEnd = reynolds == 1 ? "\r\n" : "\n",
                        };
                        var table = Foreign.Read(SentTable.Of([printed], layout).Bytes());

                        Assert.True(table.Errors.IsEmpty, $"{layout}: {Foreign.Outcome(table)}");
                        Assert.Equal([printed.Reynolds], table.Polars.Select(polar => polar.Reynolds));
                        Assert.Equal(printed.Rows.ToArray(), table.Polars[0].Rows.ToArray());
                    }
    }

    [Theory]
    [InlineData("s809-csu.txt", "s809-csu-300000", "s809-csu-500000", "s809-csu-650000")]
    [InlineData("s809-osu.tab", "s809-osu-750000", "s809-osu-1500000")]
    [InlineData("naca-0015.csv", "naca-0015-160000")]
    public void A_file_with_measured_tables_is_read_with_every_digit(string file, params string[] names)
    {
        var table = Foreign.Read(File.ReadAllBytes(Path.Join(Folder("sent"), file)));

        Assert.Equal("", string.Join('\n', table.Errors.Select(FindingText.Format)));
        Assert.Equal(names.Select(name => Printed(name).Reynolds), table.Polars.Select(polar => polar.Reynolds));
        foreach (var (name, polar) in names.Zip(table.Polars))
            Assert.Equal(Printed(name).Rows.ToArray(), polar.Rows.ToArray());
    }

    [Fact]
    public void A_measured_table_in_radians_and_fixed_columns_is_read_with_every_digit()
    {
        var table = Foreign.Read(File.ReadAllBytes(Path.Join(Folder("sent"), "s809-dut.prn")), "--reynolds 1e6");

        Assert.Equal("", string.Join('\n', table.Errors.Select(FindingText.Format)));
        Assert.Equal(Printed("s809-dut-1000000").Rows.ToArray(), table.Polars[0].Rows.ToArray());
        Assert.Contains("angles in radians, as line 2 says", table.Record);
    }

    private static PolarRows Printed(string name)
    {
        var lines = File.ReadAllLines(Path.Join(Folder("measured"), name + ".csv")).Where(line => line[0] != '#').Skip(1);
        return new PolarRows(Number(name.Split('-')[^1]), [.. lines.Select(line => line.Split(',')).Select(
            cells => new PolarRow(Number(cells[0]), Number(cells[1]), Number(cells[2]), cells.Length > 3 ? Number(cells[3]) : double.NaN))]);
    }

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);

    private static string Folder(string name) => Path.Join(AppContext.BaseDirectory, "Laboratory", "data", name);
}
