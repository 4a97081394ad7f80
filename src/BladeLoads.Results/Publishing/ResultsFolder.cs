using BladeLoads.Results.Comparison;
using BladeLoads.Results.Report;
using BladeLoads.Results.Tables;

namespace BladeLoads.Results.Publishing;

/// <summary>Where the results of a study lie. Absolute paths, but where they are only shown; nothing is created by asking.</summary>
/// <param name="Root">The folder that <c>--results</c> names: absolute, or as the user gave it, for paths to be shown.</param>
/// <param name="StudyName">The name of the study, safe as a folder name.</param>
public sealed record ResultsFolder(string Root, string StudyName)
{
    /// <summary>The folder of the study: everything else lies in it.</summary>
    public string Study => Path.Join(Root, StudyName);

    public string Logs => Path.Join(Study, LogsName);

    public string Summary => Path.Join(Study, SummaryTable.FileName);

    public string Case(string name) => Path.Join(Study, name);

    public string Failure(string name) => Path.Join(Study, FailuresName, name + ".json");

    public string Failures => Path.Join(Study, FailuresName);

    /// <summary>Parsed tables that results were made from, once each by their SHA-256.</summary>
    public string Tables => Path.Join(Study, TablesName);

    /// <summary>The file of a parsed table.</summary>
    /// <param name="hash">64 lower-case hexadecimal digits.</param>
    public string Table(string hash) => Path.Join(Tables, hash + ".csv");

    /// <summary>What the last plan found, so that the next need not open what has not changed since; its loss costs only time.</summary>
    public string Index => Path.Join(Study, ".index");

    /// <summary>Whether the folder needs this name itself: no result lies under it.</summary>
    public static bool IsOwn(string name) => OwnNames.Contains(name);

    /// <summary>Result folders whose name is none of these, in order: of cases that the study has no more.</summary>
    public IReadOnlyList<string> OfNoCase(IReadOnlySet<string> caseNames)
    {
        if (!Directory.Exists(Study))
            return [];
        return [.. Directory.EnumerateDirectories(Study).Select(path => Path.GetFileName(path))
            .Where(name => !caseNames.Contains(name) && Objection(name) is null && File.Exists(Path.Join(Case(name), Receipts.Receipt.FileName)))
            .Order(StringComparer.Ordinal)];
    }

    /// <summary>What reruns replaced: a folder a case, and in it a folder a result.</summary>
    public string Replaced => Path.Join(Study, ReplacedName);

    /// <summary>The folder of the results that were replaced of a case.</summary>
    public string ReplacedOf(string caseName) => Path.Join(Replaced, caseName);

    /// <summary>Result sets set aside under a name, a folder each.</summary>
    public string Kept => Path.Join(Study, KeptName);

    /// <summary>The folder of a result set that was set aside.</summary>
    public string KeptAs(string name) => Path.Join(Kept, name);

    /// <summary>What a check of the polar tables found.</summary>
    public string Polars => Path.Join(Study, PolarsName);

    /// <summary>Pictures of section tables, a folder a set.</summary>
    public string Pictures => Path.Join(Study, PicturesName);

    /// <summary>The page for reading, printing and signing.</summary>
    public string Report => Path.Join(Study, StudyReport.FileName);

    /// <summary>What moved in the last run.</summary>
    public string Changes => Path.Join(Study, ChangesTable.FileName);

    /// <summary>A file for each case that is being solved, or whose process was lost while solving it.</summary>
    public string Claims => Path.Join(Study, ClaimsName);

    public string Claim(string caseName) => Path.Join(Claims, caseName);

    /// <summary>
    /// Why no result folder can have this name, or null where it can: the study's folder needs some names itself, and a name beginning
    /// with a point marks what is being written.
    /// </summary>
    public static string? Objection(string caseName)
    {
        if (caseName.Length == 0 || caseName[0] == '.' || caseName.AsSpan().ContainsAny('/', '\\', '\0'))
            return "a case name may not be empty, begin with a point or hold a slash; rename the case file";
        return OwnNames.Contains(caseName)
            ? $"the results folder needs the name '{caseName}' itself; rename the case file" : null;
    }

    private const string LogsName = "logs";
    private const string ClaimsName = ".claims";   // no case has a name that begins with a point
    private const string FailuresName = "failures";
    private const string TablesName = "tables";
    private const string ReplacedName = "replaced";
    private const string KeptName = "kept";
    private const string PolarsName = "polars";
    private const string PicturesName = "pictures";

    private static readonly HashSet<string> OwnNames = new(StringComparer.OrdinalIgnoreCase)
    {
        LogsName, FailuresName, TablesName, ReplacedName, KeptName, PolarsName, PicturesName, SummaryTable.FileName, StudyReport.FileName, ChangesTable.FileName,
    };
}
