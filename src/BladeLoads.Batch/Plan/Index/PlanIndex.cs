using System.Collections.Immutable;
using BladeLoads.Results.Publishing;
using BladeLoads.Studies;
using BladeLoads.Studies.Files;

namespace BladeLoads.Batch.Plan.Index;

/// <summary>A case as an earlier plan read it.</summary>
public sealed record IndexedCase(string Name, string Title, string Fingerprint);

/// <summary>
/// What the last plan found, kept in the results folder so that the next need not read again what has not changed. It is believed only
/// as far as the stamps of the files bear it out; its loss, or damage to it, costs time and nothing else.
/// </summary>
/// <param name="ToolVersion">Another version may read the same files otherwise.</param>
/// <param name="Sight">What reading the study depended on; null where it had errors, whose cases have no values to plan with.</param>
/// <param name="Cases">All cases of the study; empty without a sight.</param>
/// <param name="Doubts">What was told of the study, and is to be told again.</param>
/// <param name="Results">By folder, relative to the study's results.</param>
public sealed record PlanIndex(
    string ToolVersion, int SolverVersion, StudySight? Sight, ImmutableArray<IndexedCase> Cases, ImmutableArray<InputFinding> Doubts,
    IReadOnlyDictionary<string, ResultFacts> Results)
{
    internal ResultFacts? Find(string folder) => Results.GetValueOrDefault(folder);

    /// <summary>The index of a study's results, made by this very version; null where there is none that is whole.</summary>
    public static PlanIndex? Read(ResultsFolder results, string toolVersion, int solverVersion)
        => FileStamp.IsSupported && IndexFile.Read(results.Index) is { } index
            && index.ToolVersion == toolVersion && index.SolverVersion == solverVersion ? index : null;

    /// <summary>Of a study that was read and the results that were looked at for it.</summary>
    internal static PlanIndex Of(Study study, KnownResults known, string toolVersion, int solverVersion)
    {
        var sight = study.Errors.IsEmpty && study.Rejected.IsEmpty ? study.Sight : null;
        return new PlanIndex(
            toolVersion, solverVersion, sight,
            sight is null ? [] : [.. study.Cases.Select(c => new IndexedCase(c.Name, c.Title, c.Fingerprint))],
            sight is null ? [] : study.Doubts,
            known.Facts.ToDictionary(StringComparer.Ordinal));
    }
}
