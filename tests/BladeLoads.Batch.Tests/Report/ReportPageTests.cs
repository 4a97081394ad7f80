using System.Collections.Immutable;
using System.Text;
using System.Xml.Linq;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Receipts;
using BladeLoads.Results.Report;
using BladeLoads.Results.Tables;
using BladeLoads.Results.Wording;
using BladeLoads.Studies;

namespace BladeLoads.Batch.Tests.Report;

public sealed class ReportPageTests : IDisposable
{
    private const string Hostile = "<script>alert(1)</script> & \"quoted\" \u202e\u0000 done";

    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Every_case_stands_in_the_summary_with_its_figures_and_in_the_receipts_with_its_files()
    {
        var page = Page(Report(Case("clean"), Case("soiled")));

        var rows = page.Descendants("table").Single(t => t.Descendants("th").Any(th => th.Value == "thrust, kN")).Descendants("tr").Skip(1).ToList();
        // The invented curve of three wind speeds: 2700 W, rated at 2.5 m/s, 6 kN and 5.9 kNm, as in the tests of summary.csv.
        Assert.Equal(
            ["clean", "0.3900", "31.00", "2.700", "2.500", "6.000", "3.000", "5.900", "1.000"],
            rows[0].Elements("td").Take(9).Select(td => td.Value));
        Assert.Equal(["clean", "soiled"], rows.Select(row => row.Elements("td").First().Value));
        Assert.Equal(["clean: Title of clean", "soiled: Title of soiled"], page.Descendants("section").Where(s => s.Attribute("class")?.Value == "receipt")
            .Select(s => s.Element("h3")!.Value));
        Assert.Contains(page.Descendants("td"), td => td.Value == new string('a', 64));
        Assert.Equal(
            "2 of 2 cases with current results, solved from 2026-01-02 03:04 UTC to 2026-01-02 03:04 UTC by bladeloads 1.2.3 (solver 4).",
            page.Descendants("p").First().Value);
        Assert.Contains(page.Descendants("p"), p => p.Value == Caution.Text);
    }

    [Fact]
    public void A_text_that_is_markup_is_shown_as_text_and_nothing_is_loaded_from_elsewhere()
    {
        var page = Page(new StudyReport(
            Hostile, Hostile, Hostile, [Case(Hostile), Case("b") with { File = Hostile }],
            [new MovedCase(Hostile, Hostile, Hostile, [new MovedFigure(Hostile, Hostile, 1, 2, 3, 4, 5, Hostile)])]));

        string[] known =
        [
            "html", "head", "meta", "title", "style", "body", "h1", "h2", "h3", "p", "section", "table", "thead", "tbody", "tr", "th", "td", "figure",
            "figcaption", "img", "footer",
        ];
        Assert.Empty(page.Descendants().Select(e => e.Name.LocalName).Except(known));
        Assert.Equal("<script>alert(1)</script> & \"quoted\" \\u202e\\u0000 done: rotor aerodynamics", page.Descendants("h1").Single().Value);
        Assert.All(page.Descendants("img"), img => Assert.StartsWith("data:image/svg+xml;base64,", img.Attribute("src")!.Value, StringComparison.Ordinal));
        Assert.DoesNotContain(page.Descendants().Attributes(), a => a.Name.LocalName is "href" or "style" || a.Name.LocalName.StartsWith("on", StringComparison.Ordinal));
        Assert.Contains(page.Descendants("meta").Attributes("content"), a => a.Value.StartsWith("default-src 'none';", StringComparison.Ordinal));
    }

    [Fact]
    public void The_same_report_gives_the_same_bytes_and_no_element_is_left_open()
    {
        var report = Report(Case("clean"), Case("soiled"));
        var text = Text(report);
        Assert.Equal(text, Text(report));
        Assert.Matches("^<!DOCTYPE html>\n<!-- of summary 0; page [0-9a-f]{64} -->\n<html lang=\"en\">", text);
        // A browser takes <td /> for one that is not closed.
        Assert.Contains("<td></td>", text, StringComparison.Ordinal);
        Assert.Empty(XDocument.Parse(text).Descendants().Where(e => e.IsEmpty).Select(e => e.Name.LocalName).Except(["meta", "img"]));
    }

    [Fact]
    public void Cases_of_one_file_are_drawn_together_twelve_to_a_picture()
    {
        var cases = Enumerable.Range(0, 14).Select(i => Case($"sweep~{i:00}") with { File = "cases/sweep.toml" }).Append(Case("alone")).ToArray();

        var page = Page(Report(cases));

        Assert.Equal(
            ["cases/sweep.toml (1 of 2)", "cases/sweep.toml (2 of 2)", "cases/alone.toml"], page.Descendants("figcaption").Select(f => f.Value));
        Assert.DoesNotContain(page.Descendants("p"), p => p.Value.Contains("not drawn", StringComparison.Ordinal));
        Assert.Contains(
            Page(Report([.. cases, Case("further") with { Curve = null }])).Descendants("p"),
            p => p.Value == "1 more case is not drawn; every curve is in its power-curve.csv.");
        var svg = Encoding.UTF8.GetString(Convert.FromBase64String(page.Descendants("img").ElementAt(1).Attribute("src")!.Value.Split(',')[1]));
        Assert.Equal(["sweep~12", "sweep~13"], XDocument.Parse(svg).Descendants().Where(e => e.Name.LocalName == "text" && e.Value.StartsWith("sweep~", StringComparison.Ordinal)).Select(e => e.Value));
    }

    [Fact]
    public void A_case_without_a_current_result_has_its_state_and_no_figure()
    {
        var missing = new ReportedCase(new SummaryRow("slow", "Slow", "f", "failed", null), "cases/slow.toml", null, null, "no room");

        var page = Page(Report(Case("clean"), missing));

        var row = page.Descendants("tr").First(tr => tr.Element("td")?.Value == "slow").Elements("td").Select(td => td.Value).ToList();
        Assert.All(row[1..^1], cell => Assert.Equal("-", cell));
        Assert.Equal("failed: no room", row[^1]);
        Assert.Empty(Page(Report(missing)).Descendants("figure"));
    }

    [Fact]
    public void Marks_that_a_case_carries_are_explained_and_no_others()
    {
        var marks = StatusWords.PointWords.ToDictionary(m => m.Word, _ => 2, StringComparer.Ordinal);
        var c = Case("clean");
        var marked = c with { Row = c.Row with { Summary = c.Row.Summary! with { Marks = marks } } };

        Assert.Equal(StatusWords.PointWords.Select(m => m.Word), Explained(Page(Report(marked))));
        Assert.Empty(Explained(Page(Report(Case("clean")))));

        static IEnumerable<string> Explained(XDocument page) => page.Descendants("table").Where(t => t.Descendants("th").First().Value == "mark")
            .SelectMany(t => t.Descendants("tr").Skip(1)).Where(tr => tr.Elements("td").Last().Value.Length > 20).Select(tr => tr.Elements("td").First().Value);
    }

    [Fact]
    public void What_moved_stands_case_by_case_with_the_reason_and_cases_beyond_forty_are_counted()
    {
        var page = Page(Report(Case("clean")) with
        {
            Moved = [.. Enumerable.Range(0, 43).Select(i => new MovedCase(
                $"c{i}", "blade.csv: 2 rows", "", [new MovedFigure("best power coefficient", "", 0.47, 8, 0.4654, 9, -0.98, "the note")]))],
        });

        var section = page.Descendants("section").Single(s => s.Element("h2")?.Value == "What the last run that solved anything moved");
        Assert.Equal("3 more cases are in changes.csv.", section.Element("p")!.Value);
        Assert.Equal("c1 (blade.csv: 2 rows)", section.Descendants("h3").ElementAt(1).Value);
        Assert.Equal(
            ["best power coefficient", "0.4700", "8.000", "0.4654", "9.000", "-0.98", "the note"],
            section.Descendants("tr").ElementAt(1).Elements("td").Select(td => td.Value));
    }

    [Fact]
    public void Each_case_says_by_which_values_it_differs_from_the_baseline()
    {
        static IReadOnlyDictionary<string, string> Values(params (string Key, string Value)[] values) => values.ToDictionary(v => v.Key, v => v.Value);
        ReportedCase With(string name, IReadOnlyDictionary<string, string> values)
            => Case(name) is var c ? c with { Receipt = c.Receipt! with { Values = values } } : throw new InvalidOperationException();

        var page = Page(Report(
            With("thin", Values(("air.density_kg_m3", "1.1"), ("blade", new string('b', 64)), ("sections.augment", "snel-1993"))),
            With("clean", Values(("air.density_kg_m3", "1.225"), ("blade", new string('a', 64)), ("site.k", "2")))));

        var section = page.Descendants("section").Single(s => s.Element("h2")?.Value == "The cases");
        Assert.Equal(
            ["thin", "Title of thin", "air.density_kg_m3 1.1; blade: another table; sections.augment snel-1993; no site.k"],
            section.Descendants("tr").ElementAt(1).Elements("td").Select(td => td.Value));
        Assert.Equal("", section.Descendants("tr").ElementAt(2).Elements("td").Last().Value);
        Assert.Equal(
            ["air.density_kg_m3", "1.225"], section.Elements("table").Last().Descendants("tr").ElementAt(1).Elements("td").Select(td => td.Value));
    }

    [Fact]
    public void A_page_that_was_changed_or_is_of_something_else_is_known()
    {
        var page = ReportPage.Write(Report(Case("clean")), "of summary 0");
        Assert.True(ReportPage.IsOf(page, "of summary 0"));
        Assert.False(ReportPage.IsOf(page, "of summary 1"));
        Assert.False(ReportPage.IsOf(page.AsSpan()[..^1], "of summary 0"));
        Assert.False(ReportPage.IsOf([], "of summary 0"));
        page[^40] ^= 1;
        Assert.False(ReportPage.IsOf(page, "of summary 0"));
    }

    private static StudyReport Report(params ReportedCase[] cases) => new("fell", "1.2.3", "clean", [.. cases], []);

    private ReportedCase Case(string name)
    {
        var summary = CaseSummary.Of(FellRotor.Curve(FellRotor.Rotor(windSpeeds: 3)));
        StoredResults.WriteCurve(_folder, "curve", new StoredResults.Point(4, 100), new StoredResults.Point(8, 900), new StoredResults.Point(12, 2000));
        return new ReportedCase(
            new SummaryRow(name, $"Title of {name}", "f", "current", summary), $"cases/{name}.toml",
            new Receipt(
                1, "fell", name, $"Title of {name}", new string('f', 64), 4, "1.2.3", new DateTimeOffset(2026, 1, 2, 3, 4, 0, TimeSpan.Zero), 1,
                ImmutableDictionary<string, string>.Empty, [new InputFile("blades/fell.csv", new string('a', 64), "3 rows")], [], summary, ""),
            StoredCurve.Read(Path.Join(_folder.Path, "curve")));
    }

    private static string Text(StudyReport report) => Encoding.UTF8.GetString(ReportPage.Write(report, "of summary 0"));

    private static XDocument Page(StudyReport report) => XDocument.Parse(Text(report));
}
