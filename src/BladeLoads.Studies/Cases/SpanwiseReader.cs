using System.Collections.Immutable;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Toml;

namespace BladeLoads.Studies.Cases;

/// <summary>Reads outputs.spanwise: the wind speeds whose elements are written.</summary>
internal static class SpanwiseReader
{
    private const string Path = "outputs.spanwise";
    private const double Closeness = 1e-9; // of the wind speed: 3.3 in a list is 3 + 3 x 0.1 of a range

    /// <returns>Null for all, empty for none.</returns>
    public static ImmutableArray<double>? Read(CaseValues values, ImmutableArray<double> windSpeeds)
    {
        var chosen = Chosen(values, windSpeeds);
        values.Note(Path, chosen switch { null => "all", { IsEmpty: true } => "none", { } some => CanonicalText.Of(some) });
        return chosen;
    }

    private static ImmutableArray<double>? Chosen(CaseValues values, ImmutableArray<double> windSpeeds)
    {
        switch (values.Find(Path)?.Value)
        {
            case null or TomlValue.Text { Value: "all" }:
                return null;
            case TomlValue.Text { Value: "none" }:
                return [];
            case TomlValue.List list:
                return [.. list.Items.SelectMany(item => OfCase(values, windSpeeds, item)).Distinct().Order()];
            case var other:
                values.RefuseValue(Path, $"is {other.Found}; write \"all\", \"none\" or a list of wind speeds");
                return null;
        }
    }

    private static IEnumerable<double> OfCase(CaseValues values, ImmutableArray<double> windSpeeds, TomlValue item)
    {
        if (item is not TomlValue.Number { Value: var wanted })
            values.Refuse(item.At, $"spanwise holds {item.Found}; give wind speeds as numbers");
        else if (windSpeeds.Where(v => Math.Abs(v - wanted) <= Closeness * v).ToList() is [var windSpeed, ..])
            return [windSpeed];
        else if (!windSpeeds.IsEmpty)
            values.Refuse(item.At, $"spanwise holds {item.Found}, which is no wind speed of the case; "
                + $"the nearest is {CanonicalText.Of(windSpeeds.MinBy(v => Math.Abs(v - wanted)))}");
        return [];
    }
}
