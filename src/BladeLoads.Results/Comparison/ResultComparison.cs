using System.Collections.Immutable;

namespace BladeLoads.Results.Comparison;

/// <summary>Sets two results beside each other, from their files.</summary>
public static class ResultComparison
{
    // A wind speed from a range (from + i step) differs in its last digits from the same one typed in a list.
    private const double SameWindSpeedWithin = 1e-9;

    /// <summary>Two result folders, whatever is in them.</summary>
    /// <param name="why">In what the two were made from differs, in one sentence; asked where both have a receipt.</param>
    public static CaseComparison OfFolders(string old, string now, Func<StoredResult, StoredResult, string> why)
    {
        StoredResult? before = null, after = null;
        var troubles = new List<string>();
        try
        {
            before = StoredResult.Read(old);
        }
        catch (UnreadableCurveException e)
        {
            troubles.Add($"old: {e.Message}");
        }
        try
        {
            after = StoredResult.Read(now);
        }
        catch (UnreadableCurveException e)
        {
            troubles.Add($"new: {e.Message}");
        }
        return before is null || after is null
            ? new CaseComparison.NotCompared(
                after?.Case ?? Path.GetFileName(now), before?.Case ?? Path.GetFileName(old), NoComparison.Unreadable, string.Join("; ", troubles))
            : Between(before, after, why);
    }

    public static CaseComparison.Compared Between(StoredResult old, StoredResult now, Func<StoredResult, StoredResult, string> why)
    {
        var (common, windSpeeds) = Match(old.Curve, now.Curve);
        return new CaseComparison.Compared(
            now.Case, old.Case,
            old.Receipt is null || now.Receipt is null ? "" : why(old, now),
            [
                .. Figures.All.Where(f => !f.IsOfSomeCases || f.Of(old) is not null || f.Of(now) is not null)
                    .Select(f => Change(f.Name, f.Unit, f.BySize, f.Of(old), f.Of(now))),
            ],
            [
                LargestChange("electrical power where it changed most", "kW", common, Figures.ElectricalPower),
                LargestChange("thrust where it changed most", "kN", common, Figures.Thrust),
            ],
            Marks(old, now),
            windSpeeds,
            [.. old.Doubts.Select(d => $"old: {d}"), .. now.Doubts.Select(d => $"new: {d}")]);
    }

    private static FigureChange Change(string name, string unit, bool bySize, FigureValue? old, FigureValue? now)
    {
        if (old is null || now is null)
            return new FigureChange(name, unit, old, now, null, null, false);
        var difference = bySize ? Math.Abs(now.Value) - Math.Abs(old.Value) : now.Value - old.Value;
        return new FigureChange(
            name, unit, old, now, difference, old.Value == 0 ? null : 100 * difference / Math.Abs(old.Value),
            bySize && Math.Sign(old.Value) * Math.Sign(now.Value) < 0);
    }

    /// <summary>At the lowest of the wind speeds that share the largest change; at none where nothing changed.</summary>
    private static FigureChange LargestChange(string name, string unit, List<(StoredPoint Old, StoredPoint New)> common, string column)
    {
        var both = common.Where(p => p.Old[column] is not null && p.New[column] is not null).ToList();
        if (both.Count == 0)
            return new FigureChange(name, unit, null, null, null, null, false);
        var (old, now) = both.MaxBy(p => Math.Abs(p.New[column]!.Value - p.Old[column]!.Value));
        var change = Change(name, unit, false, new(old[column]!.Value, old.WindSpeed), new(now[column]!.Value, now.WindSpeed));
        return change.IsChange ? change : new FigureChange(name, unit, null, null, 0, 0, false);
    }

    private static (List<(StoredPoint Old, StoredPoint New)> Common, CommonWindSpeeds WindSpeeds) Match(StoredCurve old, StoredCurve now)
    {
        var common = new List<(StoredPoint, StoredPoint)>();
        var onlyOld = ImmutableArray.CreateBuilder<double>();
        var onlyNew = ImmutableArray.CreateBuilder<double>();
        int i = 0, j = 0;
        while (i < old.Points.Length || j < now.Points.Length)
        {
            var before = i < old.Points.Length ? old.Points[i] : null;
            var after = j < now.Points.Length ? now.Points[j] : null;
            if (before is not null && after is not null && IsSame(before.WindSpeed, after.WindSpeed))
            {
                common.Add((before, after));
                i++;
                j++;
            }
            else if (after is null || before is not null && before.WindSpeed < after.WindSpeed)
            {
                onlyOld.Add(before!.WindSpeed);
                i++;
            }
            else
            {
                onlyNew.Add(after.WindSpeed);
                j++;
            }
        }
        return (common, new CommonWindSpeeds(common.Count, onlyOld.ToImmutable(), onlyNew.ToImmutable()));
    }

    private static ImmutableArray<MarkChange> Marks(StoredResult old, StoredResult now)
    {
        var (before, after) = (MarksOf(old), MarksOf(now));
        return
        [
            .. before.Keys.Union(after.Keys, StringComparer.Ordinal).Order(StringComparer.Ordinal)
                .Select(mark => MarkChangeOf(mark, before.GetValueOrDefault(mark), after.GetValueOrDefault(mark)))
                .Where(change => (change.OldPoints is null) != (change.NewPoints is null) || !change.NewAt.IsEmpty || !change.LostAt.IsEmpty),
        ];
    }

    private static MarkChange MarkChangeOf(string mark, List<double>? before, List<double>? after) => new(
        mark, before?.Count, after?.Count,
        [.. (after ?? []).Where(v => before is null || !before.Any(w => IsSame(v, w)))],
        [.. (before ?? []).Where(v => after is null || !after.Any(w => IsSame(v, w)))]);

    /// <summary>The wind speeds of each mark; none for one of the curve alone.</summary>
    private static Dictionary<string, List<double>> MarksOf(StoredResult result)
    {
        var marks = result.Receipt is { } receipt
            ? receipt.Summary.Marks.Keys.ToDictionary(m => m, _ => new List<double>(), StringComparer.Ordinal)
            : new Dictionary<string, List<double>>(StringComparer.Ordinal);
        foreach (var point in result.Curve.Points)
            foreach (var mark in point.Marks.Distinct(StringComparer.Ordinal))
            {
                if (!marks.TryGetValue(mark, out var at))
                    marks[mark] = at = [];
                at.Add(point.WindSpeed);
            }
        return marks;
    }

    private static bool IsSame(double one, double other) => Math.Abs(one - other) <= SameWindSpeedWithin * Math.Abs(other);
}
