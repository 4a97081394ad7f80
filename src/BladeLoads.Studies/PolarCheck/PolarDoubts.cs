using System.Collections.Immutable;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>
/// Every doubt about a polar table. Each rule stands in a file of its own, with its limits; all of them are common practice, no source,
/// and ours, but where they name one. Errors are told by reading.
/// </summary>
public static class PolarDoubts
{
    /// <param name="figures">One a Reynolds number.</param>
    /// <param name="file">As findings name the table.</param>
    /// <returns>In the order of the lines.</returns>
    public static ImmutableArray<PolarDoubt> Of(StoredPolars table, ImmutableArray<PolarFigures> figures, string file)
    {
        var places = new CellPlaces(file, table);
        var polars = Enumerable.Range(0, table.Polars.Length).Select(i => new CheckedPolar(table, i, figures[i], places)).ToArray();
        var doubts = new List<PolarDoubt>();
        doubts.AddRange(table.Reach.Select(doubt => OfTable(DoubtKinds.Reach, "alpha_deg", doubt, doubt.Text)));
        doubts.AddRange(table.Doubts.Select(doubt => OfTable(DoubtKinds.HalfTurn, "cl", doubt, doubt.Text)));
        if (table.Augmented is var (line, note))
        {
            var found = $"the rows are augmented for rotation, by the head: '{VisibleText.Escape(note)}'";
            doubts.Add(OfTable(DoubtKinds.Augmented, "", new InputFinding(
                file, line, 0, found + "; they hold for one rotor and one radius, and are not to be augmented again"), found));
        }
        foreach (var polar in polars)
            doubts.AddRange(OfOne(polar));
        for (var i = 1; i < polars.Length; i++)
            doubts.AddRange(ReynoldsSteps.Doubts(polars[i - 1], polars[i]));
        return [.. doubts.OrderBy(doubt => doubt.Finding, FindingOrder.Instance)];

        PolarDoubt OfTable(string kind, string column, InputFinding doubt, string found)
            => new(kind, column, doubt with { File = file }, -1, double.NaN, double.NaN, []) { Found = found };
    }

    private static PolarDoubt[] OfOne(CheckedPolar polar)
    {
        // What stands under wrong names or in another unit is wrong in every other way too.
        if (ExchangedCoefficients.Doubts(polar).ToArray() is { Length: > 0 } exchanged)
            return exchanged;
        if (DragUnit.Doubts(polar).ToArray() is { Length: > 0 } unit)
            return unit;
        return
        [
            .. Gaps.Doubts(polar), .. NearRows.Doubts(polar), .. RepeatedRows.Doubts(polar), .. ScatteredRows.Doubts(polar),
            .. AttachedLift.Doubts(polar), .. DragFloor.Doubts(polar), .. SharpStall.Doubts(polar), .. Jumps.Doubts(polar),
            .. FullCircle.Doubts(polar),
        ];
    }
}
