using System.Globalization;
using System.Xml.Linq;
using static BladeLoads.Results.Report.Html;
using static BladeLoads.Results.Wording.FigureText;

namespace BladeLoads.Results.Report;

/// <summary>What the last run that solved anything moved, case by case, with the reason.</summary>
internal static class MovedSection
{
    private const int MostCases = 40;

    public static XElement? Of(StudyReport report) => report.Moved.IsEmpty ? null : Element(
        "section", Text("h2", "What the last run that solved anything moved"),
        report.Moved.Take(MostCases).Select(CaseOf),
        report.Moved.Length > MostCases
            ? Text("p", string.Create(CultureInfo.InvariantCulture, $"{report.Moved.Length - MostCases} more cases are in changes.csv."))
            : null);

    private static XElement CaseOf(MovedCase moved) => Element(
        "section", Text("h3", moved.Why.Length == 0 ? moved.Case : $"{moved.Case} ({moved.Why})"),
        moved.Note.Length == 0 ? null : Text("p", moved.Note),
        moved.Figures.IsEmpty ? null : Table(
            1..^1, ["figure", "before", "m/s", "now", "m/s", "change, %", ""],
            moved.Figures.Select(f => (string[])
            [
                f.Unit.Length == 0 ? f.Figure : $"{f.Figure}, {f.Unit}", Value(f, f.Old), Figure(f.OldAt), Value(f, f.New), Figure(f.NewAt),
                Percent(f.Percent), f.Note,
            ])));

    private static string Value(MovedFigure figure, double? value) => figure.Unit switch
    {
        "" => Coefficient(value),
        "points" => value?.ToString("0", CultureInfo.InvariantCulture) ?? None,
        _ => Figure(value),
    };
}
