using System.Collections.Immutable;
using System.CommandLine;
using System.CommandLine.Parsing;
using BladeLoads.Results.Pictures;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Wording;
using BladeLoads.Screen;
using BladeLoads.Studies;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Commands.Polar;

/// <param name="Before">The same before an update; null where nothing is compared.</param>
/// <param name="Folder">Where the pictures go; null for their usual place.</param>
internal sealed record DrawAsked(
    GivenSource Source, string? Before, string? Folder, string Results, ImmutableArray<PictureFormat> Formats, NameChoice Only, bool Replace);

/// <summary><c>bladeloads polar draw</c>: a page of diagrams for each section table.</summary>
internal static class PolarDrawCommand
{
    private const string UsualFolder = "pictures";

    public static Command Define(Surroundings surroundings)
    {
        var source = new Argument<string>("study, set or table")
        {
            Description = "a study (or one case file of it): every table that its cases use; the folder of a set; or one table",
        };
        var before = new Option<string?>("--before")
        {
            Description = "the tables before an update, drawn beneath: a table, the folder of a set, or for a study an earlier copy of it",
            HelpName = "table, set or study",
        };
        var folder = new Option<string?>("--out")
        {
            Description = "the folder that pictures go to, a folder for each set in it; left out, results/<study>/pictures for a study, "
                + "else ./pictures",
            HelpName = "folder",
        };
        var results = CommandLine.ResultsOption();
        var format = new Option<ImmutableArray<PictureFormat>>("--format")
        {
            Description = "svg, png or both; left out, svg",
            HelpName = "svg|png|both",
            CustomParser = ParseFormat,
        };
        var only = new Option<string[]>("--only")
        {
            Description = "only sections whose name matches; * is any text, ? one character; may be given several times",
            HelpName = "pattern",
        };
        var replace = new Option<bool>("--replace") { Description = "put a picture in the place of a file that is no picture of ours, too" };
        var command = new Command(
            "draw",
            "Draws each section table on a page: lift, drag and lift-to-drag ratio over angle, lift over drag, and the full circle, as SVG or PNG.")
        {
            source, before, folder, results, format, only, replace,
        };
        command.SetAction(parsed =>
        {
            var given = GivenSource.Of(parsed.GetRequiredValue(source));
            given.RefuseWithoutStudy(parsed, results, "--out says where pictures go");
            return Run(
                new DrawAsked(
                    given, parsed.GetValue(before), parsed.GetValue(folder), parsed.GetRequiredValue(results),
                    parsed.GetValue(format) is { IsDefaultOrEmpty: false } formats ? formats : [PictureFormat.Svg],
                    new NameChoice([.. parsed.GetValue(only) ?? []]), parsed.GetValue(replace)),
                surroundings);
        });
        return command;
    }

    private static int Run(DrawAsked asked, Surroundings surroundings)
    {
        if (asked.Folder is "")
            throw new WrongUseException("--out is empty; give the folder that pictures go to");
        var earlier = asked.Before is null ? null : EarlierPolars.At(asked.Before);
        var (chosen, folder, isWhole) = asked.Source is GivenSource.Study ? OfStudy(asked, surroundings) : OfTables(asked, surroundings);
        if (earlier is not null)
            chosen = Compared(chosen, earlier, asked, surroundings);
        if (chosen.IsEmpty)
            return ExitCode.NothingCouldRun;
        return Write(chosen, asked.Folder ?? folder, asked, surroundings, isWhole);
    }

    private static (ImmutableArray<PolarPageAsked> Pages, string Folder, bool IsWhole) OfStudy(DrawAsked asked, Surroundings surroundings)
    {
        var study = AskedStudy.ReadAlone(asked.Source.Path, surroundings);
        FindingLines.Write(study.Errors, [], study.Folder, surroundings.Error, surroundings.ErrorIsTerminal);
        if (study.Cases.IsEmpty)
            surroundings.Error.WriteLine(Printable.Of(FindingLines.Closing(study)));
        var (pages, errors) = StudyPages.Of(study, asked.Only, surroundings.Solve);
        FindingLines.Write(errors, [], study.Folder, surroundings.Error, surroundings.ErrorIsTerminal);
        if (!errors.IsEmpty)
            surroundings.Error.WriteLine($"{Count.Of(errors, "error")} in tables that changed just now; their pages are not drawn");
        // Shown as the user gave it.
        var folder = new ResultsFolder(asked.Results, study.Name).Pictures;
        return (pages, folder, study.Errors.IsEmpty && errors.IsEmpty);
    }

    private static (ImmutableArray<PolarPageAsked> Pages, string Folder, bool IsWhole) OfTables(DrawAsked asked, Surroundings surroundings)
    {
        var (path, isSet) = (asked.Source.Path, asked.Source is GivenSource.Set);
        var (tables, all) = GivenTables.ReadSound(path, isSet);
        asked.Only.Check(tables.Select(table => table.SectionName).Concat(all.Select(SectionOf).OfType<string>()));
        var errors = all.Where(error => SectionOf(error) is not { } section || asked.Only.Includes(section)).ToImmutableArray();
        var name = asked.Source.FolderName();
        ImmutableArray<PolarPageAsked> pages =
        [
            .. tables.Where(table => asked.Only.Includes(table.SectionName)).Select(table => new PolarPageAsked(
                name, name, table.SectionName, table.SectionName, null,
                PolarPicture.Of(table.Section, name, isSet ? Path.Join(path, table.SectionName + ".csv") : path))),
        ];
        FindingLines.Write(errors, [], "", surroundings.Error, surroundings.ErrorIsTerminal);
        if (!errors.IsEmpty)
            surroundings.Error.WriteLine(
                $"{Count.Of(errors, "error")}; {(pages.IsEmpty ? "nothing drawn" : "only tables without errors are drawn")}");
        return (pages, UsualFolder, errors.IsEmpty);

        // Null for an error about the set itself.
        static string? SectionOf(InputFinding error)
            => StoredSet.IsTable(Path.GetFileName(error.File)) ? Path.GetFileNameWithoutExtension(error.File) : null;
    }

    private static ImmutableArray<PolarPageAsked> Compared(
        ImmutableArray<PolarPageAsked> pages, EarlierPolars earlier, DrawAsked asked, Surroundings surroundings)
    {
        earlier.Check(pages, asked.Source is GivenSource.Table);
        var errors = new List<InputFinding>();
        var compared = ImmutableArray.CreateBuilder<PolarPageAsked>();
        foreach (var page in pages)
        {
            var count = errors.Count;
            if (earlier.Of(page, errors) is { } found)
                compared.Add(page with { Picture = page.Picture.Over(found.Section, found.Name) });
            else if (errors.Count == count)
            {
                surroundings.Out.WriteLine(Printable.Of($"{page.Set}/{page.Section}: no earlier table in {earlier.Path}"));
                compared.Add(page);
            }
        }
        if (errors.Count == 0)
            return compared.ToImmutable();
        FindingLines.Write([.. errors.Distinct()], [], "", surroundings.Error, surroundings.ErrorIsTerminal);
        surroundings.Error.WriteLine($"{Count.Of(errors.Distinct().Count(), "error")} in the earlier tables; nothing drawn");
        return [];
    }

    private static int Write(
        ImmutableArray<PolarPageAsked> pages, string folder, DrawAsked asked, Surroundings surroundings, bool isWhole)
    {
        var place = new PicturePlace(folder, asked.Replace, surroundings.Disk);
        foreach (var page in pages)
            FileInTheWay.Refuse(Path.GetDirectoryName(place.PathOf(page, PictureFormat.Svg))!, "give a folder with --out");
        var code = isWhole ? ExitCode.Good : ExitCode.SomeNotGood;
        foreach (var page in pages)
            foreach (var format in asked.Formats)
            {
                var path = place.PathOf(page, format);
                try
                {
                    if (place.Write(path, Draw) is { } refusal)
                    {
                        surroundings.Error.WriteLine(Printable.Of($"not drawn: {path} {refusal}"));
                        code = ExitCode.SomeNotGood;
                    }
                    else
                        surroundings.Out.WriteLine(Printable.Of(path));
                }
                catch (Exception e) when (e is IOException or UnauthorizedAccessException)
                {
                    surroundings.Error.WriteLine(Printable.Of($"cannot write {path}: {DiskTrouble.Reason(e)}"));
                    return ExitCode.NoRoom;
                }

                byte[] Draw() => format == PictureFormat.Svg ? PictureFile.Svg(page.Picture) : PictureFile.Png(page.Picture);
            }
        return code;
    }

    private static ImmutableArray<PictureFormat> ParseFormat(ArgumentResult argument)
    {
        var text = argument.Tokens.Count == 1 ? argument.Tokens[0].Value : "";
        switch (text)
        {
            case "svg": return [PictureFormat.Svg];
            case "png": return [PictureFormat.Png];
            case "both": return [PictureFormat.Svg, PictureFormat.Png];
            default:
                argument.AddError($"--format is '{Printable.Of(text)}'; give svg, png or both");
                return [];
        }
    }
}
