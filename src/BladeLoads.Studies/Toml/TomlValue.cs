using System.Collections.Immutable;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Toml;

/// <summary>A value of a TOML file, and where it stands. Two are equal only when they are the same.</summary>
internal abstract class TomlValue
{
    private TomlValue(Place at) => At = at;

    public Place At { get; }

    /// <summary>As a message says what was found.</summary>
    public abstract string Found { get; }

    /// <param name="value">May be NaN or infinite: TOML knows both. Zero has no sign: one fingerprint, one result.</param>
    public sealed class Number(Place at, double value, bool isWhole) : TomlValue(at)
    {
        public double Value { get; } = value;

        public bool IsWhole { get; } = isWhole;

        public override string Found
            => double.IsNaN(Value) ? "nan" : double.IsInfinity(Value) ? "infinite" : CanonicalText.Of(Value);
    }

    public sealed class Text(Place at, string value) : TomlValue(at)
    {
        public string Value { get; } = value;

        public override string Found => VisibleText.Quote(Value);
    }

    public sealed class Truth(Place at, bool value) : TomlValue(at)
    {
        public bool Value { get; } = value;

        public override string Found => Value ? "true" : "false";
    }

    public sealed class Moment(Place at) : TomlValue(at)
    {
        public override string Found => "a date or time";
    }

    public sealed class List(Place at, ImmutableArray<TomlValue> items) : TomlValue(at)
    {
        public ImmutableArray<TomlValue> Items { get; } = items;

        public override string Found => "a list";
    }

    /// <summary>Keys in file order, each once.</summary>
    public sealed class Table(Place at) : TomlValue(at)
    {
        private readonly List<TomlEntry> _entries = [];
        private readonly Dictionary<string, TomlEntry> _byName = new(StringComparer.Ordinal);

        public IReadOnlyList<TomlEntry> Entries => _entries;

        public override string Found => "a table";

        public TomlEntry? Find(string name) => _byName.GetValueOrDefault(name);

        public bool TryAdd(TomlEntry entry)
        {
            if (!_byName.TryAdd(entry.Name, entry))
                return false;
            _entries.Add(entry);
            return true;
        }
    }
}

/// <summary>A key and its value.</summary>
/// <param name="Key">Where the key stands.</param>
internal sealed record TomlEntry(string Name, Place Key, TomlValue Value);
