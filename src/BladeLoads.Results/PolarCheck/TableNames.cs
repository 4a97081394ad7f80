namespace BladeLoads.Results.PolarCheck;

/// <summary>Names of section tables and of their sets, as short as they can be: without the folder that all of them are in.</summary>
public sealed class TableNames
{
    // No name and no path as one name is this: a tilde within a name is written otherwise.
    private const string OfWhole = "~";

    private readonly string _whole;
    private readonly int _common;
    private readonly int _commonOfSets;
    private readonly bool _isOneSet;

    /// <param name="files">Of the tables, parted by <c>/</c>; one or more.</param>
    /// <param name="whole">What the folder is called in which a file stands that names none: the study, as a rule.</param>
    public TableNames(IEnumerable<string> files, string whole)
    {
        var folders = files.Select(FolderOf).Distinct().ToList();
        (_whole, _isOneSet) = (whole, folders.Count == 1);
        _common = CommonOf(folders).Length;
        _commonOfSets = CommonOf([.. folders.Select(Parent)]).Length;
    }

    /// <summary><c>clean/tip-18</c>, or <c>tip-18</c> where all are of one set.</summary>
    public string Of(string file) => Path.ChangeExtension(file[_common..], null);

    /// <summary>The same as the name of one file, <c>clean~tip-18</c>; no two tables have one.</summary>
    public string FileNameOf(string file)
        => (_isOneSet ? "" : SetFolderOf(file) + "~") + OneName(Path.GetFileNameWithoutExtension(file));

    /// <summary><c>clean</c>, or <c>new/clean</c> where another set is called so too.</summary>
    public string SetOf(string file)
        => FolderOf(file)[_commonOfSets..].TrimEnd('/') is var set && (set.Length == 0 || IsNoName(set)) ? _whole : set;

    /// <summary>The same as the name of one folder; no two sets have one.</summary>
    public string SetFolderOf(string file)
        => !_isOneSet && FolderOf(file).Length == 0 ? OfWhole : OneName(SetOf(file));

    /// <summary>A path as one name: <c>~</c> for <c>/</c>. Two that differ have two; what parts it is percent-encoded within a name.</summary>
    private static string OneName(string path) => path.Replace("%", "%25", StringComparison.Ordinal)
        .Replace("~", "%7E", StringComparison.Ordinal).Replace('/', '~');

    private static bool IsNoName(string folder) => folder[(folder.LastIndexOf('/') + 1)..] is "." or "..";

    private static string FolderOf(string file) => file[..(file.LastIndexOf('/') + 1)];

    private static string Parent(string folder) => folder.Length == 0 ? "" : FolderOf(folder[..^1]);

    private static string CommonOf(List<string> folders)
    {
        var common = folders[0];
        while (!folders.TrueForAll(folder => folder.StartsWith(common, StringComparison.Ordinal)))
            common = Parent(common);
        return common;
    }
}
