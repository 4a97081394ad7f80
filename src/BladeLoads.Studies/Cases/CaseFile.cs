using System.Collections.Immutable;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Toml;

namespace BladeLoads.Studies.Cases;

/// <summary>A known key with the value that a case takes for it.</summary>
/// <param name="Key">Where the key stands.</param>
/// <param name="IsSwept">The value is one of a sweep.</param>
internal sealed record CaseEntry(KnownKey Known, Place Key, TomlValue Value, bool IsSwept);

/// <summary>A list of values that a sweep runs over.</summary>
internal sealed record SweepEntry(KnownKey Known, Place Key, TomlValue.List Values);

/// <summary>A case file, or the study's starting values, by known key. Everything unknown is reported here.</summary>
/// <param name="IsSound">Nothing was wrong with the file by itself.</param>
/// <param name="Tables">Where the header of each table stands.</param>
/// <param name="DoubtfulTables">
/// Tables with a key that is not known, or that could not be read: what seems to be missing there is most likely that.
/// </param>
internal sealed record CaseFile(
    string File, bool IsSound, InputFile? Input, ImmutableDictionary<string, CaseEntry> Entries, ImmutableArray<SweepEntry> Sweep,
    ImmutableDictionary<string, Place> Tables, ImmutableHashSet<string> DoubtfulTables, TomlEntry? Baseline)
{
    /// <summary>A file with nothing in it, or nothing that could be read.</summary>
    public static CaseFile Empty(string file, bool isSound) => new(
        file, isSound, null, ImmutableDictionary<string, CaseEntry>.Empty, [], ImmutableDictionary<string, Place>.Empty,
        isSound ? [] : [.. KnownKeys.Tables, ""], null);

    public static CaseFile Read(StudyFolder folder, string fullPath, Findings findings)
    {
        var file = folder.RelativePath(fullPath);
        if (folder.Read(fullPath, StudyFolder.LargestCase, findings.Error) is not { } input
            || TomlText.Parse(input, findings) is not { } top)
            return Empty(file, isSound: false);
        return new Sorting(file, findings).Sort(top, new InputFile(file, input.Sha256, "case file"));
    }

    /// <summary>
    /// The case with what it leaves out taken from the study's starting values, key by key. One value in the case takes the place
    /// of a sweep over the same key there, and a key in the case that of one there that does not go with it.
    /// </summary>
    public CaseFile StartingFrom(CaseFile start) => this with
    {
        Entries = start.Entries.RemoveRange(start.Entries.Keys.Where(HasOwnInPlaceOf)).SetItems(Entries),
        Sweep = [.. start.Sweep.Where(s => !HasOwn(s.Known.Path) && !HasOwnInPlaceOf(s.Known.Path)), .. Sweep],
        DoubtfulTables = DoubtfulTables.Union(start.DoubtfulTables),
    };

    private bool HasOwn(string path) => Entries.ContainsKey(path) || Sweep.Any(own => own.Known.Path == path);

    private bool HasOwnInPlaceOf(string path)
        => KnownKeys.Exclusive.Any(pair => (pair.One == path && HasOwn(pair.Other)) || (pair.Other == path && HasOwn(pair.One)));

    private sealed class Sorting(string file, Findings findings)
    {
        private readonly Dictionary<string, CaseEntry> _entries = new(StringComparer.Ordinal);
        private readonly Dictionary<string, Place> _tables = new(StringComparer.Ordinal);
        private readonly List<SweepEntry> _sweep = [];
        private readonly HashSet<string> _doubtful = new(StringComparer.Ordinal);
        private bool _isSound = true;

        public CaseFile Sort(TomlValue.Table top, InputFile input)
        {
            TomlEntry? baseline = null;
            foreach (var entry in top.Entries)
                if (KnownKeys.Find(entry.Name) is { } known)
                    Add(known, entry);
                else if (entry.Name == KnownKeys.Baseline)
                    baseline = entry;
                else if (KnownKeys.Tables.Contains(entry.Name))
                    SortTable(entry);
                else if (entry.Value is TomlValue.Table)
                {
                    _doubtful.Add(Nearest.Of(entry.Name, KnownKeys.Tables) ?? "");
                    Refuse(entry.Key, UnknownKey.Table(entry.Name));
                }
                else
                {
                    _doubtful.Add("");
                    Refuse(entry.Key, UnknownKey.InTable(entry.Name, "", file));
                }
            if (baseline is not null && file != StudyReader.StartingValuesFile)
                Refuse(baseline.Key, $"baseline is a matter of the whole study; write it in {StudyReader.StartingValuesFile}");
            return new CaseFile(
                file, _isSound, input, _entries.ToImmutableDictionary(StringComparer.Ordinal), [.. _sweep],
                _tables.ToImmutableDictionary(StringComparer.Ordinal), [.. _doubtful], baseline);
        }

        private void SortTable(TomlEntry tableEntry)
        {
            var table = tableEntry.Name;
            if (tableEntry.Value is not TomlValue.Table values)
            {
                _doubtful.Add(table);
                Refuse(tableEntry.Value.At, $"{table} is {tableEntry.Value.Found}; write it as a table: [{table}]");
                return;
            }
            _tables[table] = tableEntry.Key;
            if (table == KnownKeys.SweepTable)
                SortSweep(values, "");
            else
                foreach (var entry in values.Entries)
                    if (KnownKeys.Find($"{table}.{entry.Name}") is { } known)
                        Add(known, entry);
                    else
                    {
                        _doubtful.Add(table);
                        Refuse(entry.Key, UnknownKey.InTable(entry.Name, table, file));
                    }
        }

        // "air.density_kg_m3" = [...] is one quoted key, air.density_kg_m3 = [...] a table in a table: both are meant.
        private void SortSweep(TomlValue.Table values, string prefix)
        {
            foreach (var entry in values.Entries)
            {
                var path = prefix + entry.Name;
                if (entry.Value is TomlValue.Table inner)
                    SortSweep(inner, path + ".");
                else if (KnownKeys.Find(path) is not { } known)
                {
                    _doubtful.Add(path.Contains('.', StringComparison.Ordinal) ? path[..path.LastIndexOf('.')] : "");
                    Refuse(entry.Key, UnknownKey.InSweep(path));
                }
                else if (!known.CanSweep)
                    Refuse(entry.Key, $"'{path}' cannot be swept; write a case for each value");
                else if (entry.Value is not TomlValue.List list)
                    Refuse(entry.Value.At, $"'{path}' is {entry.Value.Found}; give the values of a sweep as a list: "
                        + $"[{entry.Value.Found.Replace('\'', '"')}]");
                else if (list.Items.IsEmpty)
                    Refuse(list.At, $"'{path}' has no values; give at least one, or leave the key out");
                else if (_sweep.Any(s => s.Known == known))
                    Refuse(entry.Key, $"'{path}' is swept twice; keep one list");
                else
                    _sweep.Add(new SweepEntry(known, entry.Key, list));
            }
        }

        private void Add(KnownKey known, TomlEntry entry)
            => _entries.Add(known.Path, new CaseEntry(known, entry.Key, entry.Value, IsSwept: false));

        private void Refuse(Place at, string text)
        {
            _isSound = false;
            findings.Error(at, text);
        }
    }
}
