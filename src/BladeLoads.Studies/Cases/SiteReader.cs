using System.Collections.Immutable;
using BladeLoads.Rotor.Energy;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Tables;
using BladeLoads.Studies.Toml;

namespace BladeLoads.Studies.Cases;

/// <summary>What [site] says.</summary>
/// <param name="Site">Null where there is none, or an error keeps it from being known.</param>
internal sealed record SiteValues(Site? Site, HistogramTable? Histogram);

/// <summary>Reads [site].</summary>
internal static class SiteReader
{
    private const string Mean = "site.mean_wind_speed_m_s", Shape = "site.weibull_shape", Availability = "site.availability";
    private const string Losses = "site.losses", Histogram = "site.histogram";

    public static SiteValues Read(CaseValues values, StudyFolder folder, StudyTables tables)
    {
        if (!new[] { Mean, Shape, Availability, Losses, Histogram }.Any(values.Has))
            return new SiteValues(null, null);
        var availability = values.Number(Availability, CaseDefaults.Availability, Ranges.Availability);
        var losses = ReadLosses(values);
        if (values.Has(Histogram))
        {
            values.RefuseTogether([Mean, Shape], Histogram, "says how often each wind speed blows");
            var table = ReadHistogram(values, folder, tables);
            return new SiteValues(
                table?.Climate is { } measured ? new Site(measured, CaseDefaults.WeibullShape, availability, losses) : null, table);
        }
        var mean = values.RequiredNumber(Mean, Ranges.MeanWindSpeed);
        var shape = values.Number(Shape, CaseDefaults.WeibullShape, Ranges.WeibullShape);
        return new SiteValues(
            values.IsSound ? new Site(new WindClimate.Weibull(mean, shape), shape, availability, losses) : null, null);
    }

    private static ImmutableArray<(string Name, double Share)> ReadLosses(CaseValues values)
    {
        if (values.Find(Losses) is not { } entry)
            return [];
        if (entry.Value is not TomlValue.Table table)
        {
            values.RefuseValue(Losses, $"is {entry.Value.Found}; name each loss with its share: {entry.Known.Example}");
            return [];
        }
        var losses = ImmutableArray.CreateBuilder<(string Name, double Share)>();
        foreach (var loss in table.Entries)
            if (loss.Value is not TomlValue.Number { Value: var share } || !double.IsFinite(share))
                values.Refuse(loss.Value.At, $"losses has {VisibleText.Quote(loss.Name)} {loss.Value.Found}; {Ranges.Loss.Remedy}");
            else if (!Ranges.Loss.Contain(share))
                values.Refuse(loss.Value.At, $"losses has {VisibleText.Quote(loss.Name)} {loss.Value.Found}; {Ranges.Loss.Refusal(share)}");
            else
                losses.Add((loss.Name, share));
        // In one order, whatever the case's: the losses are the same.
        losses.Sort((a, b) => string.CompareOrdinal(a.Name, b.Name));
        values.Note(Losses, string.Join(',', losses.Select(loss => $"{VisibleText.Escape(loss.Name)}:{CanonicalText.Of(loss.Share)}")));
        return losses.ToImmutable();
    }

    private static HistogramTable? ReadHistogram(CaseValues values, StudyFolder folder, StudyTables tables)
    {
        if (values.Text(Histogram) is not { } reference)
            return null;
        var at = values.Find(Histogram)!.Value.At;
        if (folder.Locate(at.File, reference, EntryKind.File, out var problem) is not { } fullPath)
        {
            values.Refuse(at, problem);
            return null;
        }
        values.Uses(folder.RelativePath(fullPath));
        if (tables.Histogram(fullPath) is not { Climate: not null } table)
        {
            values.Spoil();
            return null;
        }
        values.Note(Histogram, table.Canonical.Hash);
        return table;
    }
}
