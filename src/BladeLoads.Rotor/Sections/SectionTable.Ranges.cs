using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace BladeLoads.Rotor.Sections;

/// <summary>
/// Bounds of the coefficients over a range of angles. They rest on the interpolant being monotone between two knots, so the extremes of
/// a range are at its ends or at the knots within.
/// </summary>
internal sealed partial class SectionTable
{
    private const int KnotsPerBlock = 8;

    // Lanes: lift and drag at the knot; the least slopes of lift and of drag in the cell that begins there.
    private readonly Vector256<double>[] _points;

    // Of KnotsPerBlock knots at a time: their least lanes, then their largest.
    private readonly Vector256<double>[] _blocks;

    /// <summary>
    /// Bounds over angles from <paramref name="from"/> to <paramref name="to"/>, rad, within +-pi, not falling. Each polar is bounded by
    /// itself, because a blend of two monotone cubics need not be monotone.
    /// </summary>
    public CoefficientRange Range(double from, double to, in ReynoldsPlace place)
    {
        var (firstCell, lastCell) = (CellAt(from), CellAt(to));
        var range = PolarRange(place.Polar, firstCell, lastCell, from, to);
        if (place.Weight == 0)
            return range;
        return CoefficientRange.Blend(range, PolarRange(place.Polar + 1, firstCell, lastCell, from, to), place.Weight);
    }

    private CoefficientRange PolarRange(int polar, int firstCell, int lastCell, double from, double to)
    {
        var start = Cubics(((firstCell * _polars) + polar) * CoefficientsPerCell, from - _knots[firstCell]);
        var end = Cubics(((lastCell * _polars) + polar) * CoefficientsPerCell, to - _knots[lastCell]);
        var slopes = _points[(firstCell * _polars) + polar];
        var least = Vector256.Create(
            Math.Min(start.Lift, end.Lift), Math.Min(start.Drag, end.Drag), slopes.GetElement(2), slopes.GetElement(3));
        var largest = Vector256.Create(Math.Max(start.Lift, end.Lift), Math.Max(start.Drag, end.Drag), 0, 0);
        for (var knot = firstCell + 1; knot <= lastCell;)
        {
            if (knot % KnotsPerBlock == 0 && knot + KnotsPerBlock - 1 <= lastCell)
            {
                var block = 2 * (((knot / KnotsPerBlock) * _polars) + polar);
                least = Vector256.Min(least, _blocks[block]);
                largest = Vector256.Max(largest, _blocks[block + 1]);
                knot += KnotsPerBlock;
            }
            else
            {
                var point = _points[(knot * _polars) + polar];
                least = Vector256.Min(least, point);
                largest = Vector256.Max(largest, point);
                knot++;
            }
        }
        return new CoefficientRange(least, largest);
    }

    private (Vector256<double>[] Points, Vector256<double>[] Blocks) SummariseCells()
    {
        var cells = _knots.Length - 1;
        var points = new Vector256<double>[cells * _polars];
        for (var cell = 0; cell < cells; cell++)
        {
            var width = _knots[cell + 1] - _knots[cell];
            for (var m = 0; m < _polars; m++)
            {
                var c = _cells.AsSpan(((cell * _polars) + m) * CoefficientsPerCell, CoefficientsPerCell);
                points[(cell * _polars) + m] = Vector256.Create(
                    c[0], c[4], LeastSlope(c[1], c[2], c[3], width), LeastSlope(c[5], c[6], c[7], width));
            }
        }
        var wholeBlocks = cells / KnotsPerBlock;
        var blocks = new Vector256<double>[2 * wholeBlocks * _polars];
        for (var block = 0; block < wholeBlocks; block++)
            for (var m = 0; m < _polars; m++)
            {
                var (least, largest) = (points[(block * KnotsPerBlock * _polars) + m], points[(block * KnotsPerBlock * _polars) + m]);
                for (var i = 1; i < KnotsPerBlock; i++)
                {
                    var point = points[(((block * KnotsPerBlock) + i) * _polars) + m];
                    (least, largest) = (Vector256.Min(least, point), Vector256.Max(largest, point));
                }
                blocks[2 * ((block * _polars) + m)] = least;
                blocks[(2 * ((block * _polars) + m)) + 1] = largest;
            }
        return (points, blocks);
    }

    private static double LeastSlope(double c1, double c2, double c3, double width)
    {
        double Slope(double u) => c1 + (u * ((2 * c2) + (3 * u * c3)));
        var least = Math.Min(Slope(0), Slope(width));
        var turn = -c2 / (3 * c3);
        return turn > 0 && turn < width ? Math.Min(least, Slope(turn)) : least;
    }
}

/// <summary>Bounds of a section's coefficients and of their slopes over a range of angles.</summary>
/// <param name="Least">Lift, drag, slope of lift, slope of drag (a radian).</param>
/// <param name="Largest">Lift, drag; the other lanes say nothing.</param>
internal readonly record struct CoefficientRange(Vector256<double> Least, Vector256<double> Largest)
{
    public double LeastLift => Least.GetElement(0);

    public double LargestLift => Largest.GetElement(0);

    public double LeastDrag => Least.GetElement(1);

    public double LargestDrag => Largest.GetElement(1);

    public double LeastLiftSlope => Least.GetElement(2);

    public double LeastDragSlope => Least.GetElement(3);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static CoefficientRange Blend(in CoefficientRange a, in CoefficientRange b, double weightOfB) => new(
        (a.Least * (1 - weightOfB)) + (b.Least * weightOfB), (a.Largest * (1 - weightOfB)) + (b.Largest * weightOfB));

    /// <param name="liftWeightOfB">Of lift and its slope.</param>
    /// <param name="dragWeightOfB">Of drag and its slope.</param>
    public static CoefficientRange Blend(in CoefficientRange a, in CoefficientRange b, double liftWeightOfB, double dragWeightOfB)
    {
        var ofB = Vector256.Create(liftWeightOfB, dragWeightOfB, liftWeightOfB, dragWeightOfB);
        var ofA = Vector256<double>.One - ofB;
        return new((a.Least * ofA) + (b.Least * ofB), (a.Largest * ofA) + (b.Largest * ofB));
    }

    /// <summary>Bounds over both ranges.</summary>
    public static CoefficientRange Hull(in CoefficientRange a, in CoefficientRange b)
        => new(Vector256.Min(a.Least, b.Least), Vector256.Max(a.Largest, b.Largest));
}
