using System.Collections.Immutable;
using BladeLoads.Results.Publishing;

namespace BladeLoads.Commands.Polar;

/// <summary>Where the report on polar tables goes; each of its files is there whole or not at all.</summary>
internal static class ReportPlace
{
    private const string PictureEnding = ".svg";

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

    /// <summary>Into a folder of the user's, in which nothing but files of these names gives way.</summary>
    /// <inheritdoc cref="Write(ResultsFolder, ImmutableArray{ResultContent}, IDisk)"/>
    public static string Write(string folder, ImmutableArray<ResultContent> files, IDisk disk)
    {
        if (folder.Length == 0)
            throw new WrongUseException("--out is empty; give a folder");
        if (File.Exists(folder))
            throw new WrongUseException($"'{folder}' is a file; give a folder");
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
}
