using System.Text;
using BladeLoads.Results.Tables;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Batch.Tests.Results;

public sealed class PolarTableWriterTests
{
    private static readonly PolarRows _open = new(double.NaN, [Row(-10, -0.5), Row(0, 0.1), Row(10, 1)]);

    [Fact]
    public void A_table_is_written_with_its_record_and_the_fewest_digits()
        => Assert.Equal(
            """
            # read from lab.txt
            # \u001b[2J
            #\u0020
            reynolds,alpha_deg,cl,cd,cm
            750000,-10.25,-0.5,0.01,-0.1
            750000,0,0.1,1E-05,0
            750000,0.1,0.30000000000000004,0.01,0.1
            1500000,-180,0,0.01,0
            1500000,0,1,0.01,0
            1500000,180,0,0.01,0

            """.Replace(@"#\u0020", "# ", StringComparison.Ordinal),
            Text(["read from lab.txt", "\e[2J", ""], [
                new PolarRows(750_000, [new(-10.25, -0.5, 0.01, -0.1), new(0, 0.1, 0.00001, -0.0), new(0.1, 0.1 + 0.2, 0.01, 0.1)]),
                new PolarRows(1.5e6, [new(-180, 0, 0.01, 0), new(0, 1, 0.01, 0), new(180, 0, 0.01, 0)])]));

    [Fact]
    public void A_table_without_reynolds_number_and_moments_has_no_such_columns()
        => Assert.Equal("alpha_deg,cl,cd\n-10,-0.5,0.01\n0,0.1,0.01\n10,1,0.01\n", Text([], [_open]));

    [Fact]
    public void What_is_written_reads_back_to_the_same_values_and_the_same_head()
    {
        var random = new Random(5);
        for (var i = 0; i < 200; i++)
        {
            var angle = -180.0;
            var polars = Enumerable.Range(1, 1 + (i % 3)).Select(block => new PolarRows(
                i % 5 == 0 && i % 3 == 0 ? double.NaN : (block * 1e6) + (random.NextDouble() * 5e5),
                [.. Enumerable.Range(0, 3 + random.Next(30)).Select(k => new PolarRow(
                    k == 0 ? angle = -180 : angle += random.NextDouble() * 10, (random.NextDouble() * 4) - 2, random.NextDouble() * Math.Pow(10, -random.Next(12)),
                    i % 2 == 0 ? double.NaN : random.NextDouble() - 0.5))])).ToList();
            string[] head = ["one \"quoted\", with a comma", "# two", "three"];

            var bytes = PolarTableWriter.Write(head, [.. polars]);
            var stored = StoredPolars.FromBytes("set/t18.csv", bytes, out var errors);

            Assert.Empty(errors);
            Assert.Equal("t18", stored!.SectionName);
            Assert.Equal(head, stored.Head);
            Assert.Equal(bytes, stored.Bytes.ToArray());
            foreach (var (one, other) in polars.Zip(stored.Polars))
                Assert.Equal((one.Reynolds, string.Join('|', one.Rows)), (other.Reynolds, string.Join('|', other.Rows)));
        }
    }

    [Fact]
    public void Values_read_back_are_those_written_to_the_last_bit()
    {
        var rows = new PolarRows(1234567.25, [new(-123.45678901234567, 0.1 + 0.2, 1e-300, Math.PI), new(1e-17, -1.0 / 3, 0, -0.1), new(179.99999999999997, 19.999999999999996, 5e-324, 2)]);

        var stored = StoredPolars.FromBytes("t.csv", PolarTableWriter.Write([], [rows]), out _)!;

        Assert.Equal(rows.Reynolds, stored.Polars[0].Reynolds);
        Assert.Equal(rows.Rows.ToArray(), stored.Polars[0].Rows.ToArray());
    }

    [Fact]
    public void What_no_case_could_read_is_not_written()
    {
        Assert.Throws<ArgumentException>(() => Text([], []));
        Assert.Throws<ArgumentException>(() => Text([], [new PolarRows(1e6, [])]));
        Assert.Throws<ArgumentException>(() => Text([], [new PolarRows(1e6, [new(0, 0, 0, double.NaN), new(1, 0, 0, 0)])]));
        Assert.Throws<ArgumentException>(() => Text([], [new PolarRows(1e6, [Row(0, 0)]), new PolarRows(1e6, [Row(0, 0)])]));
        Assert.Throws<ArgumentException>(() => Text([], [_open, new PolarRows(1e6, [Row(0, 0)])]));
        Assert.Throws<ArgumentException>(() => Text([], [new PolarRows(1e6, [Row(0, double.NaN)])]));
    }

    private static PolarRow Row(double angle, double lift) => new(angle, lift, 0.01, double.NaN);

    private static string Text(string[] record, PolarRows[] polars) => Encoding.UTF8.GetString(PolarTableWriter.Write(record, [.. polars]));
}
