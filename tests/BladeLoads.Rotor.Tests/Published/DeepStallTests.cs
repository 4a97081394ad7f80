using BladeLoads.Rotor.Sections;
using Xunit.Abstractions;
using static BladeLoads.Rotor.Tests.Published.PublishedRotor;

namespace BladeLoads.Rotor.Tests.Published;

/// <summary>The relation of Viterna and Corrigan at tabled points; the sources stand in the data files.</summary>
public sealed class DeepStallTests(ITestOutputHelper output)
{
    [Fact]
    public void Deep_stall_has_the_tabled_coefficients()
    {
        foreach (var row in PublishedTable.Read("sections/deep-stall.csv").Rows)
        {
            var curve = CurveOf(row);
            Near(row["A1"], curve.A1);
            Near(row["A2"], curve.A2);
            Near(row["B1"], curve.B1);
            Near(row["B2"], curve.B2);
            var (lift, drag) = curve.At(row["alpha_deg"] * Degree);
            Near(row["cl"], lift);
            Near(row["cd"], drag);
        }
    }

    [Fact]
    public void An_extended_polar_has_the_tabled_coefficients_beyond_its_end()
    {
        var checkedRows = 0;
        foreach (var join in PublishedTable.Read("sections/deep-stall.csv").Rows.GroupBy(row => (row["alpha_stall_deg"], row["cl_stall"], row["aspect_ratio"])))
        {
            var first = join.First();
            var (angle, lift) = (first["alpha_stall_deg"], first["cl_stall"]);
            var polar = Polar.FromRows(double.NaN, [-5 * Degree, 0, angle * Degree], [-0.3, 0.2, lift], [0.01, 0.01, first["cd_stall"]]);
            var extended = PolarExtension.Extend(polar, first["aspect_ratio"], ExtensionJoin.End);
            Near(first["B1"], extended.LargestDrag);
            foreach (var row in join.Where(row => extended.Polar.Angles.Any(a => Math.Abs(a - row["alpha_deg"] * Degree) < 1e-9)))
            {
                var at = extended.Polar.Angles.ToList().FindIndex(a => Math.Abs(a - row["alpha_deg"] * Degree) < 1e-9);
                Near(row["cl"], extended.Polar.Lift[at]);
                Near(row["cd"], extended.Polar.Drag[at]);
                checkedRows++;
            }
        }
        // All but those whose angle lies within half a degree of the join.
        Assert.True(checkedRows >= 40, $"only {checkedRows} rows");
    }

    [Fact]
    public void Between_added_rows_the_cubic_of_the_table_stays_with_the_relation()
    {
        foreach (var join in PublishedTable.Read("sections/deep-stall.csv").Rows.GroupBy(row => (row["alpha_stall_deg"], row["aspect_ratio"])).Select(g => g.First()))
        {
            var angle = join["alpha_stall_deg"];
            var polar = Polar.FromRows(
                double.NaN, [-5 * Degree, 0, angle * Degree], [-0.3, 0.2, join["cl_stall"]], [0.01, 0.01, join["cd_stall"]]);
            var table = Section.FromPolars("a", [PolarExtension.Extend(polar, join["aspect_ratio"], ExtensionJoin.End).Polar]).Table;
            for (var deg = angle; deg <= 90; deg += 0.1)
            {
                var ((lift, drag), place) = (CurveOf(join).At(deg * Degree), table.Place(0));
                // Just beyond the join the cubic rounds the break of slope off.
                var allowed = deg < angle + 1 ? 0.006 : 0.003;
                Assert.Equal(lift, table.At(deg * Degree, place).Lift, allowed);
                Assert.Equal(drag, table.At(deg * Degree, place).Drag, allowed);
            }
        }
    }

    [Fact]
    public void A_plate_across_the_wind_has_the_tabled_drag()
    {
        foreach (var row in PublishedTable.Read("sections/largest-drag.csv").Rows)
            Assert.Equal(row["cd_max"], DeepStall.LargestDrag(row["aspect_ratio"]), 1e-12);
    }

    [Fact]
    public void A_plate_along_the_wind_has_the_friction_of_both_its_sides()
    {
        foreach (var row in PublishedTable.Read("sections/plate-friction.csv").Rows)
        {
            Assert.Equal(2 * row["laminar_friction"], PlateFriction.Laminar(row["reynolds"]), 1e-6 * row["laminar_friction"]);
            Assert.Equal(2 * row["turbulent_friction"], PlateFriction.Turbulent(row["reynolds"]), 1e-6 * row["turbulent_friction"]);
        }
    }

    /// <summary>
    /// A comparison for sanity: the relation knows one point of the section, and a plate of endless length. Allowed are 0.25 of lift and of drag
    /// to 90 degrees, and 0.3 to 170, where 0.7 of the lift is left. Common practice, no source: measurements of different tunnels beyond stall
    /// differ by 0.2.
    /// </summary>
    [Fact]
    public void The_NACA_0015_beyond_stall_is_near_to_its_measured_coefficients()
    {
        var rows = PublishedTable.Read("sections/naca0015.csv").Rows;
        var attached = rows.Where(row => row["alpha_deg"] <= 20).ToArray();
        // Both sides of a symmetric section.
        var both = attached.Skip(1).Reverse().Select(row => (-row["alpha_deg"], -row["cl"], row["cd"]))
            .Concat(attached.Select(row => (row["alpha_deg"], row["cl"], row["cd"]))).ToArray();
        var polar = Polar.FromRows(160_000, [.. both.Select(b => b.Item1 * Degree)], [.. both.Select(b => b.Item2)], [.. both.Select(b => b.Item3)]);
        var extended = PolarExtension.Extend(polar, double.PositiveInfinity, ExtensionJoin.End);
        var table = Section.FromPolars("naca0015", [extended.Polar]).Table;
        var place = table.Place(Math.Log(160_000));
        foreach (var row in rows.Where(row => row["alpha_deg"] is > 20 and <= 170))
        {
            var (lift, drag) = table.At(row["alpha_deg"] * Degree, place);
            output.WriteLine($"{row["alpha_deg"],4} deg: cl {lift:F3}, measured {row["cl"]}; cd {drag:F3}, measured {row["cd"]}");
        }
        foreach (var row in rows.Where(row => row["alpha_deg"] is > 20 and <= 170))
        {
            var (lift, drag) = table.At(row["alpha_deg"] * Degree, place);
            var allowed = row["alpha_deg"] <= 90 ? 0.25 : 0.3;
            Assert.InRange(lift - row["cl"], -allowed, allowed);
            Assert.InRange(drag - row["cd"], -allowed, allowed);
        }
    }

    private static DeepStall CurveOf(PublishedTable.Row row) => DeepStall.Through(
        row["alpha_stall_deg"] * Degree, row["cl_stall"], row["cd_stall"], DeepStall.LargestDrag(row["aspect_ratio"]));

    private static void Near(double printed, double reached) => Assert.Equal(printed, reached, 6e-7 * Math.Max(1, Math.Abs(printed)));
}
