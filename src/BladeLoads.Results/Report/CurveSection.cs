using System.Globalization;
using System.Xml.Linq;
using BladeLoads.Results.Pictures;
using BladeLoads.Results.Wording;
using static BladeLoads.Results.Report.Html;

namespace BladeLoads.Results.Report;

/// <summary>The curves of all cases, those of one case file together.</summary>
internal static class CurveSection
{
    private const int MostPictures = 40;

    public static XElement? Of(StudyReport report)
    {
        var groups = report.Cases.Where(c => c.Curve is not null).GroupBy(c => c.File, StringComparer.Ordinal)
            .Select(group => (File: group.Key, Pages: group.Chunk(CurvePicture.MostLines).ToList())).ToList();
        var pages = groups.SelectMany(g => g.Pages.Select((cases, i) => (g.File, Cases: cases, Number: i + 1, Of: g.Pages.Count))).ToList();
        var flat = report.Cases.Where(c => c.Curve is { } curve && !new CurvePicture("", [new CurveLine(c.Row.Case, curve)]).HasLines).Select(c => c.Row.Case).ToList();
        return pages.Count == 0 ? null : Element(
            "section", Text("h2", "Curves"),
            flat.Count == 0 ? null : Text("p", $"Not drawn, with one wind speed only: {string.Join(", ", flat)}."),
            pages.Take(MostPictures).Select(page => Picture(page.File, page.Cases, page.Number, page.Of)),
            pages.Count > MostPictures
                ? Text("p", string.Create(CultureInfo.InvariantCulture, $"{pages.Count - MostPictures} more pictures are left out; every curve is in its power-curve.csv."))
                : null);
    }

    private static XElement? Picture(string file, ReportedCase[] cases, int number, int of)
    {
        var title = file + (of == 1 ? "" : string.Create(CultureInfo.InvariantCulture, $" ({number} of {of})"));
        var picture = new CurvePicture($"curves of {title}", [.. cases.Select(c => new CurveLine(c.Row.Case, c.Curve!))]);
        return !picture.HasLines ? null : Element(
            "figure",
            Text("figcaption", title),
            new XElement(
                "img", new XAttribute("alt", Printable.Of($"power, thrust, moment and operation over wind speed: {string.Join(", ", cases.Select(c => c.Row.Case))}")),
                new XAttribute("src", "data:image/svg+xml;base64," + Convert.ToBase64String(PictureFile.Svg(picture)))));
    }
}
