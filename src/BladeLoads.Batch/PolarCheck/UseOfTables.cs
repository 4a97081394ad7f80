using System.Collections.Concurrent;
using System.Collections.Immutable;
using BladeLoads.Batch.Queue;
using BladeLoads.Batch.Work;
using BladeLoads.Results.Wording;
using BladeLoads.Rotor.Blades;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;
using BladeLoads.Studies.PolarCheck;

namespace BladeLoads.Batch.PolarCheck;

/// <summary>Where the rotors of a study work in their polar tables: their cases solved in memory, and nothing kept but the counts.</summary>
/// <param name="ByFile">By the file of the table; a table that no case uses is not there.</param>
/// <param name="Solved">Cases that were counted.</param>
/// <param name="Failed">Name and reason of those that could not be solved.</param>
public sealed record UseOfTables(
    ImmutableSortedDictionary<string, TableUse> ByFile, int Solved, ImmutableArray<(string Case, string Reason)> Failed)
{
    /// <summary>Of no cases.</summary>
    public static UseOfTables None { get; } = new(ImmutableSortedDictionary.Create<string, TableUse>(StringComparer.Ordinal), 0, []);

    /// <summary>
    /// Solves the cases and counts, over their operating points, how much of the blade works at each angle and Reynolds number. Every wind
    /// speed of every case counts alike, but a rotor at rest for nothing. The same for any number of workers.
    /// </summary>
    /// <param name="tables">As tabulated; what a case does to a table before it uses it is left out of account.</param>
    /// <exception cref="OperationCanceledException">Cancelled.</exception>
    public static UseOfTables Of(
        ImmutableArray<StudyCase> cases, IEnumerable<CheckedTable> tables, SolveCase solve, int workers, RunProgress progress,
        CancellationToken cancellation)
    {
        var byFile = tables.ToImmutableDictionary(table => table.File, StringComparer.Ordinal);
        var sums = new SortedDictionary<string, TableUse>(StringComparer.Ordinal);
        var failed = new SortedDictionary<string, string>(StringComparer.Ordinal);
        var solved = 0;
        Parallel.ForEach(
            Partitioner.Create(cases.OrderByDescending(CaseGroups.Estimate), EnumerablePartitionerOptions.NoBuffering),
            new ParallelOptions { MaxDegreeOfParallelism = workers, CancellationToken = cancellation },
            () => new Dictionary<string, TableUse>(StringComparer.Ordinal),
            (studyCase, _, counted) =>
            {
                try
                {
                    var curve = solve(studyCase.Rotor, cancellation);
                    Count(studyCase, curve, byFile, counted);
                    Interlocked.Increment(ref solved);
                    progress.CaseEnded(CaseGroups.Estimate(studyCase), curve.RotorSolves);
                }
                catch (Exception e) when (e is not OperationCanceledException)
                {
                    lock (failed)
                        failed.Add(studyCase.Name, $"fault in BladeLoads, please report: {Printable.Of(e.Message)}");
                    progress.CaseEnded(CaseGroups.Estimate(studyCase), 0);
                }
                return counted;
            },
            counted =>
            {
                lock (sums)
                    foreach (var (file, use) in counted)
                        if (sums.TryGetValue(file, out var sum))
                            sum.Add(use);
                        else
                            sums.Add(file, use);
            });
        return new UseOfTables(
            sums.ToImmutableSortedDictionary(StringComparer.Ordinal), solved, [.. failed.Select(f => (f.Key, f.Value))]);
    }

    private static void Count(
        StudyCase studyCase, PowerCurve curve, ImmutableDictionary<string, CheckedTable> tables, Dictionary<string, TableUse> counted)
    {
        var rotor = studyCase.Rotor;
        var files = CheckedTables.SectionTables(studyCase).ToDictionary(t => t.Section, t => t.File, StringComparer.Ordinal);
        var length = rotor.Blade.TipRadius - rotor.Blade.HubRadius;
        var elements = BladeElements.Of(rotor.Blade, rotor.Model.Elements, rotor.Model.Spacing)
            .Select(element => SectionShares.Of(element, rotor.Sections)
                .Select(share => (Use: UseOf(files[share.Section]), Share: share.Share * element.Length / length))
                .Where(x => x.Use is not null).ToArray())
            .ToArray();
        foreach (var point in curve.Points)
            if (point.Operation.RotorSpeed > 0)
                for (var i = 0; i < point.Elements.Length; i++)
                    foreach (var (use, share) in elements[i])
                        use!.Add(point.Elements[i], share);

        TableUse? UseOf(string file)
        {
            if (!counted.TryGetValue(file, out var use) && tables.TryGetValue(file, out var table))
                counted.Add(file, use = new TableUse(table.Table.Section));
            return use;
        }
    }
}
