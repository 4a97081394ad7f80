using BladeLoads.Results.Publishing;
using BladeLoads.Studies;

namespace BladeLoads.Batch.Plan;

/// <summary>Cases whose results would have nowhere to go.</summary>
public static class ReservedNames
{
    /// <summary>The study with each case rejected, and an error said about it, whose name the results folder needs for itself.</summary>
    public static Study Rejected(Study study)
    {
        var refused = study.Cases.Where(c => ResultsFolder.Objection(c.Name) is not null).ToList();
        if (refused.Count == 0)
            return study;
        var errors = refused.Select(c => new InputFinding(c.File, 0, 0, ResultsFolder.Objection(c.Name)!));
        return study with
        {
            Cases = study.Cases.RemoveRange(refused),
            Rejected = [.. study.Rejected, .. refused.Select(c => c.Name)],
            Blocking = study.Blocking.AddRange(refused.Select(c => KeyValuePair.Create(
                c.Name, new InputFinding(c.File, 0, 0, ResultsFolder.Objection(c.Name)!)))),
            Errors = [.. study.Errors.Concat(errors).OrderBy(e => e.File, StringComparer.Ordinal).ThenBy(e => e.Line).ThenBy(e => e.Column)],
        };
    }
}
