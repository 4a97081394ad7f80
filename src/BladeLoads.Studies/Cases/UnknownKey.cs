using BladeLoads.Studies.Files;

namespace BladeLoads.Studies.Cases;

/// <summary>What to say about a key or table that no case file has.</summary>
internal static class UnknownKey
{
    /// <param name="table">The table it stands in; empty at the top of the file.</param>
    /// <param name="file">study.toml knows one key more.</param>
    public static string InTable(string name, string table, string file)
    {
        var known = KnownKeys.NamesIn(table);
        if (table.Length == 0 && file == StudyReader.StartingValuesFile)
            known = known.Append(KnownKeys.Baseline);
        var found = $"unknown key {VisibleText.Quote(name)} {(table.Length == 0 ? "at the top of the file" : $"in [{table}]")}";
        var elsewhere = KnownKeys.All.FirstOrDefault(key => key.Name == name && key.Table != table);
        if (elsewhere is not null)
            return $"{found}; it belongs {(elsewhere.Table.Length == 0 ? "at the top of the file" : $"in [{elsewhere.Table}]")}";
        if (Nearest.Of(name, known) is { } near)
            return $"{found}; did you mean '{near}'?";
        return table.Length == 0 && Nearest.Of(name, KnownKeys.Tables) is { } nearTable
            ? $"{found}; did you mean the table [{nearTable}]?"
            : $"{found}; known are {string.Join(", ", known)}";
    }

    public static string Table(string name) => Nearest.Of(name, KnownKeys.Tables) is { } near
        ? $"unknown table [{Short(name)}]; did you mean [{near}]?"
        : $"unknown table [{Short(name)}]; known are {string.Join(", ", KnownKeys.Tables.Select(table => $"[{table}]"))}";

    /// <param name="path">As a sweep names it.</param>
    public static string InSweep(string path) => Nearest.Of(path, KnownKeys.All.Select(key => key.Path)) is { } near
        ? $"unknown key {VisibleText.Quote(path)} in [sweep]; did you mean '{near}'?"
        : $"unknown key {VisibleText.Quote(path)} in [sweep]; name table and key, such as \"air.density_kg_m3\"";

    private static string Short(string name) => VisibleText.Quote(name)[1..^1];
}
