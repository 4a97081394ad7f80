using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Rotor.Energy;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Tables;

/// <summary>A measured histogram of wind speeds as read.</summary>
/// <param name="Climate">Null when an error keeps the table from being used.</param>
/// <param name="Canonical">The parsed values.</param>
internal sealed record HistogramTable(WindClimate.Histogram? Climate, CanonicalTable Canonical, InputFile Input)
{
    private const double SumTolerance = 1e-6;

    private static readonly ImmutableArray<Column> Columns = [new("from_m_s", true), new("to_m_s", true), new("share", true)];

    public static HistogramTable Parse(InputText input, Findings findings)
    {
        using var rows = new CsvRows(input, findings);
        var (edges, shares, lines) = (new List<double>(), new List<double>(), new List<string>());
        if (rows.ReadHeader(Columns))
        {
            while (rows.Read())
                ReadRow(rows, edges, shares, lines);
            if (!rows.HasErrors && shares.Count == 0)
                rows.Error(new Place(input.File, 0, 0), "has no row; a histogram needs one or more");
            if (!rows.HasErrors && shares.Sum() is var sum && !(Math.Abs(sum - 1) <= SumTolerance))
                rows.Error(rows.Header("share"), WrongSum(sum, shares.Count, edges));
        }
        var canonical = Fingerprint.OfTable("site.histogram", input.File, () => lines);
        if (rows.HasErrors)
            return new HistogramTable(null, canonical, new InputFile(input.File, input.Sha256, "histogram with errors"));
        return new HistogramTable(
            new WindClimate.Histogram([.. edges], [.. shares]), canonical,
            new InputFile(input.File, input.Sha256, string.Create(
                CultureInfo.InvariantCulture, $"{shares.Count} bins from {CanonicalText.Of(edges[0])} to {CanonicalText.Of(edges[^1])} m/s")));
    }

    private static string WrongSum(double sum, int bins, List<double> edges) => sum == 0
        ? "share sums to 0, so the year would have no wind at all; give the share of time of each bin, which make 1 together"
        : string.Create(CultureInfo.InvariantCulture,
        $"share sums to {sum:G9} over {bins} bins from {edges[0]} to {edges[^1]} m/s, so {Math.Abs(1 - sum):0.####%} of the year would be ")
        + (sum < 1
            ? "missing; the shares must make 1 within a millionth: add the bins that are missing, "
            : "counted twice; the shares must make 1 within a millionth: take out what is there twice, ")
        + string.Create(CultureInfo.InvariantCulture, $"or divide each share by {sum:G9}");

    private static void ReadRow(CsvRows rows, List<double> edges, List<double> shares, List<string> lines)
    {
        var (from, to, share) = (rows.Number("from_m_s"), rows.Number("to_m_s"), rows.Number("share"));
        if (from < 0)
            rows.Error("from_m_s", $"from_m_s is {CanonicalText.Of(from)}; it must be 0 or more");
        else if (edges.Count > 0 && !double.IsNaN(from) && from != edges[^1])
            rows.Error("from_m_s", $"from_m_s is {CanonicalText.Of(from)}, where the bin before ends at {CanonicalText.Of(edges[^1])}; "
                + "bins must follow on one another (give an empty one share 0)");
        if (to <= from)
            rows.Error("to_m_s", $"to_m_s is {CanonicalText.Of(to)}, not above from_m_s {CanonicalText.Of(from)}; a bin must have a width");
        if (share is < 0 or > 1)
            rows.Error("share", $"share is {CanonicalText.Of(share)}; "
                + (share < 0 ? "no time is negative" : "no bin holds more than all of the year")
                + ": give the share of time, from 0 to 1, not percent or hours");
        if (edges.Count == 0)
            edges.Add(from);
        edges.Add(to);
        shares.Add(share);
        lines.Add(CanonicalText.Of([from, to, share]));
    }
}
