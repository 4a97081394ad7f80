using System.Collections.Immutable;

namespace BladeLoads.Results.Publishing;

/// <summary>A folder of files that a user asked for by its path: it appears whole or not at all.</summary>
public static class WholeFolder
{
    /// <summary>Writes beside the place, flushes, then renames, or exchanges with what stands there.</summary>
    /// <param name="path">The folder that it will stand in is there.</param>
    /// <param name="replace">A folder that stands there gives way, with all that is in it.</param>
    /// <returns>False where something stands there that may not, or cannot in one step, give way; nothing is written then.</returns>
    /// <exception cref="IOException">The system refuses.</exception>
    /// <exception cref="UnauthorizedAccessException">The system refuses.</exception>
    public static bool Write(string path, ImmutableArray<ResultContent> files, bool replace, IDisk disk)
    {
        var place = Path.TrimEndingDirectorySeparator(Path.GetFullPath(path));
        var above = Path.GetDirectoryName(place)!;
        var hidden = Path.Join(above, $".{Path.GetFileName(place)}.{Guid.NewGuid():N}.part");
        try
        {
            disk.CreateFolder(hidden);
            foreach (var file in files)
            {
                var beside = Path.Join(hidden, file.Name);
                disk.Write(beside, file.Bytes.Span);
                disk.Sync(beside);
            }
            disk.Sync(hidden);
            if (!Path.Exists(place) && disk.TryRename(hidden, place) || replace && disk.TryExchange(hidden, place))
            {
                disk.Sync(above);
                return true;
            }
            return false;
        }
        finally
        {
            DeleteIfPossible(hidden, disk);   // unfinished, or what gave way
        }
    }

    private static void DeleteIfPossible(string path, IDisk disk)
    {
        try
        {
            disk.Delete(path);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            // Its hidden name says what it is.
        }
    }
}
