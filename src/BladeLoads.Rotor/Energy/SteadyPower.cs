using System.Collections.Immutable;
using BladeLoads.Rotor.Operation;
using MathNet.Numerics.Interpolation;

namespace BladeLoads.Rotor.Energy;

/// <summary>
/// Electrical power at any wind speed, from the rows of a curve and its design points. Between two joints, where a region begins, it is
/// a shape-preserving cubic; across a joint nothing is smoothed.
/// </summary>
public sealed class SteadyPower
{
    private readonly Piece[] _pieces;

    private SteadyPower(Piece[] pieces) => _pieces = pieces;

    /// <summary>m/s, rising: the two ends and every place where power may have a kink.</summary>
    public ImmutableArray<double> Joints => [.. _pieces.Select(p => p.From), _pieces[^1].To];

    /// <summary>m/s: the first wind speed of operation.</summary>
    public double First => _pieces[0].From;

    /// <summary>m/s: the last wind speed of operation.</summary>
    public double Last => _pieces[^1].To;

    /// <summary>The curve of a case within its wind speeds of operation; null where it has none.</summary>
    public static SteadyPower? Of(PowerCurve curve)
    {
        var rows = curve.Points.Where(InOperation).Select(p => (Point: p, IsJoint: false));
        var joints = curve.DesignPoints.Where(d => InOperation(d.Point) && d.Name != DesignPoint.LargestThrust)
            .Select(d => (d.Point, IsJoint: true));
        // A joint on a row of the grid is a joint.
        var nodes = rows.Concat(joints).GroupBy(n => n.Point.Operation.WindSpeed).OrderBy(g => g.Key)
            .Select(g => (g.Key, g.First().Point.ElectricalPower, g.Any(n => n.IsJoint))).ToArray();
        return nodes.Length == 0 ? null : FromNodes(nodes);
    }

    /// <param name="nodes">Wind speed, m/s, rising; power, W, NaN where it is not known; whether the curve may have a kink there.</param>
    public static SteadyPower FromNodes(ReadOnlySpan<(double WindSpeed, double Power, bool IsJoint)> nodes)
    {
        var pieces = new List<Piece>();
        var start = 0;
        for (var i = 1; i < nodes.Length; i++)
        {
            var isUnknown = double.IsNaN(nodes[i].Power);
            // What is not known parts the curve: up to its neighbours nothing is.
            if (isUnknown && i - 1 > start)
            {
                pieces.Add(Piece.Of(nodes[start..i]));
                start = i - 1;
            }
            if (!nodes[i].IsJoint && !isUnknown && !double.IsNaN(nodes[start].Power) && i < nodes.Length - 1)
                continue;
            pieces.Add(Piece.Of(nodes[start..(i + 1)]));
            start = i;
        }
        return new SteadyPower(pieces.Count == 0 ? [Piece.Of(nodes)] : [.. pieces]);
    }

    /// <summary>
    /// W: 0 below the first wind speed of operation; that of the last one beyond it, since a machine stops on a mean over minutes and not on
    /// a gust; NaN beside a point without a balance.
    /// </summary>
    /// <param name="windSpeed">m/s.</param>
    public double At(double windSpeed)
    {
        if (windSpeed < First)
            return 0;
        var (low, high) = (0, _pieces.Length - 1);
        while (low < high)
        {
            var middle = (low + high + 1) / 2;
            if (_pieces[middle].From <= windSpeed)
                low = middle;
            else
                high = middle - 1;
        }
        return _pieces[low].At(Math.Min(windSpeed, Last));
    }

    /// <summary>
    /// The curve in bins of 0.5 m/s, centred on multiples of it: from the first multiple of operation to the last.
    /// </summary>
    public (double[] WindSpeeds, double[] Powers) Bins()
    {
        // A wind speed meant as a multiple may miss it by its last digits.
        var first = (int)Math.Ceiling((First / AnnualEnergy.BinWidth) - 1e-9);
        var last = (int)Math.Floor((Last / AnnualEnergy.BinWidth) + 1e-9);
        double[] speeds = [.. Enumerable.Range(first, Math.Max(0, last - first + 1)).Select(i => i * AnnualEnergy.BinWidth)];
        return (speeds, [.. speeds.Select(v => At(Math.Clamp(v, First, Last)))]);
    }

    private static bool InOperation(CurvePoint point) => (point.Marks & (PointMarks.BelowCutIn | PointMarks.AboveCutOut)) == 0;

    private sealed record Piece(double From, double To, IInterpolation? Shape, double Constant)
    {
        public double At(double windSpeed) => Shape?.Interpolate(windSpeed) ?? Constant;

        public static Piece Of(ReadOnlySpan<(double WindSpeed, double Power, bool IsJoint)> nodes)
        {
            var (speeds, powers) = (new double[nodes.Length], new double[nodes.Length]);
            for (var i = 0; i < nodes.Length; i++)
                (speeds[i], powers[i]) = (nodes[i].WindSpeed, nodes[i].Power);
            var (from, to) = (speeds[0], speeds[^1]);
            if (powers.Any(double.IsNaN) || powers.Length == 1)
                return new Piece(from, to, null, powers.FirstOrDefault(double.IsNaN, powers[0]));
            return new Piece(
                from, to, powers.Length == 2 ? LinearSpline.InterpolateSorted(speeds, powers) : CubicSpline.InterpolatePchipSorted(speeds, powers), 0);
        }
    }
}
