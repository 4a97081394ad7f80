using System.Collections.Immutable;
using System.Globalization;
using System.Xml.Linq;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Receipts;
using BladeLoads.Results.Wording;
using static BladeLoads.Results.Report.Html;

namespace BladeLoads.Results.Report;

/// <summary>The figures of all cases, their difference to the baseline, and the marks they carry.</summary>
internal static class SummarySection
{
    private const double JoulesPerMegawattHour = 3.6e9;

    public static XElement Of(StudyReport report)
    {
        var baseline = report.Cases.FirstOrDefault(c => c.Row.Case == report.Baseline)?.Row.Summary;
        return Element(
            "section", Text("h2", "Summary"), Figures(report.Cases),
            Text("p", "Largest values over the rows of the curve and the design points in operation; moments at the blade root. m/s: the wind speed there."),
            baseline is null ? null : Differences(report, baseline),
            Marks(report.Cases));
    }

    private static XElement Figures(ImmutableArray<ReportedCase> cases)
    {
        var hasEnergy = cases.Any(c => c.Row.Summary?.Energy is not null);
        return Table(
            1..^1,
            [
                "case", "best power coefficient", "at tip-speed ratio", "electrical power, kW", "rated at, m/s", "thrust, kN", "m/s",
                "flapwise moment, kNm", "m/s", "edgewise moment, kNm", "m/s", .. hasEnergy ? (string[])["net energy, MWh a year", "capacity factor"] : [],
                "state, marks with their points",
            ],
            cases.Select(c => (string[])[c.Row.Case, .. Figures(c.Row.Summary, hasEnergy), State(c)])).Class("figures");
    }

    private static string[] Figures(CaseSummary? s, bool hasEnergy) =>
    [
        s?.BestPowerCoefficient?.Value.ToString("0.0000", CultureInfo.InvariantCulture) ?? None, Figure(s?.BestTipSpeedRatio),
        Figure(s?.LargestElectricalPower?.Value / 1000), Figure(s?.RatedWindSpeed), Figure(s?.LargestThrust?.Value / 1000),
        Figure(s?.LargestThrust?.WindSpeed), Figure(s?.LargestFlapwiseMoment?.Value / 1000), Figure(s?.LargestFlapwiseMoment?.WindSpeed),
        Figure(s?.LargestEdgewiseMoment?.Value / 1000), Figure(s?.LargestEdgewiseMoment?.WindSpeed),
        .. hasEnergy ? (string[])[Figure(s?.Energy?.AnnualEnergy / JoulesPerMegawattHour), Figure(s?.Energy?.CapacityFactor)] : [],
    ];

    private static string State(ReportedCase c)
        => string.Join(' ', new[] { c.Row.State == "current" ? "" : c.Row.State, c.Row.Summary?.MarksText ?? "" }.Where(text => text.Length > 0));

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
