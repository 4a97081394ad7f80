using System.Collections.Immutable;
using System.Text;
using BladeLoads.Batch.PolarCheck;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Batch.Work;
using BladeLoads.Results.PolarCheck;
using BladeLoads.Rotor.Air;
using BladeLoads.Rotor.Blades;
using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.PolarCheck;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Batch.Tests.PolarCheck;

/// <summary>Shares counted by hand, on elements whose angles and Reynolds numbers the test says.</summary>
public sealed class UseOfTablesTests
{
    private const double Degree = Math.PI / 180;
    private const string Root = "polars/clean/root.csv";
    private const string Tip = "polars/clean/tip.csv";

    private static readonly CheckedTable RootTable = Table(Root, """
        reynolds,alpha_deg,cl,cd
        1e6,-10,-0.5,0.03
        1e6,0,0.5,0.02
        1e6,10,1.2,0.03
        1e6,20,0.9,0.2
        4e6,-10,-0.5,0.03
        4e6,0,0.5,0.02
        4e6,12,1.4,0.03
        4e6,20,0.9,0.2

        """);

    private static readonly CheckedTable TipTable = Table(Tip, "alpha_deg,cl,cd\n-5,-0.3,0.01\n0,0.3,0.01\n8,1.2,0.02\n15,0.8,0.1\n");
    private static readonly CheckedTable UnusedTable = Table("polars/clean/spare.csv", "alpha_deg,cl,cd\n-5,-0.3,0.01\n0,0.3,0.01\n8,1.2,0.02\n");

    // Four elements of 2 m: all root; a quarter, then three quarters of the way to the tip's section; all tip.
    private static readonly RotorCase Rotor = FellRotor.Rotor(elements: 4) with
    {
        Blade = Blade.FromStations([new(1, 1, 0, "root"), new(3, 1, 0, "root"), new(7, 1, 0, "tip"), new(9, 1, 0, "tip")]),
        Sections = SectionSet.Of(
            [Section.FromPolars("root", RootTable.Table.Section.Polars), Section.FromPolars("tip", TipTable.Table.Section.Polars)]),
    };

    [Fact]
    public void An_element_counts_for_each_of_its_tables_and_Reynolds_numbers_by_their_weights()
    {
        // At 2 million, halfway in its logarithm between the root's two tables.
        var use = Use((rotor, _) => Curve(rotor, (1, 11, 2e6), (1, 11, 2e6), (1, 11, 2e6), (1, 11, 2e6)));
        Assert.Equal([Root, Tip], use.ByFile.Keys);
        Assert.Equal((1 + 0.75 + 0.25) / 4, use.ByFile[Root].Blades, 1e-9);
        Assert.Equal((0.25 + 0.75 + 1) / 4, use.ByFile[Tip].Blades, 1e-9);
        Assert.Equal(0.5, use.ByFile[Root].At(0), 1e-9);
        // 11 degrees is past the peak at 10 of the lower Reynolds number, not past that at 12 of the upper; and past the tip's at 8.
        Assert.Equal(0.5, use.ByFile[Root].BeyondPeak, 1e-9);
        Assert.Equal(1, use.ByFile[Tip].BeyondPeak);
        Assert.Equal([new UseBin(11, 12, 1)], use.ByFile[Root].ByAngleDeg());
    }

    [Fact]
    public void What_lies_outside_the_tables_is_counted()
    {
        var use = Use((rotor, _) => Curve(rotor, (1, 25, 1e5), (1, 25, 1e5), (1, 5, 1e5), (1, -6, 1e5)));
        // Of the root's length at work, 1 + 0.75 + 0.25 elements, the first two are beyond 20 degrees.
        Assert.Equal(1.75 / 2, use.ByFile[Root].OutsideAngles, 1e-9);
        Assert.Equal(1, use.ByFile[Root].OutsideReynolds);
        // The tip's rows go from -5 to 15 degrees; it names no Reynolds number and serves at all.
        Assert.Equal((0.25 + 1) / 2, use.ByFile[Tip].OutsideAngles, 1e-9);
        Assert.Equal(0, use.ByFile[Tip].OutsideReynolds);
    }

    [Fact]
    public void A_rotor_at_rest_and_an_element_without_a_balance_count_for_nothing()
    {
        var use = Use((rotor, _) => Curve(rotor, (0, 80, 1e6), (1, 4, 1e6), (1, double.NaN, 1e6), (1, 4, 1e6)) with
        {
            Points = [.. Curve(rotor, (1, 4, 1e6), (1, double.NaN, 1e6), (1, 4, 1e6), (1, 4, 1e6)).Points, AtRest(rotor)],
        });
        Assert.Equal((1 + 0.25) / 4, use.ByFile[Root].Blades, 1e-9);
        Assert.Equal([new UseBin(4, 5, 1)], use.ByFile[Root].ByAngleDeg());
    }

    [Fact]
    public void A_table_that_no_case_uses_has_a_row_of_nothing()
    {
        var report = new PolarReport(new CheckedTables([RootTable, UnusedTable, TipTable], []), Use((rotor, _) => Curve(rotor, All(4))).ByFile);
        Assert.Equal("""
            table,blade_share,angle_of_attack_5_percent_deg,angle_of_attack_95_percent_deg,lowest_angle_deg,highest_angle_deg,outside_angles_share,beyond_lift_peak_share,reynolds_5_percent,reynolds_95_percent,lowest_reynolds,highest_reynolds,outside_reynolds_share,several_balances_share
            polars/clean/root.csv,0.5,4,4.1,-10,20,0,0,1000000,1020000,1000000,4000000,0,0
            polars/clean/spare.csv,0,,,-5,8,,,,,,,,
            polars/clean/tip.csv,0.5,4,4.1,-5,15,0,0,1000000,1020000,,,0,0

            """, Encoding.UTF8.GetString(report.Use.ToCsv()));
    }

    [Fact]
    public void Shares_of_a_histogram_make_one_and_do_not_depend_on_the_number_of_workers()
    {
        var cases = Enumerable.Range(0, 60).Select(i => Case($"case-{i}")).ToImmutableArray();
        // The same angles for the same case, whoever solves it; a case is known by its density.
        PowerCurve Solve(RotorCase rotor, CancellationToken cancellation)
        {
            var random = new Random((int)rotor.Air.Density);
            var elements = Enumerable.Range(0, 4)
                .Select(_ => (1.0, (random.NextDouble() * 400) - 200, Math.Pow(10, 4 + (3 * random.NextDouble()))));
            return Curve(rotor, [.. elements]);
        }

        string? first = null;
        foreach (var workers in (int[])[1, 2, 3, 16])
        {
            var use = UseOfTables.Of(
                cases, [RootTable, TipTable], Solve, workers, new RunProgress(60, 1, TimeProvider.System), CancellationToken.None);
            var report = new PolarReport(new CheckedTables([RootTable, TipTable], []), use.ByFile);
            var text = string.Concat(report.Files().Select(file => Encoding.UTF8.GetString(file.Bytes.Span)));
            Assert.Equal(first ??= text, text);
            foreach (var table in use.ByFile.Values)
            {
                Assert.Equal(1, table.ByAngleDeg().Sum(bin => bin.Share), 1e-12);
                Assert.Equal(1, table.ByReynolds().Sum(bin => bin.Share), 1e-12);
                Assert.Equal(1, table.Within(-1, [(-180, 0), (-10, 180)]), 1e-12);
                Assert.True(table.ByAngleDeg().Count() > 20);
            }
            Assert.Equal(60, use.Solved);
            Assert.Equal(60, use.ByFile.Values.Sum(u => u.Blades), 1e-6);
        }
    }

    [Fact]
    public void A_case_that_cannot_be_solved_is_left_out_and_told()
    {
        var use = UseOfTables.Of(
            [Case("case-0"), Case("case-1")], [RootTable, TipTable],
            (rotor, _) => rotor.Air.Density == 2 ? throw new InvalidOperationException("odd\e[2J") : Curve(rotor, All(4)), 2,
            new RunProgress(2, 1, TimeProvider.System), CancellationToken.None);
        Assert.Equal([("case-1", @"fault in BladeLoads, please report: odd\u001b[2J")], use.Failed.ToArray());
        Assert.Equal(1, use.Solved);
        Assert.Equal(1, use.ByFile.Values.Sum(u => u.Blades), 1e-8);
    }

    [Fact]
    public void By_thickness_the_two_tables_around_an_element_count_by_its_distance()
    {
        var rotor = FellRotor.Rotor(elements: 1) with
        {
            Blade = Blade.FromStations([BladeStation.OfThickness(1, 1, 0, 0.5), BladeStation.OfThickness(9, 1, 0, 0.2)]),
            Sections = SectionSet.Of(SectionFamily.Of(
                [
                    new FamilyMember(0.2, Section.FromPolars("tip", TipTable.Table.Section.Polars)),
                    new FamilyMember(0.4, Section.FromPolars("root", TipTable.Table.Section.Polars))])),
        };
        // In the middle of the blade 0.35: three quarters of the way to 0.4.
        var use = UseOfTables.Of(
            [Case("case-0", rotor)], [RootTable, TipTable], (r, _) => Curve(r, (1, 4, 1e6)), 1, new RunProgress(1, 1, TimeProvider.System),
            CancellationToken.None);
        Assert.Equal(0.75, use.ByFile[Root].Blades, 1e-9);
        Assert.Equal(0.25, use.ByFile[Tip].Blades, 1e-9);
    }

    [Fact]
    public void What_concerns_most_of_the_blades_comes_first()
    {
        var use = Use((rotor, _) => Curve(rotor, (1, 25, 1e6), (1, 5, 1e6), (1, 5, 1e6), (1, 5, 1e6))).ByFile;
        var first = FirstToLookAt.Of([RootTable, TipTable], use);
        Assert.Equal(
            [
                // All elements at 5 degrees lie in the gap of the tip's rows from 0 to 8 degrees: 2 of 4 elements; those of the root's rows from 0
                // to 10 at a million: 1 of 4. The element at 25 degrees is all the root's.
                "0.50 polars/clean/tip.csv gap 4 of 3",
                "0.25 polars/clean/root.csv used outside its angles  of 0",
                "0.25 polars/clean/root.csv gap 4 of 6",
            ],
            first.Select(p => FormattableString.Invariant($"{p.Share:0.00} {p.File} {p.Kind} {p.Most?.Finding.Line} of {p.Doubts}")));
    }

    [Fact]
    public void A_table_of_one_Reynolds_number_is_to_be_looked_at_where_its_use_is_far_from_it()
    {
        var one = Table(Tip, "reynolds,alpha_deg,cl,cd\n1e6,-5,-0.3,0.01\n1e6,0,0.3,0.01\n1e6,8,1.2,0.02\n1e6,15,0.8,0.1\n");
        // Of the tip's length at work, 0.25 + 0.75 + 1 of 4 elements, the last is alone beyond twice a million.
        Assert.Equal(
            ["0.25 polars/clean/tip.csv used far from its one Reynolds number, 1e6, from 6.0e5 to 3.0e6"],
            Far((1, 3, 6.05e5), (1, 3, 6.05e5), (1, 3, 6.05e5), (1, 3, 3e6)));
        Assert.Empty(Far((1, 3, 5.2e5), (1, 3, 5.2e5), (1, 3, 1.9e6), (1, 3, 1.9e6)));

        IEnumerable<string> Far(params (double, double, double)[] elements)
        {
            var use = UseOfTables.Of(
                [Case("case-0")], [one], (rotor, _) => Curve(rotor, elements), 1, new RunProgress(1, 1, TimeProvider.System), CancellationToken.None);
            return FirstToLookAt.Of([one], use.ByFile.SetItem(Root, Use((rotor, _) => Curve(rotor, elements)).ByFile[Root]))
                .Where(p => p.Kind.StartsWith("used", StringComparison.Ordinal))
                .Select(p => FormattableString.Invariant($"{p.Share:0.00} {p.File} {p.Kind}"));
        }
    }

    private static (double RotorSpeed, double AngleDeg, double Reynolds)[] All(double angleDeg) => [.. Enumerable.Repeat((1.0, angleDeg, 1.01e6), 4)];

    private static UseOfTables Use(SolveCase solve) => UseOfTables.Of(
        [Case("case-0")], [RootTable, UnusedTable, TipTable], solve, 2, new RunProgress(1, 1, TimeProvider.System), CancellationToken.None);

    // The number in the name makes the density, by which an invented solver knows the case.
    private static StudyCase Case(string name, RotorCase? rotor = null)
    {
        var number = double.Parse(name["case-".Length..], System.Globalization.CultureInfo.InvariantCulture);
        return FellRotor.Case(name, (rotor ?? Rotor) with { Air = new AirProperties(1 + number, 1.789e-5, 340.29) }) with
        {
            Tables =
            [
                new CanonicalTable("blade", "", "blades/fell.csv", () => []), new CanonicalTable("section.root", "", Root, () => []),
                new CanonicalTable("section.tip", "", Tip, () => []),
            ],
        };
    }

    private static PowerCurve Curve(RotorCase rotor, params (double RotorSpeed, double AngleDeg, double Reynolds)[] elements)
        => FellRotor.Curve(rotor) with
        {
            Points = [FellRotor.Point(8) with { Elements = [.. elements.Select((e, i) => Element(i, e.AngleDeg, e.Reynolds))] }],
        };

    private static CurvePoint AtRest(RotorCase rotor) => Curve(rotor, All(80)).Points[0] with { Operation = new OperatingPoint(30, 0, 0) };

    private static ElementState Element(int index, double angleDeg, double reynolds) => FellRotor.Element(index) with
    {
        Length = 2,
        AngleOfAttack = Math.Clamp(angleDeg * Degree, -Math.PI, Math.PI),
        Reynolds = reynolds,
    };

    private static CheckedTable Table(string file, string text)
        => CheckedTable.Of(StoredPolars.FromBytes(file, Encoding.UTF8.GetBytes(text), out _)!, file);
}
