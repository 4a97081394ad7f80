using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Toml;

namespace BladeLoads.Studies.Cases;

/// <summary>The wind speeds of a case: a list, or from-to-step with both ends.</summary>
internal static class WindSpeeds
{
    private const int Most = 10_000;
    private const double StepSlack = 1e-9; // of a step: 3 + 0.1 + 0.1 ... must still end at its `to`

    private static readonly string[] RangeKeys = ["from", "to", "step"];

    /// <summary>m/s, rising; empty when they are wrong, and then the reason is reported.</summary>
    public static ImmutableArray<double> Read(TomlValue value, Findings findings) => value switch
    {
        TomlValue.List list => FromList(list, findings),
        TomlValue.Table range => FromRange(range, findings),
        _ => Refuse(value.At, $"is {value.Found}; give a list, or {{ from = 3, to = 25, step = 0.5 }}", findings),
    };

    private static ImmutableArray<double> FromList(TomlValue.List list, Findings findings)
    {
        if (list.Items.IsEmpty)
            return Refuse(list.At, "is an empty list; give at least one wind speed", findings);
        if (list.Items.Length > Most)
            return Refuse(list.At, $"holds more than {Limit} wind speeds; that many are enough for any curve", findings);
        var speeds = ImmutableArray.CreateBuilder<double>(list.Items.Length);
        foreach (var item in list.Items)
        {
            if (item is not TomlValue.Number { Value: var speed } || !double.IsFinite(speed))
                return Refuse(item.At, $"holds {item.Found}; give finite numbers, without quotes", findings);
            if (speed <= 0)
                return Refuse(item.At, $"holds {item.Found}; wind speeds must be above 0", findings);
            if (speed > Limits.WindSpeed)
                return Refuse(item.At,
                    $"holds {item.Found}; wind speeds must be at most {CanonicalText.Of(Limits.WindSpeed)} m/s", findings);
            if (speeds.Count > 0 && speed <= speeds[^1])
                return Refuse(item.At, speed == speeds[^1]
                    ? $"holds {item.Found} twice; each wind speed once"
                    : $"falls from {CanonicalText.Of(speeds[^1])} to {item.Found}; wind speeds must rise", findings);
            speeds.Add(speed);
        }
        return speeds.ToImmutable();
    }

    private static ImmutableArray<double> FromRange(TomlValue.Table range, Findings findings)
    {
        foreach (var entry in range.Entries)
        {
            if (!RangeKeys.Contains(entry.Name))
                return Refuse(entry.Key,
                    $"has an unknown key {VisibleText.Quote(entry.Name)}; known are from, to, step", findings);
            if (entry.Value is not TomlValue.Number { Value: var number } || !double.IsFinite(number))
                return Refuse(entry.Value.At,
                    $"has {entry.Name} = {entry.Value.Found}; give a finite number, without quotes", findings);
            if (number <= 0)
                return Refuse(entry.Value.At, $"has {entry.Name} = {entry.Value.Found}; it must be above 0", findings);
            if (number > Limits.WindSpeed)
                return Refuse(entry.Value.At, $"has {entry.Name} = {entry.Value.Found}; "
                    + $"wind speeds must be at most {CanonicalText.Of(Limits.WindSpeed)} m/s", findings);
        }
        if (RangeKeys.FirstOrDefault(key => range.Find(key) is null) is { } missing)
            return Refuse(range.At, $"has no {missing}; give all of from, to, step", findings);

        var (from, to, step) = (Of("from"), Of("to"), Of("step"));
        if (from > to)
            return Refuse(range.Find("from")!.Value.At,
                $"runs from {CanonicalText.Of(from)} to {CanonicalText.Of(to)}; from must not exceed to", findings);
        var steps = Math.Floor((to - from) / step + StepSlack);
        if (!(steps < Most))
            return RefuseStep($"which gives more than {Limit} wind speeds");
        // Multiplied, not added up: the error of a sum would grow with the number of steps.
        var speeds = Enumerable.Range(0, (int)steps + 1).Select(i => Rounded(from + i * step)).ToImmutableArray();
        for (var i = 1; i < speeds.Length; i++)
            if (!(speeds[i] > speeds[i - 1]))
                return RefuseStep($"too small beside {CanonicalText.Of(from)}");
        if (to - speeds[^1] > StepSlack * step)
            findings.Doubt(range.Find("to")!.Value.At,
                $"{CanonicalText.Of(to)} is not reached in steps of {CanonicalText.Of(step)}; "
                + $"the last wind speed is {CanonicalText.Of(speeds[^1])}");
        return speeds;

        ImmutableArray<double> RefuseStep(string why) => Refuse(
            range.Find("step")!.Value.At, $"has step = {CanonicalText.Of(step)}, {why}; give a larger step", findings);

        double Of(string key) => ((TomlValue.Number)range.Find(key)!.Value).Value;
    }

    // To 12 significant digits: 4 + 28 x 0.7 is 23.6 to whoever wrote it, and 23.599999999999998 to a processor.
    private static double Rounded(double speed)
        => double.Parse(speed.ToString("G12", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);

    private const string Limit = "10,000";

    private static ImmutableArray<double> Refuse(Place at, string found, Findings findings)
    {
        findings.Error(at, $"speeds_m_s {found}");
        return [];
    }
}
