using System.Globalization;
using System.Xml.Linq;
using BladeLoads.Results.Pictures;
using BladeLoads.Results.Wording;
using static BladeLoads.Results.Report.Html;

namespace BladeLoads.Results.Report;

/// <summary>The curves of all cases, those of one case file together.</summary>
internal static class CurveSection
{
    public const int MostPictures = 40;

    public static XElement? Of(StudyReport report)
    {
        var groups = report.Cases.Where(c => c.Curve is not null).GroupBy(c => c.File, StringComparer.Ordinal)
            .Select(group => (File: group.Key, Pages: group.Chunk(CurvePicture.MostLines).ToList())).ToList();
        var pages = groups.SelectMany(g => g.Pages.Select((cases, i) => (g.File, Cases: cases, Number: i + 1, Of: g.Pages.Count))).ToList();
        var flat = report.Cases.Where(c => c.Curve is { } curve && !PictureOf("", [c]).HasLines).Select(c => c.Row.Case).ToList();
        var left = report.Cases.Count(c => c.Receipt is not null) - pages.Take(MostPictures).Sum(page => page.Cases.Length);
        return pages.Count == 0 ? null : Element(
            "section", Text("h2", "Curves"),
            flat.Count == 0 ? null : Text("p", $"Not drawn, with one wind speed only: {string.Join(", ", flat)}."),
            pages.Take(MostPictures).Select(page => Picture(page.File, page.Cases, page.Number, page.Of)),
            left == 0 ? null : Text("p", string.Create(
                CultureInfo.InvariantCulture,
                $"{left} more {(left == 1 ? "case is" : "cases are")} not drawn; every curve is in its power-curve.csv.")));
    }

    private static XElement? Picture(string file, ReportedCase[] cases, int number, int of)
    {
        var title = file + (of == 1 ? "" : string.Create(CultureInfo.InvariantCulture, $" ({number} of {of})"));
        var picture = PictureOf($"curves of {title}", cases);
        return !picture.HasLines ? null : Element(
            "figure",
            Text("figcaption", title),
            new XElement(
                "img", new XAttribute(
                    "alt", Printable.Of($"power, thrust, moment and operation over wind speed: {string.Join(", ", cases.Select(c => c.Row.Case))}")),
                new XAttribute("src", "data:image/svg+xml;base64," + Convert.ToBase64String(PictureFile.Svg(picture)))));
    }

    private static CurvePicture PictureOf(string title, IEnumerable<ReportedCase> cases)
        => new(title, [.. cases.Select(c => new CurveLine(c.Row.Case, c.Curve!))]);
}
