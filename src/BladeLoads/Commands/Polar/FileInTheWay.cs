namespace BladeLoads.Commands.Polar;

/// <summary>A file where a folder is asked for, or needed above one.</summary>
internal static class FileInTheWay
{
    /// <param name="folder">As asked for; it, and folders above it, may be missing.</param>
    /// <param name="instead">What would do.</param>
    /// <exception cref="WrongUseException">There is one.</exception>
    public static void Refuse(string folder, string instead)
    {
        for (var at = folder; !string.IsNullOrEmpty(at) && !Directory.Exists(at); at = Path.GetDirectoryName(at))
            if (File.Exists(at))
                throw new WrongUseException($"'{at}' is a file; {instead}");
    }
}
