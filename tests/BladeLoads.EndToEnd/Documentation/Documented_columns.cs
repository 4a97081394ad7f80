using System.Text.Json;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Keeping;
using BladeLoads.Results.PolarCheck;
using BladeLoads.Results.Tables;
using BladeLoads.Results.Wording;
using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies.PolarCheck;

namespace BladeLoads.EndToEnd.Documentation;

public sealed class Documented_columns
{
    [Fact]
    public void Of_the_power_curve_are_those_written_in_their_order()
        => Assert.Equal<string>(CurveTable.Columns, DocumentedTable.Names("### power-curve.csv"));

    [Fact]
    public void Of_the_spanwise_table_are_those_written_in_their_order()
        => Assert.Equal<string>(SpanwiseTable.Columns, DocumentedTable.Names("### spanwise.csv"));

    [Fact]
    public void Of_the_summary_are_those_written_in_their_order()
        => Assert.Equal<string>(SummaryTable.Columns, DocumentedTable.Names("### summary.csv"));

    [Fact]
    public void Of_the_design_points_are_the_name_and_those_of_the_curve()
        => Assert.Equal<string>(DesignPointsTable.Columns, ["point", .. DocumentedTable.Names("### power-curve.csv")]);

    [Fact]
    public void Of_the_surface_are_those_written_in_their_order()
        => Assert.Equal<string>(SurfaceTable.Columns, DocumentedTable.Names("### coefficient-surface.csv"));

    [Fact]
    public void Of_the_energy_are_those_written_in_their_order()
        => Assert.Equal<string>(EnergyTable.Columns, DocumentedTable.Names("### annual-energy.csv"));

    [Fact]
    public void Of_the_normalisation_are_those_written_in_their_order()
        => Assert.Equal<string>(NormalisationTable.Columns, DocumentedTable.Names("### density-normalisation.csv"));

    [Fact]
    public void Added_to_the_summary_are_those_written_in_their_order()
        => Assert.Equal<string>([.. SummaryTable.FurtherColumns, .. SummaryTable.FurtherBaselineColumns], DocumentedTable.Names(
            "After all of these, with or without a baseline (the last two only with one):"));

    [Fact]
    public void Of_the_baseline_are_those_written_in_their_order()
        => Assert.Equal<string>(SummaryTable.BaselineColumns, DocumentedTable.Names(
            "With a `baseline` in study.toml, five columns follow: how far the case lies from the baseline, in percent of the baseline's value."));

    [Fact]
    public void Of_the_changes_are_those_written_in_their_order()
        => Assert.Equal<string>(ChangesTable.Columns, DocumentedTable.Names("### changes.csv"));

    [Fact]
    public void Of_the_report_on_polars_are_those_written_in_their_order()
    {
        Assert.Equal<string>(PolarReport.FigureColumns, DocumentedTable.Names("`polar-figures.csv`:"));
        Assert.Equal<string>(PolarReport.DoubtColumns, DocumentedTable.Names("`polar-doubts.csv`:"));
        Assert.Equal<string>(PolarReport.UseColumns, DocumentedTable.Names("element without a balance counts for nothing. `polar-use.csv`:"));
        Assert.Equal<string>(PolarReport.HistogramColumns, DocumentedTable.Names(
            "`polar-histograms.csv`, bins of one degree and ten a decade of Reynolds number, those in which there is any:"));
    }

    [Fact]
    public void Hold_every_kind_of_doubt_about_a_polar()
        => Assert.Equal<string>(DoubtKinds.All, DocumentedTable.Names("nowhere below 0.1 within 20 degrees."));

    [Fact]
    public void Name_the_figures_that_are_compared_in_their_order()
    {
        var documented = DocumentedTable.Rows("The figures of a case, in this order:");
        Assert.Equal(Figures.All.Select(f => (f.Name, f.Unit)), documented.Take(Figures.All.Length).Select(row => (row[0].Trim('`'), row[1])));
        Assert.Equal(Figures.All.Length + 2, documented.Length);
    }

    [Fact]
    public void Of_a_kept_set_are_the_keys_written()
    {
        using var json = JsonDocument.Parse(new KeptRecord(1, "", "", default, "", [], "").ToBytes());
        Assert.Equal(json.RootElement.EnumerateObject().Select(p => p.Name), DocumentedTable.Names("### kept.json"));
    }

    [Fact]
    public void Hold_every_region_by_its_word()
        => Assert.Equal(Enum.GetValues<Region>().Select(RegionWords.Of), DocumentedTable.Names("### Regions"));

    [Fact]
    public void Hold_every_mark_of_a_point_by_its_word()
        => Assert.Equal(
            Enum.GetValues<PointMarks>().Where(mark => mark != PointMarks.None).Select(StatusWords.Of), MarksIn("P"));

    [Fact]
    public void Hold_every_mark_of_an_element_by_its_word()
        => Assert.Equal(
            Enum.GetValues<ElementMarks>().Where(mark => mark != ElementMarks.None).Select(StatusWords.Of), MarksIn("S"));

    private static IEnumerable<string> MarksIn(string table)
        => DocumentedTable.Rows("### Marks").Where(row => row[1].Split(' ').Contains(table)).Select(row => row[0].Trim('`'));
}
