namespace BladeLoads.EndToEnd.Documentation;

/// <summary>Where the documents lie, seen from a test that runs.</summary>
internal static class Repository
{
    public static string Root { get; } = FindRoot();

    public static string[] Lines(string document) => File.ReadAllLines(Path.Combine(Root, document));

    private static string FindRoot()
    {
        for (var folder = new DirectoryInfo(AppContext.BaseDirectory); folder is not null; folder = folder.Parent)
            if (File.Exists(Path.Combine(folder.FullName, "BladeLoads.sln")))
                return folder.FullName;
        throw new DirectoryNotFoundException($"no BladeLoads.sln above {AppContext.BaseDirectory}");
    }
}
