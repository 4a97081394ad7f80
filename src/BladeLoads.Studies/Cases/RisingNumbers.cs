using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Toml;

namespace BladeLoads.Studies.Cases;

/// <summary>Numbers that rise, written as a list or as from-to-step with both ends.</summary>
/// <param name="Key">As messages name it.</param>
/// <param name="Noun">One of them: <c>wind speed</c>.</param>
/// <param name="Unit">As messages write it.</param>
/// <param name="Bounds">What each may be, in the unit of the file.</param>
/// <param name="Range">A range as an example.</param>
internal sealed record RisingNumbers(string Key, string Noun, string Unit, Bounds Bounds, string Range)
{
    private const int Most = 10_000;
    private const string Limit = "10,000";
    private const double StepSlack = 1e-9; // of a step: 3 + 0.1 + 0.1 ... must still end at its `to`

    private static readonly string[] RangeKeys = ["from", "to", "step"];

    /// <summary>Rising; empty when they are wrong, and then the reason is reported.</summary>
    public ImmutableArray<double> Read(TomlValue value, Findings findings) => value switch
    {
        TomlValue.List list => FromList(list, findings),
        TomlValue.Table range => FromRange(range, findings),
        _ => Refuse(value.At, $"is {value.Found}; give a list, or {Range}", findings),
    };

    private ImmutableArray<double> FromList(TomlValue.List list, Findings findings)
    {
        if (list.Items.IsEmpty)
            return Refuse(list.At, $"is an empty list; give at least one {Noun}", findings);
        if (list.Items.Length > Most)
            return Refuse(list.At, $"holds more than {Limit} {Noun}s; that many are enough for any curve", findings);
        var numbers = ImmutableArray.CreateBuilder<double>(list.Items.Length);
        foreach (var item in list.Items)
        {
            if (item is not TomlValue.Number { Value: var number } || !double.IsFinite(number))
                return Refuse(item.At, $"holds {item.Found}; give finite numbers, without quotes", findings);
            if (!Bounds.Contain(number))
                return Refuse(item.At, $"holds {item.Found}; {Noun}s {Rule(number)}", findings);
            if (numbers.Count > 0 && number <= numbers[^1])
                return Refuse(item.At, number == numbers[^1]
                    ? $"holds {item.Found} twice; each {Noun} once"
                    : $"falls from {CanonicalText.Of(numbers[^1])} to {item.Found}; {Noun}s must rise", findings);
            numbers.Add(number);
        }
        return numbers.ToImmutable();
    }

    private ImmutableArray<double> FromRange(TomlValue.Table range, Findings findings)
    {
        foreach (var entry in range.Entries)
        {
            if (!RangeKeys.Contains(entry.Name))
                return Refuse(entry.Key, $"has an unknown key {VisibleText.Quote(entry.Name)}; known are from, to, step", findings);
            if (entry.Value is not TomlValue.Number { Value: var number } || !double.IsFinite(number))
                return Refuse(entry.Value.At,
                    $"has {entry.Name} = {entry.Value.Found}; give a finite number, without quotes", findings);
            if (entry.Name == "step" && number <= 0)
                return Refuse(entry.Value.At, $"has step = {entry.Value.Found}; it must be above 0", findings);
            if (number > Bounds.High)
                return Refuse(entry.Value.At, $"has {entry.Name} = {entry.Value.Found}; {Noun}s {Rule(number)}", findings);
            if (entry.Name != "step" && !Bounds.Contain(number))
                return Refuse(entry.Value.At, $"has {entry.Name} = {entry.Value.Found}; it {Rule(number)}", findings);
        }
        if (RangeKeys.FirstOrDefault(key => range.Find(key) is null) is { } missing)
            return Refuse(range.At, $"has no {missing}; give all of from, to, step", findings);

        var (from, to, step) = (Of("from"), Of("to"), Of("step"));
        if (from > to)
            return Refuse(range.Find("from")!.Value.At,
                $"runs from {CanonicalText.Of(from)} to {CanonicalText.Of(to)}; from must not exceed to", findings);
        var steps = Math.Floor((to - from) / step + StepSlack);
        if (!(steps < Most))
            return RefuseStep($"which gives more than {Limit} {Noun}s");
        // Multiplied, not added up: the error of a sum would grow with the number of steps.
        var numbers = Enumerable.Range(0, (int)steps + 1).Select(i => Rounded(from + i * step)).ToImmutableArray();
        for (var i = 1; i < numbers.Length; i++)
            if (!(numbers[i] > numbers[i - 1]))
                return RefuseStep($"too small beside {CanonicalText.Of(from)}");
        if (to - numbers[^1] > StepSlack * step)
            findings.Doubt(range.Find("to")!.Value.At,
                $"{CanonicalText.Of(to)} is not reached in steps of {CanonicalText.Of(step)}; "
                + $"the last {Noun} is {CanonicalText.Of(numbers[^1])}");
        return numbers;

        ImmutableArray<double> RefuseStep(string why) => Refuse(
            range.Find("step")!.Value.At, $"has step = {CanonicalText.Of(step)}, {why}; give a larger step", findings);

        double Of(string key) => ((TomlValue.Number)range.Find(key)!.Value).Value;
    }

    private string Rule(double number) => number > Bounds.High ? $"must be at most {CanonicalText.Of(Bounds.High)} {Unit}"
        : Bounds.LowIncluded ? $"must be {CanonicalText.Of(Bounds.Low)} or more"
        : $"must be above {CanonicalText.Of(Bounds.Low)}";

    // To 12 significant digits: 4 + 28 x 0.7 is 23.6 to whoever wrote it, and 23.599999999999998 to a processor.
    private static double Rounded(double number)
        => double.Parse(number.ToString("G12", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);

    private ImmutableArray<double> Refuse(Place at, string found, Findings findings)
    {
        findings.Error(at, $"{Key} {found}");
        return [];
    }
}
