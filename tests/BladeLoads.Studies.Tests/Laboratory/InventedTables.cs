using System.Collections.Immutable;
using BladeLoads.Studies.Laboratory;
using BladeLoads.Studies.Tables;
using CsCheck;

namespace BladeLoads.Studies.Tests.Laboratory;

/// <summary>Polar tables of no section, and layouts in which they can be sent without a doubt about any number.</summary>
internal static class InventedTables
{
    public static Gen<(ImmutableArray<PolarRows> Polars, SentLayout Layout)> All { get; } = Gen.Select(
        Polars(), Layouts(), (polars, layout) => (polars, layout));

    public static bool AreEqual(ImmutableArray<PolarRows> one, ImmutableArray<PolarRows> other) => one.Length == other.Length
        && one.Zip(other).All(pair => pair.First.Reynolds.Equals(pair.Second.Reynolds) && pair.First.Rows.SequenceEqual(pair.Second.Rows));

    private static Gen<ImmutableArray<PolarRows>> Polars()
    {
        var block = Gen.Select(
            Gen.Int[-1790, -100], Gen.Int[1, 80].Array[4, 14], Gen.Int[-1999, 1999].Array[20], Gen.Int[1, 19999].Array[20], Gen.Int[-999, 999].Array[20]);
        return Gen.Select(Gen.Int[0, 3], Gen.Int[1, 40].Array[3], Gen.Bool, block.Array[3], (count, steps, hasMoments, blocks) =>
        {
            var reynolds = 0.0;
            return Enumerable.Range(0, Math.Max(1, count)).Select(b =>
            {
                reynolds += steps[b] * 50_000.0;
                return new PolarRows(count == 0 ? double.NaN : reynolds, Rows(blocks[b], hasMoments));
            }).ToImmutableArray();
        });
    }

    // Angles in tenths of a degree, coefficients in thousandths and ten-thousandths: what a laboratory prints.
    private static ImmutableArray<PolarRow> Rows((int First, int[] Steps, int[] Lift, int[] Drag, int[] Moment) block, bool hasMoments)
    {
        var angle = block.First;
        return [.. block.Steps.Select((step, i) =>
        {
            angle += step;
            return new PolarRow(
                (double)(angle / 10m), (double)(block.Lift[i] / 1000m), (double)(block.Drag[i] / 10_000m), hasMoments ? (double)(block.Moment[i] / 1000m) : double.NaN);
        })];
    }

    private static Gen<SentLayout> Layouts() => Gen.Select(
        Gen.Enum<CellSeparator>(), Gen.Enum<DecimalSign>(), Gen.Enum<AngleUnit>(), Gen.Int[0, 3], Gen.Int[0, 255],
        Gen.Int[0, 2].Select(i => new[] { "\n", "\r\n", "\r" }[i]), Gen.Int[0, 3].Select(i => new[] { "utf-8", "utf-16", "utf-16BE", "iso-8859-1" }[i]),
        (separator, sign, unit, reynolds, flags, end, encoding) => new SentLayout
        {
            Separator = separator,
            Sign = sign,
            Unit = unit,
            UnitAt = flags & 1,
            ReynoldsAt = reynolds,
            HasFallingAngles = (flags & 2) != 0,
            IsQuoted = (flags & 4) != 0,
            HasMoreColumns = (flags & 8) != 0,
            EndsInSeparator = (flags & 16) != 0,
            HasRemarks = (flags & 32) != 0,
            NamesEachBlock = (flags & 64) != 0,
            LineEnd = end,
            Encoding = encoding,
        });
}
