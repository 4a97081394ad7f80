using System.Collections.Immutable;
using BladeLoads.Batch.Plan;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;
using BladeLoads.Studies;

namespace BladeLoads.Batch.Work;

/// <summary>Makes a case current with a result of its very values that is there already, in another place or under another title.</summary>
/// <param name="plan">How the cases stood when the run began. What is there may have changed since, and is looked at again.</param>
public sealed class CaseReuse(
    StudyPlan plan, ResultsFolder results, Publisher publisher, IDisk disk, RunIdentity identity)
{
    private readonly ImmutableDictionary<string, CaseState> _states
        = plan.Cases.ToImmutableDictionary(c => c.Case.Name, c => c.State, StringComparer.Ordinal);

    /// <summary>Null where there is none, and the case is to be solved.</summary>
    /// <exception cref="IOException">It could not be put into place.</exception>
    /// <exception cref="UnauthorizedAccessException">As above.</exception>
    public CaseOutcome.Reused? Try(StudyCase studyCase) => _states.GetValueOrDefault(studyCase.Name) switch
    {
        CaseState.Retitled => Retitle(studyCase),
        CaseState.CurrentAgain { Found: var found } => BringBack(studyCase, found),
        CaseState.Reusable { Found: var found } => Copy(studyCase, found),
        _ => null,
    };

    private CaseOutcome.Reused? Retitle(StudyCase studyCase)
    {
        var folder = results.Case(studyCase.Name);
        if (WholeResult(folder, studyCase) is not { } receipt)
            return null;
        if (receipt.Title != studyCase.Title || receipt.Case != studyCase.Name)
            publisher.PublishFile(
                Path.Join(folder, Receipt.FileName),
                ReceiptFile.Write(receipt with { Title = studyCase.Title, Case = studyCase.Name, Inputs = studyCase.Inputs }));
        return new CaseOutcome.Reused(receipt.Summary, studyCase.Name);
    }

    private CaseOutcome.Reused? BringBack(StudyCase studyCase, FoundResult found)
    {
        foreach (var replaced in ReplacedResult.Of(results, studyCase.Name).Where(r => r.IsResult))
            if (WholeResult(replaced.Folder, studyCase) is { } receipt && ReturnedResult.Exchange(replaced, results, disk))
            {
                if (receipt.Title != studyCase.Title)
                    Retitle(studyCase);
                return new CaseOutcome.Reused(receipt.Summary, found.Folder);
            }
        return null;
    }

    // The other case may be solved anew at this very moment: a result that is on its way to the replaced ones is there at the next look.
    private CaseOutcome.Reused? Copy(StudyCase studyCase, FoundResult found)
    {
        const int looks = 3;
        for (var look = 1; look <= looks; look++)
            if (TryCopy(studyCase, found) is { } outcome)
                return outcome;
        return null;
    }

    private CaseOutcome.Reused? TryCopy(StudyCase studyCase, FoundResult found)
    {
        publisher.Settle();   // until then what this run has replaced lies under hidden names
        var places = ReplacedResult.Of(results, found.Case).Where(r => r.IsResult).Select(r => r.Folder).Prepend(Path.Join(results.Study, found.Folder));
        foreach (var folder in places)
            if (WholeResult(folder, studyCase) is { } receipt && FilesOf(folder, receipt) is { } files)
            {
                var from = Path.GetRelativePath(results.Study, folder).Replace('\\', '/');
                var own = receipt with
                {
                    Study = results.StudyName,
                    Case = studyCase.Name,
                    Title = studyCase.Title,
                    Inputs = studyCase.Inputs,
                    ReusedFrom = from,
                };
                publisher.PublishCase(studyCase.Name, [.. files, new(Receipt.FileName, ReceiptFile.Write(own))]);
                return new CaseOutcome.Reused(receipt.Summary, from);
            }
        return null;
    }

    private Receipt? WholeResult(string folder, StudyCase wanted)
    {
        try
        {
            return ReceiptFile.Read(folder) is ReceiptReading.Readable { Receipt: var receipt }
                && receipt.Fingerprint == wanted.Fingerprint && receipt.SolverVersion == identity.SolverVersion
                && ResultCheck.IsWhole(folder, receipt) ? receipt : null;
        }
        // Moved away meanwhile, or not to be read: then there is nothing to use again, and the case is solved.
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }

    // Null where they changed while they were read: then they are those of another result.
    private static List<ResultContent>? FilesOf(string folder, Receipt receipt)
    {
        var files = new List<ResultContent>();
        foreach (var file in receipt.Files)
        {
            var bytes = ReadIfThere(Path.Join(folder, file.Name));
            if (bytes is null || ResultFile.Of(file.Name, bytes) != file)
                return null;
            files.Add(new ResultContent(file.Name, bytes));
        }
        return files;
    }

    private static byte[]? ReadIfThere(string path)
    {
        try
        {
            return File.ReadAllBytes(path);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }
}
