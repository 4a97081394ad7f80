namespace BladeLoads.Results.Publishing;

/// <summary>A file that a user asked for by its path: it appears whole or not at all.</summary>
public static class WholeFile
{
    /// <summary>Writes beside the place, flushes, then renames.</summary>
    /// <param name="path">Its folder is there.</param>
    /// <param name="replace">A file that stands there gives way.</param>
    /// <returns>False where something stands there that may not, or cannot, give way; nothing is written then.</returns>
    /// <exception cref="IOException">The system refuses.</exception>
    /// <exception cref="UnauthorizedAccessException">The system refuses.</exception>
    public static bool Write(string path, ReadOnlySpan<byte> bytes, bool replace, IDisk disk)
    {
        var beside = $"{path}.{Guid.NewGuid():N}.part";
        var placed = false;
        try
        {
            disk.Write(beside, bytes);
            disk.Sync(beside);
            placed = replace ? disk.TryRename(beside, path) : disk.TryPlace(beside, path);
            if (placed)
                disk.Sync(Path.GetDirectoryName(Path.GetFullPath(path))!);
            return placed;
        }
        finally
        {
            if (!placed)
                DeleteIfPossible(beside, disk);
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
            // What kept the file from being written is told; its ending says that this is part of one.
        }
    }
}
