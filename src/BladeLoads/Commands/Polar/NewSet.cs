using System.Collections.Immutable;
using System.CommandLine;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Tables;
using BladeLoads.Results.Wording;
using BladeLoads.Screen;
using BladeLoads.Studies;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Commands.Polar;

/// <summary>Makes a set of tables from another set, or one table from another: what all commands that change tables share.</summary>
/// <param name="Source">A table, or the folder of a set.</param>
/// <param name="Folder">The set that is made, or the one that gets the table.</param>
/// <param name="Only">Patterns of sections to change; none: all.</param>
internal sealed record NewSet(string Source, string Folder, ImmutableArray<string> Only, bool Replace)
{
    /// <param name="change">What is to be made of a table; takes the table and the name of its file in findings.</param>
    public int Make(Func<StoredPolars, string, TableChange> change, Surroundings surroundings)
    {
        var isSet = Directory.Exists(Source);
        if (GivenTables.Read(Source, isSet, out var errors) is not { } set)
            return Refuse(errors, surroundings);
        var choice = new NameChoice(Only);
        choice.Check(set.Tables.Select(table => table.SectionName));
        var place = new SetPlace(Folder, Source, isSet, Replace);
        place.Check([.. set.Tables.Select(FileName), .. set.SetFile is null ? [] : (string[])[StoredSet.SetFileName]]);

        var changes = set.Tables.Select(table => (
            Table: table,
            Change: choice.Includes(table.SectionName)
                ? change(table, isSet ? Path.Join(Source, FileName(table)) : Source)
                : new TableChange.Copied("copied"))).ToList();
        var wrong = changes.Select(c => c.Change).OfType<TableChange.Refused>().SelectMany(refused => refused.Errors).ToImmutableArray();
        if (!wrong.IsEmpty)
            return Refuse(wrong, surroundings);
        var files = changes.Select(c => Content(c.Table, c.Change)).ToImmutableArray();
        if (set.SetFile is { } setFile)
            files = files.Add(new ResultContent(StoredSet.SetFileName, setFile));
        if (!place.Write(files, surroundings))
            return ExitCode.NoRoom;
        Tell(changes, set.Others, surroundings);
        return ExitCode.Good;
    }

    private static string FileName(StoredPolars table) => table.SectionName + ".csv";

    private static ResultContent Content(StoredPolars table, TableChange change) => new(
        FileName(table), change is TableChange.Changed changed ? PolarTableWriter.Write(changed.Head(table), changed.Polars) : table.Bytes);

    private void Tell(List<(StoredPolars Table, TableChange Change)> changes, ImmutableArray<string> others, Surroundings surroundings)
    {
        foreach (var line in changes.Select(c => c.Change).OfType<TableChange.Changed>().SelectMany(changed => changed.How).Distinct())
            surroundings.Out.WriteLine(Printable.Of(line));
        foreach (var (table, change) in changes)
            foreach (var line in change is TableChange.Changed changed ? changed.Record : [((TableChange.Copied)change).Why])
                surroundings.Out.WriteLine(Printable.Of($"{FileName(table)}: {line}"));
        foreach (var other in others)
            surroundings.Out.WriteLine(Printable.Of($"{other}: no table, not copied"));
        var doubts = changes.Select(c => c.Change).OfType<TableChange.Changed>().SelectMany(changed => changed.Doubts).ToImmutableArray();
        FindingLines.Write([], doubts, "", surroundings.Error, surroundings.ErrorIsTerminal);
        surroundings.Out.WriteLine(Printable.Of($"set: {Folder}"));
    }

    public static int Refuse(ImmutableArray<InputFinding> errors, Surroundings surroundings)
    {
        FindingLines.Write(errors, [], "", surroundings.Error, surroundings.ErrorIsTerminal);
        surroundings.Error.WriteLine($"{Count.Of(errors, "error")}; nothing written");
        return ExitCode.NothingCouldRun;
    }
}

/// <summary>The arguments of a command that makes a <see cref="NewSet"/>.</summary>
/// <param name="verb">What is done to a table: scale.</param>
internal sealed class NewSetOptions(string verb)
{
    public Argument<string> Source { get; } = new("table or set") { Description = "a polar table, or the folder of a set of them" };

    public Option<string> Folder { get; } = new("--out")
    {
        Description = "the folder of the set that is made, or of the one that gets the table; the folder it stands in must be there",
        HelpName = "folder",
        Required = true,
    };

    public Option<string[]> Only { get; } = new("--only")
    {
        Description = $"{verb} only sections whose name matches, and copy the others; * is any text, ? one character; may be given several times",
        HelpName = "pattern",
    };

    public Option<bool> Replace { get; } = new("--replace") { Description = "put it in the place of what is there" };

    public NewSet Of(ParseResult parsed) => new(
        parsed.GetRequiredValue(Source), parsed.GetRequiredValue(Folder), [.. parsed.GetValue(Only) ?? []], parsed.GetValue(Replace));
}
