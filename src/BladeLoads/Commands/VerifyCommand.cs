using System.Collections.Immutable;
using System.CommandLine;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Keeping;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Wording;
using BladeLoads.Screen;

namespace BladeLoads.Commands;

/// <summary><c>bladeloads verify</c>: which results are not what was written.</summary>
internal static class VerifyCommand
{
    public static Command Define(Surroundings surroundings)
    {
        var asked = new Argument<string>("what") { Description = "a study, a case, a kept set, or a folder of results" };
        var results = CommandLine.ResultsOption();
        results.Description = "the folder in which names are looked for";
        var setAside = new Option<bool>("--set-aside")
        {
            Description = "move damaged results of a study out of their places, so that the next run solves their cases again",
        };
        var command = new Command(
            "verify", "Reads every byte of results and tells which are not what was written, by the hashes in their receipts.")
        {
            asked, results, setAside,
        };
        command.SetAction(parsed => Run(
            parsed.GetRequiredValue(asked), parsed.GetRequiredValue(results), parsed.GetValue(setAside), surroundings));
        return command;
    }

    private static int Run(string asked, string root, bool setAside, Surroundings surroundings)
    {
        var (study, found) = Look(asked, root);
        if (setAside && study is null)
            throw new WrongUseException("--set-aside is for a whole study: name the study");
        if (found.IsEmpty)
            throw new WrongUseException($"'{asked}' holds no results");
        foreach (var one in found)
            foreach (var flaw in one.Flaws)
                surroundings.Out.WriteLine(Printable.Of($"{one.Name}: {flaw.Sentence}"));
        var bad = found.Count(v => !v.IsAsWritten);
        surroundings.Out.WriteLine(bad == 0
            ? $"{Count.Of(found.Length, "result")} verified: all as written"
            : $"{Count.Of(found.Length, "result")} verified: {bad} not as written");
        if (bad == 0)
            return ExitCode.Good;
        TellWhatToDo(asked, study, found, setAside, surroundings);
        return ExitCode.SomeNotGood;
    }

    private static (ResultsFolder? Study, ImmutableArray<Verified> Found) Look(string asked, string root)
    {
        var set = NamedResults.TryFind(asked, root, out var why);
        // A study whose results are all damaged is still one.
        if (set is null || !set.IsSingle && KeptRecordIsMissing(set))
        {
            var study = set is null ? NamedResults.TryOfStudy(asked, root) : StudyIn(set.Folder);
            return study is null ? throw new WrongUseException(why!) : (study, Verification.OfStudy(study));
        }
        return (null, set.IsSingle ? Verification.OfSet(set) : Verification.OfKept(set.Folder));
    }

    private static bool KeptRecordIsMissing(ResultSet set)
        => Path.GetFileName(Path.GetDirectoryName(set.Folder)) != "kept" && !File.Exists(Path.Join(set.Folder, KeptRecord.FileName));

    private static ResultsFolder StudyIn(string folder) => new(Path.GetDirectoryName(folder)!, Path.GetFileName(folder));

    private static void TellWhatToDo(
        string asked, ResultsFolder? study, ImmutableArray<Verified> found, bool setAside, Surroundings surroundings)
    {
        var damaged = found.Where(v => v.IsDamaged).ToList();
        var current = damaged.Select(v => v.CurrentCase).OfType<string>().ToList();
        if (setAside && current.Count > 0)
        {
            DamagedResults.SetAside(study!, current, surroundings.Disk);
            surroundings.Out.WriteLine(
                $"{Count.Of(current.Count, "damaged result")} moved to replaced/ with what is left of {(current.Count == 1 ? "it; the next run solves its case" : "them; the next run solves their cases")} again");
        }
        else if (current.Count > 0)
            surroundings.Out.WriteLine(Printable.Of(
                $"to have {Count.Of(current.Count, "case")} solved again: bladeloads verify {asked} --set-aside, and run the study"));
        if (damaged.Any(v => v.CurrentCase is null && v.Name.StartsWith("kept/", StringComparison.Ordinal)) || study is null && damaged.Count > 0)
            surroundings.Out.WriteLine("what was kept or copied cannot be made again by a run: bring it back from a copy of yours");
    }
}
