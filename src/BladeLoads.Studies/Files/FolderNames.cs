using System.Collections.Immutable;

namespace BladeLoads.Studies.Files;

/// <summary>What is there, for messages about what is not.</summary>
public static class FolderNames
{
    /// <summary><c>'/studies' holds fell</c>, of the folder that a missing file or folder would be in.</summary>
    /// <param name="missing">Absolute.</param>
    /// <param name="namesIn">The names in a folder, or an exception that says why they cannot be told.</param>
    internal static string Beside(string missing, IStudyFiles files, Func<string, ImmutableArray<string>> namesIn)
    {
        var folder = Path.GetDirectoryName(missing);
        if (folder is null || files.Kind(folder) != EntryKind.Folder)
            return "the folder it would be in does not exist either";
        var names = namesIn(folder).Where(name => name[0] != '.');
        return VisibleText.Escape($"'{folder}' holds {VisibleText.Enumerate(names, "nothing")}");
    }

    /// <inheritdoc cref="Beside(string, IStudyFiles, Func{string, ImmutableArray{string}})"/>
    public static string Beside(string missing, IStudyFiles files) => Beside(missing, files, folder => Of(folder, files));

    /// <summary>The names in a folder, hidden ones left out: all of a few, the first of many.</summary>
    /// <param name="folder">Absolute.</param>
    public static string In(string folder, IStudyFiles files)
        => VisibleText.Escape(VisibleText.Enumerate(Of(folder, files).Where(name => name[0] != '.'), "nothing"));

    private static ImmutableArray<string> Of(string folder, IStudyFiles files)
    {
        try
        {
            return files.Names(folder);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return ["what may not be read"];
        }
    }
}
