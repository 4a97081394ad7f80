using BladeLoads.Results.Comparison;
using BladeLoads.Results.Publishing;

namespace BladeLoads.Commands;

/// <summary>
/// The results that a user names: a folder of one or of several, a study, or a name within the results: a case, a set that was kept,
/// or a path from the results folder on.
/// </summary>
internal static class NamedResults
{
    private const string CasesFolder = "cases";
    private const int NamesShown = 6;

    /// <param name="root">The folder of results, as given.</param>
    /// <exception cref="WrongUseException">There is nothing of that name, or more than one.</exception>
    public static ResultSet Find(string text, string root)
    {
        try
        {
            var results = Path.GetFullPath(root);
            if (text.Length > 0 && Directory.Exists(text))
                return OfFolder(text, results) ?? OfName(text, results) ?? throw new WrongUseException($"'{text}' holds no results");
            return OfName(text, results) ?? throw new WrongUseException(NothingNamed(text, results, root));
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new WrongUseException($"cannot read '{text}': {DiskTrouble.ReadingReason(e)}");
        }
    }

    /// <summary>The same; null, with the reason, where there is nothing of that name.</summary>
    public static ResultSet? TryFind(string text, string root, out string? why)
    {
        try
        {
            why = null;
            return Find(text, root);
        }
        catch (WrongUseException e)
        {
            why = e.Message;
            return null;
        }
    }

    /// <summary>As <see cref="OfStudy"/>; null where there are none.</summary>
    public static ResultsFolder? TryOfStudy(string text, string root)
    {
        try
        {
            return OfStudy(text, root);
        }
        catch (WrongUseException)
        {
            return null;
        }
    }

    /// <summary>The results of a whole study: named by the study's folder, by its name, or by the folder of its results.</summary>
    /// <exception cref="WrongUseException">There are none.</exception>
    public static ResultsFolder OfStudy(string text, string root)
    {
        var results = Path.GetFullPath(root);
        if (text.Length > 0 && Directory.Exists(text))
        {
            var folder = Path.TrimEndingDirectorySeparator(Path.GetFullPath(text));
            var isStudy = Directory.Exists(Path.Join(folder, CasesFolder));
            if (!isStudy && ResultSet.In(folder, text) is { IsSingle: false })
                return new ResultsFolder(Path.GetDirectoryName(folder)!, Path.GetFileName(folder));
            if (isStudy && Directory.Exists(Path.Join(results, Path.GetFileName(folder))))
                return new ResultsFolder(results, Path.GetFileName(folder));
        }
        if (text.Length > 0 && ResultsFolder.Objection(text) is null && Directory.Exists(Path.Join(results, text)))
            return new ResultsFolder(results, text);
        throw new WrongUseException($"'{text}' is no study with results in '{root}'; name its folder, and say where its results are with --results");
    }

    private static ResultSet? OfFolder(string text, string results)
    {
        var folder = Path.TrimEndingDirectorySeparator(Path.GetFullPath(text));
        if (ResultSet.In(folder, text) is { } there)
            return there;
        if (!Directory.Exists(Path.Join(folder, CasesFolder)))
            return null;
        var study = Path.GetFileName(folder);
        return ResultSet.In(Path.Join(results, study), study)
            ?? throw new WrongUseException($"the study '{study}' has no results in '{results}'; run it, or say where they are with --results");
    }

    private static ResultSet? OfName(string text, string results)
    {
        var parts = text.Split('/', '\\');
        if (text.Length == 0 || Path.IsPathRooted(text) || parts.Any(p => p is "" or "." or "..") || !Directory.Exists(results))
            return null;
        var places = new List<string> { text };
        foreach (var study in Studies(results))
            places.AddRange([Path.Join(study, text), Path.Join(study, "kept", text)]);
        var found = places.Select(place => ResultSet.In(Path.Join(results, place), place)).OfType<ResultSet>().ToList();
        return found.Count <= 1
            ? found.SingleOrDefault()
            : throw new WrongUseException(
                $"'{text}' can mean {string.Join(" or ", found.Select(f => $"'{f.Name.Replace('\\', '/')}'"))} in '{results}'; name the one that is meant");
    }

    private static string NothingNamed(string text, string results, string root)
    {
        if (!Directory.Exists(results))
            return $"no results named '{text}': there is no folder '{root}'; say where results are with --results";
        var names = Studies(results).SelectMany(study => NamesIn(results, study)).ToList();
        return names.Count == 0
            ? $"no results named '{text}': the folder '{root}' holds none"
            : $"no results named '{text}'; in '{root}' there are {string.Join(", ", names.Take(NamesShown))}"
                + (names.Count > NamesShown ? $" and {names.Count - NamesShown} more" : "");
    }

    private static IEnumerable<string> NamesIn(string results, string study)
    {
        var folder = new ResultsFolder(results, study);
        var kept = Directory.Exists(folder.Kept) ? Directory.EnumerateDirectories(folder.Kept).Select(f => $"kept/{Path.GetFileName(f)}") : [];
        var cases = ResultSet.In(folder.Study, study)?.Cases.Select(c => c.Case) ?? [];
        return kept.Where(k => !k.StartsWith("kept/.", StringComparison.Ordinal)).Order(StringComparer.Ordinal).Concat(cases).Select(n => $"{study}/{n}");
    }

    private static IEnumerable<string> Studies(string results)
        => Directory.EnumerateDirectories(results).Select(f => Path.GetFileName(f)).Where(f => f[0] != '.').Order(StringComparer.Ordinal);
}
