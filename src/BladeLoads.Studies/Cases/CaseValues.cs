using System.Collections.Immutable;
using System.Text;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Tables;
using BladeLoads.Studies.Toml;

namespace BladeLoads.Studies.Cases;

/// <summary>
/// The values of one case, read key by key, each checked, reported when wrong, and noted when it determines the result. A value
/// that is wrong reads as NaN or null; the case is then not sound and is not built.
/// </summary>
internal sealed class CaseValues(CaseFile file, ImmutableDictionary<string, CaseEntry> entries, Findings findings)
{
    private readonly ImmutableSortedDictionary<string, string>.Builder _determining
        = ImmutableSortedDictionary.CreateBuilder<string, string>(StringComparer.Ordinal);

    private readonly HashSet<string> _saidNotYet = new(StringComparer.Ordinal);
    private readonly List<string> _used = [file.File];

    /// <summary>Nothing was wrong so far.</summary>
    public bool IsSound { get; private set; } = true;

    public CaseEntry? Find(string path) => entries.GetValueOrDefault(path);

    public bool Has(string path) => entries.ContainsKey(path);

    /// <summary>The value is not the case's own but one that every case starts from.</summary>
    public bool IsStartingValue(CaseEntry entry) => entry.Key.File != file.File;

    /// <summary>Every value noted so far.</summary>
    public ImmutableSortedDictionary<string, string> Determining => _determining.ToImmutable();

    public void Note(string path, string canonicalText) => _determining[path] = canonicalText;

    public double Number(string path, double whenLeftOut, Bounds bounds)
    {
        var value = Has(path) ? Check(path, bounds) : whenLeftOut;
        Note(path, double.IsInfinity(value) ? "none" : CanonicalText.Of(value));
        return value;
    }

    public double RequiredNumber(string path, Bounds bounds, string? whenMissing = null)
    {
        if (Has(path))
            return Number(path, double.NaN, bounds);
        Missing(path, whenMissing);
        return double.NaN;
    }

    /// <summary>A number, or null for <c>"best"</c> and for a key that is left out; NaN where it is wrong.</summary>
    public double? NumberOrBest(string path, Bounds bounds)
    {
        if (Find(path) is not { } entry || entry.Value is TomlValue.Text { Value: "best" })
        {
            Note(path, "best");
            return null;
        }
        if (entry.Value is TomlValue.Number or TomlValue.Text { Value: [(>= '0' and <= '9') or '-' or '+' or '.' or ' ', ..] })
            return Number(path, double.NaN, bounds);
        return RefuseValue(path, $"is {entry.Value.Found}; give a number, or \"best\" for the one with the highest power coefficient");
    }

    public double? OptionalNumber(string path, Bounds bounds)
    {
        double? value = Has(path) ? Check(path, bounds) : null;
        Note(path, value is { } number ? CanonicalText.Of(number) : "none");
        return value;
    }

    /// <summary>0 where the value is wrong.</summary>
    public int WholeNumber(string path, int? whenLeftOut, int low, int high)
    {
        if (!Has(path) && whenLeftOut is null)
        {
            Missing(path, null);
            return 0;
        }
        var value = Number(path, whenLeftOut ?? double.NaN, Bounds.FromTo(low, high));
        if (double.IsNaN(value))
            return 0;
        if (value == Math.Floor(value))
            return (int)value;
        RefuseValue(path, $"is {CanonicalText.Of(value)}; give a whole number");
        return 0;
    }

    /// <summary>A number that determines nothing yet: only checked. NaN where it is left out or wrong.</summary>
    public double Check(string path, Bounds bounds)
    {
        if (Find(path) is not { } entry)
            return double.NaN;
        if (entry.Value is not TomlValue.Number number)
            return NotYet.Sentence(path, entry.Value) is { } sentence
                ? RefuseYet(entry, sentence)
                : RefuseValue(path, NotANumber(entry));
        if (!double.IsFinite(number.Value))
            return RefuseValue(path, $"is {number.Found}; give a finite number");
        if (!bounds.Contain(number.Value))
            return RefuseValue(path, $"is {number.Found}; {bounds.Refusal(number.Value)}");
        return NotYet.Sentence(path, number) is { } notYet ? RefuseYet(entry, notYet) : number.Value;
    }

    /// <summary>Text as written; null where it is left out or no text.</summary>
    public string? Text(string path)
    {
        if (Find(path) is not { } entry)
            return null;
        if (entry.Value is TomlValue.Text text)
            return text.Value;
        RefuseValue(path, $"is {entry.Value.Found}; give text in quotes, such as {entry.Known.Example}");
        return null;
    }

    /// <summary>One of the choices; null where it is wrong. Noted.</summary>
    public string? Choice(string path, string whenLeftOut, params ReadOnlySpan<string> choices)
    {
        var chosen = Has(path) ? CheckedChoice(path, choices) : whenLeftOut;
        Note(path, chosen ?? "");
        return chosen;
    }

    /// <summary>One of the choices; null where it is left out or wrong. Not noted.</summary>
    public string? CheckedChoice(string path, params ReadOnlySpan<string> choices)
    {
        if (Text(path) is not { } text)
            return null;
        if (!choices.Contains(text))
            RefuseValue(path, $"is {VisibleText.Quote(text)}; write {OneOf(choices)}");
        else if (NotYet.Sentence(path, Find(path)!.Value) is { } sentence)
            RefuseYet(Find(path)!, sentence);
        else
            return text;
        return null;
    }

    public void Missing(string path, string? sentence)
    {
        var known = KnownKeys.Find(path)!;
        IsSound = false;
        if (file.DoubtfulTables.Contains(known.Table))
            return;
        var place = file.Tables.TryGetValue(known.Table, out var header) ? header : new Place(file.File, 0, 0);
        var where = known.Table.Length == 0 ? "" : $"[{known.Table}] ";
        Refuse(place, sentence ?? $"{where}{known.Name} is missing; write it, such as {known.Name} = {known.Example}");
    }

    /// <summary>Reports at the value of a key; the text goes on after the key's name.</summary>
    /// <returns>NaN, as the value.</returns>
    public double RefuseValue(string path, string found)
    {
        var entry = Find(path)!;
        Refuse(entry.Value.At, $"{entry.Known.Name} {found}");
        return double.NaN;
    }

    /// <summary>Raises a doubt at the value of a key; the text goes on after the key's name.</summary>
    public void Doubt(string path, string found)
    {
        var entry = Find(path)!;
        findings.Doubt(entry.Value.At, $"{entry.Known.Name} {found}");
    }

    /// <summary>Reports at a key.</summary>
    public void RefuseKey(string path, string text) => Refuse(Find(path)!.Key, text);

    /// <summary>Keys that do not go with another, where they are there beside it: one error that names them all, at the first of them.</summary>
    /// <param name="why">What the other does already.</param>
    /// <param name="remark">What else is to be said of them; empty for nothing.</param>
    public void RefuseTogether(IEnumerable<string> paths, string other, string why, string remark = "")
    {
        var found = paths.Select(Find).OfType<CaseEntry>().OrderBy(e => PlaceOfKey(e).Line).ThenBy(e => PlaceOfKey(e).Column).ToList();
        if (found.Count == 0 || Find(other) is not { } second)
            return;
        var names = found.Select(e => $"'{e.Known.Name}'").ToList();
        Refuse(PlaceOfKey(found[0]), names.Count == 1
            ? $"{names[0]} does not go with {second.Known.Name}, which {why}; leave one of them out"
            : $"{string.Join(", ", names[..^1])} and {names[^1]} do not go with {second.Known.Name}, which {why}; "
                + $"leave {second.Known.Name} out, or the others{remark}");
    }

    // A swept key stands once, whatever the number of its values.
    private Place PlaceOfKey(CaseEntry entry)
        => entry.IsSwept ? file.Sweep.First(s => s.Known == entry.Known).Key : entry.Key;

    public void Refuse(Place at, string text)
    {
        IsSound = false;
        findings.Error(at, text);
    }

    /// <summary>The files whose errors are errors of this case, its own first; relative to the study folder.</summary>
    public IReadOnlyList<string> Used => _used;

    public void Uses(string usedFile) => _used.Add(usedFile);

    /// <summary>Something was wrong that is reported already.</summary>
    public void Spoil() => IsSound = false;

    private double RefuseYet(CaseEntry entry, string sentence)
    {
        IsSound = false;
        // Once for a table that is not there yet, not once for each of its keys.
        if (_saidNotYet.Add(sentence))
            findings.Error(entry.Key, $"{entry.Known.Name} is {entry.Value.Found}; {sentence}");
        return double.NaN;
    }

    private static string NotANumber(CaseEntry entry)
    {
        if (entry.Value is not TomlValue.Text { Value: var text } quoted)
            return $"is {entry.Value.Found}; give a number, such as {entry.Known.Example}";
        var trimmed = text.Trim();
        if (NumberText.TryParse(Encoding.UTF8.GetBytes(trimmed), out _))
            return $"is {quoted.Found} in quotes, which is text; write the number without quotes: {trimmed}";
        return NumberText.Misprint(trimmed) is { } misprint
            ? $"is {quoted.Found}{misprint}, without quotes"
            : $"is {quoted.Found}; give a number, such as {entry.Known.Example}";
    }

    private static string OneOf(ReadOnlySpan<string> choices)
    {
        var quoted = new List<string>();
        foreach (var choice in choices)
            quoted.Add($"\"{choice}\"");
        return quoted.Count == 1 ? quoted[0] : $"{string.Join(", ", quoted[..^1])} or {quoted[^1]}";
    }
}
