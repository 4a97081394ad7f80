using System.Collections.Immutable;

namespace BladeLoads.Rotor.Sections;

/// <summary>
/// The polars of a section made ready for the balance: all of them as cubics on one common set of angles that spans the full circle, so
/// that one look-up serves every Reynolds number. Beyond a polar's own angles its end value holds.
/// </summary>
internal sealed partial class SectionTable
{
    private const int CoefficientsPerCell = 8;

    private readonly int _polars;
    private readonly double[] _knots;
    private readonly double[] _logReynolds;
    private readonly double[] _firstAngle;
    private readonly double[] _lastAngle;

    // One cell is the span from a knot to the next: four coefficients of lift, four of drag, in powers of the angle from the knot;
    // the polars of a cell lie side by side, because a balance reads two neighbouring ones.
    private readonly double[] _cells;
    private readonly int[] _firstCellOfBucket;
    private readonly double _bucketsPerRadian;
    private readonly Lazy<SectionTable> _augmented;

    private SectionTable(ImmutableArray<Polar> polars, double[] knots)
    {
        _polars = polars.Length;
        _knots = knots;
        _logReynolds = [.. polars.Select(p => Math.Log(p.Reynolds))];
        _firstAngle = [.. polars.Select(p => p.Angles[0])];
        _lastAngle = [.. polars.Select(p => p.Angles[^1])];
        _cells = new double[(knots.Length - 1) * _polars * CoefficientsPerCell];
        for (var m = 0; m < _polars; m++)
        {
            FillCells(m, 0, polars[m].Angles, polars[m].Lift);
            FillCells(m, 4, polars[m].Angles, polars[m].Drag);
        }
        var buckets = Math.Max(512, 2 * knots.Length);
        _bucketsPerRadian = buckets / (2 * Math.PI);
        _firstCellOfBucket = new int[buckets + 1];
        for (int b = 0, cell = 0; b <= buckets; b++)
        {
            // A bucket early, so that rounding of the bucket's number never skips a cell.
            while (cell < knots.Length - 2 && knots[cell + 1] <= -Math.PI + ((b - 1) / _bucketsPerRadian))
                cell++;
            _firstCellOfBucket[b] = cell;
        }
        (_points, _blocks) = SummariseCells();
        var stalls = polars.Select(FirstLiftPeak.Of).ToArray();
        (LeastStallAngle, LeastLiftingAngle) = (stalls.Min(s => s.Peak), stalls.Min(s => s.Lifting));
        _augmented = new Lazy<SectionTable>(() => Prepare([.. polars.Select(polar => RotationalAugmentation.Augment(polar, AugmentationFactors.Full))]));
    }

    /// <summary>The angles of all rows, and +-pi; rad, rising.</summary>
    public ReadOnlySpan<double> Knots => _knots;

    /// <summary>rad; the least angle at which any of the polars has a largest lift; infinite where none lifts.</summary>
    public double LeastStallAngle { get; }

    /// <summary>rad; up to here, from far below, no polar lifts; infinite where none lifts.</summary>
    public double LeastLiftingAngle { get; }

    /// <summary>
    /// The same polars, in the same order, with all the augmentation that there can be; made when first asked for. Beyond the ends of the
    /// plain polars it holds more rows.
    /// </summary>
    public SectionTable Augmented => _augmented.Value;

    public static SectionTable Prepare(ImmutableArray<Polar> polars)
    {
        var knots = new SortedSet<double>(polars.SelectMany(p => p.Angles)) { -Math.PI, Math.PI };
        return new SectionTable(polars, [.. knots]);
    }

    /// <summary>
    /// Which polars serve at a Reynolds number, given as its natural logarithm: the weight, 0 to 1, of the polar after
    /// <c>Polar</c>. Outside the tables the nearest serves alone.
    /// </summary>
    public ReynoldsPlace Place(double logReynolds)
    {
        if (_polars == 1)
        {
            var differs = !double.IsNaN(_logReynolds[0]) && Math.Abs(logReynolds - _logReynolds[0]) > 1e-12;
            return new ReynoldsPlace(0, 0, differs);
        }
        if (logReynolds <= _logReynolds[0])
            return new ReynoldsPlace(0, 0, logReynolds < _logReynolds[0]);
        if (logReynolds >= _logReynolds[^1])
            return new ReynoldsPlace(_polars - 1, 0, logReynolds > _logReynolds[^1]);
        var m = 0;
        while (logReynolds >= _logReynolds[m + 1])
            m++;
        return new ReynoldsPlace(m, (logReynolds - _logReynolds[m]) / (_logReynolds[m + 1] - _logReynolds[m]), Outside: false);
    }

    /// <summary>Whether a polar that serves at <paramref name="place"/> does not reach the angle (rad, within +-pi).</summary>
    public bool IsOutsideAngles(double angle, in ReynoldsPlace place)
    {
        var last = place.Weight > 0 ? place.Polar + 1 : place.Polar;
        for (var m = place.Polar; m <= last; m++)
            if (angle < _firstAngle[m] || angle > _lastAngle[m])
                return true;
        return false;
    }

    /// <summary>Lift and drag coefficients at an angle of attack, rad, within +-pi.</summary>
    public Coefficients At(double angle, in ReynoldsPlace place)
    {
        var cell = CellAt(angle);
        var u = angle - _knots[cell];
        var at = ((cell * _polars) + place.Polar) * CoefficientsPerCell;
        var first = Cubics(at, u);
        if (place.Weight == 0)
            return first;
        var second = Cubics(at + CoefficientsPerCell, u);
        return new Coefficients(
            first.Lift + (place.Weight * (second.Lift - first.Lift)), first.Drag + (place.Weight * (second.Drag - first.Drag)));
    }

    private Coefficients Cubics(int at, double u)
    {
        var c = _cells.AsSpan(at, CoefficientsPerCell);
        return new Coefficients(
            c[0] + (u * (c[1] + (u * (c[2] + (u * c[3]))))), c[4] + (u * (c[5] + (u * (c[6] + (u * c[7]))))));
    }

    private int CellAt(double angle)
    {
        var bucket = (int)((angle + Math.PI) * _bucketsPerRadian);
        var cell = _firstCellOfBucket[Math.Clamp(bucket, 0, _firstCellOfBucket.Length - 1)];
        while (cell < _knots.Length - 2 && angle >= _knots[cell + 1])
            cell++;
        return cell;
    }

    private void FillCells(int polar, int offset, ImmutableArray<double> angles, ImmutableArray<double> values)
    {
        var slopes = new double[angles.Length];
        Pchip.Slopes(angles.AsSpan(), values.AsSpan(), slopes);
        for (int cell = 0, row = -1; cell < _knots.Length - 1; cell++)
        {
            while (row + 1 < angles.Length && angles[row + 1] <= _knots[cell])
                row++;
            var c = _cells.AsSpan((((cell * _polars) + polar) * CoefficientsPerCell) + offset, 4);
            if (row < 0)
                c[0] = values[0];
            else if (row == angles.Length - 1)
                c[0] = values[^1];
            else
                Hermite(angles[row], angles[row + 1], values[row], values[row + 1], slopes[row], slopes[row + 1], _knots[cell], c);
        }
    }

    // The cubic of one pair of rows, in powers of the angle from `from`, which lies between them.
    private static void Hermite(
        double x0, double x1, double y0, double y1, double s0, double s1, double from, Span<double> c)
    {
        var h = x1 - x0;
        var d = (y1 - y0) / h;
        var c2 = ((3 * d) - (2 * s0) - s1) / h;
        var c3 = (s0 + s1 - (2 * d)) / (h * h);
        var u = from - x0;
        c[0] = y0 + (u * (s0 + (u * (c2 + (u * c3)))));
        c[1] = s0 + (u * ((2 * c2) + (3 * u * c3)));
        c[2] = c2 + (3 * u * c3);
        c[3] = c3;
    }
}

/// <summary>Between which polars of a section a Reynolds number lies.</summary>
/// <param name="Polar">Index of the polar below it.</param>
/// <param name="Weight">Weight of the polar above, 0 to 1; 0 where only one serves.</param>
/// <param name="Outside">The Reynolds number is outside the tables; the nearest serves.</param>
public readonly record struct ReynoldsPlace(int Polar, double Weight, bool Outside);

/// <summary>Lift and drag coefficients of a section.</summary>
public readonly record struct Coefficients(double Lift, double Drag);
