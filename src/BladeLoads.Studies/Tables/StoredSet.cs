using System.Collections.Immutable;
using BladeLoads.Studies.Files;

namespace BladeLoads.Studies.Tables;

/// <summary>A set of polar tables by itself: a folder of them, outside any study.</summary>
/// <param name="Tables">In the order of their names (ordinal).</param>
/// <param name="SetFile">The bytes of <c>set.toml</c>, which says what belongs to each table; null where there is none.</param>
/// <param name="Others">Names of what else is in the folder.</param>
public sealed record StoredSet(ImmutableArray<StoredPolars> Tables, ReadOnlyMemory<byte>? SetFile, ImmutableArray<string> Others)
{
    public const string SetFileName = "set.toml";

    private const string Ending = ".csv";

    /// <summary>Whether a file of this name in the folder of a set is one of its tables.</summary>
    public static bool IsTable(string name) => name.EndsWith(Ending, StringComparison.Ordinal) && name[0] != '.';

    /// <summary>Why no section can have the name that a table's file gives it, or null.</summary>
    /// <param name="name">Of a file that <see cref="IsTable"/>.</param>
    public static string? NameProblem(string name) => SafeName.Problem(name[..^Ending.Length]);

    /// <summary>Reads every table of a folder; null, with all that is wrong, where one cannot be read or there is none.</summary>
    /// <param name="path">Of the folder, as the user wrote it; findings name its files so.</param>
    public static StoredSet? Read(string path, IStudyFiles files, out ImmutableArray<InputFinding> errors)
        => ReadSound(Path.GetFullPath(path), path, files, out errors, _ => false) is var sound && errors.IsEmpty ? sound : null;

    /// <summary>Reads every table of a folder, and gives those that can be read, with what is wrong with the others.</summary>
    /// <param name="folder">Absolute.</param>
    /// <param name="shown">As findings name the folder.</param>
    /// <param name="isOther">Whether a file of this name is known to be something else than a table of the set.</param>
    public static StoredSet ReadSound(
        string folder, string shown, IStudyFiles files, out ImmutableArray<InputFinding> errors, Func<string, bool> isOther)
    {
        var found = new List<InputFinding>();
        var tables = ImmutableArray.CreateBuilder<StoredPolars>();
        ReadOnlyMemory<byte>? setFile = null;
        var others = ImmutableArray.CreateBuilder<string>();
        foreach (var name in NamesIn(folder, shown, files, found).Order(StringComparer.Ordinal))
        {
            var file = Path.Join(shown, name);
            if (isOther(name))
                others.Add(name);
            else if (IsTable(name) && !LeadsOut(folder, name, file, files, found))
            {
                if (StoredPolars.Read(Path.Join(folder, name), file, files, out var wrong) is { } table)
                    tables.Add(table);
                found.AddRange(wrong);
            }
            else if (name == SetFileName && !LeadsOut(folder, name, file, files, found))
                setFile = NamedFile.Read(files, Path.Join(folder, name), file, StudyFolder.LargestCase, found.Add);
            else if (!IsTable(name) && name != SetFileName)
                others.Add(name);
        }
        if (tables.Count == 0 && found.Count == 0)
            found.Add(new InputFinding(shown, 0, 0, "holds no polar table; the tables of a set are files <section>.csv"));
        errors = [.. found];
        return new StoredSet(tables.ToImmutable(), setFile, others.ToImmutable());
    }

    private static ImmutableArray<string> NamesIn(string folder, string shown, IStudyFiles files, List<InputFinding> found)
    {
        try
        {
            return files.Names(folder);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            var reason = e is UnauthorizedAccessException ? "no permission" : e.Message;
            found.Add(new InputFinding(shown, 0, 0, $"cannot be read: {reason}"));
            return [];
        }
    }

    private static bool LeadsOut(string folder, string name, string shown, IStudyFiles files, List<InputFinding> found)
    {
        try
        {
            if (files.RealPath(Path.Join(folder, name)).StartsWith(files.RealPath(folder) + Path.DirectorySeparatorChar, StringComparison.Ordinal))
                return false;
            found.Add(new InputFinding(shown, 0, 0, "is a link that leads out of the set; put the file itself into the folder"));
        }
        catch (IOException)
        {
            found.Add(new InputFinding(shown, 0, 0, "is a link that leads round in a circle"));
        }
        return true;
    }
}
