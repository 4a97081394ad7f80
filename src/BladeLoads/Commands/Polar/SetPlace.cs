using System.Collections.Immutable;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Wording;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Commands.Polar;

/// <summary>
/// Where the tables that a command makes go: a whole set becomes a folder of its own, a single table a file in the folder of one.
/// </summary>
/// <param name="Folder">As asked for.</param>
/// <param name="Source">What the tables are made from; it always stays.</param>
internal sealed record SetPlace(string Folder, string Source, bool IsWholeSet, bool Replace)
{
    private const int NamesShown = 4;
    private const string TableEnding = ".csv";

    /// <param name="names">Of the files that are to be written.</param>
    /// <exception cref="WrongUseException">Nothing can be written there: the message says why, and what would do.</exception>
    public void Check(ImmutableArray<string> names)
    {
        if (Folder.Length == 0)
            throw new WrongUseException("--out is empty; give the folder of the set that is to be made");
        var folder = Path.TrimEndingDirectorySeparator(Path.GetFullPath(Folder));
        if (Path.GetDirectoryName(folder) is not { } above)
            throw new WrongUseException($"'{Folder}' is the topmost folder of all and cannot be a set; give the folder of one");
        var source = Path.TrimEndingDirectorySeparator(Path.GetFullPath(IsWholeSet ? Source : Path.GetDirectoryName(Path.GetFullPath(Source))!));
        if (Real(folder) == Real(source))
            throw new WrongUseException($"'{Folder}' holds what is read, which stays as it is; give the folder of another set");
        CheckIsOutside(folder, source);
        if (folder.EndsWith(TableEnding, StringComparison.OrdinalIgnoreCase))
            throw new WrongUseException(
                $"'{Folder}' ends as a table does, and --out takes the folder of a set; {FolderInstead(folder, source, names[0])}");
        if (new FileInfo(folder).LinkTarget is not null)
            throw new WrongUseException($"'{Folder}' is a link; give the folder itself");
        if (File.Exists(folder))
            throw new WrongUseException($"'{Folder}' is a file; give a folder");
        if (!Directory.Exists(above))
            throw new WrongUseException($"there is no folder for '{Folder}' to stand in; make it first");
        if (!Directory.Exists(folder))
            return;
        if (!IsWholeSet)
            CheckTable(Path.Join(folder, names[0]));
        else if (!Replace)
            throw new WrongUseException($"there is a folder '{Folder}' already; give another, or put the new set in its place with --replace");
        else if (Strangers(folder, names) is { Length: > 0 } strangers)
            throw new WrongUseException(
                $"'{Folder}' holds what the new set does not: {string.Join(", ", strangers.Take(NamesShown))}"
                + (strangers.Length > NamesShown ? $" and {strangers.Length - NamesShown} more" : "") + "; a set that takes its place would lose it");
    }

    /// <summary>Whole or not at all; false, and told, where the disk refuses.</summary>
    public bool Write(ImmutableArray<ResultContent> files, Surroundings surroundings)
    {
        try
        {
            var written = IsWholeSet
                ? WholeFolder.Write(Folder, files, Replace, surroundings.Disk)
                : WriteTable(files[0], surroundings.Disk);
            if (!written)
                surroundings.Error.WriteLine(Printable.Of($"cannot write {Folder}: something stands there that cannot give way"));
            return written;
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            surroundings.Error.WriteLine(Printable.Of($"cannot write {Folder}: {DiskTrouble.Reason(e)}"));
            return false;
        }
    }

    private bool WriteTable(ResultContent file, IDisk disk)
    {
        disk.CreateFolder(Folder);
        return WholeFile.Write(Path.Join(Folder, file.Name), file.Bytes.Span, Replace, disk);
    }

    private void CheckIsOutside(string folder, string source)
    {
        // A table beside which the user works is no set by that alone, and a folder there is the usual place for another.
        if (!IsWholeSet && source == Directory.GetCurrentDirectory() && !File.Exists(Path.Join(source, StoredSet.SetFileName)))
            return;
        if (Path.GetDirectoryName(source) is not { } above
            || !Real(folder).StartsWith(Real(source) + Path.DirectorySeparatorChar, StringComparison.Ordinal))
            return;
        var beside = WithoutEnding(Path.Join(above, Path.GetFileName(folder)));
        throw new WrongUseException($"'{Folder}' stands within the set that is read, and a set holds no other; "
            + (Path.Exists(beside) ? "give a folder outside it" : $"'{AsWritten(beside)}', beside it, would do"));
    }

    private string FolderInstead(string folder, string source, string table)
    {
        var above = Path.GetDirectoryName(folder)!;
        return IsWholeSet || Real(above) == Real(source) || Path.GetDirectoryName(above) is null
            ? $"'{AsWritten(WithoutEnding(folder))}' would do"
            : $"'{AsWritten(above)}' would do, and the table goes there as {table}";
    }

    private static string WithoutEnding(string folder)
        => folder.EndsWith(TableEnding, StringComparison.OrdinalIgnoreCase) && Path.GetFileName(folder).Length > TableEnding.Length
            ? folder[..^TableEnding.Length]
            : folder;

    // From the root only where the user wrote it so.
    private string AsWritten(string path) => Path.IsPathRooted(Folder) ? path : Path.GetRelativePath(Directory.GetCurrentDirectory(), path);

    private void CheckTable(string path)
    {
        if (Directory.Exists(path) || new FileInfo(path).LinkTarget is not null)
            throw new WrongUseException($"'{Path.Join(Folder, Path.GetFileName(path))}' is a folder or a link; a table is a file");
        if (File.Exists(path) && !Replace)
            throw new WrongUseException(
                $"there is a table '{Path.Join(Folder, Path.GetFileName(path))}' already; give another folder, or put the new one in its place with --replace");
    }

    private static ImmutableArray<string> Strangers(string folder, ImmutableArray<string> names)
        => [.. Directory.EnumerateFileSystemEntries(folder).Select(path => Path.GetFileName(path))
            .Where(name => !names.Contains(name)).Order(StringComparer.Ordinal)];

    private static string Real(string path) => new Studies.Files.DiskFiles().RealPath(path);
}
