using System.Collections.Immutable;
using BladeLoads.Studies.Files;

namespace BladeLoads.Studies.Cases;

/// <summary>Files among the cases that look like a case and are not read as one: a user may wait for their results.</summary>
internal static class PassedOver
{
    private static readonly ImmutableArray<string> Endings = [CaseName.Ending[1..]];

    public static void Doubt(StudyFolder folder, Findings findings)
    {
        var cases = folder.FullPath(StudyReader.CasesFolder);
        foreach (var name in folder.Names(cases).Where(name => !StudyPlace.IsCaseFile(name) && LooksLikeCase(name)))
            if (Path.Combine(cases, name) is var file && folder.Exists(file) && !folder.IsFolder(file))
                findings.Doubt(new Place(folder.RelativePath(file), 0, 0),
                    "is not read: a case file's name ends in .toml, in small letters, and does not begin with a dot");
    }

    // Letters only: with a ~ or a # at the end it is an editor's copy. And .toml.txt is what some editors make of .toml.
    private static bool LooksLikeCase(string name)
    {
        var ending = name[(name.LastIndexOf('.') + 1)..];
        return ending != name && ending.All(char.IsAsciiLetter) && Nearest.Of(ending, Endings) is not null
            || name.EndsWith(CaseName.Ending + ".txt", StringComparison.OrdinalIgnoreCase);
    }
}
