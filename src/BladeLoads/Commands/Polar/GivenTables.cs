using System.Collections.Immutable;
using BladeLoads.Studies;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Commands.Polar;

/// <summary>A table, or a folder of them, as a user names it.</summary>
internal static class GivenTables
{
    /// <summary>Those tables that can be read, and what is wrong with the others.</summary>
    /// <param name="isSet">The path leads to a folder.</param>
    public static (ImmutableArray<StoredPolars> Tables, ImmutableArray<InputFinding> Errors) ReadSound(string path, bool isSet)
    {
        var files = new DiskFiles();
        if (isSet)
            return (StoredSet.ReadSound(Path.GetFullPath(path), path, files, out var errors, _ => false).Tables, errors);
        return (StoredPolars.Read(path, files, out var wrong) is { } table ? [table] : [], wrong);
    }

    /// <summary>Null, with what is wrong, where a table cannot be read.</summary>
    /// <param name="isSet">The path leads to a folder.</param>
    /// <exception cref="WrongUseException">The path leads to nothing that could be a table.</exception>
    public static StoredSet? Read(string path, bool isSet, out ImmutableArray<InputFinding> errors)
    {
        var files = new DiskFiles();
        if (isSet)
            return StoredSet.Read(path, files, out errors);
        if (!StoredSet.IsTable(Path.GetFileName(path)))
            throw new WrongUseException($"'{path}' is no polar table and no folder; a polar table ends in .csv, 'bladeloads polar read' makes one");
        return StoredPolars.Read(path, files, out errors) is { } table ? new StoredSet([table], null, []) : null;
    }
}
