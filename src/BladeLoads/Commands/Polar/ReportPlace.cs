using System.Collections.Immutable;
using BladeLoads.Results.Pictures;
using BladeLoads.Results.PolarCheck;
using BladeLoads.Results.Publishing;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Commands.Polar;

/// <summary>Where the report on polar tables goes; each of its files is there whole or not at all.</summary>
internal static class ReportPlace
{
    private const string PictureEnding = ".svg";
    private const int BytesToKnow = 64 * 1024;

    /// <summary>Into the results of a study, which hold nothing else there: pictures of tables that are gone go too.</summary>
    /// <returns>The folder.</returns>
    /// <exception cref="NoRoomForResultsException">Something cannot be written.</exception>
    public static string Write(ResultsFolder results, ImmutableArray<ResultContent> files, IDisk disk)
    {
        using var publisher = Publisher.Open(results, disk);
        try
        {
            foreach (var file in files)
                publisher.PublishFile(Path.Join(results.Polars, file.Name), file.Bytes.Span);
            var names = files.Select(file => file.Name).ToHashSet(StringComparer.Ordinal);
            foreach (var old in Directory.EnumerateFiles(results.Polars, "*" + PictureEnding))
                if (!names.Contains(Path.GetFileName(old)))
                    publisher.Remove(old);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new NoRoomForResultsException(results.Polars, e);
        }
        return results.Polars;
    }

    /// <summary>Into a folder of the user's, which <see cref="Check"/> has found fit.</summary>
    /// <inheritdoc cref="Write(ResultsFolder, ImmutableArray{ResultContent}, IDisk)"/>
    public static string Write(string folder, ImmutableArray<ResultContent> files, IDisk disk)
    {
        try
        {
            disk.CreateFolder(folder);
            foreach (var file in files)
                if (!WholeFile.Write(Path.Join(folder, file.Name), file.Bytes.Span, replace: true, disk))
                    throw new IOException($"a folder stands where {file.Name} belongs");
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new NoRoomForResultsException(folder, e);
        }
        return folder;
    }

    /// <summary>
    /// Whether a folder of the user's can take a report: a report of ours that is there gives way, anything else stays. Among tables of
    /// polars a report would be read as more of them.
    /// </summary>
    /// <param name="inputs">The folders that hold what is checked.</param>
    /// <param name="pictures">The names of the pages that are to be written.</param>
    /// <exception cref="WrongUseException">It cannot; the message says why, and what would do.</exception>
    public static void Check(string folder, IEnumerable<string> inputs, IEnumerable<string> pictures)
    {
        if (folder.Length == 0)
            throw new WrongUseException("--out is empty; give a folder");
        FileInTheWay.Refuse(folder, "give a folder");
        if (!Directory.Exists(folder))
            return;
        CheckInputs(folder, inputs, "folder with --out");
        foreach (var path in Directory.EnumerateFiles(folder).Order(StringComparer.Ordinal))
            if (!PolarReport.FileNames.Contains(Path.GetFileName(path)) && StoredSet.IsTable(Path.GetFileName(path)) && IsPolarTable(path))
                throw new WrongUseException(
                    $"'{folder}' holds a polar table, {Path.GetFileName(path)}, and the report would be read as more of them; give another folder "
                    + "with --out");
        foreach (var name in PolarReport.FileNames)
            if (File.Exists(Path.Join(folder, name)) && !PolarReport.IsOwn(name, Beginning(Path.Join(folder, name))))
                throw new WrongUseException($"'{Path.Join(folder, name)}' is there and is no report of ours; give another folder with --out");
        foreach (var name in pictures)
            if (File.Exists(Path.Join(folder, name)) && !PictureFile.IsOwn(Beginning(Path.Join(folder, name))))
                throw new WrongUseException($"'{Path.Join(folder, name)}' is there and is no picture of ours; give another folder with --out");
    }

    /// <param name="another">What would do.</param>
    /// <exception cref="WrongUseException">The folder is one of the inputs.</exception>
    public static void CheckInputs(string folder, IEnumerable<string> inputs, string another)
    {
        if (inputs.Select(Real).Contains(Real(folder)))
            throw new WrongUseException($"'{folder}' holds the polars that are checked; give another {another}");
    }

    private static bool IsPolarTable(string path)
        => System.Text.Encoding.UTF8.GetString(Beginning(path)).Contains("alpha_deg", StringComparison.Ordinal);

    private static byte[] Beginning(string path)
    {
        var (full, files) = (Path.GetFullPath(path), new DiskFiles());
        try
        {
            return files.Kind(full) == EntryKind.File ? files.Read(full, BytesToKnow) : [];
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return [];   // what cannot be read is not known to be ours
        }
    }

    private static string Real(string path) => new DiskFiles().RealPath(Path.TrimEndingDirectorySeparator(Path.GetFullPath(path)));
}
