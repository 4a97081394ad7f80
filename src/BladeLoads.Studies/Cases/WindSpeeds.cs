using System.Collections.Immutable;
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
    public static ImmutableArray<double> Read(TomlValue value, Action<Place, string> refuse) => value switch
    {
        TomlValue.List list => FromList(list, refuse),
        TomlValue.Table range => FromRange(range, refuse),
        _ => Refuse(value.At, $"is {value.Found}; give a list, or {{ from = 3, to = 25, step = 0.5 }}", refuse),
    };

    private static ImmutableArray<double> FromList(TomlValue.List list, Action<Place, string> refuse)
    {
        if (list.Items.IsEmpty)
            return Refuse(list.At, "is an empty list; give at least one wind speed", refuse);
        if (list.Items.Length > Most)
            return Refuse(list.At, $"holds more than {Limit} wind speeds; that many are enough for any curve", refuse);
        var speeds = ImmutableArray.CreateBuilder<double>(list.Items.Length);
        foreach (var item in list.Items)
        {
            if (item is not TomlValue.Number { Value: var speed } || !double.IsFinite(speed))
                return Refuse(item.At, $"holds {item.Found}; give finite numbers, without quotes", refuse);
            if (speed <= 0)
                return Refuse(item.At, $"holds {item.Found}; wind speeds must be above 0", refuse);
            if (speeds.Count > 0 && speed <= speeds[^1])
                return Refuse(item.At, speed == speeds[^1]
                    ? $"holds {item.Found} twice; each wind speed once"
                    : $"falls from {CanonicalText.Of(speeds[^1])} to {item.Found}; wind speeds must rise", refuse);
            speeds.Add(speed);
        }
        return speeds.ToImmutable();
    }

    private static ImmutableArray<double> FromRange(TomlValue.Table range, Action<Place, string> refuse)
    {
        foreach (var entry in range.Entries)
        {
            if (!RangeKeys.Contains(entry.Name))
                return Refuse(entry.Key, $"has an unknown key {VisibleText.Quote(entry.Name)}; known are from, to, step", refuse);
            if (entry.Value is not TomlValue.Number { Value: var number } || !double.IsFinite(number))
                return Refuse(entry.Value.At,
                    $"has {entry.Name} = {entry.Value.Found}; give a finite number, without quotes", refuse);
            if (number <= 0)
                return Refuse(entry.Value.At, $"has {entry.Name} = {entry.Value.Found}; it must be above 0", refuse);
        }
        if (RangeKeys.FirstOrDefault(key => range.Find(key) is null) is { } missing)
            return Refuse(range.At, $"has no {missing}; give all of from, to, step", refuse);

        var (from, to, step) = (Of("from"), Of("to"), Of("step"));
        if (from > to)
            return Refuse(range.Find("from")!.Value.At,
                $"runs from {CanonicalText.Of(from)} to {CanonicalText.Of(to)}; from must not exceed to", refuse);
        var steps = Math.Floor((to - from) / step + StepSlack);
        if (!(steps < Most))
            return RefuseStep($"which gives more than {Limit} wind speeds");
        // Multiplied, not added up: the error of a sum would grow with the number of steps.
        var speeds = Enumerable.Range(0, (int)steps + 1).Select(i => from + i * step).ToImmutableArray();
        for (var i = 1; i < speeds.Length; i++)
            if (!(speeds[i] > speeds[i - 1]))
                return RefuseStep($"too small beside {CanonicalText.Of(from)}");
        return speeds;

        ImmutableArray<double> RefuseStep(string why) => Refuse(
            range.Find("step")!.Value.At, $"has step = {CanonicalText.Of(step)}, {why}; give a larger step", refuse);

        double Of(string key) => ((TomlValue.Number)range.Find(key)!.Value).Value;
    }

    private const string Limit = "10,000";

    private static ImmutableArray<double> Refuse(Place at, string found, Action<Place, string> refuse)
    {
        refuse(at, $"speeds_m_s {found}");
        return [];
    }
}
