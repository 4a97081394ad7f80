using System.Globalization;

namespace BladeLoads.Studies.Files;

/// <summary>The bytes of a file, or the finding that says why there are none.</summary>
public static class NamedFile
{
    private const int BytesPerMebibyte = 1024 * 1024;

    /// <param name="fullPath">Absolute.</param>
    /// <param name="shown">As findings name the file.</param>
    /// <param name="largest">MiB; of a larger file no more than this is read.</param>
    internal static byte[]? Read(IStudyFiles files, string fullPath, string shown, int largest, Action<InputFinding> report)
    {
        var kind = files.Kind(fullPath);
        if (kind != EntryKind.File)
            return Refuse(kind switch
            {
                EntryKind.Folder => "is a folder; put a file in its place",
                EntryKind.Missing => "is gone, or a link that leads nowhere",
                _ => LeadsNowhere(files, fullPath)
                    ? "is a link that leads nowhere; put a file in its place"
                    : "is not a regular file; put a file in its place",
            });
        try
        {
            var bytes = files.Read(fullPath, largest * BytesPerMebibyte + 1);
            return bytes.Length <= largest * BytesPerMebibyte
                ? bytes
                : Refuse($"is larger than {largest.ToString(CultureInfo.InvariantCulture)} MiB, the most that is read; "
                    + "it seems to be another kind of file");
        }
        catch (UnauthorizedAccessException)
        {
            return Refuse("cannot be read: no permission");
        }
        catch (Exception e) when (e is FileNotFoundException or DirectoryNotFoundException)
        {
            return Refuse("was there and is gone; read it again");
        }
        catch (IOException e)
        {
            return Refuse($"cannot be read: {e.Message}");
        }

        byte[]? Refuse(string why)
        {
            report(new InputFinding(shown, 0, 0, why));
            return null;
        }
    }

    /// <summary>Whether a path is a link, or goes by one, whose end is not there.</summary>
    /// <param name="fullPath">Absolute.</param>
    public static bool LeadsNowhere(IStudyFiles files, string fullPath)
    {
        try
        {
            return files.RealPath(fullPath) is var real && real != fullPath && files.Kind(real) == EntryKind.Missing;
        }
        catch (IOException)
        {
            return true;   // round in a circle
        }
    }
}
