using BladeLoads.Studies.PolarCheck;

namespace BladeLoads.Results.PolarCheck;

/// <summary>Names of checked tables as short as they can be: without the folder that all of them are in, and without ending.</summary>
public sealed class TableNames
{
    private readonly int _common;

    /// <param name="tables">One or more.</param>
    public TableNames(CheckedTables tables)
    {
        var folders = tables.Tables.Select(table => table.File[..(table.File.LastIndexOf('/') + 1)]).ToList();
        var common = folders[0];
        while (!folders.TrueForAll(folder => folder.StartsWith(common, StringComparison.Ordinal)))
            common = common[..(common.LastIndexOf('/', Math.Max(0, common.Length - 2)) + 1)];
        _common = common.Length;
    }

    /// <summary><c>clean/tip-18</c>, or <c>tip-18</c> where all are of one set.</summary>
    public string Of(string file) => Path.ChangeExtension(file[_common..], null);

    /// <summary>The same as the name of one file; no two tables have one.</summary>
    public string FileNameOf(string file) => Of(file).Replace("~", "~~", StringComparison.Ordinal).Replace('/', '~');
}
