using System.Collections.Immutable;
using System.Xml.Linq;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Receipts;
using BladeLoads.Results.Wording;
using static BladeLoads.Results.Report.Html;
using static BladeLoads.Results.Tables.FileUnits;
using static BladeLoads.Results.Wording.FigureText;

namespace BladeLoads.Results.Report;

/// <summary>The figures of all cases, their difference to the baseline, and the marks they carry.</summary>
internal static class SummarySection
{
    public static XElement Of(StudyReport report)
    {
        var baseline = report.Cases.FirstOrDefault(c => c.Row.Case == report.Baseline)?.Row.Summary;
        return Element(
            "section", Text("h2", "Summary"), Figures(report.Cases),
            Text("p", "Largest values over the rows of the curve and the design points in operation; moments at the blade root. m/s: the wind speed there."),
            BestAndEnergy(report.Cases),
            baseline is not null ? Differences(report, baseline)
                : report.Baseline is null ? null
                : Text("p", $"No difference to a baseline is shown: '{report.Baseline}' has no current result."),
            Marks(report.Cases));
    }

    private static XElement Figures(ImmutableArray<ReportedCase> cases) => Table(
        1..^1,
        [
            "case", "best power coefficient", "at tip-speed ratio", "electrical power, kW", "rated at, m/s", "thrust, kN", "m/s",
            "flapwise moment, kNm", "m/s", "edgewise moment, kNm", "m/s", "state, marks with their points",
        ],
        cases.Select(c => (string[])[c.Row.Case, .. Figures(c.Row.Summary), State(c)])).Class("figures");

    private static string[] Figures(CaseSummary? s) =>
    [
        Coefficient(s?.BestPowerCoefficient?.Value), Figure(s?.BestTipSpeedRatio),
        InKilo(s?.LargestElectricalPower), Figure(s?.RatedWindSpeed), InKilo(s?.LargestThrust),
        Figure(s?.LargestThrust?.WindSpeed), InKilo(s?.LargestFlapwiseMoment), Figure(s?.LargestFlapwiseMoment?.WindSpeed),
        InKilo(s?.LargestEdgewiseMoment), Figure(s?.LargestEdgewiseMoment?.WindSpeed),
    ];

    private static string InKilo(Extreme? extreme) => Figure(extreme is null ? null : Kilo(extreme.Value));

    private static string InMegawattHours(double? energy) => Figure(energy is { } joules ? MegawattHours(joules) : null);

    private static string State(ReportedCase c) => string.Join(
        ' ',
        new[] { c.Row.State == "current" ? "" : c.Reason.Length == 0 ? c.Row.State : $"{c.Row.State}: {c.Reason}", c.Row.Summary?.MarksText ?? "" }
            .Where(text => text.Length > 0));

    // Cases that searched their best point, or have a year; none, none of it.
    private static object[] BestAndEnergy(ImmutableArray<ReportedCase> cases)
    {
        var told = cases.Where(c => c.Row.Summary is { Energy: not null } or { Best.Searched: true }).ToList();
        return told.Count == 0 ? [] :
        [
            Text("h3", "Best point found, year at the site"),
            Table(
                1..,
                [
                    "case", "tip-speed ratio", "pitch, deg", "net energy, MWh a year", "capacity factor", "with turbulence, MWh a year", "its capacity factor",
                ],
                told.Select(c =>
                {
                    var best = c.Row.Summary!.Best is { Searched: true } searched ? searched : null;
                    var energy = c.Row.Summary.Energy;
                    return (string[])
                    [
                        c.Row.Case, Figure(best?.TipSpeedRatio), Figure(best is null ? null : Deg(best.FinePitch)),
                        InMegawattHours(energy?.AnnualEnergy), Figure(energy?.CapacityFactor),
                        InMegawattHours(energy?.TurbulentAnnualEnergy), Figure(energy?.TurbulentCapacityFactor),
                    ];
                })),
        ];
    }

    private static object[] Differences(StudyReport report, CaseSummary baseline)
    {
        var others = report.Cases.Where(c => c.Row.Summary is not null && c.Row.Case != report.Baseline).ToList();
        if (others.Count == 0)
            return [];
        return
        [
            Text("h3", $"Difference to {report.Baseline}, %"),
            Table(
                1.., ["case", "best power coefficient", "electrical power", "rated wind speed", "thrust", "flapwise moment", "annual energy"],
                others.Select(c =>
                {
                    var d = BaselineDifference.Between(c.Row.Summary!, baseline);
                    return (string[])
                    [
                        c.Row.Case, Percent(d.BestPowerCoefficient), Percent(d.LargestElectricalPower), Percent(d.RatedWindSpeed), Percent(d.LargestThrust),
                        Percent(d.LargestFlapwiseMoment), Percent(d.AnnualEnergy),
                    ];
                })),
        ];
    }

    private static object[] Marks(ImmutableArray<ReportedCase> cases)
    {
        var carried = StatusWords.PointWords.Where(m => cases.Any(c => c.Row.Summary?.Marks.ContainsKey(m.Word) == true)).ToList();
        return carried.Count == 0 ? [] :
        [
            Text("h3", "Marks"),
            Table(^0.., ["mark", "means"], carried.Select(m => (string[])[m.Word, MarkText.Of(m.Mark)])),
        ];
    }
}
