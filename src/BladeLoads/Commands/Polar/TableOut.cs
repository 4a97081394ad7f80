using BladeLoads.Results.Publishing;
using BladeLoads.Results.Wording;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Commands.Polar;

/// <summary>Where a table that a command makes goes.</summary>
/// <param name="Path">As asked for.</param>
/// <param name="Source">What the table is made from; it always stays.</param>
internal sealed record TableOut(string Path, string Source, bool Replace)
{
    /// <exception cref="WrongUseException">Nothing can be written there: the message says why, and what would do.</exception>
    public void Check()
    {
        if (!StoredSet.IsTable(System.IO.Path.GetFileName(Path)))
            throw new WrongUseException($"'{Path}' cannot be a polar table; give a file <section>.csv");
        if (StoredSet.NameProblem(System.IO.Path.GetFileName(Path)) is { } problem)
            throw new WrongUseException($"'{Path}' cannot be a polar table: the name of its section {problem}; give another <section>.csv");
        var path = System.IO.Path.GetFullPath(Path);
        if (new DiskFiles().RealPath(path) == new DiskFiles().RealPath(System.IO.Path.GetFullPath(Source)))
            throw new WrongUseException($"'{Path}' is what is read, which stays as it is; give another file");
        if (Directory.Exists(path))
            throw new WrongUseException($"'{Path}' is a folder; give a file in it");
        if (new FileInfo(path).LinkTarget is not null)
            throw new WrongUseException($"'{Path}' is a link; give the file itself");
        if (File.Exists(path) && !Replace)
            throw new WrongUseException($"there is a file '{Path}' already; give another, or put the new table in its place with --replace");
        if (!Directory.Exists(System.IO.Path.GetDirectoryName(path)))
            throw new WrongUseException($"there is no folder for '{Path}' to stand in; make it first");
    }

    /// <summary>Whole or not at all; false, and told, where the disk refuses.</summary>
    public bool Write(ReadOnlySpan<byte> bytes, Surroundings surroundings)
    {
        try
        {
            if (WholeFile.Write(Path, bytes, Replace, surroundings.Disk))
                return true;
            surroundings.Error.WriteLine(Printable.Of($"cannot write {Path}: something stands there that cannot give way"));
        }
        catch (Exception e) when (e is FileNotFoundException or DirectoryNotFoundException)
        {
            // The folder is no place for files of ours, or went after it was looked at; the system's text would name a file that nobody knows.
            surroundings.Error.WriteLine(Printable.Of($"cannot write {Path}: no file can be made in its folder; give a place in another"));
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            surroundings.Error.WriteLine(Printable.Of($"cannot write {Path}: {DiskTrouble.Reason(e)}"));
        }
        return false;
    }
}
